import { type MedicineRecord, productOf } from "../medicine/index.ts";
import type { DoseMark } from "./analysisTypes.ts";

/** What was counted of a dose in mg as its product is labelled: the other way round from doseMg. */
export function labelledDose(record: MedicineRecord, mark: DoseMark): number {
  return mark.countedMg / (productOf(record, mark.product).saltFactor?.value ?? 1);
}
