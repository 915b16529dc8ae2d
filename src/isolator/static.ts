import { STANDARD_GRAVITY } from "../units/index.ts";
import { type Curve, curveThrough } from "./curve.ts";
import type { CurvePoint, Isolator } from "./isolator.ts";

/** A curve is worked out once for its table. */
const curves = new WeakMap<readonly CurvePoint[], Curve>();

function curveOf(points: readonly CurvePoint[]): Curve {
  const known = curves.get(points);
  if (known) return known;
  const curve = curveThrough(points);
  curves.set(points, curve);
  return curve;
}

/**
 * Static stiffness along the axis at a working load: constant, the tangent of the curve there, or for an air spring
 * k = W·(2π·fn)²/g, in proportion to the load.
 * @param load  N, > 0
 * @returns     N/m
 */
export function staticStiffness({ axial }: Isolator, load: number): number {
  switch (axial.kind) {
    case "linear":
      return axial.stiffness;
    case "curve": {
      const curve = curveOf(axial.points);
      return curve.tangent(curve.deflection(load));
    }
    case "air":
      return (load * (2 * Math.PI * axial.naturalFrequencyHz) ** 2) / STANDARD_GRAVITY;
  }
}

/**
 * Static deflection along the axis under a load. For an air spring, which is levelled, it is the deflection that a
 * linear spring of the same natural frequency would have, g/(2π·fn)².
 * @param load  N, > 0
 * @returns     m
 */
export function staticDeflection({ axial }: Isolator, load: number): number {
  switch (axial.kind) {
    case "linear":
      return load / axial.stiffness;
    case "curve":
      return curveOf(axial.points).deflection(load);
    case "air":
      return STANDARD_GRAVITY / (2 * Math.PI * axial.naturalFrequencyHz) ** 2;
  }
}

/**
 * Static load along the axis at a deflection, the inverse of `staticDeflection`; a negative deflection pulls. A
 * levelled air spring has no such law: its load is what its share of the weight makes it.
 * @param deflection  m
 * @returns           N
 */
export function staticLoad({ axial }: Isolator, deflection: number): number {
  switch (axial.kind) {
    case "linear":
      return axial.stiffness * deflection;
    case "curve":
      return curveOf(axial.points).load(deflection);
    case "air":
      return Number.NaN;
  }
}
