import { describe, expect, test } from "vitest";
import { nearest } from "../../../server/input/nearest.ts";

const KNOWN = ["mass", "speed", "feet", "transmissibility", "isolation_efficiency"];

describe("the nearest known name", () => {
  test.each([
    ["mas", "mass"],
    ["Mass", "mass"],
    ["sped", "speed"],
    ["seped", "speed"],
    ["transmissability", "transmissibility"],
    ["isolation_efficency", "isolation_efficiency"],
  ])("of %s is %s", (name, expected) => {
    expect(nearest(name, KNOWN)).toBe(expected);
  });

  test.each(["price", "", "x", "m".repeat(1_000_000)])("there is none for a name like no other", (name) => {
    expect(nearest(name, KNOWN)).toBeUndefined();
  });
});
