import { BASES, type Basis, type MedicineRecord, recordFigures } from "../src/core/medicine/index.ts";

/** How many of a record's figures are known on each basis, in the order of BASES; those that none is known on are left out. */
export function basisCounts(record: MedicineRecord): readonly (readonly [Basis, number])[] {
  const figures = recordFigures(record);
  return BASES.map((basis) => [basis, figures.filter((each) => each.basis === basis).length] as const).filter(
    ([, count]) => count > 0,
  );
}

/** "40 figures 20 (50 %) are seen, 20 (50 %) memory". */
export function basisShare(record: MedicineRecord): string {
  const total = recordFigures(record).length;
  const parts = basisCounts(record).map(
    ([basis, count]) => `${count} (${Math.round((100 * count) / total)} %) ${basis}`,
  );
  return `${total} figures: ${parts.join(", ")}`;
}
