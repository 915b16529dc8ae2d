import type { Response } from "express";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { route } from "../../server/route.ts";
import { request } from "../support/request.ts";
import { testApp } from "../support/test-app.ts";

/** What the route at a documented address does in the test at hand. */
let answer: (response: Response) => unknown;

let service: Awaited<ReturnType<typeof testApp>>;
beforeAll(async () => {
  const impostor = route({
    method: "get",
    path: "/health/live",
    access: "open",
    operation: { operationId: "impostor", summary: "", description: "", tags: [], responses: {} },
    handler: ({ response }) => answer(response),
  });
  service = await testApp({ routes: [impostor, { ...impostor, path: "/undocumented" }] });
});
afterAll(() => service.close());

describe("the check of every answer against the document can fail", () => {
  test.each<[string, (response: Response) => unknown]>([
    ["a status not documented", (response) => response.status(201).json({ status: "ok" })],
    ["a media type not documented", (response) => response.type("text/plain").send("ok")],
    ["a body that breaks the schema", (response) => response.json({ status: "well" })],
    [
      "a problem that lacks its members",
      (response) => response.status(500).type("application/problem+json").send("{}"),
    ],
  ])("on %s", async (_, impostor) => {
    answer = impostor;
    await expect(request(service.app).get("/health/live").then()).rejects.toThrow();
  });

  test("on an address that is answered but not documented", async () => {
    answer = (response) => response.json({ status: "ok" });
    await expect(request(service.app).get("/undocumented").then()).rejects.toThrow();
  });

  test("and passes what is documented", async () => {
    answer = (response) => response.json({ status: "ok", since: "a later member" });
    expect((await request(service.app).get("/health/live")).status).toBe(200);
  });
});
