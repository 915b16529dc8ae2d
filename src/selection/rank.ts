import type { Evaluated } from "./evaluate.ts";
import { RANKINGS, type Ranking } from "./request.ts";

/** An arrangement that passes every gate, in its place. */
export interface Option extends Evaluated {
  /** From 1. */
  readonly rank: number;
  /** No other option is at least as good on price, transmissibility and static deflection and better on one. */
  readonly unbeaten: boolean;
}

export interface Ranked {
  readonly options: readonly Option[];
  readonly rankedBy: Ranking;
}

/**
 * Puts passing arrangements in order. Ties fall to the next order of `RANKINGS`, then to the designations, so
 * that equal input always gives the same list.
 * @param rankBy    the order asked for; `null` is price when all are priced in one currency, else stability
 * @param currency  the currency in which prices are compared; `null` is the one most options have
 */
export function rank(passing: readonly Evaluated[], rankBy: Ranking | null, currency: string | null): Ranked {
  const compared = currency ?? commonCurrency(passing);
  const priced = (option: Evaluated): number =>
    option.price !== null && option.currency === compared ? option.price : Number.POSITIVE_INFINITY;
  const rankedBy = rankBy ?? (passing.every((option) => priced(option) < Infinity) ? "price" : "stability");

  // Each key is the smaller the better.
  const keys: Readonly<Record<Ranking, (option: Evaluated) => number>> = {
    price: priced,
    transmitted_force: transmitted,
    stability: (option) => option.analysis.staticDeflection,
    margin: (option) => -(option.margin ?? 0),
  };
  const order = [rankedBy, ...RANKINGS.filter((ranking) => ranking !== rankedBy)].map(
    (ranking) => keys[ranking],
  );
  const rows = passing.map((option) => ({
    option,
    keys: order.map((key) => key(option)),
    name: nameOf(option),
  }));
  rows.sort((a, b) => compareKeys(a.keys, b.keys) || (a.name < b.name ? -1 : a.name > b.name ? 1 : 0));
  const sorted = rows.map(({ option }) => option);
  const beaten = beatenOf(sorted, priced);
  return {
    rankedBy,
    options: sorted.map((option, i) => ({ ...option, rank: i + 1, unbeaten: !beaten.has(option) })),
  };
}

/** The force transmitted, or without an excitation the share of it. */
function transmitted({ analysis }: Evaluated): number {
  return (
    analysis.worstForce?.transmittedForce ?? analysis.worst?.transmissibility ?? Number.POSITIVE_INFINITY
  );
}

function nameOf({ arrangement }: Evaluated): string {
  return arrangement.map((isolator) => isolator.designation).join("\n");
}

function compareKeys(a: readonly number[], b: readonly number[]): number {
  for (let i = 0; i < a.length; i++) {
    const x = a[i] as number;
    const y = b[i] as number;
    if (x < y) return -1;
    if (x > y) return 1;
  }
  return 0;
}

/** The currency that most options are priced in; the first in alphabetical order when they tie. */
function commonCurrency(passing: readonly Evaluated[]): string | null {
  const counts = new Map<string, number>();
  for (const { currency } of passing)
    if (currency !== null) counts.set(currency, (counts.get(currency) ?? 0) + 1);
  return [...counts].sort(([a, m], [b, n]) => n - m || (a < b ? -1 : 1))[0]?.[0] ?? null;
}

/** The options that another one beats. */
function beatenOf(
  options: readonly Evaluated[],
  priced: (option: Evaluated) => number,
): ReadonlySet<Evaluated> {
  const rows = options.map((option) => ({
    option,
    keys: [
      priced(option),
      option.analysis.worst?.transmissibility ?? Infinity,
      option.analysis.staticDeflection,
    ],
  }));
  rows.sort((a, b) => compareKeys(a.keys, b.keys));
  const beaten = new Set<Evaluated>();
  // Sorted so, only an earlier row can beat a later one, and it is enough to look among those unbeaten so far.
  const front: (readonly number[])[] = [];
  for (const { option, keys } of rows) {
    const beats = (other: readonly number[]): boolean =>
      other.every((value, i) => value <= (keys[i] as number)) &&
      other.some((value, i) => value < (keys[i] as number));
    if (front.some(beats)) beaten.add(option);
    else front.push(keys);
  }
  return beaten;
}
