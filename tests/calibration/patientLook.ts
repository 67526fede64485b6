import type { EstimationProblem } from "../../src/core/estimation/index.ts";
import type { CalibrationModel } from "./calibrationModels.ts";
import { type ForecastBand, type PatientFit, patientFit, priorBand } from "./patientFit.ts";
import { MOST_LEVELS, simulatedPatient, simulatedProblem } from "./simulatedPatient.ts";

/** How a true value lies to a forecast of it. */
export interface ForecastLook {
  /** Forecast less truth, % of the truth. */
  readonly error: number;
  readonly isCovered: boolean;
}

/** All that is kept of one simulated patient. */
export interface PatientLook {
  readonly levels: number;
  readonly belowLimit: number;
  readonly outcome: "not-converged" | "withheld" | "importance" | "chain";
  /** Null where there were no draws. */
  readonly ranks: readonly number[] | null;
  /** For each time of the next interval, the trough last, whether the truth lies in the 50 % and in the 90 % band. */
  readonly isWithin50: readonly boolean[];
  readonly isWithin90: readonly boolean[];
  /** Of the next trough, by the typical patient and by the levels. */
  readonly typical: ForecastLook;
  readonly forecast: ForecastLook | null;
}

/** Places of the quantiles in a ForecastBand. */
const [Q05, Q25, Q50, Q75, Q95] = [0, 1, 2, 3, 4] as const;

/**
 * Patient `nth` of a model, with 1 to 4 levels by turns, and what the engine makes of it.
 * @param told what the engine is told otherwise than it is: a fault put in on purpose
 */
export function patientLook(
  model: CalibrationModel,
  nth: number,
  seed: number,
  told: Partial<EstimationProblem> = {},
): PatientLook {
  const patient = simulatedPatient(model, nth, seed);
  const levels = 1 + (Math.floor(nth / model.courses.length) % MOST_LEVELS);
  const problem = { ...simulatedProblem(model, patient, levels), ...told };
  const fit = patientFit(model, patient, problem);
  const { bandTruth, bandTypical } = patient;
  const last = bandTruth.length - 1;
  const within = (band: ForecastBand, low: number, high: number) =>
    bandTruth.map((truth, i) => truth >= band[low]![i]! && truth <= band[high]![i]!);
  const lookOf = (forecast: number, band: ForecastBand): ForecastLook => ({
    error: (100 * (forecast - bandTruth[last]!)) / bandTruth[last]!,
    isCovered: within(band, Q05, Q95)[last]!,
  });
  const prior = priorBand(model, patient, problem);
  const drawn = fit.status === "drawn" ? fit : null;
  return {
    levels,
    belowLimit: problem.levels.filter(({ kind }) => kind === "below-limit").length,
    outcome: outcomeOf(fit),
    ranks: drawn?.ranks ?? null,
    isWithin50: drawn ? within(drawn.band, Q25, Q75) : [],
    isWithin90: drawn ? within(drawn.band, Q05, Q95) : [],
    typical: lookOf(bandTypical[last]!, prior),
    forecast: drawn && lookOf(drawn.band[Q50]![last]!, drawn.band),
  };
}

function outcomeOf(fit: PatientFit): PatientLook["outcome"] {
  return fit.status === "drawn" ? fit.method : fit.status;
}
