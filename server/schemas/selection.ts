import { z } from "zod";
import { EXPOSURES, FAMILIES } from "../../src/isolator/index.ts";
import { RANKINGS } from "../../src/selection/index.ts";
import { machineFields, notYet } from "./machine.ts";
import { quantity } from "./quantity.ts";

const temperature = quantity("temperature", { min: -200, max: 1000, examples: ["45 degC"] });
const currency = z
  .string()
  .regex(/^[A-Z]{3}$/, { error: 'an ISO 4217 code of three capitals, such as "EUR"' });

const environment = z.strictObject({
  temperature: z
    .strictObject({ min: temperature.optional(), max: temperature.optional() })
    .optional()
    .meta({ description: "The site's range; one of the two alone is a site of that temperature." }),
  exposures: z.array(z.enum(EXPOSURES)).max(EXPOSURES.length).optional(),
  captive: z.boolean().optional().meta({ description: "Whether every isolator must be captive." }),
});

export const target = z
  .strictObject({
    transmissibility: z.number().gt(0).max(1000).optional(),
    isolation_efficiency: z.number().min(0).lt(100).optional().meta({ description: "Per cent." }),
    transmitted_force: quantity("force", { above: 0, max: 1e9, description: "Zero to peak." }).optional(),
    support_velocity: notYet(),
    machine_velocity: notYet(),
    equipment_velocity: notYet(),
    judged_on: z.enum(["foot_sum", "net"]).optional(),
  })
  .meta({
    description: "What must hold; all that are given must hold together. Transmissibility 0.1 when left out.",
  });

const limits = z.strictObject({
  families: z.array(z.enum(FAMILIES)).min(1).max(FAMILIES.length).optional(),
  price: z.number().gt(0).max(1e9).optional().meta({ description: "Of all isolators together." }),
  currency: currency.optional(),
  free_height: quantity("length", { above: 0, max: 100, examples: ["160 mm"] }).optional(),
  static_deflection: quantity("length", { above: 0, max: 100, examples: ["30 mm"] }).optional(),
  lead_time_days: z.number().min(0).max(3650).optional(),
  ratings_per_arrangement: z.int().min(1).max(8).optional().meta({ description: "2 when left out." }),
  levelness: quantity("length", { above: 0, max: 10, examples: ["2 mm"] }).optional(),
});

/** The body of a selection. */
export const SelectionBody = z
  .strictObject({
    ...machineFields,
    mounting: z.enum(["floor", "suspended"]).optional(),
    environment: environment.optional(),
    target: target.optional(),
    limits: limits.optional(),
    uncertainty: notYet(),
    rank_by: z
      .enum(RANKINGS, {
        error: (issue) =>
          issue.input === "probability" ? '"probability" is not yet supported by this version' : undefined,
      })
      .optional(),
    catalog: z
      .string()
      .min(1)
      .max(64)
      .optional()
      .meta({ description: "Catalogue to choose from; demo when left out." }),
    limit: z.int().min(1).max(100).optional().meta({ description: "Options on a page; 10 when left out." }),
    cursor: z
      .string()
      .max(200)
      .nullable()
      .optional()
      .meta({ description: "next_cursor of the page before." }),
  })
  .meta({
    id: "SelectionRequest",
    examples: [{ mass: "850 kg", speed: "1180 rpm", target: { transmissibility: 0.08 } }],
  });

/** A selection as asked: every quantity a number in the unit its field documents. */
export type SelectionBody = z.output<typeof SelectionBody>;
