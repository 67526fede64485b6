import type { EstimationLevel, EstimationProblem } from "../../src/core/estimation/index.ts";
import { type ModelHistory, modelProfile, modelScaled } from "../../src/core/kinetics/index.ts";
import { choleskyFactor, type SeededRandom, seededRandom } from "../../src/core/numerics/index.ts";
import { type CalibrationModel, calibrationInput } from "./calibrationModels.ts";

/** Levels simulated a patient; a fit uses the first few. */
export const MOST_LEVELS = 4;
/** Points of the interval that is forecast, its end included. */
export const BAND_POINTS = 24;

/** What is prescribed and what is done: invented, as is usual on a ward. */
const FEWEST_DOSES = 5;
const MOST_DOSES = 14;
const MISSED = 0.1;
/** Standard deviation and bound of how far from its time a dose is taken, as a part of the interval. */
const JITTER = { sd: 0.06, most: 0.2 };
/** Levels are drawn after one of the last so many doses taken. */
const LAST_DOSES = 3;

export interface SimulatedPatient {
  readonly seed: number;
  /** η drawn from the prior, in the order of the model's `random`. */
  readonly truth: readonly number[];
  /** The typical patient with the doses taken before now. */
  readonly given: ModelHistory;
  /** The same with the dose at now: what the forecast is of. */
  readonly next: ModelHistory;
  /** In the order they were thought of, not of time: so that the first of them lies where the second may. */
  readonly levels: readonly EstimationLevel[];
  /** From just after the dose at now to just before the one after it, h; the last is the next trough. */
  readonly bandTimes: readonly number[];
  /** mg/L at bandTimes, without error: of this patient, and of the typical one. */
  readonly bandTruth: readonly number[];
  readonly bandTypical: readonly number[];
}

/**
 * A patient drawn from the prior, who takes doses as patients do and has levels drawn when they are drawn.
 * Doses and times don't depend on the η, so that the posterior given them is the posterior given the levels.
 */
export function simulatedPatient(model: CalibrationModel, nth: number, seed: number): SimulatedPatient {
  const random = seededRandom(seed);
  const truth = drawnEta(model, random);
  const course = model.courses[nth % model.courses.length]!;
  const { intervalH } = course;
  const now = intervalH * whole(random, FEWEST_DOSES, MOST_DOSES);
  const taken: number[] = [];
  for (let time = 0; time < now; time += intervalH) {
    const isMissed = random.uniform() < MISSED;
    const late = Math.max(-JITTER.most, Math.min(JITTER.most, JITTER.sd * random.normal())) * intervalH;
    if (time === 0) taken.push(0);
    else if (!isMissed) taken.push(time + late);
  }
  const historyOf = (times: readonly number[]): ModelHistory => ({
    dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition: model.disposition }],
    inputs: [calibrationInput(model, course, times)],
  });
  const given = historyOf(taken);
  const next = historyOf([...taken, now]);
  const names = model.random.map(({ name }) => name);
  const own = modelScaled(given, names, truth);
  const levels = Array.from({ length: MOST_LEVELS }, (): EstimationLevel => {
    const time = levelTime(random, taken, now);
    const level = modelProfile(own, [time])[0]!;
    const { additive, proportional } = model.residual;
    const measured = level + Math.hypot(additive, proportional * level) * random.normal();
    return measured < model.limit
      ? { time, value: model.limit, kind: "below-limit" }
      : { time, value: measured, kind: "measured" };
  });
  const bandTimes = Array.from({ length: BAND_POINTS }, (_, i) => now + ((i + 1) / BAND_POINTS) * intervalH);
  return {
    seed,
    truth,
    given,
    next,
    levels,
    bandTimes,
    bandTruth: [...modelProfile(modelScaled(next, names, truth), bandTimes)],
    bandTypical: [...modelProfile(next, bandTimes)],
  };
}

/** The patient's levels, the first few of them, as the engine takes them. */
export function simulatedProblem(
  model: CalibrationModel,
  patient: SimulatedPatient,
  levels: number,
): EstimationProblem {
  return {
    history: patient.given,
    random: model.random,
    correlation: model.correlation,
    residual: model.residual,
    levels: patient.levels.slice(0, levels),
    residualModel: "normal",
  };
}

/** η = ω·(L·z), L·Lᵀ the correlations: written again here, so that the simulation rests on nothing of the estimation. */
function drawnEta({ random: parameters, correlation }: CalibrationModel, random: SeededRandom): number[] {
  const factor = choleskyFactor(correlation);
  if (!factor) throw new RangeError("correlation: not positive definite");
  const z = parameters.map(() => random.normal());
  return parameters.map(({ omega }, i) => omega * factor[i]!.reduce((sum, each, j) => sum + each * z[j]!, 0));
}

/** Half just before a dose, a quarter about the peak (1 to 4 h after one), a quarter anywhere between two. */
function levelTime(random: SeededRandom, taken: readonly number[], now: number): number {
  const back = whole(random, 1, Math.min(LAST_DOSES, taken.length));
  const dose = taken[taken.length - back]!;
  const after = back === 1 ? now : taken[taken.length - back + 1]!;
  const kind = random.uniform();
  const part = random.uniform();
  if (kind < 0.5) return after - Math.min(0.5, after - dose) * part;
  const gap = after - dose;
  return dose + (kind < 0.75 ? 1 + Math.min(3, gap - 1) * part : gap * part);
}

/** A whole number, least to most, each as likely. */
function whole(random: SeededRandom, least: number, most: number): number {
  return least + Math.min(Math.floor(random.uniform() * (most - least + 1)), most - least);
}
