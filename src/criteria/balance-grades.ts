import type { Source } from "./source.ts";

/** A balance grade of ISO 21940-11, in our words. */
export interface BalanceGrade {
  /** mm/s, as the grade is named. */
  readonly grade: number;
  readonly machines: string;
}

/**
 * The balance grades, G = e_per·Ω in mm/s.
 * Source: ISO 21940-11 (before: ISO 1940-1), as published summaries agree; descriptions in our words.
 */
export const BALANCE_GRADES: readonly BalanceGrade[] = [
  { grade: 4000, machines: "crank trains of large slow marine diesels with inherent unbalance" },
  { grade: 1600, machines: "crank trains of large slow marine diesels, inherently balanced" },
  { grade: 630, machines: "crank trains with inherent unbalance, on elastic mounts" },
  { grade: 250, machines: "crank trains with inherent unbalance, rigidly mounted" },
  { grade: 100, machines: "complete reciprocating engines of cars, trucks and locomotives" },
  { grade: 40, machines: "car wheels and drive shafts; balanced crank trains on elastic mounts" },
  {
    grade: 16,
    machines: "farm machinery; crushers; cardan and propeller shafts; balanced crank trains rigidly mounted",
  },
  { grade: 6.3, machines: "fans, pumps, gears, machine tools and general machinery; motors up to 950 r/min" },
  {
    grade: 2.5,
    machines: "compressors, turbines, machine-tool drives, textile machines; motors above 950 r/min",
  },
  { grade: 1, machines: "grinding-machine drives; audio and video drives" },
  { grade: 0.4, machines: "gyroscopes and high-precision spindles" },
];

export const BALANCE_GRADES_SOURCE: Source = {
  title: "ISO 21940-11, balance quality grades for rotors in a constant (rigid) state",
  mark: "published",
  note: "As summaries of the standard agree; the descriptions are in our words.",
};

export type ParsedGrade =
  /** m/s */
  { readonly ok: true; readonly grade: number } | { readonly ok: false; readonly reason: string };

/**
 * Reads a grade such as "G6.3", "G 6.3" or "6.3".
 * @returns the grade in m/s, or why it is none
 */
export function parseGrade(text: string): ParsedGrade {
  const named = text.trim().replace(/^[Gg]\s*/, "");
  const found = BALANCE_GRADES.find(({ grade }) => String(grade) === named || `${grade}.0` === named);
  if (found !== undefined) return { ok: true, grade: found.grade / 1000 };
  const grades = BALANCE_GRADES.map(({ grade }) => `G${grade}`).join(", ");
  return { ok: false, reason: `"${text}" is not a balance grade of ISO 21940-11; they are ${grades}` };
}

/**
 * Residual unbalance that a balance grade permits, U = m·G/Ω.
 * @param rotorMass  kg
 * @param grade      m/s
 * @param topSpeed   highest service speed Ω, rad/s, > 0
 * @returns          kg·m
 * Source: ISO 21940-11.
 */
export function permissibleUnbalance(rotorMass: number, grade: number, topSpeed: number): number {
  return (rotorMass * grade) / topSpeed;
}
