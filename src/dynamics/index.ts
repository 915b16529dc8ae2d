export { analyse, frequencyCurve, verticalForce } from "./analyse.ts";
export type { Analysis, FootState, JudgedOn, Mode, PointVelocity, Shape, SteadyState } from "./analysis.ts";
export { footLoads } from "./foot-loads.ts";
export {
  type ComplexStiffness,
  type Mount,
  transmissibilityOf,
  type VerticalModel,
} from "./vertical.ts";
export { type Maximum, worstOver } from "./worst.ts";
