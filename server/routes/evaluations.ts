import { analyse, frequencyCurve } from "../../src/dynamics/index.ts";
import { isolatorFromRecord } from "../../src/isolator/index.ts";
import { cautionsFor, judge } from "../../src/selection/index.ts";
import { snapshotOf } from "../answer.ts";
import { presentEvaluation } from "../presenters/evaluation.ts";
import { type Route, route } from "../route.ts";
import { EvaluationBody } from "../schemas/evaluation.ts";
import { EvaluationAnswer } from "../schemas/evaluation-answer.ts";
import { understandEvaluation } from "../schemas/to-evaluation.ts";

/** A pump set of the bakery's cold store, its motor heavier than its pump, on a concrete inertia base. */
const PUMP_SET = {
  name: "Brine pump 1",
  tag: "BB-P-1",
  mass: "420 kg",
  speed: "1475 rpm",
  feet: {
    positions: [
      { x: "-0.75 m", y: "-0.35 m" },
      { x: "0.75 m", y: "-0.35 m" },
      { x: "-0.75 m", y: "0.35 m" },
      { x: "0.75 m", y: "0.35 m" },
    ],
  },
  centre_of_gravity: { x: "0.18 m", y: "0.02 m", z: "0.55 m" },
  envelope: { length: "1.4 m", width: "0.5 m", height: "0.6 m" },
  base: { kind: "inertia", length: "1.7 m", width: "0.8 m", thickness: "0.2 m", material: "concrete" },
  excitation: [
    { kind: "unbalance", rotor_mass: "60 kg", grade: "G6.3", at: { x: "-0.3 m", y: 0, z: "0.6 m" } },
  ],
  target: { transmissibility: 0.1 },
  isolators: [
    { feet: [1, 3], isolator: "openspring-2xd10x85-3150N-25mm" },
    { feet: [2, 4], isolator: "openspring-2xd11x94-4000N-25mm" },
  ],
};

export const evaluationRoutes: readonly Route[] = [
  route({
    method: "post",
    path: "/v1/evaluations",
    operation: {
      operationId: "evaluate",
      summary: "Analyse a stated arrangement",
      description:
        "What stated isolators do under a stated machine: foot loads, modes, steady state, the response curve, and a " +
        "check for each target. An arrangement that is bad is answered with failed checks, not with an error.",
      tags: ["selections"],
      body: EvaluationBody,
      bodyExamples: { pump_set: { summary: "A pump set on an inertia base", value: PUMP_SET } },
      responses: {
        200: { description: "The analysis.", content: { "application/json": { schema: EvaluationAnswer } } },
      },
    },
    handler({ context, body, response }) {
      const { store, engineVersion } = context;
      const asked = understandEvaluation(body, (catalog, designation) => {
        const record = store.record(snapshotOf(store, catalog).revision, designation);
        return record && isolatorFromRecord(record);
      });
      const { request, isolators, frequencies } = asked;
      const { machine, target } = request;
      const analysis = analyse(machine, isolators, target.judgedOn);
      const curve =
        frequencies &&
        (analysis.modes === null
          ? null
          : { frequencies, ...frequencyCurve(machine, isolators, analysis.rotation, frequencies) });
      const cautions = cautionsFor({ machine, mounting: "floor" });
      response.json(
        presentEvaluation(asked, analysis, judge(request, analysis), curve, cautions, engineVersion),
      );
    },
  }),
];
