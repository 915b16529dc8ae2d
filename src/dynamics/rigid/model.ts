import { InputError } from "../../errors/index.ts";
import { dashpot, dynamicRatioAt, type Isolator, lossFactor, staticStiffness } from "../../isolator/index.ts";
import type { Foot, RigidBody } from "../../machine/index.ts";
import { backward, cholesky6, forward, PACKED, packed } from "../solver/index.ts";
import type { Equilibrium } from "./equilibrium.ts";
import {
  addFootStiffness,
  type FootGeometry,
  footGeometry,
  formTimesMotion,
  massMatrix,
  N,
} from "./geometry.ts";

/** A foot in the model: how it moves with the body, and what its isolator is at the working load. */
export interface ModelFoot {
  readonly geometry: FootGeometry;
  /** Static tangent along the axis, N/m. */
  readonly stiffness: number;
  readonly isolator: Isolator;
  /** c, N·s/m. */
  readonly dashpot: number;
  /** form · G · L⁻ᵀ: the foot's force in units of its axial stiffness, from normalised coordinates; 3 × 6. */
  readonly force: Float64Array;
  /** L⁻¹ · Gᵀ · form · G · L⁻ᵀ: its share of the stiffness matrix in units of its axial stiffness, packed. */
  readonly unit: Float64Array;
}

/**
 * A rigid body on isolators, linear about its equilibrium, in coordinates p = Lᵀ·q with M = L·Lᵀ, in which the mass
 * matrix is the identity: (K(ω) + jωC + jH − ω²I)·p = L⁻¹·f. All entries then have one unit, 1/s².
 */
export interface RigidModel {
  readonly body: RigidBody;
  /** L, full by rows. */
  readonly factor: Float64Array;
  readonly feet: readonly ModelFoot[];
  /** Gravity term of a body that stands above its mounts, Σ W·r_z on both tilts, packed and normalised. */
  readonly gravity: Float64Array;
  /** Σ W·r_z, N·m; negative takes stiffness from rocking. */
  readonly gravityMoment: number;
  /** The same at every frequency, or null where a dynamic ratio depends on it. */
  readonly constant: StiffnessParts | null;
}

/** Packed and normalised: real stiffness with gravity, structural loss, dashpots. */
export interface StiffnessParts {
  readonly k: Float64Array;
  readonly h: Float64Array;
  readonly c: Float64Array;
  /** Per foot along its axis: dynamic stiffness, ηk and c. */
  readonly footK: Float64Array;
  readonly footH: Float64Array;
  readonly footC: Float64Array;
}

/**
 * The linear model of a body about its equilibrium.
 * @param isolators  one a foot
 * @throws {InputError} an inertia that is not positive definite
 */
export function rigidModel(
  body: RigidBody,
  feet: readonly Foot[],
  isolators: readonly Isolator[],
  { loads, verticalForces }: Pick<Equilibrium, "loads" | "verticalForces">,
): RigidModel {
  const factor = cholesky6(massMatrix(body));
  if (factor === null) throw InputError.at("/inertia", "is not positive definite");
  const modelFeet = feet.map((foot, i): ModelFoot => {
    const isolator = isolators[i] as Isolator;
    const geometry = footGeometry(body, foot, isolator.lateralRatio);
    const full = new Float64Array(N * N);
    addFootStiffness(full, geometry, 1);
    const rows = formTimesMotion(geometry.form, geometry.motion);
    const force = new Float64Array(3 * N);
    for (let a = 0; a < 3; a++) {
      const row = rows.slice(N * a, N * a + N);
      // A row times L⁻ᵀ is L⁻¹ times the row as a column.
      forward(factor, row);
      force.set(row, N * a);
    }
    return {
      geometry,
      isolator,
      // A foot that lifts bears nothing; its tangent at rest keeps the numbers finite for the gates to judge.
      stiffness: staticStiffness(isolator, Math.max(loads[i] as number, 0)),
      dashpot: dashpot(isolator),
      force,
      unit: normalised(factor, full),
    };
  });
  const gravityMoment = modelFeet.reduce(
    (sum, { geometry }, i) => sum + (verticalForces[i] as number) * geometry.arm[2],
    0,
  );
  const tilts = new Float64Array(N * N);
  tilts[3 * N + 3] = gravityMoment;
  tilts[4 * N + 4] = gravityMoment;
  const model = {
    body,
    factor,
    feet: modelFeet,
    gravity: normalised(factor, tilts),
    gravityMoment,
    constant: null,
  };
  const isConstant = isolators.every(({ dynamicRatio }) => typeof dynamicRatio === "number");
  return isConstant ? { ...model, constant: partsAt(model, 1) } : model;
}

/** L⁻¹·A·L⁻ᵀ of a symmetric matrix, packed. */
function normalised(factor: Float64Array, full: Float64Array): Float64Array {
  const half = new Float64Array(N * N);
  for (let j = 0; j < N; j++) {
    const column = Float64Array.from({ length: N }, (_, i) => full[N * i + j] as number);
    forward(factor, column);
    for (let i = 0; i < N; i++) half[N * i + j] = column[i] as number;
  }
  const out = new Float64Array(PACKED);
  for (let i = 0; i < N; i++) {
    const row = half.slice(N * i, N * i + N);
    forward(factor, row);
    for (let j = 0; j <= i; j++) out[packed(i, j)] = row[j] as number;
  }
  return out;
}

/** The stiffness of a model at a frequency, Hz. */
export function partsAt(model: RigidModel, frequencyHz: number): StiffnessParts {
  if (model.constant !== null) return model.constant;
  const n = model.feet.length;
  const parts = {
    k: model.gravity.slice(),
    h: new Float64Array(PACKED),
    c: new Float64Array(PACKED),
    footK: new Float64Array(n),
    footH: new Float64Array(n),
    footC: new Float64Array(n),
  };
  for (const [i, { isolator, stiffness, dashpot: c, unit }] of model.feet.entries()) {
    const k = dynamicRatioAt(isolator, frequencyHz) * stiffness;
    const h = lossFactor(isolator) * k;
    parts.footK[i] = k;
    parts.footH[i] = h;
    parts.footC[i] = c;
    for (let e = 0; e < PACKED; e++) {
      const share = unit[e] as number;
      parts.k[e] = (parts.k[e] as number) + k * share;
      parts.h[e] = (parts.h[e] as number) + h * share;
      parts.c[e] = (parts.c[e] as number) + c * share;
    }
  }
  return parts;
}

/** Physical coordinates q = L⁻ᵀ·p, in place. */
export function toPhysical(model: RigidModel, p: Float64Array): void {
  backward(model.factor, p);
}

/** Normalised load L⁻¹·f, in place. */
export function toNormalised(model: RigidModel, f: Float64Array): void {
  forward(model.factor, f);
}
