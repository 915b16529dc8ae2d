import { createHash, timingSafeEqual } from "node:crypto";
import type { NextFunction, Request, Response } from "express";
import type { Config } from "../config.ts";
import { ProblemError } from "../problems.ts";
import type { Route } from "../route.ts";

/**
 * Asks for a key where the configuration wants one: writing routes once there are keys, reading routes too
 * when all need one. OPTIONS never comes here, and HEAD of a spreadsheet route passes, since spreadsheets send
 * both without the key.
 */
export function apiKey({ apiKeys, requireKey }: Config, { access = "reading", keyInQuery }: Route) {
  const known = apiKeys.map(digest);
  const guarded = access === "writing" || (access === "reading" && requireKey === "all");

  return function checkKey(request: Request, _response: Response, next: NextFunction): void {
    if (guarded && known.length > 0 && !(keyInQuery && request.method === "HEAD")) {
      const given = bearer(request) ?? (keyInQuery ? request.query["key"] : undefined);
      if (!isKnown(given))
        throw refusal(given === undefined ? "This address needs a key." : "This key is not known.");
    }
    next();
  };

  function isKnown(given: unknown): boolean {
    if (typeof given !== "string") return false;
    const mark = digest(given);
    return known.some((key) => timingSafeEqual(key, mark));
  }
}

function bearer(request: Request): string | undefined {
  return /^Bearer +(\S+)$/i.exec(request.headers.authorization ?? "")?.[1];
}

/** Digests have one length, so comparing them takes the same time for every guess. */
function digest(key: string): Buffer {
  return createHash("sha256").update(key).digest();
}

function refusal(detail: string): ProblemError {
  return new ProblemError("unauthorized", detail, {
    headers: { "www-authenticate": 'Bearer realm="mountrank"' },
  });
}
