import { z } from "zod";
import { GATES } from "../../src/selection/index.ts";
import { EvaluationBody } from "./evaluation.ts";
import { Foot, known, Mode, number } from "./selection-answer.ts";

const SteadyState = z
  .looseObject({
    speed_rpm: number,
    order: number,
    frequency_hz: number,
    transmissibility: known("Sum of the amplitudes of the foot forces over what acts."),
    net_transmissibility: known("Amplitude of the net force over what acts."),
    transmitted_force_n: known("Zero to peak."),
    net_force_n: known("Zero to peak."),
    foot_forces_n: z.array(number.nullable()).nullable(),
    machine_velocity_mm_per_s_rms: known("At the centre of gravity."),
    points: z.array(z.looseObject({ name: z.string(), velocity_mm_per_s_rms: number.nullable() })).nullable(),
  })
  .meta({ id: "SteadyState" });

/** The answer to an evaluation. */
export const EvaluationAnswer = z
  .looseObject({
    engine_version: z.string(),
    request: EvaluationBody,
    assumptions: z.array(z.string()),
    cautions: z.array(z.string()),
    notes: z.array(z.string()),
    model: z.enum(["vertical", "rigid_body"]),
    feet: z.array(Foot),
    static_deflection_mm: number,
    levelness_mm: number,
    tilt_mrad: z.looseObject({ x: number, y: number }).nullable(),
    modes: z.array(Mode).nullable(),
    steady_state: z.array(SteadyState).meta({ description: "One an order at each end of the speed range." }),
    worst: SteadyState.nullable(),
    worst_force: SteadyState.nullable(),
    rotation: z
      .enum(["right_handed", "left_handed"])
      .nullable()
      .meta({ description: "The sense that is shown." }),
    response: z
      .looseObject({
        frequency_hz: z.array(number),
        transmissibility: z.array(number.nullable()),
        net_transmissibility: z.array(number.nullable()),
      })
      .nullable(),
    checks: z.array(
      z.looseObject({
        gate: z.enum(GATES),
        passed: z.boolean(),
        value: number.nullable(),
        limit: number.nullable(),
        unit: z.string().nullable(),
      }),
    ),
  })
  .meta({ id: "Evaluation" });
