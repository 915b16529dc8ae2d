import type { Source } from "./source.ts";

/** Boundaries of the evaluation zones of one group of machines on one kind of support. */
export interface MachineZones {
  readonly group: string;
  readonly support: "rigid" | "flexible";
  /** A/B, B/C, C/D; rms, m/s */
  readonly velocity: readonly [number, number, number];
  /** A/B, B/C, C/D; rms, m */
  readonly displacement: readonly [number, number, number];
}

const LARGE = "1: above 300 kW up to 50 MW, electrical machines with a shaft height of 315 mm and more";
const MEDIUM = "2: 15 kW up to 300 kW, electrical machines with a shaft height of 160 mm up to 315 mm";

const zones = (
  group: string,
  support: "rigid" | "flexible",
  mmPerS: readonly [number, number, number],
  micrometres: readonly [number, number, number],
): MachineZones => ({
  group,
  support,
  velocity: [mmPerS[0] * 1e-3, mmPerS[1] * 1e-3, mmPerS[2] * 1e-3],
  displacement: [micrometres[0] * 1e-6, micrometres[1] * 1e-6, micrometres[2] * 1e-6],
});

/**
 * Zones of vibration on non-rotating parts, 10 Hz to 1000 Hz (from 2 Hz below 600 r/min). A support is rigid when
 * its lowest natural frequency in the measuring direction is at least 25 % above the main excitation frequency; a
 * machine on isolators therefore stands on a flexible one.
 * Source: ISO 20816-3:2022 (before: ISO 10816-3).
 */
export const MACHINE_ZONES: readonly MachineZones[] = [
  zones(LARGE, "rigid", [2.3, 4.5, 7.1], [29, 57, 90]),
  zones(LARGE, "flexible", [3.5, 7.1, 11], [45, 90, 140]),
  zones(MEDIUM, "rigid", [1.4, 2.8, 4.5], [22, 45, 71]),
  zones(MEDIUM, "flexible", [2.3, 4.5, 7.1], [37, 71, 113]),
];

export const MACHINE_ZONES_SOURCE: Source = {
  title: "ISO 20816-3:2022, zone boundaries for industrial machines",
  mark: "published",
  note: "Velocities as published; displacements recalled from the 1998 and 2009 editions of ISO 10816-3.",
};
