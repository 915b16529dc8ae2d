import { createHash } from "node:crypto";

/** A digest of plain data in which the order of keys does not count, in hexadecimal digits. */
export function digestOf(value: unknown, length: number): string {
  return createHash("sha256").update(canonical(value)).digest("hex").slice(0, length);
}

/** JSON with the keys of every object in order. */
function canonical(value: unknown): string {
  if (value === null || typeof value !== "object") return JSON.stringify(value);
  if (Array.isArray(value)) return `[${value.map(canonical).join(",")}]`;
  const object = value as Readonly<Record<string, unknown>>;
  let text = "";
  for (const key of Object.keys(object).sort())
    if (object[key] !== undefined)
      text += `${text === "" ? "" : ","}${JSON.stringify(key)}:${canonical(object[key])}`;
  return `{${text}}`;
}
