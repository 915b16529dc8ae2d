import type { Isolator } from "../isolator/index.ts";
import type { Check, Gate } from "./gates.ts";
import type { SelectionRequest } from "./request.ts";

/** A gate that an isolator passes or fails by its record alone, whatever stands on it. */
export interface SiteGate {
  readonly gate: Gate;
  readonly check: (isolator: Isolator) => Check;
  readonly passes: (isolator: Isolator) => boolean;
}

function judged(gate: Gate, passes: (isolator: Isolator) => boolean): SiteGate {
  return {
    gate,
    passes,
    check: (isolator) => ({ gate, passed: passes(isolator), value: null, limit: null }),
  };
}

/** A gate on one number of the record: a silent record fails where the number is limited. */
function limited(gate: Gate, limit: number, value: (isolator: Isolator) => number | null): SiteGate {
  const passes = (isolator: Isolator): boolean => {
    const actual = value(isolator);
    return actual !== null && actual <= limit;
  };
  return {
    gate,
    passes,
    check: (isolator) => ({ gate, passed: passes(isolator), value: value(isolator), limit }),
  };
}

/** Price of an isolator on every foot in the currency asked for; `null` when it is not priced so. */
function priceOnEveryFoot({ machine, limits }: SelectionRequest, isolator: Isolator): number | null {
  if (isolator.price === null || (limits.currency !== null && isolator.currency !== limits.currency))
    return null;
  return isolator.price * machine.footCount;
}

/** The gates that this request sets, in their order; those it is silent about are not among them. */
export function siteGates(request: SelectionRequest): readonly SiteGate[] {
  const { limits, environment, mounting } = request;
  const gates: SiteGate[] = [];
  const families = limits.families;
  if (families !== null) gates.push(judged("family", (isolator) => families.includes(isolator.family)));
  gates.push(
    judged("mounting", (isolator) => (isolator.family === "spring_hanger") === (mounting === "suspended")),
  );
  if (environment.captive) gates.push(judged("captive", (isolator) => isolator.captive));
  const site = environment.temperature;
  if (site !== null)
    gates.push(
      judged("temperature", ({ temperature }) =>
        temperature === null ? true : temperature.min <= site.min && site.max <= temperature.max,
      ),
    );
  if (environment.exposures.length > 0)
    gates.push(judged("exposure", ({ resists }) => environment.exposures.every((e) => resists.includes(e))));
  if (limits.freeHeight !== null) gates.push(limited("free_height", limits.freeHeight, (i) => i.freeHeight));
  if (limits.leadTimeDays !== null)
    gates.push(limited("lead_time", limits.leadTimeDays, (i) => i.leadTimeDays));
  if (limits.price !== null) gates.push(limited("price", limits.price, (i) => priceOnEveryFoot(request, i)));
  return gates;
}
