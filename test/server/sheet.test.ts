import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { request } from "../support/request.ts";
import { testApp } from "../support/test-app.ts";

let service: Awaited<ReturnType<typeof testApp>>;
let api: ReturnType<typeof request>;

beforeAll(async () => {
  service = await testApp();
  api = request(service.app);
});
afterAll(() => service.close());

const CELL = "/v1/sheet/best?mass=850kg&speed=1180rpm&feet=4&transmissibility=0.08";

async function best() {
  const response = await api
    .post("/v1/selections")
    .send({ mass: 850, speed: 1180, feet: 4, target: { transmissibility: 0.08 } });
  return response.body.options;
}

describe("a spreadsheet cell", () => {
  test("is one value as plain text, UTF-8, without a newline", async () => {
    const cell = await api.get(`${CELL}&field=designation`);
    expect(cell.headers["content-type"]).toBe("text/plain; charset=utf-8");
    expect(cell.text).toBe((await best())[0].designation);
  });

  test("is a number with a decimal point, exactly as in the JSON", async () => {
    const cell = await api.get(`${CELL}&field=natural_frequency_hz`);
    expect(cell.text).toBe(String((await best())[0].natural_frequency_hz));
  });

  test("reaches into lists by a dotted path, and to what is needed", async () => {
    expect((await api.get(`${CELL}&field=modes.0.shape`)).text).toBe("vertical");
    expect(Number((await api.get(`${CELL}&field=needed.static_deflection_mm`)).text)).toBeCloseTo(8.67, 2);
  });

  test("gives another option by its rank, and none beyond the last", async () => {
    expect((await api.get(`${CELL}&field=designation&rank=2`)).text).toBe((await best())[1].designation);
    expect((await api.get(`${CELL}&field=designation&rank=9999`)).text).toBe("none");
  });

  test("is none when nothing passes", async () => {
    expect(
      (await api.get("/v1/sheet/best?mass=850kg&speed=60rpm&transmissibility=0.001&field=price")).text,
    ).toBe("none");
  });

  test("gives several fields as one CSV line, or as XML without a namespace", async () => {
    const [{ designation, quantity }] = await best();
    expect((await api.get(`${CELL}&field=designation,quantity`)).text).toBe(`${designation},${quantity}`);
    const xml = await api.get(`${CELL}&field=designation,modes.0.shape&format=xml`);
    expect(xml.type).toBe("application/xml");
    expect(xml.text).toBe(
      `<r><designation>${designation}</designation><modes_0_shape>vertical</modes_0_shape></r>`,
    );
  });

  test("ignores t=, which a sheet changes to ask again", async () => {
    expect((await api.get(`${CELL}&field=quantity&t=1`)).text).toBe("4");
  });

  test.each([
    ["mass=850xg&speed=1180rpm&field=price", /^#ERR mass: .*unit/],
    ["mass=850kg&speed=fast&field=price", /^#ERR speed: /],
    ["speed=1180rpm&field=price", /^#ERR mass: is missing/],
    ["mass=850kg&speed=1180rpm&field=colour", /^#ERR field: .*"colour" is not a key/],
    ["mass=850kg&speed=1180rpm", /^#ERR field: is missing/],
    ["mass=850kg&speed=1180rpm&field=price&wibble=1", /^#ERR wibble: is not a known/],
    [
      "mass=850kg&speed=1180rpm&field=transmitted_force_n",
      /^#ERR field: transmitted_force_n: no excitation is stated/,
    ],
    ["mass=850,5kg&speed=1180rpm&field=price", /^#ERR mass: .*comma/],
    ["mass=850kg&speed=1180rpm&field=price&rank=0", /^#ERR rank: /],
  ])("tells bad input in the cell with status 200: %s", async (query, text) => {
    const cell = await api.get(`/v1/sheet/best?${query}`);
    expect(cell.status).toBe(200);
    expect(cell.type).toBe("text/plain");
    expect(cell.text).toMatch(text);
  });

  test("tells bad input as a problem when errors=status", async () => {
    const cell = await api.get("/v1/sheet/best?mass=850xg&speed=1180rpm&field=price&errors=status");
    expect(cell.status).toBe(422);
    expect(cell.type).toBe("application/problem+json");
  });

  test("takes a decimal comma only when dec=, says so", async () => {
    const comma = await api.get(
      "/v1/sheet/best?mass=850,5kg&speed=1180rpm&transmissibility=0,08&dec=,&field=quantity",
    );
    expect(comma.text).toBe("4");
    const twice = await api.get("/v1/sheet/best?mass=1,850,5kg&speed=1180rpm&dec=,&field=quantity");
    expect(twice.text).toMatch(/^#ERR mass: /);
  });

  test("answers OPTIONS with 204 and HEAD as the GET, as a spreadsheet asks before it gets", async () => {
    expect((await api.options(`${CELL}&field=price`)).status).toBe(204);
    const head = await api.head(`${CELL}&field=price`);
    expect(head.status).toBe(200);
    expect((await api.get(`${CELL}&field=price`)).status).toBe(200);
  });
});
