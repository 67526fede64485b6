import { decimalOf } from "../units/index.ts";
import type { Case, Level } from "./caseSchema.ts";

/**
 * The step a level's value is moved in: one unit in the last place it was typed with.
 * step = 10^-(most decimals of any level of the case in the same unit); a number is kept without its trailing zeros, so that "5.0" alone
 * can't say that it was read to tenths, and the levels beside it can.
 *
 * @returns in the level's own unit, 1 or a negative power of ten. Example: 5 mg/L beside 5.3 mg/L: 0.1 mg/L; alone: 1 mg/L.
 */
export function levelValueStep(value: Pick<Case, "levels">, level: Pick<Level, "quantity">): number {
  return 1 / 10 ** decimalsOf(value, level);
}

/**
 * The value on the level's steps nearest to `toward`, never below one step: a level of 0 is no level.
 *
 * @param toward in the level's own unit, finite
 * @returns in the level's own unit, with no more decimals than the step. Example: steps of 0.1, toward 5.5512: 5.6; toward -3: 0.1.
 */
export function levelValueNear(value: Pick<Case, "levels">, level: Pick<Level, "quantity">, toward: number): number {
  if (!Number.isFinite(toward)) throw new RangeError(`toward: ${toward} ${level.quantity.unit}; allowed finite`);
  const decimals = decimalsOf(value, level);
  const steps = Math.max(1, Math.round(toward * 10 ** decimals));
  return Number((steps / 10 ** decimals).toFixed(decimals));
}

/** toFixed goes no further, and no assay does. */
const MOST_DECIMALS = 12;

function decimalsOf({ levels }: Pick<Case, "levels">, { quantity }: Pick<Level, "quantity">): number {
  const beside = levels.filter((each) => each.quantity.unit === quantity.unit).map((each) => each.quantity.value);
  return Math.min(MOST_DECIMALS, Math.max(0, ...[quantity.value, ...beside].map((each) => -decimalOf(each).exponent)));
}
