import type { UnitSymbol } from "./table.ts";

interface PeopleUnits {
  readonly si: UnitSymbol;
  readonly us: UnitSymbol;
}

/** The units in which people read a kind of number, in tables, sheets, plots and pages. */
export const PEOPLE_UNITS = {
  mass: { si: "kg", us: "lb" },
  speed: { si: "rpm", us: "rpm" },
  frequency: { si: "Hz", us: "Hz" },
  length: { si: "m", us: "ft" },
  short_length: { si: "mm", us: "in" },
  force: { si: "N", us: "lbf" },
  stiffness: { si: "N/mm", us: "lbf/in" },
  unbalance: { si: "g mm", us: "oz in" },
  velocity: { si: "mm/s", us: "in/s" },
  temperature: { si: "°C", us: "°F" },
} as const satisfies Record<string, PeopleUnits>;

/**
 * A unit as the ending of a JSON key or of a column's header.
 * @example unitSuffix("N/mm") // "n_per_mm"
 */
export function unitSuffix(unit: UnitSymbol): string {
  return unit
    .replace("°", "")
    .replace("µ", "u")
    .replace(/^M(?=[A-Z])/, "mega_") // "MN" is not to read as "mN"
    .replaceAll("/", "_per_")
    .replaceAll(" ", "_")
    .toLowerCase();
}
