/** What a user or a file wrote, in quotes. */
export const said = (value: unknown): string => `"${String(value)}"`;

/** "A, B or C" */
export function either(list: unknown): string {
  const words = (Array.isArray(list) ? list : [list]).map(String);
  const last = words.at(-1) ?? "";
  return words.length < 2 ? last : `${words.slice(0, -1).join(", ")} or ${last}`;
}
