import type { Isolator } from "../../../src/isolator/index.ts";
import {
  boxInertia,
  type Foot,
  type Machine,
  type RigidBody,
  type Vec3,
} from "../../../src/machine/index.ts";
import { isolator, machine } from "../../selection/arbitrary.ts";

export const rpm = (n: number): number => (n * 2 * Math.PI) / 60;
export const invariant = { rtol: 1e-9, because: "an invariance, but for rounding" };

/** A fan on four feet, its CG off centre, of mixed springs, shaken by a force and an unbalance. */
export const PLACES: readonly Vec3[] = [
  [-0.6, -0.4, 0],
  [0.6, -0.4, 0],
  [-0.6, 0.4, 0],
  [0.6, 0.4, 0],
];
export const SPRINGS: readonly Isolator[] = [80e3, 120e3, 80e3, 120e3].map((stiffness, i) =>
  isolator({
    designation: `s${i}`,
    axial: { kind: "linear", stiffness },
    lateralRatio: 0.8,
    damping: i < 2 ? { kind: "structural", lossFactor: 0.08 } : { kind: "viscous", ratio: 0.03 },
  }),
);
export const BODY: RigidBody = {
  mass: 850,
  centreOfGravity: [0.1, 0.03, 0.5],
  inertia: { ...boxInertia(850, 1.4, 1.0, 0.9), xz: -6, yz: 4, xy: 3 },
};

export function fan(body: RigidBody, feet: readonly Foot[], overrides: Partial<Machine> = {}): Machine {
  return machine({
    feet,
    footCount: feet.length,
    rigid: body,
    centreOfGravity: { x: body.centreOfGravity[0], y: body.centreOfGravity[1] },
    excitationPoint: body.centreOfGravity,
    speed: { min: rpm(600), max: rpm(1180) },
    excitations: [
      {
        kind: "unbalance",
        unbalance: { kind: "moment", moment: 0.004 },
        order: 1,
        phase: 0.3,
        at: [0.2, 0.1, 0.7],
      },
      { kind: "force", amplitude: 40, direction: [0, 0, 1], order: 2, phase: 0, at: [-0.3, 0, 0.4] },
    ],
    orders: [1, 2],
    ...overrides,
  });
}
