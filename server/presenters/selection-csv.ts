import { PEOPLE_UNITS } from "../../src/units/index.ts";
import type { CsvStyle } from "./csv.ts";
import type { PresentedOption } from "./option.ts";
import type { PresentedSelection } from "./selection.ts";
import { type Column, tableCsv, type UnitSystem } from "./table.ts";

const COLUMNS: readonly Column<PresentedOption>[] = [
  { name: "rank", of: (o) => o.rank },
  { name: "designation", of: (o) => o.designation },
  { name: "series", of: (o) => o.series },
  { name: "family", of: (o) => o.family },
  { name: "quantity", of: (o) => o.quantity },
  { name: "items", of: (o) => o.items.map((item) => `${item.quantity} x ${item.isolator}`).join("; ") },
  { name: "load_max", of: (o) => Math.max(...o.feet.map((foot) => foot.load_n)), unit: PEOPLE_UNITS.force },
  { name: "static_deflection", of: (o) => o.static_deflection_mm, unit: PEOPLE_UNITS.short_length },
  { name: "levelness", of: (o) => o.levelness_mm, unit: PEOPLE_UNITS.short_length },
  { name: "natural_frequency", of: (o) => o.natural_frequency_hz, unit: PEOPLE_UNITS.frequency },
  { name: "frequency_ratio", of: (o) => o.frequency_ratio },
  { name: "damping_ratio", of: (o) => o.damping_ratio },
  { name: "transmissibility", of: (o) => o.transmissibility },
  { name: "isolation_efficiency_percent", of: (o) => o.isolation_efficiency_percent },
  { name: "transmitted_force", of: (o) => o.transmitted_force_n, unit: PEOPLE_UNITS.force },
  { name: "margin", of: (o) => o.margin },
  { name: "price", of: (o) => o.price },
  { name: "currency", of: (o) => o.currency },
  { name: "unbeaten", of: (o) => o.unbeaten },
  { name: "notes", of: (o) => o.notes.join(" ") },
];

/** The options on one page of a selection as CSV. */
export function selectionCsv({ options }: PresentedSelection, units: UnitSystem, style: CsvStyle): string {
  return tableCsv(COLUMNS, options, units, style);
}
