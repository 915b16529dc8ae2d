import { z } from "zod";
import { FAMILIES } from "../../src/isolator/index.ts";
import { GATES, RANKINGS } from "../../src/selection/index.ts";
import { SelectionBody } from "./selection.ts";

export const number = z.number();
export const known = (description: string) =>
  number.nullable().meta({ description: `${description} Null when it was not computed; see notes.` });

export const Foot = z.looseObject({
  foot: z.int().meta({ description: "Foot number, from 1." }),
  isolator: z.string(),
  load_n: number,
  utilisation: number.meta({ description: "Static load over the isolator's maximum." }),
  static_deflection_mm: number,
  lateral_load_n: number.nullable().meta({ description: "Across the axis; null for an upright isolator." }),
});

export const Mode = z.looseObject({
  frequency_hz: number,
  damping_ratio: number,
  shape: z.enum(["along_x", "along_y", "vertical", "roll", "pitch", "yaw"]),
  vector: z
    .array(number)
    .length(6)
    .meta({ description: "Displacements, and rotations times their radius of gyration; the largest is 1." }),
  energy: z
    .array(number)
    .length(6)
    .meta({ description: "Shares of the kinetic energy of x, y, z, roll, pitch, yaw." }),
});

const OptionAnswer = z
  .looseObject({
    rank: z.int(),
    designation: z.string().meta({ description: 'The isolator, or those mixed, joined by " + ".' }),
    series: z.string().nullable(),
    family: z.string().meta({ description: `One of ${FAMILIES.join(", ")}.` }),
    quantity: z.int().meta({ description: "Isolators in all, one a foot." }),
    items: z
      .array(z.looseObject({ isolator: z.string(), quantity: z.int(), unit_price: number.nullable() }))
      .meta({ description: "What is to be ordered." }),
    feet: z.array(Foot),
    static_deflection_mm: number.meta({ description: "Mean over the feet." }),
    levelness_mm: number.meta({ description: "Largest difference in static deflection across the feet." }),
    natural_frequency_hz: known("Of the mode that moves most vertically."),
    frequency_ratio: known("Lowest excitation frequency over natural frequency."),
    damping_ratio: known("Equivalent viscous, of the mode that moves most vertically."),
    transmissibility: known("The largest over the speed range and orders."),
    isolation_efficiency_percent: known("100·(1 − transmissibility); negative is amplification."),
    net_transmissibility: known("By the amplitude of the net force instead of the sum over the feet."),
    transmitted_force_n: known("The largest, zero to peak."),
    worst_speed_rpm: known("Running speed at which the transmissibility is largest."),
    margin: known("Target over achieved, the tightest of the targets."),
    model: z
      .enum(["vertical", "rigid_body"])
      .meta({ description: "rigid_body where the geometry is known." }),
    tilt_mrad: z.looseObject({ x: number, y: number }).nullable(),
    modes: z.array(Mode).nullable(),
    price: number.nullable(),
    currency: z.string().nullable(),
    unbeaten: z.boolean().meta({
      description:
        "No other option is at least as good on price, transmissibility and static deflection and better on one.",
    }),
    notes: z.array(z.string()),
  })
  .meta({ id: "Option" });

const NearMiss = z.looseObject({
  designation: z.string(),
  gate: z.enum(GATES),
  value: number,
  limit: number,
  unit: z.string().nullable(),
});

/** The answer to a selection. */
export const SelectionAnswer = z
  .looseObject({
    id: z.string().meta({ description: "Ask for the same answer later at /v1/selections/{id}." }),
    engine_version: z.string(),
    catalog: z.looseObject({ name: z.string(), revision: z.string() }),
    request: SelectionBody,
    assumptions: z.array(z.string()),
    cautions: z.array(z.string()),
    needed: z
      .looseObject({ frequency_ratio: number, natural_frequency_hz: number, static_deflection_mm: number })
      .nullable()
      .meta({ description: "What an undamped isolator would have to be." }),
    counts: z
      .looseObject({
        examined: z.int(),
        passing: z.int(),
        rejected: z.partialRecord(z.enum(GATES), z.int()),
        options: z.int(),
      })
      .meta({ description: "Isolators, each once; options are arrangements." }),
    ranked_by: z.enum(RANKINGS),
    options: z.array(OptionAnswer),
    near_misses: z
      .array(NearMiss)
      .meta({ description: "What one number alone kept from passing, nearest first." }),
    next_cursor: z.string().nullable(),
  })
  .meta({ id: "Selection" });
