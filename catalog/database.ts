import { closeSync, existsSync, mkdirSync, openSync, readSync, statSync } from "node:fs";
import { join } from "node:path";
import Database from "better-sqlite3";
import { CatalogError } from "./errors.ts";
import { APPLICATION_ID, migrate, SCHEMA_VERSION } from "./migrations.ts";

const FILE = "mountrank.db";
const BUSY_MS = 5000;

/**
 * Opens the file of a data folder, making both when they are absent, and brings it up to date.
 * @throws {CatalogError} a folder or file that cannot be used; it is left exactly as it was
 */
export function openDatabase(dataDir: string): Database.Database {
  makeFolder(dataDir);
  const path = join(dataDir, FILE);
  if (existsSync(path)) requireOurs(path);
  let database: Database.Database | undefined;
  try {
    database = new Database(path, { timeout: BUSY_MS });
    const version = database.pragma("user_version", { simple: true }) as number;
    requireKnownVersion(path, version);
    // Marked before WAL is on, and checkpointed once up to date, so that the head of the file itself tells what it
    // is whatever becomes of this process.
    if (version === 0) database.pragma(`application_id = ${APPLICATION_ID}`);
    database.pragma("journal_mode = WAL");
    // With WAL a power cut can lose the last answers kept, never the file.
    database.pragma("synchronous = NORMAL");
    database.pragma("foreign_keys = ON");
    migrate(database);
    if (version < SCHEMA_VERSION) database.pragma("wal_checkpoint(TRUNCATE)");
    return database;
  } catch (error) {
    database?.close();
    if (error instanceof CatalogError) throw error;
    throw new CatalogError("unusable_folder", `cannot open ${path}: ${reason(error)}`, error);
  }
}

function makeFolder(dataDir: string): void {
  if (existsSync(dataDir) && !statSync(dataDir).isDirectory())
    throw new CatalogError("unusable_folder", `${dataDir} is not a folder; set MOUNTRANK_DATA to one`);
  try {
    mkdirSync(dataDir, { recursive: true });
  } catch (error) {
    throw new CatalogError(
      "unusable_folder",
      `cannot make the data folder ${dataDir}: ${reason(error)}`,
      error,
    );
  }
}

const HEADER_BYTES = 100;
const MAGIC = "SQLite format 3\0";
const USER_VERSION_AT = 60;
const APPLICATION_ID_AT = 68;

/**
 * Looks at the head of an existing file and refuses one that is not ours or not ours to read. SQLite itself would
 * make side files and might recover; a file that is refused must stay exactly as it was.
 * Source of the layout: the SQLite database file format, section 1.3.
 */
function requireOurs(path: string): void {
  const header = readHeader(path);
  if (header.length === 0) return;
  if (header.length < HEADER_BYTES || header.toString("latin1", 0, MAGIC.length) !== MAGIC)
    throw new CatalogError("damaged_data", `${path} is not a database; move it away or set MOUNTRANK_DATA`);
  if (header.readUInt32BE(APPLICATION_ID_AT) !== APPLICATION_ID)
    throw new CatalogError(
      "foreign_data",
      `${path} belongs to another program; set MOUNTRANK_DATA to another folder`,
    );
  requireKnownVersion(path, header.readUInt32BE(USER_VERSION_AT));
}

function readHeader(path: string): Buffer {
  try {
    const file = openSync(path, "r");
    try {
      const header = Buffer.alloc(HEADER_BYTES);
      return header.subarray(0, readSync(file, header, 0, HEADER_BYTES, 0));
    } finally {
      closeSync(file);
    }
  } catch (error) {
    throw new CatalogError("unusable_folder", `cannot read ${path}: ${reason(error)}`, error);
  }
}

function requireKnownVersion(path: string, version: number): void {
  if (version > SCHEMA_VERSION)
    throw new CatalogError(
      "newer_data",
      `${path} was written by a newer version of mountrank (schema ${version}, this one knows ${SCHEMA_VERSION}); start that one`,
    );
}

function reason(error: unknown): string {
  return error instanceof Error ? error.message : String(error);
}
