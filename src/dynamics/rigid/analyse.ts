import type { Isolator } from "../../isolator/index.ts";
import { type Foot, type Machine, type RigidBody, type Sense, sensesOf } from "../../machine/index.ts";
import type { Analysis, JudgedOn, Mode, SteadyState } from "../analysis.ts";
import { worstOver } from "../worst.ts";
import { type Equilibrium, equilibrium } from "./equilibrium.ts";
import { type RigidModel, rigidModel } from "./model.ts";
import { modesOf, type RigidMode } from "./modes.ts";
import { type Load, loadAt, respond, velocityAt } from "./response.ts";
import { stabilityOf } from "./stability.ts";

/** A machine of which all is known that the rigid-body model needs. */
export type RigidMachine = Machine & { readonly rigid: RigidBody; readonly feet: readonly Foot[] };

/** Senses whose results differ by less than this, relative, tie. */
const TIE = 1e-9;

/** Everything an arrangement does under a machine whose geometry is known, by the rigid-body model. */
export function analyseRigid(
  machine: RigidMachine,
  isolators: readonly Isolator[],
  judgedOn: JudgedOn,
): Analysis {
  const { rigid: body, feet } = machine;
  const rest = equilibrium(body, feet, isolators);
  const model = rigidModel(body, feet, isolators, rest);
  const stability = stabilityOf(model);
  const modes = modesOf(model);
  const senses = machine.excitations.some(({ kind }) => kind === "unbalance")
    ? sensesOf(machine)
    : [1 as Sense];
  const results =
    modes === null ? [] : senses.map((sense) => worstIn(model, machine, modes, sense, judgedOn));
  const shown = results.reduce<SenseResult | null>(
    (a, b) => (a === null || exceeds(magnitudeOf(b, judgedOn), magnitudeOf(a, judgedOn)) ? b : a),
    null,
  );
  const vertical =
    modes?.reduce((a, b) => ((b.energy[2] as number) > (a.energy[2] as number) ? b : a)) ?? null;
  return {
    model: "rigid_body",
    ...standing(rest, feet, isolators),
    stability,
    modes: modes?.map((mode) => withOwnTransmissibility(model, machine, mode, senses, judgedOn)) ?? null,
    naturalFrequency: vertical?.omega ?? null,
    dampingRatio: vertical?.dampingRatio ?? null,
    steadyStates: shown === null ? [] : endsOf(model, machine, shown.sense),
    worst: shown?.worst ?? null,
    worstForce: shown?.worstForce ?? null,
    judged: {
      transmissibility: largest(results.map(({ worst }) => worst && judgedTransmissibility(worst, judgedOn))),
      transmittedForce: largest(
        results.map(({ worstForce }) => worstForce && judgedForce(worstForce, judgedOn)),
      ),
    },
    rotation: senses.length === 1 && machine.rotation === "either" ? null : (shown?.sense ?? null),
  };
}

function standing(rest: Equilibrium, feet: readonly Foot[], isolators: readonly Isolator[]) {
  const { deflections } = rest;
  const levelled = isolators.every(({ axial }) => axial.kind === "air");
  return {
    feet: isolators.map((isolator, i) => {
      const load = rest.loads[i] as number;
      const upright = (feet[i] as Foot).axis[2] === 1;
      return {
        foot: i + 1,
        isolator,
        load,
        lateralLoad: upright ? null : (rest.lateralLoads[i] as number),
        utilisation: load / isolator.load.max,
        staticDeflection: deflections[i] as number,
      };
    }),
    staticDeflection: deflections.reduce((s, d) => s + d, 0) / deflections.length,
    levelness: levelled ? 0 : Math.max(...deflections) - Math.min(...deflections),
    tilt: rest.tilt,
  };
}

interface SenseResult {
  readonly sense: Sense;
  readonly worst: SteadyState | null;
  readonly worstForce: SteadyState | null;
}

function judgedTransmissibility(state: SteadyState, on: JudgedOn): number | null {
  return on === "net" ? state.netTransmissibility : state.transmissibility;
}

function judgedForce(state: SteadyState, on: JudgedOn): number | null {
  return on === "net" ? state.netForce : state.transmittedForce;
}

/** What senses are compared by: the judged transmissibility, without one the transmitted force. */
function magnitudeOf({ worst, worstForce }: SenseResult, on: JudgedOn): number {
  return (worst && judgedTransmissibility(worst, on)) ?? (worstForce && judgedForce(worstForce, on)) ?? 0;
}

function exceeds(b: number, a: number): boolean {
  return b > a * (1 + TIE);
}

function largest(values: readonly (number | null)[]): number | null {
  return values.reduce((a, b) => (a === null || (b !== null && b > a) ? b : a), null);
}

/** The worst over the speed range and every order, in one sense of rotation. */
function worstIn(
  model: RigidModel,
  machine: Machine,
  modes: readonly Mode[],
  sense: Sense,
  on: JudgedOn,
): SenseResult {
  const { min, max } = machine.speed;
  let worst: SteadyState | null = null;
  let worstForce: SteadyState | null = null;
  for (const order of machine.orders) {
    const resonances = modes.map(({ omega }) => omega / order);
    const top = loadAt(model, machine, order, max, sense);
    const force = forceOver(model, machine, order, max, top, sense, on);
    const entry = (speed: number): SteadyState => steadyState(model, machine, order, speed, sense);
    if (top.applied !== null) {
      const ratio = (speed: number): number =>
        force(speed) / (appliedAt(top, machine, order, speed, max) as number);
      const candidate = entry(worstOver(ratio, min, max, resonances).at);
      const value = judgedTransmissibility(candidate, on) ?? 0;
      if (worst === null || value > (judgedTransmissibility(worst, on) ?? 0)) worst = candidate;
    }
    if (!top.stated) continue;
    const candidate = entry(worstOver(force, min, max, resonances).at);
    const value = judgedForce(candidate, on) ?? 0;
    if (worstForce === null || value > (judgedForce(worstForce, on) ?? 0)) worstForce = candidate;
  }
  return { sense, worst, worstForce };
}

/** Whether all that acts at an order grows alike with speed, so that one load serves every speed by a factor. */
function growth(machine: Machine, order: number): "constant" | "square" | "mixed" {
  const kinds = new Set(machine.excitations.filter((e) => e.order === order).map((e) => e.kind));
  if (kinds.size > 1) return "mixed";
  return kinds.has("unbalance") ? "square" : "constant";
}

function appliedAt(top: Load, machine: Machine, order: number, speed: number, max: number): number | null {
  if (top.applied === null) return null;
  return growth(machine, order) === "square" ? top.applied * (speed / max) ** 2 : top.applied;
}

/** The judged force as a function of speed. */
function forceOver(
  model: RigidModel,
  machine: Machine,
  order: number,
  max: number,
  top: Load,
  sense: Sense,
  on: JudgedOn,
): (speed: number) => number {
  const pick = (load: Load, speed: number): number => {
    const { footSum, net } = respond(model, load, order * speed);
    return on === "net" ? net : footSum;
  };
  const grows = growth(machine, order);
  if (grows === "constant") return (speed) => pick(top, speed);
  if (grows === "square") return (speed) => pick(top, speed) * (speed / max) ** 2;
  return (speed) => pick(loadAt(model, machine, order, speed, sense), speed);
}

/** The steady state at one order of one speed, whole. */
function steadyState(
  model: RigidModel,
  machine: Machine,
  order: number,
  speed: number,
  sense: Sense,
): SteadyState {
  const omega = order * speed;
  const load = loadAt(model, machine, order, speed, sense);
  const footForces = new Float64Array(model.feet.length);
  const { footSum, net } = respond(model, load, omega, footForces);
  const finite = (value: number): number | null => (Number.isFinite(value) ? value : null);
  const ratio = (value: number): number | null => (load.applied === null ? null : value / load.applied);
  return {
    speed,
    order,
    omega,
    transmissibility: ratio(footSum),
    netTransmissibility: ratio(net),
    transmittedForce: load.stated ? footSum : null,
    netForce: load.stated ? net : null,
    footForces: load.stated ? [...footForces] : null,
    machineVelocity: load.stated ? finite(velocityAt(model, load, omega, null)) : null,
    pointVelocities: load.stated
      ? machine.points.map(({ name, at }) => ({ name, velocity: velocityAt(model, load, omega, at) }))
      : null,
  };
}

function endsOf(model: RigidModel, machine: Machine, sense: Sense): readonly SteadyState[] {
  const speeds = [...new Set([machine.speed.min, machine.speed.max])];
  return machine.orders.flatMap((order) =>
    speeds.map((speed) => steadyState(model, machine, order, speed, sense)),
  );
}

function withOwnTransmissibility(
  model: RigidModel,
  machine: Machine,
  { normalised: _, ...mode }: RigidMode,
  senses: readonly Sense[],
  on: JudgedOn,
): Mode {
  const at = (order: number, sense: Sense): number | null => {
    const load = loadAt(model, machine, order, mode.omega / order, sense);
    if (load.applied === null) return null;
    const { footSum, net } = respond(model, load, mode.omega);
    return (on === "net" ? net : footSum) / load.applied;
  };
  return {
    ...mode,
    ownTransmissibility: machine.orders.map((order) => largest(senses.map((sense) => at(order, sense)))),
  };
}

/** Transmissibility of an arrangement against frequency, rad/s, in a sense of rotation. */
export function responseOf(
  { rigid: body, feet, ...rest }: RigidMachine,
  isolators: readonly Isolator[],
  sense: Sense,
  frequencies: Float64Array,
): FrequencyResponse {
  const model = rigidModel(body, feet, isolators, equilibrium(body, feet, isolators));
  return frequencyResponse(model, { ...rest, rigid: body, feet }, sense, frequencies);
}

export interface FrequencyResponse {
  readonly transmissibility: Float64Array;
  readonly net: Float64Array;
}

/**
 * Transmissibility against frequency for what acts at order 1, or a vertical unit force through the centre of
 * gravity.
 * @param frequencies  rad/s
 */
export function frequencyResponse(
  model: RigidModel,
  machine: Machine,
  sense: Sense,
  frequencies: Float64Array,
): FrequencyResponse {
  const transmissibility = new Float64Array(frequencies.length);
  const net = new Float64Array(frequencies.length);
  const mixed = growth(machine, 1) === "mixed";
  const top = loadAt(model, machine, 1, machine.speed.max, sense);
  for (let i = 0; i < frequencies.length; i++) {
    const omega = frequencies[i] as number;
    const load = mixed ? loadAt(model, machine, 1, omega, sense) : top;
    const response = respond(model, load, omega);
    const applied = load.applied ?? Number.NaN;
    transmissibility[i] = response.footSum / applied;
    net[i] = response.net / applied;
  }
  return { transmissibility, net };
}
