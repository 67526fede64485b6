import { type DraftNode, isDraftGroup } from "../../../core/medicine/index.ts";

/** An id that no entry of the list has: "product-3". Never shown; cases and windows point to it. */
export function entryId(prefix: string, list: readonly DraftNode[]): string {
  const taken = new Set(list.map((each) => (isDraftGroup(each) ? each.id : undefined)));
  for (let count = list.length + 1; ; count += 1) {
    const id = `${prefix}-${count}`;
    if (!taken.has(id)) return id;
  }
}
