import { createHash } from "node:crypto";

/** A digest of plain data in which the order of keys does not count, in hexadecimal digits. */
export function digestOf(value: unknown, length: number): string {
  return createHash("sha256")
    .update(JSON.stringify(sorted(value)))
    .digest("hex")
    .slice(0, length);
}

function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted);
  if (value === null || typeof value !== "object") return value;
  return Object.fromEntries(
    Object.entries(value)
      .filter(([, entry]) => entry !== undefined)
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([key, entry]) => [key, sorted(entry)]),
  );
}
