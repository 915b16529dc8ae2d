import type { NextFunction, Request, Response } from "express";
import express from "express";
import { ProblemError } from "../problems.ts";

const ONE_MEBIBYTE = 1_048_576;

/**
 * Reads a JSON body into `request.body`; gzip, deflate and brotli are unpacked, and the limit holds for what
 * comes out. A request without `Content-Type: application/json` is refused, also when it has no body.
 */
export function jsonBody({ limit = ONE_MEBIBYTE }: { readonly limit?: number | undefined } = {}) {
  const read = express.json({ limit, strict: false, verify: refuseEmpty });
  return function readJson(request: Request, response: Response, next: NextFunction): void {
    if (!isJson(request.headers["content-type"])) {
      throw new ProblemError(
        "unsupported-media-type",
        "The body must come with Content-Type: application/json.",
      );
    }
    read(request, response, (error: unknown) => {
      if (error !== undefined) next(error);
      else if (request.body === undefined) next(new ProblemError("malformed-json", "The body is empty."));
      else next();
    });
  };
}

function isJson(contentType: string | undefined): boolean {
  return contentType?.split(";")[0]?.trim().toLowerCase() === "application/json";
}

/** The body reader takes an empty body for `{}`, which hides what went wrong. */
function refuseEmpty(_request: unknown, _response: unknown, body: Buffer): void {
  if (body.length === 0) throw Object.assign(new Error("The body is empty."), { type: "entity.empty" });
}
