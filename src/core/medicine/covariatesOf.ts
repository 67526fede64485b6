import type { CovariateName } from "./covariates.ts";
import { formulaCovariates } from "./formulaRead.ts";
import { kineticsFormulas } from "./kineticsKinds.ts";
import type { MedicineRecord } from "./medicineRecord.ts";

/** What of the patient a record's kinetics need: each covariate once, in order of appearance. */
export function covariatesOf(record: Pick<MedicineRecord, "kinetics">): readonly CovariateName[] {
  return [...new Set(kineticsFormulas(record).flatMap(({ formula }) => formulaCovariates(formula.formula)))];
}
