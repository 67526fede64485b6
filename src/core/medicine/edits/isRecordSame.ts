/** Whether two records, or parts of them, say the same; the order in which their fields were written means nothing. */
export function isRecordSame(a: unknown, b: unknown): boolean {
  if (typeof a !== "object" || typeof b !== "object" || a === null || b === null) return a === b;
  if (Array.isArray(a) || Array.isArray(b)) {
    return (
      Array.isArray(a) && Array.isArray(b) && a.length === b.length && a.every((each, i) => isRecordSame(each, b[i]))
    );
  }
  const [one, other] = [fieldsOf(a), fieldsOf(b)];
  return (
    one.size === other.size && [...one].every(([key, each]) => other.has(key) && isRecordSame(each, other.get(key)))
  );
}

/** A field that is there but undefined is as good as not there. */
function fieldsOf(value: object): ReadonlyMap<string, unknown> {
  return new Map(Object.entries(value).filter(([, each]) => each !== undefined));
}
