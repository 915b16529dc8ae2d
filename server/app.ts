import express, { type Express, type Request, type Response } from "express";
import { allowedMethods } from "./middleware/allowed-methods.ts";
import { apiKey } from "./middleware/api-key.ts";
import { jsonBody } from "./middleware/json-body.ts";
import { problemDetails } from "./middleware/problem-details.ts";
import { requestId } from "./middleware/request-id.ts";
import { securityHeaders } from "./middleware/security-headers.ts";
import { wellFormedUrl } from "./middleware/well-formed-url.ts";
import { engineVersion } from "./package-info.ts";
import { ProblemError } from "./problems.ts";
import type { Context, Route } from "./route.ts";
import { routes } from "./routes/index.ts";

/** The whole service as an Express application. It opens no port, so tests can call it directly. */
export function createApp(parts: Omit<Context, "engineVersion">): Express {
  return mount(routes, { ...parts, engineVersion });
}

/** An application of the given routes, with everything around them. */
export function mount(list: readonly Route[], context: Context): Express {
  const app = express();
  app.disable("x-powered-by");
  // Routes that can be cached set a strong tag of their own; hashing every other answer buys nothing.
  app.disable("etag");

  app.use(requestId(), securityHeaders(), wellFormedUrl());
  for (const route of list) {
    const { method, path, operation, bodyLimit } = route;
    const enter = (_request: Request, response: Response, next: () => void) => {
      response.locals["route"] = route;
      next();
    };
    const body = operation.body === undefined ? [] : [jsonBody({ limit: bodyLimit })];
    app[method](path, enter, apiKey(context.config, route), ...body, (request, response) =>
      route.answer(context, request, response),
    );
  }
  for (const path of new Set(list.map((route) => route.path))) {
    app.all(path, allowedMethods(list.filter((route) => route.path === path)));
  }
  app.use((request: Request) => {
    throw new ProblemError("unknown-route", `Nothing is at ${request.path}.`);
  });
  app.use(problemDetails(context.logger));
  return app;
}
