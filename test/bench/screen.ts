import type { IsolatorColumns } from "../../src/isolator/index.ts";
import { screen } from "../../src/selection/index.ts";
import { medians, print } from "./measure.ts";

const COUNT = 100_000;
const G = 9.80665;

/** A catalogue of invented numbers: rated loads spread evenly in the logarithm, as real lists are. */
function columns(): IsolatorColumns {
  const random = mulberry(20_261_201);
  const between = (lo: number, hi: number): number => lo * (hi / lo) ** random();
  const rows = Array.from({ length: COUNT }, () => {
    const max = between(20, 60_000);
    const deflection = between(0.001, 0.1);
    const viscous = random() < 0.5;
    const k = max / deflection;
    return {
      max,
      min: max * (0.1 + 0.3 * random()),
      k,
      c: viscous ? 2 * between(0.003, 0.1) * Math.sqrt((k * max) / G) : 0,
      eta: viscous ? 0 : between(0.02, 0.3),
    };
  }).sort((a, b) => a.max - b.max);
  const column = (of: (row: (typeof rows)[number]) => number): Float64Array => Float64Array.from(rows, of);
  const minLoad = column((row) => row.min);
  const minLoadFrom = minLoad.slice();
  for (let i = COUNT - 2; i >= 0; i--)
    minLoadFrom[i] = Math.min(minLoadFrom[i] as number, minLoadFrom[i + 1] as number);
  return {
    isolators: [],
    maxLoad: column((row) => row.max),
    minLoad,
    minLoadFrom,
    stiffness: column((row) => row.k),
    stiffnessPerLoad: new Float64Array(COUNT),
    dashpot: column((row) => row.c),
    lossFactor: column((row) => row.eta),
  };
}

/** A small seeded generator (mulberry32), so that every run screens the same catalogue. */
function mulberry(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32;
  };
}

/** The yardstick: summing five columns of the same length, as anyone would write it. */
function sumOfFive(parts: readonly Float64Array[]): number {
  let sum = 0;
  for (const part of parts) for (let i = 0; i < part.length; i++) sum += part[i] as number;
  return sum;
}

export function benchScreen(): void {
  const all = columns();
  const five = [all.maxLoad, all.minLoad, all.stiffness, all.dashpot, all.lossFactor];
  const mass = 850 / 4;
  const task = (...lines: (readonly [rpm: number, limit: number])[]) => ({
    loads: [mass * G],
    mass,
    lines: lines.map(([rpm, limit]) => ({ omega: (rpm * Math.PI) / 30, limit })),
  });
  const one = task([1180, 0.08]);
  const three = task([1180, 0.08], [2360, 0.08], [3540, 0.08]);
  // A force target under an unbalance: the limit falls as the force grows, and every line decides.
  const falling = task([1180, 0.08], [2360, 0.02], [3540, 0.009]);
  let kept = 0;
  const [sum, atOne, atThree, atFalling] = medians([
    () => sumOfFive(five),
    () => {
      kept = screen(all, one).length;
    },
    () => screen(all, three).length,
    () => screen(all, falling).length,
  ]) as [number, number, number, number];
  print(`Screening ${COUNT} isolators (${kept} pass at one frequency)`, [
    { name: "sum of five float64 columns", median: sum, ratio: null, goal: "" },
    { name: "screen, one frequency", median: atOne, ratio: atOne / sum, goal: "goal ≤ 1.2× the sum" },
    {
      name: "screen, three frequencies, one limit",
      median: atThree,
      ratio: atThree / sum,
      goal: "no slower",
    },
    {
      name: "screen, three frequencies, falling limits",
      median: atFalling,
      ratio: atFalling / sum,
      goal: "no slower",
    },
  ]);
}
