import type { Express } from "express";
import supertest, { type Response } from "supertest";
import { expect } from "vitest";
import { validatorAt } from "./contract.ts";

/** Requests to routes that only a test knows: every error answer must be a problem as the document describes it. */
export function checkedByProblem(app: Express) {
  const agent = supertest(app);
  return {
    get: (url: string) => agent.get(url).expect(isProblemIfError),
    head: (url: string) => agent.head(url),
    post: (url: string) => agent.post(url).expect(isProblemIfError),
    delete: (url: string) => agent.delete(url).expect(isProblemIfError),
    options: (url: string) => agent.options(url),
  };
}

function isProblemIfError(response: Response): void {
  if (response.status < 400) return;
  expect(response.type).toBe("application/problem+json");
  const validate = validatorAt("components", "schemas", "Problem");
  expect(validate(response.body) ? [] : validate.errors).toEqual([]);
  expect(response.body.status).toBe(response.status);
  expect(response.body.request_id).toBe(response.headers["x-request-id"]);
}
