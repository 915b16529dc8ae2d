import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { document } from "../support/contract.ts";
import { expectClose } from "../support/expect-close.ts";
import { request } from "../support/request.ts";
import { testApp } from "../support/test-app.ts";

let service: Awaited<ReturnType<typeof testApp>>;
let api: ReturnType<typeof request>;

beforeAll(async () => {
  service = await testApp();
  api = request(service.app);
});
afterAll(() => service.close());

const SPRING = {
  designation: "own-1",
  family: "open_spring",
  axial: { stiffness_n_per_mm: 100 },
  damping: { loss_factor: 0.1 },
  lateral_ratio: 0.6,
  load_n: { min: 500, max: 3000 },
};

/** The benchmark box (1000 kg, 1.2 × 0.8 × 1.0 m) on four mounts 0.45 m below its centre. */
const BOX = {
  mass: 1000,
  speed: 1500,
  feet: { positions: [-0.5, 0.5].flatMap((x) => [-0.35, 0.35].map((y) => ({ x, y, z: 0 }))) },
  centre_of_gravity: { x: 0, y: 0, z: 0.45 },
  envelope: { length: 1.2, width: 0.8, height: 1 },
  isolators: [{ feet: "all", isolator: SPRING }],
};

async function evaluate(body: object) {
  const response = await api.post("/v1/evaluations").send(body);
  expect(response.status, JSON.stringify(response.body.errors)).toBe(200);
  return response.body;
}

/** The pump set of the reference pages. */
function example(): object {
  const operation = document.paths["/v1/evaluations"]?.["post"] as unknown as {
    requestBody: { content: Record<string, { examples: Record<string, { value: object }> }> };
  };
  return operation.requestBody.content["application/json"]?.examples["pump_set"]?.value ?? {};
}

describe("an evaluation", () => {
  test("finds the vertical and yaw modes of the benchmark box, which gravity leaves alone, at 3.1831 and 3.6145 Hz", async () => {
    const { modes } = await evaluate(BOX);
    const named = (shape: string) => modes.find((mode: { shape: string }) => mode.shape === shape);
    expectClose(named("vertical").frequency_hz, 3.183099, {
      atol: 5e-7,
      because: "closed form, printed to six decimals",
    });
    expectClose(named("yaw").frequency_hz, 3.614497, {
      atol: 5e-7,
      because: "closed form, printed to six decimals",
    });
    expectClose(named("yaw").damping_ratio, 0.05, { rtol: 1e-9, because: "ζ = η/2" });
  });

  test("of the documented pump set reads as its example says", async () => {
    const value = example();
    const { feet, modes, worst, worst_force, checks, rotation, levelness_mm, notes } = await evaluate(value);
    const weight = (420 + 2400 * 1.7 * 0.8 * 0.2) * 9.80665;
    expectClose(
      feet.reduce((s: number, f: { load_n: number }) => s + f.load_n, 0),
      weight,
      { rtol: 1e-9, because: "balance of forces" },
    );
    expect(modes).toHaveLength(6);
    expect(worst.transmissibility).toBeLessThan(0.1);
    expect(worst_force.transmitted_force_n).toBeGreaterThan(0);
    expect(worst_force.foot_forces_n).toHaveLength(4);
    expect(["right_handed", "left_handed"]).toContain(rotation);
    expect(levelness_mm).toBeGreaterThan(0);
    expect(worst.transmissibility).toBeGreaterThan(1.5 * worst.net_transmissibility);
    expect(notes.join(" ")).toContain("push against one another");
    expect(checks.map((check: { gate: string }) => check.gate)).toEqual([
      "underloaded",
      "overloaded",
      "uplift",
      "stability",
      "transmissibility",
      "resonance",
    ]);
    expect(checks.every((check: { passed: boolean }) => check.passed)).toBe(true);
  });

  test("gives the response curve when asked, and the velocity of named points", async () => {
    const { response, worst } = await evaluate({
      ...BOX,
      excitation: [{ kind: "force", amplitude: 100 }],
      points: [{ name: "top", at: { x: 0, y: 0, z: 1 } }],
      frequencies: { min: "1 Hz", max: "100 Hz", points: 50 },
    });
    expect(response.frequency_hz).toHaveLength(50);
    expectClose(response.frequency_hz[49], 100, { rtol: 1e-12, because: "the end asked for" });
    expect(response.transmissibility[49]).toBeLessThan(0.01);
    // A vertical force through the CG moves the body without turning it.
    expectClose(worst.points[0].velocity_mm_per_s_rms, worst.machine_velocity_mm_per_s_rms, {
      rtol: 1e-9,
      because: "pure translation",
    });
  });

  test("takes isolators of the catalogue and records inline, mixed per foot", async () => {
    const { feet } = await evaluate({
      ...BOX,
      isolators: [
        { feet: [1, 2], isolator: SPRING },
        { feet: [3, 4], isolator: "openspring-2xd8x61-2500N-25mm" },
      ],
    });
    expect(feet.map((foot: { isolator: string }) => foot.isolator)).toEqual([
      "own-1",
      "own-1",
      "openspring-2xd8x61-2500N-25mm",
      "openspring-2xd8x61-2500N-25mm",
    ]);
  });

  test("answers a bad arrangement with failed checks, null where nothing could be computed, and why", async () => {
    const { checks, modes, worst, notes } = await evaluate({
      ...BOX,
      isolators: [{ feet: "all", isolator: { ...SPRING, lateral_ratio: 0 } }],
    });
    expect([modes, worst]).toEqual([null, null]);
    expect(checks.find((check: { gate: string }) => check.gate === "stability")).toMatchObject({
      passed: false,
      value: null,
    });
    expect(notes.join(" ")).toContain("nothing holds the machine");
  });

  test("knows a machine that would fall over on soft tall springs", async () => {
    const { checks } = await evaluate({
      ...BOX,
      centre_of_gravity: { x: 0, y: 0, z: 6 },
      isolators: [{ feet: "all", isolator: { ...SPRING, axial: { stiffness_n_per_mm: 30 } } }],
    });
    expect(checks.find((check: { gate: string }) => check.gate === "stability")).toMatchObject({
      passed: false,
    });
  });

  test("uses the vertical model where geometry is not known, and says what that leaves open", async () => {
    const { model, modes, notes } = await evaluate({ mass: 850, speed: 1180, isolators: BOX.isolators });
    expect(model).toBe("vertical");
    expect(modes).toHaveLength(1);
    expect(notes.join(" ")).toContain("height of the centre of gravity");
  });

  test("gives the steady state at both ends of a range, and names the modes that the range crosses", async () => {
    const range = { min: 120, max: 1180 };
    const vertical = await evaluate({ mass: 850, speed: range, isolators: BOX.isolators });
    expect(vertical.steady_state.map((state: { speed_rpm: number }) => Math.round(state.speed_rpm))).toEqual([
      120, 1180,
    ]);
    expect(vertical.notes.join(" ")).toContain("The vertical mode at 3.45 Hz lies inside the speed range");
    const rigid = await evaluate({ ...BOX, speed: range });
    expect(rigid.steady_state).toHaveLength(2);
    expect(
      rigid.notes.filter((note: string) => note.includes("lies inside the speed range")).length,
    ).toBeGreaterThan(3);
  });

  test("says what the vertical model leaves unused", async () => {
    const { assumptions } = await evaluate({
      mass: 850,
      speed: 1180,
      envelope: BOX.envelope,
      isolators: BOX.isolators,
    });
    expect(assumptions).toContain("Not used by the vertical model: envelope.");
  });

  test("serves up to 64 feet", async () => {
    const positions = Array.from({ length: 64 }, (_, i) => ({
      x: (i % 8) / 4 - 0.875,
      y: Math.floor(i / 8) / 4 - 0.875,
    }));
    const { feet } = await evaluate({ ...BOX, mass: 12_000, feet: { positions } });
    expect(feet).toHaveLength(64);
  });

  test.each<[string, object, string]>([
    [
      "a foot named twice",
      {
        isolators: [
          { feet: "all", isolator: SPRING },
          { feet: [2], isolator: SPRING },
        ],
      },
      "/isolators/1/feet",
    ],
    [
      "an inclined isolator where only the vertical model is left",
      {
        centre_of_gravity: undefined,
        envelope: undefined,
        feet: { positions: BOX.feet.positions.map((p) => ({ ...p, axis: [0, 0.5, 1] })) },
      },
      "/feet/positions/0/axis",
    ],
    ["a foot not named", { isolators: [{ feet: [1, 2, 3], isolator: SPRING }] }, "/isolators"],
    ["a foot that is not there", { isolators: [{ feet: [5], isolator: SPRING }] }, "/isolators/0/feet"],
    [
      "an unknown designation",
      { isolators: [{ feet: "all", isolator: "no-such-part" }] },
      "/isolators/0/isolator",
    ],
    [
      "a record that does not fit",
      { isolators: [{ feet: "all", isolator: { ...SPRING, family: "jelly" } }] },
      "/isolators/0/isolator/family",
    ],
    [
      "a curve that falls",
      {
        isolators: [
          {
            feet: "all",
            isolator: {
              ...SPRING,
              axial: {
                curve: [
                  [1, 100],
                  [2, 90],
                ],
              },
            },
          },
        ],
      },
      "/isolators/0/isolator/axial/curve/1",
    ],
    [
      "air springs among others",
      {
        isolators: [
          { feet: [1, 2, 3], isolator: SPRING },
          { feet: [4], isolator: { ...SPRING, family: "air_spring", axial: { natural_frequency_hz: 1.8 } } },
        ],
      },
      "/isolators",
    ],
    [
      "a centre of gravity outside the feet",
      { centre_of_gravity: { x: 0.6, y: 0, z: 0.45 } },
      "/centre_of_gravity",
    ],
    [
      "a curve that ends where it starts",
      { frequencies: { min: 5, max: 5, points: 10 } },
      "/frequencies/max",
    ],
    ["too many points", { frequencies: { min: 1, max: 5, points: 20_001 } }, "/frequencies/points"],
    [
      "a force target without an excitation",
      { target: { transmitted_force: 10 } },
      "/target/transmitted_force",
    ],
    ["an unknown field", { isolater: 1 }, "/isolater"],
  ])("refuses %s, by its place", async (_, change, pointer) => {
    const { status, body } = await api.post("/v1/evaluations").send({ ...BOX, ...change });
    expect(status).toBe(422);
    expect(body.errors[0].pointer).toBe(pointer);
  });

  test("lets captive isolators hold a centre of gravity outside the feet, and fails it as uplift", async () => {
    const { checks } = await evaluate({
      ...BOX,
      centre_of_gravity: { x: 0.6, y: 0, z: 0.45 },
      isolators: [{ feet: "all", isolator: { ...SPRING, captive: true } }],
    });
    expect(checks.find((check: { gate: string }) => check.gate === "uplift")).toMatchObject({
      passed: false,
    });
  });
});

describe("the criteria", () => {
  test("show balance grades and machine zones with their sources", async () => {
    const { body } = await api.get("/v1/criteria");
    expect(body.balance_grades.grades.map((g: { grade_mm_per_s: number }) => g.grade_mm_per_s)).toContain(
      6.3,
    );
    // ISO 20816-3:2022, medium machines on a flexible support: 2.3, 4.5, 7.1 mm/s (published).
    const zone = body.machine_zones.zones.find(
      (z: { group: string; support: string }) => z.group.startsWith("2") && z.support === "flexible",
    );
    expectClose(zone.velocity_mm_per_s_rms.b_c, 4.5, { rtol: 1e-12, because: "the published value" });
    expect(body.machine_zones.source.title).toContain("ISO 20816-3");
  });
});
