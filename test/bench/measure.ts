import { performance } from "node:perf_hooks";

/** One line of the table: what was timed, its median in µs, and its ratio to what it is held against. */
export interface Row {
  readonly name: string;
  readonly median: number;
  readonly goal: string;
  readonly ratio: number | null;
}

const ROUNDS = 15;
/** Long enough for the clock and for a garbage collection to matter little. */
const ROUND_MS = 20;

/**
 * Times several pieces of work in turn, so that a drifting machine slows all alike.
 * @returns median time of one call of each, in µs
 */
export function medians(works: readonly (() => unknown)[]): readonly number[] {
  const calls = works.map((work) => callsPerRound(work));
  const times = works.map((): number[] => []);
  for (let round = 0; round < ROUNDS; round++)
    works.forEach((work, i) => {
      const n = calls[i] as number;
      const start = performance.now();
      for (let call = 0; call < n; call++) work();
      times[i]?.push(((performance.now() - start) * 1000) / n);
    });
  return times.map(median);
}

function callsPerRound(work: () => unknown): number {
  let n = 1;
  for (;;) {
    const start = performance.now();
    for (let call = 0; call < n; call++) work();
    const took = performance.now() - start;
    if (took >= ROUND_MS) return n;
    n = Math.max(n * 2, Math.ceil((n * ROUND_MS) / Math.max(took, 0.01)));
  }
}

export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length / 2;
  return sorted.length % 2 === 1
    ? (sorted[Math.floor(middle)] as number)
    : ((sorted[middle - 1] as number) + (sorted[middle] as number)) / 2;
}

export function print(title: string, rows: readonly Row[]): void {
  console.log(`\n${title}`);
  for (const { name, median: time, ratio, goal } of rows)
    console.log(
      `  ${name.padEnd(58)} ${time.toFixed(time < 100 ? 2 : 0).padStart(9)} µs  ${ratio === null ? "" : `${ratio.toFixed(2)}×`.padStart(8)}  ${goal}`,
    );
}
