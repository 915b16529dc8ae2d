import type { IsolatorRecord } from "../../src/isolator/index.ts";
import { airRecords } from "./air.ts";
import { rubberRecords } from "./rubber.ts";
import { springRecords } from "./springs.ts";
import { wireRopeRecords } from "./wire-rope.ts";

/**
 * The demo catalogue: generic isolators that nobody makes, rated from first principles so that stiffness, load,
 * travel, height, diameter and price hang together as a designer's would. The same list every time.
 */
export function demoRecords(): readonly IsolatorRecord[] {
  return [...rubberRecords(), ...springRecords(), ...wireRopeRecords(), ...airRecords()];
}
