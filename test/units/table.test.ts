import Qty from "js-quantities";
import { unit as mathUnit } from "mathjs";
import { describe, expect, test } from "vitest";
import { ofUnit, STANDARD_GRAVITY, type UnitSymbol, unitSuffix } from "../../src/units/index.ts";
import { UNITS, unitsOf } from "../../src/units/table.ts";
import { expectClose } from "../support/expect-close.ts";

const DIMENSIONS = Object.keys(UNITS) as (keyof typeof UNITS)[];
const SYMBOLS = [...new Set(DIMENSIONS.flatMap((d) => Object.keys(UNITS[d])))] as UnitSymbol[];

describe("the exact definitions", () => {
  test("the international yard and pound (agreement of 1959) stand in the table to the last digit", () => {
    expect(ofUnit(1, "lb")).toBe(0.45359237);
    expect(ofUnit(1, "in")).toBe(0.0254);
    expect(ofUnit(1, "ft")).toBe(0.3048);
    expect(ofUnit(1, "mil")).toBe(0.0000254);
    expect(ofUnit(1, "oz")).toBe(0.45359237 / 16);
    expect(ofUnit(1, "short ton")).toBe(907.18474);
    expect(ofUnit(1, "long ton")).toBe(1016.0469088);
  });

  test("standard gravity is 9.80665 m/s² (ISO 80000-3), and forces by weight follow from it", () => {
    expect(STANDARD_GRAVITY).toBe(9.80665);
    expect(ofUnit(1, "gn")).toBe(STANDARD_GRAVITY);
    expect(ofUnit(1, "kgf")).toBe(STANDARD_GRAVITY);
    expect(ofUnit(1, "lbf")).toBe(4.4482216152605); // NIST SP 811, appendix B.8
  });

  test.each<[UnitSymbol, number]>([
    ["lbf/in", 175.1268],
    ["lbf/ft", 14.5939],
    ["slug", 14.5939],
    ["psi", 6894.757],
    ["kip", 4448.222],
    ["lb in2", 2.926397e-4],
    ["lb ft2", 4.214011e-2],
    ["oz in", 7.200778e-4],
    ["ft3", 2.831685e-2],
  ])("1 %s is %f in SI, as NIST SP 811 (2008), appendix B.8, prints it", (symbol, si) => {
    // SP 811 lists each to seven digits; ounce inch there as a torque (7.061552e-3 N·m), here without g.
    expectClose(ofUnit(1, symbol), si, {
      rtol: 4e-6,
      because: "half a unit in the last digit printed, at worst",
    });
  });
});

describe("two libraries of units", () => {
  const THEIRS: readonly (readonly [UnitSymbol, string, string])[] = [
    ["g", "g", "kg"],
    ["t", "tonne", "kg"],
    ["lb", "lbm", "kg"],
    ["oz", "oz", "kg"],
    ["short ton", "ton", "kg"],
    ["rpm", "cycle/minute", "rad/s"],
    ["Hz", "cycle/s", "rad/s"],
    ["deg/s", "deg/s", "rad/s"],
    ["mm", "mm", "m"],
    ["µm", "um", "m"],
    ["in", "in", "m"],
    ["ft", "ft", "m"],
    ["mil", "mil", "m"],
    ["mN", "mN", "N"],
    ["daN", "daN", "N"],
    ["MN", "MN", "N"],
    ["lbf", "lbf", "N"],
    ["kgf", "kgf", "N"],
    ["kN/mm", "kN/mm", "N/m"],
    ["lbf/in", "lbf/in", "N/m"],
    ["lbf/ft", "lbf/ft", "N/m"],
    ["kgf/mm", "kgf/mm", "N/m"],
    ["lbf s/in", "lbf s/in", "N s/m"],
    ["lb in2", "lbm in^2", "kg m^2"],
    ["lb ft2", "lbm ft^2", "kg m^2"],
    ["lbf in s2", "lbf in s^2", "kg m^2"],
    ["slug ft2", "lbf ft s^2", "kg m^2"],
    ["g cm2", "g cm^2", "kg m^2"],
    ["g mm", "g mm", "kg m"],
    ["oz in", "oz in", "kg m"],
    ["lb in", "lbm in", "kg m"],
    ["h", "hour", "s"],
    ["°F", "degF", "K"],
    ["°C", "degC", "K"],
    ["in/s", "in/s", "m/s"],
    ["in/s2", "in/s^2", "m/s^2"],
    ["deg", "deg", "rad"],
    ["mm/s/N", "mm/s/N", "m/s/N"],
    ["in/s/lbf", "in/s/lbf", "m/s/N"],
    ["psi", "lbf/in^2", "Pa"],
    ["mbar", "mbar", "Pa"],
    ["L", "l", "m^3"],
    ["in3", "cuin", "m^3"],
    ["ft3", "cuft", "m^3"],
  ];
  test.each(THEIRS)("%s agrees with mathjs", (symbol, theirs, si) => {
    expectClose(ofUnit(1, symbol), mathUnit(1, theirs).toNumber(si), {
      rtol: 1e-14,
      because: "rounding of a few products; of psi mathjs keeps 10 digits, so it is asked for its parts",
    });
  });

  const QUANTITIES: readonly (readonly [UnitSymbol, string])[] = [
    ["t", "tonne"],
    ["oz", "oz"],
    ["slug", "slug"],
    ["short ton", "short-ton"],
    ["rpm", "rpm"],
    ["µm", "um"],
    ["mil", "mil"],
    ["lbf", "lbf"],
    ["kN/mm", "kN/mm"],
    ["lbf/in", "lbf/in"],
    ["lbf s/in", "lbf*s/in"],
    ["lb in2", "lb*in2"],
    ["lb ft2", "lb*ft2"],
    ["g mm", "g*mm"],
    ["oz in", "oz*in"],
    ["°F", "tempF"],
    ["in/s2", "in/s2"],
    ["gn", "gee"],
    ["deg", "deg"],
    ["bar", "bar"],
    ["psi", "psi"],
    ["L", "l"],
    ["in3", "in3"],
  ];
  test.each(QUANTITIES)("%s agrees with js-quantities", (symbol, theirs) => {
    expectClose(ofUnit(1, symbol), Qty(`1 ${theirs}`).toBase().scalar, {
      rtol: 5e-7,
      because: "js-quantities keeps its pound-force to seven digits and its psi to six",
    });
  });
});

describe("the table of units", () => {
  test("gives each spelling one meaning within a dimension", () => {
    for (const dimension of DIMENSIONS) {
      const spellings = Object.entries(unitsOf(dimension)).flatMap(([symbol, { aliases }]) => [
        symbol,
        ...aliases,
      ]);
      expect(new Set(spellings).size, dimension).toBe(spellings.length);
    }
  });

  test("gives each symbol one meaning throughout, rotation and frequency sharing theirs", () => {
    const all = DIMENSIONS.filter((d) => d !== "frequency").flatMap((d) => Object.keys(UNITS[d]));
    expect(new Set(all).size).toBe(all.length);
  });

  test("gives each unit its own ending of keys, in snake_case", () => {
    const suffixes = SYMBOLS.map(unitSuffix);
    expect(new Set(suffixes).size).toBe(SYMBOLS.length);
    for (const suffix of suffixes) expect(suffix).toMatch(/^[a-z][a-z0-9]*(_[a-z0-9]+)*$/);
  });

  test.each<[UnitSymbol, string]>([
    ["mm", "mm"],
    ["in", "in"],
    ["N/mm", "n_per_mm"],
    ["lbf/in", "lbf_per_in"],
    ["mm/s", "mm_per_s"],
    ["°C", "c"],
    ["°F", "f"],
    ["Hz", "hz"],
    ["kg m2", "kg_m2"],
    ["µm", "um"],
    ["N s/m", "n_s_per_m"],
  ])("ends a key in %s as %s", (symbol, suffix) => {
    expect(unitSuffix(symbol)).toBe(suffix);
  });
});
