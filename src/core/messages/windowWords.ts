import { windowDrawnAt } from "../analysis/index.ts";
import type { TargetWindow } from "../case/index.ts";
import type { DisplayUnit } from "../medicine/index.ts";
import { numberPrint, quantityConvert, unitDimension, unitSpoken } from "../units/index.ts";

/** What a target window is about, in words. */
const WORDS: Readonly<Record<TargetWindow["quantity"], string>> = {
  trough: "lowest",
  peak: "highest",
  average: "average",
  auc24: "AUC in 24 hours",
  "lowest-and-highest": "lowest and highest",
};

export function windowQuantityWord(quantity: TargetWindow["quantity"]): string {
  return WORDS[quantity];
}

/** The same, or where the level is taken at an hour after the dose: "12 hours after the dose". */
export function windowPointWords(quantity: TargetWindow["quantity"], afterDoseH: number | null): string {
  return afterDoseH === null
    ? windowQuantityWord(quantity)
    : `${numberPrint(afterDoseH)} ${afterDoseH === 1 ? "hour" : "hours"} after the dose`;
}

/** What a window is about: "lowest"; "12 hours after the dose" where its level is drawn then. */
export function windowAboutWords(window: TargetWindow): string {
  return windowPointWords(window.quantity, windowDrawnAt(window));
}

/** "5 to 15 mg/L"; a concentration in the unit the medicine is read in, but one that was stated in a molar unit as it was stated. */
export function windowRangeWords({ low, high }: TargetWindow, medicineUnit: DisplayUnit): string {
  if (low.unit === "mg.h/L" || high.unit === "mg.h/L") {
    return `${numberPrint(low.value, {})} to ${numberPrint(high.value, {})} mg·h/L`;
  }
  const shown = unitDimension(low.unit) === unitDimension(medicineUnit) ? medicineUnit : low.unit;
  const figure = (end: typeof low) => numberPrint(quantityConvert(end, shown), {});
  return `${figure(low)} to ${figure(high)} ${unitSpoken(shown, "screen")}`;
}

/** Beside hours below, within and above a window that is meant for one point of the curve. */
export function windowRemarkWords(window: TargetWindow): string {
  const at = windowDrawnAt(window);
  return `The window is meant for the ${at === null ? "" : "level "}${windowAboutWords(window)}; the hours are those of the whole curve`;
}
