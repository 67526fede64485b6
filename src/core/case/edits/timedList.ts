import { instantMs } from "../../time/index.ts";

interface Timed {
  readonly id: string;
  readonly at: string;
}

/** A list kept in time order; entries at the same instant keep the order in which they came. */
function inOrder<T extends Timed>(list: readonly T[]): T[] {
  return [...list].sort((a, b) => instantMs(a.at) - instantMs(b.at));
}

function requireId<T extends Timed>(list: readonly T[], id: string, what: string): void {
  if (!list.some((each) => each.id === id)) throw new RangeError(`id: no ${what} "${id}"`);
}

export function timedAdd<T extends Timed>(list: readonly T[], item: T, what: string): T[] {
  if (list.some((each) => each.id === item.id)) throw new RangeError(`id: there is already a ${what} "${item.id}"`);
  return inOrder([...list, item]);
}

export function timedChange<T extends Timed>(list: readonly T[], item: T, what: string): T[] {
  requireId(list, item.id, what);
  return inOrder(list.map((each) => (each.id === item.id ? item : each)));
}

export function timedRemove<T extends Timed>(list: readonly T[], id: string, what: string): T[] {
  requireId(list, id, what);
  return list.filter((each) => each.id !== id);
}
