export {
  BALANCE_GRADES,
  BALANCE_GRADES_SOURCE,
  type BalanceGrade,
  type ParsedGrade,
  parseGrade,
  permissibleUnbalance,
} from "./balance-grades.ts";
export { MACHINE_ZONES, MACHINE_ZONES_SOURCE, type MachineZones } from "./machine-zones.ts";
export type { Mark, Source } from "./source.ts";
