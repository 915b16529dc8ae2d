/** A number as JSON can hold it: what is not known or not finite is null, never a silent zero. */
export function finite(value: number | null | undefined): number | null {
  return value !== null && value !== undefined && Number.isFinite(value) ? value : null;
}
