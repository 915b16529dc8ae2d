import { DEFAULT_CATALOG } from "../../catalog/index.ts";
import { InputError } from "../../src/errors/index.ts";
import type { SelectionRequest } from "../../src/selection/index.ts";
import { toSI } from "../../src/units/index.ts";
import type { SelectionBody } from "./selection.ts";
import { machineAssumptions, toMachine, withMachineDefaults } from "./to-machine.ts";

type Target = NonNullable<SelectionBody["target"]>;

const DEFAULT_TRANSMISSIBILITY = 0.1;
const DEFAULT_RATINGS = 2;
const DEFAULT_PAGE = 10;

/** A selection as it was understood. */
export interface AskedSelection {
  readonly request: SelectionRequest;
  /** The request with its defaults, plain numbers in the documented units: posted again, it asks the same. */
  readonly normalised: ReturnType<typeof normalise>;
  readonly assumptions: readonly string[];
}

/**
 * Understands the body of a selection: fills in what is silent and makes domain objects of it.
 * @throws {InputError} fields that do not fit each other
 */
export function understand(body: SelectionBody): AskedSelection {
  const normalised = normalise(body);
  const { environment, target, limits } = normalised;
  if (target.transmitted_force !== undefined && body.excitation === undefined)
    throw InputError.at(
      "/target/transmitted_force",
      "cannot be judged without an excitation; state what shakes the machine",
    );
  const optional = <T>(value: T | undefined): T | null => value ?? null;
  const metres = (value: number | undefined): number | null =>
    value === undefined ? null : toSI(value, "length");
  const machine = toMachine(normalised);
  return {
    normalised,
    assumptions: [...machineAssumptions(body, machine), ...selectionAssumptions(body)],
    request: {
      machine,
      mounting: normalised.mounting,
      environment: {
        temperature: temperatureOf(environment.temperature),
        exposures: environment.exposures ?? [],
        captive: environment.captive ?? false,
      },
      target: toTarget(target),
      limits: {
        families: optional(limits.families),
        price: optional(limits.price),
        currency: optional(limits.currency),
        freeHeight: metres(limits.free_height),
        staticDeflection: metres(limits.static_deflection),
        leadTimeDays: optional(limits.lead_time_days),
        levelness: metres(limits.levelness),
        ratingsPerArrangement: limits.ratings_per_arrangement,
      },
      rankBy: optional(body.rank_by),
    },
  };
}

/** The targets of a request in SI units. */
export function toTarget(target: Target): SelectionRequest["target"] {
  return {
    transmissibility: transmissibilityOf(target),
    transmittedForce: target.transmitted_force === undefined ? null : toSI(target.transmitted_force, "force"),
    judgedOn: target.judged_on ?? "foot_sum",
  };
}

/** The transmissibility that a target allows, whether stated as such, as an efficiency in per cent, or both. */
function transmissibilityOf(target: Target): number | null {
  const { transmissibility, isolation_efficiency: efficiency } = target;
  if (efficiency === undefined) return transmissibility ?? null;
  return Math.min(transmissibility ?? Number.POSITIVE_INFINITY, (100 - efficiency) / 100);
}

function temperatureOf(site: { min?: number | undefined; max?: number | undefined } | undefined) {
  const min = site?.min ?? site?.max;
  const max = site?.max ?? site?.min;
  if (min === undefined || max === undefined) return null;
  if (max < min) throw InputError.at("/environment/temperature/max", "is below the minimum");
  return { min: toSI(min, "temperature"), max: toSI(max, "temperature") };
}

function normalise(body: SelectionBody) {
  const limits = body.limits ?? {};
  return {
    ...withMachineDefaults(body),
    mounting: body.mounting ?? ("floor" as const),
    environment: body.environment ?? {},
    target: statesTarget(body)
      ? { ...body.target }
      : { ...body.target, transmissibility: DEFAULT_TRANSMISSIBILITY },
    limits: { ...limits, ratings_per_arrangement: limits.ratings_per_arrangement ?? DEFAULT_RATINGS },
    catalog: body.catalog ?? DEFAULT_CATALOG,
    limit: body.limit ?? DEFAULT_PAGE,
  };
}

function statesTarget({ target }: SelectionBody): boolean {
  return (
    target?.transmissibility !== undefined ||
    target?.isolation_efficiency !== undefined ||
    target?.transmitted_force !== undefined
  );
}

function selectionAssumptions(body: SelectionBody): readonly string[] {
  const assumed: [boolean, string][] = [
    [!statesTarget(body), `Target: transmissibility at most ${DEFAULT_TRANSMISSIBILITY}.`],
    [body.mounting === undefined, "The machine stands on the floor."],
  ];
  return assumed.filter(([holds]) => holds).map(([, text]) => text);
}
