import { z } from "zod";
import { machineFields } from "./machine.ts";
import { quantity } from "./quantity.ts";
import { target } from "./selection.ts";

const MOST_POINTS = 20_000;

const entry = z.strictObject({
  feet: z
    .union([z.literal("all"), z.array(z.int().min(1).max(64)).min(1).max(64)])
    .meta({ description: "Foot numbers, from 1, or all of them." }),
  isolator: z
    .union([z.string().min(1).max(64), z.looseObject({})])
    .meta({ description: "A designation of the catalogue, or a record of the form of Isolator." }),
});

const frequency = quantity("frequency", { above: 0, max: 100_000 });

/** The body of an evaluation. */
export const EvaluationBody = z
  .strictObject({
    ...machineFields,
    target: target.optional(),
    catalog: z
      .string()
      .min(1)
      .max(64)
      .optional()
      .meta({ description: "Where designations are looked up; demo when left out." }),
    isolators: z.array(entry).min(1).max(64).meta({ description: "Every foot exactly once." }),
    frequencies: z
      .strictObject({ min: frequency, max: frequency, points: z.int().min(2).max(MOST_POINTS) })
      .optional()
      .meta({
        description:
          "Ask for the response curve: from, to, and how many points, spaced evenly in the logarithm.",
      }),
  })
  .meta({ id: "EvaluationRequest" });

export type EvaluationBody = z.output<typeof EvaluationBody>;
