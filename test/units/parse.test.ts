import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { DIMENSIONS, type Dimension, parseQuantity } from "../../src/units/index.ts";

const read = (text: string, dimension: Dimension): number | string => {
  const parsed = parseQuantity(text, dimension);
  return parsed.ok ? parsed.value : parsed.reason;
};

describe("a quantity as text", () => {
  test.each<[string, Dimension, number]>([
    ["850", "mass", 850],
    ["850 kg", "mass", 850],
    ["850kg", "mass", 850],
    ["  850   kg  ", "mass", 850],
    ["1874 lb", "mass", 850.03210138],
    ["1.2 t", "mass", 1200],
    ["2 short tons", "mass", 1814.36948],
    ["1180 rpm", "speed", 1180],
    ["19.7 Hz", "speed", 1182],
    ["1180 1/min", "speed", 1180],
    ["1180 r/min", "speed", 1180],
    ["1180 min⁻¹", "speed", 1180],
    ["1180 r.p.m.", "speed", 1180],
    ["1180 rpm", "frequency", 1180 / 60],
    ["1200 cpm", "frequency", 20],
    ["25 mm", "length", 0.025],
    ["1 in", "length", 0.0254],
    ['0.5"', "length", 0.0127],
    ["6'", "length", 1.8288],
    ["10 in.", "length", 0.254],
    ["25 µm", "length", 25e-6],
    ["25 μm", "length", 25e-6],
    ["25 um", "length", 25e-6],
    ["350 N", "force", 350],
    ["5 mN", "force", 0.005],
    ["5 MN", "force", 5e6],
    ["2 kip", "force", 8896.443230521],
    ["35 kN/m", "stiffness", 35_000],
    ["98 N/mm", "stiffness", 98_000],
    ["10 kg/mm", "stiffness", 98_066.5],
    ["400 N·s/m", "damping", 400],
    ["0.4 N s / mm", "damping", 400],
    ["2 kg·m²", "inertia", 2],
    ["2 kg m^2", "inertia", 2],
    ["2 kg*m2", "inertia", 2],
    ["2 kgm2", "inertia", 2],
    ["900 g mm", "unbalance", 900],
    ["900 g·mm", "unbalance", 900],
    ["900 g*mm", "unbalance", 900],
    ["900 gmm", "unbalance", 900],
    ["0.0009 kg m", "unbalance", 900],
    ["500 ms", "time", 0.5],
    ["2 min", "time", 120],
    ["-10 °C", "temperature", -10],
    ["−10 °C", "temperature", -10],
    ["45 degC", "temperature", 45],
    ["45 deg C", "temperature", 45],
    ["45 ℃", "temperature", 45],
    ["113 degF", "temperature", 45],
    ["318.15 K", "temperature", 45],
    ["0.2 in/s", "velocity", 5.08],
    ["500 µm/s", "velocity", 0.5],
    ["0.5 g", "acceleration", 4.903325],
    ["0.5 g", "mass", 0.0005],
    ["2 bar", "pressure", 200],
    ["0.55 MPa", "pressure", 550],
    ["2500 cm³", "volume", 2.5],
    ["1e-3 mm/(s·N)", "mobility", 1e-6],
    ["1e3 kg", "mass", 1000],
    ["+.5 kg", "mass", 0.5],
    ["5. kg", "mass", 5],
  ])("%s is a %s of %d in the documented unit", (text, dimension, value) => {
    expect(read(text, dimension)).toBeCloseTo(value, 9);
  });

  test("is read to the last digit where the definitions are decimal", () => {
    expect(read("19.7 Hz", "speed")).toBe(1182);
    expect(read("1 in", "length")).toBe(0.0254);
    expect(read("113 °F", "temperature")).toBe(45);
    expect(read("0.3 mm", "length")).toBe(0.0003);
  });

  test("200 lb/in means pounds-force, as the trade writes it, and is 35 025.4 N/m", () => {
    expect(read("200 lb/in", "stiffness")).toBe(read("200 lbf/in", "stiffness"));
    expect(read("200 lb/in", "stiffness")).toBeCloseTo(35_025.367, 3);
  });
});

describe("the case of letters", () => {
  test.each<[string, Dimension, number]>([
    ["1180 RPM", "speed", 1180],
    ["850 KG", "mass", 850],
    ["850 Kg", "mass", 850],
    ["1 LB", "mass", 0.45359237],
    ["25 MM", "length", 0.025],
    ["20 hz", "frequency", 20],
    ["35 KN/M", "stiffness", 35_000],
    ["5 KN", "force", 5000],
    ["1 MPA", "pressure", 1000],
  ])("is forgiven in %s", (text, dimension, value) => {
    expect(read(text, dimension)).toBe(value);
  });

  test.each<[string, Dimension, string]>([
    ["1 mPa", "pressure", "MPa"],
    ["1 mpa", "pressure", "MPa"],
    ["25 Mm", "length", "mm"],
    ["5 mN/m", "stiffness", "MN/m"],
  ])("is not forgiven in %s, where it may tell milli from mega", (text, dimension, meant) => {
    expect(read(text, dimension)).toMatch(new RegExp(`is not a known unit; did you mean "${meant}"\\?$`));
  });
});

describe("a text that is no such quantity", () => {
  test.each<[string, Dimension, string]>([
    ["850 kg", "speed", 'kg is a mass; a speed is expected, such as "1180 rpm"'],
    ["500 lb", "force", 'lb is a mass; a force is expected, such as "350 N"'],
    ["850 kgg", "mass", '"kgg" is not a known unit; did you mean "kg"?'],
    ["1180 rmp/x", "time", '"rmp/x" is not a known unit; a time is given in one of s, ms, min, h'],
    ["2 ton", "mass", '"ton" may mean 1000 kg, 2000 lb or 2240 lb; write "t", "short ton" or "long ton"'],
    ["5 m s", "time", '"m s" is not a known unit; did you mean "ms"?'],
    ["3 kg m-2", "inertia", '"kg m-2" is not a known unit; did you mean "kg·m2"?'],
    ["1e999 kg", "mass", '"1e999 kg" is too large to be a finite number'],
    ["1e308 MN", "force", '"1e308 MN" is too large to be a finite number'],
    ["", "mass", 'is empty; a mass is expected, such as "850 kg"'],
    ["   ", "mass", 'is empty; a mass is expected, such as "850 kg"'],
  ])("%j as a %s: %s", (text, dimension, reason) => {
    expect(read(text, dimension)).toBe(reason);
  });

  test.each(["1,180 rpm", "0,5", ",5 rpm", "1.180,5 rpm"])(
    "%s has a comma, which is never guessed at",
    (text) => {
      expect(read(text, "speed")).toBe(
        `"${text}" has a comma in the number; use a point for decimals and nothing between thousands`,
      );
    },
  );

  test.each([
    "NaN",
    "Infinity",
    "-Infinity kg",
    "kg",
    "--5 kg",
    "1 180 kg",
    "1/2 kg",
    "constructor",
    "{}",
    "\u0000",
  ])("%j is not a number with a unit", (text) => {
    expect(read(text, "mass")).toBe(
      `"${text}" is not a number with a unit; a mass is expected, such as "850 kg"`,
    );
  });

  test.each(["constructor", "__proto__", "toString", "hasOwnProperty", "valueOf"])(
    "%s is no unit",
    (name) => {
      expect(read(`5 ${name}`, "mass")).toMatch(new RegExp(`^"${name}" is not a known unit`));
    },
  );

  test("longer than 64 characters is refused unread", () => {
    expect(read("9".repeat(65), "mass")).toBe("is longer than the 64 characters a quantity may have");
    expect(read("9".repeat(10_000_000), "mass")).toBe("is longer than the 64 characters a quantity may have");
  });

  test("whatever it is, it gives a finite number or a reason, and never throws", () => {
    const dimension = fc.constantFrom(...(Object.keys(DIMENSIONS) as Dimension[]));
    const nearly = fc.stringMatching(/^[-+0-9.,eE ]{0,12}[a-zA-Z0-9·*^/°µ"' ().-]{0,20}$/);
    fc.assert(
      fc.property(fc.oneof(fc.string({ unit: "binary" }), nearly), dimension, (text, d) => {
        const parsed = parseQuantity(text, d);
        expect(parsed.ok ? Number.isFinite(parsed.value) : parsed.reason.length > 0).toBe(true);
      }),
    );
  });
});

describe("the example of each dimension", () => {
  test.each(Object.entries(DIMENSIONS))(
    "that is shown for a %s can be read as one",
    (dimension, { example }) => {
      expect(parseQuantity(example, dimension as Dimension).ok).toBe(true);
    },
  );
});
