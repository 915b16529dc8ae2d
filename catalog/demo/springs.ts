import {
  activeMass,
  bucklingDeflection,
  type HelicalSpring,
  lateralRatio,
  SPRING_STEEL,
  springRate,
  springStress,
} from "../../src/isolator/design/index.ts";
import type { IsolatorRecord } from "../../src/isolator/index.ts";
import { loadsBetween, priceOf, RESISTS, risingPrices, rounded, SOURCE, seriesWith } from "./trade.ts";

/** Wire diameters that are stocked, m. */
const WIRES = [1.6, 2, 2.5, 3, 3.5, 4, 4.5, 5, 6, 7, 8, 9, 10, 11, 12, 14, 16, 18, 20].map((mm) => mm / 1000);
/** How many equal springs stand side by side in one isolator. */
const CLUSTERS = [1, 2, 3, 4, 6, 9, 12, 16];
const LARGEST_COIL = 0.17;
/** Inactive coils of closed and ground ends, in wire diameters of solid height. */
const END_COILS = 1.5;
/** Travel left to solid, as a share of the rated deflection (common practice: half). */
const SPARE_TRAVEL = 0.5;
/** Outside diameter over loaded height, for a spring that stands without a guide (common practice: 0.8). */
const STANDING = 0.8;

/**
 * Shear stress that a wire bears when the spring is pressed solid, Pa: half the tensile strength of patented wire,
 * Rm = 2220 − 820·log10(d/mm) MPa (EN 10270-1, grade SM, from memory).
 */
function allowedStress(wire: number): number {
  return 0.5 * (2220 - 820 * Math.log10(wire * 1000)) * 1e6;
}

interface Stand {
  readonly freeHeight: number;
  readonly deflection: number;
}

interface Cluster extends HelicalSpring {
  readonly count: number;
  readonly solidHeight: number;
}

/**
 * The lightest cluster of springs for a load that has the deflection, stands by itself, does not buckle, keeps its
 * spare travel and is not overstressed when solid.
 */
export function clusterFor(load: number, { freeHeight, deflection }: Stand): Cluster | undefined {
  const loaded = freeHeight - deflection;
  let best: (Cluster & { readonly mass: number }) | undefined;
  for (const count of CLUSTERS) {
    for (const wire of WIRES)
      for (let coil = Math.max(4 * wire, STANDING * loaded - wire); coil <= LARGEST_COIL; coil += 0.005) {
        if (coil / wire > 14) continue;
        const rate = load / count / deflection;
        const active = springRate({ wire, coil, active: 1 }, SPRING_STEEL) / rate;
        const solidHeight = (active + END_COILS) * wire;
        const spring = { wire, coil, active };
        const toSolid = freeHeight - solidHeight;
        const buckles = bucklingDeflection(freeHeight / coil, 0.5, SPRING_STEEL);
        if (active < 2 || toSolid < (1 + SPARE_TRAVEL) * deflection) continue;
        if (springStress(spring, rate * toSolid) > allowedStress(wire)) continue;
        if (buckles !== null && buckles * freeHeight < toSolid) continue;
        const mass = count * activeMass({ wire, coil, active: active + 2 }, SPRING_STEEL);
        if (best === undefined || mass < best.mass) best = { ...spring, count, solidHeight, mass };
      }
    // More springs only where fewer will not do: each one costs handling.
    if (best) return best;
  }
  return undefined;
}

interface SpringSeries extends Stand {
  readonly series: string;
  readonly family: IsolatorRecord["family"];
  readonly from: number;
  readonly to: number;
  readonly dampingRatio: number;
  /** What plates, housing and bolts add to the free height of the spring, m. */
  readonly fittings: number;
  readonly resists: NonNullable<IsolatorRecord["resists"]>;
  readonly coldest: number;
  readonly hottest: number;
  readonly captive: boolean;
  readonly basePrice: number;
  readonly leadTimeDays: number;
}

const SERIES: readonly SpringSeries[] = [
  // Standing free on ribbed soles.
  spring("open-25", "open_spring", 25, 80, 125, 40_000, { dampingRatio: 0.006, basePrice: 11, fittings: 12 }),
  spring("open-50", "open_spring", 50, 140, 250, 63_000, {
    dampingRatio: 0.006,
    basePrice: 15,
    fittings: 12,
  }),
  spring("open-75", "open_spring", 75, 200, 500, 40_000, {
    dampingRatio: 0.006,
    basePrice: 21,
    fittings: 16,
  }),
  // The same, hot-dip galvanised, with a damping insert.
  spring("open-25-damped", "open_spring", 25, 80, 250, 16_000, {
    dampingRatio: 0.045,
    basePrice: 19,
    fittings: 14,
    resists: RESISTS.galvanisedSteel,
    leadTimeDays: 12,
  }),
  // In a telescoping housing with rubber guides.
  spring("housed-20", "housed_spring", 20, 75, 250, 20_000, housing(16)),
  spring("housed-40", "housed_spring", 40, 120, 500, 25_000, housing(22)),
  // Held down by bolts.
  spring("restrained-25", "restrained_spring", 25, 80, 500, 40_000, restrained(38)),
  spring("restrained-50", "restrained_spring", 50, 140, 800, 50_000, restrained(52)),
  // In a hanger box.
  spring("hanger-25", "spring_hanger", 25, 80, 100, 5000, hanger(14)),
  spring("hanger-50", "spring_hanger", 50, 140, 200, 4000, hanger(21)),
];

function spring(
  series: string,
  family: SpringSeries["family"],
  deflectionMm: number,
  heightMm: number,
  from: number,
  to: number,
  rest: Pick<SpringSeries, "dampingRatio" | "basePrice" | "fittings"> & Partial<SpringSeries>,
): SpringSeries {
  return {
    resists: RESISTS.paintedSteel,
    coldest: -40,
    hottest: 110,
    captive: false,
    leadTimeDays: 5,
    ...rest,
    series,
    family,
    deflection: deflectionMm / 1000,
    freeHeight: heightMm / 1000,
    from,
    to,
  };
}

function housing(basePrice: number) {
  return { dampingRatio: 0.03, basePrice, fittings: 22, hottest: 80, coldest: -30, leadTimeDays: 8 };
}

function restrained(basePrice: number) {
  return {
    dampingRatio: 0.01,
    basePrice,
    fittings: 30,
    captive: true,
    resists: RESISTS.galvanisedSteel,
    leadTimeDays: 15,
  };
}

function hanger(basePrice: number) {
  return { dampingRatio: 0.015, basePrice, fittings: 45, hottest: 80, coldest: -30, leadTimeDays: 6 };
}

const STEEL_FAMILY = {
  open_spring: "openspring",
  housed_spring: "housedspring",
  restrained_spring: "restrainedspring",
  spring_hanger: "hanger",
} as const;

function recordOf(of: SpringSeries, load: number): IsolatorRecord | undefined {
  const cluster = clusterFor(load, of);
  if (!cluster) return undefined;
  const { wire, coil, active, count, solidHeight } = cluster;
  const mm = (metres: number): number => rounded(metres * 1000, 3);
  const outside = coil + wire;
  const side = Math.ceil(Math.sqrt(count)) * outside + 0.03;
  const plates = 2 * side * side * 0.006 * SPRING_STEEL.density;
  const mass = plates + count * activeMass({ wire, coil, active: active + 2 }, SPRING_STEEL);
  const thread = load <= 6300 ? "M12" : "M20";
  const bundle = count === 1 ? "" : `${count}x`;
  return {
    designation: `${STEEL_FAMILY[of.family as keyof typeof STEEL_FAMILY]}${of.dampingRatio > 0.04 ? "-damped" : ""}-${bundle}d${mm(wire)}x${mm(coil)}-${load}N-${mm(of.deflection)}mm`,
    series: seriesWith(of.series, thread),
    family: of.family,
    axial: { stiffness_n_per_mm: rounded(load / of.deflection / 1000, 5) },
    dynamic_ratio: 1,
    damping: { ratio: of.dampingRatio },
    lateral_ratio: rounded(
      lateralRatio(of.freeHeight / coil, of.deflection / of.freeHeight, SPRING_STEEL),
      3,
    ),
    load_n: { min: rounded(0.35 * load, 3), max: load, rated: load },
    travel_mm: rounded((of.freeHeight - of.deflection - solidHeight) * 1000, 3),
    tolerance: 0.1,
    temperature_c: { min: of.coldest, max: of.hottest },
    resists: of.resists,
    captive: of.captive,
    free_height_mm: Math.round(of.freeHeight * 1000 + of.fittings),
    outside_diameter_mm: mm(outside),
    footprint_mm: { length: Math.round(side * 1000), width: Math.round(side * 1000) },
    thread,
    mass_kg: rounded(mass, 3),
    price: priceOf(mass, of.basePrice, 9),
    currency: "EUR",
    lead_time_days: of.leadTimeDays,
    source: SOURCE,
  };
}

/** Every isolator with steel springs. */
export function springRecords(): readonly IsolatorRecord[] {
  return SERIES.flatMap((series) =>
    risingPrices(loadsBetween(series.from, series.to).flatMap((load) => recordOf(series, load) ?? [])),
  );
}
