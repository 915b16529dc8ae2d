import express from "express";
import supertest from "supertest";
import { describe, expect, test } from "vitest";
import { negotiate } from "../../server/negotiate.ts";
import { problemOf } from "../../server/problems.ts";

const app = express();
app.get("/", (request, response) => {
  const forms = { json: "application/json", csv: "text/csv" } as const;
  const format = request.query["format"] === "csv" ? "csv" : undefined;
  response.send(negotiate(request, response, forms, format));
});
app.use(
  (error: unknown, _request: express.Request, response: express.Response, _next: express.NextFunction) => {
    response.send(problemOf(error).code);
  },
);

describe("the form of an answer", () => {
  test.each([
    [undefined, "json"],
    ["*/*", "json"],
    ["text/csv", "csv"],
    ["text/*", "csv"],
    ["text/csv;q=0.5, application/json;q=0.4", "csv"],
    ["text/html,application/xhtml+xml,*/*;q=0.8", "json"],
    ["image/png", "not-acceptable"],
  ])("for Accept %s it is %s", async (accept, form) => {
    const response = await supertest(app)
      .get("/")
      .set(accept === undefined ? {} : { accept });
    expect(response.text).toBe(form);
    expect(response.headers["vary"]).toBe("Accept");
  });

  test("format= in the query wins over Accept, and then the answer does not vary", async () => {
    const response = await supertest(app).get("/?format=csv").set({ accept: "application/json" });
    expect(response.text).toBe("csv");
    expect(response.headers["vary"]).toBeUndefined();
  });
});
