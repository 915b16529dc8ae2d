import { type Isolator, staticDeflection, staticLoad, staticStiffness } from "../../isolator/index.ts";
import type { Foot, RigidBody, Vec3 } from "../../machine/index.ts";
import { STANDARD_GRAVITY } from "../../units/index.ts";
import { PACKED, packed, solveSymmetric6 } from "../solver/index.ts";
import { addFootStiffness, type FootGeometry, footGeometry, N } from "./geometry.ts";

/** How a body stands on its isolators at rest. */
export interface Equilibrium {
  /** Along each isolator's own axis, N; not positive is uplift. */
  readonly loads: readonly number[];
  /** Along each isolator's own axis, m. */
  readonly deflections: readonly number[];
  /** Across each isolator's own axis, N. */
  readonly lateralLoads: readonly number[];
  /** Vertical part of each foot's force on the body, N. */
  readonly verticalForces: readonly number[];
  /** Rotation about x and y, rad. */
  readonly tilt: { readonly x: number; readonly y: number };
  /** Largest unbalanced force over the weight, or moment over the weight times the span of the feet. */
  readonly residual: number;
}

const MAX_ITERATIONS = 60;
const CONVERGED = 1e-12;
/** Upright isolators without lateral stiffness leave the plan motion free; this share holds it in statics only. */
const LEAST_LATERAL = 1e-6;

/**
 * Static equilibrium of a rigid body on isolators: Σ Gᵀ·f(G·q) = weight, by Newton's method with the tangent
 * stiffness of each isolator. Levelled air springs share the weight as equal linear springs would and do not tilt.
 * @param feet       at least three, not on one line
 * @param isolators  one a foot; air springs only together
 */
export function equilibrium(
  body: RigidBody,
  feet: readonly Foot[],
  isolators: readonly Isolator[],
): Equilibrium {
  const geometry = feet.map((foot, i) =>
    footGeometry(body, foot, Math.max((isolators[i] as Isolator).lateralRatio, LEAST_LATERAL)),
  );
  const weight = body.mass * STANDARD_GRAVITY;
  const levelled = isolators.every(({ axial }) => axial.kind === "air");
  // Any stiffness gives equal springs the same loads; this one keeps the numbers of the size of the weight.
  const shared = weight / feet.length;
  const laws = isolators.map((isolator) => (levelled ? equalSpring(shared) : lawOf(isolator)));

  const q = new Float64Array(N);
  const start = weight / feet.length;
  q[2] = -laws.reduce((sum, law) => sum + law.deflection(start), 0) / laws.length;
  let forces = forcesAt(geometry, laws, q);
  for (let i = 0; i < MAX_ITERATIONS; i++) {
    const step = newtonStep(geometry, forces, weight);
    for (let k = 0; k < N; k++) q[k] = (q[k] as number) + (step[k] as number);
    forces = forcesAt(geometry, laws, q);
    if (unbalance(geometry, forces, weight).relative <= CONVERGED) break;
  }
  const loads = forces.map((force) => force.axial);
  return {
    loads,
    deflections: levelled
      ? isolators.map((isolator, i) => staticDeflection(isolator, loads[i] as number))
      : forces.map((force) => force.deflection),
    lateralLoads: forces.map((force) => force.lateral),
    verticalForces: forces.map((force) => force.onBody[2]),
    tilt: levelled ? { x: 0, y: 0 } : { x: q[3] as number, y: q[4] as number },
    residual: unbalance(geometry, forces, weight).relative,
  };
}

/** The static law of one isolator along its axis. */
interface Law {
  readonly load: (deflection: number) => number;
  readonly deflection: (load: number) => number;
  /** Tangent stiffness at a load. */
  readonly stiffness: (load: number) => number;
}

function lawOf(isolator: Isolator): Law {
  return {
    load: (deflection) => staticLoad(isolator, deflection),
    deflection: (load) => staticDeflection(isolator, load),
    stiffness: (load) => staticStiffness(isolator, load),
  };
}

function equalSpring(stiffness: number): Law {
  return {
    load: (deflection) => stiffness * deflection,
    deflection: (load) => load / stiffness,
    stiffness: () => stiffness,
  };
}

interface FootForce {
  readonly deflection: number;
  readonly axial: number;
  readonly lateral: number;
  readonly stiffness: number;
  readonly onBody: Vec3;
}

function forcesAt(
  geometry: readonly FootGeometry[],
  laws: readonly Law[],
  q: Float64Array,
): readonly FootForce[] {
  return geometry.map(({ motion, axis, form }, foot) => {
    const law = laws[foot] as Law;
    const u = [0, 1, 2].map((i) => {
      let sum = 0;
      for (let k = 0; k < N; k++) sum += (motion[N * i + k] as number) * (q[k] as number);
      return sum;
    }) as [number, number, number];
    const along = axis[0] * u[0] + axis[1] * u[1] + axis[2] * u[2];
    const axial = law.load(-along);
    const stiffness = law.stiffness(axial);
    const ratio = lateralRatioOf(form);
    const across = u.map((v, i) => -ratio * stiffness * (v - along * (axis[i] as number))) as [
      number,
      number,
      number,
    ];
    return {
      deflection: -along,
      axial,
      lateral: Math.hypot(...across),
      stiffness,
      onBody: [axial * axis[0] + across[0], axial * axis[1] + across[1], axial * axis[2] + across[2]],
    };
  });
}

/** λ from the trace of λI + (1 − λ)·a·aᵀ, which is 1 + 2λ. */
function lateralRatioOf(form: Float64Array): number {
  return ((form[0] as number) + (form[4] as number) + (form[8] as number) - 1) / 2;
}

function unbalance(geometry: readonly FootGeometry[], forces: readonly FootForce[], weight: number) {
  const rest = new Float64Array(N);
  rest[2] = -weight;
  let span = 0;
  for (const [foot, { motion, arm }] of geometry.entries()) {
    const { onBody } = forces[foot] as FootForce;
    span = Math.max(span, Math.hypot(...arm));
    for (let k = 0; k < N; k++)
      for (let i = 0; i < 3; i++)
        rest[k] = (rest[k] as number) + (motion[N * i + k] as number) * (onBody[i] as number);
  }
  let relative = 0;
  for (let k = 0; k < N; k++)
    relative = Math.max(relative, Math.abs(rest[k] as number) / (weight * (k < 3 ? 1 : span)));
  return { rest, relative };
}

/** Solves the tangent stiffness for the rest of force, rotations measured at the span of the feet. */
function newtonStep(
  geometry: readonly FootGeometry[],
  forces: readonly FootForce[],
  weight: number,
): Float64Array {
  const tangent = new Float64Array(N * N);
  for (const [foot, of] of geometry.entries())
    addFootStiffness(tangent, of, (forces[foot] as FootForce).stiffness);
  const span = Math.max(...geometry.map(({ arm }) => Math.hypot(...arm)));
  const scale = (k: number): number => (k < 3 ? 1 : 1 / span);
  const re = new Float64Array(PACKED);
  const size = Math.abs(tangent[2 * N + 2] as number);
  for (let i = 0; i < N; i++)
    for (let j = 0; j <= i; j++)
      re[packed(i, j)] = ((tangent[N * i + j] as number) * scale(i) * scale(j)) / size;
  const { rest } = unbalance(geometry, forces, weight);
  const b = rest.map((value, k) => (value * scale(k)) / size);
  const x = new Float64Array(N);
  solveSymmetric6(re, new Float64Array(PACKED), b, new Float64Array(N), x, new Float64Array(N));
  return x.map((value, k) => value * scale(k));
}
