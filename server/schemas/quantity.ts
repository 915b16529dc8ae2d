import { z } from "zod";
import { DIMENSIONS, type Dimension, parseQuantity } from "../../src/units/index.ts";

/** Limits in the documented unit of the dimension, and what the contract says of the field. */
interface Wanted {
  readonly min?: number;
  readonly max?: number;
  /** Limits that are not allowed themselves. */
  readonly above?: number;
  readonly below?: number;
  readonly description?: string;
  readonly examples?: readonly (string | number)[];
}

const LONGEST_TEXT = 64;

/**
 * A quantity of a request: a number in the documented unit of its dimension, or text with a unit. Read, it is a
 * number in the documented unit.
 */
export function quantity(dimension: Dimension, wanted: Wanted = {}) {
  const { documented: unit, example } = DIMENSIONS[dimension];
  const forms = `a number in ${unit}, or a string with a unit such as "${example}"`;
  return (
    z
      .union([documentedNumber(wanted), z.string().meta({ maxLength: LONGEST_TEXT })], {
        error: ({ input }) => (input === undefined ? undefined : `must be ${forms}, not ${kindOf(input)}`),
      })
      // Here and not at the end: of what a transform carries, zod leaves the examples out of the contract.
      .meta({
        description: [wanted.description, `${capital(forms)}.`].filter(Boolean).join(" "),
        examples: [...(wanted.examples ?? [example])],
        "x-unit": unit,
      })
      .transform((given, context): number => {
        const read =
          typeof given === "number" ? { ok: true as const, value: given } : parseQuantity(given, dimension);
        const fault = read.ok ? outside(read.value, wanted, unit) : read.reason;
        if (read.ok && fault === undefined) return read.value;
        context.issues.push({ code: "custom", message: fault ?? "", input: given });
        return z.NEVER;
      })
      // Says what comes out, so that the answer, which repeats the request, can be documented.
      .pipe(z.number())
  );
}

/** The limits are documented on the number and checked after conversion, for both forms in the same words. */
function documentedNumber({ min, max, above, below }: Wanted) {
  return z.number().meta({
    ...(min === undefined ? {} : { minimum: min }),
    ...(max === undefined ? {} : { maximum: max }),
    ...(above === undefined ? {} : { exclusiveMinimum: above }),
    ...(below === undefined ? {} : { exclusiveMaximum: below }),
  });
}

function outside(value: number, { min, max, above, below }: Wanted, unit: string): string | undefined {
  if (above !== undefined && value <= above) return mustBe("more than", above, value, unit);
  if (min !== undefined && value < min) return mustBe("at least", min, value, unit);
  if (below !== undefined && value >= below) return mustBe("less than", below, value, unit);
  if (max !== undefined && value > max) return mustBe("at most", max, value, unit);
  return undefined;
}

function mustBe(comparison: string, limit: number, value: number, unit: string): string {
  return `must be ${comparison} ${limit} ${unit}, not ${value} ${unit}`;
}

function kindOf(input: unknown): string {
  if (input === null) return "null";
  if (Array.isArray(input)) return "an array";
  if (typeof input === "number") return String(input);
  return typeof input === "object" ? "an object" : `a ${typeof input}`;
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
