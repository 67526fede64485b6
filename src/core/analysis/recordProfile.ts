import {
  type ModelInput,
  modelHalfLife,
  modelProfile,
  modelSteadyProfile,
  modelSteadyState,
  modelTimeToSteadyState,
} from "../kinetics/index.ts";
import {
  doseMg,
  formulaEvaluate,
  kineticsFormulas,
  type MedicineRecord,
  productAbsorption,
  productOf,
} from "../medicine/index.ts";
import { fail, type Issue, issue, type Result, succeed } from "../result/index.ts";
import type { UnitCode } from "../units/index.ts";
import type { Curve } from "./analysisTypes.ts";
import { curveTimes } from "./curveTimes.ts";
import { type KineticsValues, kineticsDisposition } from "./kineticsDisposition.ts";
import { type ReferencePatient, referenceCovariates } from "./referenceCovariates.ts";

/** One product, one dose, one interval: what two records can be compared under. */
export interface RecordCourse {
  readonly product: string;
  /** mg as labelled, above 0, at most RECORD_DOSE_MOST_MG. */
  readonly doseMg: number;
  /** h, RECORD_INTERVAL_LEAST_H to RECORD_INTERVAL_MOST_H */
  readonly intervalH: number;
}

export const RECORD_DOSE_MOST_MG = 100_000;
export const RECORD_INTERVAL_LEAST_H = 1;
export const RECORD_INTERVAL_MOST_H = 336;

/** Intervals drawn after the one in which 90 % of the way to steady state is done. */
const INTERVALS_AFTER = 2;
/** Ours: what takes longer is drawn this far; the steady state itself is worked out, not waited for. h */
const COURSE_MOST_H = 60 * 24;
/** Drawn where there is no steady state to wait for. h */
const COURSE_WITHOUT_END_H = 14 * 24;
const STEADY_POINTS = 240;

export interface RecordReadings {
  /** mg/L at steady state, and h after the dose. */
  readonly peak: number;
  readonly peakAfterDoseH: number;
  readonly lowest: number;
  readonly average: number;
  /** mg·h/L */
  readonly auc24: number;
  /** AUC over an interval at steady state ÷ over the first one. */
  readonly accumulation: number;
  readonly timeTo90H: number;
}

export interface RecordProfile {
  /** The formulas of the kinetics with the patient's numbers in them. */
  readonly parameters: readonly {
    readonly name: string;
    readonly symbol: string;
    readonly words: string;
    readonly value: number;
    readonly unit: UnitCode;
  }[];
  /** null where it depends on the level. */
  readonly halfLifeH: number | null;
  /** From the first dose. */
  readonly course: Curve;
  /** One interval at steady state, from a dose; null where there is none. */
  readonly steady: Curve | null;
  /** null where more is taken than can ever be eliminated. */
  readonly readings: RecordReadings | null;
}

/**
 * What a record predicts for a reference patient who takes one dose of one product at one interval.
 * Issues: those of the formulas (what the patient lacks among them), "record-course-amount", "record-course-interval", and
 * "record-profile-failed" where the figures are outside what the kinetics take. Accuracy: as modelProfile and modelSteadyState.
 */
export function recordProfile(
  record: MedicineRecord,
  patient: ReferencePatient,
  course: RecordCourse,
): Result<RecordProfile> {
  const faults = courseFaults(course);
  const covariates = referenceCovariates(patient);
  const values: Record<string, number> = {};
  const parameters = kineticsFormulas(record).flatMap(({ name, symbol, words, formula }) => {
    const found = formulaEvaluate(formula, covariates);
    if (!found.ok) {
      faults.push(...found.issues.filter((each) => !faults.some((told) => isSame(told, each))));
      return [];
    }
    values[name] = found.value.value;
    return [{ name, symbol, words, value: found.value.value, unit: formula.unit }];
  });
  if (faults.length > 0) return fail(...faults);
  try {
    return succeed({ parameters, ...courseFigures(record, values, course) });
  } catch (error) {
    if (error instanceof RangeError) return fail(issue("record-profile-failed", { detail: error.message }));
    throw error;
  }
}

function courseFaults({ doseMg, intervalH }: RecordCourse): Issue[] {
  const faults: Issue[] = [];
  if (!(doseMg > 0 && doseMg <= RECORD_DOSE_MOST_MG)) {
    faults.push(issue("record-course-amount", { found: doseMg, most: RECORD_DOSE_MOST_MG }, ["doseMg"]));
  }
  if (!(intervalH >= RECORD_INTERVAL_LEAST_H && intervalH <= RECORD_INTERVAL_MOST_H)) {
    const data = { found: intervalH, least: RECORD_INTERVAL_LEAST_H, most: RECORD_INTERVAL_MOST_H };
    faults.push(issue("record-course-interval", data, ["intervalH"]));
  }
  return faults;
}

function courseFigures(
  record: MedicineRecord,
  values: KineticsValues,
  course: RecordCourse,
): Omit<RecordProfile, "parameters"> {
  const { intervalH } = course;
  const disposition = kineticsDisposition(record, values);
  const product = productOf(record, course.product);
  const active = doseMg({ value: course.doseMg, unit: "mg" }, product);
  if (!active.ok) throw new RangeError(`doseMg: ${course.doseMg} mg`);
  const inputOf = (count: number): ModelInput => ({
    absorption: productAbsorption(product),
    bioavailability: product.bioavailability.value,
    lag: product.lag.value,
    doses: Array.from({ length: count }, (_, i) => ({ time: i * intervalH, amount: active.value })),
  });
  const one = [inputOf(1)];
  const settled = modelSteadyState(disposition, one, intervalH);
  const timeTo90H = modelTimeToSteadyState(disposition, one, intervalH, 0.9).hours;
  const isSettled = settled.status === "settled";
  const wanted = isSettled ? timeTo90H + INTERVALS_AFTER * intervalH : COURSE_WITHOUT_END_H;
  const intervals = Math.ceil(Math.min(wanted, COURSE_MOST_H) / intervalH);
  const history = { dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition }], inputs: [inputOf(intervals)] };
  const timesH = curveTimes(history, 0, intervals * intervalH);
  const steadyH = Float64Array.from({ length: STEADY_POINTS + 1 }, (_, i) => (i / STEADY_POINTS) * intervalH);
  return {
    halfLifeH: modelHalfLife(disposition),
    course: { timesH, values: modelProfile(history, timesH) },
    steady: isSettled ? { timesH: steadyH, values: modelSteadyProfile(disposition, one, intervalH, steadyH) } : null,
    readings: isSettled
      ? {
          peak: settled.peak,
          peakAfterDoseH: settled.timeOfPeak,
          lowest: settled.lowest,
          average: settled.average,
          auc24: settled.average * 24,
          accumulation: settled.accumulation,
          timeTo90H,
        }
      : null,
  };
}

function isSame(a: Issue, b: Issue): boolean {
  return a.code === b.code && a.data.name === b.data.name && a.data.formula === b.data.formula;
}
