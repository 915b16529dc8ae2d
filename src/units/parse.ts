import { DIMENSIONS } from "./dimensions.ts";
import { dimensionNamed, nearestSpelling, unitNamed } from "./spelling.ts";
import { type Dimension, unitsOf } from "./table.ts";
import { convert, type Unit } from "./unit.ts";

export type Parsed =
  /** In the documented unit of the dimension asked for. */
  { readonly ok: true; readonly value: number } | { readonly ok: false; readonly reason: string };

const LONGEST = 64;

/** Anchored at the start only, so that there is nothing to try twice. */
const NUMBER = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?/;

/**
 * Reads a quantity such as "850 kg", "0.5 in", "19.7Hz" or "1180".
 *
 * @param text       a number and a unit, at most 64 characters; without a unit, the documented one is meant
 * @param dimension  what is expected
 * @returns          the value in the documented unit of the dimension, or why there is none, in one sentence
 * @example parseQuantity("19.7 Hz", "speed") // { ok: true, value: 1182 }, in rpm
 */
export function parseQuantity(text: string, dimension: Dimension): Parsed {
  if (text.length > LONGEST) return refuse(`is longer than the ${LONGEST} characters a quantity may have`);
  const trimmed = text.trim().replace(/^−/, "-");
  const { called, documented, example } = DIMENSIONS[dimension];
  if (trimmed === "") return refuse(`is empty; ${called} is expected, such as "${example}"`);

  const [digits] = NUMBER.exec(trimmed) ?? [""];
  const name = trimmed.slice(digits.length).trim();
  if (/\d,|^[+-]?,\d/.test(trimmed))
    return refuse(
      `"${text}" has a comma in the number; use a point for decimals and nothing between thousands`,
    );
  if (digits === "") return refuse(notAQuantity(text, dimension));

  const value = Number(digits);
  const to = unitsOf(dimension)[documented] as Unit;
  const from = name === "" ? to : unitNamed(name, dimension);
  if (from === undefined)
    return refuse(/^[\d/]/.test(name) ? notAQuantity(text, dimension) : notAUnit(name, dimension));
  const converted = convert(value, from, to);
  return Number.isFinite(converted)
    ? { ok: true, value: converted }
    : refuse(`"${text}" is too large to be a finite number`);
}

function refuse(reason: string): Parsed {
  return { ok: false, reason };
}

function notAQuantity(text: string, dimension: Dimension): string {
  const { called, example } = DIMENSIONS[dimension];
  return `"${text}" is not a number with a unit; ${called} is expected, such as "${example}"`;
}

/** Tons are told apart by a third of their value and more, so none is guessed. */
const TON = /^tons?$/i;

function notAUnit(name: string, dimension: Dimension): string {
  const { called, example } = DIMENSIONS[dimension];
  if (dimension === "mass" && TON.test(name))
    return `"${name}" may mean 1000 kg, 2000 lb or 2240 lb; write "t", "short ton" or "long ton"`;
  const other = dimensionNamed(name);
  if (other !== undefined)
    return `${name} is ${DIMENSIONS[other].called}; ${called} is expected, such as "${example}"`;
  const near = nearestSpelling(name, dimension);
  const known = Object.keys(unitsOf(dimension)).join(", ");
  return near === undefined
    ? `"${name}" is not a known unit; ${called} is given in one of ${known}`
    : `"${name}" is not a known unit; did you mean "${near}"?`;
}
