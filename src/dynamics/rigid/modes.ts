import type { Mode, Shape } from "../analysis.ts";
import { packed, symmetricEigen6 } from "../solver/index.ts";
import { N } from "./geometry.ts";
import { partsAt, type RigidModel, toNormalised, toPhysical } from "./model.ts";

/** The freedoms in order, as modes are named by them. */
const SHAPES: readonly Shape[] = ["along_x", "along_y", "vertical", "roll", "pitch", "yaw"];

/** Squares of frequency this close, as a share, are one frequency. */
const EQUAL = 1e-9;
/** A square of frequency under this share of the largest is none: the body is free to move. */
const FREE = 1e-12;
const MAX_ITERATIONS = 60;
const CONVERGED = 1e-12;

/** A mode with its shape in normalised coordinates. */
export interface RigidMode extends Mode {
  readonly normalised: Float64Array;
}

/**
 * The six undamped modes of a body on its isolators, (K − ω²M)·φ = 0 with the real stiffness at ω, and the damping
 * that each has, ζ = φᵀ·Im K*·φ / (2·φᵀ·Re K*·φ).
 * @returns ascending in frequency; null where the stiffness is not positive definite: the body falls over or drifts
 */
export function modesOf(model: RigidModel): readonly RigidMode[] | null {
  const first = decompose(model, 1);
  if (first === null) return null;
  if (model.constant !== null) return describeAll(model, turned(model, first));
  // Where stiffness depends on frequency each mode is found at its own.
  const modes: RigidMode[] = [];
  for (let n = 0; n < N; n++) {
    let omega2 = first.values[n] as number;
    let found = first;
    for (let i = 0; i < MAX_ITERATIONS; i++) {
      const next = decompose(model, Math.sqrt(omega2) / (2 * Math.PI));
      if (next === null) return null;
      found = next;
      const moved = Math.abs((next.values[n] as number) - omega2) > CONVERGED * omega2;
      omega2 = next.values[n] as number;
      if (!moved) break;
    }
    const { vectors } = turned(model, found);
    modes.push(describe(model, omega2, vectors.slice(N * n, N * n + N)));
  }
  return modes;
}

interface Decomposition {
  readonly values: Float64Array;
  readonly vectors: Float64Array;
}

function decompose(model: RigidModel, frequencyHz: number): Decomposition | null {
  const { k } = partsAt(model, frequencyHz);
  const full = new Float64Array(N * N);
  for (let i = 0; i < N; i++) for (let j = 0; j < N; j++) full[N * i + j] = k[packed(i, j)] as number;
  const eigen = symmetricEigen6(full);
  const lowest = eigen.values[0] as number;
  return lowest > FREE * (eigen.values[N - 1] as number) ? eigen : null;
}

/**
 * Within equal frequencies any turn of the shapes is as good; they are turned so that the first moves most along the
 * lowest freedom that the group can move along, the next along the next.
 */
function turned(model: RigidModel, { values, vectors }: Decomposition): Decomposition {
  const out = vectors.slice();
  let start = 0;
  while (start < N) {
    let end = start + 1;
    while (
      end < N &&
      (values[end] as number) - (values[start] as number) <= EQUAL * (values[start] as number)
    )
      end++;
    if (end - start > 1) turnGroup(model, out, start, end);
    start = end;
  }
  return { values, vectors: out };
}

function turnGroup(model: RigidModel, vectors: Float64Array, start: number, end: number): void {
  const group = Array.from({ length: end - start }, (_, g) =>
    vectors.slice(N * (start + g), N * (start + g) + N),
  );
  const chosen: Float64Array[] = [];
  for (let freedom = 0; freedom < N && chosen.length < group.length; freedom++) {
    // φ_freedom = w·p for normalised p; the unit vector of the group along w moves that freedom most.
    const w = new Float64Array(N);
    w[freedom] = 1;
    toNormalised(model, w);
    const direction = new Float64Array(N);
    for (const v of group) addTimes(direction, v, dot(w, v));
    for (const v of chosen) addTimes(direction, v, -dot(direction, v));
    const length = Math.hypot(...direction);
    if (length > 1e-6 * Math.hypot(...w)) chosen.push(direction.map((value) => value / length));
  }
  for (const [g, v] of chosen.entries()) vectors.set(v, N * (start + g));
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < N; i++) sum += (a[i] as number) * (b[i] as number);
  return sum;
}

function addTimes(to: Float64Array, v: Float64Array, factor: number): void {
  for (let i = 0; i < N; i++) to[i] = (to[i] as number) + factor * (v[i] as number);
}

function describeAll(model: RigidModel, { values, vectors }: Decomposition): readonly RigidMode[] {
  return Array.from(values, (omega2, n) => describe(model, omega2, vectors.slice(N * n, N * n + N)));
}

function describe(model: RigidModel, omega2: number, normalised: Float64Array): RigidMode {
  const omega = Math.sqrt(omega2);
  const shape = normalised.slice();
  toPhysical(model, shape);
  // (M·φ) = L·p, so that the shares (M·φ)_k·φ_k sum to p·p = 1.
  const momentum = new Float64Array(N);
  for (let i = 0; i < N; i++)
    for (let k = 0; k <= i; k++)
      momentum[i] = (momentum[i] as number) + (model.factor[N * i + k] as number) * (normalised[k] as number);
  const energy = Array.from(shape, (value, i) => value * (momentum[i] as number));
  const largest = energy.indexOf(Math.max(...energy));
  return {
    omega,
    dampingRatio: lossOf(model, normalised, omega) / (2 * omega2),
    shape: SHAPES[largest] as Shape,
    energy,
    vector: scaled(model, shape),
    ownTransmissibility: [],
    normalised,
  };
}

/** φᵀ·Im K*(ω)·φ in normalised coordinates. */
function lossOf(model: RigidModel, p: Float64Array, omega: number): number {
  const { h, c } = partsAt(model, omega / (2 * Math.PI));
  let sum = 0;
  for (let i = 0; i < N; i++)
    for (let j = 0; j < N; j++) {
      const e = packed(i, j);
      sum += (p[i] as number) * (p[j] as number) * ((h[e] as number) + omega * (c[e] as number));
    }
  return sum;
}

/** Rotations times their radius of gyration, so that all components are lengths; then the largest is 1. */
function scaled({ body }: RigidModel, shape: Float64Array): readonly number[] {
  const { xx, yy, zz } = body.inertia;
  const gyration = [xx, yy, zz].map((moment) => Math.sqrt(moment / body.mass));
  const lengths = Array.from(shape, (value, i) => (i < 3 ? value : value * (gyration[i - 3] as number)));
  const largest = lengths.reduce((a, b) => (Math.abs(b) > Math.abs(a) ? b : a));
  return lengths.map((value) => value / largest);
}
