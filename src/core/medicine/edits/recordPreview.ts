import { fail, type Result } from "../../result/index.ts";
import { medicineParse } from "../medicineParse.ts";
import type { MedicineRecord } from "../medicineRecord.ts";
import { draftJson, type RecordDraft } from "./recordDraft.ts";

/**
 * As much of a draft as its typical curve needs, as a record: kinetics, one product and the molar mass, in the record it started from.
 * What is unfinished elsewhere in the draft, a source not yet named included, does not stand in the way. For drawing only.
 */
export function recordPreview(draft: RecordDraft, base: MedicineRecord, productIndex: number): Result<MedicineRecord> {
  const { json, faults } = draftJson(draft);
  const product = partOf(partOf(json, "products"), productIndex);
  const used = (path: readonly (string | number)[]) =>
    path[0] === "kinetics" || path[0] === "molarMass" || (path[0] === "products" && path[1] === productIndex);
  const unread = faults.filter(({ path }) => used(path));
  if (unread.length > 0) return fail(...unread);
  const source = Object.keys(base.sources)[0] ?? "";
  const sourced = (value: unknown): unknown => withSource(value, source);
  const parsed = medicineParse({
    ...base,
    molarMass: sourced(partOf(json, "molarMass")),
    kinetics: sourced(partOf(json, "kinetics")),
    products: [sourced(product)],
    variability: {},
    windows: [],
  });
  if (parsed.ok) return parsed;
  // The one product stands first in what was parsed; its own place is the draft's.
  return fail(
    ...parsed.issues.map((each) =>
      each.path[0] === "products" ? { ...each, path: ["products", productIndex, ...each.path.slice(2)] } : each,
    ),
  );
}

function partOf(value: unknown, key: string | number): unknown {
  return typeof value === "object" && value !== null ? (value as Record<string | number, unknown>)[key] : undefined;
}

/** Every figure and formula with a source that the record knows: which one makes no difference to a curve. */
function withSource(value: unknown, source: string): unknown {
  if (Array.isArray(value)) return value.map((each) => withSource(each, source));
  if (typeof value !== "object" || value === null) return value;
  const fields = Object.fromEntries(Object.entries(value).map(([key, each]) => [key, withSource(each, source)]));
  return "unit" in fields ? { ...fields, source, basis: "memory" } : fields;
}
