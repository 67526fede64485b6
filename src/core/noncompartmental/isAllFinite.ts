/** True when every number in a value, however deep, is finite. */
export function isAllFinite(value: unknown): boolean {
  if (typeof value === "number") return Number.isFinite(value);
  if (typeof value !== "object" || value === null) return true;
  return Object.values(value).every(isAllFinite);
}
