/** A vector in the machine's frame: right-handed, z up, origin wherever the user put it. */
export type Vec3 = readonly [x: number, y: number, z: number];

/** A complex number; harmonic quantities are zero-to-peak amplitudes of e^{jωt}. */
export interface Complex {
  readonly re: number;
  readonly im: number;
}

export type ComplexVec3 = readonly [Complex, Complex, Complex];

/** Length of a vector, in the unit of its components. */
export function norm(v: Vec3): number {
  return Math.hypot(v[0], v[1], v[2]);
}
