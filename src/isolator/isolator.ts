/**
 * The families of isolator, in the order in which lists show them. A family is added here and in
 * `catalog/isolator.schema.json`; a test holds the two together.
 */
export const FAMILIES = [
  "elastomer_pad",
  "elastomer_mount",
  "sandwich_mount",
  "open_spring",
  "housed_spring",
  "restrained_spring",
  "spring_hanger",
  "wire_rope",
  "air_spring",
] as const;

export type Family = (typeof FAMILIES)[number];

/** What an isolator can be exposed to and resist. */
export const EXPOSURES = ["oil", "ozone", "salt_water", "sunlight", "chlorinated_water"] as const;

export type Exposure = (typeof EXPOSURES)[number];

/** A point of a load–deflection curve: deflection in m, load in N. */
export type CurvePoint = readonly [deflection: number, load: number];

/** A value against frequency: frequency in Hz, then the value. */
export type FrequencyPoint = readonly [frequencyHz: number, value: number];

/** The static law along the isolator's axis. */
export type Axial =
  | { readonly kind: "linear" /** N/m */; readonly stiffness: number }
  | { readonly kind: "curve" /** strictly rising in both */; readonly points: readonly CurvePoint[] }
  /** An air spring: stiffness in proportion to load, so that this holds at any load in its range. */
  | { readonly kind: "air" /** Hz, a dynamic rating */; readonly naturalFrequencyHz: number };

export type Damping =
  /** Fraction of critical damping quoted at rated load; the dashpot it stands for is fixed. */
  | { readonly kind: "viscous"; readonly ratio: number }
  /** Loss factor η of a complex stiffness k(1 + jη). */
  | { readonly kind: "structural"; readonly lossFactor: number };

/**
 * One isolator as rated by its supplier, SI units. `null` is "the record is silent", which some gates treat
 * as a failure and never as a zero.
 */
export interface Isolator {
  readonly designation: string;
  /** Isolators of one series share construction, height and fixing, and may be mixed under one machine. */
  readonly series: string | null;
  readonly family: Family;
  readonly axial: Axial;
  /** κ: dynamic over static stiffness, constant or linear in log frequency and flat outside the table. */
  readonly dynamicRatio: number | readonly FrequencyPoint[];
  readonly damping: Damping;
  /** λ: lateral over axial stiffness, the same in x and y. */
  readonly lateralRatio: number;
  /** Static load range of one mount, N. */
  readonly load: { readonly min: number; readonly max: number; readonly rated: number };
  /** Dynamic deflection beyond static before metal meets metal or a snubber, m. */
  readonly travel: number | null;
  /** ± relative scatter of stiffness as delivered. */
  readonly tolerance: number | null;
  /** Service temperatures, K. */
  readonly temperature: { readonly min: number; readonly max: number } | null;
  readonly resists: readonly Exposure[];
  /** Holds the machine against uplift when its elastic part fails or the machine is lifted. */
  readonly captive: boolean;
  /** m */
  readonly freeHeight: number | null;
  /** m */
  readonly outsideDiameter: number | null;
  /** Plan of the fixing plate, m. */
  readonly footprint: { readonly length: number; readonly width: number } | null;
  readonly thread: string | null;
  /** kg */
  readonly mass: number | null;
  readonly price: number | null;
  /** ISO 4217 code. */
  readonly currency: string | null;
  readonly leadTimeDays: number | null;
  readonly source: string | null;
}
