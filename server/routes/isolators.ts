import type { Response } from "express";
import { z } from "zod";
import { DEFAULT_CATALOG, type Snapshot } from "../../catalog/index.ts";
import type { IsolatorRecord } from "../../src/isolator/index.ts";
import { snapshotOf } from "../answer.ts";
import { browse } from "../browse.ts";
import { negotiate } from "../negotiate.ts";
import { cursorAt, offsetOf } from "../presenters/cursor.ts";
import { isolatorsCsv } from "../presenters/isolators-csv.ts";
import { ProblemError } from "../problems.ts";
import { type Context, type Route, route } from "../route.ts";
import { TABLE_MEDIA, tableForms } from "../schemas/forms.ts";
import { IsolatorQuery } from "../schemas/isolators.ts";

const DEFAULT_PAGE = 50;

const record = { $ref: "#/components/schemas/Isolator" };

const list = {
  type: "object",
  required: ["catalog", "isolators", "next_cursor"],
  properties: {
    catalog: {
      type: "object",
      required: ["name", "revision"],
      properties: { name: { type: "string" }, revision: { type: "string" } },
    },
    found: { type: "integer", description: "Isolators on all pages." },
    isolators: { type: "array", items: record },
    next_cursor: { type: ["string", "null"] },
  },
};

const csv = { schema: z.string().meta({ description: "A record a line, a unit in each header." }) };
const unchanged = { description: "Nothing has changed since the answer with this ETag." };

/** Marks the answer with the revision it was made from; one address has one answer a revision and version. */
function tag(response: Response, { revision }: Snapshot, { engineVersion }: Context, form: string): void {
  response.set("etag", `"${revision}.${engineVersion}.${form}"`).set("cache-control", "private, no-cache");
}

export const isolatorRoutes: readonly Route[] = [
  route({
    method: "get",
    path: "/v1/isolators",
    operation: {
      operationId: "listIsolators",
      summary: "Browse the catalogue",
      description: "The isolators of the active revision that pass every filter given, in pages.",
      tags: ["catalogue"],
      query: IsolatorQuery,
      responses: {
        200: { description: "One page.", content: { "application/json": { schema: list }, "text/csv": csv } },
        304: unchanged,
      },
      problems: ["not-acceptable", "stale-cursor"],
    },
    handler({ context, query, request, response }) {
      const form = negotiate(request, response, TABLE_MEDIA, query.format);
      const snapshot = snapshotOf(context.store, query.catalog ?? DEFAULT_CATALOG);
      const { catalog, revision } = snapshot;
      tag(response, snapshot, context, form);
      if (request.fresh) return void response.status(304).end();

      const found = browse(snapshot.columns.isolators, query);
      const offset = offsetOf(query.cursor, query, snapshot);
      const next = offset + (query.limit ?? DEFAULT_PAGE);
      const page = found.slice(offset, next).map((isolator) => isolator.designation);
      const records = context.store.records(revision, page);
      if (form === "csv") return void response.type("csv").send(csvOf(records, query));
      response.json({
        catalog: { name: catalog, revision },
        found: found.length,
        isolators: records,
        next_cursor: next < found.length ? cursorAt(next, query, snapshot) : null,
      });
    },
  }),
  route({
    method: "get",
    path: "/v1/isolators/:id",
    operation: {
      operationId: "getIsolator",
      summary: "One isolator",
      description: "The full record as it was imported. The id is the designation, percent-encoded.",
      tags: ["catalogue"],
      params: z.strictObject({ id: z.string().max(64).meta({ description: "The designation." }) }),
      query: z.strictObject({ catalog: IsolatorQuery.shape.catalog, ...tableForms }),
      responses: {
        200: {
          description: "The record.",
          content: { "application/json": { schema: record }, "text/csv": csv },
        },
        304: unchanged,
      },
      problems: ["not-found", "not-acceptable"],
    },
    handler({ context, params, query, request, response }) {
      const form = negotiate(request, response, TABLE_MEDIA, query.format);
      const snapshot = snapshotOf(context.store, query.catalog ?? DEFAULT_CATALOG);
      const found = context.store.record(snapshot.revision, params.id);
      if (found === undefined)
        throw new ProblemError(
          "not-found",
          `The catalogue "${snapshot.catalog}" has no isolator called "${params.id}".`,
        );
      tag(response, snapshot, context, form);
      if (request.fresh) response.status(304).end();
      else if (form === "csv") response.type("csv").send(csvOf([found], query));
      else response.json(found);
    },
  }),
];

type Forms = Pick<IsolatorQuery, "units" | "decimal">;

function csvOf(records: readonly IsolatorRecord[], { units, decimal }: Forms): string {
  return isolatorsCsv(records, units ?? "si", { decimal: decimal ?? "point" });
}
