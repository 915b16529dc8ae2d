import type { Isolator } from "../isolator/index.ts";

/** What one foot bears. */
export interface FootState {
  /** Foot number, from 1. */
  readonly foot: number;
  readonly isolator: Isolator;
  /** Static load, N; not positive is uplift. */
  readonly load: number;
  /** Load over the isolator's maximum. */
  readonly utilisation: number;
  /** m */
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
}

/** Steady state at one order of one running speed; what was not computed is `null`. */
export interface SteadyState {
  /** Running speed, rad/s. */
  readonly speed: number;
  readonly order: number;
  /** order · speed, rad/s. */
  readonly omega: number;
  readonly transmissibility: number | null;
  /** N, zero to peak */
  readonly transmittedForce: number | null;
}

/** What an arrangement does under a machine. */
export interface Analysis {
  readonly feet: readonly FootState[];
  /** Mean over the feet, m. */
  readonly staticDeflection: number;
  /** Largest difference in static deflection across the feet, m. */
  readonly levelness: number;
  readonly modes: readonly Mode[];
  /** The vertical mode, rad/s. */
  readonly naturalFrequency: number;
  readonly dampingRatio: number;
  /** The largest transmissibility over the speed range and orders; `null` when none can be told. */
  readonly worst: SteadyState | null;
  /** The largest transmitted force; `null` without an excitation. */
  readonly worstForce: SteadyState | null;
}
