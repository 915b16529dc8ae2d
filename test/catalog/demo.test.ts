import { Ajv2020 } from "ajv/dist/2020.js";
import { describe, expect, test } from "vitest";
import { demoRecords } from "../../catalog/demo/index.ts";
import schema from "../../catalog/isolator.schema.json" with { type: "json" };
import {
  EXPOSURES,
  FAMILIES,
  type IsolatorRecord,
  isolatorFromRecord,
  ratedNaturalFrequency,
} from "../../src/isolator/index.ts";

const records = demoRecords();
const validate = new Ajv2020({ strict: true, allErrors: true }).compile(schema);

const bears =
  (load: number) =>
  (record: IsolatorRecord): boolean =>
    load >= (record.load_n.min ?? 0) && load <= record.load_n.max;

describe("the demo catalogue", () => {
  test("has at least 300 isolators in at least 16 series over all families", () => {
    expect(records.length).toBeGreaterThanOrEqual(300);
    expect(new Set(records.map((record) => record.series)).size).toBeGreaterThanOrEqual(16);
    expect(new Set(records.map((record) => record.family))).toEqual(new Set(FAMILIES));
  });

  test("has designations of letters, digits, dots and hyphens that begin with a letter, each once", () => {
    for (const { designation } of records) expect(designation).toMatch(/^[a-z][a-z0-9.-]*(N|mm)$/i);
    expect(new Set(records.map((record) => record.designation)).size).toBe(records.length);
  });

  test("fits the schema of a record", () => {
    for (const record of records)
      expect(validate(record) ? [] : validate.errors, record.designation).toEqual([]);
  });

  test("leaves no gap from 20 N to 60 kN, and offers a choice where machines mostly are", () => {
    for (let load = 20; load <= 60_000; load *= 1.05)
      expect(records.filter(bears(load)).length, `${load.toFixed(0)} N`).toBeGreaterThanOrEqual(1);
    for (let load = 100; load <= 20_000; load *= 1.05)
      expect(records.filter(bears(load)).length, `${load.toFixed(0)} N`).toBeGreaterThanOrEqual(8);
  });

  test("is the same list every time", () => {
    expect(demoRecords()).toEqual(records);
  });

  test("shares construction, free height and fixing within a series", () => {
    const seen = new Map<string | undefined, IsolatorRecord>();
    for (const record of records) {
      const first = seen.get(record.series) ?? record;
      seen.set(record.series, first);
      expect([record.family, record.free_height_mm, record.thread], record.designation).toEqual([
        first.family,
        first.free_height_mm,
        first.thread,
      ]);
    }
  });

  test("never asks less for a stronger part of a series", () => {
    for (const series of new Set(records.map((record) => record.series))) {
      const prices = records
        .filter((record) => record.series === series)
        .sort((a, b) => a.load_n.max - b.load_n.max)
        .map((record) => record.price ?? 0);
      expect(prices, series).toEqual([...prices].sort((a, b) => a - b));
    }
  });

  test("rates every part within what its family does (common practice)", () => {
    // Natural frequency at rated load, Hz, and static deflection over free height.
    const usual: Readonly<Record<string, readonly [number, number]>> = {
      elastomer_pad: [6, 25],
      elastomer_mount: [5, 12],
      sandwich_mount: [6, 17],
      open_spring: [1.7, 3.3],
      housed_spring: [2.3, 3.7],
      restrained_spring: [2, 3.3],
      spring_hanger: [2, 3.3],
      wire_rope: [3, 9],
      air_spring: [1, 2.5],
    };
    for (const record of records) {
      const [lowest, highest] = usual[record.family] as readonly [number, number];
      const frequency = ratedNaturalFrequency(isolatorFromRecord(record));
      expect(frequency, record.designation).toBeGreaterThan(lowest);
      expect(frequency, record.designation).toBeLessThan(highest);
    }
  });

  test("keeps springs standing: diameter at least 0.8 of the loaded height, half the deflection spare (common practice)", () => {
    for (const { family, designation, axial, load_n, outside_diameter_mm, travel_mm } of records) {
      if (family !== "open_spring" || !("stiffness_n_per_mm" in axial)) continue;
      const deflection = load_n.max / axial.stiffness_n_per_mm;
      const bare = Number(/-(\d+)mm$/.exec(designation)?.[1]);
      expect(deflection).toBeCloseTo(bare, 1);
      const loaded = { 25: 55, 50: 90, 75: 125 }[bare] as number;
      expect(outside_diameter_mm, designation).toBeGreaterThanOrEqual(0.8 * loaded - 0.5);
      expect(travel_mm, designation).toBeGreaterThanOrEqual(0.5 * deflection - 0.1);
    }
  });
});

describe("the schema of a record", () => {
  test("knows the same families and exposures as the engine", () => {
    expect(schema.properties.family.enum).toEqual(FAMILIES);
    expect(schema.properties.resists.items.enum).toEqual(EXPOSURES);
  });

  const good = {
    designation: "x",
    family: "open_spring",
    axial: { stiffness_n_per_mm: 98 },
    damping: { ratio: 0.01 },
    load_n: { max: 2500 },
  };

  test("takes the least a record can be", () => {
    expect(validate(good)).toBe(true);
  });

  test.each([
    ["no designation", { ...good, designation: undefined }],
    ["a control character", { ...good, designation: "a\u0007b" }],
    ["an unknown family", { ...good, family: "spring" }],
    ["an unknown key", { ...good, colour: "red" }],
    ["no stiffness", { ...good, axial: {} }],
    ["two laws", { ...good, axial: { stiffness_n_per_mm: 1, natural_frequency_hz: 2 } }],
    ["both dampings", { ...good, damping: { ratio: 0.1, loss_factor: 0.2 } }],
    ["text for a number", { ...good, load_n: { max: "2500 N" } }],
    [
      "an air spring with a dynamic ratio",
      { ...good, family: "air_spring", axial: { natural_frequency_hz: 2 }, dynamic_ratio: 1.2 },
    ],
    ["a natural frequency of what is no air spring", { ...good, axial: { natural_frequency_hz: 2 } }],
    ["a price without a currency", { ...good, price: 10 }],
  ])("refuses %s", (_, record) => {
    expect(validate(JSON.parse(JSON.stringify(record)))).toBe(false);
  });
});
