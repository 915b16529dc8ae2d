import { Ajv2020, type ErrorObject, type ValidateFunction } from "ajv/dist/2020.js";
import { type Fault, InputError } from "../src/errors/index.ts";
import type { IsolatorRecord } from "../src/isolator/index.ts";
import schema from "./isolator.schema.json" with { type: "json" };

/** Compiled when first needed: most starts never are. */
let compiled: ValidateFunction<IsolatorRecord> | undefined;

/**
 * A value as a record, once it fits the schema and its curve rises.
 * @param pointer  where it stands in the request
 * @throws {InputError} every fault, each at its place under `pointer`
 */
export function checkRecord(value: unknown, pointer: string): IsolatorRecord {
  compiled ??= new Ajv2020({ strict: true, allErrors: true }).compile<IsolatorRecord>(schema);
  const validate = compiled;
  if (!validate(value)) throw new InputError((validate.errors ?? []).map((error) => faultOf(error, pointer)));
  const { axial, load_n: load } = value;
  const faults: Fault[] = [];
  if ("curve" in axial)
    for (const [i, [deflection, force]] of axial.curve.entries()) {
      const before = axial.curve[i - 1];
      if (before !== undefined && (deflection <= before[0] || force <= before[1]))
        faults.push({
          pointer: `${pointer}/axial/curve/${i}`,
          detail: "must lie beyond the point before it in both",
        });
    }
  if ((load.min ?? 0) > load.max)
    faults.push({ pointer: `${pointer}/load_n/min`, detail: "is above the maximum" });
  if (faults.length > 0) throw new InputError(faults);
  return value;
}

function faultOf({ instancePath, message, keyword, params }: ErrorObject, pointer: string): Fault {
  const named = keyword === "additionalProperties" ? ` ("${params["additionalProperty"]}")` : "";
  return { pointer: pointer + instancePath, detail: `${message ?? "does not fit"}${named}` };
}
