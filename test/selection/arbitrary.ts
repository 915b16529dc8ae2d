import fc from "fast-check";
import type { Isolator } from "../../src/isolator/index.ts";
import type { Foot, Machine, Vec3 } from "../../src/machine/index.ts";
import type { SelectionRequest } from "../../src/selection/index.ts";

/** An isolator of plain properties; what a test is about it overrides. */
export function isolator(overrides: Partial<Isolator> = {}): Isolator {
  return {
    designation: "spring",
    series: null,
    family: "open_spring",
    axial: { kind: "linear", stiffness: 100e3 },
    dynamicRatio: 1,
    damping: { kind: "viscous", ratio: 0.01 },
    lateralRatio: 1,
    load: { min: 500, max: 2500, rated: 2500 },
    travel: null,
    tolerance: null,
    temperature: null,
    resists: [],
    captive: false,
    freeHeight: 0.12,
    outsideDiameter: null,
    footprint: null,
    thread: null,
    mass: null,
    price: 50,
    currency: "EUR",
    leadTimeDays: 10,
    source: null,
    ...overrides,
  };
}

/** Feet with upright isolators. */
export function uprightFeet(positions: readonly Vec3[]): readonly Foot[] {
  return positions.map((position) => ({ position, axis: [0, 0, 1] }));
}

export function machine(overrides: Partial<Machine> = {}): Machine {
  const speed = (1180 * 2 * Math.PI) / 60;
  return {
    mass: 850,
    footCount: 4,
    feet: null,
    centreOfGravity: null,
    rigid: null,
    excitationPoint: null,
    points: [],
    speed: { min: speed, max: speed },
    orders: [1],
    excitations: [],
    shaftAxis: "x",
    rotation: "either",
    ...overrides,
  };
}

export function request(overrides: Partial<SelectionRequest> = {}): SelectionRequest {
  return {
    machine: machine(),
    mounting: "floor",
    environment: { temperature: null, exposures: [], captive: false },
    target: { transmissibility: 0.08, transmittedForce: null, judgedOn: "foot_sum" },
    limits: {
      families: null,
      price: null,
      currency: null,
      freeHeight: null,
      staticDeflection: null,
      leadTimeDays: null,
      levelness: null,
      ratingsPerArrangement: 2,
    },
    rankBy: null,
    ...overrides,
  };
}

/** Isolators of both kinds of damping, some of them air springs, rated so that a fair share fits the machine. */
const arbitraryIsolator: fc.Arbitrary<Omit<Isolator, "designation">> = fc
  .record({
    rated: fc.double({ min: 500, max: 8000, noNaN: true }),
    minShare: fc.double({ min: 0, max: 0.9, noNaN: true }),
    deflection: fc.double({ min: 0.001, max: 0.06, noNaN: true }),
    air: fc.boolean(),
    damping: fc.oneof(
      fc.record({
        kind: fc.constant("viscous" as const),
        ratio: fc.double({ min: 0, max: 0.3, noNaN: true }),
      }),
      fc.record({
        kind: fc.constant("structural" as const),
        lossFactor: fc.double({ min: 0, max: 0.4, noNaN: true }),
      }),
    ),
    dynamicRatio: fc.double({ min: 1, max: 2, noNaN: true }),
    price: fc.option(fc.integer({ min: 5, max: 500 })),
    series: fc.option(fc.constantFrom("A", "B", "C")),
  })
  .map(({ rated, minShare, deflection, air, damping, dynamicRatio, price, series }) =>
    isolator({
      family: air ? "air_spring" : "open_spring",
      axial: air
        ? { kind: "air", naturalFrequencyHz: 1 + 50 * deflection }
        : { kind: "linear", stiffness: rated / deflection },
      dynamicRatio: air ? 1 : dynamicRatio,
      damping,
      load: { min: minShare * rated, max: rated, rated },
      price,
      currency: price === null ? null : "EUR",
      series,
    }),
  );

/** A small catalogue with designations of its own. */
export const arbitraryCatalogue = fc
  .array(arbitraryIsolator, { minLength: 1, maxLength: 40 })
  .map((list) =>
    list.map((entry, i): Isolator => ({ ...entry, designation: `i${String(i).padStart(2, "0")}` })),
  );

export const arbitraryMachine = fc
  .record({
    mass: fc.double({ min: 200, max: 3000, noNaN: true }),
    rpm: fc.double({ min: 300, max: 3600, noNaN: true }),
    footCount: fc.constantFrom(3, 4, 6, 8),
    orders: fc.subarray([0.5, 1, 2, 3.5], { minLength: 1 }),
  })
  .map(({ mass, rpm, footCount, orders }) => {
    const speed = (rpm * 2 * Math.PI) / 60;
    return machine({ mass, footCount, orders, speed: { min: speed, max: speed } });
  });
