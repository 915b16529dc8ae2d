import { SPRING_STEEL } from "../../src/isolator/design/index.ts";
import type { IsolatorRecord } from "../../src/isolator/index.ts";
import { priceOf, RESISTS, risingPrices, rounded, SOURCE, seriesWith } from "./trade.ts";

/** Wires in a rope, and a wire's diameter as a share of the rope's (seven strands of seven: d/9). */
const WIRES = 49;
const WIRE_SHARE = 1 / 9;
/** Static deflection at rated load as a share of the loop's height (common practice). */
const STATIC_SHARE = 0.15;
const TRAVEL_SHARE = 0.3;

/**
 * Stiffness of loops of wire rope pressed between two bars: each a ring under two opposite forces,
 * δ = 0.149·F·R³/(E·I), its wires sliding on one another and so bending singly.
 * Source: R. J. Roark, Formulas for Stress and Strain, circular ring (from memory).
 */
function loopStiffness(rope: number, radius: number, loops: number): number {
  const wire = rope * WIRE_SHARE;
  const bending = WIRES * SPRING_STEEL.youngModulus * ((Math.PI * wire ** 4) / 64);
  return (loops * bending) / (0.149 * radius ** 3);
}

/** Helical wire-rope isolators of one height: ropes and numbers of loops between the same bars. */
function ropes(series: string, heightMm: number, ropeMm: readonly number[], loops: readonly number[]) {
  const radius = heightMm / 2000;
  return risingPrices(
    ropeMm
      .flatMap((rope) =>
        loops.map((count): IsolatorRecord => {
          const thread = rope < 6 ? "M6" : "M10";
          const k = loopStiffness(rope / 1000, radius, count);
          const load = rounded(k * STATIC_SHARE * 2 * radius, 3);
          const mass =
            count *
              2 *
              Math.PI *
              radius *
              0.55 *
              ((Math.PI * (rope / 1000) ** 2) / 4) *
              SPRING_STEEL.density +
            count * rope * 1e-3 * 2.2 * 0.016 * 0.025 * 2 * 2700;
          const length = Math.round(count * rope * 2.2 + 20);
          return {
            designation: `ropeloop-${count}x${rope}-h${heightMm}-${load}N`,
            series: seriesWith(series, thread),
            family: "wire_rope",
            axial: { stiffness_n_per_mm: rounded(k / 1000, 5) },
            dynamic_ratio: 1.3,
            damping: { loss_factor: 0.26 },
            lateral_ratio: 0.45,
            load_n: { min: rounded(0.2 * load, 3), max: load, rated: load },
            travel_mm: rounded(TRAVEL_SHARE * heightMm, 3),
            tolerance: 0.2,
            temperature_c: { min: -70, max: 180 },
            resists: RESISTS.stainlessSteel,
            captive: true,
            free_height_mm: heightMm,
            footprint_mm: { length, width: Math.round(heightMm * 1.15) },
            thread,
            mass_kg: rounded(mass, 3),
            price: priceOf(mass, 28, 55),
            currency: "EUR",
            lead_time_days: 20,
            source: SOURCE,
          };
        }),
      )
      .sort((a, b) => a.load_n.max - b.load_n.max),
  );
}

/** Every isolator of wire rope. */
export function wireRopeRecords(): readonly IsolatorRecord[] {
  return [
    ...ropes("ropeloop-40", 40, [2, 3, 4, 5, 6], [4, 8]),
    ...ropes("ropeloop-90", 90, [6, 8, 10, 12], [6, 10]),
    ...ropes("ropeloop-150", 150, [12, 16, 20], [6, 10]),
  ];
}
