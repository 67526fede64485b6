import { fail, type Issue, type Result, succeed } from "../../result/index.ts";
import { numberRead } from "../../units/index.ts";
import { medicineParse } from "../medicineParse.ts";
import type { MedicineRecord } from "../medicineRecord.ts";
import { type DraftGroup, type DraftNode, type DraftPath, isDraftGroup, isDraftList } from "./draftNode.ts";

/**
 * A record while it is edited. It differs from the record's JSON in two ways only: a number that was typed is the text as typed
 * (one that was not touched stays the number it is), and whatever has a source carries `was`: what it said when editing began.
 */
export type RecordDraft = DraftGroup;

/** Fields whose number a person types; anything else that is a number is not edited. */
const TYPED = new Set(["value", "low", "high"]);
/** Left empty, these are not there at all. */
const OPTIONAL = new Set(["note", "source", "basis", "setting", "by", "on", "authors", "year", "place", "salt"]);

export function recordDraft(record: MedicineRecord): RecordDraft {
  return draftOf(record) as RecordDraft;
}

function draftOf(value: unknown): DraftNode {
  if (Array.isArray(value)) return value.map((each) => draftOf(each));
  if (typeof value !== "object" || value === null) return value as DraftNode;
  const fields = Object.entries(value).filter(([, each]) => each !== undefined);
  const node = Object.fromEntries(fields.map(([name, each]) => [name, draftOf(each)]));
  return "source" in node && "basis" in node ? { ...node, was: withoutWas(node) } : node;
}

function withoutWas(node: DraftNode): DraftNode {
  if (isDraftList(node)) return node.map(withoutWas);
  if (!isDraftGroup(node)) return node;
  return Object.fromEntries(
    Object.entries(node).flatMap(([key, each]) =>
      key === "was" || each === undefined ? [] : [[key, withoutWas(each)]],
    ),
  );
}

/** The draft as a record's JSON, and the faults of numbers that can't be read. */
export function draftJson(draft: RecordDraft): { readonly json: unknown; readonly faults: readonly Issue[] } {
  const faults: Issue[] = [];
  const jsonOf = (node: DraftNode, key: string | number, path: DraftPath): unknown => {
    if (typeof node === "string" && TYPED.has(String(key))) {
      const read = numberRead(node);
      if (read.ok) return read.value;
      faults.push(...read.issues.map((each) => ({ ...each, path })));
      return node;
    }
    if (isDraftList(node)) return node.map((each, i) => jsonOf(each, i, [...path, i]));
    if (!isDraftGroup(node)) return node;
    return Object.fromEntries(
      Object.entries(node).flatMap(([name, each]) => {
        const isLeftOut = each === undefined || name === "was" || (each === "" && isOptional(node, name));
        return isLeftOut ? [] : [[name, jsonOf(each, name, [...path, name])]];
      }),
    );
  };
  return { json: jsonOf(draft, "", []), faults };
}

/** An end of a population's range may be open; the ends of a window may not. */
function isOptional(node: DraftGroup, name: string): boolean {
  return OPTIONAL.has(name) || ((name === "low" || name === "high") && "covariate" in node);
}

/** The draft as a record, or everything that is in the way, each with the path of its field. */
export function recordDraftRead(draft: RecordDraft): Result<MedicineRecord> {
  const { json, faults } = draftJson(draft);
  const parsed = medicineParse(json);
  if (parsed.ok && faults.length === 0) return succeed(parsed.value);
  const told = [...faults];
  const isTold = (each: Issue) => told.some(({ path }) => isSamePath(path, each.path));
  if (!parsed.ok) told.push(...parsed.issues.filter((each) => !isTold(each)));
  // What must hold across fields is looked at only in a whole record: a source still to be named hides no other fault.
  const whole = medicineParse(draftJson(withSources(draft)).json);
  if (!whole.ok) told.push(...whole.issues.filter((each) => !isTold(each)));
  return fail(...told);
}

/** Wherever source or basis is still to be named, one that passes. */
function withSources(draft: RecordDraft): RecordDraft {
  const source = isDraftGroup(draft.sources) ? (Object.keys(draft.sources)[0] ?? "") : "";
  const filled = (node: DraftNode): DraftNode => {
    if (isDraftList(node)) return node.map(filled);
    if (!isDraftGroup(node)) return node;
    return Object.fromEntries(
      Object.entries(node).flatMap(([key, each]) => {
        if (each === "" && key === "source") return [[key, source]];
        if (each === "" && key === "basis") return [[key, "memory"]];
        return each === undefined || key === "was" ? [] : [[key, filled(each)]];
      }),
    );
  };
  return filled(draft) as RecordDraft;
}

export function isSamePath(a: DraftPath, b: DraftPath): boolean {
  return a.length === b.length && a.every((part, i) => part === b[i]);
}
