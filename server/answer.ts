import { CatalogError, type Snapshot, type Store } from "../catalog/index.ts";
import { InputError } from "../src/errors/index.ts";
import { type Selection, select } from "../src/selection/index.ts";
import { offsetOf } from "./presenters/cursor.ts";
import { type Origin, presentSelection, selectionId } from "./presenters/selection.ts";
import type { SelectionBody } from "./schemas/selection.ts";
import { type AskedSelection, understand } from "./schemas/to-selection.ts";

/** What answers need of the context of a request. */
interface Ground {
  readonly store: Store;
  readonly engineVersion: string;
}

/** A question that has been understood, with the catalogue revision it is asked of; nothing is computed yet. */
export interface Question {
  readonly id: string;
  readonly asked: AskedSelection;
  readonly snapshot: Snapshot;
  readonly origin: Origin;
}

/**
 * Understands a selection and settles which revision answers it.
 * @throws {InputError} fields that do not fit each other, or an unknown catalogue
 */
export function questionOf({ store, engineVersion }: Ground, body: SelectionBody): Question {
  const asked = understand(body);
  const snapshot = snapshotOf(store, asked.normalised.catalog);
  const origin = { catalog: snapshot.catalog, revision: snapshot.revision, engineVersion };
  return { id: selectionId(asked.normalised, origin), asked, snapshot, origin };
}

/** The active revision of a catalogue. */
export function snapshotOf(store: Store, catalog: string): Snapshot {
  try {
    return store.snapshot(catalog);
  } catch (error) {
    if (error instanceof CatalogError && error.code === "unknown_catalog")
      throw InputError.at("/catalog", `there is no catalogue called "${catalog}"`);
    throw error;
  }
}

export function compute({ asked, snapshot }: Question): Selection {
  return select(asked.request, snapshot.columns);
}

/**
 * The answer to a question as JSON text: as issued before when it has been asked before, else computed and kept.
 * @throws {ProblemError} a cursor that is stale
 */
export function answerOf({ store }: Ground, question: Question): string {
  const { id, asked, origin } = question;
  const kept = store.archive.get(id);
  if (kept !== undefined) return kept.answer;
  const offset = offsetOf(asked.normalised.cursor, asked.normalised, origin);
  const answer = JSON.stringify(presentSelection(id, asked, compute(question), origin, offset));
  store.archive.put({ id, catalog: origin.catalog, revision: origin.revision, answer });
  return answer;
}
