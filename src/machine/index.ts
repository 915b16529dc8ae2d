export { type BaseMaterial, type Slab, slabBody, slabMass } from "./base.ts";
export {
  CANCELS,
  type Excitation,
  type ForceExcitation,
  forceOf,
  ordersOf,
  type Sense,
  sensesOf,
  type UnbalanceExcitation,
} from "./excitation.ts";
export { centroid, footprintPositions, requireCarryingFeet, withinOutline } from "./feet.ts";
export type { Axis, Foot, Machine, NamedPoint, Rotation, SpeedRange } from "./machine.ts";
export {
  boxInertia,
  combine,
  type Inertia,
  principalMoments,
  type RigidBody,
  requirePossibleInertia,
} from "./rigid-body.ts";
export { type Complex, type ComplexVec3, norm, type Vec3 } from "./vector.ts";
