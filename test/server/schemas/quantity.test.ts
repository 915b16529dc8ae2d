import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { z } from "zod";
import { createDocument } from "zod-openapi";
import { faultsOf } from "../../../server/input/faults.ts";
import { sentence } from "../../../server/input/sentences.ts";
import { quantity } from "../../../server/schemas/quantity.ts";

const Machine = z.strictObject({
  mass: quantity("mass", {
    min: 0.001,
    max: 1e7,
    description: "Mass on the isolators.",
    examples: ["1874 lb"],
  }),
  gap: quantity("length", { above: 0, below: 2 }).optional(),
  temperature: quantity("temperature").optional(),
});

const faults = (input: unknown) => {
  const result = Machine.safeParse(input, { error: sentence });
  return result.success ? [] : faultsOf(result.error, Machine, input);
};

describe("a quantity in a request", () => {
  test("is a number in the documented unit, given so or as text with a unit", () => {
    expect(Machine.parse({ mass: 850, gap: 0.025, temperature: -10 })).toEqual({
      mass: 850,
      gap: 0.025,
      temperature: -10,
    });
    expect(Machine.parse({ mass: "850 kg", gap: "25 mm", temperature: "113 °F" })).toEqual({
      mass: 850,
      gap: 0.025,
      temperature: 45,
    });
    expect(Machine.parse({ mass: "850" })).toEqual({ mass: 850 });
  });

  test("means the same as a number and as text of it", () => {
    fc.assert(
      fc.property(fc.double({ min: 0.001, max: 1e7, noNaN: true }), (mass) => {
        expect(Machine.parse({ mass: `${mass} kg` })).toEqual(Machine.parse({ mass }));
      }),
    );
  });

  test.each<[unknown, string]>([
    [null, "null"],
    [true, "a boolean"],
    [["850 kg"], "an array"],
    [{ value: 850 }, "an object"],
    [Number.NaN, "NaN"],
    [Number.POSITIVE_INFINITY, "Infinity"],
  ])("of the wrong type, %j, is refused in one sentence at its place", (mass, found) => {
    expect(faults({ mass })).toEqual([
      {
        pointer: "/mass",
        detail: `must be a number in kg, or a string with a unit such as "850 kg", not ${found}`,
      },
    ]);
  });

  test("that is missing is said to be missing, and not of a wrong type", () => {
    expect(faults({})).toEqual([{ pointer: "/mass", detail: "is missing" }]);
  });

  test.each<[unknown, string]>([
    ["0 lb", "must be at least 0.001 kg, not 0 kg"],
    [-5, "must be at least 0.001 kg, not -5 kg"],
    ["10001 t", "must be at most 10000000 kg, not 10001000 kg"],
    ["1e999 kg", '"1e999 kg" is too large to be a finite number'],
    ["850 rpm", 'rpm is a speed; a mass is expected, such as "850 kg"'],
    ["850 kgg", '"kgg" is not a known unit; did you mean "kg"?'],
    ["", 'is empty; a mass is expected, such as "850 kg"'],
    ["9".repeat(65), "is longer than the 64 characters a quantity may have"],
  ])("of %j for a mass is refused: %s", (mass, detail) => {
    expect(faults({ mass })).toEqual([{ pointer: "/mass", detail }]);
  });

  test("with open limits may not lie on them, in any unit", () => {
    expect(faults({ mass: 1, gap: "0 mm" })).toEqual([
      { pointer: "/gap", detail: "must be more than 0 m, not 0 m" },
    ]);
    expect(faults({ mass: 1, gap: "2000 mm" })).toEqual([
      { pointer: "/gap", detail: "must be less than 2 m, not 2 m" },
    ]);
    expect(faults({ mass: 1, gap: "1999 mm" })).toEqual([]);
  });

  test("is refused at every place where it is wrong, at once", () => {
    expect(faults({ mass: "x", gap: 3, temperature: [] }).map(({ pointer }) => pointer)).toEqual([
      "/mass",
      "/gap",
      "/temperature",
    ]);
  });
});

describe("a quantity in the contract", () => {
  const MASS = {
    anyOf: [
      { type: "number", minimum: 0.001, maximum: 1e7 },
      { type: "string", maxLength: 64 },
    ],
    description: 'Mass on the isolators. A number in kg, or a string with a unit such as "850 kg".',
    examples: ["1874 lb"],
    "x-unit": "kg",
  };

  test("is a number or a string, with its unit, limits and examples, in zod's JSON Schema", () => {
    const { properties, required } = z.toJSONSchema(Machine, { io: "input" });
    expect(properties?.["mass"]).toEqual(MASS);
    expect(properties?.["gap"]).toMatchObject({
      anyOf: [{ exclusiveMinimum: 0, exclusiveMaximum: 2 }, { type: "string" }],
      "x-unit": "m",
    });
    expect(required).toEqual(["mass"]);
  });

  test("is the same in the OpenAPI document", () => {
    const document = createDocument({
      openapi: "3.1.1",
      info: { title: "Quantities", version: "1" },
      paths: {
        "/machines": {
          post: { requestBody: { content: { "application/json": { schema: Machine } } }, responses: {} },
        },
      },
    });
    expect(JSON.parse(JSON.stringify(document))).toHaveProperty(
      [
        "paths",
        "/machines",
        "post",
        "requestBody",
        "content",
        "application/json",
        "schema",
        "properties",
        "mass",
      ],
      MASS,
    );
  });
});
