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

/** What options are compared by: the smaller the better. */
type Key = (option: Evaluated) => number;

/**
 * Puts passing arrangements in order. Ties fall to the next order of `RANKINGS`, then to the designations, so
 * that equal input always gives the same list.
 * @param rankBy    the order asked for; `null` is price when all are priced in one currency, else stability
 * @param currency  the currency in which prices are compared; `null` is the one most options have
 */
export function rank(passing: readonly Evaluated[], rankBy: Ranking | null, currency: string | null): Ranked {
  const compared = currency ?? commonCurrency(passing);
  const priced: Key = (option) =>
    option.price !== null && option.currency === compared ? option.price : Number.POSITIVE_INFINITY;
  const rankedBy = rankBy ?? (passing.every((option) => priced(option) < Infinity) ? "price" : "stability");

  const keys: Readonly<Record<Ranking, Key>> = {
    price: priced,
    transmitted_force: transmitted,
    stability: (option) => option.analysis.staticDeflection,
    margin: (option) => -(option.margin ?? 0),
  };
  const order = [rankedBy, ...RANKINGS.filter((ranking) => ranking !== rankedBy)].map(
    (ranking) => keys[ranking],
  );
  const sorted = [...passing].sort((a, b) => compareBy(order, a, b) || (nameOf(a) < nameOf(b) ? -1 : 1));
  const beaten = beatenOf(sorted, priced);
  return {
    rankedBy,
    options: sorted.map((option, i) => ({ ...option, rank: i + 1, unbeaten: !beaten.has(option) })),
  };
}

/** The force transmitted, or without an excitation the share of it. */
function transmitted({ analysis }: Evaluated): number {
  return analysis.judged.transmittedForce ?? analysis.judged.transmissibility ?? Number.POSITIVE_INFINITY;
}

function nameOf({ arrangement }: Evaluated): string {
  return arrangement.map((isolator) => isolator.designation).join("\n");
}

/** The order of two options by the first key that tells them apart; 0 when none does. */
function compareBy(keys: readonly Key[], a: Evaluated, b: Evaluated): number {
  for (const key of keys) {
    const x = key(a);
    const y = key(b);
    if (x !== y) return x < y ? -1 : 1;
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
function beatenOf(options: readonly Evaluated[], priced: Key): ReadonlySet<Evaluated> {
  const keys: readonly Key[] = [
    priced,
    (option) => option.analysis.judged.transmissibility ?? Number.POSITIVE_INFINITY,
    (option) => option.analysis.staticDeflection,
  ];
  const beats = (a: Evaluated, b: Evaluated): boolean =>
    keys.every((key) => key(a) <= key(b)) && keys.some((key) => key(a) < key(b));
  const beaten = new Set<Evaluated>();
  // Sorted so, only an earlier one can beat a later, and it is enough to look among those unbeaten so far.
  const front: Evaluated[] = [];
  for (const option of [...options].sort((a, b) => compareBy(keys, a, b))) {
    if (front.some((other) => beats(other, option))) beaten.add(option);
    else front.push(option);
  }
  return beaten;
}
