import type { Excitation } from "./excitation.ts";
import type { Vec3 } from "./vector.ts";

export type Axis = "x" | "y" | "z";

/** Sense in which the shaft turns about its positive axis; `either` analyses both and takes the worse. */
export type Rotation = "right_handed" | "left_handed" | "either";

/** Running speed of the shaft, rad/s; `min` equals `max` for a machine of one speed. */
export interface SpeedRange {
  readonly min: number;
  readonly max: number;
}

/**
 * A machine on its feet, SI units. What is not known is `null`, and the model that needs it is not used.
 */
export interface Machine {
  /** kg */
  readonly mass: number;
  readonly footCount: number;
  /** Elastic centres of the isolators, m; `null` when only their number is known. */
  readonly feet: readonly Vec3[] | null;
  /** m; `null` is above the centroid of the feet. The height may be unknown. */
  readonly centreOfGravity: { readonly x: number; readonly y: number; readonly z: number | null } | null;
  readonly speed: SpeedRange;
  /** Multiples of the running speed that are evaluated, ascending. */
  readonly orders: readonly number[];
  readonly excitations: readonly Excitation[];
  readonly shaftAxis: Axis;
  readonly rotation: Rotation;
}
