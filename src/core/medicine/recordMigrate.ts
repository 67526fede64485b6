import { fail, issue, type Result, succeed } from "../result/index.ts";
import { RECORD_FORMAT, RECORD_VERSION } from "./medicineRecord.ts";
import { record0001 } from "./migrations/0001.ts";

type Fields = Readonly<Record<string, unknown>>;

/** Step n (counted from 0) takes a record of version n + 1 to version n + 2. Pure, and frozen once released. */
export const RECORD_MIGRATIONS: readonly ((record: Fields) => Fields)[] = [record0001];

/**
 * Brings a record of any released version to the newest; what is no record is handed on for the schema to refuse.
 * A newer one gives "record-newer", a file that says it is something else "record-format".
 */
export function recordMigrate(value: unknown): Result<unknown> {
  if (typeof value !== "object" || value === null || Array.isArray(value)) return succeed(value);
  const { format, version } = value as Fields;
  if (typeof format === "string" && format !== RECORD_FORMAT) {
    return fail(issue("record-format", { found: format.slice(0, 60), allowed: RECORD_FORMAT }, ["format"]));
  }
  if (format !== RECORD_FORMAT || typeof version !== "number" || !Number.isInteger(version)) return succeed(value);
  if (version > RECORD_VERSION) {
    return fail(issue("record-newer", { found: version, known: RECORD_VERSION }, ["version"]));
  }
  if (version < 1) return succeed(value);
  return succeed(RECORD_MIGRATIONS.slice(version - 1).reduce((each, step) => step(each), value as Fields));
}
