import type { z } from "zod";

/**
 * The field names a schema knows at one place of a document. Where the schema allows several forms, the names
 * of all of them.
 */
export function knownKeys(schema: z.core.$ZodType, path: readonly PropertyKey[]): ReadonlySet<string> {
  return new Set(keysAt(schema as z.core.$ZodTypes, path));
}

function keysAt(schema: z.core.$ZodType, path: readonly PropertyKey[]): string[] {
  const { def } = (schema as z.core.$ZodTypes)._zod;
  const [key, ...rest] = path;
  switch (def.type) {
    case "object": {
      if (key === undefined) return Object.keys(def.shape);
      const field = def.shape[String(key)];
      return field === undefined ? [] : keysAt(field, rest);
    }
    case "array":
      return key === undefined ? [] : keysAt(def.element, rest);
    case "tuple": {
      const item = def.items[Number(key)];
      return item === undefined ? [] : keysAt(item, rest);
    }
    case "record":
      return key === undefined ? [] : keysAt(def.valueType, rest);
    case "union":
      return def.options.flatMap((option) => keysAt(option, path));
    case "lazy":
      return keysAt(def.getter(), path);
    case "pipe":
      return keysAt(def.in, path);
    case "optional":
    case "nullable":
    case "default":
    case "prefault":
    case "readonly":
    case "nonoptional":
    case "catch":
      return keysAt(def.innerType, path);
    default:
      return [];
  }
}
