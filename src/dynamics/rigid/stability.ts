import { addFootStiffness, N } from "./geometry.ts";
import type { RigidModel } from "./model.ts";

/** Rocking stiffness that is left, and what it has to be. */
export interface Stability {
  /** Smaller eigenvalue of the rocking stiffness, N·m/rad; null where nothing holds the body sideways. */
  readonly stiffness: number | null;
  /** What gravity takes, N·m/rad. */
  readonly needed: number;
}

const HOLDS = 1e-12;

/**
 * Static rocking stiffness of a body with its other freedoms left to follow, S = K_rr − K_rf·K_ff⁻¹·K_fr, r being
 * roll and pitch, K the static tangent with gravity. The bare elements of K pass bodies that fall over sideways
 * while they tilt.
 */
export function stabilityOf({ feet, gravityMoment }: RigidModel): Stability {
  const k = new Float64Array(N * N);
  for (const { geometry, stiffness } of feet) addFootStiffness(k, geometry, stiffness);
  k[3 * N + 3] = (k[3 * N + 3] as number) + gravityMoment;
  k[4 * N + 4] = (k[4 * N + 4] as number) + gravityMoment;
  const needed = Math.max(0, -gravityMoment);
  const size = Array.from({ length: N }, (_, i) => Math.abs(k[N * i + i] as number));
  // Eliminate the four that follow, one by one.
  for (const pivot of [0, 1, 2, 5]) {
    const d = k[N * pivot + pivot] as number;
    if (!(d > HOLDS * (size[pivot] as number)) || d === 0) return { stiffness: null, needed };
    for (let i = 0; i < N; i++) {
      if (i === pivot) continue;
      const factor = (k[N * i + pivot] as number) / d;
      for (let j = 0; j < N; j++)
        k[N * i + j] = (k[N * i + j] as number) - factor * (k[N * pivot + j] as number);
    }
  }
  const a = k[3 * N + 3] as number;
  const b = k[4 * N + 4] as number;
  const c = k[3 * N + 4] as number;
  return { stiffness: (a + b) / 2 - Math.hypot((a - b) / 2, c), needed };
}
