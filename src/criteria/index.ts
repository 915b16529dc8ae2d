export {
  BALANCE_GRADES,
  type BalanceGrade,
  type ParsedGrade,
  parseGrade,
  permissibleUnbalance,
} from "./balance-grades.ts";
