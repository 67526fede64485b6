import type { MedicineRecord } from "../medicineRecord.ts";
import carbamazepine from "./carbamazepine.json" with { type: "json" };
import clozapine from "./clozapine.json" with { type: "json" };
import demoxiline from "./demoxiline.json" with { type: "json" };
import digoxin from "./digoxin.json" with { type: "json" };
import ethosuximide from "./ethosuximide.json" with { type: "json" };
import imatinib from "./imatinib.json" with { type: "json" };
import lamotrigine from "./lamotrigine.json" with { type: "json" };
import levetiracetam from "./levetiracetam.json" with { type: "json" };
import linezolid from "./linezolid.json" with { type: "json" };
import lithium from "./lithium.json" with { type: "json" };
import mycophenolate from "./mycophenolate.json" with { type: "json" };
import nortriptyline from "./nortriptyline.json" with { type: "json" };
import phenobarbital from "./phenobarbital.json" with { type: "json" };
import phenytoin from "./phenytoin.json" with { type: "json" };
import posaconazole from "./posaconazole.json" with { type: "json" };
import tacrolimus from "./tacrolimus.json" with { type: "json" };
import theophylline from "./theophylline.json" with { type: "json" };
import valproate from "./valproate.json" with { type: "json" };
import voriconazole from "./voriconazole.json" with { type: "json" };

/** The records that come with the program. To add one: its file in this folder and one line here (docs/medicines.md). */
const files: readonly unknown[] = [
  theophylline, //
  lamotrigine,
  phenytoin,
  digoxin,
  carbamazepine,
  ethosuximide,
  levetiracetam,
  lithium,
  phenobarbital,
  valproate,
  clozapine,
  imatinib,
  linezolid,
  mycophenolate,
  nortriptyline,
  posaconazole,
  tacrolimus,
  voriconazole,
  demoxiline,
];

/** Not parsed here: a test parses every file and finds it unchanged, so a fault never reaches a build. */
export const BUILT_IN_RECORDS = files as readonly MedicineRecord[];

export function recordById(id: string): MedicineRecord | undefined {
  return BUILT_IN_RECORDS.find((each) => each.id === id);
}
