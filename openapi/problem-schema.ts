import { z } from "zod";
import { PROBLEM_CODES } from "../server/problems.ts";

/** The body of every error answer (RFC 9457), open so that a later member breaks no reader. */
export const ProblemSchema = z
  .looseObject({
    type: z.string().describe("Where this kind of problem is explained, relative to the service."),
    title: z.string().describe("The kind of problem, the same for every occurrence."),
    status: z.int().min(400).max(599).describe("The HTTP status, repeated."),
    detail: z.string().describe("What was wrong this time."),
    instance: z.string().describe("The path that was asked for."),
    code: z.enum(PROBLEM_CODES).describe("The name of the kind of problem, for programs."),
    request_id: z.string().describe("Names this request in the service's log."),
    errors: z
      .array(
        z.looseObject({
          pointer: z.string().describe("JSON Pointer (RFC 6901) to the field at fault."),
          detail: z.string(),
          parameter: z.string().optional().describe("The query or path parameter at fault, where it is one."),
        }),
      )
      .optional()
      .describe("One entry for each field at fault."),
  })
  .meta({ id: "Problem", description: "An error answer (RFC 9457)." });
