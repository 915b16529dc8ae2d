import {
  CANCELS,
  type Complex,
  type ComplexVec3,
  forceOf,
  type Machine,
  type Sense,
  type Vec3,
} from "../../machine/index.ts";
import { PACKED, solveSymmetric6 } from "../solver/index.ts";
import { motionAt, N } from "./geometry.ts";
import { partsAt, type RigidModel, toNormalised, toPhysical } from "./model.ts";

/** A harmonic load on the body: forces and moments about its centre of gravity, complex, in normalised coordinates. */
export interface Load {
  readonly re: Float64Array;
  readonly im: Float64Array;
  /** Amplitude of the resultant force, N; null where the forces cancel and nothing can be compared with it. */
  readonly applied: number | null;
  /** Whether an excitation acts; without one the load is a vertical unit force at the centre of gravity. */
  readonly stated: boolean;
}

/**
 * Amplitude of a vector of complex components, whose tip runs on an ellipse: its major semi-axis,
 * √((‖F‖² + |F·F|)/2).
 */
export function amplitude(xr: number, xi: number, yr: number, yi: number, zr: number, zi: number): number {
  const square = xr * xr + xi * xi + yr * yr + yi * yi + zr * zr + zi * zi;
  const re = xr * xr - xi * xi + yr * yr - yi * yi + zr * zr - zi * zi;
  const im = 2 * (xr * xi + yr * yi + zr * zi);
  return Math.sqrt((square + Math.sqrt(re * re + im * im)) / 2);
}

function amplitudeOf([x, y, z]: ComplexVec3): number {
  return amplitude(x.re, x.im, y.re, y.im, z.re, z.im);
}

/**
 * What acts on a machine at an order of a speed.
 * @param speed  rad/s
 */
export function loadAt(
  model: RigidModel,
  machine: Machine,
  order: number,
  speed: number,
  sense: Sense,
): Load {
  const re = new Float64Array(N);
  const im = new Float64Array(N);
  const acting = machine.excitations.filter((excitation) => excitation.order === order);
  if (acting.length === 0) {
    re[2] = 1;
    toNormalised(model, re);
    return { re, im, applied: 1, stated: false };
  }
  let moduli = 0;
  for (const excitation of acting) {
    const force = forceOf(excitation, machine, speed, sense);
    moduli += amplitudeOf(force);
    addForce(re, im, force, armOf(model, excitation.at ?? machine.excitationPoint));
  }
  const part = (i: 0 | 1 | 2): Complex => ({ re: re[i] as number, im: im[i] as number });
  const resultant = amplitudeOf([part(0), part(1), part(2)]);
  toNormalised(model, re);
  toNormalised(model, im);
  return { re, im, applied: resultant <= CANCELS * moduli ? null : resultant, stated: true };
}

function armOf({ body }: RigidModel, at: Vec3 | null): Vec3 {
  const c = body.centreOfGravity;
  return at === null ? [0, 0, 0] : [at[0] - c[0], at[1] - c[1], at[2] - c[2]];
}

/** Adds a force at an arm from the centre of gravity, with its moment r × F. */
function addForce(re: Float64Array, im: Float64Array, force: ComplexVec3, arm: Vec3): void {
  const motion = motionAt(arm);
  for (let k = 0; k < N; k++)
    for (const i of [0, 1, 2] as const) {
      const lever = motion[N * i + k] as number;
      re[k] = (re[k] as number) + lever * force[i].re;
      im[k] = (im[k] as number) + lever * force[i].im;
    }
}

/** The steady state of a body under a load at one frequency. */
export interface Response {
  /** Sum of the amplitudes of the foot forces, N. */
  readonly footSum: number;
  /** Amplitude of the sum of the foot forces, N. */
  readonly net: number;
}

/** Room for one solve, used over and over. */
const aRe = new Float64Array(PACKED);
const aIm = new Float64Array(PACKED);
const pRe = new Float64Array(N);
const pIm = new Float64Array(N);
const DIAGONAL = [0, 2, 5, 9, 14, 20];

/** Solves (K + jωC + jH − ω²I)·p = load into `pRe` and `pIm`; returns the stiffness it used. */
function solveAt(model: RigidModel, { re, im }: Pick<Load, "re" | "im">, omega: number) {
  const parts = partsAt(model, omega / (2 * Math.PI));
  const { k, h, c } = parts;
  for (let e = 0; e < PACKED; e++) {
    aRe[e] = k[e] as number;
    aIm[e] = (h[e] as number) + omega * (c[e] as number);
  }
  const square = omega * omega;
  for (const e of DIAGONAL) aRe[e] = (aRe[e] as number) - square;
  solveSymmetric6(aRe, aIm, re, im, pRe, pIm);
  return parts;
}

/**
 * Foot forces of the steady state. The two parts of an isolator's complex stiffness are common to its directions, so
 * that its modulus comes out of the amplitude.
 * @param omega      rad/s
 * @param amplitudes takes the amplitude of each foot force, N, when given
 */
export function respond(model: RigidModel, load: Load, omega: number, amplitudes?: Float64Array): Response {
  const { footK, footH, footC } = solveAt(model, load, omega);
  let footSum = 0;
  let nxr = 0;
  let nxi = 0;
  let nyr = 0;
  let nyi = 0;
  let nzr = 0;
  let nzi = 0;
  const feet = model.feet;
  const p0r = pRe[0] as number;
  const p1r = pRe[1] as number;
  const p2r = pRe[2] as number;
  const p3r = pRe[3] as number;
  const p4r = pRe[4] as number;
  const p5r = pRe[5] as number;
  const p0i = pIm[0] as number;
  const p1i = pIm[1] as number;
  const p2i = pIm[2] as number;
  const p3i = pIm[3] as number;
  const p4i = pIm[4] as number;
  const p5i = pIm[5] as number;
  for (let foot = 0; foot < feet.length; foot++) {
    const b = (feet[foot] as (typeof feet)[number]).force;
    const x0 = b[0] as number;
    const x1 = b[1] as number;
    const x2 = b[2] as number;
    const x3 = b[3] as number;
    const x4 = b[4] as number;
    const x5 = b[5] as number;
    const xr = x0 * p0r + x1 * p1r + x2 * p2r + x3 * p3r + x4 * p4r + x5 * p5r;
    const xi = x0 * p0i + x1 * p1i + x2 * p2i + x3 * p3i + x4 * p4i + x5 * p5i;
    const y0 = b[6] as number;
    const y1 = b[7] as number;
    const y2 = b[8] as number;
    const y3 = b[9] as number;
    const y4 = b[10] as number;
    const y5 = b[11] as number;
    const yr = y0 * p0r + y1 * p1r + y2 * p2r + y3 * p3r + y4 * p4r + y5 * p5r;
    const yi = y0 * p0i + y1 * p1i + y2 * p2i + y3 * p3i + y4 * p4i + y5 * p5i;
    const z0 = b[12] as number;
    const z1 = b[13] as number;
    const z2 = b[14] as number;
    const z3 = b[15] as number;
    const z4 = b[16] as number;
    const z5 = b[17] as number;
    const zr = z0 * p0r + z1 * p1r + z2 * p2r + z3 * p3r + z4 * p4r + z5 * p5r;
    const zi = z0 * p0i + z1 * p1i + z2 * p2i + z3 * p3i + z4 * p4i + z5 * p5i;
    const sr = footK[foot] as number;
    const si = (footH[foot] as number) + omega * (footC[foot] as number);
    const force = Math.sqrt(sr * sr + si * si) * amplitude(xr, xi, yr, yi, zr, zi);
    if (amplitudes !== undefined) amplitudes[foot] = force;
    footSum += force;
    nxr += sr * xr - si * xi;
    nxi += sr * xi + si * xr;
    nyr += sr * yr - si * yi;
    nyi += sr * yi + si * yr;
    nzr += sr * zr - si * zi;
    nzi += sr * zi + si * zr;
  }
  return { footSum, net: amplitude(nxr, nxi, nyr, nyi, nzr, nzi) };
}

/**
 * Amplitude of the velocity of a point of the body, m/s rms along the direction in which it is largest.
 * @param at     m, in the machine's frame; the centre of gravity when null
 * @param omega  rad/s
 */
export function velocityAt(model: RigidModel, load: Load, omega: number, at: Vec3 | null): number {
  solveAt(model, load, omega);
  const qRe = pRe.slice();
  const qIm = pIm.slice();
  toPhysical(model, qRe);
  toPhysical(model, qIm);
  const motion = motionAt(armOf(model, at));
  const part = (q: Float64Array, i: number): number => {
    let sum = 0;
    for (let k = 0; k < N; k++) sum += (motion[N * i + k] as number) * (q[k] as number);
    return sum;
  };
  const u = amplitude(part(qRe, 0), part(qIm, 0), part(qRe, 1), part(qIm, 1), part(qRe, 2), part(qIm, 2));
  return (omega * u) / Math.SQRT2;
}

/** Complex displacement of the body in physical coordinates under a load, for tests of reciprocity and energy. */
export function displacement(model: RigidModel, load: Pick<Load, "re" | "im">, omega: number) {
  solveAt(model, load, omega);
  const re = pRe.slice();
  const im = pIm.slice();
  toPhysical(model, re);
  toPhysical(model, im);
  return { re, im };
}
