import { cautionsFor, type Needed, type Selection } from "../../src/selection/index.ts";
import { inUnit } from "../../src/units/index.ts";
import type { AskedSelection } from "../schemas/to-selection.ts";
import { cursorAt } from "./cursor.ts";
import { digestOf } from "./digest.ts";
import { presentNearMiss, presentOption } from "./option.ts";

/** What an answer was computed from. */
export interface Origin {
  readonly catalog: string;
  readonly revision: string;
  readonly engineVersion: string;
}

/** Length of a selection's id in hexadecimal digits: 96 bits. */
const ID_LENGTH = 24;

/** The id of an answer: a digest of all that it depends on, so that equal questions have equal ids. */
export function selectionId(normalised: AskedSelection["normalised"], origin: Origin): string {
  return digestOf([normalised, origin.catalog, origin.revision, origin.engineVersion], ID_LENGTH);
}

/** One page of a selection as JSON; `offset` counts the options on the pages before. */
export function presentSelection(
  id: string,
  asked: AskedSelection,
  selection: Selection,
  origin: Origin,
  offset: number,
) {
  const { request, normalised, assumptions } = asked;
  const { counts, needed } = selection;
  const next = offset + normalised.limit;
  return {
    id,
    engine_version: origin.engineVersion,
    catalog: { name: origin.catalog, revision: origin.revision },
    request: normalised,
    assumptions: [...assumptions, ...rankingAssumption(asked, selection)],
    cautions: cautionsFor(request),
    needed: presentNeeded(needed),
    counts: {
      examined: counts.examined,
      passing: counts.passing,
      rejected: Object.fromEntries(counts.rejected),
      options: counts.options,
    },
    ranked_by: selection.rankedBy,
    options: selection.options.slice(offset, next).map((option) => presentOption(option, request)),
    near_misses: selection.nearMisses.map(presentNearMiss),
    next_cursor: next < selection.options.length ? cursorAt(next, normalised, origin) : null,
  };
}

export function presentNeeded(needed: Needed | null) {
  return (
    needed && {
      frequency_ratio: needed.frequencyRatio,
      natural_frequency_hz: inUnit(needed.naturalFrequency, "Hz"),
      static_deflection_mm: inUnit(needed.staticDeflection, "mm"),
    }
  );
}

export type PresentedSelection = ReturnType<typeof presentSelection>;

function rankingAssumption({ request }: AskedSelection, { rankedBy }: Selection): readonly string[] {
  if (request.rankBy !== null) return [];
  const why =
    rankedBy === "price"
      ? "every option is priced in one currency"
      : "not every option is priced in one currency";
  return [`Ranked by ${rankedBy}: ${why}.`];
}
