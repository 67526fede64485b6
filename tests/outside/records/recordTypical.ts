import type { Covariates, KineticsFormulaName } from "../../../src/core/medicine/index.ts";
import type { UnitCode } from "../../../src/core/units/index.ts";
import { recordOf } from "../../core/medicine/recordOf.ts";
import {
  type Course,
  recordAverage,
  recordFactor,
  recordHalfLife,
  recordPeakTime,
  recordValue,
  recordWindow,
} from "./recordFigure.ts";

/** A built-in record and the typical patient of its checks: what the record gives for them, where no other patient is named. */
export function recordTypical(id: string, typical: Covariates) {
  const record = recordOf(id);
  return {
    record,
    value: (name: KineticsFormulaName, patient = typical) => recordValue(record, name, patient),
    valuePerKg: (name: KineticsFormulaName) => recordValue(record, name, typical) / (typical.weight ?? Number.NaN),
    halfLife: (patient = typical) => recordHalfLife(record, patient),
    average: (course: Course, unit?: UnitCode, patient = typical) => recordAverage(record, patient, course, unit),
    peakTime: (product: string) => recordPeakTime(record, typical, product),
    window: (window: string, unit: UnitCode) => recordWindow(record, window, unit),
    factor: (from: UnitCode, to: UnitCode) => recordFactor(record, from, to),
    /** Its factor; not a number, which no comparison takes, where the record does not have it. */
    interaction: (interaction: string) =>
      record.interactions.find((each) => each.id === interaction)?.factor.value ?? Number.NaN,
  };
}
