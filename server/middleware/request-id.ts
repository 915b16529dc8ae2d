import { randomUUID } from "node:crypto";
import type { NextFunction, Request, Response } from "express";

/** Names every request, in `response.locals.requestId` and in the header `x-request-id`. */
export function requestId() {
  return function nameRequest(_request: Request, response: Response, next: NextFunction): void {
    const id = randomUUID();
    response.locals["requestId"] = id;
    response.setHeader("x-request-id", id);
    next();
  };
}
