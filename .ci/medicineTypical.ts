import { kineticsDisposition } from "../src/core/analysis/kineticsDisposition.ts";
import { referenceCovariates } from "../src/core/analysis/referenceCovariates.ts";
import { modelHalfLife } from "../src/core/kinetics/index.ts";
import { formulaEvaluate, kineticsFormulas, type MedicineRecord } from "../src/core/medicine/index.ts";

/** The patient for whom the pages state typical values; invented. A little above ideal weight, so that every size is defined. */
const PAGE_PATIENT = referenceCovariates({
  sex: "male",
  ageYears: 50,
  weightKg: 70,
  heightCm: 172,
  creatinineClearanceMlPerMin: 90,
  albuminGPerL: 40,
});
export const PAGE_PATIENT_TEXT = "a man of 50 years, 70 kg, 172 cm, creatinine clearance 90 mL/min, albumin 40 g/L";

export interface TypicalValues {
  /** By the name of the formula, in the formula's unit. */
  readonly values: Readonly<Record<string, number>>;
  /** h; null where elimination is saturable. */
  readonly halfLifeH: number | null;
}

/** A record's formulas for the patient of the pages. A formula that needs what that patient lacks throws a RangeError. */
export function medicineTypical(record: MedicineRecord): TypicalValues {
  const values = Object.fromEntries(
    kineticsFormulas(record).map(({ name, formula }) => {
      const found = formulaEvaluate(formula, PAGE_PATIENT);
      if (!found.ok) throw new RangeError(`${record.id} ${name}: ${JSON.stringify(found.issues)}`);
      return [name, found.value.value];
    }),
  );
  return { values, halfLifeH: modelHalfLife(kineticsDisposition(record, values)) };
}
