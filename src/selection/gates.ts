/** Every gate an isolator or an arrangement passes, in the order in which they are tried: the cheap ones first. */
export const GATES = [
  "family",
  "mounting",
  "captive",
  "temperature",
  "exposure",
  "free_height",
  "lead_time",
  "price",
  "underloaded",
  "overloaded",
  "uplift",
  "stability",
  "levelness",
  "static_deflection",
  "transmissibility",
  "transmitted_force",
  "resonance",
] as const;

export type Gate = (typeof GATES)[number];

/** One gate's verdict, with the number judged and the number it was judged by, where there are such (SI units). */
export interface Check {
  readonly gate: Gate;
  readonly passed: boolean;
  readonly value: number | null;
  readonly limit: number | null;
}

/** The first gate of a list of checks that was not passed. */
export function firstFailure(checks: readonly Check[]): Check | undefined {
  return checks.find((check) => !check.passed);
}
