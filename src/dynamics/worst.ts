/** Where a function is largest on a range, and how large. */
export interface Maximum {
  readonly at: number;
  readonly value: number;
}

const GOLDEN = (Math.sqrt(5) - 1) / 2;
/** Log-spaced points that catch what no resonance announces. */
const SCAN_POINTS = 12;
/** Points round each resonance, as multiples of it: closer than half a bandwidth at any usual damping. */
const AROUND_RESONANCE = [0.97, 0.99, 1, 1.01, 1.03];
/** A local maximum lower than this share of the largest sample cannot overtake it by refinement. */
const WORTH_REFINING = 0.3;
/** Relative width at which refinement stops; the value is then flat to its square. */
const WIDTH = 1e-5;

/**
 * The largest value of a frequency response on a range: the ends, every resonance inside, a scan between, and
 * golden-section refinement of each local maximum. Never only a sample of a grid.
 * @param f           response, finite or +Infinity, of frequency (rad/s)
 * @param lo, hi      range, rad/s, 0 < lo ≤ hi
 * @param resonances  frequencies where a peak is to be expected, rad/s
 * @returns           the maximum, to 0.1 % of its value (Source: golden-section search, Kiefer 1953)
 */
export function worstOver(
  f: (omega: number) => number,
  lo: number,
  hi: number,
  resonances: readonly number[],
): Maximum {
  if (hi <= lo) return { at: lo, value: f(lo) };
  const ratio = hi / lo;
  const points = Array.from({ length: SCAN_POINTS }, (_, i) => lo * ratio ** (i / (SCAN_POINTS - 1)));
  points[SCAN_POINTS - 1] = hi;
  for (const peak of resonances)
    for (const times of AROUND_RESONANCE)
      if (peak * times > lo && peak * times < hi) points.push(peak * times);
  points.sort((a, b) => a - b);

  const samples = points.map((at): Maximum => ({ at, value: f(at) }));
  const largest = (a: Maximum, b: Maximum): Maximum => (b.value > a.value ? b : a);
  let best = samples.reduce(largest);
  const floor = best.value * WORTH_REFINING;
  samples.forEach((sample, i) => {
    const left = samples[Math.max(i - 1, 0)] as Maximum;
    const right = samples[Math.min(i + 1, samples.length - 1)] as Maximum;
    const peaked = sample.value >= left.value && sample.value >= right.value;
    if (peaked && sample.value >= floor && left.at < right.at)
      best = largest(best, refine(f, left.at, right.at));
  });
  return best;
}

/** Golden-section search for a maximum of `f` between `a` and `b`, taken to be the only one there. */
function refine(f: (omega: number) => number, a: number, b: number): Maximum {
  let lo = a;
  let hi = b;
  let x1 = hi - GOLDEN * (hi - lo);
  let x2 = lo + GOLDEN * (hi - lo);
  let f1 = f(x1);
  let f2 = f(x2);
  while (hi - lo > WIDTH * hi) {
    if (f1 >= f2) {
      hi = x2;
      x2 = x1;
      f2 = f1;
      x1 = hi - GOLDEN * (hi - lo);
      f1 = f(x1);
    } else {
      lo = x1;
      x1 = x2;
      f1 = f2;
      x2 = lo + GOLDEN * (hi - lo);
      f2 = f(x2);
    }
  }
  return f1 >= f2 ? { at: x1, value: f1 } : { at: x2, value: f2 };
}
