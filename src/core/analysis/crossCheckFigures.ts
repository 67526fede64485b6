import type { Case } from "../case/index.ts";
import { crossCheck, crossCheckExposure, type ModelHistory, modelProfile } from "../kinetics/index.ts";
import type { CrossCheck, DoseMark, Model, OptionResult } from "./analysisTypes.ts";
import { countedByProduct } from "./caseDoses.ts";
import { modelHistory } from "./modelInputs.ts";
import { concentrationWindow } from "./optionReadings.ts";

/** Figures that differ by more than this share of the largest level are a concern. */
export const CROSS_CHECK_TOLERANCE = 1e-6;

/** Points of each displayed curve that are computed by both roads. */
const POINTS = 120;

/**
 * The displayed profile and exposure once more by plain numerical integration, and how far the two roads are apart:
 * levels, highest, lowest and average as a share of the largest level; hours in the window as a share of the span.
 */
export function crossCheckFigures(
  value: Case,
  model: Model,
  given: readonly DoseMark[],
  options: readonly OptionResult[],
  clock: { readonly fromH: number; readonly nowH: number; readonly toH: number },
): CrossCheck {
  let worst = 0;
  let where = "given";
  const note = (difference: number, name: string) => {
    // Not a number is as wrong as can be.
    const found = Number.isNaN(difference) ? Number.POSITIVE_INFINITY : difference;
    if (found > worst) {
      worst = found;
      where = name;
    }
  };
  if (clock.nowH > clock.fromH) {
    note(levelsApart(modelHistory(model, countedByProduct(given)), clock.fromH, clock.nowH), "given");
  }
  for (const option of options) {
    const span = option.typical?.span;
    if (!span) continue;
    const history = modelHistory(model, countedByProduct([...given, ...option.doses]));
    note(levelsApart(history, span.fromH, span.toH), option.id);
    const other = crossCheckExposure(history, span.fromH, span.toH, concentrationWindow(value) ?? undefined);
    const largest = Math.max(other.peak, Number.MIN_VALUE);
    const length = span.toH - span.fromH;
    note(Math.abs(other.peak - span.peak) / largest, option.id);
    note(Math.abs(other.lowest - span.lowest) / largest, option.id);
    note(Math.abs(other.average - span.average) / largest, option.id);
    if (span.hoursWithin !== null) {
      note(Math.abs(other.hoursBelow - (span.hoursBelow ?? 0)) / length, option.id);
      note(Math.abs(other.hoursWithin - span.hoursWithin) / length, option.id);
      note(Math.abs(other.hoursAbove - (span.hoursAbove ?? 0)) / length, option.id);
    }
  }
  return { worst, where, isAgreed: worst <= CROSS_CHECK_TOLERANCE };
}

function levelsApart(history: ModelHistory, fromH: number, toH: number): number {
  const times = Float64Array.from({ length: POINTS + 1 }, (_, i) => fromH + ((toH - fromH) * i) / POINTS);
  const one = modelProfile(history, times);
  const other = crossCheck(history, times);
  let largest = 0;
  let apart = 0;
  for (let i = 0; i < times.length; i++) {
    largest = Math.max(largest, one[i]!, other[i]!);
    apart = Math.max(apart, Math.abs(one[i]! - other[i]!));
  }
  return largest === 0 ? 0 : apart / largest;
}
