import { checkRecord, DEFAULT_CATALOG } from "../../catalog/index.ts";
import { InputError } from "../../src/errors/index.ts";
import { type Isolator, isolatorFromRecord } from "../../src/isolator/index.ts";
import type { Machine } from "../../src/machine/index.ts";
import type { EvaluationRequest } from "../../src/selection/index.ts";
import { toSI } from "../../src/units/index.ts";
import type { EvaluationBody } from "./evaluation.ts";
import { machineAssumptions, toMachine, withMachineDefaults } from "./to-machine.ts";
import { toTarget } from "./to-selection.ts";

/** An evaluation as it was understood. */
export interface AskedEvaluation {
  readonly request: EvaluationRequest;
  readonly isolators: readonly Isolator[];
  readonly normalised: object;
  readonly assumptions: readonly string[];
  /** Frequencies of the response curve, rad/s; null when none is asked for. */
  readonly frequencies: Float64Array | null;
}

/**
 * Understands the body of an evaluation.
 * @param lookUp  finds an isolator of a catalogue by its designation
 * @throws {InputError} fields that do not fit each other, an unknown isolator, a foot named twice or not at all
 */
export function understandEvaluation(
  body: EvaluationBody,
  lookUp: (catalog: string, designation: string) => Isolator | undefined,
): AskedEvaluation {
  const normalised = { ...withMachineDefaults(body), catalog: body.catalog ?? DEFAULT_CATALOG };
  const machine = toMachine(normalised);
  if (body.target?.transmitted_force !== undefined && body.excitation === undefined)
    throw InputError.at(
      "/target/transmitted_force",
      "cannot be judged without an excitation; state what shakes the machine",
    );
  const isolators = perFoot(body, machine, (designation) => lookUp(normalised.catalog, designation));
  const air = isolators.filter(({ axial }) => axial.kind === "air").length;
  if (air > 0 && air < isolators.length)
    throw InputError.at("/isolators", "air springs, which are levelled, cannot be mixed with other kinds");
  return {
    request: { machine, target: toTarget(body.target ?? {}) },
    isolators,
    normalised,
    assumptions: machineAssumptions(body, machine),
    frequencies: frequenciesOf(body),
  };
}

function perFoot(
  { isolators: entries }: EvaluationBody,
  { footCount }: Machine,
  lookUp: (designation: string) => Isolator | undefined,
): readonly Isolator[] {
  const feet = new Map<number, Isolator>();
  for (const [i, entry] of entries.entries()) {
    const pointer = `/isolators/${i}`;
    const isolator =
      typeof entry.isolator === "string"
        ? lookUp(entry.isolator)
        : isolatorFromRecord(checkRecord(entry.isolator, `${pointer}/isolator`));
    if (isolator === undefined)
      throw InputError.at(`${pointer}/isolator`, `the catalogue has no isolator called "${entry.isolator}"`);
    const numbers =
      entry.feet === "all" ? Array.from({ length: footCount }, (_, foot) => foot + 1) : entry.feet;
    for (const foot of numbers) {
      if (foot > footCount)
        throw InputError.at(`${pointer}/feet`, `there is no foot ${foot}; the machine has ${footCount}`);
      if (feet.has(foot)) throw InputError.at(`${pointer}/feet`, `foot ${foot} has an isolator already`);
      feet.set(foot, isolator);
    }
  }
  return Array.from({ length: footCount }, (_, i) => {
    const isolator = feet.get(i + 1);
    if (isolator === undefined) throw InputError.at("/isolators", `foot ${i + 1} has no isolator`);
    return isolator;
  });
}

function frequenciesOf({ frequencies }: EvaluationBody): Float64Array | null {
  if (frequencies === undefined) return null;
  const { min, max, points } = frequencies;
  if (max <= min) throw InputError.at("/frequencies/max", `${max} Hz is not above the minimum of ${min} Hz`);
  const lowest = toSI(min, "frequency");
  return Float64Array.from({ length: points }, (_, i) => lowest * (max / min) ** (i / (points - 1)));
}
