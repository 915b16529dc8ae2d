import type { Response } from "express";
import { z } from "zod";
import { InputError } from "../../src/errors/index.ts";
import { answerOf, type Question, questionOf } from "../answer.ts";
import { readBody } from "../input/read.ts";
import { negotiate } from "../negotiate.ts";
import type { PresentedSelection } from "../presenters/selection.ts";
import { selectionCsv } from "../presenters/selection-csv.ts";
import { type InputFault, invalidInput, ProblemError } from "../problems.ts";
import { type Context, type Route, route } from "../route.ts";
import { TABLE_MEDIA, tableForms } from "../schemas/forms.ts";
import { SelectionBody } from "../schemas/selection.ts";
import { SelectionAnswer } from "../schemas/selection-answer.ts";
import { bodyOfQuery, queryNameOf, SelectionQuery } from "../schemas/selection-query.ts";

const SMALLEST = { mass: "850 kg", speed: "1180 rpm", target: { transmissibility: 0.08 } };

/** An idle bakery fan on a variable-speed drive, with what a plant engineer knows of it. */
const FULLER = {
  name: "Prover extract fan",
  tag: "BB-EF-2",
  mass: "850 kg",
  speed: { min: "590 rpm", max: "1180 rpm" },
  feet: { count: 4, length: "1.8 m", width: "1.1 m" },
  centre_of_gravity: { x: "0.1 m", y: 0 },
  excitation: [{ kind: "unbalance", rotor_mass: "120 kg", grade: "G6.3" }],
  environment: { temperature: { min: "-10 degC", max: "45 degC" } },
  target: { isolation_efficiency: 80, transmitted_force: "100 N" },
  limits: { static_deflection: "60 mm" },
};

const answers = {
  200: {
    description: "The ranked options; none of them when nothing passes, with the reasons.",
    content: {
      "application/json": { schema: SelectionAnswer },
      "text/csv": { schema: z.string().meta({ description: "The options of this page, one a line." }) },
    },
  },
};

const forms = z.strictObject(tableForms);
type Forms = z.output<typeof forms>;

function send(response: Response, answer: string, form: "json" | "csv", { units, decimal }: Forms): void {
  if (form === "json") response.type("json").send(answer);
  else
    response.type("csv").send(
      selectionCsv(JSON.parse(answer) as PresentedSelection, units ?? "si", {
        decimal: decimal ?? "point",
      }),
    );
}

/**
 * The question that a query asks, its faults told by the names of the query.
 * @throws {ProblemError} invalid-input
 */
export function questionOfQuery(
  context: Context,
  query: Readonly<Record<string, string | undefined>>,
): Question {
  try {
    return questionOf(context, readBody(SelectionBody, bodyOfQuery(query)));
  } catch (error) {
    const faults =
      error instanceof InputError ? error.faults : error instanceof ProblemError ? error.errors : undefined;
    if (faults === undefined) throw error;
    throw invalidInput(faults.map(namedByQuery));
  }
}

function namedByQuery(fault: InputFault): InputFault {
  const parameter = queryNameOf(fault.pointer);
  return parameter === undefined ? fault : { ...fault, parameter };
}

export const selectionRoutes: readonly Route[] = [
  route({
    method: "post",
    path: "/v1/selections",
    operation: {
      operationId: "createSelection",
      summary: "Rank isolators for a machine",
      description:
        "From a machine's mass and running speed, with as much more as is known, ranks the arrangements of isolators " +
        "that keep its targets, and says why the others fail. A quantity is a number in the unit of its field, or a " +
        "text with a unit.",
      tags: ["selections"],
      query: forms,
      body: SelectionBody,
      bodyExamples: {
        smallest: { summary: "A mass, a speed and a target", value: SMALLEST },
        fuller: { summary: "A fan on a variable-speed drive", value: FULLER },
      },
      responses: answers,
      problems: ["not-acceptable", "stale-cursor"],
    },
    handler({ context, body, query, request, response }) {
      const form = negotiate(request, response, TABLE_MEDIA, query.format);
      send(response, answerOf(context, questionOf(context, body)), form, query);
    },
  }),
  route({
    method: "get",
    path: "/v1/selections",
    operation: {
      operationId: "querySelection",
      summary: "Rank isolators for a machine, by address",
      description: "The same as a POST, from a query string: for browsers and spreadsheets.",
      tags: ["selections"],
      query: SelectionQuery.extend(tableForms),
      responses: {
        ...answers,
        304: { description: "Nothing has changed since the answer with this ETag." },
      },
      problems: ["not-acceptable", "stale-cursor"],
    },
    handler({ context, query, request, response }) {
      const { format, units, decimal, ...machine } = query;
      const form = negotiate(request, response, TABLE_MEDIA, format);
      const question = questionOfQuery(context, machine);
      response.set("etag", `"${question.id}.${form}.${units ?? "si"}.${decimal ?? "point"}"`);
      response.set("cache-control", "private, no-cache");
      if (request.fresh) response.status(304).end();
      else send(response, answerOf(context, question), form, query);
    },
  }),
  route({
    method: "get",
    path: "/v1/selections/:id",
    operation: {
      operationId: "getSelection",
      summary: "An answer as issued",
      description:
        "A selection that was answered before, byte for byte. With .csv after the id, its options as CSV.",
      tags: ["selections"],
      params: z.strictObject({
        id: z
          .string()
          .max(64)
          .meta({ description: "The id of the answer.", examples: ["3f0c1b2a4d5e6f708192a3b4"] }),
      }),
      query: forms,
      responses: answers,
      problems: ["not-found", "not-acceptable"],
    },
    handler({ context, params, query, request, response }) {
      const [, id, suffix] = /^([0-9a-f]+)(?:\.(json|csv))?$/.exec(params.id) ?? [];
      const kept = id === undefined ? undefined : context.store.archive.get(id);
      if (kept === undefined)
        throw new ProblemError(
          "not-found",
          `No selection is kept under "${params.id}". Old ones make room for new ones.`,
        );
      const form =
        suffix === undefined
          ? negotiate(request, response, TABLE_MEDIA, query.format)
          : (suffix as "json" | "csv");
      send(response, kept.answer, form, query);
    },
  }),
];
