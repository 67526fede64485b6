import { fail, type Issue, issue, type Result, succeed } from "../result/index.ts";
import type { MedicineRecord } from "./medicineRecord.ts";
import { medicineRecordSchema } from "./medicineRecordSchema.ts";
import { recordMigrate } from "./recordMigrate.ts";
import { pathText, schemaIssues } from "./schemaIssues.ts";

/** Reads a medicine record of any released version: the record as it is now, or every fault of it with its path. */
export function medicineParse(json: unknown): Result<MedicineRecord> {
  const migrated = recordMigrate(json);
  if (!migrated.ok) return migrated;
  const { value } = migrated;
  const parsed = medicineRecordSchema.safeParse(value);
  return parsed.success ? succeed(parsed.data) : fail(...recordIssues(schemaIssues(parsed.error, value), value, []));
}

/**
 * Issues of a record said more plainly where a figure or statement has no source or basis: which one it is.
 * `at` is where the record stands in what was parsed.
 */
export function recordIssues(issues: readonly Issue[], input: unknown, at: readonly string[]): Issue[] {
  return issues.map((each) => {
    const inside = at.every((part, i) => each.path[i] === part);
    const last = each.path.at(-1);
    if (!inside || !(last === "source" || last === "basis")) return each;
    if (each.code !== "field-missing" && each.code !== "value-too-small") return each;
    const figure = each.path.slice(at.length, -1);
    const data = { path: pathText(each.path.slice(0, -1)), missing: last, ...figureNames(input, at, figure) };
    return issue("record-figure-without-source", data, each.path);
  });
}

/** What a person calls the figure: the record's name, the product's name, the part. */
function figureNames(input: unknown, at: readonly string[], figure: readonly (string | number)[]) {
  const record = at.reduce<unknown>((value, key) => fieldOf(value, key), input);
  const product =
    figure[0] === "products" ? fieldOf(fieldOf(fieldOf(record, "products"), figure[1]), "name") : undefined;
  return { medicine: fieldOf(record, "name"), product, figure };
}

function fieldOf(value: unknown, key: string | number | undefined): unknown {
  if (key === undefined || typeof value !== "object" || value === null || !Object.hasOwn(value, key)) return undefined;
  return (value as Record<string | number, unknown>)[key];
}
