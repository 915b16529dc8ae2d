/** Cold-coiled spring steel: shear and Young's modulus, Pa, and density, kg/m³ (EN 13906-1, rounded). */
export const SPRING_STEEL = { shearModulus: 79.3e9, youngModulus: 206e9, density: 7850 } as const;

/** A helical compression spring with closed and ground ends, SI units. */
export interface HelicalSpring {
  /** Wire diameter d, m. */
  readonly wire: number;
  /** Mean coil diameter D, m. */
  readonly coil: number;
  /** Active coils n. */
  readonly active: number;
}

export interface SpringMaterial {
  readonly shearModulus: number;
  readonly youngModulus: number;
  readonly density: number;
}

/**
 * Rate of a helical spring, k = G·d⁴/(8·D³·n).
 * @returns N/m
 * Validity: round wire, small pitch.   Source: any text on machine design; EN 13906-1.
 */
export function springRate({ wire, coil, active }: HelicalSpring, { shearModulus }: SpringMaterial): number {
  return (shearModulus * wire ** 4) / (8 * coil ** 3 * active);
}

/**
 * Wahl's correction of shear stress for curvature and direct shear, K = (4C − 1)/(4C − 4) + 0.615/C.
 * @param index  C = D/d, > 1
 */
export function wahlFactor(index: number): number {
  return (4 * index - 1) / (4 * index - 4) + 0.615 / index;
}

/**
 * Largest shear stress in the wire under a load, τ = K·8·F·D/(π·d³).
 * @param load  N
 * @returns     Pa
 */
export function springStress({ wire, coil }: HelicalSpring, load: number): number {
  return (wahlFactor(coil / wire) * 8 * load * coil) / (Math.PI * wire ** 3);
}

/** Mass of the active wire, kg: ρ·π·d²/4 · π·D·n. */
export function activeMass({ wire, coil, active }: HelicalSpring, { density }: SpringMaterial): number {
  return ((density * Math.PI * wire ** 2) / 4) * Math.PI * coil * active;
}

/**
 * First surge frequency of a spring between two plates, f = ½·√(k/m).
 * @returns Hz
 * Source: any text on machine design, e.g. Shigley, Mechanical Engineering Design.
 */
export function surgeFrequency(spring: HelicalSpring, material: SpringMaterial): number {
  return Math.sqrt(springRate(spring, material) / activeMass(spring, material)) / 2;
}

/**
 * Lateral over axial rate of a spring whose ends stay parallel,
 * ξ / (ξ − 1 + (1/λ)/(½ + G/E)·Q·tan(λ·ξ·Q)), Q = √((½ + G/E)·(G/E + (1 − ξ)/ξ)).
 * @param slenderness  λ = free length over mean diameter
 * @param deflection   ξ = deflection over free length, in (0, 1)
 * @returns            not positive where the spring gives way sideways
 * Source: EN 13906-1 (Gross 1951); the same as Haringx's column theory.
 */
export function lateralRatio(slenderness: number, deflection: number, material: SpringMaterial): number {
  const g = material.shearModulus / material.youngModulus;
  const q = Math.sqrt((0.5 + g) * (g + (1 - deflection) / deflection));
  const tangent = Math.tan(slenderness * deflection * q);
  return deflection / (deflection - 1 + (1 / slenderness / (0.5 + g)) * q * tangent);
}

/**
 * Deflection over free length at which a spring buckles,
 * 0.5/(1 − G/E)·[1 − √(1 − (1 − G/E)/(0.5 + G/E)·(π/(ν·λ))²)].
 * @param slenderness  λ = free length over mean diameter
 * @param seating      ν: 0.5 both ends fixed and parallel, 0.7 fixed and hinged, 1 both hinged, 2 fixed and free
 * @returns            null where the spring cannot buckle
 * Source: EN 13906-1.
 */
export function bucklingDeflection(
  slenderness: number,
  seating: number,
  material: SpringMaterial,
): number | null {
  const g = material.shearModulus / material.youngModulus;
  const root = 1 - ((1 - g) / (0.5 + g)) * (Math.PI / (seating * slenderness)) ** 2;
  return root < 0 ? null : (0.5 / (1 - g)) * (1 - Math.sqrt(root));
}
