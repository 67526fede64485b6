import { type Issue, issue } from "../result/index.ts";

/** One issue for every entry whose id an earlier one already has. */
export function duplicateIds(list: readonly { readonly id: string }[], path: readonly (string | number)[]): Issue[] {
  const seen = new Set<string>();
  return list.flatMap(({ id }, i) => {
    const isSecond = seen.has(id);
    seen.add(id);
    return isSecond ? [issue("id-twice", { id }, [...path, i, "id"])] : [];
  });
}
