import { gzipSync } from "node:zlib";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { z } from "zod";
import { ProblemError } from "../../server/problems.ts";
import { type Route, route } from "../../server/route.ts";
import { InputError } from "../../src/errors/index.ts";
import { checkedByProblem } from "../support/problem.ts";
import { testApp } from "../support/test-app.ts";

const operation = {
  summary: "For a test.",
  description: "For a test.",
  tags: [],
  responses: { 200: { description: "" } },
};

const routes: readonly Route[] = [
  route({
    method: "post",
    path: "/echo",
    operation: { ...operation, operationId: "echo", body: z.strictObject({ mass: z.number().positive() }) },
    handler: ({ body, response }) => response.json(body),
  }),
  route({
    method: "get",
    path: "/things/:id",
    operation: {
      ...operation,
      operationId: "thing",
      params: z.strictObject({ id: z.string().max(20) }),
      query: z.strictObject({ format: z.enum(["json", "csv"]).optional() }),
    },
    handler: ({ params, response }) => response.json(params),
  }),
  route({
    method: "get",
    path: "/fails",
    operation: { ...operation, operationId: "fails" },
    handler: async ({ response }) => {
      response.set("etag", '"half-made"');
      throw new Error("password=yeast at /secret/path");
    },
  }),
  route({
    method: "get",
    path: "/model",
    operation: { ...operation, operationId: "model" },
    handler: () => {
      throw new InputError([
        { pointer: "/feet", detail: "the feet lie on one line" },
        { pointer: "/mass", detail: "must be more than 0" },
      ]);
    },
  }),
  route({
    method: "get",
    path: "/cell",
    operation: { ...operation, operationId: "cell" },
    answerProblem: (problem, request, response) => {
      if (request.query["errors"] === "status") return false;
      response.type("text/plain").send(`#ERR ${problem.message}`);
      return true;
    },
    handler: () => {
      throw new ProblemError("not-found", "no such mount");
    },
  }),
];

let service: Awaited<ReturnType<typeof testApp>>;
beforeAll(async () => {
  service = await testApp({ routes });
});
afterAll(() => service.close());

const ask = () => checkedByProblem(service.app);
const json = { "content-type": "application/json" };

describe("a body that cannot be read", () => {
  test.each([
    ["broken JSON", '{"mass": 850'],
    ["a NaN literal", '{"mass": NaN}'],
    ["an empty body", ""],
    ["100,000 brackets that never close", "[".repeat(100_000)],
  ])("%s is 400 malformed-json", async (_, body) => {
    const response = await ask().post("/echo").set(json).send(body);
    expect(response.body).toMatchObject({ status: 400, code: "malformed-json", instance: "/echo" });
  });

  test("no body at all is 400 malformed-json", async () => {
    const response = await ask().post("/echo").set(json);
    expect(response.body.code).toBe("malformed-json");
  });

  test.each([
    ["text/plain", '{"mass":1}'],
    ["application/x-www-form-urlencoded", "mass=1"],
    ["application/json; charset=latin1", '{"mass":1}'],
    ["application/", '{"mass":1}'],
  ])("Content-Type %s is 415", async (type, body) => {
    const response = await ask().post("/echo").set("content-type", type).send(body);
    expect(response.body).toMatchObject({ status: 415, code: "unsupported-media-type" });
  });

  test("a Content-Encoding that is not known is 415", async () => {
    const response = await ask().post("/echo").set(json).set("content-encoding", "lzma").send('{"mass":1}');
    expect(response.body.code).toBe("unsupported-media-type");
  });

  test("more than 1 MiB is 413", async () => {
    const response = await ask()
      .post("/echo")
      .set(json)
      .send(`{"mass":1${" ".repeat(1_048_576)}}`);
    expect(response.body).toMatchObject({ status: 413, code: "payload-too-large" });
  });

  test("a small gzip body that unpacks to more than 1 MiB is 413", async () => {
    const bomb = gzipSync(`{"mass":1${" ".repeat(20_000_000)}}`);
    const response = await ask()
      .post("/echo")
      .set({ ...json, "content-encoding": "gzip" })
      .serialize((body) => body)
      .send(bomb);
    expect(response.body.code).toBe("payload-too-large");
  });

  test("what claims to be gzip and is not is 400", async () => {
    const response = await ask().post("/echo").set(json).set("content-encoding", "gzip").send('{"mass":1}');
    expect(response.body).toMatchObject({ status: 400, code: "malformed-request" });
  });
});

describe("a body that is JSON but not usable", () => {
  test.each([
    ["null", "null", ""],
    ["a number", "5", ""],
    ["100,000 brackets", "[".repeat(100_000) + "]".repeat(100_000), ""],
    ["brackets in a field", `{"mass":${"[".repeat(100_000)}${"]".repeat(100_000)}}`, "/mass"],
    ["1e999, which reads as infinity", '{"mass":1e999}', "/mass"],
    ["a missing field", "{}", "/mass"],
    ["a misspelt field", '{"mass":1,"masss":1}', "/masss"],
  ])("%s is 422 at its own pointer", async (_, body, pointer) => {
    const response = await ask().post("/echo").set(json).send(body);
    expect(response.body).toMatchObject({ status: 422, code: "invalid-input", errors: [{ pointer }] });
  });

  test("thousands of unknown fields are counted, and fifty are listed", async () => {
    const body = Object.fromEntries(Array.from({ length: 5000 }, (_, i) => [`unknown ${i}`, i]));
    const response = await ask()
      .post("/echo")
      .send({ mass: 1, ...body });
    expect(response.body.errors).toHaveLength(50);
    expect(response.body.detail).toContain("4999 more");
  });

  test("a rule of the model that is broken gives every fault it found", async () => {
    const response = await ask().get("/model");
    expect(response.body).toMatchObject({
      status: 422,
      detail: "/feet: the feet lie on one line (and 1 more)",
      errors: [{ pointer: "/feet" }, { pointer: "/mass" }],
    });
  });
});

describe("an address that does not fit", () => {
  test("an unknown path is 404 unknown-route", async () => {
    const response = await ask().get("/v2/selections?mass=1");
    expect(response.body).toMatchObject({ status: 404, code: "unknown-route", instance: "/v2/selections" });
  });

  test.each(["/things/%ZZ", "/things/%E0%A4%A", "/things/x?format=%FF", "/%"])(
    "%s, badly encoded, is 400",
    async (url) => {
      const response = await ask().get(url);
      expect(response.body).toMatchObject({ status: 400, code: "malformed-request" });
    },
  );

  test("a well encoded slash, space and sign belong to the name", async () => {
    const response = await ask().get("/things/4%2F7%20%C3%A9");
    expect(response.body).toEqual({ id: "4/7 é" });
  });

  test("a method the path does not have is 405 with Allow", async () => {
    const response = await ask().delete("/things/x");
    expect(response.body).toMatchObject({ status: 405, code: "method-not-allowed" });
    expect(response.headers["allow"]).toBe("GET, HEAD, OPTIONS");
  });

  test("OPTIONS is 204 with Allow, and HEAD has the status of GET", async () => {
    const options = await ask().options("/echo");
    expect([options.status, options.headers["allow"]]).toEqual([204, "POST, OPTIONS"]);
    expect((await ask().head("/things/x")).status).toBe(200);
    expect((await ask().head("/model")).status).toBe(422);
  });

  test("an unknown, a wrong and a repeated query parameter are each named", async () => {
    const unknown = await ask().get("/things/x?fromat=csv");
    expect(unknown.body.errors).toEqual([
      { pointer: "/fromat", parameter: "fromat", detail: 'is not a known field; did you mean "format"?' },
    ]);
    const wrong = await ask().get("/things/x?format=pdf");
    expect(wrong.body.errors).toEqual([
      { pointer: "/format", parameter: "format", detail: 'must be one of "json", "csv"' },
    ]);
    const twice = await ask().get("/things/x?format=csv&format=csv");
    expect(twice.body.errors).toEqual([
      { pointer: "/format", parameter: "format", detail: "is given more than once" },
    ]);
  });

  test("a route without a query refuses one", async () => {
    expect((await ask().get("/fails?x=1")).body).toMatchObject({ status: 422, errors: [{ parameter: "x" }] });
  });
});

describe("what nobody planned", () => {
  test("is a bare 500 that tells nothing but the request's id", async () => {
    const response = await ask().get("/fails");
    expect(response.body).toEqual({
      type: "/reference/problems#internal",
      title: "The service failed",
      status: 500,
      detail: "The service failed. Its log holds the cause under the request id.",
      instance: "/fails",
      code: "internal",
      request_id: response.headers["x-request-id"],
    });
    expect(response.headers["etag"]).toBeUndefined();
  });

  test("is logged whole, under that id", async () => {
    const lines: object[] = [];
    const logger = Object.create(service.context.logger, {
      error: { value: (fields: object) => lines.push(fields) },
    });
    const logged = await testApp({ routes, context: { logger } });
    const response = await checkedByProblem(logged.app).get("/fails");
    logged.close();
    expect(lines).toMatchObject([
      {
        err: { message: "password=yeast at /secret/path" },
        request_id: response.body.request_id,
        path: "/fails",
      },
    ]);
  });
});

test("a route may answer its problems in its own way, as a spreadsheet needs, or leave it", async () => {
  const cell = await ask().get("/cell");
  expect([cell.status, cell.text]).toEqual([200, "#ERR no such mount"]);
  const plain = await ask().get("/cell?errors=status");
  expect(plain.body).toMatchObject({ status: 422 });
});

describe("keys", () => {
  const config = { apiKeys: ["flour"], requireKey: "all" } as const;
  const keyed: readonly Route[] = [
    ...routes,
    route({
      method: "get",
      path: "/sheet",
      keyInQuery: true,
      operation: { ...operation, operationId: "sheet" },
      handler: ({ query, response }) => response.json(query),
    }),
    route({
      method: "get",
      path: "/open",
      access: "open",
      operation: { ...operation, operationId: "open" },
      handler: ({ response }) => response.json({}),
    }),
  ];
  let locked: Awaited<ReturnType<typeof testApp>>;
  beforeAll(async () => {
    locked = await testApp({ routes: keyed, config });
  });
  afterAll(() => locked.close());

  test("without one, or with a wrong one, a reading route is 401", async () => {
    for (const authorization of ["", "Bearer yeast", "Basic flour", "Bearer"]) {
      const response = await checkedByProblem(locked.app).get("/things/x").set({ authorization });
      expect(response.body).toMatchObject({ status: 401, code: "unauthorized" });
      expect(response.headers["www-authenticate"]).toBe('Bearer realm="mountrank"');
    }
  });

  test("the right one opens it; open routes and OPTIONS need none", async () => {
    const agent = checkedByProblem(locked.app);
    expect((await agent.get("/things/x").set({ authorization: "Bearer flour" })).status).toBe(200);
    expect((await agent.get("/open")).status).toBe(200);
    expect((await agent.options("/things/x")).status).toBe(204);
  });

  test("a spreadsheet sends it in the query, where the handler does not see it, and HEAD needs none", async () => {
    const agent = checkedByProblem(locked.app);
    expect((await agent.get("/sheet?key=flour")).body).toEqual({});
    expect((await agent.get("/sheet?key=yeast")).status).toBe(401);
    expect((await agent.get("/sheet")).status).toBe(401);
    expect((await agent.head("/sheet")).status).toBe(200);
    expect((await agent.get("/things/x?key=flour")).status).toBe(401);
  });
});
