import { EigenvalueDecomposition, inverse, LuDecomposition, Matrix } from "ml-matrix";
import { analyseRigid, frequencyResponse } from "../../src/dynamics/rigid/analyse.ts";
import { equilibrium } from "../../src/dynamics/rigid/equilibrium.ts";
import { massMatrix } from "../../src/dynamics/rigid/geometry.ts";
import { partsAt, rigidModel } from "../../src/dynamics/rigid/model.ts";
import { modesOf } from "../../src/dynamics/rigid/modes.ts";
import { loadAt, respond } from "../../src/dynamics/rigid/response.ts";
import { packed, symmetricEigen6 } from "../../src/dynamics/solver/index.ts";
import { worstOver } from "../../src/dynamics/worst.ts";
import { boxInertia, type Machine } from "../../src/machine/index.ts";
import { isolator, machine, uprightFeet } from "../selection/arbitrary.ts";
import { medians, print } from "./measure.ts";

const N = 6;
const POINTS = 400;

const places = [-0.5, 0.6].flatMap((x) => [-0.35, 0.35].map((y) => [x, y, 0] as const));
const feet = uprightFeet(places);
const springs = [80e3, 80e3, 120e3, 120e3].map((stiffness, i) =>
  isolator({
    axial: { kind: "linear", stiffness },
    lateralRatio: 0.7,
    damping: i < 2 ? { kind: "structural", lossFactor: 0.1 } : { kind: "viscous", ratio: 0.05 },
  }),
);
const rigid = {
  mass: 1000,
  centreOfGravity: [0.1, 0.02, 0.5],
  inertia: boxInertia(1000, 1.2, 0.8, 1),
} as const;
const on: Machine & { rigid: typeof rigid; feet: typeof feet } = {
  ...machine({
    excitationPoint: rigid.centreOfGravity,
    centreOfGravity: { x: 0.1, y: 0.02 },
    speed: { min: 10, max: 120 },
    excitations: [
      { kind: "force", amplitude: 100, direction: [0, 0, 1], order: 1, phase: 0, at: [0.2, 0.1, 0.6] },
    ],
  }),
  rigid,
  feet,
};

/** The same 400 frequencies with the library: the complex system as a real one twice its size, by LU. */
function libraryResponse(): number {
  const parts = partsAt(model, 1);
  const b = new Float64Array(2 * N);
  b.set(load.re);
  b.set(load.im, N);
  const right = Matrix.columnVector([...b]);
  let sum = 0;
  for (let p = 0; p < POINTS; p++) {
    const omega = frequencies[p] as number;
    const a = Matrix.zeros(2 * N, 2 * N);
    for (let i = 0; i < N; i++)
      for (let j = 0; j < N; j++) {
        const e = packed(i, j);
        const re = (parts.k[e] as number) - (i === j ? omega * omega : 0);
        const im = (parts.h[e] as number) + omega * (parts.c[e] as number);
        a.set(i, j, re);
        a.set(i + N, j + N, re);
        a.set(i, j + N, -im);
        a.set(i + N, j, im);
      }
    sum += new LuDecomposition(a).solve(right).get(0, 0);
  }
  return sum;
}

/** The same eigenproblem with the library as it is mostly written, M⁻¹K with its general eigensolver. */
function libraryModes(): number {
  return new EigenvalueDecomposition(massInverse.mmul(stiffness)).realEigenvalues[0] as number;
}

/** And with its symmetric eigensolver, the mass matrix reduced beforehand. */
function librarySymmetric(): number {
  return new EigenvalueDecomposition(reduced, { assumeSymmetric: true }).realEigenvalues[0] as number;
}

const massInverse = inverse(Matrix.from1DArray(N, N, [...massMatrix(rigid)]));
const model = rigidModel(rigid, feet, springs, equilibrium(rigid, feet, springs));
const load = loadAt(model, on, 1, 60, 1);
const { k: packedK } = partsAt(model, 1);
const full = Float64Array.from(
  { length: N * N },
  (_, e) => packedK[packed(Math.floor(e / N), e % N)] as number,
);
const reduced = Matrix.from1DArray(N, N, [...full]);
const factor = Matrix.from1DArray(N, N, [...model.factor]);
const stiffness = factor.mmul(reduced).mmul(factor.transpose());
const frequencies = Float64Array.from({ length: POINTS }, (_, i) => 5 * 40 ** (i / (POINTS - 1)));

export function benchRigid(): void {
  const modes = modesOf(model) ?? [];
  const resonances = modes.map(({ omega }) => omega);
  let solves = 0;
  worstOver(
    (omega) => {
      solves++;
      return respond(model, load, omega).footSum;
    },
    10,
    120,
    resonances,
  );
  const [response, library, eigen, named, theirs, symmetric, single, worst, whole] = medians([
    () => frequencyResponse(model, on, 1, frequencies),
    libraryResponse,
    () => symmetricEigen6(full),
    () => modesOf(model),
    libraryModes,
    librarySymmetric,
    () => respond(model, load, 60),
    () => worstOver((omega) => respond(model, load, omega).footSum, 10, 120, resonances),
    () => analyseRigid(on, springs, "foot_sum"),
  ]) as number[] as [number, number, number, number, number, number, number, number, number];
  print(`A rigid body on four feet (the worst took ${solves} solves)`, [
    {
      name: "response at 400 frequencies, with foot forces",
      median: response,
      ratio: library / response,
      goal: "goal ≥ 50× the library",
    },
    { name: "  ml-matrix: 400 solves alone", median: library, ratio: null, goal: "" },
    { name: "six modes and shapes", median: eigen, ratio: theirs / eigen, goal: "goal ≥ 30× the library" },
    { name: "  ml-matrix, general eigensolver on M⁻¹K", median: theirs, ratio: null, goal: "" },
    { name: "  ml-matrix, symmetric eigensolver", median: symmetric, ratio: symmetric / eigen, goal: "" },
    { name: "six modes named, scaled, with damping", median: named, ratio: null, goal: "" },
    { name: "one frequency", median: single, ratio: null, goal: "" },
    {
      name: "worst over a speed range",
      median: worst,
      ratio: worst / single,
      goal: "goal ≤ 200× one frequency",
    },
    { name: "a whole analysis", median: whole, ratio: null, goal: "" },
  ]);
}
