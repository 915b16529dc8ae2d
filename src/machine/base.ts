import { boxInertia, type RigidBody } from "./rigid-body.ts";
import type { Vec3 } from "./vector.ts";

/** Density of what inertia bases are made of, kg/m³ (common practice for normal concrete and structural steel). */
const BASE_DENSITY = { concrete: 2400, steel: 7850 } as const;

export type BaseMaterial = keyof typeof BASE_DENSITY;

/** A solid slab under the machine, SI units. */
export interface Slab {
  readonly length: number;
  readonly width: number;
  readonly thickness: number;
  readonly material: BaseMaterial;
  /** kg; overrides the density, as for a steel frame filled in part. */
  readonly mass: number | null;
}

/** Mass of a slab, kg. */
export function slabMass({ length, width, thickness, material, mass }: Slab): number {
  return mass ?? length * width * thickness * BASE_DENSITY[material];
}

/**
 * A slab as a uniform box.
 * @param centre  where its middle is, m
 */
export function slabBody(slab: Slab, centre: Vec3): RigidBody {
  const mass = slabMass(slab);
  return {
    mass,
    centreOfGravity: centre,
    inertia: boxInertia(mass, slab.length, slab.width, slab.thickness),
  };
}
