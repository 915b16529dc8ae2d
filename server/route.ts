import type { Request, Response } from "express";
import type { Logger } from "pino";
import { z } from "zod";
import type { Store } from "../catalog/index.ts";
import type { Config } from "./config.ts";
import { readBody, readParameters } from "./input/read.ts";
import type { ProblemCode, ProblemError } from "./problems.ts";

/** What every handler may use. */
export interface Context {
  readonly store: Store;
  readonly config: Config;
  readonly logger: Logger;
  /** The only clock of the server. */
  readonly clock: () => Date;
  readonly engineVersion: string;
}

/** One request as a handler sees it: the parameters and the body have been checked by the route's schemas. */
export interface Call<P, Q, B> {
  readonly context: Context;
  readonly params: P;
  readonly query: Q;
  readonly body: B;
  readonly request: Request;
  readonly response: Response;
}

type Method = "get" | "post" | "put" | "delete";

/** One form of an answer, by media type: a zod schema or a plain JSON Schema, and an example to show. */
export interface Content {
  readonly schema: z.ZodType | Readonly<Record<string, unknown>>;
  readonly example?: unknown;
}

interface Answer {
  readonly description: string;
  readonly content?: Readonly<Record<string, Content>>;
}

/** What the OpenAPI document says of a route, and what its requests are checked by. */
export interface Operation<PS extends z.ZodObject, QS extends z.ZodObject, BS extends z.ZodType> {
  readonly operationId: string;
  readonly summary: string;
  readonly description: string;
  readonly tags: readonly Tag[];
  /** Path parameters, by the names in the path. */
  readonly params?: PS;
  /** Query parameters; make it a strict object, so that a misspelt one is refused. Without it there are none. */
  readonly query?: QS;
  /** The JSON body. */
  readonly body?: BS;
  /** Requests to show, by name. */
  readonly bodyExamples?: Readonly<Record<string, { readonly summary: string; readonly value: unknown }>>;
  /** Answers that are not problems, by status. */
  readonly responses: Readonly<Record<number, Answer>>;
  /** Problems of the route's own; those that follow from the request's parts are added by `problemsOf`. */
  readonly problems?: readonly ProblemCode[];
}

export const TAGS = {
  selections: "Ranked isolators for a machine and a target.",
  catalogue: "The isolators there are.",
  spreadsheets: "Single values for spreadsheet cells.",
  service: "Pages for people, and the state of the service.",
} as const;
type Tag = keyof typeof TAGS;

export interface RouteSpec<PS extends z.ZodObject, QS extends z.ZodObject, BS extends z.ZodType> {
  readonly method: Method;
  /** In Express form: `/v1/isolators/:id`. A GET route answers HEAD too. */
  readonly path: string;
  readonly operation: Operation<PS, QS, BS>;
  /** Who may call it when there are keys. `reading` unless stated; `open` is for everybody, always. */
  readonly access?: "open" | "reading" | "writing";
  /** The key may come as `key=` in the query, and HEAD needs none: for spreadsheets, which can send no header. */
  readonly keyInQuery?: true;
  /** Largest body in bytes, 1 MiB unless stated. */
  readonly bodyLimit?: number;
  readonly handler: (call: Call<z.output<PS>, z.output<QS>, z.output<BS>>) => unknown;
  /** Answers a problem in the route's own way instead of as problem+json; false leaves it to the usual way. */
  readonly answerProblem?: (problem: ProblemError, request: Request, response: Response) => boolean;
}

/** A route with its types worked in: what the application mounts and the document describes. */
export type Route = Omit<RouteSpec<z.ZodObject, z.ZodObject, z.ZodType>, "handler"> & {
  readonly answer: (context: Context, request: Request, response: Response) => unknown;
};

const nothing = z.strictObject({});
/** Pages and health answer whatever query a proxy or a link has added. */
const anything = z.looseObject({});

/** Makes a route. The handler's parameter types follow from the operation's schemas. */
export function route<
  PS extends z.ZodObject = z.ZodObject,
  QS extends z.ZodObject = z.ZodObject,
  BS extends z.ZodType = z.ZodType<undefined>,
>(spec: RouteSpec<PS, QS, BS>): Route {
  const { handler, ...rest } = spec;
  const { params, query, body } = spec.operation;
  return {
    ...rest,
    answer: (context, request, response) =>
      handler({
        context,
        params: readParameters(params ?? nothing, request.params) as z.output<PS>,
        query: readParameters(
          query ?? (spec.access === "open" ? anything : nothing),
          queryOf(spec, request),
        ) as z.output<QS>,
        body: (body === undefined ? undefined : readBody(body, request.body)) as z.output<BS>,
        request,
        response,
      }),
  };
}

/** The key has been dealt with before a handler sees the query. */
function queryOf(spec: { readonly keyInQuery?: true }, request: Request): Record<string, unknown> {
  if (spec.keyInQuery === undefined || !("key" in request.query)) return request.query;
  const { key: _, ...rest } = request.query;
  return rest;
}

/** Every problem a route can answer with: its own, and those that follow from the parts of its request. */
export function problemsOf({
  operation: { params, query, body, problems = [] },
  access,
}: Route): ReadonlySet<ProblemCode> {
  const isOpen = access === "open";
  const takesInput = !isOpen || params !== undefined || query !== undefined || body !== undefined;
  return new Set<ProblemCode>([
    "malformed-request",
    ...(body === undefined
      ? []
      : (["malformed-json", "payload-too-large", "unsupported-media-type"] as const)),
    ...(isOpen ? [] : (["unauthorized"] as const)),
    ...(takesInput ? (["invalid-input"] as const) : []),
    ...problems,
    "internal",
  ]);
}
