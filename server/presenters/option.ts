import type { Analysis, FootState, Mode } from "../../src/dynamics/index.ts";
import type { Machine } from "../../src/machine/index.ts";
import type { Check, Gate, NearMiss, Option, SelectionRequest } from "../../src/selection/index.ts";
import { inUnit } from "../../src/units/index.ts";
import { finite } from "./number.ts";

/** One option as JSON: plain numbers, each key ending in its unit. */
export function presentOption(option: Option, request: SelectionRequest) {
  const { analysis, arrangement } = option;
  const { worst, judged, naturalFrequency, modes } = analysis;
  const { machine } = request;
  const items = itemsOf(option);
  const families = [...new Set(arrangement.map((isolator) => isolator.family))];
  const transmissibility = finite(judged.transmissibility);
  const lowest = machine.speed.min * (machine.orders[0] as number);
  return {
    rank: option.rank,
    designation: items.map((item) => item.isolator).join(" + "),
    series: arrangement[0]?.series ?? null,
    family: families.join(" + "),
    quantity: arrangement.length,
    items,
    feet: analysis.feet.map(presentFoot),
    static_deflection_mm: inUnit(analysis.staticDeflection, "mm"),
    levelness_mm: inUnit(analysis.levelness, "mm"),
    natural_frequency_hz: naturalFrequency === null ? null : inUnit(naturalFrequency, "Hz"),
    frequency_ratio: naturalFrequency === null ? null : lowest / naturalFrequency,
    damping_ratio: analysis.dampingRatio,
    transmissibility,
    isolation_efficiency_percent: transmissibility === null ? null : 100 * (1 - transmissibility),
    net_transmissibility: finite(worst?.netTransmissibility),
    transmitted_force_n: finite(judged.transmittedForce),
    worst_speed_rpm: worst === null ? null : inUnit(worst.speed, "rpm"),
    margin: finite(option.margin),
    model: analysis.model,
    tilt_mrad: analysis.tilt && { x: 1000 * analysis.tilt.x, y: 1000 * analysis.tilt.y },
    modes: modes?.map(presentMode) ?? null,
    price: option.price,
    currency: option.currency,
    unbeaten: option.unbeaten,
    notes: notesOf(option, request),
  };
}

export type PresentedOption = ReturnType<typeof presentOption>;

/** What is to be ordered: each isolator of the arrangement with its number, in the order of the feet. */
function itemsOf({ arrangement }: Option) {
  return [...new Set(arrangement)].map((isolator) => ({
    isolator: isolator.designation,
    quantity: arrangement.filter((other) => other === isolator).length,
    unit_price: isolator.price,
  }));
}

export function presentFoot({ foot, isolator, load, lateralLoad, utilisation, staticDeflection }: FootState) {
  return {
    foot,
    isolator: isolator.designation,
    load_n: load,
    utilisation,
    static_deflection_mm: inUnit(staticDeflection, "mm"),
    lateral_load_n: lateralLoad,
  };
}

export function presentMode({ omega, dampingRatio, shape, energy, vector }: Mode) {
  return { frequency_hz: inUnit(omega, "Hz"), damping_ratio: dampingRatio, shape, energy, vector };
}

/** How far the foot sum may be above the net value before a note says so. */
const NET_DIFFERS = 1.5;

export const NET_NOTE =
  "The feet push against one another: the sum of their forces is well above the net force.";

/** Whether the foot sum and the net value at the worst tell different stories. */
export function netDiffers({ worst }: Analysis): boolean {
  const { transmissibility, netTransmissibility } = worst ?? {};
  return (transmissibility ?? 0) > NET_DIFFERS * (netTransmissibility ?? Number.POSITIVE_INFINITY);
}

/** The modes that a speed range runs through, each in a sentence. */
export function crossings({ modes }: Analysis, { speed: { min, max }, orders }: Machine): readonly string[] {
  if (min === max) return [];
  return (modes ?? []).flatMap(({ omega, shape }) =>
    orders
      .filter((order) => omega >= order * min && omega <= order * max)
      .map(
        (order) =>
          `The ${shape.replace("_", " ")} mode at ${inUnit(omega, "Hz").toFixed(2)} Hz lies inside the speed range (order ${order}).`,
      ),
  );
}

/** What the numbers of one option do not say, the reason of every null among them. */
function notesOf(
  { analysis, arrangement, price }: Option,
  { machine, environment }: SelectionRequest,
): string[] {
  const notes: string[] = [];
  if (analysis.worst === null)
    notes.push(
      analysis.model === "vertical"
        ? "transmissibility: nothing acts vertically, and the vertical model knows no other direction."
        : "transmissibility: the forces that act cancel; their moments are judged by the force transmitted.",
    );
  else if (finite(analysis.worst.transmissibility) === null)
    notes.push("transmissibility: an undamped natural frequency is met exactly; no bound can be given.");
  if (analysis.modes === null) notes.push("modes: nothing holds the machine in every direction.");
  if (netDiffers(analysis)) notes.push(NET_NOTE);
  if (machine.excitations.length === 0) notes.push("transmitted_force_n: no excitation is stated.");
  if (price === null) notes.push("price: not every isolator is priced in one currency.");
  if (environment.temperature !== null && arrangement.some((isolator) => isolator.temperature === null))
    notes.push("The record is silent on temperature: ask the supplier.");
  if (arrangement.some(({ axial }) => axial.kind === "air"))
    notes.push("Air springs: taken as levelled; they need air supply and levelling valves.");
  return [...notes, ...crossings(analysis, machine)];
}

/** The unit in which each gate's numbers are shown; a gate without one compares plain numbers. */
const GATE_UNITS = {
  free_height: "mm",
  underloaded: "N",
  overloaded: "N",
  uplift: "N",
  levelness: "mm",
  static_deflection: "mm",
  transmitted_force: "N",
} as const;

const PLAIN_UNITS: Readonly<Record<string, string>> = {
  lead_time: "days",
  resonance: "mode over excitation frequency",
  stability: "N·m/rad",
};

/** A number of a gate in the unit in which it is shown. */
function shownFor(gate: Gate, si: number): number {
  return gate in GATE_UNITS ? inUnit(si, GATE_UNITS[gate as keyof typeof GATE_UNITS]) : si;
}

function unitFor(gate: Gate): string | null {
  return gate in GATE_UNITS ? GATE_UNITS[gate as keyof typeof GATE_UNITS] : (PLAIN_UNITS[gate] ?? null);
}

/** A near miss as JSON, its numbers in the unit it names. */
export function presentNearMiss({ designation, gate, value, limit }: NearMiss) {
  return {
    designation,
    gate,
    value: shownFor(gate, value),
    limit: shownFor(gate, limit),
    unit: unitFor(gate),
  };
}

/** A check as JSON, its numbers in the unit it names. */
export function presentCheck({ gate, passed, value, limit }: Check) {
  const shown = (si: number | null): number | null => {
    const known = finite(si);
    return known === null ? null : shownFor(gate, known);
  };
  return { gate, passed, value: shown(value), limit: shown(limit), unit: unitFor(gate) };
}
