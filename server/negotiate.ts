import type { Request, Response } from "express";
import { ProblemError } from "./problems.ts";

/**
 * The form in which to answer. The `format=` of the query wins; else the `Accept` header chooses, and among
 * equals the first offered.
 *
 * @param offered  media types by format name, the default first: `{ json: "application/json", csv: "text/csv" }`
 * @param format   the `format=` of the query, already checked by the route's schema
 * @throws {ProblemError} not-acceptable, when `Accept` allows none of them
 */
export function negotiate<F extends string>(
  request: Request,
  response: Response,
  offered: Readonly<Record<F, string>>,
  format?: F,
): F {
  if (format !== undefined) return format;
  response.vary("Accept");
  const names = Object.keys(offered) as F[];
  const accepted = request.accepts(names.map((name) => offered[name]));
  const chosen = names.find((name) => offered[name] === accepted);
  if (chosen !== undefined) return chosen;
  throw new ProblemError("not-acceptable", `This address answers as ${Object.values(offered).join(" or ")}.`);
}
