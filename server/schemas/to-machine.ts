import { parseGrade } from "../../src/criteria/index.ts";
import { InputError } from "../../src/errors/index.ts";
import {
  type Excitation,
  footprintPositions,
  type Machine,
  norm,
  ordersOf,
  requireCarryingFeet,
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

/** The orders at which something is stated to act; without an excitation once per revolution. */
function defaultOrders({ excitation }: MachineBody): number[] {
  return excitation === undefined ? [1] : [...new Set(excitation.map((e) => e.order ?? 1))];
}

/** The assumptions that those defaults are, in words. */
export function machineAssumptions(body: MachineBody): readonly string[] {
  const assumed: [boolean, string][] = [
    [body.feet === undefined, `${DEFAULT_FEET} feet.`],
    [
      body.centre_of_gravity === undefined,
      "The centre of gravity is above the centroid of the feet, so that they share the weight as on equal springs.",
    ],
    [
      body.orders === undefined && body.excitation === undefined,
      "The machine shakes once per revolution (order 1).",
    ],
    [
      body.excitation === undefined,
      "No excitation is stated: a vertical force through the centre of gravity, ratios only.",
    ],
    [body.support === undefined, "The ground is rigid."],
  ];
  return assumed.filter(([holds]) => holds).map(([, text]) => text);
}

/**
 * The machine of a request, in SI units.
 * @throws {InputError} what single fields could not show: a range upside down, a zero direction, an unknown
 *                      balance grade, feet that cannot carry
 */
export function toMachine(body: ReturnType<typeof withMachineDefaults<MachineBody>>): Machine {
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
  return {
    mass: toSI(body.mass, "mass"),
    footCount: feet?.length ?? (body.feet as number),
    feet: feet?.map((position) => ({ position, axis: UPWARD })) ?? null,
    centreOfGravity: cg === undefined ? null : { x: cg.x, y: cg.y },
    rigid: null,
    excitationPoint: null,
    points: [],
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

function toFeet(feet: NonNullable<MachineBody["feet"]>): readonly Vec3[] | null {
  if (typeof feet === "number") return null;
  if (!("positions" in feet)) return footprintPositions(feet.count, feet.length, feet.width);
  const positions = feet.positions.map(({ x, y, z }): Vec3 => [x, y, z ?? 0]);
  requireCarryingFeet(positions);
  return positions;
}

type ExcitationBody = NonNullable<MachineBody["excitation"]>[number];

function toExcitation(body: ExcitationBody, index: number): Excitation {
  const line = {
    order: body.order ?? 1,
    phase: ((body.phase_deg ?? 0) * Math.PI) / 180,
    at: body.at === undefined ? null : ([body.at.x, body.at.y, body.at.z ?? 0] as const),
  };
  if (body.kind === "force") {
    const direction = body.direction ?? UPWARD;
    const length = norm(direction);
    if (length === 0)
      throw InputError.at(`/excitation/${index}/direction`, "a direction of length zero points nowhere");
    const [x, y, z] = direction;
    return {
      kind: "force",
      amplitude: toSI(body.amplitude, "force"),
      direction: [x / length, y / length, z / length],
      ...line,
    };
  }
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
