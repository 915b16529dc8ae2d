import { type Isolator, staticDeflection } from "../isolator/index.ts";

/** An isolator for every foot, in the order of the feet. */
export type Arrangement = readonly Isolator[];

/** Loads this close share one rating: the sharing on equal springs leaves rounding behind. */
const SAME_LOAD = 1e-9;

function bears({ load }: Isolator, weight: number): boolean {
  return weight > 0 && weight >= load.min && weight <= load.max;
}

/** Whether all feet carry the same. */
export function equallyLoaded(loads: readonly number[]): boolean {
  const largest = Math.max(...loads);
  return largest - Math.min(...loads) <= SAME_LOAD * largest;
}

/**
 * The arrangements worth evaluating among isolators of one series (one construction, height and fixing).
 *
 * Each isolator stands alone under every foot when it bears all the loads. Where the loads differ, each is also
 * tried in company: every foot gets the rating that brings its deflection nearest to a common one, and of the
 * common deflections that the ratings and loads themselves offer, the one that leaves the machine most level is
 * kept. Air springs, levelled and never mixed with other kinds, are only tried alone.
 * @param series  isolators that may be mixed
 * @param loads   N, one a foot, as shared on equal springs
 * @param ratingsPerArrangement  how many ratings may be mixed, ≥ 1
 */
export function arrangements(
  series: readonly Isolator[],
  loads: readonly number[],
  ratingsPerArrangement: number,
): readonly Arrangement[] {
  const alone = series
    .filter((isolator) => loads.every((load) => bears(isolator, load)))
    .map((isolator): Arrangement => loads.map(() => isolator));
  if (equallyLoaded(loads) || ratingsPerArrangement === 1) return alone;

  const mixable = series.filter((isolator) => isolator.axial.kind !== "air");
  const mixed = new Map<string, Arrangement>();
  const keep = (found: Arrangement | undefined): void => {
    if (found && new Set(found).size > 1) mixed.set(found.map((i) => i.designation).join("\n"), found);
  };
  for (const isolator of mixable) keep(bestCompany(isolator, mixable, loads));
  if (ratingsPerArrangement > 2) {
    const free = mostLevel(mixable, loads);
    if (free && new Set(free).size <= ratingsPerArrangement) keep(free);
  }
  return [...alone, ...mixed.values()];
}

/** The most level pairing of an isolator with another of its series that uses both. */
function bestCompany(
  isolator: Isolator,
  series: readonly Isolator[],
  loads: readonly number[],
): Arrangement | undefined {
  let best: Arrangement | undefined;
  let least = Number.POSITIVE_INFINITY;
  for (const other of series) {
    if (other === isolator) continue;
    const found = mostLevel([isolator, other], loads);
    if (!found?.includes(isolator) || !found.includes(other)) continue;
    const uneven = unevenness(found, loads);
    if (uneven < least) {
      best = found;
      least = uneven;
    }
  }
  return best;
}

/** Relative spread of the static deflections of an arrangement. */
function unevenness(arrangement: Arrangement, loads: readonly number[]): number {
  const deflections = arrangement.map((isolator, foot) => staticDeflection(isolator, loads[foot] as number));
  return Math.max(...deflections) / Math.min(...deflections) - 1;
}

/** For every foot the rating nearest to a common deflection, for the common deflection that leaves the least spread. */
function mostLevel(ratings: readonly Isolator[], loads: readonly number[]): Arrangement | undefined {
  const choices = loads.map((load) =>
    ratings
      .filter((isolator) => bears(isolator, load))
      .map((isolator) => ({ isolator, deflection: staticDeflection(isolator, load) })),
  );
  if (choices.some((choice) => choice.length === 0)) return undefined;
  let best: Arrangement | undefined;
  let least = Number.POSITIVE_INFINITY;
  for (const common of new Set(choices.flat().map((choice) => choice.deflection))) {
    const found = choices.map((choice) =>
      choice.reduce((a, b) => (Math.abs(b.deflection - common) < Math.abs(a.deflection - common) ? b : a)),
    );
    const arrangement = found.map((choice) => choice.isolator);
    const uneven = unevenness(arrangement, loads);
    if (uneven < least) {
      best = arrangement;
      least = uneven;
    }
  }
  return best;
}
