import type { IsolatorRecord } from "../../src/isolator/index.ts";

/** What every invented rating says of itself. */
export const SOURCE = "Invented for demonstration, computed from first principles.";

/** Steps of rated load, ten to the decade (the preferred numbers R10 of ISO 3), from `from` to `to` newtons. */
export function loadsBetween(from: number, to: number): readonly number[] {
  const mantissas = [1, 1.25, 1.6, 2, 2.5, 3.15, 4, 5, 6.3, 8];
  return [10, 100, 1000, 10_000]
    .flatMap((decade) => mantissas.map((mantissa) => Math.round(mantissa * decade)))
    .filter((load) => load >= from && load <= to);
}

/** A price that grows with the part as its material and handling do; in whole euros above ten, else in tens of cents. */
export function priceOf(massKg: number, base: number, perKilogram: number): number {
  const price = base + perKilogram * massKg ** 0.85;
  return price < 10 ? Math.round(price * 10) / 10 : Math.round(price);
}

/** Parts of one construction and height are one series as far as they share their fixing. */
export function seriesWith(series: string, thread: string): string {
  return `${series}-${thread.toLowerCase()}`;
}

/** Within a series a stronger part never costs less, whatever it happens to weigh. */
export function risingPrices(series: readonly IsolatorRecord[]): readonly IsolatorRecord[] {
  let dearest = 0;
  return series.map((record) => {
    dearest = Math.max(dearest, record.price ?? 0);
    return { ...record, price: dearest };
  });
}

/** A number as a record has it: so many significant digits. */
export function rounded(value: number, digits = 4): number {
  return Number(value.toPrecision(digits));
}

/** Resistances by what the part is made of. */
export const RESISTS = {
  paintedSteel: ["oil", "ozone", "sunlight"],
  galvanisedSteel: ["oil", "ozone", "salt_water", "sunlight"],
  stainlessSteel: ["oil", "ozone", "salt_water", "sunlight", "chlorinated_water"],
  naturalRubber: ["salt_water"],
  chloroprene: ["oil", "ozone", "sunlight", "salt_water"],
} as const satisfies Record<string, IsolatorRecord["resists"]>;
