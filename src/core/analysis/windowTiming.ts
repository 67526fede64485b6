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

/** When a window's level is drawn, h after a dose: as meant, and at the earliest. */
export interface WindowDraw {
  readonly afterDoseH: number;
  readonly fromH: number;
}

/** As windowDrawH, with the earliest hour. */
export function windowDraw({ window }: Case): WindowDraw | null {
  const afterDoseH = window ? windowDrawnAt(window) : null;
  return afterDoseH === null ? null : { afterDoseH, fromH: window?.drawFrom?.value ?? afterDoseH };
}

/** Levels of a pattern at steady state so many hours after a dose: mg/L. */
export interface TimedLevels {
  readonly afterDoseH: number;
  readonly lowest: number;
  readonly highest: number;
}

/** A gap shorter than this is one of doses given together, h. */
export const TOGETHER_H = 1e-9;

/** In place of hours after a dose: the level just before the next one. */
export const BEFORE_NEXT_DOSE = Number.POSITIVE_INFINITY;

/**
 * Levels at the hour after a dose that a window is about, with no other dose between: after a dose whose next comes before the earliest hour
 * there is none. Where the next comes within the hours the level may be drawn, the level just before it. null where no dose of the pattern is
 * followed by so long a gap: the hour never comes.
 * Example: 08:00, 14:00 and 20:00, a level 12 h after a dose: the one before 08:00.
 */
export function timedLevels(
  disposition: ModelDisposition,
  inputs: readonly ModelInput[],
  periodH: number,
  { afterDoseH, fromH }: WindowDraw,
): TimedLevels | null {
  const times = gapsOf(inputs, periodH)
    .filter(({ gapH }) => gapH >= fromH - TOGETHER_H)
    .map(({ start, gapH }) => start + Math.min(afterDoseH, gapH));
  return times.length === 0 ? null : { afterDoseH, ...levelsAt(disposition, inputs, periodH, times) };
}

/** Levels so many hours after every dose, or just before the next one where that comes first: mg/L. */
export function dueLevels(
  disposition: ModelDisposition,
  inputs: readonly ModelInput[],
  periodH: number,
  afterDoseH: number,
): Pick<TimedLevels, "lowest" | "highest"> {
  const times = gapsOf(inputs, periodH).map(({ start, gapH }) => start + Math.min(afterDoseH, gapH));
  return levelsAt(disposition, inputs, periodH, times);
}

/** Each time at which doses are given, with the hours to the next. */
function gapsOf(inputs: readonly ModelInput[], periodH: number): { start: number; gapH: number }[] {
  const starts = [...new Set(inputs.flatMap((input) => input.doses.map((dose) => dose.time)))].sort((a, b) => a - b);
  return starts.flatMap((start, i) => {
    const next = i + 1 < starts.length ? starts[i + 1]! : starts[0]! + periodH;
    return next - start < TOGETHER_H ? [] : [{ start, gapH: next - start }];
  });
}

function levelsAt(
  disposition: ModelDisposition,
  inputs: readonly ModelInput[],
  periodH: number,
  times: readonly number[],
): Pick<TimedLevels, "lowest" | "highest"> {
  const levels = modelSteadyProfile(
    disposition,
    inputs,
    periodH,
    [...times].sort((a, b) => a - b),
  );
  return { lowest: Math.min(...levels), highest: Math.max(...levels) };
}
