export {
  type AirSpring,
  airSpringLoad,
  airSpringStiffness,
  FAST_EXPONENT,
} from "./air-spring.ts";
export {
  compressionStiffness,
  discShape,
  type Rubber,
  rectangleShape,
  rubberOf,
  shearStiffness,
} from "./block.ts";
export {
  activeMass,
  bucklingDeflection,
  type HelicalSpring,
  lateralRatio,
  SPRING_STEEL,
  type SpringMaterial,
  springRate,
  springStress,
  surgeFrequency,
  wahlFactor,
} from "./helical-spring.ts";
