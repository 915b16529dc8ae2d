import { createHash } from "node:crypto";
import type { Database } from "better-sqlite3";
import {
  columnsOf,
  type IsolatorColumns,
  type IsolatorRecord,
  isolatorFromRecord,
} from "../src/isolator/index.ts";
import { CatalogError } from "./errors.ts";

/** One immutable revision of a catalogue, in memory as the columns that screening reads. */
export interface Snapshot {
  readonly catalog: string;
  readonly revision: string;
  readonly columns: IsolatorColumns;
}

export interface Imported {
  readonly revision: string;
  readonly count: number;
  /** Whether the same records were not there yet. */
  readonly isNew: boolean;
}

export interface ImportOptions {
  /** Whether the catalogue answers from this revision from now on. */
  readonly activate: boolean;
  readonly note?: string;
}

/** Length of a revision's id in hexadecimal digits: 48 bits. */
const ID_LENGTH = 12;

/** The id of a list of records: a digest of them in which their order does not count. */
export function revisionId(records: readonly IsolatorRecord[]): string {
  const hash = createHash("sha256");
  for (const text of records.map((record) => JSON.stringify(record)).sort()) hash.update(text).update("\n");
  return hash.digest("hex").slice(0, ID_LENGTH);
}

export interface Revisions {
  readonly importRevision: (
    catalog: string,
    records: readonly IsolatorRecord[],
    options: ImportOptions,
  ) => Imported;
  readonly snapshot: (catalog: string) => Snapshot;
  readonly record: (revision: string, designation: string) => IsolatorRecord | undefined;
  readonly records: (revision: string, designations: readonly string[]) => readonly IsolatorRecord[];
  readonly activeRevision: (catalog: string) => string | undefined;
}

/** The catalogues in a database: named lists of immutable revisions, one of them active. */
export function openRevisions(database: Database, now: () => Date): Revisions {
  const hasRevision = database.prepare<[string], 1>("SELECT 1 FROM revisions WHERE id = ?").pluck();
  const addRevision = database.prepare(
    "INSERT INTO revisions (id, created_at, count, note) VALUES (?, ?, ?, ?)",
  );
  const addIsolator = database.prepare(
    "INSERT INTO isolators (revision, designation, record) VALUES (?, ?, ?)",
  );
  const addCatalog = database.prepare("INSERT OR IGNORE INTO catalogs (name) VALUES (?)");
  const addToCatalog = database.prepare(
    "INSERT OR IGNORE INTO catalog_revisions (catalog, revision) VALUES (?, ?)",
  );
  const activate = database.prepare("UPDATE catalogs SET active_revision = ? WHERE name = ?");
  const active = database
    .prepare<[string], string | null>("SELECT active_revision FROM catalogs WHERE name = ?")
    .pluck();
  const recordOf = database
    .prepare<[string, string], string>("SELECT record FROM isolators WHERE revision = ? AND designation = ?")
    .pluck();
  const recordsOf = database
    .prepare<[string], string>("SELECT record FROM isolators WHERE revision = ?")
    .pluck();

  const importAll = database.transaction(
    (catalog: string, records: readonly IsolatorRecord[], options: ImportOptions): Imported => {
      const revision = revisionId(records);
      const isNew = hasRevision.get(revision) === undefined;
      if (isNew) {
        for (const record of records) addIsolator.run(revision, record.designation, JSON.stringify(record));
        addRevision.run(revision, now().toISOString(), records.length, options.note ?? null);
      }
      addCatalog.run(catalog);
      addToCatalog.run(catalog, revision);
      if (options.activate) activate.run(revision, catalog);
      return { revision, count: records.length, isNew };
    },
  );

  const parse = (text: string): IsolatorRecord => JSON.parse(text) as IsolatorRecord;
  const snapshots = new Map<string, Snapshot>();

  return {
    importRevision(catalog, records, options) {
      try {
        return importAll(catalog, records, options);
      } catch (error) {
        const why = error instanceof Error ? error.message : String(error);
        throw new CatalogError("refused_import", `nothing was imported into "${catalog}": ${why}`, error);
      }
    },
    activeRevision: (catalog) => active.get(catalog) ?? undefined,
    snapshot(catalog) {
      const revision = active.get(catalog);
      if (revision === undefined || revision === null)
        throw new CatalogError("unknown_catalog", `there is no catalogue called "${catalog}"`);
      const kept = snapshots.get(catalog);
      if (kept?.revision === revision) return kept;
      const isolators = recordsOf.all(revision).map((text) => isolatorFromRecord(parse(text)));
      const snapshot = { catalog, revision, columns: columnsOf(isolators) };
      snapshots.set(catalog, snapshot);
      return snapshot;
    },
    record(revision, designation) {
      const text = recordOf.get(revision, designation);
      return text === undefined ? undefined : parse(text);
    },
    records: (revision, designations) =>
      designations.flatMap((designation) => {
        const text = recordOf.get(revision, designation);
        return text === undefined ? [] : [parse(text)];
      }),
  };
}
