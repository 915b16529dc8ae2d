import { inUnit, ofUnit, type UnitSymbol, unitSuffix } from "../../src/units/index.ts";
import { type Cell, type CsvStyle, csvOf } from "./csv.ts";

/** Units for people, in CSV, sheets, plots and pages; JSON keeps its own. */
export type UnitSystem = "si" | "us";

/** A column of a table of `Row`s. */
export interface Column<Row> {
  /** Without its unit, which the header adds. */
  readonly name: string;
  readonly of: (row: Row) => Cell | undefined;
  /** The unit of each system; the value comes in the SI one, as JSON has it. */
  readonly unit?: { readonly si: UnitSymbol; readonly us: UnitSymbol };
}

/** More digits than any reading has, and few enough to read. */
const DIGITS = 8;

/** Rows as CSV, in the units of a system, each header ending in the unit of its column. */
export function tableCsv<Row>(
  columns: readonly Column<Row>[],
  rows: readonly Row[],
  units: UnitSystem,
  style: CsvStyle,
): string {
  const shown = columns.map(({ name, of, unit }) => {
    if (unit === undefined) return { header: name, of: (row: Row): Cell => rounded(of(row) ?? null) };
    const to = unit[units];
    const convert = (value: Cell): Cell =>
      typeof value === "number" && to !== unit.si ? inUnit(ofUnit(value, unit.si), to) : value;
    return { header: `${name}_${unitSuffix(to)}`, of: (row: Row): Cell => rounded(convert(of(row) ?? null)) };
  });
  return csvOf(
    shown.map((column) => column.header),
    rows.map((row) => shown.map((column) => column.of(row))),
    style,
  );
}

function rounded(value: Cell): Cell {
  return typeof value === "number" ? Number(value.toPrecision(DIGITS)) : value;
}
