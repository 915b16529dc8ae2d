import fc from "fast-check";
import { describe, test } from "vitest";
import { analyse } from "../../../src/dynamics/index.ts";
import type { Isolator } from "../../../src/isolator/index.ts";
import type { Machine, Vec3 } from "../../../src/machine/index.ts";
import { uprightFeet } from "../../selection/arbitrary.ts";
import { expectAllClose } from "../../support/expect-close.ts";
import { BODY, fan, invariant, PLACES, SPRINGS } from "./fan.ts";

/** The numbers of an analysis that no choice of frame or numbering may change. */
function numbers(on: Machine, springs: readonly Isolator[]): number[] {
  const { modes, judged, worst, worstForce } = analyse(on, springs);
  return [
    ...(modes ?? []).flatMap(({ omega, dampingRatio }) => [omega, dampingRatio]),
    judged.transmissibility as number,
    judged.transmittedForce as number,
    worst?.netTransmissibility as number,
    worst?.machineVelocity as number,
    worstForce?.netForce as number,
  ];
}

describe("nothing changes", () => {
  const before = numbers(fan(BODY, uprightFeet(PLACES)), SPRINGS);

  test("when the origin moves", () => {
    fc.assert(
      fc.property(fc.tuple(...[0, 1, 2].map(() => fc.double({ min: -5, max: 5, noNaN: true }))), (by) => {
        const move = (p: Vec3): Vec3 => [
          p[0] + (by[0] as number),
          p[1] + (by[1] as number),
          p[2] + (by[2] as number),
        ];
        const on = fan(
          { ...BODY, centreOfGravity: move(BODY.centreOfGravity) },
          uprightFeet(PLACES.map(move)),
        );
        const excitations = on.excitations.map((e) => ({ ...e, at: e.at && move(e.at) }));
        expectAllClose(numbers({ ...on, excitations }, SPRINGS), before, invariant);
      }),
      { numRuns: 30 },
    );
  });

  test("when the frame turns a quarter about z, shaft and all", () => {
    const turn = ([x, y, z]: Vec3): Vec3 => [-y, x, z];
    const { xx, yy, zz, xy, xz, yz } = BODY.inertia;
    const inertia = { xx: yy, yy: xx, zz, xy: -xy, xz: -yz, yz: xz };
    const on = fan(
      { ...BODY, centreOfGravity: turn(BODY.centreOfGravity), inertia },
      uprightFeet(PLACES.map(turn)),
      { shaftAxis: "y" },
    );
    // A shaft along +y turns (0, 1, −j) into (−1, 0, −j): against the table's (−j, 0, 1) that is a phase of −90°.
    const excitations = on.excitations.map((e) => ({
      ...e,
      at: e.at && turn(e.at),
      phase: e.kind === "unbalance" ? e.phase - Math.PI / 2 : e.phase,
    }));
    expectAllClose(numbers({ ...on, excitations }, SPRINGS), before, invariant);
  });

  test("when the frame turns about z by any angle, forces and all", () => {
    const pushed = fan(BODY, uprightFeet(PLACES), {
      orders: [1],
      excitations: [
        { kind: "force", amplitude: 60, direction: [0.6, 0, 0.8], order: 1, phase: 0, at: [0.2, 0.1, 0.7] },
      ],
    });
    const still = numbers(pushed, SPRINGS);
    fc.assert(
      fc.property(fc.double({ min: 0, max: 6.28, noNaN: true }), (angle) => {
        const c = Math.cos(angle);
        const s = Math.sin(angle);
        const turn = ([x, y, z]: Vec3): Vec3 => [c * x - s * y, s * x + c * y, z];
        const { xx, yy, zz, xy, xz, yz } = BODY.inertia;
        const inertia = {
          xx: c * c * xx - 2 * s * c * xy + s * s * yy,
          yy: s * s * xx + 2 * s * c * xy + c * c * yy,
          zz,
          xy: s * c * (xx - yy) + (c * c - s * s) * xy,
          xz: c * xz - s * yz,
          yz: s * xz + c * yz,
        };
        const body = { ...BODY, inertia, centreOfGravity: turn(BODY.centreOfGravity) };
        const excitations = pushed.excitations.map((e) =>
          e.kind === "force" ? { ...e, direction: turn(e.direction), at: e.at && turn(e.at) } : e,
        );
        const on = fan(body, uprightFeet(PLACES.map(turn)), { orders: [1], excitations });
        expectAllClose(numbers(on, SPRINGS), still, invariant);
      }),
      { numRuns: 30 },
    );
  });

  test("when the feet are numbered otherwise", () => {
    const order = [2, 0, 3, 1];
    const on = fan(BODY, uprightFeet(order.map((i) => PLACES[i] as Vec3)));
    expectAllClose(
      numbers(
        on,
        order.map((i) => SPRINGS[i] as Isolator),
      ),
      before,
      invariant,
    );
  });

  test("when a foot is split into two of half the stiffness at its place", () => {
    const [first, ...rest] = SPRINGS as [Isolator, ...Isolator[]];
    const half: Isolator = { ...first, axial: { kind: "linear", stiffness: 40e3 } };
    const on = fan(BODY, uprightFeet([PLACES[0] as Vec3, ...PLACES]));
    expectAllClose(numbers(on, [half, half, ...rest]), before, invariant);
  });
});
