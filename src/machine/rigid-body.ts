import { InputError } from "../errors/index.ts";
import type { Vec3 } from "./vector.ts";

/**
 * Inertia tensor about the centre of gravity, kg·m²: the elements of J as they stand in the mass matrix, so that
 * a product of inertia carries its sign, xy = −∫xy dm.
 */
export interface Inertia {
  readonly xx: number;
  readonly yy: number;
  readonly zz: number;
  readonly xy: number;
  readonly xz: number;
  readonly yz: number;
}

export interface RigidBody {
  /** kg, > 0 */
  readonly mass: number;
  /** m, in the machine's frame */
  readonly centreOfGravity: Vec3;
  readonly inertia: Inertia;
}

/**
 * Inertia of a uniform box about its centre: Ixx = m(w² + h²)/12 and so on.
 * @param mass  kg
 * @param length, width, height  along x, y, z, m
 * Source: any text on mechanics.
 */
export function boxInertia(mass: number, length: number, width: number, height: number): Inertia {
  const part = (a: number, b: number): number => (mass * (a * a + b * b)) / 12;
  return { xx: part(width, height), yy: part(length, height), zz: part(length, width), xy: 0, xz: 0, yz: 0 };
}

/**
 * Several bodies fixed together as one: masses add, moments of mass add, inertias are moved to the common centre
 * by the parallel-axis theorem, J + m(|d|²I − d dᵀ).
 * @param bodies  at least one
 */
export function combine(bodies: readonly RigidBody[]): RigidBody {
  const mass = bodies.reduce((s, body) => s + body.mass, 0);
  const centre = (i: 0 | 1 | 2): number =>
    bodies.reduce((s, body) => s + body.mass * body.centreOfGravity[i], 0) / mass;
  const centreOfGravity: Vec3 = [centre(0), centre(1), centre(2)];
  const inertia = { xx: 0, yy: 0, zz: 0, xy: 0, xz: 0, yz: 0 };
  for (const { mass: m, centreOfGravity: c, inertia: own } of bodies) {
    const dx = c[0] - centreOfGravity[0];
    const dy = c[1] - centreOfGravity[1];
    const dz = c[2] - centreOfGravity[2];
    inertia.xx += own.xx + m * (dy * dy + dz * dz);
    inertia.yy += own.yy + m * (dx * dx + dz * dz);
    inertia.zz += own.zz + m * (dx * dx + dy * dy);
    inertia.xy += own.xy - m * dx * dy;
    inertia.xz += own.xz - m * dx * dz;
    inertia.yz += own.yz - m * dy * dz;
  }
  return { mass, centreOfGravity, inertia };
}

/** A triangle inequality missed by less than this share is rounding: a flat plate meets it with equality. */
const ROUNDING = 1e-9;

/**
 * Refuses a tensor that no body can have: one that is not positive definite, or whose principal moments break the
 * triangle inequality (each at most the sum of the other two).
 * @throws {InputError} at `pointer`
 */
export function requirePossibleInertia(inertia: Inertia, pointer: string): void {
  const [a, b, c] = principalMoments(inertia);
  const shown = [a, b, c].map((moment) => Number(moment.toPrecision(4))).join(", ");
  if (a <= 0)
    throw InputError.at(
      pointer,
      `no body has this inertia: its principal moments ${shown} kg m2 are not all above zero`,
    );
  if (c > (a + b) * (1 + ROUNDING))
    throw InputError.at(
      pointer,
      `no body has this inertia: of its principal moments ${shown} kg m2 the largest is more than the sum of the others`,
    );
}

/**
 * Principal moments of a tensor, kg·m², ascending: the eigenvalues of a symmetric 3 × 3 matrix in closed form.
 * Source: O. K. Smith, Communications of the ACM 4 (1961) 168.
 */
export function principalMoments({ xx, yy, zz, xy, xz, yz }: Inertia): readonly [number, number, number] {
  const mean = (xx + yy + zz) / 3;
  const off = xy * xy + xz * xz + yz * yz;
  const spread = Math.sqrt(((xx - mean) ** 2 + (yy - mean) ** 2 + (zz - mean) ** 2 + 2 * off) / 6);
  if (spread === 0) return [mean, mean, mean];
  const a = (xx - mean) / spread;
  const b = (yy - mean) / spread;
  const c = (zz - mean) / spread;
  const d = xy / spread;
  const e = xz / spread;
  const f = yz / spread;
  const half = (a * (b * c - f * f) - d * (d * c - f * e) + e * (d * f - b * e)) / 2;
  const angle = Math.acos(Math.min(1, Math.max(-1, half))) / 3;
  const largest = mean + 2 * spread * Math.cos(angle);
  const smallest = mean + 2 * spread * Math.cos(angle + (2 * Math.PI) / 3);
  return [smallest, 3 * mean - largest - smallest, largest];
}
