import { InputError } from "../errors/index.ts";
import type { Vec3 } from "./vector.ts";

/** Feet closer together than this share of their span count as one place. */
const COINCIDENT = 1e-6;
/** Feet whose width across their own line is under this share of its length count as one line. */
const COLLINEAR = 1e-6;

/**
 * Foot positions of a footprint: two rows along x, numbered from y = −width/2 with x ascending; three feet
 * stand two at x = −length/2 and one at (length/2, 0). The centroid of the feet is not moved: origin in the
 * middle of the rectangle, z = 0.
 * @param count   3, or an even number from 4
 * @param length  along x, m, > 0
 * @param width   along y, m, > 0
 * @throws {InputError} an odd count above three
 */
export function footprintPositions(count: number, length: number, width: number): readonly Vec3[] {
  const a = length / 2;
  const b = width / 2;
  if (count === 3)
    return [
      [-a, -b, 0],
      [-a, b, 0],
      [a, 0, 0],
    ];
  if (count % 2 !== 0)
    throw InputError.at(
      "/feet/count",
      `a footprint carries 3 feet or an even number, not ${count}; give positions`,
    );
  const perRow = count / 2;
  const row = (y: number): Vec3[] =>
    Array.from({ length: perRow }, (_, i): Vec3 => [-a + (length * i) / (perRow - 1), y, 0]);
  return [...row(-b), ...row(b)];
}

/** Centroid of a set of points, m. */
export function centroid(points: readonly Vec3[]): Vec3 {
  const n = points.length;
  const sum = (i: 0 | 1 | 2): number => points.reduce((s, p) => s + p[i], 0) / n;
  return [sum(0), sum(1), sum(2)];
}

/**
 * Refuses feet that cannot carry a machine: two in one place, or all on one line in plan.
 * @throws {InputError} at `/feet/positions` or at the second of two coincident feet
 */
export function requireCarryingFeet(feet: readonly Vec3[]): void {
  const span = Math.max(...feet.flatMap((p) => feet.map((q) => Math.hypot(p[0] - q[0], p[1] - q[1]))));
  feet.forEach((p, i) => {
    const j = feet.findIndex((q) => Math.hypot(p[0] - q[0], p[1] - q[1]) <= COINCIDENT * span);
    if (j < i)
      throw InputError.at(
        `/feet/positions/${i}`,
        `foot ${i + 1} stands in the same place in plan as foot ${j + 1}`,
      );
  });
  const [cx, cy] = centroid(feet);
  const sxx = feet.reduce((s, p) => s + (p[0] - cx) ** 2, 0);
  const syy = feet.reduce((s, p) => s + (p[1] - cy) ** 2, 0);
  const sxy = feet.reduce((s, p) => s + (p[0] - cx) * (p[1] - cy), 0);
  if (sxx * syy - sxy * sxy <= COLLINEAR ** 2 * (sxx + syy) ** 2)
    throw InputError.at("/feet/positions", "the feet stand on one line in plan and cannot carry a machine");
}

/**
 * Whether a point lies within the outline (convex hull) of the feet in plan; on the outline counts as within.
 */
export function withinOutline(feet: readonly Vec3[], x: number, y: number): boolean {
  // The point is outside exactly when some line through it has every foot strictly on one side: that is, when
  // the directions to the feet leave a gap wider than half a turn.
  const angles = feet
    .filter((p) => p[0] !== x || p[1] !== y)
    .map((p) => Math.atan2(p[1] - y, p[0] - x))
    .sort((a, b) => a - b);
  if (angles.length < feet.length) return true;
  const gaps = angles.map((angle, i) => (angles[i + 1] ?? (angles[0] as number) + 2 * Math.PI) - angle);
  return Math.max(...gaps) <= Math.PI * (1 + 1e-12);
}
