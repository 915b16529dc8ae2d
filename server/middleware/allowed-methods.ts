import type { Request, Response } from "express";
import { ProblemError } from "../problems.ts";
import type { Route } from "../route.ts";

/** The answer at a known path to OPTIONS, and to every method it does not have. */
export function allowedMethods(routesAtPath: readonly Route[]) {
  const methods = routesAtPath.flatMap(({ method }) =>
    method === "get" ? ["GET", "HEAD"] : [method.toUpperCase()],
  );
  const allow = [...new Set([...methods, "OPTIONS"])].join(", ");

  return function answerMethods(request: Request, response: Response): void {
    if (request.method === "OPTIONS") {
      response.status(204).set("allow", allow).end();
      return;
    }
    throw new ProblemError(
      "method-not-allowed",
      `${request.method} does not fit this address; it has ${allow}.`,
      {
        headers: { allow },
      },
    );
  };
}
