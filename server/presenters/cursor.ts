import { InputError } from "../../src/errors/index.ts";
import { ProblemError } from "../problems.ts";
import { digestOf } from "./digest.ts";

const MARK_LENGTH = 16;

/** What a page belongs to: a question and the revision that it was asked of. */
interface Paged {
  readonly revision: string;
}

/** A cursor is the offset of the next page and a mark of the question and revision it continues. */
export function cursorAt(offset: number, question: object, paged: Paged): string {
  return `${offset}.${markOf(question, paged)}`;
}

/**
 * The offset that a cursor stands for, 0 without one.
 * @throws {ProblemError} `invalid-input` when it is none of ours, `stale-cursor` when the question or the revision
 *                        has changed since
 */
export function offsetOf(cursor: string | null | undefined, question: object, paged: Paged): number {
  if (cursor === null || cursor === undefined) return 0;
  const [, offset, mark] = /^(\d{1,9})\.([0-9a-f]+)$/.exec(cursor) ?? [];
  if (offset === undefined || mark === undefined)
    throw InputError.at("/cursor", "is not a cursor of this service; leave it out for the first page");
  if (mark !== markOf(question, paged))
    throw new ProblemError(
      "stale-cursor",
      "the catalogue or the question has changed since this cursor was given; start again from the first page",
    );
  return Number(offset);
}

function markOf(question: object, { revision }: Paged): string {
  return digestOf([{ ...question, cursor: null }, revision], MARK_LENGTH);
}
