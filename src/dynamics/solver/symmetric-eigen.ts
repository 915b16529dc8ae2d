const N = 6;
const MAX_SWEEPS = 60;
/** Under this share of the whole an entry is nothing; above it no square here overflows. */
const TINY = 1e-60;

/** Eigenvalues ascending, and orthonormal eigenvectors: vector n holds entries 6n to 6n + 5. */
export interface Eigen6 {
  readonly values: Float64Array;
  readonly vectors: Float64Array;
}

/**
 * Eigenvalues and eigenvectors of a real symmetric 6 × 6 matrix by Householder tridiagonalisation and implicit QL.
 * @param matrix  full, by rows, 36 entries; not changed
 * Source: Bowdler, Martin, Reinsch and Wilkinson, Numerische Mathematik 11 (1968) 293 (tred2, tql2).
 */
export function symmetricEigen6(matrix: Float64Array): Eigen6 {
  // Columns of `v` become the eigenvectors; it is kept by rows.
  const v = matrix.slice();
  const d = new Float64Array(N);
  const e = new Float64Array(N);
  tridiagonalise(v, d, e);
  implicitQl(v, d, e);
  return sortedAscending(v, d);
}

function tridiagonalise(v: Float64Array, d: Float64Array, e: Float64Array): void {
  const at = (i: number, j: number): number => v[i * N + j] as number;
  for (let j = 0; j < N; j++) d[j] = at(N - 1, j);
  for (let i = N - 1; i > 0; i--) {
    let scale = 0;
    let h = 0;
    for (let k = 0; k < i; k++) scale += Math.abs(d[k] as number);
    if (scale === 0) {
      e[i] = d[i - 1] as number;
      for (let j = 0; j < i; j++) {
        d[j] = at(i - 1, j);
        v[i * N + j] = 0;
        v[j * N + i] = 0;
      }
    } else {
      for (let k = 0; k < i; k++) {
        d[k] = (d[k] as number) / scale;
        h += (d[k] as number) ** 2;
      }
      let f = d[i - 1] as number;
      let g = f > 0 ? -Math.sqrt(h) : Math.sqrt(h);
      e[i] = scale * g;
      h -= f * g;
      d[i - 1] = f - g;
      for (let j = 0; j < i; j++) e[j] = 0;
      for (let j = 0; j < i; j++) {
        f = d[j] as number;
        v[j * N + i] = f;
        g = (e[j] as number) + at(j, j) * f;
        for (let k = j + 1; k < i; k++) {
          g += at(k, j) * (d[k] as number);
          e[k] = (e[k] as number) + at(k, j) * f;
        }
        e[j] = g;
      }
      f = 0;
      for (let j = 0; j < i; j++) {
        e[j] = (e[j] as number) / h;
        f += (e[j] as number) * (d[j] as number);
      }
      const hh = f / (h + h);
      for (let j = 0; j < i; j++) e[j] = (e[j] as number) - hh * (d[j] as number);
      for (let j = 0; j < i; j++) {
        f = d[j] as number;
        g = e[j] as number;
        for (let k = j; k < i; k++) v[k * N + j] = at(k, j) - (f * (e[k] as number) + g * (d[k] as number));
        d[j] = at(i - 1, j);
        v[i * N + j] = 0;
      }
    }
    d[i] = h;
  }
  for (let i = 0; i < N - 1; i++) {
    v[(N - 1) * N + i] = at(i, i);
    v[i * N + i] = 1;
    const h = d[i + 1] as number;
    if (h !== 0) {
      for (let k = 0; k <= i; k++) d[k] = at(k, i + 1) / h;
      for (let j = 0; j <= i; j++) {
        let g = 0;
        for (let k = 0; k <= i; k++) g += at(k, i + 1) * at(k, j);
        for (let k = 0; k <= i; k++) v[k * N + j] = at(k, j) - g * (d[k] as number);
      }
    }
    for (let k = 0; k <= i; k++) v[k * N + i + 1] = 0;
  }
  for (let j = 0; j < N; j++) {
    d[j] = at(N - 1, j);
    v[(N - 1) * N + j] = 0;
  }
  v[N * N - 1] = 1;
  e[0] = 0;
}

function implicitQl(v: Float64Array, d: Float64Array, e: Float64Array): void {
  for (let i = 1; i < N; i++) e[i - 1] = e[i] as number;
  e[N - 1] = 0;
  let f = 0;
  let largest = 0;
  let whole = 0;
  for (let i = 0; i < N; i++) whole = Math.max(whole, Math.abs(d[i] as number) + Math.abs(e[i] as number));
  for (let l = 0; l < N; l++) {
    largest = Math.max(largest, Math.abs(d[l] as number) + Math.abs(e[l] as number));
    let m = l;
    // What is far under the rounding of the whole would only overflow the shift below.
    const negligible = Math.max(Number.EPSILON * largest, TINY * whole);
    while (m < N - 1 && Math.abs(e[m] as number) > negligible) m++;
    for (let sweep = 0; m > l && sweep < MAX_SWEEPS; sweep++) {
      let g = d[l] as number;
      let p = ((d[l + 1] as number) - g) / (2 * (e[l] as number));
      let r = p < 0 ? -Math.sqrt(p * p + 1) : Math.sqrt(p * p + 1);
      d[l] = (e[l] as number) / (p + r);
      d[l + 1] = (e[l] as number) * (p + r);
      const dl1 = d[l + 1] as number;
      let h = g - (d[l] as number);
      for (let i = l + 2; i < N; i++) d[i] = (d[i] as number) - h;
      f += h;
      p = d[m] as number;
      let c = 1;
      let c2 = c;
      let c3 = c;
      const el1 = e[l + 1] as number;
      let s = 0;
      let s2 = 0;
      for (let i = m - 1; i >= l; i--) {
        c3 = c2;
        c2 = c;
        s2 = s;
        g = c * (e[i] as number);
        h = c * p;
        r = Math.sqrt(p * p + (e[i] as number) ** 2);
        e[i + 1] = s * r;
        s = (e[i] as number) / r;
        c = p / r;
        p = c * (d[i] as number) - s * g;
        d[i + 1] = h + s * (c * g + s * (d[i] as number));
        for (let k = 0; k < N; k++) {
          const row = k * N + i;
          h = v[row + 1] as number;
          v[row + 1] = s * (v[row] as number) + c * h;
          v[row] = c * (v[row] as number) - s * h;
        }
      }
      p = (-s * s2 * c3 * el1 * (e[l] as number)) / dl1;
      e[l] = s * p;
      d[l] = c * p;
      if (Math.abs(e[l] as number) <= negligible) break;
    }
    d[l] = (d[l] as number) + f;
    e[l] = 0;
  }
}

function sortedAscending(v: Float64Array, d: Float64Array): Eigen6 {
  const values = new Float64Array(N);
  const vectors = new Float64Array(N * N);
  for (let column = 0; column < N; column++) {
    // Its place is the number of smaller values, and of equal ones before it.
    let place = 0;
    for (let other = 0; other < N; other++)
      if ((d[other] as number) < (d[column] as number) || (d[other] === d[column] && other < column)) place++;
    values[place] = d[column] as number;
    for (let i = 0; i < N; i++) vectors[place * N + i] = v[i * N + column] as number;
  }
  return { values, vectors };
}
