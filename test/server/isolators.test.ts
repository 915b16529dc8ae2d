import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { FAMILIES, type IsolatorRecord } from "../../src/isolator/index.ts";
import { request } from "../support/request.ts";
import { testApp } from "../support/test-app.ts";

let service: Awaited<ReturnType<typeof testApp>>;
let api: ReturnType<typeof request>;

/** A buyer's own part number, with everything a part number may hold. */
const AWKWARD: IsolatorRecord = {
  designation: '007/A 12" =1+1',
  family: "open_spring",
  axial: { stiffness_n_per_mm: 98 },
  damping: { ratio: 0.01 },
  load_n: { max: 2500 },
};

beforeAll(async () => {
  service = await testApp();
  service.context.store.importRevision("own", [AWKWARD], { activate: true });
  api = request(service.app);
});
afterAll(() => service.close());

async function all(query: string): Promise<IsolatorRecord[]> {
  const found: IsolatorRecord[] = [];
  let cursor = "";
  for (;;) {
    const { status, body } = await api.get(`/v1/isolators?${query}&limit=100${cursor}`);
    expect(status, JSON.stringify(body)).toBe(200);
    found.push(...body.isolators);
    if (body.next_cursor === null) return found;
    cursor = `&cursor=${body.next_cursor}`;
  }
}

describe("browsing the catalogue", () => {
  test("finds every isolator once, over all pages", async () => {
    const found = await all("");
    expect(found.length).toBeGreaterThanOrEqual(300);
    expect(new Set(found.map((r) => r.designation)).size).toBe(found.length);
    expect(new Set(found.map((r) => r.family)).size).toBe(FAMILIES.length);
  });

  test("filters by load, family, height, temperature, resistance and price", async () => {
    const found = await all(
      "load=2000N&families=open_spring,elastomer_mount&max_height=200mm&temp_min=-10&max_price=500",
    );
    expect(found.length).toBeGreaterThan(0);
    for (const record of found) {
      expect(["open_spring", "elastomer_mount"]).toContain(record.family);
      expect(record.load_n.max).toBeGreaterThanOrEqual(2000);
      expect(record.load_n.min ?? 0).toBeLessThanOrEqual(2000);
      expect(record.free_height_mm).toBeLessThanOrEqual(200);
      expect(record.temperature_c?.min).toBeLessThanOrEqual(-10);
      expect(record.price).toBeLessThanOrEqual(500);
    }
    for (const record of await all("exposures=oil")) expect(record.resists).toContain("oil");
    for (const record of await all("captive=true")) expect(record.captive).toBe(true);
  });

  test("filters by natural frequency at rated load", async () => {
    const soft = await all("natural_frequency_max=2.5Hz");
    expect(soft.length).toBeGreaterThan(0);
    for (const { axial, load_n, dynamic_ratio = 1 } of soft) {
      const fn =
        "natural_frequency_hz" in axial
          ? axial.natural_frequency_hz
          : "stiffness_n_per_mm" in axial
            ? Math.sqrt(
                (axial.stiffness_n_per_mm * 1000 * (dynamic_ratio as number) * 9.80665) /
                  (load_n.rated ?? load_n.max),
              ) /
              (2 * Math.PI)
            : Number.NaN;
      expect(fn).toBeLessThanOrEqual(2.5);
    }
  });

  test("sorts either way, what is silent about the key last", async () => {
    const prices = (await all("sort=price")).map((r) => r.price ?? Number.POSITIVE_INFINITY);
    expect(prices).toEqual([...prices].sort((a, b) => a - b));
    const loads = (await all("sort=-load")).map((r) => r.load_n.max);
    expect(loads).toEqual([...loads].sort((a, b) => b - a));
  });

  test("comes as CSV in SI and US units", async () => {
    const si = await api.get("/v1/isolators?format=csv&limit=2");
    expect(si.text.split("\r\n")[0]).toContain("stiffness_n_per_mm");
    const us = await api.get("/v1/isolators?units=us&limit=2").set("accept", "text/csv");
    expect(us.text.split("\r\n")[0]).toContain("stiffness_lbf_per_in");
  });

  test("is not sent again while the revision is the same", async () => {
    const first = await api.get("/v1/isolators?limit=3");
    const again = await api
      .get("/v1/isolators?limit=3")
      .set("if-none-match", first.headers["etag"] as string);
    expect(again.status).toBe(304);
  });

  test.each([
    ["families=open_sprung", "families"],
    ["load=2000rpm", "load"],
    ["sort=colour", "sort"],
    ["limit=0", "limit"],
    ["cursor=abc", "cursor"],
    ["catalog=atlantis", "catalog"],
    ["colour=red", "colour"],
  ])("refuses %s by name", async (query, name) => {
    const { status, body } = await api.get(`/v1/isolators?${query}`);
    expect(status).toBe(422);
    expect(body.errors[0].pointer.startsWith(`/${name}`)).toBe(true);
  });

  test("refuses the cursor of another query as stale", async () => {
    const { body } = await api.get("/v1/isolators?limit=5");
    expect((await api.get(`/v1/isolators?limit=5&sort=price&cursor=${body.next_cursor}`)).status).toBe(410);
  });
});

describe("one isolator", () => {
  test("is the full record, as it was imported", async () => {
    const [record] = await all("sort=designation");
    const { body } = await api.get(
      `/v1/isolators/${encodeURIComponent((record as IsolatorRecord).designation)}`,
    );
    expect(body).toEqual(record);
  });

  test("may be called anything, percent-encoded", async () => {
    const { body, status } = await api.get(
      `/v1/isolators/${encodeURIComponent(AWKWARD.designation)}?catalog=own`,
    );
    expect(status).toBe(200);
    expect(body).toEqual(AWKWARD);
  });

  test("whose name a spreadsheet would run is neutralised in CSV", async () => {
    service.context.store.importRevision("formula", [{ ...AWKWARD, designation: "=1+1" }], {
      activate: true,
    });
    const { text } = await api.get("/v1/isolators?catalog=formula&format=csv");
    expect(text.split("\r\n")[1]?.startsWith("'=1+1,")).toBe(true);
  });

  test("is 404 under a name that is not in the catalogue", async () => {
    expect((await api.get("/v1/isolators/no-such-part")).status).toBe(404);
  });
});
