import type { JudgedOn } from "../dynamics/index.ts";
import type { Exposure, Family } from "../isolator/index.ts";
import type { Machine } from "../machine/index.ts";

/** How the machine is carried: on its feet, or hung from above. */
export type Mounting = "floor" | "suspended";

export const RANKINGS = ["price", "transmitted_force", "stability", "margin"] as const;

/** An order of ranking. A ranking is added here and in `rank.ts`. */
export type Ranking = (typeof RANKINGS)[number];

/** What must hold; at least one is not `null`, and all that are must hold together. */
export interface Target {
  /** Largest transmissibility, dimensionless, > 0; an isolation efficiency E asks for 1 − E. */
  readonly transmissibility: number | null;
  /** Largest transmitted force, N, zero to peak. */
  readonly transmittedForce: number | null;
  /** Which sum of the foot forces the targets are judged on. */
  readonly judgedOn: JudgedOn;
}

/** What the buyer or the site rules out; `null` is no limit. */
export interface Limits {
  readonly families: readonly Family[] | null;
  /** Of the whole arrangement, in `currency` when that is given. */
  readonly price: number | null;
  readonly currency: string | null;
  /** m */
  readonly freeHeight: number | null;
  /** m, mean over the feet */
  readonly staticDeflection: number | null;
  readonly leadTimeDays: number | null;
  /** Largest difference in static deflection across the feet, m. */
  readonly levelness: number | null;
  /** How many ratings of one series may be mixed under one machine. */
  readonly ratingsPerArrangement: number;
}

export interface Environment {
  /** K */
  readonly temperature: { readonly min: number; readonly max: number } | null;
  readonly exposures: readonly Exposure[];
  /** Whether every isolator must be captive. */
  readonly captive: boolean;
}

export interface SelectionRequest {
  readonly machine: Machine;
  readonly mounting: Mounting;
  readonly environment: Environment;
  readonly target: Target;
  readonly limits: Limits;
  /** `null` leaves the order to what is known: price when every option is priced alike, else stability. */
  readonly rankBy: Ranking | null;
}
