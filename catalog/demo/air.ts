import {
  type AirSpring,
  airSpringLoad,
  airSpringStiffness,
  FAST_EXPONENT,
} from "../../src/isolator/design/index.ts";
import type { IsolatorRecord } from "../../src/isolator/index.ts";
import { STANDARD_GRAVITY } from "../../src/units/index.ts";
import { priceOf, RESISTS, risingPrices, rounded, SOURCE, seriesWith } from "./trade.ts";

/** Gauge pressures between which an air spring works, and at which it is rated, Pa (common practice). */
const PRESSURE = { least: 200e3, rated: 500e3, most: 700e3 };
/** Effective area at working height over the area of the outer circle (common practice for one convolution). */
const AREA_SHARE = 0.62;

/**
 * Rolling-sleeve air springs of one working height, with or without a tank that softens them.
 * @param tank  volume added, as a share of the spring's own
 */
function sleeves(
  series: string,
  heightMm: number,
  tank: number,
  diameters: readonly number[],
  basePrice: number,
) {
  return risingPrices(
    diameters.map((diameter): IsolatorRecord => {
      const thread = diameter < 200 ? "M12" : "M16";
      const outer = (Math.PI * (diameter / 1000) ** 2) / 4;
      const area = AREA_SHARE * outer;
      const at = (gaugePressure: number): AirSpring => ({
        gaugePressure,
        area,
        volume: area * (heightMm / 1000) * (1 + tank),
        // A sleeve that rolls on a straight piston keeps its area.
        areaSlope: 0,
        exponent: FAST_EXPONENT,
      });
      const rated = airSpringLoad(at(PRESSURE.rated));
      const frequency =
        Math.sqrt((airSpringStiffness(at(PRESSURE.rated)) * STANDARD_GRAVITY) / rated) / (2 * Math.PI);
      const max = rounded(airSpringLoad(at(PRESSURE.most)), 3);
      const mass = 14 * outer + 0.0035 * diameter * (1 + tank) + 0.3;
      return {
        designation: `airsleeve-${diameter}x${heightMm}${tank > 0 ? "-tank" : ""}-${max}N`,
        series: seriesWith(series, thread),
        family: "air_spring",
        axial: { natural_frequency_hz: rounded(frequency, 3) },
        damping: { ratio: tank > 0 ? 0.05 : 0.03 },
        // A sleeve has little stiffness across; a guide gives it this much.
        lateral_ratio: 0.3,
        load_n: { min: rounded(airSpringLoad(at(PRESSURE.least)), 3), max, rated: rounded(rated, 3) },
        travel_mm: Math.round(0.22 * heightMm),
        tolerance: 0.1,
        temperature_c: { min: -30, max: 60 },
        resists: RESISTS.naturalRubber,
        captive: false,
        free_height_mm: heightMm,
        outside_diameter_mm: diameter,
        footprint_mm: { length: diameter + 20, width: diameter + 20 },
        thread,
        mass_kg: rounded(mass, 3),
        price: priceOf(mass, basePrice, 32),
        currency: "EUR",
        lead_time_days: 25,
        source: SOURCE,
      };
    }),
  );
}

/** Every air spring. */
export function airRecords(): readonly IsolatorRecord[] {
  const diameters = [70, 85, 100, 120, 140, 165, 200, 240, 280, 330, 400, 480];
  return [
    ...sleeves("airsleeve-90", 90, 0, diameters, 60),
    ...sleeves("airsleeve-140", 140, 0, diameters.slice(2), 85),
    ...sleeves("airsleeve-140-tank", 140, 1.5, diameters.slice(4), 170),
  ];
}
