/**
 * One unit, against the reference that all units of its dimension share: a reading `v` in this unit is
 * `(v − zero)·times/per` of the reference. Two plain numbers in place of one factor keep decimals clean:
 * 25 mm is 25/1000 m, not 25·0.001 m.
 */
export interface Unit {
  readonly times: number;
  readonly per: number;
  /** What this unit reads at the zero of the reference; 0 but for temperatures. */
  readonly zero: number;
  /** Other spellings. Case, spaces, `·`, `*`, `^` and superscripts need none of their own. */
  readonly aliases: readonly string[];
}

export function unit(times: number, per: number, ...aliases: string[]): Unit {
  return { times, per, zero: 0, aliases };
}

/** A reading in one unit as the reading in another of the same dimension. */
export function convert(value: number, from: Unit, to: Unit): number {
  if (from === to) return value;
  return ((value - from.zero) * (from.times * to.per)) / (from.per * to.times) + to.zero;
}
