const N = 6;
const at = (i: number, j: number): number => (i * (i + 1)) / 2 + j;

/**
 * Writes `src/dynamics/solver/unrolled-ldl.ts`: LDLᵀ of a complex symmetric 6 × 6 matrix in straight-line code. By
 * hand it would be six hundred chances of a slip.
 */
export function unrolledLdl(): string {
  const out: string[] = [];
  const say = (line: string): number => out.push(`  ${line}`);
  const complex = (name: string, re: string, im: string): void => {
    say(`const ${name}r = ${re};`);
    say(`const ${name}i = ${im};`);
  };
  /** a − Σ x·y, as real and imaginary part. */
  const minus = (
    a: readonly [string, string],
    products: readonly (readonly [string, string])[],
  ): [string, string] => [
    [a[0], ...products.flatMap(([x, y]) => [`- ${x}r * ${y}r`, `+ ${x}i * ${y}i`])].join(" "),
    [a[1], ...products.map(([x, y]) => `- ${x}r * ${y}i - ${x}i * ${y}r`)].join(" "),
  ];
  const ks = (n: number): number[] => Array.from({ length: n }, (_, k) => k);

  for (let j = 0; j < N; j++) {
    say(`// Column ${j}: u = l·d, l = u/d.`);
    for (let i = j; i < N; i++) {
      const products = ks(j).map((k) => [`l${j}${k}`, `u${i}${k}`] as const);
      complex(`u${i}${j}`, ...minus([`re[${at(i, j)}]`, `im[${at(i, j)}]`], products));
    }
    say(`const m${j} = u${j}${j}r * u${j}${j}r + u${j}${j}i * u${j}${j}i;`);
    complex(`e${j}`, `u${j}${j}r / m${j}`, `-u${j}${j}i / m${j}`);
    for (let i = j + 1; i < N; i++)
      complex(
        `l${i}${j}`,
        `u${i}${j}r * e${j}r - u${i}${j}i * e${j}i`,
        `u${i}${j}r * e${j}i + u${i}${j}i * e${j}r`,
      );
    for (let i = j + 1; i < N; i++)
      say(`if (!(l${i}${j}r * l${i}${j}r + l${i}${j}i * l${i}${j}i < GROWTH)) return false;`);
  }
  say(`if (!(m5 > 0)) return false;`);
  say("// Forward: L·y = b.");
  for (let i = 0; i < N; i++)
    complex(
      `y${i}`,
      ...minus(
        [`bRe[${i}]`, `bIm[${i}]`],
        ks(i).map((k) => [`l${i}${k}`, `y${k}`] as const),
      ),
    );
  say("// Diagonal and back: Lᵀ·x = y/d.");
  for (let i = N - 1; i >= 0; i--) {
    const scaled: [string, string] = [
      `(y${i}r * e${i}r - y${i}i * e${i}i)`,
      `(y${i}r * e${i}i + y${i}i * e${i}r)`,
    ];
    const products = ks(N - 1 - i).map((k) => [`l${i + 1 + k}${i}`, `x${i + 1 + k}`] as const);
    complex(`x${i}`, ...minus(scaled, products));
  }
  for (let i = 0; i < N; i++) say(`xRe[${i}] = x${i}r;`);
  for (let i = 0; i < N; i++) say(`xIm[${i}] = x${i}i;`);
  say("return true;");

  const body = out.join("\n").replaceAll(/(re|im|bRe|bIm)\[(\d+)\](?! =)/g, "($1[$2] as number)");
  return `// Written by test/support/write-ldl.ts; do not edit. A test compares the two and, run with -u, writes it anew.

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
${body}
}
`;
}
