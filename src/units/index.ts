export { fromSI, inUnit, ofUnit, toSI } from "./convert.ts";
export { DIMENSIONS, DOCUMENTED_UNIT } from "./dimensions.ts";
export { type Parsed, parseQuantity } from "./parse.ts";
export { PEOPLE_UNITS, unitSuffix } from "./people.ts";
export { type Dimension, STANDARD_GRAVITY, type UnitSymbol } from "./table.ts";
