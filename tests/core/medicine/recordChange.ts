import { expect } from "vitest";
import { type MedicineRecord, medicineParse, recordById } from "../../../src/core/medicine/index.ts";
import { issueMessage } from "../../../src/core/messages/index.ts";
import type { Issue } from "../../../src/core/result/index.ts";

/** A built-in record with one thing changed, and what reading it says. */

export type Change = (record: MedicineRecord) => void;

export function changed(id: string, change: Change): unknown {
  const record = structuredClone(recordById(id)) as MedicineRecord;
  change(record);
  return record;
}

export type Part = Record<string, unknown>;

export function partOf(record: MedicineRecord, path: string): Part {
  return path.split(".").reduce<unknown>((part, key) => (part as Part)[key], record) as Part;
}

/** Sets the field at a path such as "products.0.lag.value". */
export function put(path: string, value: unknown): Change {
  return (record) => {
    const at = path.lastIndexOf(".");
    const part = at < 0 ? (record as unknown as Part) : partOf(record, path.slice(0, at));
    part[path.slice(at + 1)] = value;
  };
}

export function take(path: string): Change {
  return (record) => {
    const at = path.lastIndexOf(".");
    delete (at < 0 ? (record as unknown as Part) : partOf(record, path.slice(0, at)))[path.slice(at + 1)];
  };
}

export function issuesOf(json: unknown): readonly Issue[] {
  const parsed = medicineParse(json);
  return parsed.ok ? [] : parsed.issues;
}

/** Code and path of each issue; every one has a sentence. */
export function faults(id: string, change: Change): string[] {
  return issuesOf(changed(id, change)).map((each) => {
    expect(issueMessage(each)).toMatch(/^[A-Z"a-z].*[.:]$/);
    expect(issueMessage(each)).not.toMatch(/undefined|\[object|NaN/);
    return `${each.code} ${each.path.join(".")}`;
  });
}
