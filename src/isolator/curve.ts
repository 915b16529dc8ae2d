import type { CurvePoint } from "./isolator.ts";

/**
 * A load–deflection curve through rated points: a cubic Hermite between them that keeps the shape of the data, so
 * that a rising table gives a rising curve, and beyond the last point straight on with the end slope.
 */
export interface Curve {
  /** Load at a deflection, N for m; below the origin straight on with the first slope. */
  readonly load: (deflection: number) => number;
  /** Tangent stiffness at a deflection, N/m. */
  readonly tangent: (deflection: number) => number;
  /** Deflection at a load, m for N; infinite beyond the last point of a curve that ends flat. */
  readonly deflection: (load: number) => number;
}

/** Relative accuracy of an inverted load, well above the rounding of the cubic. */
const TOLERANCE = 1e-13;
const MAX_ITERATIONS = 100;

/**
 * Interpolates points that strictly rise in both columns; the origin is added when the table starts later.
 *
 * Interior slopes are the weighted harmonic mean of the neighbouring secants, end slopes the one-sided three-point
 * formula limited to keep shape.
 * Source: F. N. Fritsch and J. Butland, SIAM J. Sci. Stat. Comput. 5 (1984) 300.
 * @param points  at least one beyond the origin, (m, N)
 */
export function curveThrough(points: readonly CurvePoint[]): Curve {
  const first = points[0] as CurvePoint;
  const table: readonly CurvePoint[] = first[0] > 0 ? [[0, 0], ...points] : points;
  const x = table.map((p) => p[0]);
  const y = table.map((p) => p[1]);
  const slopes = slopesOf(x, y);
  const last = x.length - 1;
  const at = (list: readonly number[], i: number): number => list[i] as number;

  const segmentOf = (column: readonly number[], value: number): number => {
    let i = 0;
    while (i < last - 1 && value >= at(column, i + 1)) i++;
    return i;
  };
  const cubic = (i: number, deflection: number): { load: number; tangent: number } => {
    const h = at(x, i + 1) - at(x, i);
    const t = (deflection - at(x, i)) / h;
    const rise = at(y, i + 1) - at(y, i);
    const a = at(slopes, i) * h;
    const b = at(slopes, i + 1) * h;
    // Hermite form written as powers of t, which loses no digits for t in [0, 1].
    const c2 = 3 * rise - 2 * a - b;
    const c3 = a + b - 2 * rise;
    return {
      load: at(y, i) + t * (a + t * (c2 + t * c3)),
      tangent: (a + t * (2 * c2 + t * 3 * c3)) / h,
    };
  };
  const beyond = (deflection: number): { load: number; tangent: number } | undefined => {
    if (deflection < at(x, 0))
      return { load: at(y, 0) + at(slopes, 0) * (deflection - at(x, 0)), tangent: at(slopes, 0) };
    if (deflection > at(x, last))
      return { load: at(y, last) + at(slopes, last) * (deflection - at(x, last)), tangent: at(slopes, last) };
    return undefined;
  };
  const evaluate = (deflection: number) => beyond(deflection) ?? cubic(segmentOf(x, deflection), deflection);

  return {
    load: (deflection) => evaluate(deflection).load,
    tangent: (deflection) => evaluate(deflection).tangent,
    deflection(load) {
      // Rounding above the last load is the last point, also where the curve ends flat.
      if (load >= at(y, last) && load <= at(y, last) * (1 + TOLERANCE)) return at(x, last);
      if (load <= at(y, 0))
        return load === at(y, 0) ? at(x, 0) : at(x, 0) + (load - at(y, 0)) / at(slopes, 0);
      if (load > at(y, last)) return at(x, last) + (load - at(y, last)) / at(slopes, last);
      const i = segmentOf(y, load);
      let lo = at(x, i);
      let hi = at(x, i + 1);
      let guess = lo + ((hi - lo) * (load - at(y, i))) / (at(y, i + 1) - at(y, i));
      for (let n = 0; n < MAX_ITERATIONS; n++) {
        const { load: found, tangent } = cubic(i, guess);
        const off = found - load;
        if (Math.abs(off) <= TOLERANCE * load) return guess;
        if (off > 0) hi = guess;
        else lo = guess;
        // Newton where it stays inside the bracket, else halve it.
        const next = guess - off / tangent;
        guess = next > lo && next < hi ? next : (lo + hi) / 2;
      }
      return guess;
    },
  };
}

function slopesOf(x: readonly number[], y: readonly number[]): readonly number[] {
  const at = (list: readonly number[], i: number): number => list[i] as number;
  const widths = x.slice(1).map((v, i) => v - at(x, i));
  const secants = widths.map((h, i) => (at(y, i + 1) - at(y, i)) / h);
  const last = x.length - 1;
  if (last === 1) return [at(secants, 0), at(secants, 0)];
  return x.map((_, i) => {
    if (i === 0) return endSlope(at(widths, 0), at(widths, 1), at(secants, 0), at(secants, 1));
    if (i === last)
      return endSlope(
        at(widths, last - 1),
        at(widths, last - 2),
        at(secants, last - 1),
        at(secants, last - 2),
      );
    const before = at(secants, i - 1);
    const after = at(secants, i);
    if (before * after <= 0) return 0;
    const w1 = 2 * at(widths, i) + at(widths, i - 1);
    const w2 = at(widths, i) + 2 * at(widths, i - 1);
    return (w1 + w2) / (w1 / before + w2 / after);
  });
}

/** One-sided three-point slope, kept between 0 and three times the end's own secant. */
function endSlope(h0: number, h1: number, s0: number, s1: number): number {
  const slope = ((2 * h0 + h1) * s0 - h0 * s1) / (h0 + h1);
  if (slope * s0 <= 0) return 0;
  return s0 * s1 <= 0 && Math.abs(slope) > 3 * Math.abs(s0) ? 3 * s0 : slope;
}
