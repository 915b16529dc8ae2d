import { type Analysis, analyse, type FootState } from "../dynamics/index.ts";
import type { Arrangement } from "./arrange.ts";
import type { Check, Gate } from "./gates.ts";
import type { SelectionRequest } from "./request.ts";

/** A mode this close to an excitation line, relative to the line, is excited at resonance. */
const RESONANCE_BAND = 0.2;

/** An arrangement with what it does and how it was judged. */
export interface Evaluated {
  readonly arrangement: Arrangement;
  readonly analysis: Analysis;
  readonly checks: readonly Check[];
  /** The tightest of limit over value among the targets; `null` when a target could not be judged. */
  readonly margin: number | null;
  /** Of all isolators together; `null` when one is unpriced or currencies differ. */
  readonly price: number | null;
  readonly currency: string | null;
}

/**
 * Analyses an arrangement and judges it by every gate that depends on the load, in the order of the gates.
 * @throws {InputError} a centre of gravity outside the feet
 */
export function evaluate(request: SelectionRequest, arrangement: Arrangement): Evaluated {
  const analysis = analyse(request.machine, arrangement, request.target.judgedOn);
  const cost = priceOf(arrangement);
  const { price } = request.limits;
  const checks = judge(request, analysis, request.limits);
  return {
    arrangement,
    analysis,
    checks: price === null ? checks : [...checks, atMost("price", cost.price, price)],
    margin: marginOf(targetChecks(request, analysis)),
    ...cost,
  };
}

/** A machine and what must hold: what an arrangement is judged by, without catalogue, limits or ranking. */
export type EvaluationRequest = Pick<SelectionRequest, "machine" | "target">;

const NO_LIMITS = { levelness: null, staticDeflection: null };

/** The checks of an arrangement by what it does, in the order of the gates. */
export function judge(
  request: EvaluationRequest,
  analysis: Analysis,
  {
    levelness,
    staticDeflection,
  }: Pick<SelectionRequest["limits"], "levelness" | "staticDeflection"> = NO_LIMITS,
): readonly Check[] {
  const { min, max } = request.machine.speed;
  const checks: Check[] = [...loadChecks(analysis.feet), ...stabilityChecks(analysis)];
  if (levelness !== null) checks.push(atMost("levelness", analysis.levelness, levelness));
  if (staticDeflection !== null)
    checks.push(atMost("static_deflection", analysis.staticDeflection, staticDeflection));
  checks.push(...targetChecks(request, analysis));
  if (min === max) checks.push(resonanceCheck(request, analysis));
  return checks;
}

/** A value that must not exceed a limit; one that is not known fails. */
function atMost(gate: Gate, value: number | null, limit: number): Check {
  return { gate, value, limit, passed: value !== null && value <= limit };
}

/** Whether each foot bears enough, not too much, and at all; each reports the foot that is worst off. */
function loadChecks(feet: readonly FootState[]): readonly Check[] {
  const worst = (measure: (foot: FootState) => number): FootState =>
    feet.reduce((a, b) => (measure(b) > measure(a) ? b : a));
  const light = worst((foot) => foot.isolator.load.min - foot.load);
  const heavy = worst((foot) => foot.utilisation);
  const least = worst((foot) => -foot.load);
  const { min } = light.isolator.load;
  const { max } = heavy.isolator.load;
  return [
    { gate: "underloaded", value: light.load, limit: min, passed: light.load >= min || light.load <= 0 },
    { gate: "overloaded", value: heavy.load, limit: max, passed: heavy.load <= max },
    { gate: "uplift", value: least.load, limit: 0, passed: least.load > 0 },
  ];
}

/** Whether the machine stands of itself: the rocking stiffness left is at least what gravity takes. */
function stabilityChecks({ stability }: Analysis): readonly Check[] {
  if (stability === null) return [];
  const { stiffness, needed } = stability;
  return [
    {
      gate: "stability",
      value: stiffness,
      limit: needed,
      passed: stiffness !== null && stiffness > 0 && stiffness >= needed,
    },
  ];
}

function targetChecks({ target }: EvaluationRequest, { judged }: Analysis): readonly Check[] {
  const checks: Check[] = [];
  if (target.transmissibility !== null)
    checks.push(atMost("transmissibility", judged.transmissibility, target.transmissibility));
  if (target.transmittedForce !== null)
    checks.push(atMost("transmitted_force", judged.transmittedForce, target.transmittedForce));
  return checks;
}

function marginOf(targets: readonly Check[]): number | null {
  const margins = targets.map(({ value, limit }) =>
    value === null || limit === null ? null : limit / value,
  );
  return margins.includes(null) ? null : Math.min(...(margins as number[]));
}

/**
 * At a fixed speed no mode that amplifies what acts may lie close to an excitation line; reports the nearest such
 * mode, as mode over line, or where none amplifies the nearest of all.
 */
function resonanceCheck({ machine }: EvaluationRequest, { modes }: Analysis): Check {
  let nearest = Number.POSITIVE_INFINITY;
  let amplified = false;
  for (const { omega, ownTransmissibility } of modes ?? [])
    for (const [i, order] of machine.orders.entries()) {
      const ratio = omega / (order * machine.speed.max);
      const amplifies = (ownTransmissibility[i] ?? Number.POSITIVE_INFINITY) > 1;
      const nearer = Math.abs(ratio - 1) < Math.abs(nearest - 1);
      if (amplifies === amplified ? nearer : amplifies) {
        nearest = ratio;
        amplified = amplifies;
      }
    }
  return {
    gate: "resonance",
    value: Number.isFinite(nearest) ? nearest : null,
    limit: nearest < 1 ? 1 - RESONANCE_BAND : 1 + RESONANCE_BAND,
    passed: modes !== null && (!amplified || Math.abs(nearest - 1) >= RESONANCE_BAND),
  };
}

function priceOf(arrangement: Arrangement): {
  readonly price: number | null;
  readonly currency: string | null;
} {
  const currency = arrangement[0]?.currency ?? null;
  let price = 0;
  for (const isolator of arrangement) {
    if (isolator.price === null || isolator.currency !== currency) return { price: null, currency: null };
    price += isolator.price;
  }
  return { price, currency };
}
