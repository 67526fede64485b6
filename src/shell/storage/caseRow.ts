import { sha256 } from "@noble/hashes/sha2.js";
import { bytesToHex, utf8ToBytes } from "@noble/hashes/utils.js";
import { type Case, caseParse, casePrint } from "../../core/case/index.ts";
import { fail, issue, type Result } from "../../core/result/index.ts";
import type { CaseRow } from "./storageSchema.ts";

export interface CaseEntry {
  readonly id: string;
  readonly label: string;
  readonly medicine: string;
  readonly demo: boolean;
  readonly savedAt: number;
}

export function textChecksum(text: string): string {
  return bytesToHex(sha256(utf8ToBytes(text)));
}

export function caseRowMake(value: Case, savedAt: number): Omit<CaseRow, "revision"> {
  const text = casePrint(value);
  return {
    id: value.id,
    label: value.label,
    medicine: value.medicine.name,
    demo: value.demo === true,
    savedAt,
    checksum: textChecksum(text),
    text,
  };
}

/** The same parser as an import. A row that fails is left where it is; the first issue says which case. */
export function caseRowRead(row: CaseRow): Result<Case> {
  const which = { id: row.id, label: typeof row.label === "string" ? row.label : "" };
  if (typeof row.text !== "string" || textChecksum(row.text) !== row.checksum)
    return fail(issue("storage-row-damaged", which));
  const parsed = caseParse(row.text);
  if (!parsed.ok) return fail(issue("storage-row-unreadable", which), ...parsed.issues);
  if (parsed.value.id !== row.id) return fail(issue("storage-row-damaged", which));
  return parsed;
}

/** For the list: needs nothing of the text, so a damaged case is still listed and can be named. */
export function caseRowEntry(row: CaseRow): CaseEntry {
  return {
    id: row.id,
    label: typeof row.label === "string" ? row.label : "",
    medicine: typeof row.medicine === "string" ? row.medicine : "",
    demo: row.demo === true,
    savedAt: typeof row.savedAt === "number" ? row.savedAt : 0,
  };
}
