import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { request } from "../support/request.ts";
import { testApp } from "../support/test-app.ts";

describe("the health of the service", () => {
  let service: Awaited<ReturnType<typeof testApp>>;
  beforeAll(async () => {
    service = await testApp();
  });
  afterAll(() => service.close());

  test.each(["/health/live", "/health/ready"])(
    "%s is 200 while all is well, and never cached",
    async (url) => {
      const response = await request(service.app).get(url);
      expect(response.body).toEqual({ status: "ok" });
      expect(response.headers["cache-control"]).toBe("no-store");
    },
  );

  test("with a store that cannot be read it lives but is not ready, and says when to ask again", async () => {
    const store = Object.create(service.context.store, {
      check: {
        value: () => {
          throw new Error("disk I/O error at /secret/path");
        },
      },
    });
    const broken = await testApp({ context: { store } });
    const ready = await request(broken.app).get("/health/ready");
    expect(ready.body).toMatchObject({
      status: 503,
      code: "unavailable",
      detail: "The catalogue cannot be read.",
    });
    expect(ready.headers["retry-after"]).toBe("5");
    expect((await request(broken.app).get("/health/live")).status).toBe(200);
    broken.close();
  });

  test("the headers keep pages to themselves and do not name the framework", async () => {
    const { headers } = await request(service.app).get("/health/live");
    expect(headers["content-security-policy"]).toContain("default-src 'self'");
    expect(headers["x-content-type-options"]).toBe("nosniff");
    expect(headers["x-powered-by"]).toBeUndefined();
    expect(headers["x-request-id"]).toMatch(/^[0-9a-f-]{36}$/);
  });
});
