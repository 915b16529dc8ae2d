import { InputError } from "../errors/index.ts";
import { centroid, type Machine, withinOutline } from "../machine/index.ts";
import { STANDARD_GRAVITY } from "../units/index.ts";

/**
 * Static load of each foot of a rigid machine on upright springs: vertical force and the two tilting moments
 * in balance, the foot's deflection following from the plane through the feet.
 *
 * u_i = u + θx·y_i − θy·x_i (from the CG),  Σ k_i u_i = m·g,  Σ k_i u_i·x_i = Σ k_i u_i·y_i = 0
 *
 * @param stiffness  of each foot, N/m, > 0; only their ratios matter to the loads. Equal values (or none
 *                   given) are the sharing on equal springs.
 * @returns          N, one a foot, in order; a negative load is uplift. Known by count alone, or with the CG
 *                   above the centroid unstated, the feet share the weight equally.
 * @throws {InputError} at `/centre_of_gravity` when it lies outside the outline of the feet
 * Validity: small tilt, upright isolators.   Source: statics of a rigid body; no further assumption.
 */
export function footLoads(machine: Machine, stiffness?: readonly number[]): readonly number[] {
  const { feet, footCount } = machine;
  const weight = machine.mass * STANDARD_GRAVITY;
  if (feet === null) return new Array<number>(footCount).fill(weight / footCount);

  const places = feet.map((foot) => foot.position);
  const [x0, y0] = centroid(places);
  const cg = machine.centreOfGravity ?? { x: x0, y: y0 };
  requireStanding(machine);

  const k = stiffness ?? new Array<number>(footCount).fill(1);
  const total = k.reduce((s, v) => s + v, 0);
  const mean = (value: (i: number) => number): number => k.reduce((s, v, i) => s + v * value(i), 0) / total;
  const x = places.map((p) => p[0]);
  const y = places.map((p) => p[1]);
  // About the elastic centre the balance of force drops out and a 2 × 2 system is left for the tilt.
  const ex = mean((i) => x[i] as number);
  const ey = mean((i) => y[i] as number);
  const dx = x.map((v) => v - ex);
  const dy = y.map((v) => v - ey);
  const xx = mean((i) => (dx[i] as number) ** 2);
  const yy = mean((i) => (dy[i] as number) ** 2);
  const xy = mean((i) => (dx[i] as number) * (dy[i] as number));
  const det = xx * yy - xy * xy;
  const gx = cg.x - ex;
  const gy = cg.y - ey;
  const ax = (gx * yy - gy * xy) / det;
  const ay = (gy * xx - gx * xy) / det;
  return k.map((v, i) => (weight * v * (1 + ax * (dx[i] as number) + ay * (dy[i] as number))) / total);
}

/**
 * Refuses a machine whose centre of gravity, base counted, lies outside the outline of its feet.
 * @throws {InputError} at `/centre_of_gravity`
 */
export function requireStanding({ feet, centreOfGravity: cg }: Machine): void {
  if (feet === null || cg === null) return;
  const places = feet.map((foot) => foot.position);
  if (!withinOutline(places, cg.x, cg.y))
    throw InputError.at("/centre_of_gravity", "lies outside the outline of the feet: the machine would tip");
}
