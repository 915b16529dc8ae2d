import type { Route } from "../route.ts";
import { criteriaRoutes } from "./criteria.ts";
import { evaluationRoutes } from "./evaluations.ts";
import { healthRoutes } from "./health.ts";
import { isolatorRoutes } from "./isolators.ts";
import { openapiRoutes } from "./openapi.ts";
import { pageRoutes } from "./page.ts";
import { referenceRoutes } from "./reference.ts";
import { selectionRoutes } from "./selections.ts";
import { sheetRoutes } from "./sheet.ts";

/** Every route of the service: what the application mounts and what the OpenAPI document describes. */
export const routes: readonly Route[] = [
  ...selectionRoutes,
  ...evaluationRoutes,
  ...sheetRoutes,
  ...isolatorRoutes,
  ...criteriaRoutes,
  ...pageRoutes,
  ...openapiRoutes,
  ...referenceRoutes,
  ...healthRoutes,
];
