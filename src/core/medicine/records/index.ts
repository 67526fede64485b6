import type { MedicineRecord } from "../medicineRecord.ts";
import demoxiline from "./demoxiline.json" with { type: "json" };
import digoxin from "./digoxin.json" with { type: "json" };
import lamotrigine from "./lamotrigine.json" with { type: "json" };
import phenytoin from "./phenytoin.json" with { type: "json" };
import theophylline from "./theophylline.json" with { type: "json" };

/** The records that come with the program. To add one: its file in this folder and one line here (docs/medicines.md). */
const files: readonly unknown[] = [
  theophylline, //
  lamotrigine,
  phenytoin,
  digoxin,
  demoxiline,
];

/** Not parsed here: a test parses every file and finds it unchanged, so a fault never reaches a build. */
export const BUILT_IN_RECORDS = files as readonly MedicineRecord[];

export function recordById(id: string): MedicineRecord | undefined {
  return BUILT_IN_RECORDS.find((each) => each.id === id);
}
