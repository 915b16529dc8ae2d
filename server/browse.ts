import { type Isolator, ratedNaturalFrequency, staticStiffness } from "../src/isolator/index.ts";
import { toSI } from "../src/units/index.ts";
import type { IsolatorQuery, Sort } from "./schemas/isolators.ts";

const KEYS: Readonly<Record<Sort, (isolator: Isolator) => number | string | null>> = {
  designation: (isolator) => isolator.designation,
  load: (isolator) => isolator.load.max,
  stiffness: (isolator) => staticStiffness(isolator, isolator.load.rated),
  natural_frequency: ratedNaturalFrequency,
  free_height: (isolator) => isolator.freeHeight,
  price: (isolator) => isolator.price,
};

/**
 * The isolators of a catalogue that a query asks for, in its order: by the key, what is silent about it last,
 * then by designation.
 */
export function browse(isolators: readonly Isolator[], query: IsolatorQuery): readonly Isolator[] {
  const wanted = filtersOf(query);
  const found = isolators.filter((isolator) => wanted.every((wants) => wants(isolator)));
  const descending = query.sort?.startsWith("-") ?? false;
  const key = KEYS[(query.sort ?? "load").replace("-", "") as Sort];
  return found
    .map((isolator) => ({ isolator, key: key(isolator) }))
    .sort(
      (a, b) =>
        compare(a.key, b.key, descending) || (a.isolator.designation < b.isolator.designation ? -1 : 1),
    )
    .map(({ isolator }) => isolator);
}

function compare(a: number | string | null, b: number | string | null, descending: boolean): number {
  if (a === b) return 0;
  if (a === null) return 1;
  if (b === null) return -1;
  return (a < b ? -1 : 1) * (descending ? -1 : 1);
}

function filtersOf(query: IsolatorQuery): readonly ((isolator: Isolator) => boolean)[] {
  const filters: ((isolator: Isolator) => boolean)[] = [];
  const {
    families,
    series,
    load,
    natural_frequency_max,
    temp_min,
    temp_max,
    exposures,
    captive,
    max_height,
    max_price,
  } = query;
  if (families !== undefined) filters.push(({ family }) => families.includes(family));
  if (series !== undefined) filters.push((isolator) => isolator.series === series);
  if (load !== undefined) filters.push((isolator) => load >= isolator.load.min && load <= isolator.load.max);
  if (natural_frequency_max !== undefined)
    filters.push((isolator) => ratedNaturalFrequency(isolator) <= natural_frequency_max);
  if (temp_min !== undefined) {
    const lowest = toSI(temp_min, "temperature");
    filters.push(({ temperature }) => temperature !== null && temperature.min <= lowest);
  }
  if (temp_max !== undefined) {
    const highest = toSI(temp_max, "temperature");
    filters.push(({ temperature }) => temperature !== null && temperature.max >= highest);
  }
  if (exposures !== undefined)
    filters.push(({ resists }) => exposures.every((exposure) => resists.includes(exposure)));
  if (captive !== undefined) filters.push((isolator) => isolator.captive === (captive === "true"));
  if (max_height !== undefined)
    filters.push(({ freeHeight }) => freeHeight !== null && freeHeight <= max_height);
  if (max_price !== undefined) filters.push(({ price }) => price !== null && price <= max_price);
  return filters;
}
