import { readFileSync } from "node:fs";
import { join } from "node:path";
import { Ajv2020, type ValidateFunction } from "ajv/dist/2020.js";
import { packageRoot } from "../../server/package-info.ts";

interface MediaType {
  readonly schema?: unknown;
  readonly example?: unknown;
  readonly examples?: Readonly<Record<string, { readonly value: unknown }>>;
}
interface Operation {
  readonly operationId: string;
  readonly requestBody?: { readonly content: Readonly<Record<string, MediaType>> };
  readonly responses: Readonly<Record<string, { readonly content?: Readonly<Record<string, MediaType>> }>>;
  readonly parameters?: readonly (MediaType & { readonly name: string })[];
}
interface Document {
  readonly paths: Readonly<Record<string, Readonly<Record<string, Operation>>>>;
  readonly components: {
    readonly schemas: Readonly<Record<string, { readonly examples?: readonly unknown[] }>>;
  };
}

/** The committed OpenAPI document. */
export const document: Document = JSON.parse(
  readFileSync(join(packageRoot, "openapi", "openapi.json"), "utf8"),
);

// OpenAPI adds keywords of its own, and zod's formats come with patterns: neither is for ajv to check.
const ajv = new Ajv2020({ strict: false, validateFormats: false, allErrors: true, validateSchema: false });
ajv.addSchema(document, "openapi.json");

/** A check by the schema at a place of the document, given as the keys that lead there. */
export function validatorAt(...keys: readonly string[]): ValidateFunction {
  const pointer = keys
    .map((key) => `/${encodeURIComponent(key.replaceAll("~", "~0").replaceAll("/", "~1"))}`)
    .join("");
  const validate = ajv.getSchema(`openapi.json#${pointer}`);
  if (validate === undefined) throw new Error(`the document has no schema at ${pointer}`);
  return validate;
}

/** The documented path that a requested one belongs to: exact paths before those with parameters. */
export function documentedPath(requested: string): string | undefined {
  if (requested in document.paths) return requested;
  return Object.keys(document.paths).find((path) => {
    const pattern = path.replaceAll(/[.*+?^$()|[\]\\]/g, "\\$&").replaceAll(/\{\w+\}/g, "[^/]+");
    return new RegExp(`^${pattern}$`).test(requested);
  });
}
