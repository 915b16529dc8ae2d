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
  /** Dynamic axial stiffness that does not depend on load, N/m; 0 for an air spring. */
  readonly stiffness: Float64Array;
  /** Dynamic axial stiffness per newton of static load, 1/m: ωₙ²/g for an air spring, else 0. */
  readonly stiffnessPerLoad: Float64Array;
  /** Dashpot c, N·s/m; 0 for structural damping. */
  readonly dashpot: Float64Array;
  /** Loss factor η; 0 for viscous damping. */
  readonly lossFactor: Float64Array;
}
