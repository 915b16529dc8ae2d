import { dashpot, dynamicStiffness, lossFactor, ratedNaturalFrequency } from "./dynamic.ts";
import type { Isolator } from "./isolator.ts";

/**
 * The isolators of one catalogue revision as columns, for screening a whole catalogue without touching an
 * object per isolator. Rows are sorted by maximum load (ties by designation), so that the load gate is a
 * bisection. SI units; every column has one value a row.
 */
export interface IsolatorColumns {
  readonly isolators: readonly Isolator[];
  /** Maximum static load, N, ascending. */
  readonly maxLoad: Float64Array;
  /** Minimum static load, N. */
  readonly minLoad: Float64Array;
  /** Smallest minimum load of this row and all after it, N, ascending: where the load gate can end. */
  readonly minLoadFrom: Float64Array;
  /** Dynamic axial stiffness, N/m; 0 for an air spring, and where it varies with load or frequency. */
  readonly stiffness: Float64Array;
  /** Dynamic axial stiffness per newton of static load, 1/m: ωₙ²/g for an air spring, else 0. */
  readonly stiffnessPerLoad: Float64Array;
  /** Dashpot c, N·s/m; 0 for structural damping, and where the stiffness varies. */
  readonly dashpot: Float64Array;
  /** Loss factor η; 0 for viscous damping. */
  readonly lossFactor: Float64Array;
}

/**
 * The columns of a list of isolators. One whose stiffness varies with load (a curve) or frequency (a table of dynamic
 * ratios) has no stiffness here: a screen then lets it by on its load, to be evaluated as it is.
 */
export function columnsOf(list: readonly Isolator[]): IsolatorColumns {
  const isolators = [...list].sort(
    (a, b) => a.load.max - b.load.max || (a.designation < b.designation ? -1 : 1),
  );
  const column = (value: (isolator: Isolator) => number): Float64Array => Float64Array.from(isolators, value);
  const ratedStiffness = (isolator: Isolator): number =>
    dynamicStiffness(isolator, isolator.load.rated, ratedNaturalFrequency(isolator));
  const minLoad = column((isolator) => isolator.load.min);
  return {
    isolators,
    maxLoad: column((isolator) => isolator.load.max),
    minLoad,
    minLoadFrom: smallestFrom(minLoad),
    stiffness: column((isolator) => (isConstant(isolator) ? ratedStiffness(isolator) : 0)),
    stiffnessPerLoad: column((isolator) =>
      isolator.axial.kind === "air" ? ratedStiffness(isolator) / isolator.load.rated : 0,
    ),
    dashpot: column((isolator) => (isVarying(isolator) ? 0 : dashpot(isolator))),
    lossFactor: column(lossFactor),
  };
}

function isVarying({ axial, dynamicRatio }: Isolator): boolean {
  return axial.kind === "curve" || (axial.kind === "linear" && typeof dynamicRatio !== "number");
}

function isConstant(isolator: Isolator): boolean {
  return isolator.axial.kind === "linear" && !isVarying(isolator);
}

/** For each place the smallest value from there to the end. */
function smallestFrom(values: Float64Array): Float64Array {
  const smallest = values.slice();
  for (let i = smallest.length - 2; i >= 0; i--)
    smallest[i] = Math.min(smallest[i] as number, smallest[i + 1] as number);
  return smallest;
}
