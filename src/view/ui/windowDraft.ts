import type { TargetWindow } from "../../core/case/index.ts";
import { fail, type Issue, issue, type Result, succeed } from "../../core/result/index.ts";
import { numberPlain, numberRead, quantityConvert, unitSpoken } from "../../core/units/index.ts";

export const WINDOW_UNITS = ["mg/L", "ug/mL", "ug/L", "ng/mL", "umol/L", "nmol/L", "mmol/L", "mg.h/L"] as const;
export type WindowUnit = (typeof WINDOW_UNITS)[number];

/** Units typed that a case doesn't hold, with the one it is stored in: the same amount by another name. */
const STORED: Partial<Record<WindowUnit, "mg/L" | "ug/L">> = { "ug/mL": "mg/L", "ng/mL": "ug/L" };

/** A window being typed. A case stores it in the unit it was typed in. */
export interface WindowDraft {
  readonly about: TargetWindow["quantity"] | null;
  readonly low: string;
  readonly high: string;
  readonly unit: WindowUnit;
  readonly basis: string;
}

export const EMPTY_WINDOW: WindowDraft = { about: null, low: "", high: "", unit: "mg/L", basis: "" };

export function windowDraft(window: TargetWindow): WindowDraft {
  return {
    about: window.quantity,
    low: numberPlain(window.low.value),
    high: numberPlain(window.high.value),
    unit: window.low.unit,
    basis: window.basis,
  };
}

export function windowUnits(about: WindowDraft["about"]): readonly WindowUnit[] {
  return WINDOW_UNITS.filter((unit) => (unit === "mg.h/L") === (about === "auc24"));
}

/** The window as stored, or an issue a field: path "about", "low", "high" or "basis". */
export function windowDraftRead(draft: WindowDraft): Result<TargetWindow> {
  const { about, unit } = draft;
  const low = numberRead(draft.low);
  const high = numberRead(draft.high);
  const basis = draft.basis.trim();
  const faults: Issue[] = [
    ...(about === null ? [issue("window-about-missing", {}, ["about"])] : []),
    ...(low.ok ? [] : low.issues.map((one) => ({ ...one, path: ["low"] }))),
    ...(high.ok ? [] : high.issues.map((one) => ({ ...one, path: ["high"] }))),
    ...(basis === "" ? [issue("window-basis-missing", {}, ["basis"])] : []),
  ];
  if (low.ok && high.ok && !(low.value >= 0 && low.value < high.value)) {
    const data = { low: low.value, high: high.value, unit: unitSpoken(unit, "screen") };
    faults.push(issue("window-ends", data, ["high"]));
  }
  if (faults.length > 0 || about === null || !low.ok || !high.ok) return fail(...faults);
  const stored = STORED[unit] ?? (unit as TargetWindow["low"]["unit"]);
  const end = (value: number) => ({ value: quantityConvert({ value, unit }, stored), unit: stored });
  return succeed({ quantity: about, low: end(low.value), high: end(high.value), basis });
}
