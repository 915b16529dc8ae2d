import { type Archive, openArchive } from "./archive.ts";
import { openDatabase } from "./database.ts";
import { openRevisions, type Revisions, revisionId } from "./revisions.ts";

/** The data of one service: its catalogues and the answers it gave. */
export interface Store extends Revisions {
  readonly archive: Archive;
  /** Brings the demo catalogue in where its present form is not there yet; leaves other catalogues alone. */
  readonly ensureDemo: () => Promise<void>;
  /** Throws when the file cannot be read. */
  readonly check: () => void;
  readonly close: () => void;
}

export interface StoreOptions {
  /** Answers kept at most. */
  readonly archiveLimit?: number;
  readonly now?: () => Date;
}

const DEFAULT_ARCHIVE_LIMIT = 10_000;
/** The catalogue that answers when none is named. */
export const DEFAULT_CATALOG = "demo";

/**
 * Opens the data folder, making it when it is absent.
 * @throws {CatalogError} a folder that cannot be used, left exactly as it was
 */
export function openStore(dataDir: string, options: StoreOptions = {}): Store {
  const { archiveLimit = DEFAULT_ARCHIVE_LIMIT, now = () => new Date() } = options;
  const database = openDatabase(dataDir);
  const revisions = openRevisions(database, now);
  return {
    ...revisions,
    archive: openArchive(database, archiveLimit, now),
    async ensureDemo() {
      const { demoRecords } = await import("./demo/index.ts");
      const records = demoRecords();
      if (revisions.activeRevision(DEFAULT_CATALOG) !== revisionId(records))
        revisions.importRevision(DEFAULT_CATALOG, records, {
          activate: true,
          note: "invented for demonstration",
        });
    },
    check() {
      database.prepare("SELECT count(*) FROM catalogs").get();
    },
    close() {
      database.close();
    },
  };
}
