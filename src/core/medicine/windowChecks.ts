import { DISPLAY_UNITS, type RecordWindow } from "./medicineRecord.ts";
import { boundsFaults, type FaultPath, type RecordFault } from "./recordFault.ts";

/** Shared with the target window of a case: one unit for both ends, which fits what the window is about, and low below high. */
export function windowChecks(
  { quantity, low, high }: Pick<RecordWindow, "quantity" | "low" | "high">,
  path: FaultPath,
): RecordFault[] {
  const allowed: readonly string[] = quantity === "auc24" ? ["mg.h/L"] : DISPLAY_UNITS;
  const faults: RecordFault[] = [];
  for (const [end, { unit }] of [["low", low] as const, ["high", high] as const]) {
    if (!allowed.includes(unit))
      faults.push({ code: "window-unit", path: [...path, end, "unit"], data: { found: unit, allowed, quantity } });
  }
  if (faults.length === 0 && low.unit !== high.unit) {
    const data = { low: low.unit, high: high.unit };
    faults.push({ code: "window-units-differ", path: [...path, "high", "unit"], data });
  }
  if (low.value < 0 || low.value >= high.value) {
    faults.push({ code: "window-order", path, data: { low: low.value, high: high.value, unit: low.unit } });
  }
  return faults;
}

/** A day and more: some levels are drawn before the next dose of a long interval. h */
export const LATEST_DRAW_H = 168;

/** The window of a record, and the hours between which its level is drawn. */
export function recordWindowChecks(window: RecordWindow, path: FaultPath): RecordFault[] {
  return [...windowChecks(window, path), ...windowDrawChecks(window, path)];
}

type Hours = Parameters<typeof boundsFaults>[0];

/** The hours alone, shared with the target window of a case. */
export function windowDrawChecks(
  { drawFrom, drawTo }: { readonly drawFrom?: Hours; readonly drawTo?: Hours },
  path: FaultPath,
): RecordFault[] {
  const hours = { unit: "h", least: 0, most: LATEST_DRAW_H } as const;
  const faults = [
    ...boundsFaults(drawFrom, hours, [...path, "drawFrom"]),
    ...boundsFaults(drawTo, hours, [...path, "drawTo"]),
  ];
  if (drawFrom && drawTo && drawFrom.value >= drawTo.value) {
    faults.push({ code: "window-draw-order", path, data: { from: drawFrom.value, to: drawTo.value } });
  }
  return faults;
}
