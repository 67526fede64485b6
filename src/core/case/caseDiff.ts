import type { Case } from "./caseSchema.ts";

type Path = readonly (string | number)[];
/** One end of a change: the value that stands there, or that nothing does. */
type End = { readonly value: unknown } | "absent";

interface Change {
  readonly path: Path;
  readonly from: End;
  readonly to: End;
}

/** What sets two states of a case apart; inverted, it leads back. Shares its values with both, so history costs little. */
export type CaseDiff = readonly Change[];

export function caseDiff(before: Case, after: Case): CaseDiff {
  const changes: Change[] = [];
  collect(before, after, [], changes);
  return changes;
}

/** A case to which a diff does not belong is the caller's mistake and throws. */
export function diffApply(diff: CaseDiff, value: Case): Case {
  return diff.reduce<unknown>((whole, change) => changed(whole, change, 0), value) as Case;
}

export function diffInvert(diff: CaseDiff): CaseDiff {
  return diff.map(({ path, from, to }) => ({ path, from: to, to: from })).reverse();
}

function collect(before: unknown, after: unknown, path: Path, changes: Change[]): void {
  if (Object.is(before, after)) return;
  if (isList(before) && isList(after) && before.length === after.length) {
    before.forEach((each, i) => {
      collect(each, after[i], [...path, i], changes);
    });
  } else if (isObject(before) && isObject(after)) {
    for (const key of new Set([...Object.keys(before), ...Object.keys(after)])) {
      const from = endOf(before, key);
      const to = endOf(after, key);
      if (from !== "absent" && to !== "absent") collect(from.value, to.value, [...path, key], changes);
      else changes.push({ path: [...path, key], from, to });
    }
  } else {
    changes.push({ path, from: { value: before }, to: { value: after } });
  }
}

/** The part at `path[depth…]` replaced; every part on the way is copied, the rest is shared. */
function changed(value: unknown, change: Change, depth: number): unknown {
  const key = change.path[depth];
  if (key === undefined) {
    requireFound({ value }, change);
    if (change.to === "absent") throw new RangeError("diff: the whole case can't be taken away");
    return change.to.value;
  }
  if (!isObject(value) && !isList(value)) throw misfit(change);
  const copy = (isList(value) ? [...value] : { ...value }) as Record<string | number, unknown>;
  if (depth < change.path.length - 1) {
    if (!Object.hasOwn(copy, key)) throw misfit(change);
    copy[key] = changed(copy[key], change, depth + 1);
    return copy;
  }
  requireFound(endOf(copy, key), change);
  if (change.to === "absent") delete copy[key];
  else copy[key] = change.to.value;
  return copy;
}

function requireFound(found: End, change: Change): void {
  const { from } = change;
  const isSame = found === "absent" || from === "absent" ? found === from : isEqual(found.value, from.value);
  if (!isSame) throw misfit(change);
}

function misfit({ path }: Change): RangeError {
  return new RangeError(`diff: does not belong to this case: another value at ${path.join(".") || "the top"}`);
}

function isEqual(a: unknown, b: unknown): boolean {
  if (Object.is(a, b)) return true;
  if (isList(a) && isList(b)) return a.length === b.length && a.every((each, i) => isEqual(each, b[i]));
  if (!isObject(a) || !isObject(b)) return false;
  const keys = Object.keys(a);
  return keys.length === Object.keys(b).length && keys.every((key) => Object.hasOwn(b, key) && isEqual(a[key], b[key]));
}

function endOf(value: Readonly<Record<string | number, unknown>>, key: string | number): End {
  return Object.hasOwn(value, key) ? { value: value[key] } : "absent";
}

function isList(value: unknown): value is readonly unknown[] {
  return Array.isArray(value);
}

function isObject(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}
