import type { SteadyStateReadings } from "../analysisTypes.ts";
import { type ConcernRule, concern } from "../concernRule.ts";
import { concentrationWindow } from "../optionReadings.ts";
import { windowDraw } from "../windowTiming.ts";

/** An option whose steady state leaves the target window, judged by what the window is for. */
export const optionOutsideWindow: ConcernRule = ({ case: value, options, fit }) => {
  const { window } = value;
  if (!window) return [];
  const isArea = window.quantity === "auc24";
  const limits = isArea ? { low: window.low.value, high: window.high.value } : concentrationWindow(value);
  if (!limits) return [];
  const { low, high } = limits;
  // The lowest is not what such a window is about (windowHourNever).
  const isHourNever = ({ timed }: SteadyStateReadings) => timed === null && windowDraw(value) !== null;
  return options.flatMap((option) => {
    const settled = option.typical?.steadyState;
    // Where the order rests on this patient, the chance of lying outside is said instead (optionChanceOutside).
    if (!settled || isHourNever(settled) || (option.individual?.steadyChance && value.fit.use === "individual"))
      return [];
    const [least, most] = {
      trough: settled.timed ? [settled.timed.lowest, settled.timed.highest] : [settled.lowest, settled.lowest],
      peak: [settled.peak, settled.peak],
      average: [settled.average, settled.average],
      auc24: [settled.auc24, settled.auc24],
      "lowest-and-highest": [settled.lowest, settled.peak],
    }[window.quantity] as [number, number];
    const about = { kind: "option", id: option.id } as const;
    const data = {
      option: option.id,
      quantity: window.quantity,
      low,
      high,
      unit: isArea ? "mg.h/L" : "mg/L",
      least,
      most,
      afterDoseH: settled.timed?.afterDoseH ?? null,
      isFitted: fit.kind === "fitted",
    };
    return [
      ...(most > high ? [concern("option-above-window", "check", about, data)] : []),
      ...(least < low ? [concern("option-below-window", "check", about, data)] : []),
    ];
  });
};
