import { describe, expect, test } from "vitest";
import {
  airSpringLoad,
  airSpringStiffness,
  compressionStiffness,
  discShape,
  rectangleShape,
  rubberOf,
  shearStiffness,
} from "../../../src/isolator/design/index.ts";
import { expectClose } from "../../support/expect-close.ts";

const printed = (atol: number) => ({ atol, because: "half a unit in the last printed digit" });

describe("a rubber block (Gent and Lindley 1959, with Lindley's table of hardness; recomputed from them)", () => {
  test("disc of 50 mm by 25 mm in 50 IRHD", () => {
    const area = (Math.PI * 0.05 ** 2) / 4;
    const shape = discShape(0.05, 0.025);
    expect(shape).toBe(0.5);
    expectClose(compressionStiffness(rubberOf(50), area, 0.025, shape), 235_855, printed(0.5));
    expectClose(shearStiffness(rubberOf(50), area, 0.025), 50_265, printed(0.5));
  });

  test("block of 100 by 75 by 20 mm in 60 IRHD, without and with the bulk modulus", () => {
    const shape = rectangleShape(0.1, 0.075, 0.02);
    expectClose(shape, 1.07143, printed(5e-6));
    expectClose(compressionStiffness(rubberOf(60), 0.0075, 0.02, shape), 3_852_600, printed(50));
    expectClose(compressionStiffness(rubberOf(60), 0.0075, 0.02, shape, true), 3_818_490, printed(50));
    expectClose(shearStiffness(rubberOf(60), 0.0075, 0.02), 397_500, printed(0.5));
  });

  test("refuses a hardness outside the table, by name", () => {
    expect(() => rubberOf(52)).toThrow("/hardness: 52 IRHD is not in the table");
  });
});

describe("an air spring (k = n·p·A²/V, computed from the formula)", () => {
  test.each([
    [500e3, 0.05, 0.015, 1.4, 140_309, 1.18074],
    [500e3, 0.05, 0.015, 1.0, 100_221, 0.99791],
    [400e3, 0.03, 0.006, 1.38, 103_774, 1.46566],
  ])(
    "at %d Pa on %d m² over %d m³ with exponent %d",
    (gaugePressure, area, volume, exponent, rate, hertz) => {
      const spring = { gaugePressure, area, volume, exponent, areaSlope: 0 };
      const k = airSpringStiffness(spring);
      expectClose(k, rate, printed(0.5));
      expectClose(Math.sqrt((k * 9.80665) / airSpringLoad(spring)) / (2 * Math.PI), hertz, printed(5e-6));
    },
  );
});
