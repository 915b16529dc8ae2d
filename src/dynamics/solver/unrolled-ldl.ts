// Written by test/support/write-ldl.ts; do not edit. A test compares the two and, run with -u, writes it anew.

/** Square of the largest multiplier that elimination may meet before its answer is not trusted. */
const GROWTH = 1e8;

/**
 * Solves A·x = b for a complex symmetric A (no conjugate) by LDLᵀ without pivoting.
 * @param re, im    lower triangle of A packed by rows, 21 entries
 * @param bRe, bIm  right-hand side, 6 entries
 * @param xRe, xIm  take the answer, 6 entries
 * @returns         whether the answer stands; false where a leading minor nearly vanishes, and nothing is written
 */
export function solveUnrolled(
  re: Float64Array,
  im: Float64Array,
  bRe: Float64Array,
  bIm: Float64Array,
  xRe: Float64Array,
  xIm: Float64Array,
): boolean {
  // Column 0: u = l·d, l = u/d.
  const u00r = (re[0] as number);
  const u00i = (im[0] as number);
  const u10r = (re[1] as number);
  const u10i = (im[1] as number);
  const u20r = (re[3] as number);
  const u20i = (im[3] as number);
  const u30r = (re[6] as number);
  const u30i = (im[6] as number);
  const u40r = (re[10] as number);
  const u40i = (im[10] as number);
  const u50r = (re[15] as number);
  const u50i = (im[15] as number);
  const m0 = u00r * u00r + u00i * u00i;
  const e0r = u00r / m0;
  const e0i = -u00i / m0;
  const l10r = u10r * e0r - u10i * e0i;
  const l10i = u10r * e0i + u10i * e0r;
  const l20r = u20r * e0r - u20i * e0i;
  const l20i = u20r * e0i + u20i * e0r;
  const l30r = u30r * e0r - u30i * e0i;
  const l30i = u30r * e0i + u30i * e0r;
  const l40r = u40r * e0r - u40i * e0i;
  const l40i = u40r * e0i + u40i * e0r;
  const l50r = u50r * e0r - u50i * e0i;
  const l50i = u50r * e0i + u50i * e0r;
  if (!(l10r * l10r + l10i * l10i < GROWTH)) return false;
  if (!(l20r * l20r + l20i * l20i < GROWTH)) return false;
  if (!(l30r * l30r + l30i * l30i < GROWTH)) return false;
  if (!(l40r * l40r + l40i * l40i < GROWTH)) return false;
  if (!(l50r * l50r + l50i * l50i < GROWTH)) return false;
  // Column 1: u = l·d, l = u/d.
  const u11r = (re[2] as number) - l10r * u10r + l10i * u10i;
  const u11i = (im[2] as number) - l10r * u10i - l10i * u10r;
  const u21r = (re[4] as number) - l10r * u20r + l10i * u20i;
  const u21i = (im[4] as number) - l10r * u20i - l10i * u20r;
  const u31r = (re[7] as number) - l10r * u30r + l10i * u30i;
  const u31i = (im[7] as number) - l10r * u30i - l10i * u30r;
  const u41r = (re[11] as number) - l10r * u40r + l10i * u40i;
  const u41i = (im[11] as number) - l10r * u40i - l10i * u40r;
  const u51r = (re[16] as number) - l10r * u50r + l10i * u50i;
  const u51i = (im[16] as number) - l10r * u50i - l10i * u50r;
  const m1 = u11r * u11r + u11i * u11i;
  const e1r = u11r / m1;
  const e1i = -u11i / m1;
  const l21r = u21r * e1r - u21i * e1i;
  const l21i = u21r * e1i + u21i * e1r;
  const l31r = u31r * e1r - u31i * e1i;
  const l31i = u31r * e1i + u31i * e1r;
  const l41r = u41r * e1r - u41i * e1i;
  const l41i = u41r * e1i + u41i * e1r;
  const l51r = u51r * e1r - u51i * e1i;
  const l51i = u51r * e1i + u51i * e1r;
  if (!(l21r * l21r + l21i * l21i < GROWTH)) return false;
  if (!(l31r * l31r + l31i * l31i < GROWTH)) return false;
  if (!(l41r * l41r + l41i * l41i < GROWTH)) return false;
  if (!(l51r * l51r + l51i * l51i < GROWTH)) return false;
  // Column 2: u = l·d, l = u/d.
  const u22r = (re[5] as number) - l20r * u20r + l20i * u20i - l21r * u21r + l21i * u21i;
  const u22i = (im[5] as number) - l20r * u20i - l20i * u20r - l21r * u21i - l21i * u21r;
  const u32r = (re[8] as number) - l20r * u30r + l20i * u30i - l21r * u31r + l21i * u31i;
  const u32i = (im[8] as number) - l20r * u30i - l20i * u30r - l21r * u31i - l21i * u31r;
  const u42r = (re[12] as number) - l20r * u40r + l20i * u40i - l21r * u41r + l21i * u41i;
  const u42i = (im[12] as number) - l20r * u40i - l20i * u40r - l21r * u41i - l21i * u41r;
  const u52r = (re[17] as number) - l20r * u50r + l20i * u50i - l21r * u51r + l21i * u51i;
  const u52i = (im[17] as number) - l20r * u50i - l20i * u50r - l21r * u51i - l21i * u51r;
  const m2 = u22r * u22r + u22i * u22i;
  const e2r = u22r / m2;
  const e2i = -u22i / m2;
  const l32r = u32r * e2r - u32i * e2i;
  const l32i = u32r * e2i + u32i * e2r;
  const l42r = u42r * e2r - u42i * e2i;
  const l42i = u42r * e2i + u42i * e2r;
  const l52r = u52r * e2r - u52i * e2i;
  const l52i = u52r * e2i + u52i * e2r;
  if (!(l32r * l32r + l32i * l32i < GROWTH)) return false;
  if (!(l42r * l42r + l42i * l42i < GROWTH)) return false;
  if (!(l52r * l52r + l52i * l52i < GROWTH)) return false;
  // Column 3: u = l·d, l = u/d.
  const u33r = (re[9] as number) - l30r * u30r + l30i * u30i - l31r * u31r + l31i * u31i - l32r * u32r + l32i * u32i;
  const u33i = (im[9] as number) - l30r * u30i - l30i * u30r - l31r * u31i - l31i * u31r - l32r * u32i - l32i * u32r;
  const u43r = (re[13] as number) - l30r * u40r + l30i * u40i - l31r * u41r + l31i * u41i - l32r * u42r + l32i * u42i;
  const u43i = (im[13] as number) - l30r * u40i - l30i * u40r - l31r * u41i - l31i * u41r - l32r * u42i - l32i * u42r;
  const u53r = (re[18] as number) - l30r * u50r + l30i * u50i - l31r * u51r + l31i * u51i - l32r * u52r + l32i * u52i;
  const u53i = (im[18] as number) - l30r * u50i - l30i * u50r - l31r * u51i - l31i * u51r - l32r * u52i - l32i * u52r;
  const m3 = u33r * u33r + u33i * u33i;
  const e3r = u33r / m3;
  const e3i = -u33i / m3;
  const l43r = u43r * e3r - u43i * e3i;
  const l43i = u43r * e3i + u43i * e3r;
  const l53r = u53r * e3r - u53i * e3i;
  const l53i = u53r * e3i + u53i * e3r;
  if (!(l43r * l43r + l43i * l43i < GROWTH)) return false;
  if (!(l53r * l53r + l53i * l53i < GROWTH)) return false;
  // Column 4: u = l·d, l = u/d.
  const u44r = (re[14] as number) - l40r * u40r + l40i * u40i - l41r * u41r + l41i * u41i - l42r * u42r + l42i * u42i - l43r * u43r + l43i * u43i;
  const u44i = (im[14] as number) - l40r * u40i - l40i * u40r - l41r * u41i - l41i * u41r - l42r * u42i - l42i * u42r - l43r * u43i - l43i * u43r;
  const u54r = (re[19] as number) - l40r * u50r + l40i * u50i - l41r * u51r + l41i * u51i - l42r * u52r + l42i * u52i - l43r * u53r + l43i * u53i;
  const u54i = (im[19] as number) - l40r * u50i - l40i * u50r - l41r * u51i - l41i * u51r - l42r * u52i - l42i * u52r - l43r * u53i - l43i * u53r;
  const m4 = u44r * u44r + u44i * u44i;
  const e4r = u44r / m4;
  const e4i = -u44i / m4;
  const l54r = u54r * e4r - u54i * e4i;
  const l54i = u54r * e4i + u54i * e4r;
  if (!(l54r * l54r + l54i * l54i < GROWTH)) return false;
  // Column 5: u = l·d, l = u/d.
  const u55r = (re[20] as number) - l50r * u50r + l50i * u50i - l51r * u51r + l51i * u51i - l52r * u52r + l52i * u52i - l53r * u53r + l53i * u53i - l54r * u54r + l54i * u54i;
  const u55i = (im[20] as number) - l50r * u50i - l50i * u50r - l51r * u51i - l51i * u51r - l52r * u52i - l52i * u52r - l53r * u53i - l53i * u53r - l54r * u54i - l54i * u54r;
  const m5 = u55r * u55r + u55i * u55i;
  const e5r = u55r / m5;
  const e5i = -u55i / m5;
  if (!(m5 > 0)) return false;
  // Forward: L·y = b.
  const y0r = (bRe[0] as number);
  const y0i = (bIm[0] as number);
  const y1r = (bRe[1] as number) - l10r * y0r + l10i * y0i;
  const y1i = (bIm[1] as number) - l10r * y0i - l10i * y0r;
  const y2r = (bRe[2] as number) - l20r * y0r + l20i * y0i - l21r * y1r + l21i * y1i;
  const y2i = (bIm[2] as number) - l20r * y0i - l20i * y0r - l21r * y1i - l21i * y1r;
  const y3r = (bRe[3] as number) - l30r * y0r + l30i * y0i - l31r * y1r + l31i * y1i - l32r * y2r + l32i * y2i;
  const y3i = (bIm[3] as number) - l30r * y0i - l30i * y0r - l31r * y1i - l31i * y1r - l32r * y2i - l32i * y2r;
  const y4r = (bRe[4] as number) - l40r * y0r + l40i * y0i - l41r * y1r + l41i * y1i - l42r * y2r + l42i * y2i - l43r * y3r + l43i * y3i;
  const y4i = (bIm[4] as number) - l40r * y0i - l40i * y0r - l41r * y1i - l41i * y1r - l42r * y2i - l42i * y2r - l43r * y3i - l43i * y3r;
  const y5r = (bRe[5] as number) - l50r * y0r + l50i * y0i - l51r * y1r + l51i * y1i - l52r * y2r + l52i * y2i - l53r * y3r + l53i * y3i - l54r * y4r + l54i * y4i;
  const y5i = (bIm[5] as number) - l50r * y0i - l50i * y0r - l51r * y1i - l51i * y1r - l52r * y2i - l52i * y2r - l53r * y3i - l53i * y3r - l54r * y4i - l54i * y4r;
  // Diagonal and back: Lᵀ·x = y/d.
  const x5r = (y5r * e5r - y5i * e5i);
  const x5i = (y5r * e5i + y5i * e5r);
  const x4r = (y4r * e4r - y4i * e4i) - l54r * x5r + l54i * x5i;
  const x4i = (y4r * e4i + y4i * e4r) - l54r * x5i - l54i * x5r;
  const x3r = (y3r * e3r - y3i * e3i) - l43r * x4r + l43i * x4i - l53r * x5r + l53i * x5i;
  const x3i = (y3r * e3i + y3i * e3r) - l43r * x4i - l43i * x4r - l53r * x5i - l53i * x5r;
  const x2r = (y2r * e2r - y2i * e2i) - l32r * x3r + l32i * x3i - l42r * x4r + l42i * x4i - l52r * x5r + l52i * x5i;
  const x2i = (y2r * e2i + y2i * e2r) - l32r * x3i - l32i * x3r - l42r * x4i - l42i * x4r - l52r * x5i - l52i * x5r;
  const x1r = (y1r * e1r - y1i * e1i) - l21r * x2r + l21i * x2i - l31r * x3r + l31i * x3i - l41r * x4r + l41i * x4i - l51r * x5r + l51i * x5i;
  const x1i = (y1r * e1i + y1i * e1r) - l21r * x2i - l21i * x2r - l31r * x3i - l31i * x3r - l41r * x4i - l41i * x4r - l51r * x5i - l51i * x5r;
  const x0r = (y0r * e0r - y0i * e0i) - l10r * x1r + l10i * x1i - l20r * x2r + l20i * x2i - l30r * x3r + l30i * x3i - l40r * x4r + l40i * x4i - l50r * x5r + l50i * x5i;
  const x0i = (y0r * e0i + y0i * e0r) - l10r * x1i - l10i * x1r - l20r * x2i - l20i * x2r - l30r * x3i - l30i * x3r - l40r * x4i - l40i * x4r - l50r * x5i - l50i * x5r;
  xRe[0] = x0r;
  xRe[1] = x1r;
  xRe[2] = x2r;
  xRe[3] = x3r;
  xRe[4] = x4r;
  xRe[5] = x5r;
  xIm[0] = x0i;
  xIm[1] = x1i;
  xIm[2] = x2i;
  xIm[3] = x3i;
  xIm[4] = x4i;
  xIm[5] = x5i;
  return true;
}
