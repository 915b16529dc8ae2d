import {
  compressionStiffness,
  discShape,
  rectangleShape,
  rubberOf,
  shearStiffness,
} from "../../src/isolator/design/index.ts";
import type { IsolatorRecord } from "../../src/isolator/index.ts";
import { priceOf, RESISTS, risingPrices, rounded, SOURCE, seriesWith } from "./trade.ts";

/** Static strain at rated load (common practice: 10 to 15 % in compression, up to 50 % in shear). */
const COMPRESSION = 0.12;
const PAD_COMPRESSION = 0.1;
const SHEAR = 0.35;
/** Strain at which a part meets its stop or its limit, dynamic deflection included. */
const COMPRESSION_LIMIT = 0.2;
const SHEAR_LIMIT = 0.75;
/** Mean pressure that a loose pad bears for good, Pa (common practice for plain pads of these hardnesses). */
const PAD_PRESSURE = 2.5e6;
const RUBBER_DENSITY = 1150;
const STEEL_DENSITY = 7850;

/**
 * What a compound is like beside its table of moduli: dynamic stiffening and loss rise with hardness, as filler does
 * (common practice; from memory).
 */
const COMPOUNDS: Readonly<Record<number, { readonly dynamicRatio: number; readonly lossFactor: number }>> = {
  40: { dynamicRatio: 1.15, lossFactor: 0.06 },
  45: { dynamicRatio: 1.2, lossFactor: 0.07 },
  50: { dynamicRatio: 1.3, lossFactor: 0.09 },
  55: { dynamicRatio: 1.4, lossFactor: 0.1 },
  60: { dynamicRatio: 1.5, lossFactor: 0.12 },
  65: { dynamicRatio: 1.7, lossFactor: 0.14 },
  70: { dynamicRatio: 1.9, lossFactor: 0.17 },
};

function compound(hardness: number) {
  const { dynamicRatio, lossFactor } = COMPOUNDS[hardness] as (typeof COMPOUNDS)[number];
  return { dynamic_ratio: dynamicRatio, damping: { loss_factor: lossFactor }, tolerance: 0.15 };
}

const chloroprene = { temperature_c: { min: -25, max: 90 }, resists: RESISTS.chloroprene };
const naturalRubber = { temperature_c: { min: -40, max: 70 }, resists: RESISTS.naturalRubber };

/** Parts of one series that differ in size and hardness, weakest first, each rated at its own strain. */
function seriesOf(parts: readonly IsolatorRecord[]): readonly IsolatorRecord[] {
  return risingPrices([...parts].sort((a, b) => a.load_n.max - b.load_n.max));
}

/** Square pads, plain faces, loose under the foot. */
function pads(series: string, thicknessMm: number, hardness: number): readonly IsolatorRecord[] {
  const t = thicknessMm / 1000;
  return seriesOf(
    [30, 40, 50, 60, 75, 100, 125, 150, 200, 250].flatMap((side) => {
      const a = side / 1000;
      const shape = rectangleShape(a, a, t);
      // A loose pad is held by friction only, so its bulging is freer than a bonded one's; rated as bonded, on the
      // side of too stiff.
      const k = compressionStiffness(rubberOf(hardness), a * a, t, shape, true);
      const load = rounded(k * PAD_COMPRESSION * t, 3);
      if (load / (a * a) > PAD_PRESSURE) return [];
      const mass = a * a * t * RUBBER_DENSITY;
      return {
        designation: `pad-${side}x${side}x${thicknessMm}-h${hardness}-${load}N`,
        series,
        family: "elastomer_pad",
        axial: { stiffness_n_per_mm: rounded(k / 1000, 5) },
        ...compound(hardness),
        lateral_ratio: rounded(shearStiffness(rubberOf(hardness), a * a, t) / k, 3),
        load_n: { min: rounded(0.1 * load, 3), max: load, rated: load },
        travel_mm: rounded((COMPRESSION_LIMIT - PAD_COMPRESSION) * thicknessMm, 3),
        ...chloroprene,
        captive: false,
        free_height_mm: thicknessMm,
        footprint_mm: { length: side, width: side },
        mass_kg: rounded(mass, 3),
        price: priceOf(mass, 0.8, 14),
        currency: "EUR",
        lead_time_days: 3,
        source: SOURCE,
      };
    }),
  );
}

/** Cylinders bonded between two plates with studs, loaded in compression. */
function sandwiches(
  series: string,
  thicknessMm: number,
  hardnesses: readonly number[],
): readonly IsolatorRecord[] {
  const t = thicknessMm / 1000;
  const diameters = [15, 20, 25, 30, 40, 50, 60, 75, 100, 125].filter(
    // Slimmer than this a block in compression is unsteady (Harris' Shock and Vibration Handbook: length over width 1.6).
    (d) => thicknessMm / d <= 1.6 && d / (4 * thicknessMm) <= 1.2,
  );
  return seriesOf(
    diameters.flatMap((diameter) =>
      hardnesses.map((hardness) => {
        const thread = diameter < 25 ? "M5" : diameter < 50 ? "M8" : "M12";
        const d = diameter / 1000;
        const area = (Math.PI * d * d) / 4;
        const k = compressionStiffness(rubberOf(hardness), area, t, discShape(d, t));
        const load = rounded(k * COMPRESSION * t, 3);
        const mass = area * (t * RUBBER_DENSITY + 0.006 * STEEL_DENSITY) + 0.01;
        return {
          designation: `sandwich-${diameter}x${thicknessMm}-h${hardness}-${load}N`,
          series: seriesWith(series, thread),
          family: "sandwich_mount",
          axial: { stiffness_n_per_mm: rounded(k / 1000, 5) },
          ...compound(hardness),
          lateral_ratio: rounded(shearStiffness(rubberOf(hardness), area, t) / k, 3),
          load_n: { min: rounded(0.12 * load, 3), max: load, rated: load },
          travel_mm: rounded((COMPRESSION_LIMIT - COMPRESSION) * thicknessMm, 3),
          ...naturalRubber,
          captive: false,
          free_height_mm: thicknessMm + 6,
          outside_diameter_mm: diameter,
          footprint_mm: { length: diameter, width: diameter },
          thread,
          mass_kg: rounded(mass, 3),
          price: priceOf(mass, 1.5, 13),
          currency: "EUR",
          lead_time_days: 4,
          source: SOURCE,
        };
      }),
    ),
  );
}

/** A ring of rubber bonded between two sleeves under a bell, loaded in shear; the bell holds the machine when it lifts. */
function mounts(series: string, wallMm: number, hardnesses: readonly number[]): readonly IsolatorRecord[] {
  const wall = wallMm / 1000;
  return seriesOf(
    [15, 20, 30, 40, 55, 75, 100].flatMap((inner) =>
      hardnesses.map((hardness) => {
        const thread = inner < 30 ? "M8" : "M12";
        const mean = inner / 1000 + wall;
        const height = 1.5 * wall + 0.25 * mean;
        // A wall that is thin beside its diameter shears like a flat strip.
        const k = shearStiffness(rubberOf(hardness), Math.PI * mean * height, wall);
        const load = rounded(k * SHEAR * wall, 3);
        const outside = inner + 2 * wallMm + 6;
        const mass =
          Math.PI * mean * height * (wall * RUBBER_DENSITY + 0.006 * STEEL_DENSITY) +
          ((Math.PI * (outside / 1000) ** 2) / 4) * 0.004 * STEEL_DENSITY;
        return {
          designation: `bellmount-${inner}x${wallMm}-h${hardness}-${load}N`,
          series: seriesWith(series, thread),
          family: "elastomer_mount",
          axial: { stiffness_n_per_mm: rounded(k / 1000, 5) },
          ...compound(hardness),
          // Across, the ring is squeezed on two sides and sheared on the others.
          lateral_ratio: 2.2,
          load_n: { min: rounded(0.2 * load, 3), max: load, rated: load },
          travel_mm: rounded((SHEAR_LIMIT - SHEAR) * wallMm, 3),
          ...chloroprene,
          captive: true,
          free_height_mm: Math.round(5 * wallMm),
          outside_diameter_mm: outside,
          footprint_mm: { length: Math.round(1.5 * outside), width: outside },
          thread,
          mass_kg: rounded(mass, 3),
          price: priceOf(mass, 4.5, 15),
          currency: "EUR",
          lead_time_days: 6,
          source: SOURCE,
        };
      }),
    ),
  );
}

/** Every isolator whose spring is rubber. */
export function rubberRecords(): readonly IsolatorRecord[] {
  return [
    ...pads("pad-12", 12, 60),
    ...pads("pad-25", 25, 50),
    ...pads("pad-50", 50, 50),
    ...sandwiches("sandwich-20", 20, [45, 60]),
    ...sandwiches("sandwich-30", 30, [45, 55, 65]),
    ...sandwiches("sandwich-50", 50, [40, 50, 60]),
    ...mounts("bellmount-10", 10, [40, 50, 60]),
    ...mounts("bellmount-16", 16, [45, 60]),
    ...mounts("bellmount-25", 25, [40, 50, 60]),
  ];
}
