import { permissibleUnbalance } from "../criteria/index.ts";
import type { Axis, Machine } from "./machine.ts";
import type { Complex, ComplexVec3, Vec3 } from "./vector.ts";

interface Line {
  /** Multiple of the running speed at which it acts. */
  readonly order: number;
  /** rad */
  readonly phase: number;
  /** Where it acts, m; `null` is the centre of gravity of the machine. */
  readonly at: Vec3 | null;
}

/** A force of fixed direction and amplitude. */
export interface ForceExcitation extends Line {
  readonly kind: "force";
  /** N, zero to peak */
  readonly amplitude: number;
  /** Unit vector. */
  readonly direction: Vec3;
}

/** A rotating unbalance, known by its moment or by what its balance grade permits. */
export interface UnbalanceExcitation extends Line {
  readonly kind: "unbalance";
  readonly unbalance:
    | { readonly kind: "moment" /** kg·m */; readonly moment: number }
    | { readonly kind: "grade" /** kg */; readonly rotorMass: number /** m/s */; readonly grade: number };
}

export type Excitation = ForceExcitation | UnbalanceExcitation;

/** Forces whose resultant is under this share of the sum of their moduli cancel. */
export const CANCELS = 1e-6;

/** +1: right-handed about the positive shaft axis; −1: left-handed. */
export type Sense = 1 | -1;

const ZERO: Complex = { re: 0, im: 0 };

/**
 * Unbalance moment of a rotor. A stated moment stands at every speed; a balance grade gives the residual
 * unbalance it permits at the top speed, U = m·G/ω_max (ISO 21940-11).
 * @param topSpeed  highest running speed, rad/s, > 0
 * @returns         kg·m
 */
function unbalanceMoment(excitation: UnbalanceExcitation, topSpeed: number): number {
  const { unbalance, order } = excitation;
  return unbalance.kind === "moment"
    ? unbalance.moment
    : permissibleUnbalance(unbalance.rotorMass, unbalance.grade, order * topSpeed);
}

/** Directions of a force that turns right-handed about each axis, at phase 0: first component real where it acts. */
const ROTATING: Readonly<Record<Axis, readonly [re: Vec3, im: Vec3]>> = {
  x: [
    [0, 1, 0],
    [0, 0, -1],
  ],
  y: [
    [0, 0, 1],
    [-1, 0, 0],
  ],
  z: [
    [1, 0, 0],
    [0, -1, 0],
  ],
};

/**
 * Complex amplitude of one excitation's force.
 * A force keeps its amplitude at every speed; an unbalance U gives U·ω² turning in the plane normal to the shaft.
 * @param machine  for the shaft axis and the top speed
 * @param speed    running speed, rad/s
 * @param sense    of the shaft's rotation
 * @returns        N, zero to peak, along x, y, z
 */
export function forceOf(excitation: Excitation, machine: Machine, speed: number, sense: Sense): ComplexVec3 {
  const cos = Math.cos(excitation.phase);
  const sin = Math.sin(excitation.phase);
  const turned = (re: number, im: number): Complex =>
    re === 0 && im === 0 ? ZERO : { re: re * cos - im * sin, im: re * sin + im * cos };

  if (excitation.kind === "force") {
    const [x, y, z] = excitation.direction;
    const a = excitation.amplitude;
    return [turned(a * x, 0), turned(a * y, 0), turned(a * z, 0)];
  }
  const omega = excitation.order * speed;
  const p = unbalanceMoment(excitation, machine.speed.max) * omega * omega;
  const [re, im] = ROTATING[machine.shaftAxis];
  const component = (i: 0 | 1 | 2): Complex => turned(p * re[i], sense * p * im[i]);
  return [component(0), component(1), component(2)];
}

/** The senses of rotation to analyse for a machine. */
export function sensesOf(machine: Machine): readonly Sense[] {
  if (machine.rotation === "right_handed") return [1];
  if (machine.rotation === "left_handed") return [-1];
  return [1, -1];
}

/** Orders that are evaluated: those asked for and those at which something acts, ascending, each once. */
export function ordersOf(listed: readonly number[], excitations: readonly Excitation[]): readonly number[] {
  return [...new Set([...listed, ...excitations.map((e) => e.order)])].sort((a, b) => a - b);
}
