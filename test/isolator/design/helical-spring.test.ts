import { describe, expect, test } from "vitest";
import {
  activeMass,
  bucklingDeflection,
  lateralRatio,
  SPRING_STEEL,
  springRate,
  springStress,
  surgeFrequency,
  wahlFactor,
} from "../../../src/isolator/design/index.ts";
import { expectClose } from "../../support/expect-close.ts";

/** The moduli that the tables of EN 13906-1 ratios below were computed with. */
const EN = { ...SPRING_STEEL, shearModulus: 79.5e9 };
const printed = (atol: number) => ({ atol, because: "half a unit in the last printed digit" });

describe("a helical spring", () => {
  test("has the rate of Shigley's first spring example: 0.037 in wire, 0.400 in coil, 10.5 coils (recalled, recomputed)", () => {
    const spring = { wire: 0.037 * 0.0254, coil: 0.4 * 0.0254, active: 10.5 };
    const rate = springRate(spring, { ...SPRING_STEEL, shearModulus: 11.85e6 * 6894.757293168361 });
    expectClose((rate * 0.0254) / 4.4482216152605, 4.1311, printed(5e-5));
  });

  test("of 12 mm wire and 80 mm coil has the rate, stress, mass and surge computed from the textbook formulas", () => {
    const spring = { wire: 0.012, coil: 0.08, active: 6 };
    expectClose(springRate(spring, SPRING_STEEL), 66_909, printed(0.5));
    expectClose(activeMass(spring, SPRING_STEEL), 1.33879, printed(5e-6));
    expectClose(surgeFrequency(spring, SPRING_STEEL), 111.778, printed(5e-4));
    expectClose(wahlFactor(80 / 12), 1.2246, printed(5e-6));
    expectClose(springStress(spring, 1672.73) / 1e6, 241.5, {
      atol: 0.01,
      because: "the check value was multiplied from rounded factors",
    });
  });

  test("of 16 mm wire and 120 mm coil likewise", () => {
    const spring = { wire: 0.016, coil: 0.12, active: 5 };
    expectClose(springRate(spring, SPRING_STEEL), 75_188, printed(0.5));
    expectClose(surgeFrequency(spring, SPRING_STEEL), 79.487, printed(5e-4));
    expectClose(springStress(spring, 0.025 * 75_188) / 1e6, 167.91, printed(0.005));
  });

  test.each([
    [1.0, 1.4965, 1.5266, 1.5918, 1.6635, 1.7418],
    [1.25, 1.2028, 1.2274, 1.2834, 1.3491, 1.4259],
    [1.5, 0.9659, 0.9817, 1.0199, 1.0688, 1.1308],
    [2.0, 0.6338, 0.6303, 0.6262, 0.628, 0.6389],
    [3.0, 0.2994, 0.2679, 0.1972, 0.1143, 0.0166],
  ])("of slenderness %d has the lateral ratios of EN 13906-1 (recomputed)", (slenderness, ...ratios) => {
    [0.05, 0.1, 0.2, 0.3, 0.4].forEach((deflection, i) => {
      expectClose(lateralRatio(slenderness, deflection, EN), ratios[i] as number, printed(5e-5));
    });
  });

  test.each([
    [1, 3, 0.41544],
    [1, 4, 0.19819],
    [1, 6, 0.08144],
    [0.5, 6, 0.41544],
    [0.5, 8, 0.19819],
    [2, 2, 0.19819],
    [2, 4, 0.04475],
  ])(
    "seated with ν = %d and slenderness %d buckles where EN 13906-1 says (recomputed)",
    (seating, slenderness, ratio) => {
      expectClose(bucklingDeflection(slenderness, seating, EN) as number, ratio, printed(5e-6));
    },
  );

  test("of slenderness 5 between fixed parallel ends cannot buckle (EN 13906-1)", () => {
    expect(bucklingDeflection(5, 0.5, EN)).toBeNull();
  });
});
