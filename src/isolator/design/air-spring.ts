/** Standard atmosphere, Pa (ISO 2533). */
const ATMOSPHERE = 101_325;

/** Polytropic exponent of air that is compressed fast (common practice for vibration above 1 Hz). */
export const FAST_EXPONENT = 1.38;

/** An air spring at its working height, SI units. */
export interface AirSpring {
  /** Pa above atmosphere */
  readonly gaugePressure: number;
  /** Effective area, m². */
  readonly area: number;
  /** With any auxiliary tank, m³. */
  readonly volume: number;
  /** Change of effective area with height, m. */
  readonly areaSlope: number;
  /** Polytropic exponent: 1.0 slow, 1.4 fast. */
  readonly exponent: number;
}

/** Load that an air spring carries, N: gauge pressure times effective area. */
export function airSpringLoad({ gaugePressure, area }: AirSpring): number {
  return gaugePressure * area;
}

/**
 * Stiffness of an air spring, k = n·p_abs·A²/V + p_gauge·dA/dz.
 * @returns N/m
 * Source: Harris' Shock and Vibration Handbook; C. E. Crede, Vibration and Shock Isolation (both recalled).
 */
export function airSpringStiffness({ gaugePressure, area, volume, areaSlope, exponent }: AirSpring): number {
  return (exponent * (gaugePressure + ATMOSPHERE) * area ** 2) / volume + gaugePressure * areaSlope;
}
