import { ofUnit } from "../units/index.ts";
import type { Axial, Damping, Exposure, Family, Isolator } from "./isolator.ts";

/**
 * One isolator as a record of a catalogue, an import or an inline entry: plain numbers in the units of their
 * keys. `catalog/isolator.schema.json` is its checked form.
 */
export interface IsolatorRecord {
  readonly designation: string;
  readonly series?: string;
  readonly family: Family;
  readonly axial:
    | { readonly stiffness_n_per_mm: number }
    | { readonly curve: readonly (readonly [deflectionMm: number, loadN: number])[] }
    | { readonly natural_frequency_hz: number };
  readonly dynamic_ratio?: number | readonly (readonly [hz: number, ratio: number])[];
  readonly damping: { readonly ratio: number } | { readonly loss_factor: number };
  readonly lateral_ratio?: number;
  readonly load_n: { readonly min?: number; readonly max: number; readonly rated?: number };
  readonly travel_mm?: number;
  readonly tolerance?: number;
  readonly temperature_c?: { readonly min: number; readonly max: number };
  readonly resists?: readonly Exposure[];
  readonly captive?: boolean;
  readonly free_height_mm?: number;
  readonly outside_diameter_mm?: number;
  readonly footprint_mm?: { readonly length: number; readonly width: number };
  readonly thread?: string;
  readonly mass_kg?: number;
  readonly price?: number;
  readonly currency?: string;
  readonly lead_time_days?: number;
  readonly source?: string;
}

/**
 * The isolator that a record describes, in SI units, with the defaults of the record's form: rated load the maximum,
 * minimum load 0, dynamic and lateral ratio 1. What the record is silent about is null.
 * @param record  has passed `catalog/isolator.schema.json`
 */
export function isolatorFromRecord(record: IsolatorRecord): Isolator {
  const mm = (value: number | undefined): number | null => (value === undefined ? null : ofUnit(value, "mm"));
  const { load_n, temperature_c, footprint_mm } = record;
  return {
    designation: record.designation,
    series: record.series ?? null,
    family: record.family,
    axial: axialOf(record.axial),
    dynamicRatio: record.dynamic_ratio ?? 1,
    damping: dampingOf(record.damping),
    lateralRatio: record.lateral_ratio ?? 1,
    load: { min: load_n.min ?? 0, max: load_n.max, rated: load_n.rated ?? load_n.max },
    travel: mm(record.travel_mm),
    tolerance: record.tolerance ?? null,
    temperature:
      temperature_c === undefined
        ? null
        : { min: ofUnit(temperature_c.min, "°C"), max: ofUnit(temperature_c.max, "°C") },
    resists: record.resists ?? [],
    captive: record.captive ?? false,
    freeHeight: mm(record.free_height_mm),
    outsideDiameter: mm(record.outside_diameter_mm),
    footprint:
      footprint_mm === undefined
        ? null
        : { length: ofUnit(footprint_mm.length, "mm"), width: ofUnit(footprint_mm.width, "mm") },
    thread: record.thread ?? null,
    mass: record.mass_kg ?? null,
    price: record.price ?? null,
    currency: record.currency ?? null,
    leadTimeDays: record.lead_time_days ?? null,
    source: record.source ?? null,
  };
}

function axialOf(axial: IsolatorRecord["axial"]): Axial {
  if ("stiffness_n_per_mm" in axial)
    return { kind: "linear", stiffness: ofUnit(axial.stiffness_n_per_mm, "N/mm") };
  if ("curve" in axial)
    return { kind: "curve", points: axial.curve.map(([mm, load]) => [ofUnit(mm, "mm"), load] as const) };
  return { kind: "air", naturalFrequencyHz: axial.natural_frequency_hz };
}

function dampingOf(damping: IsolatorRecord["damping"]): Damping {
  return "ratio" in damping
    ? { kind: "viscous", ratio: damping.ratio }
    : { kind: "structural", lossFactor: damping.loss_factor };
}
