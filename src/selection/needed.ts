import { STANDARD_GRAVITY } from "../units/index.ts";
import type { TargetLine } from "./target-lines.ts";

/** What an undamped isolator would have to be to hold the target. */
export interface Needed {
  /** Excitation over natural frequency, at the line that asks most. */
  readonly frequencyRatio: number;
  /** rad/s */
  readonly naturalFrequency: number;
  /** m */
  readonly staticDeflection: number;
}

/**
 * The undamped isolator that just holds the target: r = √(1 + 1/T), fn = f/r, d = g/ωn².
 * @returns `null` when no line asks anything of the vertical model
 */
export function neededFor(lines: readonly TargetLine[]): Needed | null {
  const asks = lines.map(({ omega, limit }) => {
    const frequencyRatio = Math.sqrt(1 + 1 / limit);
    return { frequencyRatio, naturalFrequency: omega / frequencyRatio };
  });
  if (asks.length === 0) return null;
  const most = asks.reduce((a, b) => (b.naturalFrequency < a.naturalFrequency ? b : a));
  return { ...most, staticDeflection: STANDARD_GRAVITY / most.naturalFrequency ** 2 };
}
