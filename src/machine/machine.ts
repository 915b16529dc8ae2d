import type { Excitation } from "./excitation.ts";
import type { RigidBody } from "./rigid-body.ts";
import type { Vec3 } from "./vector.ts";

export type Axis = "x" | "y" | "z";

/** Sense in which the shaft turns about its positive axis; `either` analyses both and takes the worse. */
export type Rotation = "right_handed" | "left_handed" | "either";

/** Running speed of the shaft, rad/s; `min` equals `max` for a machine of one speed. */
export interface SpeedRange {
  readonly min: number;
  readonly max: number;
}

/** A place where one isolator carries the machine. */
export interface Foot {
  /** Elastic centre of the isolator, m. */
  readonly position: Vec3;
  /** Unit vector of the isolator's own direction: [0, 0, 1] unless it stands inclined. */
  readonly axis: Vec3;
}

/** A place on the machine whose motion is asked for. */
export interface NamedPoint {
  readonly name: string;
  readonly at: Vec3;
}

/**
 * A machine on its feet, SI units. What is not known is `null`, and the model that needs it is not used.
 */
export interface Machine {
  /** kg, an inertia base counted */
  readonly mass: number;
  readonly footCount: number;
  /** `null` when only their number is known. */
  readonly feet: readonly Foot[] | null;
  /** Of machine and base in plan, m; `null` is above the centroid of the feet. */
  readonly centreOfGravity: { readonly x: number; readonly y: number } | null;
  /**
   * Machine and base as a rigid body; `null` when the places of the feet, the height of the centre of gravity or
   * the inertia is not known, and the vertical model alone is used.
   */
  readonly rigid: RigidBody | null;
  /** Centre of gravity of the machine without its base, where an excitation without a point acts, m. */
  readonly excitationPoint: Vec3 | null;
  /** Places whose velocity is asked for. */
  readonly points: readonly NamedPoint[];
  readonly speed: SpeedRange;
  /** Multiples of the running speed that are evaluated, ascending. */
  readonly orders: readonly number[];
  readonly excitations: readonly Excitation[];
  readonly shaftAxis: Axis;
  readonly rotation: Rotation;
}
