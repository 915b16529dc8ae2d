import { readFileSync } from "node:fs";
import { join } from "node:path";
import { z } from "zod";
import { packageRoot } from "../package-info.ts";
import { type Route, route } from "../route.ts";

const OpenapiSchema = z.looseObject({
  openapi: z.string(),
  info: z.looseObject({}),
  paths: z.looseObject({}),
});

let document: string | undefined;

export const openapiRoutes: readonly Route[] = [
  route({
    method: "get",
    path: "/openapi.json",
    access: "open",
    operation: {
      operationId: "getOpenapi",
      summary: "This document",
      description: "The contract of the service as an OpenAPI 3.1 document.",
      tags: ["service"],
      responses: {
        200: {
          description: "The document.",
          content: { "application/json": { schema: OpenapiSchema } },
        },
      },
    },
    handler({ response }) {
      document ??= readFileSync(join(packageRoot, "openapi", "openapi.json"), "utf8");
      response.type("application/json").send(document);
    },
  }),
];
