import { type Analysis, derive, type Model, type OptionReadings } from "../core/analysis/index.ts";
import { type Case, caseParse } from "../core/case/index.ts";
import { issueMessage } from "../core/messages/index.ts";
import { instantIso } from "../core/time/index.ts";
import type { UnitCode } from "../core/units/index.ts";
import { recomputeFit, recomputeIndividual, recomputeLevelFit } from "./recomputeFit.ts";

/** What `npm run -s recompute -- FILE` prints: the same figures as the screens and the sheet, from the same pipeline. */
export function recompute(text: string): { ok: true; output: unknown } | { ok: false; lines: readonly string[] } {
  const parsed = caseParse(text);
  if (!parsed.ok) {
    return {
      ok: false,
      lines: parsed.issues.map((issue) => `${issue.path.join(".") || "file"}: ${issueMessage(issue)}`),
    };
  }
  return {
    ok: true,
    output: recomputeOutput(parsed.value, derive(parsed.value, { isFitted: true, isCrossChecked: true })),
  };
}

const HOUR_MS = 3_600_000;

function quantity(value: number | null, unit: UnitCode) {
  return value === null ? null : { value, unit };
}

function recomputeOutput(value: Case, analysis: Analysis) {
  const at = (hours: number) => instantIso(analysis.clock.originMs + Math.round(hours * HOUR_MS), value.timeZone);
  return {
    label: value.label,
    engine: analysis.engine,
    fingerprint: analysis.fingerprint,
    medicine: { id: value.medicine.id, recordVersion: value.medicine.recordVersion },
    kinetics: analysis.typical && {
      kind: analysis.typical.kind,
      parameters: Object.fromEntries(
        analysis.typical.parameters.map(({ symbol, figure }) => [symbol, quantity(figure.value, figure.unit)]),
      ),
      changes: analysis.typical.dispositions.slice(1).map((each) => at(each.from)),
    },
    thisPatient: recomputeFit(analysis.fit, value.fit.use),
    span: { from: at(analysis.clock.nowH), to: at(analysis.clock.readingsToH) },
    patient: Object.fromEntries(
      (["weight", "creatinine", "idealWeight", "adjustedWeight", "bodyMassIndex", "creatinineClearance"] as const).map(
        (name) => {
          const figure = analysis.patient[name];
          return [name, figure && { value: figure.value, unit: figure.unit }];
        },
      ),
    ),
    options: Object.fromEntries(
      analysis.options.map((option) => [
        option.id,
        {
          chosen: value.options.find((candidate) => candidate.id === option.id)?.chosen ?? false,
          typical: figures(option.typical, analysis.typical, at),
          individual: recomputeIndividual(option.individual, analysis.fit),
        },
      ]),
    ),
    levels: analysis.levels.map((level) => ({
      id: level.id,
      at: at(level.atH),
      measured: quantity(level.measured, "mg/L"),
      predicted: quantity(level.predicted, "mg/L"),
      difference: quantity(level.difference, "mg/L"),
      excluded: level.excluded,
      individual: recomputeLevelFit(level.fit),
    })),
    crossCheck: analysis.crossCheck && {
      isAgreed: analysis.crossCheck.isAgreed,
      worst: quantity(analysis.crossCheck.worst, "1"),
    },
    concerns: analysis.concerns.map((concern) => concern.id),
  };
}

function figures(readings: OptionReadings | null, model: Model | null, at: (hours: number) => string) {
  if (!readings || !model) return null;
  const { span, steadyState } = readings;
  return {
    peak: quantity(span.peak, "mg/L"),
    timeOfPeak: at(span.timeOfPeakH),
    trough: quantity(span.lowest, "mg/L"),
    timeOfTrough: at(span.timeOfLowestH),
    average: quantity(span.average, "mg/L"),
    auc: quantity(span.auc, "mg.h/L"),
    auc24: quantity(span.auc24, "mg.h/L"),
    halfLife: quantity(readings.halfLifeH, "h"),
    clearance: quantity(model.clearance?.value ?? null, "L/h"),
    volume: quantity(model.volume.value, "L"),
    hoursBelow: quantity(span.hoursBelow, "h"),
    hoursWithin: quantity(span.hoursWithin, "h"),
    hoursAbove: quantity(span.hoursAbove, "h"),
    dailyDose: quantity(readings.dailyDoseMg, "mg"),
    steadyState: steadyState
      ? {
          period: quantity(steadyState.periodH, "h"),
          peak: quantity(steadyState.peak, "mg/L"),
          peakAfterDose: quantity(steadyState.peakAfterDoseH, "h"),
          trough: quantity(steadyState.lowest, "mg/L"),
          troughAfterDose: quantity(steadyState.lowestAfterDoseH, "h"),
          average: quantity(steadyState.average, "mg/L"),
          auc24: quantity(steadyState.auc24, "mg.h/L"),
          accumulation: quantity(steadyState.accumulation, "1"),
          swing: quantity(steadyState.swing, "1"),
          fluctuation: quantity(steadyState.fluctuation, "1"),
          timeTo90: quantity(steadyState.timeTo90H, "h"),
          steady90From: at(steadyState.steady90AtH),
          slower: steadyState.slower,
          timed: steadyState.timed && {
            afterDose: quantity(steadyState.timed.afterDoseH, "h"),
            lowest: quantity(steadyState.timed.lowest, "mg/L"),
            highest: quantity(steadyState.timed.highest, "mg/L"),
          },
        }
      : { none: readings.noSteadyState },
  };
}
