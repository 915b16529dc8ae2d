export { backward, cholesky6, forward } from "./cholesky.ts";
export { PACKED, packed, solveSymmetric6 } from "./solve.ts";
export { type Eigen6, symmetricEigen6 } from "./symmetric-eigen.ts";
