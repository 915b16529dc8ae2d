import type { NextFunction, Request, Response } from "express";
import type { Logger } from "pino";
import { type ProblemError, problemBody, problemOf } from "../problems.ts";
import type { Route } from "../route.ts";

/**
 * Answers everything that was thrown, and is the only place that writes an error body (RFC 9457). What was not
 * planned is logged whole under the request's id and shown to nobody. A route may answer its problems in its own
 * way (`answerProblem`), as spreadsheets need.
 */
export function problemDetails(logger: Logger) {
  // Express knows an error handler by its four parameters.
  return function answerProblem(
    error: unknown,
    request: Request,
    response: Response,
    _next: NextFunction,
  ): void {
    const problem = problemOf(error);
    const id = String(response.locals["requestId"]);
    if (problem.code === "internal") {
      logger.error(
        { err: error, request_id: id, method: request.method, path: request.path },
        "unplanned failure",
      );
    }
    if (response.headersSent) {
      request.socket.destroy();
      return;
    }
    clearAnswer(response);
    const route = response.locals["route"] as Route | undefined;
    if (route?.answerProblem?.(problem, request, response)) return;
    send(problem, request, response, id);
  };
}

function send(problem: ProblemError, request: Request, response: Response, id: string): void {
  response
    .status(problem.status)
    .set({ "cache-control": "no-store", ...problem.headers })
    .type("application/problem+json")
    .send(JSON.stringify(problemBody(problem, request.path, id)));
}

/** What a handler had set for an answer that never came must not go out with the problem. */
function clearAnswer(response: Response): void {
  for (const name of ["etag", "last-modified", "cache-control", "content-disposition"])
    response.removeHeader(name);
}
