import type { z } from "zod";
import type { Fault } from "../../src/errors/index.ts";
import { knownKeys } from "./known-keys.ts";
import { suggestion } from "./nearest.ts";
import { jsonPointer } from "./pointer.ts";
import { mustBe, NO_FORM, oneOf } from "./sentences.ts";

/**
 * The faults in a zod error, each with the most specific place that can be named: an unknown field is pointed
 * at itself, and where a field may have several forms, the form that came nearest is the one explained.
 *
 * @param schema  the schema that was applied; with it, a misspelt field gets a suggestion
 * @param input   what it was applied to
 */
export function faultsOf(error: z.core.$ZodError, schema?: z.core.$ZodType, input?: unknown): Fault[] {
  return flatten(error.issues, [], input).map(({ path, detail, unknown }) => {
    const near =
      schema === undefined || !unknown
        ? ""
        : suggestion(String(path.at(-1)), knownKeys(schema, path.slice(0, -1)));
    return { pointer: jsonPointer(path), detail: detail + near };
  });
}

interface Finding {
  readonly path: readonly PropertyKey[];
  readonly detail: string;
  /** The last part of the path is a name the schema does not know. */
  readonly unknown?: true;
}

function flatten(
  issues: readonly z.core.$ZodIssue[],
  base: readonly PropertyKey[],
  input: unknown,
): Finding[] {
  return issues.flatMap((issue): Finding[] => {
    const path = [...base, ...issue.path];
    if (issue.code === "unrecognized_keys") {
      return issue.keys.map((key) => ({
        path: [...path, key],
        detail: "is not a known field",
        unknown: true,
      }));
    }
    if (issue.code === "invalid_union" && issue.errors.length > 0) return union(issue, path, input);
    return [{ path, detail: issue.message }];
  });
}

function union(issue: z.core.$ZodIssueInvalidUnion, path: readonly PropertyKey[], input: unknown): Finding[] {
  const entered = issue.errors.filter((issues) => !issues.some(isRefusedWhole));
  const ofItsKind = entered.filter((issues) => !issues.some(isWrongKind));
  const [nearestForm] = ofItsKind.toSorted((a, b) => strangeness(a) - strangeness(b) || a.length - b.length);
  if (nearestForm !== undefined) return flatten(nearestForm, path, input);

  const [kind, ...kinds] = entered.flatMap((issues) => issues.filter(isWrongKind));
  if (kind !== undefined) {
    const at = [...path, ...kind.path];
    const known = [kind, ...kinds]
      .filter(({ path: [key] }) => key === kind.path[0])
      .flatMap(({ values }) => values);
    return [{ path: at, detail: oneOf(known.map(String), valueAt(input, at)) }];
  }

  const expected = issue.errors.flatMap(expectedKinds);
  const detail =
    issue.message === NO_FORM && expected.length > 0 ? mustBe(expected, valueAt(input, path)) : issue.message;
  return [{ path, detail }];
}

/** The field that tells the forms apart by a constant, such as `kind`, names another form. */
function isWrongKind(issue: z.core.$ZodIssue): issue is z.core.$ZodIssueInvalidValue {
  return issue.code === "invalid_value" && issue.values.length === 1 && issue.path.length === 1;
}

/** The form does not even have the right kind of value: an object where a number is due. */
function isRefusedWhole(issue: z.core.$ZodIssue): boolean {
  if (issue.path.length > 0) return false;
  return (
    issue.code === "invalid_type" ||
    (issue.code === "invalid_union" && issue.errors.every((form) => form.some(isRefusedWhole)))
  );
}

function strangeness(issues: readonly z.core.$ZodIssue[]): number {
  return issues.filter((issue) => issue.code === "unrecognized_keys").length;
}

function expectedKinds(issues: readonly z.core.$ZodIssue[]): string[] {
  return issues.flatMap((issue) => {
    if (issue.code === "invalid_type") return [issue.expected];
    return issue.code === "invalid_union" ? issue.errors.flatMap(expectedKinds) : [];
  });
}

function valueAt(input: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>(
    (value, key) => (typeof value === "object" && value !== null ? Reflect.get(value, key) : undefined),
    input,
  );
}
