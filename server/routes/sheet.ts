import type { Request, Response } from "express";
import { z } from "zod";
import { InputError } from "../../src/errors/index.ts";
import { compute } from "../answer.ts";
import { csvOf } from "../presenters/csv.ts";
import { presentOption } from "../presenters/option.ts";
import { presentNeeded } from "../presenters/selection.ts";
import { cellText, valueAt, xmlText } from "../presenters/value.ts";
import type { ProblemError } from "../problems.ts";
import { type Context, type Route, route } from "../route.ts";
import { SelectionQuery } from "../schemas/selection-query.ts";
import { questionOfQuery } from "./selections.ts";

/** What a cell shows when no option has the rank asked for. */
const NOTHING = "none";
const MOST_FIELDS = 32;

const SheetQuery = SelectionQuery.omit({ limit: true, cursor: true }).extend({
  field: z
    .string()
    .min(1)
    .max(500)
    .regex(/^[A-Za-z0-9_]+(\.[A-Za-z0-9_]+)*(,[A-Za-z0-9_]+(\.[A-Za-z0-9_]+)*)*$/, {
      error:
        "must be names of an option's keys, separated by commas, such as designation or modes.0.frequency_hz",
    })
    .meta({
      description: "Key of an option, a dotted path, or needed.…; several with commas.",
      examples: ["designation"],
    }),
  rank: z.coerce
    .number()
    .int()
    .min(1)
    .max(1_000_000)
    .optional()
    .meta({ description: "Which option; 1 is the best." }),
  format: z.enum(["text", "xml"]).optional().meta({ description: "xml gives one element a value." }),
  dec: z
    .enum([",", "."])
    .optional()
    .meta({ description: "Decimal sign of the numbers in this address; a point when left out." }),
  errors: z
    .enum(["cell", "status"])
    .optional()
    .meta({ description: "status answers bad input with a problem and its status." }),
  t: z.string().max(200).optional().meta({ description: "Ignored: change it to make a sheet ask again." }),
});

type Machine = Readonly<Record<string, string | undefined>>;

/** Values of one option for the cells of a spreadsheet, by field. */
function valuesOf(
  context: Context,
  machine: Machine,
  fields: readonly string[],
  rank: number,
): readonly string[] {
  const question = questionOfQuery(context, machine);
  const selection = compute(question);
  const option = selection.options[rank - 1];
  const shown = option && presentOption(option, question.asked.request);
  const needed = { needed: presentNeeded(selection.needed) };
  return fields.map((field) => {
    const ofOption = !field.startsWith("needed");
    if (ofOption && shown === undefined) return NOTHING;
    const value = valueAt(ofOption ? shown : needed, field);
    if (value === undefined) throw InputError.at("/field", `"${field}" is not a key of an option`);
    if (value === null) {
      const note = shown?.notes.find((text) => text.startsWith(`${field}:`));
      throw InputError.at("/field", note ?? `${field}: was not computed`);
    }
    return cellText(value);
  });
}

/** Numbers written with a decimal comma, once the caller has said that they are. */
function withPoints(machine: Machine): Machine {
  return Object.fromEntries(
    Object.entries(machine).map(([name, text]) => [name, text?.replace(/^([^,]*\d),(\d[^,]*)$/, "$1.$2")]),
  );
}

/** A sheet shows neither status nor body of an error, so bad input is told in the cell. */
function inTheCell({ code, message, errors }: ProblemError, request: Request, response: Response): boolean {
  if (code !== "invalid-input" || request.query["errors"] === "status") return false;
  const [first] = errors ?? [];
  const text =
    first === undefined ? message : `${first.parameter ?? first.pointer.slice(1)}: ${first.detail}`;
  response.status(200).type("text/plain; charset=utf-8").send(`#ERR ${text}`);
  return true;
}

export const sheetRoutes: readonly Route[] = [
  route({
    method: "get",
    path: "/v1/sheet/best",
    keyInQuery: true,
    operation: {
      operationId: "getCell",
      summary: "One value for a spreadsheet cell",
      description:
        "The query of a GET selection with field=: the value of the best option as plain text, `none` when nothing " +
        "passes. Bad input answers 200 with `#ERR field: reason`, since a sheet shows neither status nor body of an error.",
      tags: ["spreadsheets"],
      query: SheetQuery,
      responses: {
        200: {
          description: "The value; several as one CSV line.",
          content: {
            "text/plain": { schema: z.string(), example: "2084.0" },
            "application/xml": { schema: z.string(), example: "<r><quantity>4</quantity></r>" },
          },
        },
      },
    },
    answerProblem: inTheCell,
    handler({ context, query, response }) {
      const { field, rank, format, dec, errors: _, t: __, ...machine } = query;
      const fields = field.split(",");
      if (fields.length > MOST_FIELDS) throw InputError.at("/field", `at most ${MOST_FIELDS} fields at once`);
      const values = valuesOf(context, dec === "," ? withPoints(machine) : machine, fields, rank ?? 1);
      response.set("cache-control", "no-cache");
      if (format === "xml") {
        const elements = fields.map(
          (name, i) => `<${elementOf(name)}>${xmlText(values[i] as string)}</${elementOf(name)}>`,
        );
        response.type("application/xml; charset=utf-8").send(`<r>${elements.join("")}</r>`);
      } else {
        const [only] = values as [string];
        response
          .type("text/plain; charset=utf-8")
          .send(values.length === 1 ? only : csvOf(values, [], { decimal: "point" }).trimEnd());
      }
    },
  }),
];

/** A dotted path as the name of an element: the dots become low lines, and no name begins with a digit. */
function elementOf(field: string): string {
  return field.replaceAll(".", "_").replace(/^(?=\d)/, "_");
}
