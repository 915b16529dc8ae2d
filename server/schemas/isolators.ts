import { z } from "zod";
import { EXPOSURES, FAMILIES } from "../../src/isolator/index.ts";
import { tableForms } from "./forms.ts";
import { quantity } from "./quantity.ts";

/** By what a list of isolators can be sorted; a leading minus turns the order round. */
const SORTS = ["designation", "load", "stiffness", "natural_frequency", "free_height", "price"] as const;
export type Sort = (typeof SORTS)[number];

const anyOf = <T extends string>(values: readonly T[], description: string) =>
  z
    .string()
    .max(400)
    .transform((text) => text.split(",").map((entry) => entry.trim()))
    .pipe(z.array(z.enum(values as readonly [T, ...T[]])))
    .optional()
    .meta({ description });

export const IsolatorQuery = z.strictObject({
  catalog: z.string().min(1).max(64).optional().meta({ description: "demo when left out." }),
  families: anyOf(FAMILIES, "Families, comma-separated."),
  series: z.string().min(1).max(64).optional(),
  load: quantity("force", {
    above: 0,
    max: 1e9,
    description: "A static load that it must bear, N.",
  }).optional(),
  natural_frequency_max: quantity("frequency", {
    above: 0,
    max: 1e4,
    description: "Highest natural frequency at rated load, Hz.",
  }).optional(),
  temp_min: quantity("temperature", { min: -200, max: 1000 }).optional(),
  temp_max: quantity("temperature", { min: -200, max: 1000 }).optional(),
  exposures: anyOf(EXPOSURES, "What it must resist, comma-separated."),
  captive: z.enum(["true", "false"]).optional(),
  max_height: quantity("length", { above: 0, max: 100, description: "Highest free height, m." }).optional(),
  max_price: z.coerce.number().positive().max(1e9).optional().meta({ description: "Highest price of one." }),
  sort: z
    .enum([...SORTS, ...SORTS.map((sort) => `-${sort}` as const)])
    .optional()
    .meta({ description: "load when left out; a leading minus turns the order round." }),
  limit: z.coerce
    .number()
    .int()
    .min(1)
    .max(500)
    .optional()
    .meta({ description: "Isolators on a page; 50 when left out." }),
  cursor: z.string().max(200).optional().meta({ description: "next_cursor of the page before." }),
  ...tableForms,
});

export type IsolatorQuery = z.output<typeof IsolatorQuery>;
