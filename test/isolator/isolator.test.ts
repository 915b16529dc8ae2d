import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  columnsOf,
  curveThrough,
  dashpot,
  dynamicRatioAt,
  dynamicStiffness,
  isolatorFromRecord,
  lossFactor,
  ratedNaturalFrequency,
  staticDeflection,
  staticStiffness,
} from "../../src/isolator/index.ts";
import { FREQUENCY_OF_DEFLECTION_IN, FREQUENCY_OF_DEFLECTION_MM } from "../references/transmissibility.ts";
import { isolator } from "../selection/arbitrary.ts";
import { expectClose } from "../support/expect-close.ts";

const G = 9.80665;
const rounding = { rtol: 1e-12, because: "closed form, rounding only" };

describe("natural frequency from static deflection, 15.76/√(d mm) (any handbook)", () => {
  test.each(FREQUENCY_OF_DEFLECTION_MM)("of %d mm is %d Hz", (mm, hertz) => {
    const spring = isolator({ axial: { kind: "linear", stiffness: 2500 / (mm / 1000) } });
    expectClose(ratedNaturalFrequency(spring), hertz, { atol: 5e-5, because: "printed to four decimals" });
  });

  test.each(FREQUENCY_OF_DEFLECTION_IN)("of %d in is %d Hz", (inches, hertz) => {
    const spring = isolator({ axial: { kind: "linear", stiffness: 2500 / (inches * 0.0254) } });
    expectClose(ratedNaturalFrequency(spring), hertz, { atol: 5e-5, because: "printed to four decimals" });
  });
});

describe("damping", () => {
  test("quoted at rated load is a dashpot c = 2ζ·√(k·W/g), the same at every load", () => {
    const mount = isolator({ damping: { kind: "viscous", ratio: 0.05 }, dynamicRatio: 1.4 });
    expectClose(dashpot(mount), 2 * 0.05 * Math.sqrt((1.4 * 100e3 * 2500) / G), rounding);
    expect(lossFactor(mount)).toBe(0);
  });

  test("given as a loss factor is no dashpot", () => {
    const mount = isolator({ damping: { kind: "structural", lossFactor: 0.12 } });
    expect(dashpot(mount)).toBe(0);
    expect(lossFactor(mount)).toBe(0.12);
  });
});

describe("an air spring", () => {
  const air = isolator({
    family: "air_spring",
    axial: { kind: "air", naturalFrequencyHz: 1.8 },
    damping: { kind: "viscous", ratio: 0.03 },
  });

  test("has a stiffness in proportion to its load, so that its natural frequency stays", () => {
    for (const load of [600, 1500, 2500]) {
      expectClose(Math.sqrt((staticStiffness(air, load) * G) / load) / (2 * Math.PI), 1.8, rounding);
      expectClose(staticDeflection(air, load), G / (2 * Math.PI * 1.8) ** 2, rounding);
    }
  });

  test("is rated dynamically: no ratio is applied, and c = 2ζ·W·ωn/g", () => {
    expect(dynamicStiffness(air, 1000, 20)).toBe(staticStiffness(air, 1000));
    expectClose(dashpot(air), (2 * 0.03 * 2500 * 2 * Math.PI * 1.8) / G, rounding);
  });
});

describe("a dynamic ratio against frequency", () => {
  const mount = isolator({
    dynamicRatio: [
      [5, 1.2],
      [50, 1.5],
    ],
  });

  test("is linear in the logarithm between its points and flat outside", () => {
    expect(dynamicRatioAt(mount, 1)).toBe(1.2);
    expect(dynamicRatioAt(mount, 5)).toBe(1.2);
    expectClose(dynamicRatioAt(mount, Math.sqrt(250)), 1.35, rounding);
    expect(dynamicRatioAt(mount, 50)).toBe(1.5);
    expect(dynamicRatioAt(mount, 500)).toBe(1.5);
  });

  test("makes the natural frequency implicit: it satisfies fn = √(κ(fn)·k·g/W)/2π", () => {
    const fn = ratedNaturalFrequency(mount);
    expectClose(fn, Math.sqrt((dynamicRatioAt(mount, fn) * 100e3 * G) / 2500) / (2 * Math.PI), rounding);
  });
});

describe("a load–deflection curve", () => {
  const table = [
    [0.002, 400],
    [0.005, 1400],
    [0.008, 3200],
  ] as const;
  const curve = curveThrough(table);

  test("goes through its points and the origin", () => {
    expect(curve.load(0)).toBe(0);
    for (const [deflection, load] of table) {
      expectClose(curve.load(deflection), load, rounding);
      expectClose(curve.deflection(load), deflection, rounding);
    }
  });

  test("goes straight on beyond its last point with the end slope", () => {
    const slope = curve.tangent(0.008);
    expectClose(curve.load(0.01), 3200 + 0.002 * slope, rounding);
    expectClose(curve.deflection(3200 + 0.002 * slope), 0.01, rounding);
  });

  test("has the slopes of Fritsch and Butland: the weighted harmonic mean of the neighbouring secants", () => {
    // Secants 200, 333.3 and 600 N/mm over 2, 3 and 3 mm.
    const harmonic = (h0: number, h1: number, s0: number, s1: number): number =>
      (3 * (h0 + h1)) / ((2 * h1 + h0) / s0 + (h1 + 2 * h0) / s1);
    expectClose(curve.tangent(0.002), harmonic(2, 3, 200e3, 1000e3 / 3), rounding);
    expectClose(curve.tangent(0.005), harmonic(3, 3, 1000e3 / 3, 600e3), rounding);
  });

  test("through points on a line is that line", () => {
    const line = curveThrough([
      [0.01, 1000],
      [0.02, 2000],
      [0.05, 5000],
    ]);
    for (const d of [0.003, 0.017, 0.04, 0.06]) {
      expectClose(line.load(d), d * 1e5, rounding);
      expectClose(line.tangent(d), 1e5, rounding);
    }
  });

  test("rises wherever its points rise, and is its own inverse", () => {
    const step = fc.tuple(
      fc.double({ min: 0.1, max: 10, noNaN: true }),
      fc.double({ min: 1, max: 1000, noNaN: true }),
    );
    fc.assert(
      fc.property(fc.array(step, { minLength: 2, maxLength: 8 }), (steps) => {
        let x = 0;
        let y = 0;
        const points = steps.map(([dx, dy]) => {
          x += dx;
          y += dy;
          return [x, y] as const;
        });
        const through = curveThrough(points);
        let before = 0;
        for (let i = 0; i <= 200; i++) {
          const d = (x * i) / 180;
          const load = through.load(d);
          // A curve that ends flat is flat to rounding.
          expect(load).toBeGreaterThanOrEqual(before * (1 - 1e-14));
          before = load;
          if (i > 0 && i <= 180)
            expectClose(through.load(through.deflection(load)), load, {
              rtol: 1e-11,
              because: "the inverse stops at 1e-13",
            });
        }
      }),
    );
  });

  test("makes an isolator as stiff as its tangent at the working load", () => {
    const mount = isolator({ axial: { kind: "curve", points: table } });
    expectClose(staticDeflection(mount, 1400), 0.005, rounding);
    expectClose(staticStiffness(mount, 1400), curve.tangent(0.005), rounding);
  });
});

describe("columns", () => {
  test("are sorted by maximum load and tell the smallest minimum load from each row on", () => {
    const list = [
      isolator({ designation: "c", load: { min: 100, max: 3000, rated: 3000 } }),
      isolator({ designation: "b", load: { min: 300, max: 1000, rated: 1000 } }),
      isolator({ designation: "a", load: { min: 400, max: 1000, rated: 900 } }),
    ];
    const columns = columnsOf(list);
    expect(columns.isolators.map((i) => i.designation)).toEqual(["a", "b", "c"]);
    expect([...columns.minLoadFrom]).toEqual([100, 100, 100]);
    expect([...columns.maxLoad]).toEqual([1000, 1000, 3000]);
  });
});

test("a record becomes an isolator in SI units, with the defaults of its form", () => {
  const made = isolatorFromRecord({
    designation: "x",
    family: "elastomer_mount",
    axial: {
      curve: [
        [0, 0],
        [2, 400],
      ],
    },
    damping: { loss_factor: 0.12 },
    load_n: { max: 400 },
    temperature_c: { min: 0, max: 100 },
    free_height_mm: 135,
  });
  expect(made).toMatchObject({
    axial: {
      kind: "curve",
      points: [
        [0, 0],
        [0.002, 400],
      ],
    },
    load: { min: 0, max: 400, rated: 400 },
    dynamicRatio: 1,
    lateralRatio: 1,
    temperature: { min: 273.15, max: 373.15 },
    freeHeight: 0.135,
    travel: null,
    tolerance: null,
    captive: false,
    resists: [],
    price: null,
  });
});
