import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { permissibleUnbalance } from "../../src/criteria/index.ts";
import { transmissibilityOf, worstOver } from "../../src/dynamics/index.ts";
import {
  RATIOS,
  STRUCTURAL_RATIOS,
  STRUCTURAL_TABLE,
  VISCOUS_PEAKS,
  VISCOUS_TABLE,
} from "../references/transmissibility.ts";
import { expectClose } from "../support/expect-close.ts";

const rpm = (n: number): number => (n * 2 * Math.PI) / 60;

/** A unit mass on a unit spring: ω is then the frequency ratio, c = 2ζ. */
const viscous = (zeta: number, r: number): number => transmissibilityOf(1, { k: 1, c: 2 * zeta, h: 0 }, r);
const structural = (eta: number, r: number): number => transmissibilityOf(1, { k: 1, c: 0, h: eta }, r);

describe("transmissibility of one degree of freedom", () => {
  for (const [zeta, ...row] of VISCOUS_TABLE)
    test(`agrees with the table of T(r, ζ) at ζ = ${zeta}`, () => {
      RATIOS.forEach((r, i) => {
        const expected = row[i] as number;
        if (r === 1 && zeta === 0) expect(viscous(zeta, r)).toBe(Number.POSITIVE_INFINITY);
        else
          expectClose(viscous(zeta, r), expected, {
            atol: expected >= 10 ? 5e-5 : 5e-6,
            because: "half a unit in the last printed digit",
          });
      });
    });

  for (const [eta, ...row] of STRUCTURAL_TABLE)
    test(`agrees with the table of T(r, η) at η = ${eta}`, () => {
      STRUCTURAL_RATIOS.forEach((r, i) => {
        const expected = row[i] as number;
        expectClose(structural(eta, r), expected, {
          atol: expected >= 10 ? 5e-5 : 5e-6,
          because: "half a unit in the last printed digit",
        });
      });
    });

  test("is 1 at √2 times the natural frequency, whatever the damping", () => {
    for (const damping of [0, 0.01, 0.1, 0.5, 1, 3]) {
      expectClose(viscous(damping, Math.SQRT2), 1, {
        rtol: 1e-14,
        because: "an identity but for rounding of √2",
      });
      expectClose(structural(damping, Math.SQRT2), 1, {
        rtol: 1e-14,
        because: "an identity but for rounding of √2",
      });
    }
  });

  test("never falls as a mount is made stiffer, above resonance and with equal damping", () => {
    const positive = (min: number, max: number) => fc.double({ min, max, noNaN: true });
    fc.assert(
      fc.property(
        positive(0.01, 0.45),
        positive(1, 1.1),
        positive(0, 1),
        positive(0, 0.5),
        (k, times, zeta, eta) => {
          // A unit mass at ω = 1: k under a half is more than √2 above resonance, before and after stiffening.
          const at = (stiffness: number): number =>
            transmissibilityOf(
              1,
              { k: stiffness, c: 2 * zeta * Math.sqrt(stiffness), h: eta * stiffness },
              1,
            );
          expect(at(k * times)).toBeGreaterThanOrEqual(at(k) * (1 - 1e-12));
        },
      ),
    );
  });

  test("isolates with structural damping better than with the same damping at resonance made viscous", () => {
    // At r = 10, ζ = 0.1 gives 0.02258 and η = 0.2 only 0.01030: both tables above.
    expect(structural(0.2, 10)).toBeLessThan(viscous(0.1, 10) / 2);
  });
});

describe("the worst over a range", () => {
  for (const { zeta, ratio, peak } of VISCOUS_PEAKS)
    test(`finds the published peak at ζ = ${zeta}`, () => {
      const found = worstOver((r) => viscous(zeta, r), 0.1, 5, [1]);
      expectClose(found.value, peak, { rtol: 1e-5, because: "printed to six figures" });
      expectClose(found.at, ratio, {
        rtol: 1e-3,
        because: "the peak is flat: its place is known to the root of its height",
      });
    });

  test("is the value itself when the range is one point", () => {
    expect(worstOver((r) => r * r, 3, 3, [])).toEqual({ at: 3, value: 9 });
  });

  test("is at an end when nothing resonates inside", () => {
    expect(worstOver((r) => viscous(0.05, r), 2, 5, [1]).at).toBe(2);
    expect(worstOver((r) => r, 2, 5, []).at).toBe(5);
  });

  test("misses no peak that a scan of 4000 points finds, for two overlapping resonances", () => {
    for (const split of [1.02, 1.1, 1.5, 3]) {
      for (const zeta of [0.002, 0.02, 0.2]) {
        const f = (w: number): number => viscous(zeta, w) + 0.6 * viscous(zeta, w / split);
        const scanned = Math.max(...Array.from({ length: 4000 }, (_, i) => f(0.5 * 8 ** (i / 3999))));
        expect(worstOver(f, 0.5, 4, [1, split]).value).toBeGreaterThanOrEqual(scanned * 0.999);
      }
    }
  });
});

describe("worked examples from textbooks", () => {
  /** Half a unit in the last digit the book prints. */
  const printed = (atol: number) => ({ atol, because: "half a unit in the last printed digit" });

  test("Grover, Mechanical Vibrations, ex. 4.10.1: 1000 kg, 490 N at 180 rpm on two undamped springs", () => {
    const omega = rpm(180);
    expectClose(490 * transmissibilityOf(1000, { k: 1.96e6, c: 0, h: 0 }, omega), 598.49, printed(0.05));
    expectClose(490 * transmissibilityOf(1000, { k: 9.8e4, c: 0, h: 0 }, omega), 186.63, printed(0.05));
  });

  test("Grover, Mechanical Vibrations, ex. 4.10.2: reciprocating 2 kg on 75 kg at 3000 rpm", () => {
    const k = 11.76e5;
    const c = 2 * 0.2 * Math.sqrt(k * 75);
    const force = 2 * 0.04 * rpm(3000) ** 2;
    expectClose(force, 7895.68, printed(0.005));
    expectClose(force * transmissibilityOf(75, { k, c, h: 0 }, rpm(3000)), 2075.84, printed(0.005));
  });

  test("Grover, Mechanical Vibrations, ex. 4.10.3: a radio on four isolators over a moving base", () => {
    const stiffness = { k: 4 * 31.4e3, c: 4 * 392, h: 0 };
    // X = T·Y for a base displacement of 0.05 mm; the book prints 6.922e-5 m.
    expectClose(0.05e-3 * transmissibilityOf(20, stiffness, rpm(500)), 6.922e-5, printed(0.0005e-5));
  });

  test("Grover, Mechanical Vibrations, ex. 4.4.2: support moving 5 mm at 1150 cycles a minute", () => {
    const k = 1960;
    const c = 2 * 0.2 * Math.sqrt(k * 0.9);
    expectClose(5 * transmissibilityOf(0.9, { k, c: 0, h: 0 }, rpm(1150)), 0.8835, printed(0.00005));
    expectClose(5 * transmissibilityOf(0.9, { k, c, h: 0 }, rpm(1150)), 1.2491, printed(0.00005));
  });

  test("Thomson, Theory of Vibration, vibration isolation: 100 kg, 350 N at 3000 rpm (answer recalled, recomputed)", () => {
    const k = 700e3;
    const c = 2 * 0.2 * Math.sqrt(k * 100);
    expectClose(transmissibilityOf(100, { k, c, h: 0 }, rpm(3000)), 0.136851, printed(5e-7));
    expectClose(350 * transmissibilityOf(100, { k, c, h: 0 }, rpm(3000)), 47.898, printed(0.0005));
  });

  test("Rao, Mechanical Vibrations, vehicle on a rough road (answer recalled, recomputed)", () => {
    const k = 400e3;
    const c = 2 * 0.5 * Math.sqrt(k * 1200);
    expectClose(transmissibilityOf(1200, { k, c, h: 0 }, 5.81778), 1.10096, printed(5e-6));
  });

  test("Rao, Mechanical Vibrations, springs under an exhaust fan: 10 % at 1000 rpm (answer recalled, recomputed)", () => {
    expectClose(transmissibilityOf(40, { k: 4 * 9969.3, c: 0, h: 0 }, rpm(1000)), 0.1, {
      rtol: 2e-5,
      because: "the stiffness is printed to five figures",
    });
  });

  test("Rao, Mechanical Vibrations, undamped isolator for 5 % at 120 rad/s (answer recalled, recomputed)", () => {
    expectClose(transmissibilityOf(50, { k: 34285.7, c: 0, h: 0 }, 120), 0.05, {
      rtol: 1e-5,
      because: "the stiffness is printed to six figures",
    });
  });

  test("Inman, Engineering Vibration, isolating a control module (answer recalled, recomputed)", () => {
    const k = 3 * (35 / Math.sqrt(3)) ** 2;
    const c = 2 * 0.02 * Math.sqrt(k * 3);
    expectClose(transmissibilityOf(3, { k, c, h: 0 }, 35), 0.5009, printed(5e-6));
  });

  test("force of a permitted residual: 100 kg at G 6.3 and 1500 rpm is 98.960 N (F = m·G·Ω, ISO 21940-11)", () => {
    const omega = rpm(1500);
    expectClose(permissibleUnbalance(100, 6.3e-3, omega) * omega ** 2, 98.96, printed(0.0005));
  });
});
