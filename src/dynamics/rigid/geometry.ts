import type { Foot, RigidBody, Vec3 } from "../../machine/index.ts";

/** Freedoms of a rigid body: displacement of the centre of gravity along x, y, z, then rotation about them. */
export const N = 6;

/** A foot as the body moves it: u = G·q with G = [I, −[r]×], r from the centre of gravity to the foot. */
export interface FootGeometry {
  /** m */
  readonly arm: Vec3;
  readonly axis: Vec3;
  /** 3 × 6 by rows. */
  readonly motion: Float64Array;
  /** Stiffness per unit of axial stiffness, R·diag(λ, λ, 1)·Rᵀ = λI + (1 − λ)·a·aᵀ, 3 × 3 by rows. */
  readonly form: Float64Array;
}

/** The motion of a point of the body at `arm` from its centre of gravity, 3 × 6 by rows. */
export function motionAt([x, y, z]: Vec3): Float64Array {
  return Float64Array.of(1, 0, 0, 0, z, -y, 0, 1, 0, -z, 0, x, 0, 0, 1, y, -x, 0);
}

/**
 * @param lateralRatio  λ of the isolator under the foot
 */
export function footGeometry(body: RigidBody, { position, axis }: Foot, lateralRatio: number): FootGeometry {
  const c = body.centreOfGravity;
  const arm: Vec3 = [position[0] - c[0], position[1] - c[1], position[2] - c[2]];
  const form = new Float64Array(9);
  for (const i of [0, 1, 2] as const)
    for (const j of [0, 1, 2] as const)
      form[3 * i + j] = (i === j ? lateralRatio : 0) + (1 - lateralRatio) * axis[i] * axis[j];
  return { arm, axis, motion: motionAt(arm), form };
}

/** Product of a 3 × 3 and a 3 × 6 matrix, by rows. */
export function formTimesMotion(form: Float64Array, motion: Float64Array): Float64Array {
  const product = new Float64Array(3 * N);
  for (let i = 0; i < 3; i++)
    for (let j = 0; j < N; j++) {
      let sum = 0;
      for (let k = 0; k < 3; k++) sum += (form[3 * i + k] as number) * (motion[N * k + j] as number);
      product[N * i + j] = sum;
    }
  return product;
}

/** Adds factor · Gᵀ·form·G to a full 6 × 6 matrix. */
export function addFootStiffness(k: Float64Array, { motion, form }: FootGeometry, factor: number): void {
  const formed = formTimesMotion(form, motion);
  for (let i = 0; i < N; i++)
    for (let j = 0; j < N; j++) {
      let sum = 0;
      for (let a = 0; a < 3; a++) sum += (motion[N * a + i] as number) * (formed[N * a + j] as number);
      k[N * i + j] = (k[N * i + j] as number) + factor * sum;
    }
}

/** The mass matrix, diag(m, m, m, J), full by rows. */
export function massMatrix({ mass, inertia }: RigidBody): Float64Array {
  const matrix = new Float64Array(N * N);
  for (let i = 0; i < 3; i++) matrix[N * i + i] = mass;
  const { xx, yy, zz, xy, xz, yz } = inertia;
  matrix.set([xx, xy, xz], N * 3 + 3);
  matrix.set([xy, yy, yz], N * 4 + 3);
  matrix.set([xz, yz, zz], N * 5 + 3);
  return matrix;
}
