import type { z } from "zod";
import { type InputFault, invalidInput } from "../problems.ts";
import { faultsOf } from "./faults.ts";
import { sentence } from "./sentences.ts";

/**
 * Reads a body by its schema.
 * @throws {ProblemError} invalid-input, with a pointer for each fault
 */
export function readBody<S extends z.ZodType>(schema: S, body: unknown): z.output<S> {
  const result = schema.safeParse(body, { error: sentence });
  if (result.success) return result.data;
  throw invalidInput(faultsOf(result.error, schema, body));
}

/**
 * Reads query or path parameters by their schema. A parameter given twice is refused.
 * @throws {ProblemError} invalid-input, each fault with the parameter's name
 */
export function readParameters<S extends z.ZodType>(
  schema: S,
  given: Readonly<Record<string, unknown>>,
): z.output<S> {
  const result = schema.safeParse(given, { error: sentence });
  if (result.success) return result.data;
  throw invalidInput(faultsOf(result.error, schema, given).map((fault) => withParameter(fault, given)));
}

function withParameter(fault: InputFault, given: Readonly<Record<string, unknown>>): InputFault {
  const parameter = (fault.pointer.split("/")[1] ?? "").replaceAll("~1", "/").replaceAll("~0", "~");
  const detail = Array.isArray(given[parameter]) ? "is given more than once" : fault.detail;
  return { ...fault, detail, parameter };
}
