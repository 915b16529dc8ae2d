/** A JSON Pointer (RFC 6901) to a place inside a document: `["a/b", 0]` is `/a~1b/0`. */
export function jsonPointer(path: readonly PropertyKey[]): string {
  return path.map((key) => `/${String(key).replaceAll("~", "~0").replaceAll("/", "~1")}`).join("");
}
