import { fail, issue, type Result, succeed } from "../result/index.ts";
import { CASE_FORMAT } from "./caseSchema.ts";
import { case0001 } from "./migrations/0001.ts";

type Fields = Readonly<Record<string, unknown>>;
/** Step n (counted from 0) takes a case of version n + 1 to version n + 2. Pure, and frozen once released. */
export type MigrationStep = (value: Fields) => Fields;

/** A new version is one file in ./migrations and one line here; then CASE_VERSION counts up. */
export const CASE_MIGRATIONS: readonly MigrationStep[] = [case0001];

/**
 * Brings a case of any released version to the newest, after looking at what it says it is.
 * Issues: case-not-object, case-format, case-version, case-newer.
 */
export function caseMigrate(value: unknown, steps: readonly MigrationStep[] = CASE_MIGRATIONS): Result<Fields> {
  if (typeof value !== "object" || value === null || Array.isArray(value)) return fail(issue("case-not-object"));
  const { format, version } = value as Fields;
  if (format !== CASE_FORMAT) {
    return fail(
      issue("case-format", { found: typeof format === "string" ? format.slice(0, 60) : null, allowed: CASE_FORMAT }, [
        "format",
      ]),
    );
  }
  const known = steps.length + 1;
  if (typeof version !== "number" || !Number.isInteger(version) || version < 1) {
    const found = typeof version === "number" || typeof version === "string" ? String(version).slice(0, 60) : null;
    return fail(issue("case-version", { found, known }, ["version"]));
  }
  if (version > known) return fail(issue("case-newer", { found: version, known }, ["version"]));
  return succeed(steps.slice(version - 1).reduce((each, step) => step(each), value as Fields));
}
