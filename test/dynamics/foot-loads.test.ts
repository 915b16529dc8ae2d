import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { footLoads } from "../../src/dynamics/index.ts";
import { machine, uprightFeet } from "../selection/arbitrary.ts";
import { expectAllClose, expectClose } from "../support/expect-close.ts";

const W = 850 * 9.80665;
const rectangle = [
  [-0.6, -0.4, 0],
  [0.6, -0.4, 0],
  [-0.6, 0.4, 0],
  [0.6, 0.4, 0],
] as const;
const rounding = { rtol: 1e-12, because: "closed form, rounding only" };

describe("foot loads", () => {
  test("are equal when only the number of feet is known", () => {
    expect(footLoads(machine({ footCount: 6 }))).toEqual(new Array(6).fill(W / 6));
  });

  test("are equal above the centroid of any feet on equal springs", () => {
    const loads = footLoads(machine({ feet: uprightFeet(rectangle) }));
    for (const load of loads) expectClose(load, W / 4, rounding);
  });

  test("on a rectangle follow W/4·(1 ± x/a ± y/b) (statics, common practice)", () => {
    const loads = footLoads(
      machine({ feet: uprightFeet(rectangle), centreOfGravity: { x: 0.15, y: -0.08 } }),
    );
    const expected = [-1, 1].flatMap((sy) =>
      [-1, 1].map((sx) => (W / 4) * (1 + (sx * 0.15) / 0.6 - (sy * 0.08) / 0.4)),
    );
    expectAllClose(loads, expected, rounding);
  });

  test("on three feet balance forces and moments, whatever the springs", () => {
    const feet = [
      [-0.5, -0.3, 0],
      [-0.5, 0.3, 0],
      [0.7, 0, 0],
    ] as const;
    const on = machine({ feet: uprightFeet(feet), footCount: 3, centreOfGravity: { x: 0.1, y: 0.05 } });
    const [a, b, c] = footLoads(on) as [number, number, number];
    // Moments about the line of the two rear feet, then about the x axis.
    expectClose(c, (W * 0.6) / 1.2, rounding);
    expectClose((b - a) * 0.3, W * 0.05, rounding);
    expectAllClose(footLoads(on, [1, 5, 20]), [a, b, c], rounding);
  });

  test("balance the weight and its moments on any feet and springs", () => {
    const coordinate = fc.double({ min: -2, max: 2, noNaN: true });
    fc.assert(
      fc.property(
        fc.array(fc.tuple(coordinate, coordinate, fc.double({ min: 0.1, max: 10, noNaN: true })), {
          minLength: 4,
          maxLength: 9,
        }),
        fc.array(fc.double({ min: 0.05, max: 1, noNaN: true }), { minLength: 9, maxLength: 9 }),
        (points, weights) => {
          const feet = points.map(([x, y]) => [x, y, 0] as const);
          const spread = feet.some((p) =>
            feet.some((q) =>
              feet.some((r) => Math.abs((q[0] - p[0]) * (r[1] - p[1]) - (q[1] - p[1]) * (r[0] - p[0])) > 0.1),
            ),
          );
          fc.pre(spread);
          const total = feet.reduce((s, _, i) => s + (weights[i] as number), 0);
          // A weighted mean of the feet lies within their outline.
          const x = feet.reduce((s, p, i) => s + (weights[i] as number) * p[0], 0) / total;
          const y = feet.reduce((s, p, i) => s + (weights[i] as number) * p[1], 0) / total;
          const on = machine({ feet: uprightFeet(feet), footCount: feet.length, centreOfGravity: { x, y } });
          const loads = footLoads(
            on,
            points.map((p) => p[2]),
          );
          const sum = (f: (i: number) => number): number => loads.reduce((s, load, i) => s + load * f(i), 0);
          const scale = { atol: 1e-8 * W, because: "conditioning of feet almost on one line" };
          expectClose(
            sum(() => 1),
            W,
            scale,
          );
          expectClose(
            sum((i) => (feet[i]?.[0] ?? 0) - x),
            0,
            scale,
          );
          expectClose(
            sum((i) => (feet[i]?.[1] ?? 0) - y),
            0,
            scale,
          );
        },
      ),
    );
  });

  test("refuse a centre of gravity outside the outline of the feet, by name", () => {
    const on = machine({ feet: uprightFeet(rectangle), centreOfGravity: { x: 0.61, y: 0 } });
    expect(() => footLoads(on)).toThrow("/centre_of_gravity: lies outside the outline of the feet");
  });
});
