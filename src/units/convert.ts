import { DOCUMENTED_UNIT, SI_UNIT } from "./dimensions.ts";
import { type Dimension, UNITS, type UnitSymbol, unitsOf } from "./table.ts";
import { convert, type Unit } from "./unit.ts";

interface Pair {
  readonly unit: Unit;
  /** The SI unit of its dimension. */
  readonly si: Unit;
}

const DIMENSIONS = Object.keys(UNITS) as Dimension[];

const BY_SYMBOL: ReadonlyMap<string, Pair> = new Map(
  DIMENSIONS.flatMap((dimension) => {
    const units = unitsOf(dimension);
    const si = units[SI_UNIT[dimension]] as Unit;
    return Object.entries(units).map(([symbol, unit]): [string, Pair] => [symbol, { unit, si }]);
  }),
);

/** Every symbol is in the map: its type is made from the same table. */
const pairOf = (symbol: UnitSymbol): Pair => BY_SYMBOL.get(symbol) as Pair;

/**
 * A value in a unit, in the SI unit of its dimension (rad/s for rpm and Hz, K for temperatures).
 * @example ofUnit(25.4, "mm") // 0.0254, in m
 */
export function ofUnit(value: number, unit: UnitSymbol): number {
  const pair = pairOf(unit);
  return convert(value, pair.unit, pair.si);
}

/**
 * An SI value in a unit of its dimension.
 * @example inUnit(0.0214, "mm") // 21.4
 */
export function inUnit(si: number, unit: UnitSymbol): number {
  const pair = pairOf(unit);
  return convert(si, pair.si, pair.unit);
}

/**
 * A value in the documented unit of a dimension, in its SI unit: rpm and Hz to rad/s, °C to K, g mm to kg m.
 * @example toSI(20, "temperature") // 293.15, in K
 */
export function toSI(value: number, dimension: Dimension): number {
  return ofUnit(value, DOCUMENTED_UNIT[dimension]);
}

/** An SI value in the documented unit of a dimension: the way back of `toSI`. */
export function fromSI(si: number, dimension: Dimension): number {
  return inUnit(si, DOCUMENTED_UNIT[dimension]);
}
