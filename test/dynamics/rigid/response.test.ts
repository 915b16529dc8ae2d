import { describe, expect, test } from "vitest";
import { analyse, footLoads, transmissibilityOf } from "../../../src/dynamics/index.ts";
import { equilibrium } from "../../../src/dynamics/rigid/equilibrium.ts";
import { rigidModel } from "../../../src/dynamics/rigid/model.ts";
import { amplitude, displacement, loadAt, respond } from "../../../src/dynamics/rigid/response.ts";
import type { Isolator } from "../../../src/isolator/index.ts";
import { boxInertia, type Foot, type RigidBody } from "../../../src/machine/index.ts";
import { isolator, uprightFeet } from "../../selection/arbitrary.ts";
import { expectAllClose, expectClose } from "../../support/expect-close.ts";
import { BODY, fan, invariant, PLACES, rpm, SPRINGS } from "./fan.ts";

describe("a rigid body on its isolators", () => {
  const feet = uprightFeet(PLACES);
  const rest = equilibrium(BODY, feet, SPRINGS);
  const model = rigidModel(BODY, feet, SPRINGS, rest);

  test("is in balance at rest, to 1e-10 of its weight", () => {
    expect(rest.residual).toBeLessThan(1e-10);
    expectClose(
      rest.loads.reduce((s, w) => s + w, 0),
      850 * 9.80665,
      invariant,
    );
  });

  test("bears on each foot what the statics of the vertical model has, for springs as for curves", () => {
    const on = fan(BODY, feet);
    expectAllClose(rest.loads, footLoads(on, [80e3, 120e3, 80e3, 120e3]), invariant);
    const curved = SPRINGS.map((s, i) => ({
      ...s,
      axial: {
        kind: "curve" as const,
        points: [
          [0.01, 800],
          [0.03, 2000 + 400 * (i % 2)],
          [0.05, 5000],
        ] as const,
      },
    }));
    const curvedRest = equilibrium(BODY, feet, curved);
    expect(curvedRest.residual).toBeLessThan(1e-10);
    const { rigid: _, ...plan } = on;
    const vertical = analyse({ ...plan, rigid: null }, curved);
    expectAllClose(
      curvedRest.loads,
      vertical.feet.map((foot) => foot.load),
      { rtol: 1e-8, because: "two iterations that stop at 1e-12" },
    );
  });

  test("stands level on air springs, which share the weight as equal springs would", () => {
    const air = SPRINGS.map((s) => ({
      ...s,
      axial: { kind: "air" as const, naturalFrequencyHz: 1.8 },
      dynamicRatio: 1,
    }));
    const { levelness, tilt, feet: states } = analyse(fan(BODY, feet), air);
    expect([levelness, tilt]).toEqual([0, { x: 0, y: 0 }]);
    expectAllClose(
      states.map((foot) => foot.load),
      footLoads(fan(BODY, feet)),
      invariant,
    );
  });

  test("answers reciprocally: motion at B for a force at A is motion at A for that force at B", () => {
    const load = (at: number) => {
      const re = new Float64Array(6);
      re[at] = 1;
      return re;
    };
    for (const omega of [5, 19.7, 40, 124])
      for (const [a, b] of [
        [0, 4],
        [2, 3],
        [1, 5],
      ] as const) {
        const respondTo = (at: number) => {
          const l = loadAt(model, fan(BODY, feet, { excitations: [] }), 1, omega, 1);
          const re = load(at);
          // A load in physical coordinates, made normal by the factor of the mass matrix.
          for (let i = 0; i < 6; i++) {
            for (let k = 0; k < i; k++)
              re[i] = (re[i] as number) - (model.factor[6 * i + k] as number) * (re[k] as number);
            re[i] = (re[i] as number) / (model.factor[6 * i + i] as number);
          }
          return displacement(model, { ...l, re, im: new Float64Array(6) }, omega);
        };
        const ab = respondTo(a);
        const ba = respondTo(b);
        const scale = Math.hypot(...ab.re, ...ab.im);
        expectClose(ab.re[b] as number, ba.re[a] as number, {
          atol: 1e-11 * scale,
          because: "symmetry of the matrices",
        });
        expectClose(ab.im[b] as number, ba.im[a] as number, {
          atol: 1e-11 * scale,
          because: "symmetry of the matrices",
        });
      }
  });

  test("is six oscillators where nothing couples: each obeys the one-degree formula", () => {
    const central: RigidBody = { mass: 400, centreOfGravity: [0, 0, 0], inertia: boxInertia(400, 1, 1, 1) };
    const springs = PLACES.map(() =>
      isolator({
        axial: { kind: "linear", stiffness: 50e3 },
        lateralRatio: 0.5,
        damping: { kind: "structural", lossFactor: 0.1 },
      }),
    );
    const flat = uprightFeet(PLACES.map(([x, y]) => [x, y, 0]));
    const still = rigidModel(central, flat, springs, { loads: [1, 1, 1, 1], verticalForces: [0, 0, 0, 0] });
    for (const [direction, k] of [
      [[0, 0, 1], 200e3],
      [[1, 0, 0], 100e3],
      [[0, 1, 0], 100e3],
    ] as const)
      for (const omega of [10, 22, 60]) {
        const on = fan(central, flat, {
          excitations: [{ kind: "force", amplitude: 7, direction, order: 1, phase: 0, at: null }],
        });
        const load = loadAt(still, on, 1, omega, 1);
        const expected = 7 * transmissibilityOf(400, { k, c: 0, h: 0.1 * k }, omega);
        expectClose(respond(still, load, omega).footSum, expected, invariant);
        expectClose(respond(still, load, omega).net, expected, invariant);
      }
  });

  test("agrees with the vertical model for a central vertical force on equal feet", () => {
    const central: RigidBody = {
      ...BODY,
      centreOfGravity: [0, 0, 0.5],
      inertia: boxInertia(850, 1.4, 1, 0.9),
    };
    const equal = PLACES.map(() => SPRINGS[0] as Isolator);
    const on = fan(central, feet, { excitations: [], orders: [1] });
    const rigid = analyse(on, equal);
    const vertical = analyse({ ...on, rigid: null }, equal);
    expectClose(
      rigid.judged.transmissibility as number,
      vertical.judged.transmissibility as number,
      invariant,
    );
    expectClose(rigid.naturalFrequency as number, vertical.naturalFrequency as number, invariant);
    expectClose(rigid.staticDeflection, vertical.staticDeflection, invariant);
  });

  test("has its worst where a scan of 4000 speeds finds none worse", () => {
    const on = fan(BODY, feet, { speed: { min: rpm(60), max: rpm(1200) }, rotation: "right_handed" });
    const { worst, worstForce } = analyse(on, SPRINGS);
    let ratio = 0;
    let force = 0;
    for (const order of on.orders)
      for (let i = 0; i < 4000; i++) {
        const speed = rpm(60) * 20 ** (i / 3999);
        const load = loadAt(model, on, order, speed, 1);
        const { footSum } = respond(model, load, order * speed);
        ratio = Math.max(ratio, footSum / (load.applied as number));
        force = Math.max(force, footSum);
      }
    expect(worst?.transmissibility).toBeGreaterThanOrEqual(ratio * 0.999);
    expect(worstForce?.transmittedForce).toBeGreaterThanOrEqual(force * 0.999);
  });

  test("cannot be told a transmissibility where the forces cancel, but the force it transmits", () => {
    const couple = [0.3, -0.3].map((y, i) => ({
      kind: "force" as const,
      amplitude: 50,
      direction: [0, 0, 1] as const,
      order: 1,
      phase: i * Math.PI,
      at: [0, y, 0.5] as const,
    }));
    const { worst, worstForce, judged } = analyse(
      fan(BODY, feet, { excitations: couple, orders: [1] }),
      SPRINGS,
    );
    expect(worst).toBeNull();
    expect(judged.transmissibility).toBeNull();
    expect(worstForce?.transmissibility).toBeNull();
    expect(worstForce?.transmittedForce).toBeGreaterThan(0);
  });
});

test("isolators inclined by θ in pairs hold the vertical with k(cos²θ + λ·sin²θ) each, and bear loads along their axes", () => {
  const angle = Math.PI / 6;
  const body: RigidBody = { mass: 800, centreOfGravity: [0, 0, 0], inertia: boxInertia(800, 1.4, 1, 0.8) };
  const inclined = PLACES.map(
    ([x, y]): Foot => ({
      position: [x, y, 0],
      axis: [0, -Math.sign(y) * Math.sin(angle), Math.cos(angle)],
    }),
  );
  const springs = PLACES.map(() =>
    isolator({
      axial: { kind: "linear", stiffness: 90e3 },
      lateralRatio: 0.4,
      load: { min: 0, max: 5000, rated: 2500 },
    }),
  );
  const { modes, feet } = analyse(fan(body, inclined, { excitations: [], orders: [1] }), springs);
  const stiffness = 4 * 90e3 * (Math.cos(angle) ** 2 + 0.4 * Math.sin(angle) ** 2);
  const vertical = modes?.find(({ shape }) => shape === "vertical");
  expectClose(vertical?.omega as number, Math.sqrt(stiffness / 800), invariant);
  for (const { load, lateralLoad } of feet) {
    // Pressed down by d, a foot gives k·d·cosθ along its axis and λ·k·d·sinθ across it.
    const d = (800 * 9.80665) / stiffness;
    expectClose(load, 90e3 * d * Math.cos(angle), invariant);
    expectClose(lateralLoad as number, 0.4 * 90e3 * d * Math.sin(angle), invariant);
  }
});

test("far above resonance a rotor of 200 kg at G 6.3 on 800 kg moves it with 1.575 mm/s peak (ISO 21940-11; computed)", () => {
  const body: RigidBody = { mass: 800, centreOfGravity: [0, 0, 0.4], inertia: boxInertia(800, 1.4, 1, 0.8) };
  const soft = PLACES.map(() =>
    isolator({ axial: { kind: "linear", stiffness: 1e3 }, damping: { kind: "viscous", ratio: 0 } }),
  );
  const on = fan(body, uprightFeet(PLACES.map(([x, y]) => [x, y, 0.4])), {
    speed: { min: rpm(1500), max: rpm(1500) },
    orders: [1],
    excitations: [
      {
        kind: "unbalance",
        unbalance: { kind: "grade", rotorMass: 200, grade: 6.3e-3 },
        order: 1,
        phase: 0,
        at: null,
      },
    ],
  });
  expectClose((analyse(on, soft).worst?.machineVelocity as number) * Math.SQRT2, 1.575e-3, {
    rtol: 5e-4,
    because: "printed to four digits",
  });
});

describe("amplitude of a rotating vector", () => {
  test("is its modulus, and of an oscillating one its length", () => {
    expectClose(amplitude(0, 0, 3, 0, 0, -3), 3, invariant);
    expectClose(amplitude(1, 0, 2, 0, 2, 0), 3, invariant);
  });
});

test("extreme ratios give finite numbers or null, never NaN", () => {
  for (const [mass, stiffness] of [
    [0.001, 1e9],
    [1e7, 1],
  ] as const) {
    const body: RigidBody = { mass, centreOfGravity: [0, 0, 0.5], inertia: boxInertia(mass, 1, 1, 1) };
    const springs = PLACES.map(() => isolator({ axial: { kind: "linear", stiffness } }));
    const { modes, judged, staticDeflection } = analyse(fan(body, uprightFeet(PLACES)), springs);
    for (const value of [
      judged.transmissibility,
      judged.transmittedForce,
      staticDeflection,
      ...(modes ?? []).map((m) => m.omega),
    ])
      expect(value === null || Number.isFinite(value)).toBe(true);
  }
});
