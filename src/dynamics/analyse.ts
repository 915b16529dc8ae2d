import { type Isolator, staticDeflection, staticStiffness } from "../isolator/index.ts";
import {
  CANCELS,
  type Excitation,
  forceOf,
  type Machine,
  norm,
  type Sense,
  sensesOf,
} from "../machine/index.ts";
import type { Analysis, FootState, JudgedOn, Mode, SteadyState } from "./analysis.ts";
import { footLoads, requireStanding } from "./foot-loads.ts";
import { analyseRigid, type FrequencyResponse, responseOf } from "./rigid/analyse.ts";
import {
  dampingRatio,
  naturalFrequency,
  transmissibilityOf,
  type VerticalModel,
  verticalModel,
} from "./vertical.ts";
import { worstOver } from "./worst.ts";

const LOAD_TOLERANCE = 1e-12;
const MAX_ITERATIONS = 60;

/**
 * Everything an arrangement does under a machine: by the rigid-body model where the machine's geometry is known,
 * else by the vertical model.
 * @param machine    with as many feet as there are isolators
 * @param isolators  one a foot
 * @param judgedOn   which sum of the foot forces is looked at for the worst
 * @returns          the analysis; loads that are not positive are reported as they are, for a gate to judge
 * @throws {InputError} a centre of gravity outside the feet that are not all captive
 */
export function analyse(
  machine: Machine,
  isolators: readonly Isolator[],
  judgedOn: JudgedOn = "foot_sum",
): Analysis {
  const { rigid, feet } = machine;
  if (rigid === null || feet === null) return analyseVertical(machine, isolators);
  if (!isolators.every((isolator) => isolator.captive)) requireStanding(machine);
  return analyseRigid({ ...machine, rigid, feet }, isolators, judgedOn);
}

/**
 * Transmissibility of an arrangement against frequency, for what acts at order 1 or a vertical force through the
 * centre of gravity.
 * @param rotation     sense of the shaft, as the analysis reports it
 * @param frequencies  rad/s, ascending
 */
export function frequencyCurve(
  machine: Machine,
  isolators: readonly Isolator[],
  rotation: Sense | null,
  frequencies: Float64Array,
): FrequencyResponse {
  const { rigid, feet } = machine;
  if (rigid !== null && feet !== null)
    return responseOf({ ...machine, rigid, feet }, isolators, rotation ?? 1, frequencies);
  const model = modelUnder(machine, isolators, arrangementLoads(machine, isolators));
  const transmissibility = frequencies.map((omega) =>
    transmissibilityOf(model.mass, model.stiffnessAt(omega), omega),
  );
  return { transmissibility, net: transmissibility };
}

function analyseVertical(machine: Machine, isolators: readonly Isolator[]): Analysis {
  const loads = arrangementLoads(machine, isolators);
  const feet = isolators.map((isolator, i): FootState => {
    const load = loads[i] as number;
    return {
      foot: i + 1,
      isolator,
      load,
      lateralLoad: null,
      utilisation: load / isolator.load.max,
      staticDeflection: load > 0 ? staticDeflection(isolator, load) : 0,
    };
  });
  const deflections = feet.map((foot) => foot.staticDeflection);
  const model = modelUnder(machine, isolators, loads);
  const omega = naturalFrequency(model);
  const damping = dampingRatio(model, omega);
  const { worst, worstForce } = worstSteadyStates(machine, model, omega);
  const mode: Mode = {
    omega,
    dampingRatio: damping,
    shape: "vertical",
    energy: VERTICAL,
    vector: VERTICAL,
    ownTransmissibility: machine.orders.map(() =>
      transmissibilityOf(model.mass, model.stiffnessAt(omega), omega),
    ),
  };
  return {
    model: "vertical",
    feet,
    staticDeflection: deflections.reduce((s, d) => s + d, 0) / deflections.length,
    levelness: isolators.every(isLevelled) ? 0 : Math.max(...deflections) - Math.min(...deflections),
    tilt: null,
    stability: null,
    modes: [mode],
    naturalFrequency: omega,
    dampingRatio: damping,
    steadyStates: endsOf(machine, model),
    worst,
    worstForce,
    judged: {
      transmissibility: worst?.transmissibility ?? null,
      transmittedForce: worstForce?.transmittedForce ?? null,
    },
    rotation: null,
  };
}

/** A foot that lifts bears nothing. */
function modelUnder(
  { mass }: Machine,
  isolators: readonly Isolator[],
  loads: readonly number[],
): VerticalModel {
  return verticalModel(
    mass,
    isolators.map((isolator, i) => ({ isolator, load: Math.max(loads[i] as number, 0) })),
  );
}

const VERTICAL: readonly number[] = [0, 0, 1, 0, 0, 0];

/** Levelled air springs hold their height whatever they carry. */
function isLevelled(isolator: Isolator): boolean {
  return isolator.axial.kind === "air";
}

/**
 * Static loads on the isolators as they are. A curve shares the load by its secant at that load, so the loads
 * are found by iteration; levelled air springs share the weight as equal springs would.
 */
function arrangementLoads(machine: Machine, isolators: readonly Isolator[]): readonly number[] {
  let loads = footLoads(machine);
  if (machine.feet === null || isolators.every(isLevelled)) return loads;
  for (let i = 0; i < MAX_ITERATIONS; i++) {
    const secants = isolators.map((isolator, foot) => {
      const load = loads[foot] as number;
      return load > 0 ? load / staticDeflection(isolator, load) : staticStiffness(isolator, 0);
    });
    const next = footLoads(machine, secants);
    const moved = next.some(
      (load, foot) => Math.abs(load - (loads[foot] as number)) > LOAD_TOLERANCE * machine.mass,
    );
    loads = next;
    if (!moved) break;
  }
  return loads;
}

/**
 * Amplitude of the vertical force applied at an order, N, the larger over the senses of rotation.
 * @returns `undefined` when nothing acts at the order, `null` when what acts there has no vertical part
 */
export function verticalForce(machine: Machine, order: number, speed: number): number | null | undefined {
  const acting = machine.excitations.filter((e) => e.order === order);
  if (acting.length === 0) return undefined;
  return sensesOf(machine).reduce<number | null>((largest, sense) => {
    const forces = acting.map((e: Excitation) => forceOf(e, machine, speed, sense));
    const re = forces.reduce((s, f) => s + f[2].re, 0);
    const im = forces.reduce((s, f) => s + f[2].im, 0);
    const moduli = forces.reduce((s, f) => s + norm([modulus(f[0]), modulus(f[1]), modulus(f[2])]), 0);
    const resultant = Math.hypot(re, im);
    return resultant <= CANCELS * moduli ? largest : Math.max(largest ?? 0, resultant);
  }, null);
}

function modulus(z: { readonly re: number; readonly im: number }): number {
  return Math.hypot(z.re, z.im);
}

/** The steady state at an order of a speed, where something vertical acts or a unit force is judged. */
function stateAt(machine: Machine, model: VerticalModel, order: number, speed: number): SteadyState {
  const omega = order * speed;
  const share = transmissibilityOf(model.mass, model.stiffnessAt(omega), omega);
  const applied = verticalForce(machine, order, speed) ?? null;
  const transmitted = applied === null ? null : share * applied;
  return {
    speed,
    order,
    omega,
    transmissibility: share,
    netTransmissibility: share,
    transmittedForce: transmitted,
    netForce: transmitted,
    footForces: null,
    machineVelocity: null,
    pointVelocities: null,
  };
}

/** Orders at which the vertical model has something to say: what acts has a vertical part, or nothing acts. */
function ordersHeld(machine: Machine): readonly number[] {
  return machine.orders.filter((order) => verticalForce(machine, order, machine.speed.max) !== null);
}

function endsOf(machine: Machine, model: VerticalModel): readonly SteadyState[] {
  const speeds = [...new Set([machine.speed.min, machine.speed.max])];
  return ordersHeld(machine).flatMap((order) => speeds.map((speed) => stateAt(machine, model, order, speed)));
}

/** The largest transmissibility and the largest transmitted force over the speed range and every order. */
function worstSteadyStates(
  machine: Machine,
  model: VerticalModel,
  omega: number,
): { readonly worst: SteadyState | null; readonly worstForce: SteadyState | null } {
  const { min, max } = machine.speed;
  let worst: SteadyState | null = null;
  let worstForce: SteadyState | null = null;
  for (const order of ordersHeld(machine)) {
    const at = (speed: number): SteadyState => stateAt(machine, model, order, speed);
    const largest = (of: (state: SteadyState) => number): SteadyState =>
      at(worstOver((speed) => of(at(speed)), min, max, [omega / order]).at);
    const share = largest((state) => state.transmissibility ?? 0);
    if (worst === null || (share.transmissibility ?? 0) > (worst.transmissibility ?? 0)) worst = share;
    if (share.transmittedForce === null) continue;
    const force = largest((state) => state.transmittedForce ?? 0);
    if (worstForce === null || (force.transmittedForce ?? 0) > (worstForce.transmittedForce ?? 0))
      worstForce = force;
  }
  return { worst, worstForce };
}
