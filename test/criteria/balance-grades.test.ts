import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { BALANCE_GRADES, parseGrade, permissibleUnbalance } from "../../src/criteria/index.ts";
import { expectClose } from "../support/expect-close.ts";

const rpm = (n: number): number => (n * 2 * Math.PI) / 60;

/** The grade as the rest of the program gets it, m/s. */
const gradeOf = (text: string): number => {
  const parsed = parseGrade(text);
  if (!parsed.ok) throw new Error(parsed.reason);
  return parsed.grade;
};

describe("the permissible residual unbalance of a balance grade", () => {
  const SPEEDS = [750, 1000, 1500, 3000, 6000] as const;
  /**
   * e_per in micrometres = g mm/kg, derived from e_per = 1000·G/Ω, the definition of the grades in ISO 21940-11
   * (before: ISO 1940-1), with an independent numerical library; printed to the digits shown.
   */
  const E_PER: readonly (readonly [grade: string, lastDigit: number, e: readonly number[]])[] = [
    ["G0.4", 1e-3, [5.093, 3.82, 2.546, 1.273, 0.637]],
    ["G1", 1e-3, [12.732, 9.549, 6.366, 3.183, 1.592]],
    ["G2.5", 1e-3, [31.831, 23.873, 15.915, 7.958, 3.979]],
    ["G6.3", 1e-3, [80.214, 60.161, 40.107, 20.054, 10.027]],
    ["G16", 1e-2, [203.72, 152.79, 101.86, 50.93, 25.46]],
    ["G40", 1e-2, [509.3, 381.97, 254.65, 127.32, 63.66]],
  ];
  test.each(E_PER)("of %s agrees with the table of e_per at five speeds", (grade, lastDigit, row) => {
    SPEEDS.forEach((speed, i) => {
      const micrometres = 1e6 * permissibleUnbalance(1, gradeOf(grade), rpm(speed));
      expectClose(micrometres, row[i] as number, {
        atol: 0.5001 * lastDigit,
        because: "half a unit in the last printed digit",
      });
    });
  });

  test("of a 3600 kg turbine rotor of G2.5 at 3000 rpm is 28.65e3 g mm, e_per 7.958 µm", () => {
    // Derived; that the annex of ISO 1940-1 has this rotor for its example is memory, of medium certainty.
    const unbalance = permissibleUnbalance(3600, gradeOf("G2.5"), rpm(3000));
    expectClose(1e6 * unbalance, 28.65e3, { atol: 5, because: "half a unit in the last printed digit" });
    expectClose((1e6 * unbalance) / 3600, 7.958, {
      atol: 5e-4,
      because: "half a unit in the last printed digit",
    });
  });

  test("of a 100 kg rotor of G6.3 at 1500 rpm shakes with 98.960 N, F = m·G·Ω", () => {
    // Derived from the definition of the grade in ISO 21940-11.
    const omega = rpm(1500);
    expectClose(permissibleUnbalance(100, gradeOf("G6.3"), omega) * omega ** 2, 98.96, {
      atol: 5e-4,
      because: "half a unit in the last printed digit",
    });
  });

  test("of a 200 kg rotor of G6.3 at 1500 rpm moves an 800 kg machine, far above resonance, by 10.03 µm", () => {
    // Derived: X = m·e/M as r grows, and velocity X·Ω = 1.575 mm/s peak.
    const travel = permissibleUnbalance(200, gradeOf("G6.3"), rpm(1500)) / 800;
    expectClose(1e6 * travel, 10.03, { atol: 5e-3, because: "half a unit in the last printed digit" });
    expectClose(1e3 * travel * rpm(1500), 1.575, { rtol: 1e-14, because: "G·m/M without rounding" });
  });

  test("is U = 9549·G·m/n in g mm, the form of practice, within its rounded constant", () => {
    // 9549 = 30 000/π rounded to four digits; common practice.
    const positive = (max: number) => fc.double({ min: 0.1, max, noNaN: true });
    fc.assert(
      fc.property(positive(1e5), positive(1e5), fc.constantFrom(...BALANCE_GRADES), (mass, n, { grade }) =>
        expectClose(1e6 * permissibleUnbalance(mass, grade / 1000, rpm(n)), (9549 * grade * mass) / n, {
          rtol: 4e-5,
          because: "30 000/π = 9549.297 against 9549",
        }),
      ),
    );
  });
});

describe("a balance grade as text", () => {
  test.each(["G6.3", "g6.3", "G 6.3", " G6.3 ", "6.3"])("%j is 6.3 mm/s", (text) => {
    expect(parseGrade(text)).toEqual({ ok: true, grade: 0.0063 });
  });

  test("is read for every grade of the table, with its G and without", () => {
    for (const { grade } of BALANCE_GRADES)
      for (const text of [`G${grade}`, `G ${grade}`, `${grade}`]) expect(gradeOf(text)).toBe(grade / 1000);
  });

  test.each(["G6", "G", "", "6.3 mm/s", "G6,3", "GG6.3", "-6.3", "NaN", "constructor", "__proto__"])(
    "%j is refused, and the reason lists the grades there are",
    (text) => {
      expect(parseGrade(text)).toEqual({
        ok: false,
        reason:
          `"${text}" is not a balance grade of ISO 21940-11; ` +
          "they are G4000, G1600, G630, G250, G100, G40, G16, G6.3, G2.5, G1, G0.4",
      });
    },
  );
});
