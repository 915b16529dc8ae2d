import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  boxInertia,
  combine,
  principalMoments,
  type RigidBody,
  requirePossibleInertia,
  slabMass,
} from "../../src/machine/index.ts";
import { expectAllClose, expectClose } from "../support/expect-close.ts";

const rounding = { rtol: 1e-12, because: "closed form, rounding only" };

describe("inertia", () => {
  test("of the benchmark box, 1000 kg and 1.2 × 0.8 × 1.0 m, is m(w²+h²)/12 and so on (any text on mechanics)", () => {
    const { xx, yy, zz } = boxInertia(1000, 1.2, 0.8, 1.0);
    expectClose(xx, 136.6667, { atol: 5e-5, because: "printed to four decimals" });
    expectClose(yy, 203.3333, { atol: 5e-5, because: "printed to four decimals" });
    expectClose(zz, 173.3333, { atol: 5e-5, because: "printed to four decimals" });
  });

  test("of a box cut in two and put together again is that of the box (parallel-axis theorem)", () => {
    const half = (y: number): RigidBody => ({
      mass: 500,
      centreOfGravity: [0.3, y, 0.1],
      inertia: boxInertia(500, 1.2, 0.4, 1.0),
    });
    const whole = combine([half(-0.2 + 0.05), half(0.2 + 0.05)]);
    const expected = boxInertia(1000, 1.2, 0.8, 1.0);
    expect(whole.mass).toBe(1000);
    expectAllClose(whole.centreOfGravity, [0.3, 0.05, 0.1], { atol: 1e-15, because: "rounding" });
    for (const key of ["xx", "yy", "zz"] as const) expectClose(whole.inertia[key], expected[key], rounding);
    for (const key of ["xy", "xz", "yz"] as const)
      expectClose(whole.inertia[key], 0, { atol: 1e-12, because: "symmetry" });
  });

  test("of two points carries the products of inertia with their sign, xy = −∫xy dm", () => {
    const none = { xx: 0, yy: 0, zz: 0, xy: 0, xz: 0, yz: 0 };
    const point = (x: number, y: number): RigidBody => ({
      mass: 2,
      centreOfGravity: [x, y, 0],
      inertia: none,
    });
    expect(combine([point(1, 1), point(-1, -1)]).inertia).toMatchObject({ xx: 4, yy: 4, zz: 8, xy: -4 });
  });

  test("has the principal moments that turned axes leave unchanged", () => {
    const moment = fc.double({ min: 0.1, max: 100, noNaN: true });
    fc.assert(
      fc.property(moment, moment, moment, fc.double({ min: 0, max: 6.28, noNaN: true }), (a, b, c, angle) => {
        const cos = Math.cos(angle);
        const sin = Math.sin(angle);
        const turned = {
          xx: a * cos * cos + b * sin * sin,
          yy: a * sin * sin + b * cos * cos,
          zz: c,
          xy: (a - b) * sin * cos,
          xz: 0,
          yz: 0,
        };
        const expected = [a, b, c].sort((p, q) => p - q);
        expectAllClose(principalMoments(turned), expected, {
          atol: 3e-8 * Math.max(a, b, c),
          because: "an arc cosine near its ends keeps half the digits: the root of 2.2e-16 of the spread",
        });
      }),
    );
  });
});

describe("an inertia that no body can have", () => {
  const possible = { xx: 3, yy: 4, zz: 5, xy: 0, xz: 0, yz: 0 };

  test("is refused where its moments break the triangle inequality, a flat plate still passing", () => {
    expect(() => requirePossibleInertia({ ...possible, zz: 7 }, "/inertia")).not.toThrow();
    expect(() => requirePossibleInertia({ ...possible, zz: 7.01 }, "/inertia")).toThrow(
      "/inertia: no body has this inertia",
    );
  });

  test("is refused where it is not positive definite", () => {
    expect(() => requirePossibleInertia({ ...possible, xy: 3.6 }, "/inertia")).toThrow("not all above zero");
  });
});

test("a concrete slab weighs 2400 kg/m³ (common practice) unless its mass is stated", () => {
  const slab = { length: 2.2, width: 1.4, thickness: 0.2, material: "concrete", mass: null } as const;
  expectClose(slabMass(slab), 1478.4, rounding);
  expect(slabMass({ ...slab, mass: 900 })).toBe(900);
});
