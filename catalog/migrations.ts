import type { Database } from "better-sqlite3";

/** Marks a file as ours: the letters "mtrk". */
export const APPLICATION_ID = 0x6d74726b;

/**
 * The steps from an empty file to today's, each once and in order; `PRAGMA user_version` counts those done. A step
 * that has landed is never changed.
 */
const MIGRATIONS: readonly string[] = [
  `
  CREATE TABLE revisions (
    id          TEXT PRIMARY KEY,  -- digest of the records
    created_at  TEXT NOT NULL,
    count       INTEGER NOT NULL,
    note        TEXT
  ) STRICT, WITHOUT ROWID;

  CREATE TABLE catalogs (
    name             TEXT PRIMARY KEY,
    active_revision  TEXT REFERENCES revisions (id)
  ) STRICT, WITHOUT ROWID;

  CREATE TABLE catalog_revisions (
    catalog   TEXT NOT NULL REFERENCES catalogs (name),
    revision  TEXT NOT NULL REFERENCES revisions (id),
    PRIMARY KEY (catalog, revision)
  ) STRICT, WITHOUT ROWID;

  CREATE TABLE isolators (
    revision     TEXT NOT NULL REFERENCES revisions (id) DEFERRABLE INITIALLY DEFERRED,
    designation  TEXT NOT NULL,
    record       TEXT NOT NULL,  -- the record as JSON, as it was imported
    PRIMARY KEY (revision, designation)
  ) STRICT, WITHOUT ROWID;

  -- A revision is sealed once its row stands: its isolators come before it, in the same transaction.
  CREATE TRIGGER isolators_are_sealed BEFORE INSERT ON isolators
    WHEN EXISTS (SELECT 1 FROM revisions WHERE id = NEW.revision)
    BEGIN SELECT RAISE(ABORT, 'a revision is never added to'); END;
  CREATE TRIGGER isolators_never_change BEFORE UPDATE ON isolators
    BEGIN SELECT RAISE(ABORT, 'a revision is never changed'); END;
  CREATE TRIGGER isolators_stay BEFORE DELETE ON isolators
    WHEN EXISTS (SELECT 1 FROM revisions WHERE id = OLD.revision)
    BEGIN SELECT RAISE(ABORT, 'an isolator leaves only with its revision'); END;

  CREATE TABLE selections (
    seq         INTEGER PRIMARY KEY,
    id          TEXT NOT NULL UNIQUE,
    created_at  TEXT NOT NULL,
    catalog     TEXT NOT NULL,
    revision    TEXT NOT NULL,
    answer      TEXT NOT NULL
  ) STRICT;
  `,
];

export const SCHEMA_VERSION = MIGRATIONS.length;

/** Brings a file up to date, each step whole or not at all. */
export function migrate(database: Database): void {
  const done = database.pragma("user_version", { simple: true }) as number;
  MIGRATIONS.forEach((sql, step) => {
    if (step < done) return;
    database.transaction(() => {
      database.exec(sql);
      database.pragma(`user_version = ${step + 1}`);
    })();
  });
}
