import { footLoads } from "../dynamics/index.ts";
import type { Isolator, IsolatorColumns } from "../isolator/index.ts";
import type { Machine } from "../machine/index.ts";
import { arrangements, equallyLoaded } from "./arrange.ts";
import { type Evaluated, evaluate } from "./evaluate.ts";
import { firstFailure, GATES, type Gate } from "./gates.ts";
import { type NearMiss, nearMisses } from "./near-misses.ts";
import { type Needed, neededFor } from "./needed.ts";
import { type Option, rank } from "./rank.ts";
import type { Ranking, SelectionRequest } from "./request.ts";
import { overTarget, screen } from "./screen.ts";
import { siteGates } from "./site-gates.ts";
import { type TargetLine, targetLines } from "./target-lines.ts";

/** How much of the limit the screen lets by: what it keeps is evaluated exactly afterwards. */
const SCREEN_SLACK = 1.05;

export interface Counts {
  /** Isolators of the revision. */
  readonly examined: number;
  /** Isolators that some passing arrangement uses. */
  readonly passing: number;
  /** The others, each under the first gate that failed it. */
  readonly rejected: ReadonlyMap<Gate, number>;
  /** Passing arrangements. */
  readonly options: number;
}

export interface Selection {
  readonly needed: Needed | null;
  readonly counts: Counts;
  readonly rankedBy: Ranking;
  /** All that pass, best first. */
  readonly options: readonly Option[];
  readonly nearMisses: readonly NearMiss[];
}

/**
 * Ranks the arrangements of a catalogue's isolators that keep a machine's targets, and says why the others fail.
 *
 * Screen the catalogue by its columns, arrange the isolators of each series under the feet, evaluate, gate, rank,
 * explain. The same request on the same columns gives the same answer to the bit.
 * @throws {InputError} a machine its feet cannot carry
 */
export function select(request: SelectionRequest, columns: IsolatorColumns): Selection {
  const { machine, limits } = request;
  const loads = footLoads(machine);
  const asked = targetLines(request);
  const lines = holdsVertically(machine) ? asked : [];
  const sites = siteGates(request);
  const { isolators } = columns;

  // 0 while nothing has failed an isolator, else the place of the gate in GATES, from 1.
  const failedAt = new Uint8Array(isolators.length);
  isolators.forEach((isolator, row) => {
    const failed = sites.find((site) => !site.passes(isolator));
    if (failed) failedAt[row] = placeOf(failed.gate);
  });

  const passing: Evaluated[] = [];
  const failed: Evaluated[] = [];
  const used = new Set<Isolator>();
  const furthest = new Map<Isolator, number>();
  const standing = screened(columns, loads, machine.mass, lines).filter((row) => failedAt[row] === 0);
  for (const series of seriesOf(isolators, standing))
    for (const arrangement of arrangements(series, loads, limits.ratingsPerArrangement)) {
      const evaluated = evaluate(request, arrangement);
      const failure = firstFailure(evaluated.checks);
      (failure ? failed : passing).push(evaluated);
      for (const isolator of arrangement)
        if (failure) furthest.set(isolator, Math.max(furthest.get(isolator) ?? 0, placeOf(failure.gate)));
        else used.add(isolator);
    }

  const rejected: number[] = [];
  isolators.forEach((isolator, row) => {
    if (used.has(isolator)) return;
    rejected.push(row);
    if (failedAt[row] === 0)
      failedAt[row] =
        furthest.get(isolator) ?? placeOf(gateByColumns(columns, row, loads, machine.mass, lines));
  });
  const { options, rankedBy } = rank(passing, request.rankBy, limits.currency);
  return {
    needed: neededFor(asked),
    counts: {
      examined: isolators.length,
      passing: used.size,
      rejected: tally(failedAt),
      options: options.length,
    },
    rankedBy,
    options,
    nearMisses: nearMisses({ request, columns, rows: rejected, failed, sites, loads, lines }),
  };
}

/**
 * Whether no isolator can do better than its vertical transmissibility: in the vertical model, and where all that
 * acts is vertical and the isolators are upright, since the foot forces then sum to that at least.
 */
function holdsVertically({ rigid, feet, excitations }: Machine): boolean {
  if (rigid === null) return true;
  const upright = feet?.every(({ axis }) => axis[2] === 1) ?? true;
  return upright && excitations.every((e) => e.kind === "force" && Math.abs(e.direction[2]) === 1);
}

function placeOf(gate: Gate): number {
  return GATES.indexOf(gate) + 1;
}

/** Rows that bear some foot and, where all feet carry alike, come near the targets. */
function screened(
  columns: IsolatorColumns,
  loads: readonly number[],
  mass: number,
  lines: readonly TargetLine[],
): readonly number[] {
  const borne = loads.filter((load) => load > 0).sort((a, b) => a - b);
  const slack = lines.map(({ omega, limit }) => ({ omega, limit: limit * SCREEN_SLACK }));
  const task = equallyLoaded(loads)
    ? { loads: [loads[0] as number], mass: mass / loads.length, lines: slack }
    : { loads: borne, mass, lines: [] };
  return [...screen(columns, task)];
}

/** Rows grouped by series, in the order of their first row; an isolator without a series stands by itself. */
function seriesOf(isolators: readonly Isolator[], rows: readonly number[]): readonly (readonly Isolator[])[] {
  const groups = new Map<string | Isolator, Isolator[]>();
  for (const row of rows) {
    const isolator = isolators[row] as Isolator;
    const key = isolator.series ?? isolator;
    const group = groups.get(key);
    if (group) group.push(isolator);
    else groups.set(key, [isolator]);
  }
  return [...groups.values()];
}

/** The first gate that fails an isolator for which no arrangement was evaluated. */
function gateByColumns(
  columns: IsolatorColumns,
  row: number,
  loads: readonly number[],
  mass: number,
  lines: readonly TargetLine[],
): Gate {
  if (loads.some((load) => load > 0 && load < (columns.minLoad[row] as number))) return "underloaded";
  if (loads.some((load) => load > (columns.maxLoad[row] as number))) return "overloaded";
  if (loads.some((load) => load <= 0)) return "uplift";
  const load = loads[0] as number;
  const stated = lines.filter((line) => line.gate === "transmissibility");
  return overTarget(columns, row, load, mass / loads.length, stated) > 1
    ? "transmissibility"
    : "transmitted_force";
}

/** How many rows fell at each gate, in the order of the gates. */
function tally(failedAt: Uint8Array): ReadonlyMap<Gate, number> {
  const counts = new Uint32Array(GATES.length + 1);
  for (const place of failedAt) counts[place] = (counts[place] as number) + 1;
  return new Map(
    GATES.map((gate, i): [Gate, number] => [gate, counts[i + 1] as number]).filter(([, count]) => count > 0),
  );
}
