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

const SMALLEST = { mass: "850 kg", speed: "1180 rpm", target: { transmissibility: 0.08 } };

async function select(body: object) {
  const response = await api.post("/v1/selections").send(body);
  expect(response.status, JSON.stringify(response.body.errors)).toBe(200);
  return response.body;
}

describe("bad input", () => {
  test.each<[string, object, string]>([
    ["no mass", { speed: 1180 }, "/mass"],
    ["no speed", { mass: 850 }, "/speed"],
    ["mass of nothing", { ...SMALLEST, mass: 0 }, "/mass"],
    ["negative mass", { ...SMALLEST, mass: "-3 kg" }, "/mass"],
    ["absurd mass", { ...SMALLEST, mass: "1e9 kg" }, "/mass"],
    ["mass with a speed's unit", { ...SMALLEST, mass: "850 rpm" }, "/mass"],
    ["unknown unit", { ...SMALLEST, mass: "850 stone" }, "/mass"],
    ["infinite mass", { ...SMALLEST, mass: "1e999 kg" }, "/mass"],
    ["a comma in a number", { ...SMALLEST, mass: "1,874 lb" }, "/mass"],
    ["a boolean mass", { ...SMALLEST, mass: true }, "/mass"],
    ["a list of masses", { ...SMALLEST, mass: [850] }, "/mass"],
    ["too slow", { ...SMALLEST, speed: 0.5 }, "/speed"],
    ["a range upside down", { ...SMALLEST, speed: { min: 1200, max: 600 } }, "/speed/max"],
    ["a range of one speed", { ...SMALLEST, speed: { min: 600, max: 600 } }, "/speed/max"],
    ["half a range", { ...SMALLEST, speed: { min: 600 } }, "/speed/max"],
    ["two feet", { ...SMALLEST, feet: 2 }, "/feet"],
    ["sixty-five feet", { ...SMALLEST, feet: 65 }, "/feet"],
    ["half a foot", { ...SMALLEST, feet: 4.5 }, "/feet"],
    ["an odd footprint", { ...SMALLEST, feet: { count: 5, length: 1, width: 1 } }, "/feet/count"],
    [
      "feet on one line",
      { ...SMALLEST, feet: { positions: [0, 1, 2].map((x) => ({ x, y: x })) } },
      "/feet/positions",
    ],
    [
      "a centre of gravity outside the feet",
      { ...SMALLEST, feet: { count: 4, length: 1, width: 1 }, centre_of_gravity: { x: 0.6, y: 0 } },
      "/centre_of_gravity",
    ],
    [
      "a centre of gravity over unplaced feet",
      { ...SMALLEST, centre_of_gravity: { x: 0.6, y: 0 } },
      "/centre_of_gravity",
    ],
    ["order nothing", { ...SMALLEST, orders: [0] }, "/orders/0"],
    ["an order beyond 200", { ...SMALLEST, orders: [201] }, "/orders/0"],
    ["no orders", { ...SMALLEST, orders: [] }, "/orders"],
    ["an unknown excitation", { ...SMALLEST, excitation: [{ kind: "shaking" }] }, "/excitation/0/kind"],
    [
      "a direction to nowhere",
      { ...SMALLEST, excitation: [{ kind: "force", amplitude: 1, direction: [0, 0, 0] }] },
      "/excitation/0/direction",
    ],
    [
      "no such grade",
      { ...SMALLEST, excitation: [{ kind: "unbalance", rotor_mass: 10, grade: "G7" }] },
      "/excitation/0/grade",
    ],
    [
      "an unbalance of nothing",
      { ...SMALLEST, excitation: [{ kind: "unbalance", moment: 0 }] },
      "/excitation/0/moment",
    ],
    ["a target of nothing", { ...SMALLEST, target: { transmissibility: 0 } }, "/target/transmissibility"],
    [
      "a complete efficiency",
      { ...SMALLEST, target: { isolation_efficiency: 100 } },
      "/target/isolation_efficiency",
    ],
    [
      "a force target without an excitation",
      { ...SMALLEST, target: { transmitted_force: 10 } },
      "/target/transmitted_force",
    ],
    ["no such family", { ...SMALLEST, limits: { families: ["open_sprung"] } }, "/limits/families/0"],
    ["a currency in words", { ...SMALLEST, limits: { currency: "euro" } }, "/limits/currency"],
    ["no such exposure", { ...SMALLEST, environment: { exposures: ["lava"] } }, "/environment/exposures/0"],
    [
      "temperatures upside down",
      { ...SMALLEST, environment: { temperature: { min: 40, max: 20 } } },
      "/environment/temperature/max",
    ],
    ["no such ranking", { ...SMALLEST, rank_by: "colour" }, "/rank_by"],
    ["no such catalogue", { ...SMALLEST, catalog: "atlantis" }, "/catalog"],
    ["a page of nothing", { ...SMALLEST, limit: 0 }, "/limit"],
    ["an unknown field", { ...SMALLEST, masss: 3 }, "/masss"],
    ["an unknown field within", { ...SMALLEST, target: { transmisibility: 0.1 } }, "/target/transmisibility"],
  ])("%s is refused, by its place", async (_, body, pointer) => {
    const response = await api.post("/v1/selections").send(body);
    expect(response.status).toBe(422);
    expect(response.type).toBe("application/problem+json");
    expect(response.body.errors.map((e: { pointer: string }) => e.pointer)).toContain(pointer);
  });

  test("suggests the field that was meant", async () => {
    const { body } = await api.post("/v1/selections").send({ ...SMALLEST, target: { transmisibility: 0.1 } });
    expect(body.errors[0].detail).toContain('did you mean "transmissibility"?');
  });

  test.each([
    ["uncertainty", { ...SMALLEST, uncertainty: { mass: 0.05 } }, "/uncertainty"],
    ["floor_motion", { ...SMALLEST, floor_motion: {} }, "/floor_motion"],
    ["run_up", { ...SMALLEST, run_up: { time: 8 } }, "/run_up"],
    ["support_velocity", { ...SMALLEST, target: { support_velocity: 1 } }, "/target/support_velocity"],
    ["probability", { ...SMALLEST, rank_by: "probability" }, "/rank_by"],
  ])("%s is refused by name as not yet supported", async (_, body, pointer) => {
    const response = await api.post("/v1/selections").send(body);
    expect(response.status).toBe(422);
    expect(response.body.errors).toEqual([
      expect.objectContaining({ pointer, detail: expect.stringContaining("not yet supported") }),
    ]);
  });

  test("leaves the service serving", async () => {
    await api.post("/v1/selections").set("content-type", "application/json").send("{broken");
    expect((await select(SMALLEST)).options.length).toBeGreaterThan(0);
  });
});
