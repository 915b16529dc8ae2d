import type { Isolator, IsolatorColumns } from "../isolator/index.ts";
import { STANDARD_GRAVITY } from "../units/index.ts";
import { type Evaluated, evaluate } from "./evaluate.ts";
import type { Check, Gate } from "./gates.ts";
import type { SelectionRequest } from "./request.ts";
import { overTarget } from "./screen.ts";
import type { SiteGate } from "./site-gates.ts";
import type { TargetLine } from "./target-lines.ts";

/** An isolator, or several in company, that one number alone kept from passing. */
export interface NearMiss {
  readonly designation: string;
  readonly gate: Gate;
  readonly value: number;
  readonly limit: number;
}

/** How far beyond a limit is still near. */
const NEAR = 1.5;
const SHOWN = 5;
/** Full evaluations spent on finding them. */
const TRIED = 60;

/** How far a failed check missed, as a ratio above 1; Infinity where no number tells. */
function missOf({ value, limit }: Check): number {
  if (value === null || limit === null || value <= 0 || limit <= 0) return Number.POSITIVE_INFINITY;
  return Math.max(value / limit, limit / value);
}

function nearMiss(
  designation: string,
  checks: readonly Check[],
): (NearMiss & { readonly miss: number }) | undefined {
  const failures = checks.filter((check) => !check.passed);
  const [failed] = failures;
  // Price is judged twice, by the record and at the end: it is one gate all the same.
  if (failed === undefined || failures.some((other) => other.gate !== failed.gate)) return undefined;
  const { gate, value, limit } = failed;
  const miss = missOf(failed);
  if (value === null || limit === null || miss > NEAR) return undefined;
  return { designation, gate, value, limit, miss };
}

/** What near misses are looked for among. */
export interface Rejects {
  readonly request: SelectionRequest;
  readonly columns: IsolatorColumns;
  /** Rows that no passing arrangement uses. */
  readonly rows: readonly number[];
  /** Arrangements that were evaluated and failed. */
  readonly failed: readonly Evaluated[];
  readonly sites: readonly SiteGate[];
  readonly loads: readonly number[];
  readonly lines: readonly TargetLine[];
}

/**
 * The rejects that failed one gate alone, by the smallest share of its limit. Each is evaluated in full with the
 * failed gate left open, so that a near miss is one that changing that number would make pass.
 */
export function nearMisses(rejects: Rejects): readonly NearMiss[] {
  const { request, columns, rows, failed, sites, loads } = rejects;
  const found = new Map<string, NearMiss & { readonly miss: number }>();
  const keep = (miss: ReturnType<typeof nearMiss>): void => {
    if (miss && miss.miss < (found.get(miss.designation)?.miss ?? Infinity))
      found.set(miss.designation, miss);
  };
  for (const { arrangement, checks } of failed)
    keep(nearMiss([...new Set(arrangement.map((i) => i.designation))].join(" + "), checks));

  const heaviest = Math.max(...loads);
  const lightest = Math.min(...loads);
  const candidates = rows
    .map((row) => ({
      isolator: columns.isolators[row] as Isolator,
      miss: quickMiss(rejects, row, heaviest, lightest),
    }))
    .filter(({ miss, isolator }) => miss <= NEAR && !found.has(isolator.designation))
    .sort((a, b) => a.miss - b.miss)
    .slice(0, TRIED);
  for (const { isolator, miss } of candidates) {
    // Those that follow are farther off than what is found already.
    if ([...found.values()].filter((nearer) => nearer.miss <= miss).length >= SHOWN) break;
    const arrangement = loads.map(() => isolator);
    const { checks } = evaluate(request, arrangement);
    keep(nearMiss(isolator.designation, [...sites.map((site) => site.check(isolator)), ...checks]));
  }
  return [...found.values()]
    .sort((a, b) => a.miss - b.miss || (a.designation < b.designation ? -1 : 1))
    .slice(0, SHOWN)
    .map(({ miss: _, ...shown }) => shown);
}

/**
 * How far the isolator alone misses by its columns, when it misses one number only; else Infinity. The load, which
 * most miss by far, is looked at first.
 */
function quickMiss(
  { request, columns, sites, loads, lines }: Rejects,
  row: number,
  heaviest: number,
  lightest: number,
): number {
  const overload = heaviest / (columns.maxLoad[row] as number);
  const underload = (columns.minLoad[row] as number) / lightest;
  const misses = [overload, underload].filter((miss) => miss > 1);
  if (misses.length > 1 || overload > NEAR || underload > NEAR) return Number.POSITIVE_INFINITY;

  const isolator = columns.isolators[row] as Isolator;
  for (const site of sites) if (!site.passes(isolator)) misses.push(missOf(site.check(isolator)));
  if (misses.length > 1) return Number.POSITIVE_INFINITY;

  const mean = (request.machine.mass * STANDARD_GRAVITY) / loads.length;
  const over = overTarget(columns, row, mean, request.machine.mass / loads.length, lines);
  if (over > 1) misses.push(over);
  return misses.length > 1 ? Number.POSITIVE_INFINITY : Math.max(1, ...misses);
}
