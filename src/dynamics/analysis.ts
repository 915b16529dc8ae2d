import type { Isolator } from "../isolator/index.ts";
import type { Sense } from "../machine/index.ts";

/** What one foot bears. */
export interface FootState {
  /** Foot number, from 1. */
  readonly foot: number;
  readonly isolator: Isolator;
  /** Static load along the isolator's axis, N; not positive is uplift. */
  readonly load: number;
  /** Static load across the axis, N; null for an upright isolator. */
  readonly lateralLoad: number | null;
  /** Load over the isolator's maximum. */
  readonly utilisation: number;
  /** Along the axis, m. */
  readonly staticDeflection: number;
}

/** A coordinate after which a mode is named: the one with the largest share of its kinetic energy. */
export type Shape = "along_x" | "along_y" | "vertical" | "roll" | "pitch" | "yaw";

export interface Mode {
  /** rad/s */
  readonly omega: number;
  readonly dampingRatio: number;
  readonly shape: Shape;
  /** Shares of the kinetic energy of ux, uy, uz, θx, θy, θz; they sum to 1. */
  readonly energy: readonly number[];
  /** Displacements and rotations times their radius of gyration, the largest 1. */
  readonly vector: readonly number[];
  /**
   * Transmissibility at the mode's own frequency for what acts at each order evaluated; null where the forces cancel
   * or none acts in a way the model knows.
   */
  readonly ownTransmissibility: readonly (number | null)[];
}

/** A velocity at a place on the machine. */
export interface PointVelocity {
  readonly name: string;
  /** m/s rms, along the direction in which it is largest */
  readonly velocity: number;
}

/** Steady state at one order of one running speed; what was not computed is `null`. */
export interface SteadyState {
  /** Running speed, rad/s. */
  readonly speed: number;
  readonly order: number;
  /** order · speed, rad/s. */
  readonly omega: number;
  /** Sum of the amplitudes of the foot forces over the amplitude of what acts. */
  readonly transmissibility: number | null;
  /** Amplitude of the sum of the foot forces over the amplitude of what acts. */
  readonly netTransmissibility: number | null;
  /** The same in N, zero to peak. */
  readonly transmittedForce: number | null;
  readonly netForce: number | null;
  /** Amplitude at each foot, N. */
  readonly footForces: readonly number[] | null;
  /** At the centre of gravity, m/s rms. */
  readonly machineVelocity: number | null;
  readonly pointVelocities: readonly PointVelocity[] | null;
}

/** Which sum of the foot forces targets are judged on. */
export type JudgedOn = "foot_sum" | "net";

/** What an arrangement does under a machine. */
export interface Analysis {
  readonly model: "vertical" | "rigid_body";
  readonly feet: readonly FootState[];
  /** Mean over the feet, m. */
  readonly staticDeflection: number;
  /** Largest difference in static deflection across the feet, m. */
  readonly levelness: number;
  /** Rotation about x and y under the weight, rad; null in the vertical model. */
  readonly tilt: { readonly x: number; readonly y: number } | null;
  /** Rocking stiffness left beside what gravity takes, N·m/rad; null in the vertical model. */
  readonly stability: { readonly stiffness: number | null; readonly needed: number } | null;
  /** Null where the machine is not held in every direction. */
  readonly modes: readonly Mode[] | null;
  /** The mode that moves most vertically, rad/s. */
  readonly naturalFrequency: number | null;
  readonly dampingRatio: number | null;
  /** One entry an order at each end of the speed range, in the sense reported. */
  readonly steadyStates: readonly SteadyState[];
  /** The largest transmissibility over the speed range and orders; null when none can be told. */
  readonly worst: SteadyState | null;
  /** The largest transmitted force; null without an excitation. */
  readonly worstForce: SteadyState | null;
  /** What targets are judged on: the worse of both senses where both may be. */
  readonly judged: { readonly transmissibility: number | null; readonly transmittedForce: number | null };
  /** The sense of rotation that is shown; null where it makes no difference. */
  readonly rotation: Sense | null;
}
