import type { Analysis, PointVelocity, SteadyState } from "../../src/dynamics/index.ts";
import type { Check } from "../../src/selection/index.ts";
import { inUnit } from "../../src/units/index.ts";
import type { AskedEvaluation } from "../schemas/to-evaluation.ts";
import { finite } from "./number.ts";
import { crossings, NET_NOTE, netDiffers, presentCheck, presentFoot, presentMode } from "./option.ts";

/** A response curve, rad/s against ratios. */
export interface Curve {
  readonly frequencies: Float64Array;
  readonly transmissibility: Float64Array;
  readonly net: Float64Array;
}

/** A stated arrangement's analysis as JSON. */
export function presentEvaluation(
  { request, normalised, assumptions }: AskedEvaluation,
  analysis: Analysis,
  checks: readonly Check[],
  curve: Curve | null,
  cautions: readonly string[],
  engineVersion: string,
) {
  const { tilt, modes, worst, worstForce, rotation } = analysis;
  return {
    engine_version: engineVersion,
    request: normalised,
    assumptions,
    cautions,
    notes: [...notesOf(analysis), ...crossings(analysis, request.machine)],
    model: analysis.model,
    feet: analysis.feet.map(presentFoot),
    static_deflection_mm: inUnit(analysis.staticDeflection, "mm"),
    levelness_mm: inUnit(analysis.levelness, "mm"),
    tilt_mrad: tilt && { x: 1000 * tilt.x, y: 1000 * tilt.y },
    modes: modes?.map(presentMode) ?? null,
    steady_state: analysis.steadyStates.map(presentState),
    worst: worst && presentState(worst),
    worst_force: worstForce && presentState(worstForce),
    rotation: rotation === null ? null : rotation === 1 ? "right_handed" : "left_handed",
    response: curve && {
      frequency_hz: Array.from(curve.frequencies, (omega) => inUnit(omega, "Hz")),
      transmissibility: Array.from(curve.transmissibility, finite),
      net_transmissibility: Array.from(curve.net, finite),
    },
    checks: checks.map(presentCheck),
  };
}

function presentState(state: SteadyState) {
  const { speed, order, omega } = state;
  return {
    speed_rpm: inUnit(speed, "rpm"),
    order,
    frequency_hz: inUnit(omega, "Hz"),
    transmissibility: finite(state.transmissibility),
    net_transmissibility: finite(state.netTransmissibility),
    transmitted_force_n: finite(state.transmittedForce),
    net_force_n: finite(state.netForce),
    foot_forces_n: state.footForces?.map(finite) ?? null,
    machine_velocity_mm_per_s_rms: millimetres(state.machineVelocity),
    points: state.pointVelocities?.map(presentPoint) ?? null,
  };
}

function presentPoint({ name, velocity }: PointVelocity) {
  return { name, velocity_mm_per_s_rms: millimetres(velocity) };
}

function millimetres(velocity: number | null): number | null {
  const known = finite(velocity);
  return known === null ? null : inUnit(known, "mm/s");
}

/** Why what is null was not computed, and what the numbers do not say. */
function notesOf(analysis: Analysis): readonly string[] {
  const { model, modes, worst, worstForce } = analysis;
  const reasons: [boolean, string][] = [
    [
      model === "vertical",
      "tilt_mrad, rocking modes, foot forces and velocities: need the places of the feet and the height of the centre of gravity.",
    ],
    [
      modes === null,
      "modes and steady_state: nothing holds the machine in every direction, or it falls over.",
    ],
    [
      modes !== null && worst === null,
      "worst: no resultant force acts that a transmissibility could be told of.",
    ],
    [modes !== null && worstForce === null, "worst_force: no excitation is stated."],
    [netDiffers(analysis), NET_NOTE],
  ];
  return reasons.filter(([holds]) => holds).map(([, text]) => text);
}
