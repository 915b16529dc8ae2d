import { describe, expect, test } from "vitest";
import { z } from "zod";
import { faultsOf } from "../../../server/input/faults.ts";
import { sentence } from "../../../server/input/sentences.ts";

const quantity = z.union([z.number(), z.string()]);
const schema = z.strictObject({
  mass: quantity,
  speed: z.union([quantity, z.strictObject({ min: quantity, max: quantity })]),
  excitation: z
    .array(
      z.discriminatedUnion("kind", [
        z.strictObject({ kind: z.literal("force"), amplitude: z.number().max(5) }),
        z.strictObject({ kind: z.literal("unbalance"), grade: z.string() }),
      ]),
    )
    .optional(),
  mounting: z.enum(["floor", "suspended"]).optional(),
  "a/b~c": z.number().optional(),
});

function faults(input: unknown) {
  const { error } = schema.safeParse(input, { error: sentence });
  return error === undefined ? [] : faultsOf(error, schema, input);
}

describe("faults of a body", () => {
  test("a missing field is named by its own pointer", () => {
    expect(faults({ speed: 1180 })).toEqual([{ pointer: "/mass", detail: "is missing" }]);
  });

  test("a field that may be a number or text says so, with what it got", () => {
    expect(faults({ mass: [1], speed: 1 })).toEqual([
      { pointer: "/mass", detail: "must be a number or a string, not an array" },
    ]);
  });

  test("a body that is no object is refused at the root", () => {
    expect(faults(null)).toEqual([{ pointer: "", detail: "must be an object, not null" }]);
  });

  test("wording that a schema brings itself is kept", () => {
    const own = z.strictObject({
      mass: z.union([z.number(), z.string()], { error: "must be a mass, such as 850 kg" }),
    });
    const { error } = own.safeParse({ mass: true }, { error: sentence });
    expect(error && faultsOf(error, own, { mass: true })).toEqual([
      { pointer: "/mass", detail: "must be a mass, such as 850 kg" },
    ]);
  });

  test("a misspelt field is pointed at itself, with the nearest known name", () => {
    expect(faults({ mass: 1, speed: 1, mountign: "floor" })).toEqual([
      { pointer: "/mountign", detail: 'is not a known field; did you mean "mounting"?' },
    ]);
  });

  test("a field like no other gets no suggestion", () => {
    expect(faults({ mass: 1, speed: 1, colour: "red" })).toEqual([
      { pointer: "/colour", detail: "is not a known field" },
    ]);
  });

  test("among several forms, the one that came nearest is explained", () => {
    expect(faults({ mass: 1, speed: { mn: 590, max: 1180 } })).toEqual([
      { pointer: "/speed/min", detail: "is missing" },
      { pointer: "/speed/mn", detail: 'is not a known field; did you mean "min"?' },
    ]);
  });

  test("an unknown kind lists the kinds there are and the nearest", () => {
    expect(faults({ mass: 1, speed: 1, excitation: [{ kind: "unbalanse" }] })).toEqual([
      {
        pointer: "/excitation/0/kind",
        detail: 'must be one of "force", "unbalance"; did you mean "unbalance"?',
      },
    ]);
  });

  test("a missing kind lists the kinds there are", () => {
    expect(faults({ mass: 1, speed: 1, excitation: [{}] })).toEqual([
      { pointer: "/excitation/0/kind", detail: 'is missing and must be one of "force", "unbalance"' },
    ]);
  });

  describe("where forms of several kinds, two of them alike, are no discriminated union", () => {
    const forms = z.union([
      z.strictObject({ kind: z.literal("force"), amplitude: z.number() }),
      z.strictObject({ kind: z.literal("unbalance"), moment: z.number() }),
      z.strictObject({ kind: z.literal("unbalance"), rotor_mass: z.number(), grade: z.string() }),
    ]);
    test.each([
      [
        { kind: "unbalanse", moment: 1 },
        "/kind",
        'must be one of "force", "unbalance"; did you mean "unbalance"?',
      ],
      [{}, "/kind", 'is missing and must be one of "force", "unbalance"'],
      [{ kind: "force", grade: "G6.3" }, "/amplitude", "is missing"],
      [{ kind: "unbalance", moment: "x" }, "/moment", "must be a number, not a string"],
      [{ kind: "unbalance", rotor_mass: 1 }, "/grade", "is missing"],
      [{ kind: "unbalance", momment: 1 }, "/moment", "is missing"],
    ])("%j is explained by the form of its kind", (input, pointer, detail) => {
      const { error } = forms.safeParse(input, { error: sentence });
      expect(error && faultsOf(error, forms, input)[0]).toEqual({ pointer, detail });
    });
  });

  test("inside a chosen kind, a number out of range and a misspelt name are both told", () => {
    expect(faults({ mass: 1, speed: 1, excitation: [{ kind: "force", amplitude: 7, ampitude: 1 }] })).toEqual(
      [
        { pointer: "/excitation/0/amplitude", detail: "must be at most 5" },
        { pointer: "/excitation/0/ampitude", detail: 'is not a known field; did you mean "amplitude"?' },
      ],
    );
  });

  test("infinity, as 1e999 reads, is no number", () => {
    expect(faults({ mass: JSON.parse("1e999"), speed: 1 })).toEqual([
      { pointer: "/mass", detail: "must be a number or a string, not Infinity" },
    ]);
  });

  test("slash and tilde in a name are escaped in the pointer (RFC 6901)", () => {
    expect(faults({ mass: 1, speed: 1, "a/b~c": "x" })).toEqual([
      { pointer: "/a~1b~0c", detail: "must be a number, not a string" },
    ]);
  });

  test("a name of the language's own, such as __proto__, is an unknown field like any other", () => {
    expect(faults(JSON.parse('{"mass":1,"speed":1,"__proto__":{"x":1}}'))).toEqual([
      { pointer: "/__proto__", detail: "is not a known field" },
    ]);
  });
});
