import fc from "fast-check";
import { EigenvalueDecomposition, LuDecomposition, Matrix } from "ml-matrix";
import { describe, expect, test } from "vitest";
import {
  cholesky6,
  PACKED,
  packed,
  solveSymmetric6,
  symmetricEigen6,
} from "../../../src/dynamics/solver/index.ts";

const N = 6;

const entries = (length: number) =>
  fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: length, maxLength: length });

/** The full complex matrix of a packed triangle, as the real one twice its size. */
function asReal(re: Float64Array, im: Float64Array): Matrix {
  const a = Matrix.zeros(2 * N, 2 * N);
  for (let i = 0; i < N; i++)
    for (let j = 0; j < N; j++) {
      const r = re[packed(i, j)] as number;
      const x = im[packed(i, j)] as number;
      a.set(i, j, r);
      a.set(i + N, j + N, r);
      a.set(i, j + N, -x);
      a.set(i + N, j, x);
    }
  return a;
}

function solve(re: Float64Array, im: Float64Array, b: readonly number[]): number[] {
  const xRe = new Float64Array(N);
  const xIm = new Float64Array(N);
  solveSymmetric6(re, im, Float64Array.from(b.slice(0, N)), Float64Array.from(b.slice(N)), xRe, xIm);
  return [...xRe, ...xIm];
}

function residual(re: Float64Array, im: Float64Array, b: readonly number[], x: readonly number[]): number {
  const a = asReal(re, im);
  const off = a.mmul(Matrix.columnVector([...x])).sub(Matrix.columnVector([...b]));
  const norm = (list: readonly number[]): number => Math.hypot(...list);
  return norm(off.to1DArray()) / (norm(a.to1DArray()) * norm(x) + norm(b));
}

describe("the complex symmetric solve", () => {
  test("agrees with a general library's LU on the real form, and leaves no residual", () => {
    fc.assert(
      fc.property(entries(PACKED), entries(PACKED), entries(2 * N), (r, i, b) => {
        const re = Float64Array.from(r);
        const im = Float64Array.from(i, (v, k) => v + (k === 0 || [2, 5, 9, 14, 20].includes(k) ? 3 : 0));
        const x = solve(re, im, b);
        const expected = new LuDecomposition(asReal(re, im)).solve(Matrix.columnVector(b)).to1DArray();
        const scale = Math.hypot(...expected) + 1e-300;
        for (const [k, value] of x.entries())
          expect(Math.abs(value - (expected[k] as number)) / scale).toBeLessThan(1e-9);
        expect(residual(re, im, b, x)).toBeLessThan(1e-12);
      }),
    );
  });

  test("stays right where a leading minor vanishes", () => {
    for (const tiny of [0, 1e-17, 1e-12, 1e-8, 1e-5]) {
      const re = new Float64Array(PACKED);
      const im = new Float64Array(PACKED);
      for (let i = 0; i < N; i++) re[packed(i, i)] = i === 0 ? tiny : i === 3 ? tiny : 1 + i;
      re[packed(1, 0)] = 2;
      re[packed(5, 3)] = -1.5;
      im[packed(2, 1)] = 0.3;
      const b = Array.from({ length: 2 * N }, (_, i) => Math.cos(i));
      expect(residual(re, im, b, solve(re, im, b))).toBeLessThan(1e-13);
    }
  });

  test("gives no finite answer for a matrix without an inverse", () => {
    const x = solve(
      new Float64Array(PACKED),
      new Float64Array(PACKED),
      Array.from({ length: 2 * N }, () => 1),
    );
    expect(x.every((value) => !Number.isFinite(value))).toBe(true);
  });
});

function full(lower: readonly number[]): Float64Array {
  return Float64Array.from({ length: N * N }, (_, k) => lower[packed(Math.floor(k / N), k % N)] as number);
}

describe("the symmetric eigenproblem", () => {
  test("leaves no residual and gives orthonormal vectors, whatever the scales", () => {
    fc.assert(
      fc.property(
        entries(PACKED),
        fc.array(fc.integer({ min: -4, max: 4 }), { minLength: N, maxLength: N }),
        (lower, powers) => {
          const scaled = lower.map((value, k) => {
            const i = [0, 1, 2, 3, 4, 5].find((row) => k < packed(row, row) + 1) as number;
            return value * 10 ** (powers[i] as number) * 10 ** (powers[k - packed(i, 0)] as number);
          });
          const a = full(scaled);
          const { values, vectors } = symmetricEigen6(a);
          const matrix = Matrix.from1DArray(N, N, [...a]);
          const norm = Math.hypot(...a) + 1e-300;
          for (let n = 0; n < N; n++) {
            const vector = Matrix.columnVector([...vectors.slice(N * n, N * n + N)]);
            const off = matrix.mmul(vector).sub(Matrix.mul(vector, values[n] as number));
            expect(Math.hypot(...off.to1DArray()) / norm).toBeLessThan(1e-13);
            if (n > 0) expect(values[n]).toBeGreaterThanOrEqual(values[n - 1] as number);
            for (let m = 0; m <= n; m++) {
              const other = vectors.slice(N * m, N * m + N);
              const dot = vector.to1DArray().reduce((s, value, i) => s + value * (other[i] as number), 0);
              expect(Math.abs(dot - (m === n ? 1 : 0))).toBeLessThan(1e-13);
            }
          }
        },
      ),
    );
  });

  test("agrees with a general library", () => {
    fc.assert(
      fc.property(entries(PACKED), (lower) => {
        const a = full(lower);
        const expected = [
          ...new EigenvalueDecomposition(Matrix.from1DArray(N, N, [...a]), { assumeSymmetric: true })
            .realEigenvalues,
        ].sort((x, y) => x - y);
        for (const [n, value] of symmetricEigen6(a).values.entries())
          expect(Math.abs(value - (expected[n] as number))).toBeLessThan(1e-12);
      }),
    );
  });
});

test("a Cholesky factor times its transpose is the matrix; a matrix that is not positive definite has none", () => {
  const a = full([4, 1, 5, 0, 2, 6, 1, 0, 1, 7, 0, 0, 0, 1, 3, 0, 1, 0, 0, 1, 2]);
  const l = Matrix.from1DArray(N, N, [...(cholesky6(a) as Float64Array)]);
  const again = l.mmul(l.transpose()).to1DArray();
  for (const [k, value] of again.entries()) expect(Math.abs(value - (a[k] as number))).toBeLessThan(1e-14);
  expect(cholesky6(a.map((value, k) => (k === 35 ? -value : value)))).toBeNull();
});
