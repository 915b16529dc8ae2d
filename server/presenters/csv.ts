import { stringify } from "csv-stringify/sync";

export type Cell = string | number | boolean | null;

export interface CsvStyle {
  /** `comma`: decimal comma in numbers and `;` between cells. */
  readonly decimal: "point" | "comma";
}

/**
 * A table as CSV for spreadsheets: RFC 4180, CRLF, header row. A text cell that a spreadsheet would run as a
 * formula is neutralised with a leading apostrophe; numbers never are.
 */
export function csvOf(
  header: readonly string[],
  rows: readonly (readonly Cell[])[],
  { decimal }: CsvStyle,
): string {
  const comma = decimal === "comma";
  return stringify([header, ...rows], {
    record_delimiter: "windows",
    delimiter: comma ? ";" : ",",
    escape_formulas: true,
    cast: {
      number: (value) => (comma ? String(value).replace(".", ",") : String(value)),
      boolean: (value) => String(value),
    },
  });
}
