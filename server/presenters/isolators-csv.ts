import type { IsolatorRecord } from "../../src/isolator/index.ts";
import { PEOPLE_UNITS } from "../../src/units/index.ts";
import type { Cell, CsvStyle } from "./csv.ts";
import { type Column, tableCsv, type UnitSystem } from "./table.ts";

/** A table in one cell: pairs with a space between, one after the other. */
const pairs = (table: readonly (readonly [number, number])[]): string =>
  table.map((pair) => pair.join(" ")).join("; ");

const axial = (record: IsolatorRecord, key: string): Cell =>
  (record.axial as Readonly<Record<string, number | undefined>>)[key] ?? null;
const damping = (record: IsolatorRecord, key: string): Cell =>
  (record.damping as Readonly<Record<string, number | undefined>>)[key] ?? null;

const COLUMNS: readonly Column<IsolatorRecord>[] = [
  { name: "designation", of: (r) => r.designation },
  { name: "series", of: (r) => r.series },
  { name: "family", of: (r) => r.family },
  { name: "load_min", of: (r) => r.load_n.min, unit: PEOPLE_UNITS.force },
  { name: "load_max", of: (r) => r.load_n.max, unit: PEOPLE_UNITS.force },
  { name: "load_rated", of: (r) => r.load_n.rated, unit: PEOPLE_UNITS.force },
  { name: "stiffness", of: (r) => axial(r, "stiffness_n_per_mm"), unit: PEOPLE_UNITS.stiffness },
  { name: "natural_frequency", of: (r) => axial(r, "natural_frequency_hz"), unit: PEOPLE_UNITS.frequency },
  { name: "curve_mm_n", of: (r) => ("curve" in r.axial ? pairs(r.axial.curve) : null) },
  {
    name: "dynamic_ratio",
    of: (r) => (typeof r.dynamic_ratio === "object" ? pairs(r.dynamic_ratio) : r.dynamic_ratio),
  },
  { name: "damping_ratio", of: (r) => damping(r, "ratio") },
  { name: "loss_factor", of: (r) => damping(r, "loss_factor") },
  { name: "lateral_ratio", of: (r) => r.lateral_ratio },
  { name: "travel", of: (r) => r.travel_mm, unit: PEOPLE_UNITS.short_length },
  { name: "tolerance", of: (r) => r.tolerance },
  { name: "temperature_min", of: (r) => r.temperature_c?.min, unit: PEOPLE_UNITS.temperature },
  { name: "temperature_max", of: (r) => r.temperature_c?.max, unit: PEOPLE_UNITS.temperature },
  { name: "resists", of: (r) => r.resists?.join(" ") },
  { name: "captive", of: (r) => r.captive },
  { name: "free_height", of: (r) => r.free_height_mm, unit: PEOPLE_UNITS.short_length },
  { name: "outside_diameter", of: (r) => r.outside_diameter_mm, unit: PEOPLE_UNITS.short_length },
  { name: "footprint_length", of: (r) => r.footprint_mm?.length, unit: PEOPLE_UNITS.short_length },
  { name: "footprint_width", of: (r) => r.footprint_mm?.width, unit: PEOPLE_UNITS.short_length },
  { name: "thread", of: (r) => r.thread },
  { name: "mass", of: (r) => r.mass_kg, unit: PEOPLE_UNITS.mass },
  { name: "price", of: (r) => r.price },
  { name: "currency", of: (r) => r.currency },
  { name: "lead_time_days", of: (r) => r.lead_time_days },
  { name: "source", of: (r) => r.source },
];

/** Isolators as CSV, a record a line. */
export function isolatorsCsv(records: readonly IsolatorRecord[], units: UnitSystem, style: CsvStyle): string {
  return tableCsv(COLUMNS, records, units, style);
}
