/**
 * Published numbers on one degree of freedom that tests are held against. "Worked" examples stand in the books
 * named; where a book's answer was recalled and recomputed from its inputs, `mark` says so.
 */

/** Frequency ratios of the table below. */
export const RATIOS = [0.5, 1, Math.SQRT2, 1.5, 2, 3, 4, 5, 10] as const;

/**
 * T(r, ζ) for viscous damping, computed with an independent numerical library from
 * T = √[(1+(2ζr)²)/((1−r²)²+(2ζr)²)], the formula of every text on vibration (e.g. Harris' Shock and Vibration
 * Handbook; Rao, Mechanical Vibrations; Inman, Engineering Vibration). Printed to five decimals.
 */
export const VISCOUS_TABLE: readonly (readonly [zeta: number, ...transmissibility: readonly number[]])[] = [
  [0, 1.33333, Number.POSITIVE_INFINITY, 1, 0.8, 0.33333, 0.125, 0.06667, 0.04167, 0.0101],
  [0.01, 1.33328, 50.01, 1, 0.80013, 0.33357, 0.12522, 0.06688, 0.04187, 0.0103],
  [0.05, 1.33204, 10.0499, 1, 0.80319, 0.33918, 0.13041, 0.07178, 0.04657, 0.01428],
  [0.1, 1.32823, 5.09902, 1, 0.81216, 0.35586, 0.14537, 0.08525, 0.05887, 0.02258],
  [0.2, 1.31383, 2.69258, 1, 0.84108, 0.41246, 0.1931, 0.12508, 0.09285, 0.04161],
  [0.5, 1.24035, Math.SQRT2, 1, 0.92329, 0.62017, 0.37012, 0.26559, 0.20799, 0.101],
  [1.0, 1.13137, 1.11803, 1, 0.97301, 0.82462, 0.60828, 0.47425, 0.38653, 0.19827],
];

/** Largest transmissibility and where: r_p = √(√(1+8ζ²)−1)/(2ζ). Computed likewise. */
export const VISCOUS_PEAKS = [
  { zeta: 0.01, ratio: 0.9999, peak: 50.0125 },
  { zeta: 0.05, ratio: 0.997522, peak: 10.06221 },
  { zeta: 0.1, ratio: 0.990334, peak: 5.12277 },
  { zeta: 0.2, ratio: 0.96473, peak: 2.73392 },
  { zeta: 0.5, ratio: 0.8556, peak: 1.46789 },
] as const;

/** Frequency ratios of the structural table. */
export const STRUCTURAL_RATIOS = [1, 1.5, 2, 3, 5, 10] as const;

/** T(r, η) for structural damping, T = √[(1+η²)/((1−r²)²+η²)]. Computed likewise. */
export const STRUCTURAL_TABLE: readonly (readonly [eta: number, ...transmissibility: readonly number[]])[] = [
  [0.02, 50.01, 0.80006, 0.33339, 0.12502, 0.04167, 0.0101],
  [0.1, 10.0499, 0.80143, 0.33481, 0.12561, 0.04187, 0.01015],
  [0.2, 5.09902, 0.8056, 0.33918, 0.12744, 0.04249, 0.0103],
  [0.4, 2.69258, 0.82063, 0.35586, 0.13446, 0.04487, 0.01088],
  [1.0, Math.SQRT2, 0.88345, 0.44721, 0.17541, 0.05887, 0.01428],
];

/** Natural frequency in Hz from static deflection; 15.76/√(d mm), printed to four decimals. */
export const FREQUENCY_OF_DEFLECTION_MM = [
  [1, 15.7609],
  [2.5, 9.9681],
  [5, 7.0485],
  [6, 6.4344],
  [10, 4.984],
  [19, 3.6158],
  [25, 3.1522],
  [38, 2.5568],
  [50, 2.2289],
  [64, 1.9701],
  [89, 1.6706],
  [100, 1.5761],
] as const;

/** Natural frequency in Hz from static deflection in inches; 3.127/√(d in), printed to four decimals. */
export const FREQUENCY_OF_DEFLECTION_IN = [
  [0.1, 9.8893],
  [0.25, 6.2545],
  [0.5, 4.4226],
  [0.75, 3.611],
  [1, 3.1273],
  [1.5, 2.5534],
  [2, 2.2113],
  [2.5, 1.9779],
  [3.5, 1.6716],
  [4, 1.5636],
] as const;

/** Static deflection in mm that an undamped mount needs for 80, 90, 95, 98 % efficiency: d = (g/ω²)(1 + 1/(1−E)). */
export const DEFLECTION_NEEDED_MM: readonly (readonly [rpm: number, ...mm: readonly number[]])[] = [
  [600, 14.9, 27.32, 52.17, 126.69],
  [750, 9.54, 17.49, 33.39, 81.08],
  [1000, 5.37, 9.84, 18.78, 45.61],
  [1500, 2.38, 4.37, 8.35, 20.27],
  [1800, 1.66, 3.04, 5.8, 14.08],
  [3000, 0.6, 1.09, 2.09, 5.07],
];
