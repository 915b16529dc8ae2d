import { describe, expect, test } from "vitest";
import { centroid, footprintPositions, requireCarryingFeet, withinOutline } from "../../src/machine/index.ts";

describe("a footprint", () => {
  test("of four feet makes two rows along x, numbered from y = −width/2 with x ascending", () => {
    expect(footprintPositions(4, 1.8, 1.1)).toEqual([
      [-0.9, -0.55, 0],
      [0.9, -0.55, 0],
      [-0.9, 0.55, 0],
      [0.9, 0.55, 0],
    ]);
  });

  test("of six feet puts the third pair in the middle", () => {
    expect(footprintPositions(6, 2, 1).map(([x]) => x)).toEqual([-1, 0, 1, -1, 0, 1]);
  });

  test("of three feet stands two at x = −length/2 and one at (length/2, 0)", () => {
    expect(footprintPositions(3, 2, 1)).toEqual([
      [-1, -0.5, 0],
      [-1, 0.5, 0],
      [1, 0, 0],
    ]);
  });

  test("refuses an odd number above three, by name", () => {
    expect(() => footprintPositions(5, 2, 1)).toThrow("/feet/count");
  });
});

describe("feet that cannot carry a machine", () => {
  test("on one line are refused", () => {
    expect(() =>
      requireCarryingFeet([
        [0, 0, 0],
        [1, 1, 0],
        [2, 2, 0.5],
      ]),
    ).toThrow("on one line");
  });

  test("in one place are refused, naming both", () => {
    expect(() =>
      requireCarryingFeet([
        [0, 0, 0],
        [1, 0, 0],
        [0, 1, 0],
        [1, 0, 0.2],
      ]),
    ).toThrow("/feet/positions/3: foot 4 stands in the same place in plan as foot 2");
  });

  test("but a flat triangle still carries", () => {
    expect(() =>
      requireCarryingFeet([
        [0, 0, 0],
        [2, 0, 0],
        [1, 0.01, 0],
      ]),
    ).not.toThrow();
  });
});

describe("the outline of the feet", () => {
  const feet = [
    [0, 0, 0],
    [4, 0, 0],
    [4, 2, 0],
    [0, 2, 0],
    [2, 1, 0],
  ] as const;

  test.each([
    [1, 1],
    [3.9, 0.1],
    [2, 0],
    [0, 0],
    [2, 1],
  ])("holds (%d, %d)", (x, y) => {
    expect(withinOutline(feet, x, y)).toBe(true);
  });

  test.each([
    [4.01, 1],
    [-0.01, 0],
    [2, -0.01],
    [5, 5],
  ])("leaves out (%d, %d)", (x, y) => {
    expect(withinOutline(feet, x, y)).toBe(false);
  });

  test("has its centroid where the mean of its points is", () => {
    expect(centroid(feet)).toEqual([2, 1, 0]);
  });
});
