import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";
import { z } from "zod";
import { htmlPage } from "../presenters/html.ts";
import { problemsPage } from "../presenters/problems-page.ts";
import { type Route, route } from "../route.ts";

const INDEX = htmlPage(
  "mountrank reference",
  `<div id="swagger-ui"></div>
<noscript><p>This page needs JavaScript. The document itself is at <a href="/openapi.json">/openapi.json</a>,
the problem codes are at <a href="/reference/problems">/reference/problems</a>.</p></noscript>
<script src="/reference/assets/swagger-ui-bundle.js"></script>
<script src="/reference/assets/start.js"></script>`,
  '<link rel="stylesheet" href="/reference/assets/swagger-ui.css">\n',
);

/** A file of its own, because the pages' policy allows no script inside a page. No validator: it is elsewhere. */
const START = `SwaggerUIBundle({ url: "/openapi.json", dom_id: "#swagger-ui", deepLinking: true, validatorUrl: null });
`;

const ASSETS = {
  "swagger-ui.css": "text/css; charset=utf-8",
  "swagger-ui-bundle.js": "text/javascript; charset=utf-8",
  "favicon-32x32.png": "image/png",
  "start.js": "text/javascript; charset=utf-8",
} as const;

const html = (description: string) => ({
  200: { description, content: { "text/html": { schema: { type: "string" } } } },
});

export const referenceRoutes: readonly Route[] = [
  route({
    method: "get",
    path: "/reference",
    access: "open",
    operation: {
      operationId: "getReference",
      summary: "The reference, for reading",
      description:
        "This document as a page on which requests can be tried. Everything it needs is served here.",
      tags: ["service"],
      responses: html("The page."),
    },
    handler({ response }) {
      response.type("html").send(INDEX);
    },
  }),
  route({
    method: "get",
    path: "/reference/problems",
    access: "open",
    operation: {
      operationId: "getProblemCodes",
      summary: "The problem codes",
      description: "Every code an error answer can have: what it means and what to do.",
      tags: ["service"],
      responses: html("The page."),
    },
    handler({ response }) {
      response.type("html").send(problemsPage());
    },
  }),
  route({
    method: "get",
    path: "/reference/assets/:file",
    access: "open",
    operation: {
      operationId: "getReferenceAsset",
      summary: "A file of the reference page",
      description: "Style, script and icon of the page at /reference.",
      tags: ["service"],
      params: z.strictObject({
        file: z
          .enum(Object.keys(ASSETS) as [keyof typeof ASSETS, ...(keyof typeof ASSETS)[]])
          .describe("Name of the file."),
      }),
      responses: {
        200: {
          description: "The file.",
          content: {
            "text/css": { schema: { type: "string" } },
            "text/javascript": { schema: { type: "string" } },
            "image/png": { schema: { type: "string", contentEncoding: "binary" } },
          },
        },
      },
    },
    async handler({ params: { file }, response }) {
      response.set({ "content-type": ASSETS[file], "cache-control": "public, max-age=3600" });
      if (file === "start.js") response.send(START);
      else await sendFile(response, file);
    },
  }),
];

function sendFile(response: import("express").Response, file: string): Promise<void> {
  const folder = dirname(fileURLToPath(import.meta.resolve("swagger-ui-dist/package.json")));
  return new Promise((resolve, reject) => {
    response.sendFile(join(folder, file), { cacheControl: false }, (error: unknown) =>
      error === undefined ? resolve() : reject(error),
    );
  });
}
