import { verticalForce } from "../dynamics/index.ts";
import type { Gate } from "./gates.ts";
import type { SelectionRequest } from "./request.ts";

/** What one target allows at one excitation frequency. */
export interface TargetLine {
  readonly gate: Extract<Gate, "transmissibility" | "transmitted_force">;
  /** rad/s */
  readonly omega: number;
  /** Largest transmissibility; a force target allows its share of the force applied. */
  readonly limit: number;
}

/**
 * The frequencies at which the vertical model is held to the targets: the ends of the speed range at every order
 * at which something vertical acts (or nothing at all, and a unit force is judged), one line a target.
 */
export function targetLines({ machine, target }: SelectionRequest): readonly TargetLine[] {
  const { min, max } = machine.speed;
  const { transmissibility, transmittedForce } = target;
  const lines: TargetLine[] = [];
  for (const order of machine.orders)
    for (const speed of new Set([min, max])) {
      const force = verticalForce(machine, order, speed);
      if (force === null) continue;
      const omega = order * speed;
      if (transmissibility !== null) lines.push({ gate: "transmissibility", omega, limit: transmissibility });
      if (transmittedForce !== null && force !== undefined)
        lines.push({ gate: "transmitted_force", omega, limit: transmittedForce / force });
    }
  return lines;
}
