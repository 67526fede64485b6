import { recordIssues, schemaIssues } from "../medicine/index.ts";
import { fail, jsonRead, type Result, succeed } from "../result/index.ts";
import { caseChecks } from "./caseChecks.ts";
import { caseMigrate } from "./caseMigrate.ts";
import { type Case, caseSchema } from "./caseSchema.ts";

/** Reads a case file: the case, or every fault with its path. Nothing is guessed, mended or dropped. */
export function caseParse(text: string): Result<Case> {
  const read = jsonRead(text);
  return read.ok ? caseValidate(read.value) : read;
}

/** The same for a value already read, as the database holds it: one door for both. */
export function caseValidate(value: unknown): Result<Case> {
  // 1. What it says it is, and up to the newest version.
  const migrated = caseMigrate(value);
  if (!migrated.ok) return migrated;

  // 2. Shape, and the medicine record's own checks.
  const shaped = caseSchema.safeParse(migrated.value);
  if (!shaped.success) {
    const issues = schemaIssues(shaped.error, migrated.value);
    return fail(...recordIssues(issues, migrated.value, ["medicine"]));
  }

  // 3. What holds across fields.
  const issues = caseChecks(shaped.data);
  return issues.length > 0 ? fail(...issues) : succeed(shaped.data);
}
