import { spawn } from "node:child_process";
import { createHash } from "node:crypto";
import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import Database from "better-sqlite3";
import { afterEach, beforeEach, describe, expect, test } from "vitest";
import { CatalogError, openStore, type Store } from "../../catalog/index.ts";
import type { IsolatorRecord } from "../../src/isolator/index.ts";

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "mountrank-store-"));
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const record = (i: number): IsolatorRecord => ({
  designation: `spring ${i}`,
  family: "open_spring",
  axial: { stiffness_n_per_mm: 98.1 },
  damping: { ratio: 0.01 },
  load_n: { min: 100, max: 1000 + i },
});
const records = (count: number): IsolatorRecord[] => Array.from({ length: count }, (_, i) => record(i));

function withStore<T>(use: (store: Store) => T, options = {}): T {
  const store = openStore(folder, options);
  try {
    return use(store);
  } finally {
    store.close();
  }
}

/** What every store must do, on a new file as on one that was opened before. */
function contract(open: <T>(use: (store: Store) => T) => T): void {
  test("gives records back exactly as they came", () => {
    open((store) => {
      const { revision } = store.importRevision("own", records(3), { activate: true });
      expect(store.record(revision, "spring 1")).toEqual(record(1));
      expect(store.record(revision, "spring 9")).toBeUndefined();
      expect(store.records(revision, ["spring 2", "spring 0"])).toEqual([record(2), record(0)]);
    });
  });

  test("answers from the active revision, as columns", () => {
    open((store) => {
      const first = store.importRevision("own", records(3), { activate: true });
      const kept = store.snapshot("own");
      store.importRevision("own", records(5), { activate: false });
      expect(store.snapshot("own")).toBe(kept);
      const second = store.importRevision("own", records(5), { activate: true });
      expect(store.snapshot("own").revision).toBe(second.revision);
      expect(store.snapshot("own").columns.isolators).toHaveLength(5);
      expect(kept.revision).toBe(first.revision);
      expect(kept.columns.isolators).toHaveLength(3);
    });
  });

  test("knows equal lists as one revision, whatever their order", () => {
    open((store) => {
      const first = store.importRevision("own", records(4), { activate: true });
      const again = store.importRevision("other", records(4).reverse(), { activate: true });
      expect(again).toEqual({ ...first, isNew: false });
    });
  });

  test("imports all or nothing", () => {
    open((store) => {
      const { revision } = store.importRevision("own", records(3), { activate: true });
      expect(() => store.importRevision("own", [...records(50), record(7)], { activate: true })).toThrow(
        CatalogError,
      );
      expect(store.snapshot("own").revision).toBe(revision);
    });
  });

  test("refuses a catalogue that is not there, by name", () => {
    open((store) => expect(() => store.snapshot("atlantis")).toThrow('no catalogue called "atlantis"'));
  });

  test("keeps answers byte for byte, the first under an id for good", () => {
    open((store) => {
      const answer = '{"x":0.1,"y":"Ø"}';
      store.archive.put({ id: "a", answer, catalog: "own", revision: "r" });
      store.archive.put({ id: "a", answer: "other", catalog: "own", revision: "r" });
      expect(store.archive.get("a")).toMatchObject({ answer, catalog: "own", revision: "r" });
      expect(store.archive.get("b")).toBeUndefined();
    });
  });
}

describe("a store on a new folder", () => contract(withStore));
describe("a store opened again", () => {
  contract((use) => {
    withStore((store) => store.importRevision("before", records(2), { activate: true }));
    return withStore((store) => {
      expect(store.snapshot("before").columns.isolators).toHaveLength(2);
      return use(store);
    });
  });
});

describe("the data folder", () => {
  test("keeps catalogues and answers from one start to the next", async () => {
    const store = openStore(folder);
    await store.ensureDemo();
    const { revision } = store.snapshot("demo");
    store.archive.put({ id: "a", answer: "{}", catalog: "demo", revision });
    store.close();
    const again = openStore(folder);
    await again.ensureDemo();
    expect(again.snapshot("demo").revision).toBe(revision);
    expect(again.archive.get("a")?.answer).toBe("{}");
    again.close();
  });

  test("holds one file, in WAL mode, with foreign keys on", () => {
    withStore(() => undefined);
    expect(readdirSync(folder)).toEqual(["mountrank.db"]);
    const database = new Database(join(folder, "mountrank.db"));
    expect(database.pragma("journal_mode", { simple: true })).toBe("wal");
    database.close();
  });

  test("may be open twice at once", () => {
    withStore((one) =>
      withStore((two) => {
        one.importRevision("own", records(2), { activate: true });
        expect(two.snapshot("own").columns.isolators).toHaveLength(2);
      }),
    );
  });

  test("bounds the answers it keeps, the oldest going first", () => {
    withStore(
      (store) => {
        for (let i = 0; i < 500; i++)
          store.archive.put({ id: `a${i}`, answer: "{}", catalog: "own", revision: "r" });
        expect(store.archive.get("a499")).toBeDefined();
        expect(store.archive.get("a390")).toBeDefined();
        expect(store.archive.get("a300")).toBeUndefined();
        expect(store.archive.get("a0")).toBeUndefined();
      },
      { archiveLimit: 100 },
    );
  });

  test("never lets a revision be changed, added to or taken from", () => {
    withStore((store) => store.importRevision("own", records(3), { activate: true }));
    const database = new Database(join(folder, "mountrank.db"));
    database.pragma("foreign_keys = ON");
    const revision = database.prepare("SELECT id FROM revisions").pluck().get();
    expect(() => database.prepare("UPDATE isolators SET record = '{}'").run()).toThrow("never changed");
    expect(() => database.prepare("DELETE FROM isolators").run()).toThrow("only with its revision");
    expect(() => database.prepare("INSERT INTO isolators VALUES (?, 'new', '{}')").run(revision)).toThrow(
      "never added to",
    );
    expect(() => database.prepare("DELETE FROM revisions").run()).toThrow("FOREIGN KEY");
    database.close();
  });
});

/** Names and digests of everything in a folder. */
function contents(of: string): string[] {
  return readdirSync(of).map((name) => {
    const path = join(of, name);
    return `${name} ${createHash("sha256").update(readFileSync(path)).digest("hex")}`;
  });
}

describe("a data folder that cannot be used is refused in one line and left as it was", () => {
  const refuses = (code: string): void => {
    const before = contents(folder);
    let caught: unknown;
    try {
      openStore(folder).close();
    } catch (error) {
      caught = error;
    }
    expect(caught).toBeInstanceOf(CatalogError);
    expect((caught as CatalogError).code).toBe(code);
    expect((caught as CatalogError).message).not.toContain("\n");
    expect((caught as CatalogError).message).toContain(folder);
    expect(contents(folder)).toEqual(before);
  };

  test("when the file is no database", () => {
    writeFileSync(join(folder, "mountrank.db"), "a shopping list: flour, yeast, salt\n".repeat(40));
    refuses("damaged_data");
  });

  test("when the file is a piece of a database", () => {
    withStore((store) => store.importRevision("own", records(3), { activate: true }));
    const whole = readFileSync(join(folder, "mountrank.db"));
    writeFileSync(join(folder, "mountrank.db"), whole.subarray(0, 60));
    refuses("damaged_data");
  });

  test("when the file belongs to another program", () => {
    const other = new Database(join(folder, "mountrank.db"));
    other.exec("CREATE TABLE recipes (name TEXT)");
    other.close();
    refuses("foreign_data");
  });

  test("when the file is newer than the program", () => {
    withStore(() => undefined);
    const database = new Database(join(folder, "mountrank.db"));
    database.pragma("user_version = 99");
    database.close();
    refuses("newer_data");
  });

  test("when a file stands where the folder should be", () => {
    const path = join(folder, "taken");
    writeFileSync(path, "x");
    expect(() => openStore(path)).toThrow("is not a folder");
    expect(readFileSync(path, "utf8")).toBe("x");
  });

  test("when a folder stands where the file should be", () => {
    mkdirSync(join(folder, "mountrank.db"));
    expect(() => openStore(folder)).toThrow(CatalogError);
    expect(readdirSync(folder)).toEqual(["mountrank.db"]);
  });
});

describe("a process killed while it writes", () => {
  const WRITER = `
    const { openStore } = await import(${JSON.stringify(new URL("../../catalog/index.ts", import.meta.url).href)});
    const store = openStore(process.argv[1]);
    for (let n = 0; ; n++) {
      const records = Array.from({ length: 200 }, (_, i) => ({ designation: "s" + i, family: "open_spring",
        axial: { stiffness_n_per_mm: n + 1 }, damping: { ratio: 0 }, load_n: { max: 1000 } }));
      store.importRevision("own", records, { activate: true });
      store.archive.put({ id: "a" + n, answer: "x".repeat(5000), catalog: "own", revision: "r" });
      if (n === 0) console.log("writing");
    }`;

  test("leaves whole revisions only, at any of a dozen moments", async () => {
    for (let round = 0; round < 12; round++) {
      await killedAfter(5 + 17 * round);
      const database = new Database(join(folder, "mountrank.db"));
      expect(database.pragma("integrity_check", { simple: true })).toBe("ok");
      expect(database.pragma("foreign_key_check")).toEqual([]);
      const partial = database
        .prepare(
          "SELECT revision FROM isolators GROUP BY revision HAVING count(*) <> 200 OR revision NOT IN (SELECT id FROM revisions)",
        )
        .all();
      expect(partial).toEqual([]);
      database.close();
      withStore((store) => expect(store.snapshot("own").columns.isolators).toHaveLength(200));
    }
  }, 60_000);

  function killedAfter(ms: number): Promise<void> {
    return new Promise((done, failed) => {
      const child = spawn(
        process.execPath,
        ["--import", "tsx", "--input-type=module", "-e", WRITER, folder],
        {
          stdio: ["ignore", "pipe", "inherit"],
        },
      );
      child.stdout.once("data", () => setTimeout(() => child.kill("SIGKILL"), ms));
      child.once("exit", (code) =>
        code === null ? done() : failed(new Error(`the writer ended with ${code}`)),
      );
    });
  }
});

test("a store that is closed leaves no side files behind", () => {
  withStore((store) => store.importRevision("own", records(2), { activate: true }));
  expect(existsSync(join(folder, "mountrank.db-wal"))).toBe(false);
});
