import { z } from "zod";

/** How tables are written for people: the query parameters that every CSV answer knows. */
export const tableForms = {
  format: z
    .enum(["json", "csv"])
    .optional()
    .meta({ description: "Form of the answer, for clients that send no Accept." }),
  units: z
    .enum(["si", "us"])
    .optional()
    .meta({ description: "Units of a CSV; JSON keeps its own. si when left out." }),
  decimal: z
    .enum(["point", "comma"])
    .optional()
    .meta({ description: "comma writes 3,5 and puts ; between cells. point when left out." }),
};

export const TABLE_MEDIA = { json: "application/json", csv: "text/csv" } as const;
