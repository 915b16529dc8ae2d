/** How sure a published number is: read in its source, or recalled and not read again. */
export type Mark = "published" | "recalled";

/** Where a table comes from. */
export interface Source {
  readonly title: string;
  readonly mark: Mark;
  readonly note: string | null;
}
