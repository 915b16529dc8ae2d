export type { Arrangement } from "./arrange.ts";
export { cautionsFor } from "./cautions.ts";
export { type Evaluated, type EvaluationRequest, judge } from "./evaluate.ts";
export { type Check, GATES, type Gate } from "./gates.ts";
export type { NearMiss } from "./near-misses.ts";
export type { Needed } from "./needed.ts";
export type { Option } from "./rank.ts";
export {
  type Environment,
  type Limits,
  type Mounting,
  RANKINGS,
  type Ranking,
  type SelectionRequest,
  type Target,
} from "./request.ts";
export { type ScreenLine, type ScreenTask, screen } from "./screen.ts";
export { type Counts, type Selection, select } from "./select.ts";
