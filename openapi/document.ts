import { readFileSync } from "node:fs";
import { join } from "node:path";
import {
  createDocument,
  type oas31,
  type ZodOpenApiContentObject,
  type ZodOpenApiObject,
  type ZodOpenApiOperationObject,
  type ZodOpenApiResponseObject,
} from "zod-openapi";
import { engineVersion, packageRoot } from "../server/package-info.ts";
import { PROBLEMS } from "../server/problems.ts";
import { type Content, problemsOf, type Route, TAGS } from "../server/route.ts";
import { ProblemSchema } from "./problem-schema.ts";

/** The path of a route as OpenAPI writes it: `/v1/isolators/:id` is `/v1/isolators/{id}`. */
export function documentPath(expressPath: string): string {
  return expressPath.replaceAll(/:(\w+)/g, "{$1}");
}

/** The OpenAPI 3.1 document of the given routes. */
export function buildDocument(routes: readonly Route[]): oas31.OpenAPIObject {
  return createDocument(describe(routes), { override: asAnswer });
}

/**
 * What an answer shares with a request is told otherwise of the answer: it is open, since a later member must
 * break no reader, and the examples of what may be sent (text with units) are not what comes back.
 */
function asAnswer({ jsonSchema, io }: { jsonSchema: Record<string, unknown>; io: "input" | "output" }): void {
  if (io === "input") return;
  delete jsonSchema["examples"];
  if (jsonSchema["additionalProperties"] === false) delete jsonSchema["additionalProperties"];
}

function describe(routes: readonly Route[]): ZodOpenApiObject {
  return {
    openapi: "3.1.1",
    info: {
      title: "mountrank",
      version: engineVersion,
      description:
        "Give a machine's mass and running speed and the vibration that may be transmitted; back come the " +
        "arrangements of isolators that hold it, ranked. Quantities come in as plain numbers in the unit the field " +
        'documents or as text with a unit ("850 kg", "1874 lb"); they go out as numbers whose key ends in the unit. ' +
        "Every error is application/problem+json (RFC 9457).",
      license: { name: "MIT", identifier: "MIT" },
    },
    servers: [{ url: "/", description: "The service that serves this document." }],
    tags: Object.entries(TAGS).map(([name, description]) => ({ name, description })),
    paths: pathsOf(routes),
    components: {
      schemas: { Isolator: isolatorSchema(), Problem: ProblemSchema },
      securitySchemes: {
        key: {
          type: "http",
          scheme: "bearer",
          description: "Needed only where the service is set up with keys.",
        },
        sheet_key: {
          type: "apiKey",
          in: "query",
          name: "key",
          description: "The same key, for spreadsheets.",
        },
      },
    },
  };
}

function pathsOf(routes: readonly Route[]): Record<string, Record<string, ZodOpenApiOperationObject>> {
  const paths: Record<string, Record<string, ZodOpenApiOperationObject>> = {};
  for (const route of routes) {
    const path = documentPath(route.path);
    paths[path] = { ...paths[path], [route.method]: operationOf(route) };
  }
  return paths;
}

function operationOf(route: Route): ZodOpenApiOperationObject {
  const { operationId, summary, description, tags, params, query, body, bodyExamples } = route.operation;
  return {
    operationId,
    summary,
    description,
    tags: [...tags],
    security: securityOf(route),
    ...(params || query
      ? { requestParams: { ...(params && { path: params }), ...(query && { query }) } }
      : {}),
    ...(body && {
      requestBody: {
        // OpenAPI takes a body for optional unless told otherwise.
        required: true,
        content: { "application/json": { schema: body, ...(bodyExamples && { examples: bodyExamples }) } },
      },
    }),
    responses: responsesOf(route),
  };
}

function securityOf({ access, keyInQuery }: Route): Record<string, string[]>[] {
  if (access === "open") return [];
  return [{}, { key: [] }, ...(keyInQuery ? [{ sheet_key: [] }] : [])];
}

function responsesOf(route: Route): Record<string, ZodOpenApiResponseObject> {
  const responses: Record<string, ZodOpenApiResponseObject> = {};
  for (const [status, { description, content }] of Object.entries(route.operation.responses)) {
    responses[status] = { description, ...(content && { content: contentOf(content) }) };
  }
  const codes = [...problemsOf(route)];
  for (const status of new Set(codes.map((code) => PROBLEMS[code].status))) {
    const meanings = codes
      .filter((code) => PROBLEMS[code].status === status)
      .map((code) => `\`${code}\`: ${PROBLEMS[code].meaning}`);
    responses[`${status}`] = {
      description: meanings.join("\n\n"),
      content: { "application/problem+json": { schema: ProblemSchema } },
    };
  }
  return responses;
}

function contentOf(content: Readonly<Record<string, Content>>): ZodOpenApiContentObject {
  return Object.fromEntries(Object.entries(content).map(([type, { ...media }]) => [type, media]));
}

/** The record's own JSON Schema, which imports are checked by, as a component of the document. */
function isolatorSchema() {
  const file = join(packageRoot, "catalog", "isolator.schema.json");
  const { $schema: _, $id: __, ...schema } = JSON.parse(readFileSync(file, "utf8"));
  return schema;
}
