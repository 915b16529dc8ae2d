import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { request } from "../support/request.ts";
import { testApp } from "../support/test-app.ts";

test("the README shows the answer that the service gives", async () => {
  const readme = readFileSync(new URL("../../README.md", import.meta.url), "utf8");
  const [, body] = /-d '(\{.*\})'/.exec(readme) ?? [];
  const service = await testApp();
  const answer = await request(service.app)
    .post("/v1/selections")
    .send(JSON.parse(body as string));
  service.close();
  const { id, catalog, counts, needed, options, near_misses, next_cursor } = answer.body;
  const [option] = options;
  for (const shown of [
    id,
    catalog.revision,
    next_cursor,
    needed.static_deflection_mm,
    `"passing": ${counts.passing}`,
    `"overloaded": ${counts.rejected.overloaded}`,
    option.designation,
    option.natural_frequency_hz,
    option.transmissibility,
    `"price": ${option.price}`,
    near_misses[0].designation,
  ])
    expect(readme).toContain(String(shown));
});
