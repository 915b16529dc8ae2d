/**
 * One value of an answer by its dotted path, such as `designation` or `modes.0.frequency_hz`.
 * @returns `undefined` where the path leads nowhere
 */
export function valueAt(document: unknown, path: string): unknown {
  return path
    .split(".")
    .reduce<unknown>(
      (value, key) =>
        typeof value === "object" && value !== null && Object.hasOwn(value, key)
          ? Reflect.get(value, key)
          : undefined,
      document,
    );
}

/** A value as the text of a cell: a number with a decimal point and no thousands separator, a list as JSON. */
export function cellText(value: string | number | boolean | object): string {
  return typeof value === "object" ? JSON.stringify(value) : String(value);
}

/** Text for inside an XML element. */
export function xmlText(text: string): string {
  return text.replaceAll("&", "&amp;").replaceAll("<", "&lt;").replaceAll(">", "&gt;");
}
