import { z } from "zod";
import { quantity } from "./quantity.ts";

/** A field of the contract that later work fills: refused by name, never silently ignored. */
export const notYet = (): z.ZodOptional<z.ZodNever> =>
  z
    .never({ error: "not yet supported by this version" })
    .meta({ description: "Not yet supported." })
    .optional();

const coordinate = (description: string) => quantity("length", { min: -1000, max: 1000, description });

const point = z
  .strictObject({
    x: coordinate("Along the length, m."),
    y: coordinate("Along the width, m."),
    z: coordinate("Upward, m.").optional(),
  })
  .meta({ description: "A point in the machine's frame: x along its length, y along its width, z up." });

const direction = z
  .tuple([z.number(), z.number(), z.number()])
  .meta({ description: "x, y, z; any length but zero." });

const foot = z.strictObject({
  ...point.shape,
  axis: direction.optional().meta({ description: "The isolator's own direction; upright when left out." }),
});

const axis = z.enum(["x", "y", "z"]);

const footCount = z.int().min(3).max(64);
const extent = (description: string) => quantity("length", { above: 0, max: 1000, description });

const feet = z
  .union([
    footCount.meta({ description: "How many feet, when their places are not known." }),
    z.strictObject({ count: footCount, length: extent("Along x."), width: extent("Along y.") }).meta({
      description: "A footprint: two rows along x; three feet stand two at the back and one in front.",
    }),
    z
      .strictObject({ positions: z.array(foot).min(3).max(64) })
      .meta({ description: "The elastic centres of the isolators." }),
  ])
  .meta({ description: "The feet, one isolator each; four when left out." });

const speed = z
  .union([
    quantity("speed", {
      min: 1,
      max: 100_000,
      description: "One running speed.",
      examples: ["1180 rpm", "19.7 Hz"],
    }),
    z
      .strictObject({
        min: quantity("speed", { min: 1, max: 100_000 }),
        max: quantity("speed", { min: 1, max: 100_000 }),
      })
      .meta({ description: "A range, for a variable-speed drive." }),
  ])
  .meta({ description: "Running speed of the shaft." });

const order = z.number().gt(0).max(200);
const line = {
  at: point.optional().meta({ description: "Where it acts; the centre of gravity when left out." }),
  phase_deg: z.number().min(-360).max(360).optional(),
  order: order.optional().meta({ description: "Multiple of the running speed; 1 when left out." }),
};

const excitation = z.union([
  z
    .strictObject({
      kind: z.literal("force"),
      amplitude: quantity("force", { above: 0, max: 1e9, description: "Zero to peak.", examples: ["350 N"] }),
      direction: direction.optional(),
      ...line,
    })
    .meta({ description: "A force of fixed direction; upward when none is given." }),
  z
    .strictObject({
      kind: z.literal("unbalance"),
      moment: quantity("unbalance", { above: 0, max: 1e12, examples: ["900 g mm"] }),
      ...line,
    })
    .meta({ description: "A rotating unbalance by its moment." }),
  z
    .strictObject({
      kind: z.literal("unbalance"),
      rotor_mass: quantity("mass", { above: 0, max: 1e7, examples: ["120 kg"] }),
      grade: z
        .string()
        .max(16)
        .meta({ description: "ISO 21940-11 balance grade.", examples: ["G6.3"] }),
      ...line,
    })
    .meta({ description: "The residual unbalance that a balance grade permits at the top speed." }),
]);

const inertiaElement = (least: { above?: number; min?: number }) =>
  quantity("inertia", { max: 1e12, ...least });

const inertia = z
  .strictObject({
    xx: inertiaElement({ above: 0 }),
    yy: inertiaElement({ above: 0 }),
    zz: inertiaElement({ above: 0 }),
    xy: inertiaElement({ min: -1e12 }).optional(),
    xz: inertiaElement({ min: -1e12 }).optional(),
    yz: inertiaElement({ min: -1e12 }).optional(),
  })
  .meta({
    description:
      "Inertia tensor of the machine about its centre of gravity, the elements as they stand in the mass matrix: xy = −∫xy dm.",
  });

const base = z
  .strictObject({
    kind: z.literal("inertia").optional(),
    length: extent("Along x.").optional(),
    width: extent("Along y.").optional(),
    thickness: extent("Upward.").optional(),
    material: z.enum(["concrete", "steel"]).optional().meta({ description: "concrete when left out." }),
    mass: quantity("mass", { above: 0, max: 1e7, description: "Overrides the density." }).optional(),
    at: point.optional().meta({ description: "Its centre; under the middle of the feet when left out." }),
  })
  .meta({
    description:
      "An inertia base between machine and isolators: its three dimensions, or its mass alone, which allows the vertical model only.",
  });

/** What is known of the machine. */
export const machineFields = {
  name: z.string().max(200).optional().meta({ description: "What you call the machine." }),
  tag: z.string().max(100).optional().meta({ description: "Its number in your list." }),
  mass: quantity("mass", {
    min: 0.001,
    max: 1e7,
    description: "Mass on the isolators.",
    examples: ["850 kg", "1874 lb"],
  }),
  speed,
  orders: z
    .array(order)
    .min(1)
    .max(32)
    .optional()
    .meta({ description: "Multiples of the speed to judge; [1] when left out." }),
  feet: feet.optional(),
  centre_of_gravity: point.optional(),
  envelope: z
    .strictObject({ length: extent("Along x."), width: extent("Along y."), height: extent("Upward.") })
    .optional()
    .meta({
      description: "The machine's outline, a uniform box of which stands for an inertia that is not given.",
    }),
  inertia: inertia.optional(),
  shaft_axis: axis.optional().meta({ description: "x when left out." }),
  rotation: z
    .enum(["right_handed", "left_handed", "either"])
    .optional()
    .meta({ description: "either when left out." }),
  excitation: z.array(excitation).min(1).max(32).optional(),
  points: z
    .array(z.strictObject({ name: z.string().min(1).max(100), at: point }))
    .max(32)
    .optional()
    .meta({ description: "Places on the machine whose velocity is asked for." }),
  run_up: notYet(),
  coast_down: notYet(),
  base: base.optional(),
  support: z
    .strictObject({
      kind: z.literal("rigid", { error: "only a rigid support is supported by this version" }),
    })
    .optional(),
  floor_motion: notYet(),
};

export type MachineBody = z.output<z.ZodObject<typeof machineFields>>;
