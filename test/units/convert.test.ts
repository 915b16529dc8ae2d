import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type Dimension,
  DOCUMENTED_UNIT,
  fromSI,
  inUnit,
  ofUnit,
  PEOPLE_UNITS,
  parseQuantity,
  toSI,
  type UnitSymbol,
} from "../../src/units/index.ts";
import { UNITS } from "../../src/units/table.ts";
import { expectClose } from "../support/expect-close.ts";

const DIMENSIONS = Object.keys(UNITS) as Dimension[];
const SYMBOLS = DIMENSIONS.flatMap((dimension) =>
  Object.keys(UNITS[dimension]).map((symbol) => ({ dimension, symbol: symbol as UnitSymbol })),
);
/** From a thousandth of a millionth to a thousand million, either way of zero: far from where doubles underflow. */
const reading = fc
  .tuple(fc.double({ min: 1e-9, max: 1e9, noNaN: true }), fc.constantFrom(-1, 0, 1))
  .map(([size, sign]) => sign * size);
const anyUnit = fc.constantFrom(...SYMBOLS);
const ROUNDING = { rtol: 1e-14, because: "a few roundings of 1.1e-16 each" };
/** Adding 273.15 K to a small reading and taking it away again loses its last digits. */
const ICE_POINT = { ...ROUNDING, atol: 1e-12, because: "a rounding of 273.15 K, 5.7e-14, in whatever unit" };
const toleranceOf = (dimension: Dimension) => (dimension === "temperature" ? ICE_POINT : ROUNDING);

describe("conversion", () => {
  test("keeps decimals clean where the definitions are decimal", () => {
    expect(inUnit(0.0214, "mm")).toBe(21.4);
    expect(ofUnit(25, "mm")).toBe(0.025);
    expect(inUnit(0.0254, "in")).toBe(1);
    expect(inUnit(98_000, "N/mm")).toBe(98);
    expect(inUnit(ofUnit(98.1, "N/mm"), "N/mm")).toBe(98.1);
    expect(inUnit(ofUnit(1180, "rpm"), "rpm")).toBe(1180);
  });

  test("takes the documented units of the HTTP interface to SI", () => {
    expect(toSI(850, "mass")).toBe(850);
    expectClose(toSI(60, "speed"), 2 * Math.PI, ROUNDING);
    expect(toSI(1, "frequency")).toBe(2 * Math.PI);
    expect(toSI(20, "temperature")).toBe(293.15);
    expect(toSI(900, "unbalance")).toBe(0.0009);
    expect(toSI(4.5, "velocity")).toBe(0.0045);
    expect(toSI(180, "angle")).toBe(Math.PI);
    expect(fromSI(293.15, "temperature")).toBe(20);
    expect(fromSI(0.0009, "unbalance")).toBe(900);
  });

  test("knows the fixed points of temperature: ice 32 °F, steam 212 °F, and −40 where the scales meet", () => {
    expect(ofUnit(32, "°F")).toBe(273.15);
    expect(ofUnit(212, "°F")).toBe(373.15);
    expect(ofUnit(-40, "°F")).toBe(ofUnit(-40, "°C"));
    expect(ofUnit(0, "K")).toBe(0);
  });

  test("a value in any unit returns from SI as it was", () => {
    fc.assert(
      fc.property(reading, anyUnit, (value, { dimension, symbol }) =>
        expectClose(inUnit(ofUnit(value, symbol), symbol), value, toleranceOf(dimension)),
      ),
    );
  });

  test("a value in the documented unit returns from SI as it was", () => {
    fc.assert(
      fc.property(reading, fc.constantFrom(...DIMENSIONS), (value, dimension) =>
        expectClose(fromSI(toSI(value, dimension), dimension), value, toleranceOf(dimension)),
      ),
    );
  });

  test("n times a quantity is n times it in every unit but the two temperatures with a zero of their own", () => {
    const proportional = SYMBOLS.filter(({ symbol }) => symbol !== "°C" && symbol !== "°F");
    fc.assert(
      fc.property(reading, reading, fc.constantFrom(...proportional), (value, n, { symbol }) =>
        expectClose(ofUnit(n * value, symbol), n * ofUnit(value, symbol), {
          rtol: 1e-14,
          atol: symbol === "K" ? Math.abs(n) * 1e-13 + 1e-12 : 0,
          because: "roundings of 1.1e-16 each; kelvins pass the ice point on their way",
        }),
      ),
    );
  });

  test("a text with any unit is read as that unit through SI would be", () => {
    fc.assert(
      fc.property(reading, anyUnit, (value, { dimension, symbol }) => {
        const read = parseQuantity(`${value} ${symbol}`, dimension);
        expect(read.ok).toBe(true);
        if (read.ok)
          expectClose(read.value, fromSI(ofUnit(value, symbol), dimension), toleranceOf(dimension));
      }),
    );
  });
});

describe("units for people", () => {
  test("name, in both systems, units of one dimension", () => {
    for (const [kind, { si, us }] of Object.entries(PEOPLE_UNITS))
      expect(
        DIMENSIONS.some((dimension) => si in UNITS[dimension] && us in UNITS[dimension]),
        kind,
      ).toBe(true);
  });

  test("the documented unit is one of its dimension", () => {
    for (const dimension of DIMENSIONS) expect(UNITS[dimension]).toHaveProperty([DOCUMENTED_UNIT[dimension]]);
  });
});
