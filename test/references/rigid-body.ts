/**
 * Published and computed numbers on a rigid body on resilient supports.
 * "Recalled, recomputed": the published answer was recalled and its recalled inputs give it by computation.
 */

/**
 * Body of the benchmarks: 1000 kg uniform box, 1.2 × 0.8 × 1.0 m along x, y, z. Natural frequencies in Hz computed
 * with an independent numerical library as eigenvalues of K·v = ω²·M·v; no publication.
 */
export const BENCHMARK_BOX = { mass: 1000, length: 1.2, width: 0.8, height: 1.0 } as const;

export interface Benchmark {
  readonly name: string;
  /** Places from the CG, m, with lateral and axial stiffness, kN/m. */
  readonly feet: readonly (readonly [x: number, y: number, z: number, lateral: number, axial: number])[];
  /** Product of inertia xz as it stands in the matrix, kg·m². */
  readonly xz: number;
  readonly hertz: readonly number[];
}

const four = (
  xs: readonly (readonly [number, number, number])[],
): readonly (readonly [number, number, number, number, number])[] =>
  xs.flatMap(([x, lateral, axial]) => [-0.35, 0.35].map((y) => [x, y, -0.45, lateral, axial] as const));

export const BENCHMARKS: readonly Benchmark[] = [
  {
    name: "A symmetric",
    feet: four([
      [0.5, 60, 100],
      [-0.5, 60, 100],
    ]),
    xz: 0,
    hertz: [1.5982, 1.8999, 3.1831, 3.6145, 4.5806, 4.6491],
  },
  {
    name: "B offset, equal mounts",
    feet: four([
      [0.6, 60, 100],
      [-0.4, 60, 100],
    ]),
    xz: 0,
    hertz: [1.5892, 1.8895, 3.1408, 3.5881, 4.6676, 4.71],
  },
  {
    name: "C offset, stiffness by load",
    feet: four([
      [0.6, 48, 80],
      [-0.4, 72, 120],
    ]),
    xz: 0,
    hertz: [1.5982, 1.8806, 3.1831, 3.5657, 4.5339, 4.6491],
  },
  {
    name: "D as B, with inertia-matrix entries xz = −15",
    feet: four([
      [0.6, 60, 100],
      [-0.4, 60, 100],
    ]),
    xz: -15,
    hertz: [1.5923, 1.8895, 3.1408, 3.4994, 4.6676, 4.843],
  },
];

/**
 * Coupled roots of translation and rocking over the vertical frequency, four equal supports with two planes of
 * symmetry, a_x = 1. Computed from the closed form of C. E. Crede, Vibration and Shock Isolation (1951), and Harris'
 * Shock and Vibration Handbook, chapter 3 (recalled).
 */
export const COUPLED_ROOTS = [
  { lateral: 1, height: 1, gyration: 0.8165, low: 0.64719, high: 1.89239 },
  { lateral: 0.5, height: 1, gyration: 0.8165, low: 0.55408, high: 1.56301 },
  { lateral: 0.5, height: 0.5, gyration: 0.8165, low: 0.6525, high: 1.3273 },
  { lateral: 0.25, height: 1, gyration: 0.8165, low: 0.4407, high: 1.3895 },
  { lateral: 1, height: 0.5, gyration: 1, low: 0.7808, high: 1.2808 },
  { lateral: 1, height: 1, gyration: 1, low: 0.618, high: 1.618 },
  { lateral: 2, height: 1, gyration: 0.8165, low: Math.SQRT1_2, high: 2.4495 },
  { lateral: 2, height: 1.5, gyration: 0.5, low: 0.5815, high: 4.8644 },
] as const;

/**
 * T. Irvine, tutorial on the six-degree-of-freedom response of an isolated avionics component: all six published
 * natural frequencies. The layout was recalled and accepted because all six come out.
 */
export const AVIONICS = {
  massLb: 4.28,
  inertiaLbIn2: { xx: 44.9, yy: 39.9, zz: 18.8 },
  stiffnessLbfPerIn: 80,
  feetIn: [
    [6.18, 3.85, 3],
    [6.18, 3.85, -3],
    [2.68, 3.85, 3],
    [2.68, 3.85, -3],
  ],
  hertz: [7.338, 12.02, 27.04, 27.47, 63.06, 83.19],
} as const;

/** Plane bounce and pitch: supports along x at the height of the CG, vertical stiffness only. */
export const BOUNCE_AND_PITCH = [
  {
    source: "Rao, Mechanical Vibrations, automobile example (recalled, recomputed)",
    mass: 1000,
    gyration: 0.9,
    supports: [
      [1.0, 18e3],
      [-1.5, 22e3],
    ],
    radPerS: [5.8593, 9.4341],
    digits: 5e-5,
  },
  {
    // W = 3220 lb at g = 32.2 ft/s² is 100 slug; radius 4 ft; pounds, feet and slugs are one coherent system.
    source: "Thomson, Theory of Vibration, automobile example (recalled, recomputed)",
    mass: 100,
    gyration: 4,
    supports: [
      [4.5, 2400],
      [-5.5, 2600],
    ],
    radPerS: [6.89943, 9.05147],
    digits: 5e-6,
  },
  {
    source: "Edwards and Penney, two-axle car, problem 7.4-24 (published 6.13, 10.31)",
    mass: 100,
    gyration: Math.sqrt(10),
    supports: [
      [6, 2000],
      [-4, 2000],
    ],
    radPerS: [6.13113, 10.31549],
    digits: 5e-6,
  },
] as const;
