import type { NextFunction, Request, Response } from "express";
import { ProblemError } from "../problems.ts";

/** Refuses an address whose percent-encoding is broken, in the path or in the query. */
export function wellFormedUrl() {
  return function checkUrl(request: Request, _response: Response, next: NextFunction): void {
    if (request.url.includes("%")) {
      try {
        decodeURIComponent(request.url);
      } catch {
        throw new ProblemError(
          "malformed-request",
          "The address holds a percent-encoding that is not UTF-8.",
        );
      }
    }
    next();
  };
}
