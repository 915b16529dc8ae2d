import { EigenvalueDecomposition, Matrix } from "ml-matrix";
import { describe, expect, test } from "vitest";
import { type RigidModel, rigidModel } from "../../../src/dynamics/rigid/model.ts";
import { modesOf } from "../../../src/dynamics/rigid/modes.ts";
import type { Isolator } from "../../../src/isolator/index.ts";
import { boxInertia, type RigidBody } from "../../../src/machine/index.ts";
import {
  AVIONICS,
  BENCHMARK_BOX,
  BENCHMARKS,
  BOUNCE_AND_PITCH,
  COUPLED_ROOTS,
} from "../../references/rigid-body.ts";
import { isolator, uprightFeet } from "../../selection/arbitrary.ts";
import { expectAllClose, expectClose } from "../../support/expect-close.ts";

/** A spring of lateral and axial stiffness, N/m. */
const spring = (lateral: number, axial: number): Isolator =>
  isolator({ axial: { kind: "linear", stiffness: axial }, lateralRatio: lateral / axial });

/** A body without gravity's part, as the publications have it: its feet bear no weight. */
function weightless(
  body: RigidBody,
  places: readonly (readonly [number, number, number])[],
  springs: readonly Isolator[],
): RigidModel {
  const none = places.map(() => 0);
  return rigidModel(body, uprightFeet(places), springs, { loads: none, verticalForces: none });
}

function hertz(model: RigidModel): number[] {
  return (modesOf(model) ?? []).map(({ omega }) => omega / (2 * Math.PI));
}

describe("six modes", () => {
  const { mass, length, width, height } = BENCHMARK_BOX;
  for (const { name, feet, xz, hertz: expected } of BENCHMARKS)
    test(`of benchmark ${name} (eigenvalues computed with an independent library)`, () => {
      const body = {
        mass,
        centreOfGravity: [0, 0, 0],
        inertia: { ...boxInertia(mass, length, width, height), xz },
      } as const;
      const model = weightless(
        body,
        feet.map(([x, y, z]) => [x, y, z]),
        feet.map(([, , , l, a]) => spring(l * 1e3, a * 1e3)),
      );
      expectAllClose(hertz(model), expected, { atol: 5e-5, because: "printed to four decimals" });
    });

  test("of an avionics component on four mounts on one side are those published by T. Irvine", () => {
    const pound = 0.45359237;
    const inch = 0.0254;
    const { massLb, inertiaLbIn2: j, stiffnessLbfPerIn, feetIn } = AVIONICS;
    const inertia = {
      xx: j.xx * pound * inch ** 2,
      yy: j.yy * pound * inch ** 2,
      zz: j.zz * pound * inch ** 2,
      xy: 0,
      xz: 0,
      yz: 0,
    };
    // The tutorial has 386 in/s², which sets the pound-force.
    const k = (stiffnessLbfPerIn * pound * 386 * inch) / inch;
    const places = feetIn.map(([x, y, z]) => [x * inch, y * inch, z * inch] as const);
    const model = weightless(
      { mass: massLb * pound, centreOfGravity: [0, 0, 0], inertia },
      places,
      places.map(() => spring(k, k)),
    );
    for (const [n, value] of hertz(model).entries())
      expectClose(value, AVIONICS.hertz[n] as number, {
        atol: 0.0055,
        because: "printed to four digits, a hundredth at most",
      });
  });

  for (const { lateral, height: az, gyration, low, high } of COUPLED_ROOTS)
    test(`couple translation and rocking as the closed form for kx/kz ${lateral}, az ${az}, ρ ${gyration} has it`, () => {
      // A body whose yaw and roll lie elsewhere; feet at (±1, ±0.3), equal springs.
      const rho = gyration === 0.8165 ? Math.sqrt(2 / 3) : gyration;
      const inertia = { xx: 0.01, yy: rho ** 2, zz: rho ** 2, xy: 0, xz: 0, yz: 0 };
      const places = [-1, 1].flatMap((x) => [-0.3, 0.3].map((y) => [x, y, -az] as const));
      const model = weightless(
        { mass: 1, centreOfGravity: [0, 0, 0], inertia },
        places,
        places.map(() => spring(lateral * 25, 25)),
      );
      const coupled = (modesOf(model) ?? []).filter(
        ({ energy }) => (energy[0] as number) + (energy[4] as number) > 0.99,
      );
      const digits = low === 0.64719 || low === 0.55408 ? 5e-6 : 5e-5;
      expectAllClose(
        coupled.map(({ omega }) => omega / 10),
        [low, high],
        { atol: digits, because: "half a unit in the last printed digit" },
      );
    });

  for (const { source, mass: m, gyration, supports, radPerS, digits } of BOUNCE_AND_PITCH)
    test(`of bounce and pitch: ${source}`, () => {
      const inertia = { xx: m, yy: m * gyration ** 2, zz: m * gyration ** 2, xy: 0, xz: 0, yz: 0 };
      // Each support as two, left and right, so that the body also holds itself across.
      const places = supports.flatMap(([x]) => [-1, 1].map((y) => [x, y, 0] as const));
      const springs = supports.flatMap(([, k]) => [spring(k / 20, k / 2), spring(k / 20, k / 2)]);
      const plane = (
        modesOf(weightless({ mass: m, centreOfGravity: [0, 0, 0], inertia }, places, springs)) ?? []
      ).filter(({ energy }) => (energy[2] as number) + (energy[4] as number) > 0.99);
      expectAllClose(
        plane.map(({ omega }) => omega),
        radPerS,
        { atol: digits, because: "half a unit in the last printed digit" },
      );
    });
});

describe("a mode", () => {
  const { mass, length, width, height } = BENCHMARK_BOX;
  const inertia = { ...boxInertia(mass, length, width, height), xz: -15, yz: 8 };
  const body = { mass, centreOfGravity: [0.05, -0.02, 0.6], inertia } as const;
  const places = [
    [-0.5, -0.35, 0],
    [0.6, -0.35, 0],
    [-0.5, 0.4, 0.05],
    [0.6, 0.3, 0],
  ] as const;
  const springs = [spring(60e3, 90e3), spring(70e3, 130e3), spring(60e3, 90e3), spring(70e3, 130e3)];
  const model = rigidModel(body, uprightFeet(places), springs, {
    loads: [1, 1, 1, 1],
    verticalForces: [2000, 2900, 2100, 2806],
  });

  test("agrees with a general library's eigenvalues of the same matrices, written out anew", () => {
    const k = Matrix.zeros(6, 6);
    let moment = 0;
    for (const [i, [x, y, z]] of places.entries()) {
      const rx = x - 0.05;
      const ry = y + 0.02;
      const rz = z - 0.6;
      const b = new Matrix([
        [1, 0, 0, 0, rz, -ry],
        [0, 1, 0, -rz, 0, rx],
        [0, 0, 1, ry, -rx, 0],
      ]);
      const axial = i % 2 === 0 ? 90e3 : 130e3;
      const lateral = i % 2 === 0 ? 60e3 : 70e3;
      k.add(
        b
          .transpose()
          .mmul(Matrix.diag([lateral, lateral, axial]))
          .mmul(b),
      );
      moment += ([2000, 2900, 2100, 2806][i] as number) * rz;
    }
    k.set(3, 3, k.get(3, 3) + moment);
    k.set(4, 4, k.get(4, 4) + moment);
    const m = Matrix.diag([mass, mass, mass, 0, 0, 0]);
    const { xx, yy, zz, xz, yz } = inertia;
    for (const [i, j, value] of [
      [3, 3, xx],
      [4, 4, yy],
      [5, 5, zz],
      [3, 5, xz],
      [5, 3, xz],
      [4, 5, yz],
      [5, 4, yz],
    ] as const)
      m.set(i, j, value);
    const half = new EigenvalueDecomposition(m, { assumeSymmetric: true });
    const root = half.eigenvectorMatrix
      .mmul(Matrix.diag(half.realEigenvalues.map((v) => 1 / Math.sqrt(v))))
      .mmul(half.eigenvectorMatrix.transpose());
    const values = new EigenvalueDecomposition(root.mmul(k).mmul(root), { assumeSymmetric: true })
      .realEigenvalues;
    expectAllClose(
      (modesOf(model) ?? []).map(({ omega }) => omega ** 2),
      [...values].sort((a, b) => a - b),
      { rtol: 1e-10, because: "two eigensolvers in double precision" },
    );
  });

  test("shares its kinetic energy among the coordinates, and is named by the largest share", () => {
    const names = ["along_x", "along_y", "vertical", "roll", "pitch", "yaw"];
    for (const { energy, shape, vector } of modesOf(model) ?? []) {
      expectClose(
        energy.reduce((s, e) => s + e, 0),
        1,
        { rtol: 1e-12, because: "rounding" },
      );
      expect(shape).toBe(names[energy.indexOf(Math.max(...energy))]);
      expect(Math.max(...vector.map(Math.abs))).toBe(1);
    }
  });

  test("has the damping of its springs where all have one loss factor: ζ = η/2", () => {
    const lossy = springs.map((s) => ({ ...s, damping: { kind: "structural", lossFactor: 0.12 } as const }));
    for (const { dampingRatio } of modesOf(weightless(body, places, lossy)) ?? [])
      expectClose(dampingRatio, 0.06, { rtol: 1e-10, because: "closed form" });
  });

  test("is found at its own frequency where stiffness depends on it", () => {
    const table = [
      [1, 1.1],
      [100, 2.1],
    ] as const;
    const stiffening = springs.map((s) => ({ ...s, dynamicRatio: table }));
    for (const [n, { omega }] of (modesOf(weightless(body, places, stiffening)) ?? []).entries()) {
      const ratio = 1.1 + Math.log(omega / (2 * Math.PI)) / Math.log(100);
      const frozen = springs.map((s) => ({ ...s, dynamicRatio: ratio }));
      expectClose((modesOf(weightless(body, places, frozen)) ?? [])[n]?.omega as number, omega, {
        rtol: 1e-9,
        because: "the iteration stops at 1e-12 of ω²",
      });
    }
  });

  test("does not exist for a body that nothing holds sideways, or that falls over", () => {
    expect(
      modesOf(
        weightless(
          body,
          places,
          springs.map((s) => ({ ...s, lateralRatio: 0 })),
        ),
      ),
    ).toBeNull();
    const heavy = rigidModel(body, uprightFeet(places), springs, {
      loads: [1, 1, 1, 1],
      verticalForces: [1e6, 1e6, 1e6, 1e6],
    });
    expect(modesOf(heavy)).toBeNull();
  });
});
