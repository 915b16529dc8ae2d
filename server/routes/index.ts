import type { Route } from "../route.ts";
import { healthRoutes } from "./health.ts";
import { openapiRoutes } from "./openapi.ts";
import { pageRoutes } from "./page.ts";
import { referenceRoutes } from "./reference.ts";

/** Every route of the service: what the application mounts and what the OpenAPI document describes. */
export const routes: readonly Route[] = [
  ...pageRoutes,
  ...openapiRoutes,
  ...referenceRoutes,
  ...healthRoutes,
];
