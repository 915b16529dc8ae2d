import type { z } from "zod";
import { suggestion } from "./nearest.ts";

/** Of a field with several forms, when the schema has no wording of its own. */
export const NO_FORM = "has none of the forms that are known here";

/**
 * What is wrong with a field, in words that follow its name: "is missing", "must be at most 5". Wording that a
 * schema brings itself is kept; this is only for what zod would say in its own words.
 */
export const sentence: z.core.$ZodErrorMap = (issue) => {
  if (issue.input === undefined) return "is missing";
  switch (issue.code) {
    case "invalid_type":
      return mustBe([String(issue.expected)], issue.input);
    case "too_big":
      return `must ${amount(issue.origin, issue.inclusive === false ? "less than" : "at most", issue.maximum)}`;
    case "too_small":
      return `must ${amount(issue.origin, issue.inclusive === false ? "more than" : "at least", issue.minimum)}`;
    case "invalid_value":
      return oneOf(issue.values.map(String), issue.input);
    case "invalid_union":
      // Only a discriminated union names its options, and with them the field that tells its forms apart.
      return Array.isArray(issue["options"])
        ? oneOf(issue["options"].map(String), fieldOf(issue.input, issue["discriminator"]))
        : NO_FORM;
    case "invalid_format":
      return issue.format === "regex" ? "is not of the form asked for" : `is not a valid ${issue.format}`;
    default:
      return undefined;
  }
};

/** `must be a number or a string, not an array`. */
export function mustBe(expected: readonly string[], input: unknown): string {
  return `must be ${[...new Set(expected)].map(withArticle).join(" or ")}, not ${kindOf(input)}`;
}

function amount(origin: string, comparison: string, limit: number | bigint): string {
  if (limit === 1 && comparison === "at least" && origin !== "number") return "not be empty";
  if (origin === "string") return `have ${comparison} ${limit} characters`;
  if (origin === "array" || origin === "set") return `have ${comparison} ${limit} entries`;
  return `be ${comparison} ${limit}`;
}

/** `must be one of "floor", "suspended"`, with the nearest when it was misspelt. */
export function oneOf(values: readonly string[], input: unknown): string {
  const distinct = [...new Set(values)];
  const list = distinct.map((value) => `"${value}"`).join(", ");
  const must = distinct.length === 1 ? `must be ${list}` : `must be one of ${list}`;
  if (input === undefined) return `is missing and ${must}`;
  return typeof input === "string" ? must + suggestion(input, distinct) : must;
}

function fieldOf(input: unknown, key: unknown): unknown {
  return typeof input === "object" && input !== null ? Reflect.get(input, String(key)) : undefined;
}

function kindOf(input: unknown): string {
  if (input === null) return "null";
  if (Array.isArray(input)) return "an array";
  if (typeof input === "number" && !Number.isFinite(input)) return String(input);
  return withArticle(typeof input);
}

function withArticle(kind: string): string {
  if (kind === "null" || kind === "undefined" || kind === "never") return kind;
  if (kind === "int") return "a whole number";
  return /^[aeiou]/.test(kind) ? `an ${kind}` : `a ${kind}`;
}
