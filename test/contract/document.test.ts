import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { buildDocument, documentPath } from "../../openapi/document.ts";
import { PROBLEM_CODES } from "../../server/problems.ts";
import { routes } from "../../server/routes/index.ts";
import { document, validatorAt } from "../support/contract.ts";
import { request } from "../support/request.ts";
import { testApp } from "../support/test-app.ts";

let service: Awaited<ReturnType<typeof testApp>>;
beforeAll(async () => {
  service = await testApp();
});
afterAll(() => service.close());

describe("the committed document", () => {
  test("is what the routes say; `npm run openapi` writes it anew", () => {
    expect(document).toEqual(JSON.parse(JSON.stringify(buildDocument(routes))));
  });

  test("holds every route, and no other", () => {
    const documented = Object.entries(document.paths).flatMap(([path, methods]) =>
      Object.entries(methods).map(([method, { operationId }]) => `${operationId}: ${method} ${path}`),
    );
    const listed = routes.map(
      ({ method, path, operation }) => `${operation.operationId}: ${method} ${documentPath(path)}`,
    );
    expect(documented.toSorted()).toEqual(listed.toSorted());
    expect(new Set(routes.map((route) => route.operation.operationId)).size).toBe(routes.length);
  });

  test.each(routes.map((route) => [route.method.toUpperCase(), route.path]))(
    "%s %s is mounted",
    async (method, path) => {
      const { headers } = await request(service.app).options(path.replaceAll(/:\w+/g, "x"));
      expect(headers["allow"]?.split(", ")).toContain(method);
    },
  );

  test.each(examples(document))("the example at %s fits its schema", (_, schemaAt, value) => {
    const validate = validatorAt(...schemaAt);
    expect(validate(value) ? [] : validate.errors).toEqual([]);
  });
});

test("registry, reference page and document hold the same problem codes", async () => {
  const page = await request(service.app).get("/reference/problems");
  const onPage = [...page.text.matchAll(/<tr id="([^"]+)">/g)].map(([, code]) => code);
  expect(onPage).toEqual(PROBLEM_CODES);
  expect(document.components.schemas["Problem"]).toMatchObject({
    properties: { code: { enum: PROBLEM_CODES } },
  });
});

/** Every example in the document: where it is, the keys that lead to its schema, and the example. */
function examples(node: unknown, keys: readonly string[] = []): [string, readonly string[], unknown][] {
  if (typeof node !== "object" || node === null) return [];
  const found: [string, readonly string[], unknown][] = [];
  const add = (schemaAt: readonly string[], value: unknown) =>
    found.push([schemaAt.join(" "), schemaAt, value]);
  if ("examples" in node && Array.isArray(node.examples)) {
    for (const value of node.examples) add(keys, value);
  } else if ("schema" in node) {
    if ("example" in node) add([...keys, "schema"], node.example);
    if ("examples" in node) {
      for (const { value } of Object.values(node.examples as Record<string, { value: unknown }>)) {
        add([...keys, "schema"], value);
      }
    }
  }
  return found.concat(Object.entries(node).flatMap(([key, child]) => examples(child, [...keys, key])));
}
