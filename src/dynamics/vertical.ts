import { dashpot, dynamicStiffness, type Isolator, lossFactor } from "../isolator/index.ts";

/** An isolator under a foot that bears a static load. */
export interface Mount {
  readonly isolator: Isolator;
  /** N, > 0 */
  readonly load: number;
}

/** Dynamic stiffness of all feet together at one frequency: K* = k + j(ωc + h). */
export interface ComplexStiffness {
  /** N/m */
  readonly k: number;
  /** Dashpots, N·s/m */
  readonly c: number;
  /** Structural part ηk, N/m */
  readonly h: number;
}

/** A machine that can only move up and down. */
export interface VerticalModel {
  /** kg */
  readonly mass: number;
  /** K* at a frequency in rad/s. */
  readonly stiffnessAt: (omega: number) => ComplexStiffness;
}

/**
 * Force transmissibility of a mass on a complex spring, one degree of freedom.
 * T = √[(k² + (cω + ηk)²) / ((k − mω²)² + (cω + ηk)²)]; purely viscous this is
 * √[(1 + (2ζr)²) / ((1 − r²)² + (2ζr)²)], purely structural √[(1 + η²) / ((1 − r²)² + η²)].
 * @param mass   kg, > 0
 * @param k, c, h  stiffness N/m, dashpot N·s/m and structural part ηk N/m, ≥ 0
 * @param omega  rad/s, ≥ 0
 * @returns      |F_transmitted| / |F_applied|; Infinity at an undamped resonance
 * Validity: linear, steady state, rigid ground.   Source: any text on mechanical vibration, e.g. Harris' Shock
 * and Vibration Handbook, chapter on vibration isolation.
 * @example transmissibilityOf(1, { k: 1, c: 0.6, h: 0 }, Math.SQRT2) // 1 for every damping
 */
export function transmissibilityOf(mass: number, { k, c, h }: ComplexStiffness, omega: number): number {
  const loss = c * omega + h;
  const inertia = k - mass * omega * omega;
  return Math.sqrt((k * k + loss * loss) / (inertia * inertia + loss * loss));
}

function stiffnessOf({ isolator, load }: Mount, frequencyHz: number) {
  const k = dynamicStiffness(isolator, load, frequencyHz);
  return { k, c: dashpot(isolator), h: lossFactor(isolator) * k };
}

/** The vertical model of a machine of `mass` kg on `mounts`, one a foot. */
export function verticalModel(mass: number, mounts: readonly Mount[]): VerticalModel {
  const sumAt = (frequencyHz: number): ComplexStiffness => {
    const sum = { k: 0, c: 0, h: 0 };
    let one = sum;
    let before: Mount | undefined;
    for (const mount of mounts) {
      // Feet mostly carry alike.
      if (mount.isolator !== before?.isolator || mount.load !== before.load)
        one = stiffnessOf(mount, frequencyHz);
      before = mount;
      sum.k += one.k;
      sum.c += one.c;
      sum.h += one.h;
    }
    return sum;
  };
  // Only a dynamic ratio given against frequency makes the stiffness depend on it.
  if (mounts.some(({ isolator }) => typeof isolator.dynamicRatio !== "number"))
    return { mass, stiffnessAt: (omega) => sumAt(omega / (2 * Math.PI)) };
  const constant = sumAt(1);
  return { mass, stiffnessAt: () => constant };
}

const MAX_ITERATIONS = 100;

/**
 * Natural frequency of a vertical model, ω = √(k(ω)/m). Where the stiffness depends on frequency the resonance
 * is implicit and is found by iteration.
 * @returns rad/s
 */
export function naturalFrequency({ mass, stiffnessAt }: VerticalModel): number {
  let omega = Math.sqrt(stiffnessAt(2 * Math.PI).k / mass);
  for (let i = 0; i < MAX_ITERATIONS; i++) {
    const next = Math.sqrt(stiffnessAt(omega).k / mass);
    if (Math.abs(next - omega) <= 1e-14 * omega) return next;
    omega = next;
  }
  return omega;
}

/**
 * Equivalent viscous damping ratio of a vertical model at its resonance, ζ = (cω + ηk) / (2k).
 * @param omega  natural frequency, rad/s
 */
export function dampingRatio({ stiffnessAt }: VerticalModel, omega: number): number {
  const { k, c, h } = stiffnessAt(omega);
  return (c * omega + h) / (2 * k);
}
