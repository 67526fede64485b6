import type { Case } from "../case/index.ts";
import { concentrationWindow } from "./optionReadings.ts";

/** The edges of the case's window in the unit of what it is about: mg/L, or mg·h/L of an AUC; null without a window. */
export function windowLimits(value: Case): { readonly low: number; readonly high: number } | null {
  const { window } = value;
  if (window === undefined) return null;
  if (window.quantity === "auc24") return { low: window.low.value, high: window.high.value };
  return concentrationWindow(value);
}
