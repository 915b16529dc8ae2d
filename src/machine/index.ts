export {
  type Excitation,
  type ForceExcitation,
  forceOf,
  ordersOf,
  type Sense,
  sensesOf,
  type UnbalanceExcitation,
  unbalanceMoment,
} from "./excitation.ts";
export { centroid, footprintPositions, requireCarryingFeet, withinOutline } from "./feet.ts";
export type { Axis, Machine, Rotation, SpeedRange } from "./machine.ts";
export { type Complex, type ComplexVec3, norm, type Vec3 } from "./vector.ts";
