const N = 6;

/**
 * Cholesky factor of a symmetric positive definite 6 × 6 matrix, A = L·Lᵀ.
 * @param matrix  full, by rows, 36 entries
 * @returns       L by rows with zeros above the diagonal; null where the matrix is not positive definite
 */
export function cholesky6(matrix: Float64Array): Float64Array | null {
  const l = new Float64Array(N * N);
  for (let i = 0; i < N; i++)
    for (let j = 0; j <= i; j++) {
      let sum = matrix[i * N + j] as number;
      for (let k = 0; k < j; k++) sum -= (l[i * N + k] as number) * (l[j * N + k] as number);
      if (i !== j) l[i * N + j] = sum / (l[j * N + j] as number);
      else if (sum > 0) l[i * N + i] = Math.sqrt(sum);
      else return null;
    }
  return l;
}

/** Solves L·y = b in place. */
export function forward(l: Float64Array, b: Float64Array): void {
  for (let i = 0; i < N; i++) {
    let sum = b[i] as number;
    for (let k = 0; k < i; k++) sum -= (l[i * N + k] as number) * (b[k] as number);
    b[i] = sum / (l[i * N + i] as number);
  }
}

/** Solves Lᵀ·x = y in place. */
export function backward(l: Float64Array, y: Float64Array): void {
  for (let i = N - 1; i >= 0; i--) {
    let sum = y[i] as number;
    for (let k = i + 1; k < N; k++) sum -= (l[k * N + i] as number) * (y[k] as number);
    y[i] = sum / (l[i * N + i] as number);
  }
}
