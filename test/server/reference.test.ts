import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { document } from "../support/contract.ts";
import { request } from "../support/request.ts";
import { testApp } from "../support/test-app.ts";

let service: Awaited<ReturnType<typeof testApp>>;
beforeAll(async () => {
  service = await testApp();
});
afterAll(() => service.close());

/** Every address a page loads or leads to. */
function addresses(html: string): string[] {
  return [...html.matchAll(/(?:href|src)="([^"]+)"/g)].map(([, address]) =>
    (address ?? "").replaceAll("&amp;", "&"),
  );
}

describe("the pages for people", () => {
  test.each(["/", "/reference", "/reference/problems"])(
    "%s is HTML in UTF-8 with no script inside",
    async (url) => {
      const { headers, text } = await request(service.app).get(url);
      expect(headers["content-type"]).toBe("text/html; charset=utf-8");
      expect(text).not.toMatch(/<script>|\son\w+=/);
    },
  );

  test.each(["/", "/reference", "/reference/problems"])("every address on %s is served here", async (url) => {
    const page = await request(service.app).get(url);
    for (const address of addresses(page.text)) {
      expect(address, "an address on another host").toMatch(/^\/(?!\/)/);
      const { status } = await request(service.app).get(address.split("#")[0] ?? address);
      expect(status, address).toBe(200);
    }
  });

  test("the reference is titled and starts on the document, with no validator elsewhere", async () => {
    const page = await request(service.app).get("/reference");
    expect(page.text).toContain("<title>mountrank reference</title>");
    const start = await request(service.app).get("/reference/assets/start.js");
    expect(start.text).toContain('url: "/openapi.json"');
    expect(start.text).toContain("validatorUrl: null");
  });

  test("style and script come in UTF-8, without which the page stays blank", async () => {
    const script = await request(service.app).get("/reference/assets/swagger-ui-bundle.js");
    expect(script.headers["content-type"]).toBe("text/javascript; charset=utf-8");
    expect(script.text.length).toBeGreaterThan(1_000_000);
    const style = await request(service.app).get("/reference/assets/swagger-ui.css");
    expect(style.headers["content-type"]).toBe("text/css; charset=utf-8");
  });

  test.each(["package.json", "..%2Fpackage.json", "index.html"])(
    "no other file of the package is served: %s",
    async (file) => {
      expect((await request(service.app).get(`/reference/assets/${file}`)).status).toBe(422);
    },
  );
});

test("the document is served as it is committed", async () => {
  expect((await request(service.app).get("/openapi.json")).body).toEqual(document);
});
