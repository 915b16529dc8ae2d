import type { Express } from "express";
import supertest, { type Response } from "supertest";
import { expect } from "vitest";
import { document, documentedPath, validatorAt } from "./contract.ts";

/**
 * Requests to an application whose every answer must be one that the OpenAPI document allows: a documented
 * status and media type, and a body that fits the schema. Anything else fails the test.
 */
export function request(app: Express) {
  const agent = supertest(app);
  return {
    get: (url: string) => agent.get(url).expect(conforms("get", url)),
    head: (url: string) => agent.head(url).expect(conforms("head", url)),
    post: (url: string) => agent.post(url).expect(conforms("post", url)),
    put: (url: string) => agent.put(url).expect(conforms("put", url)),
    delete: (url: string) => agent.delete(url).expect(conforms("delete", url)),
    options: (url: string) => agent.options(url).expect(conforms("options", url)),
  };
}

function conforms(method: string, url: string) {
  return (response: Response): void => {
    const requested = url.split("?")[0] ?? url;
    const path = documentedPath(requested);
    const operation = document.paths[path ?? ""]?.[method === "head" ? "get" : method];

    if (path === undefined || operation === undefined) {
      outsideTheDocument(response, method, path);
      return;
    }
    const status = String(response.status);
    const answer = operation.responses[status] ?? {};
    expect(Object.keys(operation.responses), `${method} ${path} answered a status not documented`).toContain(
      status,
    );
    if (answer.content === undefined) {
      expect(response.text ?? "", `${method} ${path} ${status} is documented without a body`).toBe("");
      return;
    }
    expect(Object.keys(answer.content), `${method} ${path} ${status} media type`).toContain(response.type);
    if (method === "head" || !response.type.endsWith("json")) return;
    check(["paths", path, method, "responses", status, "content", response.type, "schema"], response.body);
  };
}

/** Only these may be answered where the document says nothing: no such path, no such method, OPTIONS, a bad address. */
function outsideTheDocument(response: Response, method: string, path: string | undefined): void {
  if (method === "options" && path !== undefined) {
    expect(response.status).toBe(204);
    expect(response.headers["allow"]).toContain("OPTIONS");
    return;
  }
  expect(path === undefined ? [400, 404] : [405]).toContain(response.status);
  expect(response.type).toBe("application/problem+json");
  if (method !== "head") check(["components", "schemas", "Problem"], response.body);
}

function check(keys: readonly string[], body: unknown): void {
  const validate = validatorAt(...keys);
  expect(validate(body) ? [] : validate.errors, keys.join(" ")).toEqual([]);
}
