import { parseGrade } from "../../src/criteria/index.ts";
import { InputError } from "../../src/errors/index.ts";
import {
  boxInertia,
  centroid,
  combine,
  type Excitation,
  type Foot,
  footprintPositions,
  type Inertia,
  type Machine,
  norm,
  ordersOf,
  type RigidBody,
  requireCarryingFeet,
  requirePossibleInertia,
  type Slab,
  slabBody,
  slabMass,
  type Vec3,
} from "../../src/machine/index.ts";
import { toSI } from "../../src/units/index.ts";
import type { MachineBody } from "./machine.ts";

const DEFAULT_FEET = 4;
const UPWARD: Vec3 = [0, 0, 1];
const MOST_ORDERS = 32;

/** What is filled in where the machine is silent, so that the answer can show the request as it was understood. */
export function withMachineDefaults<Body extends MachineBody>(body: Body) {
  return {
    ...body,
    orders: body.orders ?? defaultOrders(body),
    feet: body.feet ?? DEFAULT_FEET,
    shaft_axis: body.shaft_axis ?? ("x" as const),
    rotation: body.rotation ?? ("either" as const),
  };
}

type Understood = ReturnType<typeof withMachineDefaults<MachineBody>>;

/** The orders at which something is stated to act; without an excitation once per revolution. */
function defaultOrders({ excitation }: MachineBody): number[] {
  return excitation === undefined ? [1] : [...new Set(excitation.map((e) => e.order ?? 1))];
}

/** The assumptions that those defaults are, in words. */
export function machineAssumptions(body: MachineBody, machine: Machine): readonly string[] {
  const { centre_of_gravity: cg, excitation } = body;
  const balanced = excitation?.some((e) => e.kind === "unbalance") ?? false;
  const assumed: [boolean, string][] = [
    [body.feet === undefined, `${DEFAULT_FEET} feet.`],
    [
      cg === undefined,
      "The centre of gravity is above the centroid of the feet, so that they share the weight as on equal springs.",
    ],
    [
      machine.rigid !== null && cg?.z === undefined,
      "The centre of gravity is half the envelope's height above the feet, or above the base where there is one.",
    ],
    [
      machine.rigid !== null && body.inertia === undefined && body.envelope !== undefined,
      "The inertia is that of a uniform box of the envelope.",
    ],
    [
      machine.rigid !== null && body.inertia === undefined && body.envelope === undefined,
      "The inertia is that of a uniform box over the feet, twice as high as its centre of gravity; give the envelope or the inertia for better.",
    ],
    [machine.rigid === null, "The vertical model is used: the machine moves up and down only."],
    [
      machine.rigid === null && unusedIn(body).length > 0,
      `Not used by the vertical model: ${unusedIn(body).join(", ")}.`,
    ],
    [
      body.orders === undefined && excitation === undefined,
      "The machine shakes once per revolution (order 1).",
    ],
    [
      excitation === undefined,
      "No excitation is stated: a vertical force through the centre of gravity, ratios only.",
    ],
    [balanced && body.shaft_axis === undefined, "The shaft runs along x."],
    [balanced && body.rotation === undefined, "The shaft may turn either way; the worse counts."],
    [
      body.base !== undefined && body.base.material === undefined && body.base.mass === undefined,
      "The base is of concrete, 2400 kg/m³.",
    ],
    [body.support === undefined, "The ground is rigid."],
  ];
  return assumed.filter(([holds]) => holds).map(([, text]) => text);
}

/** What a body states that only the rigid-body model can use. */
function unusedIn(body: MachineBody): readonly string[] {
  const stated: [boolean, string][] = [
    [body.envelope !== undefined, "envelope"],
    [body.inertia !== undefined, "inertia"],
    [body.points !== undefined, "points"],
    [body.centre_of_gravity?.z !== undefined, "height of the centre of gravity"],
    [body.excitation?.some(({ at }) => at !== undefined) ?? false, "where the excitation acts"],
  ];
  return stated.filter(([is]) => is).map(([, name]) => name);
}

/**
 * The machine of a request, in SI units.
 * @throws {InputError} what single fields could not show: a range upside down, a zero direction, an unknown
 *                      balance grade, feet that cannot carry, an inertia that no body has
 */
export function toMachine(body: Understood): Machine {
  const excitations = (body.excitation ?? []).map(toExcitation);
  const orders = ordersOf(body.orders, excitations);
  if (orders.length > MOST_ORDERS)
    throw InputError.at(
      "/orders",
      `${orders.length} orders with those of the excitations; at most ${MOST_ORDERS} are evaluated`,
    );
  const feet = toFeet(body.feet);
  const cg = body.centre_of_gravity;
  if (cg !== undefined && feet === null && (cg.x !== 0 || cg.y !== 0))
    throw InputError.at(
      "/centre_of_gravity",
      "says nothing while the places of the feet are unknown; give /feet positions or a footprint",
    );
  const slab = toSlab(body.base);
  const own = feet && ownBody(body, feet, slab);
  const rigid = own && feet && withBase(body, own, feet, slab);
  const inclined = feet?.findIndex(({ axis }) => axis[2] !== 1) ?? -1;
  if (rigid === null && inclined !== -1)
    throw InputError.at(
      `/feet/positions/${inclined}/axis`,
      "needs the height of the centre of gravity, or the envelope: the vertical model knows upright isolators only",
    );
  const plan = rigid === null ? cg : { x: rigid.centreOfGravity[0], y: rigid.centreOfGravity[1] };
  return {
    mass: rigid?.mass ?? toSI(body.mass, "mass") + baseMass(body.base, slab),
    footCount: feet?.length ?? (body.feet as number),
    feet,
    centreOfGravity: plan === undefined ? null : { x: plan.x, y: plan.y },
    rigid,
    excitationPoint: own?.centreOfGravity ?? null,
    points: (body.points ?? []).map(({ name, at }) => ({ name, at: toVector(at) })),
    speed: toSpeed(body.speed),
    orders,
    excitations,
    shaftAxis: body.shaft_axis,
    rotation: body.rotation,
  };
}

function toSpeed(speed: MachineBody["speed"]): Machine["speed"] {
  if (typeof speed === "number") return { min: toSI(speed, "speed"), max: toSI(speed, "speed") };
  if (speed.max <= speed.min)
    throw InputError.at(
      "/speed/max",
      `${speed.max} rpm is not above the minimum of ${speed.min} rpm; give one speed when there is no range`,
    );
  return { min: toSI(speed.min, "speed"), max: toSI(speed.max, "speed") };
}

type Point = { readonly x: number; readonly y: number; readonly z?: number | undefined };

function toVector({ x, y, z }: Point): Vec3 {
  return [x, y, z ?? 0];
}

/** A direction as a unit vector. */
function toUnit(direction: Vec3, pointer: string): Vec3 {
  const length = norm(direction);
  if (length === 0) throw InputError.at(pointer, "a direction of length zero points nowhere");
  return [direction[0] / length, direction[1] / length, direction[2] / length];
}

function toFeet(feet: NonNullable<MachineBody["feet"]>): readonly Foot[] | null {
  if (typeof feet === "number") return null;
  if (!("positions" in feet))
    return footprintPositions(feet.count, feet.length, feet.width).map((position) => ({
      position,
      axis: UPWARD,
    }));
  const placed = feet.positions.map((foot, i) => ({
    position: toVector(foot),
    axis: foot.axis === undefined ? UPWARD : toUnit(foot.axis, `/feet/positions/${i}/axis`),
  }));
  requireCarryingFeet(placed.map((foot) => foot.position));
  return placed;
}

type Base = MachineBody["base"];

/** The base as a slab; null when there is none or only its mass is known. */
function toSlab(base: Base): Slab | null {
  if (base === undefined) return null;
  const { length, width, thickness, material = "concrete", mass } = base;
  const stated = [length, width, thickness].filter((side) => side !== undefined).length;
  if (stated === 0 && mass === undefined)
    throw InputError.at("/base", "needs its length, width and thickness, or its mass");
  if (length === undefined || width === undefined || thickness === undefined) {
    if (stated > 0)
      throw InputError.at("/base", "needs all three of length, width and thickness, or none of them");
    return null;
  }
  return { length, width, thickness, material, mass: mass ?? null };
}

function baseMass(base: Base, slab: Slab | null): number {
  return slab === null ? (base?.mass ?? 0) : slabMass(slab);
}

/** The machine without its base as a rigid body; null while its height is unknown. */
function ownBody(body: Understood, feet: readonly Foot[], slab: Slab | null): RigidBody | null {
  const { envelope, centre_of_gravity: cg } = body;
  if (body.base !== undefined && slab === null) return null;
  const [x, y, floor] = centroid(feet.map((foot) => foot.position));
  const top = floor + (slab?.thickness ?? 0);
  const z = cg?.z ?? (envelope === undefined ? undefined : top + envelope.height / 2);
  if (z === undefined) return null;
  const mass = toSI(body.mass, "mass");
  const box = envelope ?? boxOverFeet(feet, z - top);
  if (box === null) return null;
  const inertia =
    body.inertia === undefined
      ? boxInertia(mass, box.length, box.width, box.height)
      : toInertia(body.inertia);
  requirePossibleInertia(inertia, "/inertia");
  return { mass, centreOfGravity: [cg?.x ?? x, cg?.y ?? y, z], inertia };
}

/** A box over the feet, its middle at a height above them; null where that is no height. */
function boxOverFeet(feet: readonly Foot[], height: number) {
  const spread = (i: 0 | 1): number => {
    const values = feet.map((foot) => foot.position[i]);
    return Math.max(...values) - Math.min(...values);
  };
  return height > 0 ? { length: spread(0), width: spread(1), height: 2 * height } : null;
}

function withBase(body: Understood, own: RigidBody, feet: readonly Foot[], slab: Slab | null): RigidBody {
  if (slab === null) return own;
  const [x, y, floor] = centroid(feet.map((foot) => foot.position));
  const at = body.base?.at;
  const centre: Vec3 =
    at === undefined ? [x, y, floor + slab.thickness / 2] : [at.x, at.y, at.z ?? floor + slab.thickness / 2];
  return combine([own, slabBody(slab, centre)]);
}

function toInertia({ xx, yy, zz, xy, xz, yz }: NonNullable<MachineBody["inertia"]>): Inertia {
  return { xx, yy, zz, xy: xy ?? 0, xz: xz ?? 0, yz: yz ?? 0 };
}

type ExcitationBody = NonNullable<MachineBody["excitation"]>[number];

function toExcitation(body: ExcitationBody, index: number): Excitation {
  const line = {
    order: body.order ?? 1,
    phase: ((body.phase_deg ?? 0) * Math.PI) / 180,
    at: body.at === undefined ? null : toVector(body.at),
  };
  if (body.kind === "force")
    return {
      kind: "force",
      amplitude: toSI(body.amplitude, "force"),
      direction: toUnit(body.direction ?? UPWARD, `/excitation/${index}/direction`),
      ...line,
    };
  if ("moment" in body)
    return {
      kind: "unbalance",
      unbalance: { kind: "moment", moment: toSI(body.moment, "unbalance") },
      ...line,
    };
  const grade = parseGrade(body.grade);
  if (!grade.ok) throw InputError.at(`/excitation/${index}/grade`, grade.reason);
  return {
    kind: "unbalance",
    unbalance: { kind: "grade", rotorMass: toSI(body.rotor_mass, "mass"), grade: grade.grade },
    ...line,
  };
}
