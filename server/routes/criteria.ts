import { z } from "zod";
import {
  BALANCE_GRADES,
  BALANCE_GRADES_SOURCE,
  MACHINE_ZONES,
  MACHINE_ZONES_SOURCE,
} from "../../src/criteria/index.ts";
import { inUnit } from "../../src/units/index.ts";
import { type Route, route } from "../route.ts";

const source = z.looseObject({
  title: z.string(),
  mark: z.enum(["published", "recalled"]),
  note: z.string().nullable(),
});

const boundaries = z.looseObject({ a_b: z.number(), b_c: z.number(), c_d: z.number() });

const CriteriaAnswer = z
  .looseObject({
    balance_grades: z.looseObject({
      source,
      grades: z.array(z.looseObject({ grade_mm_per_s: z.number(), machines: z.string() })),
    }),
    machine_zones: z.looseObject({
      source,
      zones: z.array(
        z.looseObject({
          group: z.string(),
          support: z.enum(["rigid", "flexible"]),
          velocity_mm_per_s_rms: boundaries,
          displacement_um_rms: boundaries,
        }),
      ),
    }),
  })
  .meta({ id: "Criteria" });

type Boundaries = readonly [number, number, number];

const named = ([a_b, b_c, c_d]: Boundaries) => ({ a_b, b_c, c_d });
const inMillimetres = ([a, b, c]: Boundaries): Boundaries => [
  inUnit(a, "mm/s"),
  inUnit(b, "mm/s"),
  inUnit(c, "mm/s"),
];
const inMicrometres = ([a, b, c]: Boundaries): Boundaries => [
  inUnit(a, "µm"),
  inUnit(b, "µm"),
  inUnit(c, "µm"),
];

export const criteriaRoutes: readonly Route[] = [
  route({
    method: "get",
    path: "/v1/criteria",
    operation: {
      operationId: "getCriteria",
      summary: "The published tables that are used",
      description: "Balance grades and machine-vibration zones, each with its source and how sure it is.",
      tags: ["service"],
      responses: {
        200: { description: "The tables.", content: { "application/json": { schema: CriteriaAnswer } } },
      },
    },
    handler({ response }) {
      response.json({
        balance_grades: {
          source: BALANCE_GRADES_SOURCE,
          grades: BALANCE_GRADES.map(({ grade, machines }) => ({ grade_mm_per_s: grade, machines })),
        },
        machine_zones: {
          source: MACHINE_ZONES_SOURCE,
          zones: MACHINE_ZONES.map(({ group, support, velocity, displacement }) => ({
            group,
            support,
            velocity_mm_per_s_rms: named(inMillimetres(velocity)),
            displacement_um_rms: named(inMicrometres(displacement)),
          })),
        },
      });
    },
  }),
];
