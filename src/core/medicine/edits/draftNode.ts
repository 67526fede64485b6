import { numberPlain } from "../../units/index.ts";

/** A record being edited, as a tree: what stands in a field exactly as typed, right or wrong. */
export type DraftNode = string | number | boolean | readonly DraftNode[] | DraftGroup;
export interface DraftGroup {
  readonly [key: string]: DraftNode | undefined;
}
export type DraftPath = readonly (string | number)[];

export function isDraftGroup(node: DraftNode | undefined): node is DraftGroup {
  return typeof node === "object" && !Array.isArray(node);
}

export function isDraftList(node: DraftNode | undefined): node is readonly DraftNode[] {
  return Array.isArray(node);
}

/** The node at a path; undefined where there is none. */
export function draftAt(node: DraftNode | undefined, path: DraftPath): DraftNode | undefined {
  return path.reduce<DraftNode | undefined>((at, key) => {
    if (isDraftList(at)) return typeof key === "number" ? at[key] : undefined;
    return isDraftGroup(at) && Object.hasOwn(at, key) ? at[String(key)] : undefined;
  }, node);
}

/** What stands in the field of a node: the text as typed, or the number as it would be typed; "" for what is no text. */
export function draftTyped(node: DraftNode | undefined): string {
  if (typeof node === "number") return numberPlain(node);
  return typeof node === "string" ? node : "";
}

/**
 * The tree with another node at a path; `undefined` takes the field, or the entry of a list, away. What is not on the path is shared.
 * Groups on the way that are not there yet are made; a list takes an entry at its end.
 */
export function draftPut(node: DraftNode | undefined, path: DraftPath, value: DraftNode | undefined): DraftNode {
  const [key, ...rest] = path;
  if (key === undefined) {
    if (value === undefined) throw new RangeError("path: empty; allowed: the path of a field to take away");
    return value;
  }
  if (typeof key === "number") {
    const list = isDraftList(node) ? [...node] : [];
    if (key > list.length) throw new RangeError(`path: entry ${key}; allowed 0 to ${list.length}`);
    if (rest.length === 0 && value === undefined) list.splice(key, 1);
    else list[key] = draftPut(list[key], rest, value);
    return list;
  }
  const group: Record<string, DraftNode | undefined> = isDraftGroup(node) ? { ...node } : {};
  if (rest.length === 0 && value === undefined) delete group[key];
  else group[key] = draftPut(group[key], rest, value);
  return group;
}
