import { transmissibilityOf } from "../dynamics/index.ts";
import type { IsolatorColumns } from "../isolator/index.ts";

/** Transmissibility allowed at one excitation frequency, rad/s. */
export interface ScreenLine {
  readonly omega: number;
  readonly limit: number;
}

/** What an isolator must do alone, the same on every foot. */
export interface ScreenTask {
  /** Static load of one foot, N; an isolator must bear at least one of them. Ascending. */
  readonly loads: readonly number[];
  /** Share of the machine's mass on one foot, kg. */
  readonly mass: number;
  /** Empty: the load alone is judged. */
  readonly lines: readonly ScreenLine[];
}

/**
 * Rows of a catalogue whose isolator bears the load of some foot and, the same on every foot, keeps the vertical
 * transmissibility under the limit of every line.
 *
 * Rows are sorted by maximum load, so those too weak end at a bisection, and those too strong begin where even
 * the lightest minimum load of all that follow is above the load. A row is dropped at the first line it fails.
 * With unequal loads an isolator may do better in company than alone, so only loads are to be judged then.
 * @returns row numbers, ascending
 */
export function screen(columns: IsolatorColumns, { loads, mass, lines }: ScreenTask): Int32Array {
  const { maxLoad, minLoad, minLoadFrom } = columns;
  const lightest = loads[0] as number;
  const heaviest = loads[loads.length - 1] as number;
  const begin = lowerBound(maxLoad, lightest);
  const end = upperBound(minLoadFrom, heaviest);
  const rows = new Int32Array(Math.max(end - begin, 0));
  let kept = 0;
  if (lightest === heaviest) {
    for (let row = begin; row < end; row++) {
      rows[kept] = row;
      kept += (minLoad[row] as number) <= lightest ? 1 : 0;
    }
  } else {
    for (let row = begin; row < end; row++) {
      rows[kept] = row;
      kept += loads.some((load) => load >= (minLoad[row] as number) && load <= (maxLoad[row] as number))
        ? 1
        : 0;
    }
  }
  for (const line of binding(lines)) kept = keepUnder(columns, rows, kept, lightest, mass, line);
  return rows.subarray(0, kept);
}

/**
 * The lines that can decide, the most demanding first so that the others see few rows. Beyond √2 times its
 * natural frequency an isolator transmits the less the higher the frequency; so what holds a line under 1 holds
 * every higher one that allows as much.
 */
function binding(lines: readonly ScreenLine[]): readonly ScreenLine[] {
  /** Square of the natural frequency that an undamped isolator may have. */
  const allowed = ({ omega, limit }: ScreenLine): number => (omega * omega * limit) / (1 + limit);
  const implies = (a: ScreenLine, b: ScreenLine): boolean =>
    a.limit <= 1 && a.omega <= b.omega && a.limit <= b.limit;
  const decides = (line: ScreenLine, i: number): boolean =>
    !lines.some((other, j) => implies(other, line) && (j < i || !implies(line, other)));
  return lines.filter(decides).sort((a, b) => allowed(a) - allowed(b));
}

/**
 * How far an isolator, the same on every foot, is over the limits: the largest of transmissibility over limit.
 * @param load  N, mean static load of a foot
 * @param mass  kg, the machine's share on one foot
 * @returns     at most 1 when it holds every line; 0 without lines
 */
export function overTarget(
  columns: IsolatorColumns,
  row: number,
  load: number,
  mass: number,
  lines: readonly ScreenLine[],
): number {
  const k = (columns.stiffness[row] as number) + (columns.stiffnessPerLoad[row] as number) * load;
  const stiffness = { k, c: columns.dashpot[row] as number, h: (columns.lossFactor[row] as number) * k };
  return Math.max(0, ...lines.map(({ omega, limit }) => transmissibilityOf(mass, stiffness, omega) / limit));
}

/** Keeps, in place, the rows whose transmissibility at a line is within its limit; returns how many. */
function keepUnder(
  columns: IsolatorColumns,
  rows: Int32Array,
  count: number,
  load: number,
  mass: number,
  { omega, limit }: ScreenLine,
): number {
  const { stiffness, stiffnessPerLoad, dashpot, lossFactor } = columns;
  const inertia = mass * omega * omega;
  const limit2 = limit * limit;
  let kept = 0;
  for (let i = 0; i < count; i++) {
    const row = rows[i] as number;
    const k = (stiffness[row] as number) + (stiffnessPerLoad[row] as number) * load;
    const loss = (dashpot[row] as number) * omega + (lossFactor[row] as number) * k;
    const loss2 = loss * loss;
    const beyond = k - inertia;
    rows[kept] = row;
    kept += k * k + loss2 <= limit2 * (beyond * beyond + loss2) ? 1 : 0;
  }
  return kept;
}

/** First row whose value is not under `bound`; the column ascends. */
function lowerBound(column: Float64Array, bound: number): number {
  let lo = 0;
  let hi = column.length;
  while (lo < hi) {
    const middle = (lo + hi) >>> 1;
    if ((column[middle] as number) < bound) lo = middle + 1;
    else hi = middle;
  }
  return lo;
}

/** First row whose value is above `bound`; the column ascends. */
function upperBound(column: Float64Array, bound: number): number {
  let lo = 0;
  let hi = column.length;
  while (lo < hi) {
    const middle = (lo + hi) >>> 1;
    if ((column[middle] as number) <= bound) lo = middle + 1;
    else hi = middle;
  }
  return lo;
}
