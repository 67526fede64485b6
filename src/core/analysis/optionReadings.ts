import type { Case } from "../case/index.ts";
import {
  type Course,
  type Disposition,
  historyExposure,
  patternSteadyState,
  timeToSteadyState,
} from "../kinetics/index.ts";
import type { DoseLine } from "../regimen/index.ts";
import type { Model, OptionReadings, SpanReadings, SteadyStateReadings } from "./analysisTypes.ts";
import { modelCourses, modelDisposition } from "./modelCourses.ts";
import { type RegimenPattern, regimenPattern } from "./regimenPattern.ts";

const HOUR_MS = 3_600_000;

export interface ReadingsClock {
  readonly originMs: number;
  readonly fromH: number;
  readonly toH: number;
}

/** Readings of one option for one reading of the model: over the stated span, and of the pattern it settles into. */
export function optionReadings(
  value: Case,
  lines: readonly DoseLine[],
  doses: ReadonlyMap<string, readonly { readonly time: number; readonly amount: number }[]>,
  model: Model,
  clock: ReadingsClock,
): OptionReadings {
  const disposition = modelDisposition(model);
  const span = spanReadings(disposition, modelCourses(model, doses), clock, concentrationWindow(value));
  const pattern = regimenPattern(value, lines);
  const settled = pattern.ok ? steadyStateReadings(disposition, model, pattern.pattern, clock.originMs) : null;
  return {
    span,
    steadyState: settled,
    noSteadyState: pattern.ok ? null : pattern.reason,
    dailyDoseMg: pattern.ok ? (pattern.pattern.dosePerPeriodMg * 24) / pattern.pattern.periodH : null,
    halfLifeH: model.halfLife.value,
  };
}

/** The case's window in mg/L, or null when it has none or it is about the AUC. */
export function concentrationWindow(value: Case): { readonly low: number; readonly high: number } | null {
  const { window } = value;
  if (window?.low.unit !== "mg/L" || window.high.unit !== "mg/L") return null;
  return { low: window.low.value, high: window.high.value };
}

function spanReadings(
  disposition: Disposition,
  courses: readonly Course[],
  clock: ReadingsClock,
  window: { readonly low: number; readonly high: number } | null,
): SpanReadings {
  const found = historyExposure(disposition, courses, clock.fromH, clock.toH, window ?? undefined);
  return {
    fromH: clock.fromH,
    toH: clock.toH,
    peak: found.peak,
    timeOfPeakH: found.timeOfPeak,
    lowest: found.lowest,
    timeOfLowestH: found.timeOfLowest,
    average: found.average,
    auc: found.auc,
    auc24: found.average * 24,
    hoursBelow: window ? found.hoursBelow : null,
    hoursWithin: window ? found.hoursWithin : null,
    hoursAbove: window ? found.hoursAbove : null,
  };
}

function steadyStateReadings(
  disposition: Disposition,
  model: Model,
  pattern: RegimenPattern,
  originMs: number,
): SteadyStateReadings {
  const courses = modelCourses(model, pattern.courses);
  const settled = patternSteadyState(disposition, courses, pattern.periodH);
  const doseTimes = courses.flatMap((course) => course.doses.map((dose) => dose.time));
  const slowest = courses
    .map((course) => timeToSteadyState({ ...course, ...disposition }, 0.9))
    .reduce((a, b) => (b.hours > a.hours ? b : a));
  return {
    periodH: pattern.periodH,
    dosePerPeriodMg: pattern.dosePerPeriodMg,
    peak: settled.peak,
    peakAfterDoseH: sinceDose(settled.timeOfPeak, doseTimes, pattern.periodH),
    lowest: settled.lowest,
    lowestAfterDoseH: sinceDose(settled.timeOfLowest, doseTimes, pattern.periodH),
    average: settled.average,
    auc24: settled.average * 24,
    swing: settled.swing,
    fluctuation: settled.fluctuation,
    accumulation: settled.accumulation,
    timeTo90H: slowest.hours,
    steady90AtH: (pattern.startMs - originMs) / HOUR_MS + slowest.hours,
    slower: slowest.slower,
  };
}

/** A gap shorter than this (well under a second) is rounding: the time is the dose's own. h */
const SAME_INSTANT_H = 1e-9;

/** Hours from the latest dose strictly before `time` in a pattern that repeats every `period` hours. */
function sinceDose(time: number, doseTimes: readonly number[], period: number): number {
  return Math.min(
    ...doseTimes.map((dose) => {
      const gap = (((time - dose) % period) + period) % period;
      return gap < SAME_INSTANT_H ? period : gap;
    }),
  );
}
