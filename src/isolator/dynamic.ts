import { STANDARD_GRAVITY } from "../units/index.ts";
import type { FrequencyPoint, Isolator } from "./isolator.ts";
import { staticStiffness } from "./static.ts";

const MAX_ITERATIONS = 100;

/**
 * Dynamic over static stiffness κ at a frequency: constant, or from the table linear in log f and flat outside it.
 * The natural frequency of an air spring is a dynamic rating already: 1.
 * @param frequencyHz  Hz, > 0
 */
export function dynamicRatioAt({ axial, dynamicRatio }: Isolator, frequencyHz: number): number {
  if (axial.kind === "air") return 1;
  return typeof dynamicRatio === "number" ? dynamicRatio : interpolated(dynamicRatio, frequencyHz);
}

function interpolated(table: readonly FrequencyPoint[], frequencyHz: number): number {
  const next = table.findIndex(([f]) => f >= frequencyHz);
  const [f1, ratio1] = table[next === -1 ? table.length - 1 : next] as FrequencyPoint;
  if (next <= 0) return ratio1;
  const [f0, ratio0] = table[next - 1] as FrequencyPoint;
  return ratio0 + ((ratio1 - ratio0) * Math.log(frequencyHz / f0)) / Math.log(f1 / f0);
}

/**
 * Dynamic stiffness along the axis, κ(f) times the static tangent at the working load.
 * @param load         static load, N, > 0
 * @param frequencyHz  Hz, > 0
 * @returns            N/m
 */
export function dynamicStiffness(isolator: Isolator, load: number, frequencyHz: number): number {
  return dynamicRatioAt(isolator, frequencyHz) * staticStiffness(isolator, load);
}

/**
 * Natural frequency of the isolator under its rated load, fn = √(k_dyn·g/W)/2π; implicit, and found by iteration,
 * where κ depends on frequency.
 * @returns Hz
 */
export function ratedNaturalFrequency(isolator: Isolator): number {
  const { rated } = isolator.load;
  if (typeof isolator.dynamicRatio === "number")
    return Math.sqrt((dynamicStiffness(isolator, rated, 1) * STANDARD_GRAVITY) / rated) / (2 * Math.PI);
  let frequency = Math.sqrt((staticStiffness(isolator, rated) * STANDARD_GRAVITY) / rated) / (2 * Math.PI);
  for (let i = 0; i < MAX_ITERATIONS; i++) {
    const stiffness = dynamicStiffness(isolator, rated, frequency);
    const next = Math.sqrt((stiffness * STANDARD_GRAVITY) / rated) / (2 * Math.PI);
    if (Math.abs(next - frequency) <= 1e-14 * frequency) return next;
    frequency = next;
  }
  return frequency;
}

/**
 * Dashpot of a viscously damped isolator, fixed at its rated load: c = 2ζ·√(k_dyn·W/g) = 2ζ·W·ωn/g.
 * @returns N·s/m; 0 for structural damping
 */
export function dashpot(isolator: Isolator): number {
  const { damping, load } = isolator;
  if (damping.kind !== "viscous") return 0;
  return (2 * damping.ratio * load.rated * 2 * Math.PI * ratedNaturalFrequency(isolator)) / STANDARD_GRAVITY;
}

/** Loss factor η of a structurally damped isolator; 0 for viscous damping. */
export function lossFactor({ damping }: Isolator): number {
  return damping.kind === "structural" ? damping.lossFactor : 0;
}
