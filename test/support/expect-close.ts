import { expect } from "vitest";

interface Tolerance {
  /** Largest difference as a part of the expected value. */
  readonly rtol?: number;
  /** Largest difference in the value's own unit; the two add up. */
  readonly atol?: number;
  /** Why this much and no less: the digits printed in the source, or the rounding of the arithmetic. */
  readonly because: string;
}

/** Fails unless |actual − expected| ≤ atol + rtol·|expected|, and says by how much and why that was asked. */
export function expectClose(
  actual: number,
  expected: number,
  { rtol = 0, atol = 0, because }: Tolerance,
): void {
  const allowed = atol + rtol * Math.abs(expected);
  const off = Math.abs(actual - expected);
  const same = Object.is(actual, expected) || off <= allowed;
  expect(same, `got ${actual}, expected ${expected}: off by ${off}, allowed ${allowed} (${because})`).toBe(
    true,
  );
}

/** `expectClose` for each value of two lists of equal length. */
export function expectAllClose(
  actual: readonly number[],
  expected: readonly number[],
  tolerance: Tolerance,
): void {
  expect(actual).toHaveLength(expected.length);
  for (const [i, value] of actual.entries()) expectClose(value, expected[i] as number, tolerance);
}
