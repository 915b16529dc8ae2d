import { solveUnrolled } from "./unrolled-ldl.ts";

/** Freedoms of a rigid body. */
const N = 6;

/** Place of element (i, j), i ≥ j, in a lower triangle packed by rows. */
export function packed(i: number, j: number): number {
  return i >= j ? (i * (i + 1)) / 2 + j : (j * (j + 1)) / 2 + i;
}

/** Length of a packed lower triangle. */
export const PACKED = (N * (N + 1)) / 2;

/**
 * Solves A·x = b for a complex symmetric 6 × 6 matrix: unrolled LDLᵀ, and where a leading minor nearly vanishes,
 * as close to a resonance without damping, Gaussian elimination with pivoting.
 * @param re, im    lower triangle of A packed by rows, 21 entries; its rows should have one scale
 * @param bRe, bIm  right-hand side
 * @param xRe, xIm  take the answer; not finite where A is singular
 */
export function solveSymmetric6(
  re: Float64Array,
  im: Float64Array,
  bRe: Float64Array,
  bIm: Float64Array,
  xRe: Float64Array,
  xIm: Float64Array,
): void {
  if (!solveUnrolled(re, im, bRe, bIm, xRe, xIm)) solvePivoted(re, im, bRe, bIm, xRe, xIm);
}

/** Gaussian elimination with partial pivoting on the full complex matrix (Golub and Van Loan, Matrix Computations). */
function solvePivoted(
  re: Float64Array,
  im: Float64Array,
  bRe: Float64Array,
  bIm: Float64Array,
  xRe: Float64Array,
  xIm: Float64Array,
): void {
  const width = N + 1;
  const ar = new Float64Array(N * width);
  const ai = new Float64Array(N * width);
  for (let i = 0; i < N; i++) {
    for (let j = 0; j < N; j++) {
      ar[i * width + j] = re[packed(i, j)] as number;
      ai[i * width + j] = im[packed(i, j)] as number;
    }
    ar[i * width + N] = bRe[i] as number;
    ai[i * width + N] = bIm[i] as number;
  }
  const size = (i: number, j: number): number =>
    Math.abs(ar[i * width + j] as number) + Math.abs(ai[i * width + j] as number);
  for (let k = 0; k < N; k++) {
    let pivot = k;
    for (let i = k + 1; i < N; i++) if (size(i, k) > size(pivot, k)) pivot = i;
    for (let j = k; j <= N; j++) {
      swap(ar, k * width + j, pivot * width + j);
      swap(ai, k * width + j, pivot * width + j);
    }
    const pr = ar[k * width + k] as number;
    const pi = ai[k * width + k] as number;
    const modulus = pr * pr + pi * pi;
    for (let i = k + 1; i < N; i++) {
      const fr = ar[i * width + k] as number;
      const fi = ai[i * width + k] as number;
      const lr = (fr * pr + fi * pi) / modulus;
      const li = (fi * pr - fr * pi) / modulus;
      for (let j = k; j <= N; j++) {
        const ur = ar[k * width + j] as number;
        const ui = ai[k * width + j] as number;
        ar[i * width + j] = (ar[i * width + j] as number) - lr * ur + li * ui;
        ai[i * width + j] = (ai[i * width + j] as number) - lr * ui - li * ur;
      }
    }
  }
  for (let i = N - 1; i >= 0; i--) {
    let sr = ar[i * width + N] as number;
    let si = ai[i * width + N] as number;
    for (let j = i + 1; j < N; j++) {
      const ur = ar[i * width + j] as number;
      const ui = ai[i * width + j] as number;
      sr -= ur * (xRe[j] as number) - ui * (xIm[j] as number);
      si -= ur * (xIm[j] as number) + ui * (xRe[j] as number);
    }
    const pr = ar[i * width + i] as number;
    const pi = ai[i * width + i] as number;
    const modulus = pr * pr + pi * pi;
    xRe[i] = (sr * pr + si * pi) / modulus;
    xIm[i] = (si * pr - sr * pi) / modulus;
  }
}

function swap(list: Float64Array, i: number, j: number): void {
  const kept = list[i] as number;
  list[i] = list[j] as number;
  list[j] = kept;
}
