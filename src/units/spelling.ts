import { DIMENSIONS } from "./dimensions.ts";
import { type Dimension, unitsOf } from "./table.ts";
import type { Unit } from "./unit.ts";

interface Spellings {
  /** As written in the table, in plain form, and in plain form with its parts joined ("gmm"). */
  readonly exact: ReadonlyMap<string, Unit>;
  /** Spellings by their lower case, for RPM and KG. */
  readonly folded: ReadonlyMap<string, readonly string[]>;
}

const SPELLINGS = new Map((Object.keys(DIMENSIONS) as Dimension[]).map((d) => [d, spellingsOf(d)]));

/** The unit of a dimension that a text names, if any. */
export function unitNamed(text: string, dimension: Dimension): Unit | undefined {
  const { exact, folded } = SPELLINGS.get(dimension) as Spellings;
  const asWritten = exact.get(text);
  if (asWritten !== undefined) return asWritten;
  const name = plain(text);
  const inPlainForm = exact.get(name);
  if (inPlainForm !== undefined) return inPlainForm;
  const candidates = (folded.get(name.toLowerCase()) ?? []).filter((spelling) => mayBe(name, spelling));
  const units = new Set(candidates.map((spelling) => exact.get(spelling)));
  return units.size === 1 ? [...units][0] : undefined;
}

/** The dimension of which a text names a unit, if any. */
export function dimensionNamed(text: string): Dimension | undefined {
  return [...SPELLINGS.keys()].find((dimension) => unitNamed(text, dimension) !== undefined);
}

/** The spelling that a text most likely meant: another case of it, or one slip of the pen away; or none. */
export function nearestSpelling(text: string, dimension: Dimension): string | undefined {
  const name = plain(text).toLowerCase();
  const { folded } = SPELLINGS.get(dimension) as Spellings;
  const near = folded.has(name) ? name : [...folded.keys()].find((spelling) => oneSlip(name, spelling));
  return near === undefined ? undefined : folded.get(near)?.[0];
}

function spellingsOf(dimension: Dimension): Spellings {
  const exact = new Map<string, Unit>();
  const folded = new Map<string, string[]>();
  for (const [symbol, unit] of Object.entries(unitsOf(dimension)))
    for (const name of [symbol, ...unit.aliases])
      for (const spelling of new Set([name, plain(name), plain(name).replaceAll("·", "")])) {
        exact.set(spelling, unit);
        const lower = spelling.toLowerCase();
        folded.set(lower, [...(folded.get(lower) ?? []), spelling]);
      }
  return { exact, folded };
}

/**
 * A spelling with the freedoms of print taken out: signs of multiplication and spaces become one `·`, powers
 * plain digits. The hyphen of "lbf-in" is such a sign, that of "min-1" is not.
 */
function plain(text: string): string {
  return text
    .normalize("NFKC")
    .replaceAll("μ", "u")
    .replaceAll("−", "-")
    .replaceAll("^", "")
    .replaceAll(/[\s·⋅•×*.]+|-(?!\d)/g, "·")
    .replaceAll(/·?([/()])·?/g, "$1")
    .replaceAll(/^·|·$/g, "");
}

/** Case is forgiven unless it tells milli from mega: a small m is never M, and M is m only where all is in capitals. */
function mayBe(written: string, spelling: string): boolean {
  const capitals = written === written.toUpperCase();
  return [...written].every((letter, i) => {
    if (letter === "m") return spelling[i] !== "M";
    return letter !== "M" || capitals || spelling[i] !== "m";
  });
}

/** Whether one letter too many, too few or wrong tells two words apart; or none does. */
function oneSlip(a: string, b: string): boolean {
  if (Math.abs(a.length - b.length) > 1 || Math.max(a.length, b.length) < 2) return false;
  let i = 0;
  while (i < a.length && a[i] === b[i]) i++;
  const rest = (word: string, skipped: number): string => word.slice(i + skipped);
  return rest(a, 1) === rest(b, 1) || rest(a, 1) === rest(b, 0) || rest(a, 0) === rest(b, 1);
}
