import { InputError } from "../../errors/index.ts";

/** A natural rubber by its hardness. */
export interface Rubber {
  /** IRHD */
  readonly hardness: number;
  /** Young's modulus E0, Pa. */
  readonly youngModulus: number;
  /** Pa */
  readonly shearModulus: number;
  /** Factor ϕ of the shape factor squared. */
  readonly shapeWeight: number;
  /** Pa */
  readonly bulkModulus: number;
}

const rubber = (hardness: number, e: number, g: number, weight: number, bulk: number): Rubber => ({
  hardness,
  youngModulus: e * 1e6,
  shearModulus: g * 1e6,
  shapeWeight: weight,
  bulkModulus: bulk * 1e6,
});

/**
 * Natural rubber, filled with SRF black above 48 IRHD; hardness ± 2.
 * Source: P. B. Lindley, Engineering Design with Natural Rubber (recalled; two rows met in print within 2.5 %).
 */
const RUBBERS: readonly Rubber[] = [
  rubber(30, 0.92, 0.3, 0.93, 1000),
  rubber(35, 1.18, 0.37, 0.89, 1000),
  rubber(40, 1.5, 0.45, 0.85, 1000),
  rubber(45, 1.8, 0.54, 0.8, 1000),
  rubber(50, 2.2, 0.64, 0.73, 1030),
  rubber(55, 3.25, 0.81, 0.64, 1090),
  rubber(60, 4.45, 1.06, 0.57, 1150),
  rubber(65, 5.85, 1.37, 0.54, 1210),
  rubber(70, 7.35, 1.73, 0.53, 1270),
  rubber(75, 9.4, 2.22, 0.52, 1330),
];

/**
 * The rubber of a hardness in the table.
 * @throws {InputError} at `/hardness`, naming those there are
 */
export function rubberOf(hardness: number): Rubber {
  const found = RUBBERS.find((entry) => entry.hardness === hardness);
  if (found) return found;
  const known = RUBBERS.map((entry) => entry.hardness).join(", ");
  throw InputError.at("/hardness", `${hardness} IRHD is not in the table of ${known}`);
}

/** Shape factor of a disc, one loaded area over the force-free area: D/(4t). */
export function discShape(diameter: number, thickness: number): number {
  return diameter / (4 * thickness);
}

/** Shape factor of a rectangular block: a·b/(2t(a + b)). */
export function rectangleShape(length: number, width: number, thickness: number): number {
  return (length * width) / (2 * thickness * (length + width));
}

/**
 * Compression stiffness of a block bonded on both faces, k = E_c·A/t with E_c = E0(1 + 2ϕS²).
 * @param area       one loaded face, m²
 * @param thickness  m
 * @param shape      shape factor S
 * @param bulk       whether the bulk modulus counts, 1/E = 1/E_c + 1/B, as it does in thin pads
 * @returns          N/m
 * Validity: strains up to about 15 %.   Source: A. N. Gent and P. B. Lindley, Proc. IMechE 173 (1959) 111.
 */
export function compressionStiffness(
  { youngModulus, shapeWeight, bulkModulus }: Rubber,
  area: number,
  thickness: number,
  shape: number,
  bulk = false,
): number {
  const compression = youngModulus * (1 + 2 * shapeWeight * shape ** 2);
  const modulus = bulk ? 1 / (1 / compression + 1 / bulkModulus) : compression;
  return (modulus * area) / thickness;
}

/** Shear stiffness of a block, k = G·A/t, N/m. */
export function shearStiffness({ shearModulus }: Rubber, area: number, thickness: number): number {
  return (shearModulus * area) / thickness;
}
