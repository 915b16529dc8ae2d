export { columnsOf, type IsolatorColumns } from "./columns.ts";
export { type Curve, curveThrough } from "./curve.ts";
export { dashpot, dynamicRatioAt, dynamicStiffness, lossFactor, ratedNaturalFrequency } from "./dynamic.ts";
export {
  type Axial,
  type CurvePoint,
  type Damping,
  EXPOSURES,
  type Exposure,
  FAMILIES,
  type Family,
  type FrequencyPoint,
  type Isolator,
} from "./isolator.ts";
export { type IsolatorRecord, isolatorFromRecord } from "./record.ts";
export { staticDeflection, staticLoad, staticStiffness } from "./static.ts";
