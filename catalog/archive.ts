import type { Database } from "better-sqlite3";

/** An answer as it went out. */
export interface KeptAnswer {
  readonly answer: string;
  readonly catalog: string;
  readonly revision: string;
  /** ISO 8601 */
  readonly createdAt: string;
}

export interface Archive {
  /** Keeps an answer; one that is kept under the id already stays as it is. */
  readonly put: (entry: {
    readonly id: string;
    readonly answer: string;
    readonly catalog: string;
    readonly revision: string;
  }) => void;
  readonly get: (id: string) => KeptAnswer | undefined;
}

/** Answers held in memory: those asked again are mostly those just given. */
const RECENT = 64;

/** Old answers are cleared away once in so many puts, so that a put stays cheap. */
const CLEAR_EVERY = 64;

/**
 * The answers that were issued, on disk, at most `limit` of them (and the few that came since the last clearing),
 * the oldest going first.
 */
export function openArchive(database: Database, limit: number, now: () => Date): Archive {
  const insert = database.prepare(
    "INSERT OR IGNORE INTO selections (id, created_at, catalog, revision, answer) VALUES (?, ?, ?, ?, ?)",
  );
  const select = database.prepare<[string], KeptAnswer>(
    "SELECT answer, catalog, revision, created_at AS createdAt FROM selections WHERE id = ?",
  );
  // Places in the row of answers are given without gaps, so the newest `limit` are told by number.
  const clear = database.prepare("DELETE FROM selections WHERE seq <= (SELECT max(seq) FROM selections) - ?");
  let puts = 0;
  // A Map keeps its entries in the order they came, so its first is the oldest.
  const recent = new Map<string, KeptAnswer>();
  const remember = (id: string, kept: KeptAnswer): void => {
    recent.set(id, kept);
    if (recent.size > RECENT) recent.delete(recent.keys().next().value as string);
  };
  return {
    put({ id, answer, catalog, revision }) {
      insert.run(id, now().toISOString(), catalog, revision, answer);
      if (puts++ % CLEAR_EVERY === 0) clear.run(limit);
    },
    get(id) {
      const held = recent.get(id);
      if (held !== undefined) return held;
      const kept = select.get(id);
      if (kept !== undefined) remember(id, kept);
      return kept;
    },
  };
}
