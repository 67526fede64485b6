import type { Case, TargetWindow } from "../case/index.ts";
import { type ModelDisposition, type ModelInput, modelSteadyProfile } from "../kinetics/index.ts";

/**
 * Hours after a dose at which the level is taken that the case's window is about: the middle of the times it may be drawn between.
 * null: not timed, or no upper end is stated ("at least 6 hours after"), and the level just before the next dose is meant.
 * Example: a lithium window drawn 11 to 13 h after the dose: 12.
 */
export function windowDrawH({ window }: Case): number | null {
  return window ? windowDrawnAt(window) : null;
}

/** The same of a window by itself. */
export function windowDrawnAt({ quantity, drawFrom, drawTo }: TargetWindow): number | null {
  return quantity === "trough" && drawFrom && drawTo ? (drawFrom.value + drawTo.value) / 2 : null;
}

/** Levels of a pattern at steady state so many hours after each dose: mg/L. */
export interface TimedLevels {
  readonly afterDoseH: number;
  readonly lowest: number;
  readonly highest: number;
}

/** A gap shorter than this is one of doses given together, h. */
export const TOGETHER_H = 1e-9;

/** In place of hours after a dose: the level just before the next one. */
export const BEFORE_NEXT_DOSE = Number.POSITIVE_INFINITY;

/** Where the next dose comes first, the level just before it: that is when it would be drawn. */
export function timedLevels(
  disposition: ModelDisposition,
  inputs: readonly ModelInput[],
  periodH: number,
  afterDoseH: number,
): TimedLevels {
  const starts = [...new Set(inputs.flatMap((input) => input.doses.map((dose) => dose.time)))].sort((a, b) => a - b);
  const times = starts.flatMap((start, i) => {
    const next = i + 1 < starts.length ? starts[i + 1]! : starts[0]! + periodH;
    return next - start < TOGETHER_H ? [] : [start + Math.min(afterDoseH, next - start)];
  });
  const levels = modelSteadyProfile(
    disposition,
    inputs,
    periodH,
    times.sort((a, b) => a - b),
  );
  return { afterDoseH, lowest: Math.min(...levels), highest: Math.max(...levels) };
}
