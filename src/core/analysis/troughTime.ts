import type { ConcernContext } from "./concernRule.ts";

/** A sample before a dose is drawn within this long before it (common practice), h. */
export const BEFORE_DOSE_H = 0.5;

/** A trough is drawn in the last part of the interval: this much of it, or two hours where that is less, may be left (our own rule, common practice). */
const TROUGH_SHARE = 0.25;
const TROUGH_LEAST_H = 2;

/** Whether a level so long after a dose and so long before the next, h, counts as the one just before a dose. */
export function isTroughTime(afterDoseH: number, leftH: number): boolean {
  return leftH <= Math.max(TROUGH_LEAST_H, TROUGH_SHARE * (leftH + afterDoseH));
}

/** Hours from a level to the next dose as given; where none was given after it, the last interval goes on. null with a single dose. */
export function untilNextDose(
  { given }: Pick<ConcernContext, "given">,
  levelH: number,
  afterDoseH: number,
): number | null {
  const times = given.filter((mark) => mark.countedMg > 0).map((mark) => mark.atH);
  const next = times.find((atH) => atH >= levelH);
  if (next !== undefined) return next - levelH;
  const lastH = levelH - afterDoseH;
  const before = times.filter((atH) => atH < lastH).at(-1);
  return before === undefined ? null : Math.max(0, lastH - before - afterDoseH);
}
