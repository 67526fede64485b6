import type { TargetWindow } from "../../core/case/index.ts";
import { concentrationUnits, LATEST_DRAW_H, type MedicineRecord } from "../../core/medicine/index.ts";
import { fail, type Issue, issue, type Result, succeed } from "../../core/result/index.ts";
import { numberPlain, numberRead, type Quantity, quantityConvert, unitSpoken } from "../../core/units/index.ts";
import { concentrationAsk } from "./concentrationAsk.ts";
import type { FieldAsk } from "./fieldQuestion.ts";

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
  /** Hours after the dose between which a trough's level is drawn; both empty: just before the next dose. */
  readonly drawFrom: string;
  readonly drawTo: string;
  readonly basis: string;
}

export const EMPTY_WINDOW: WindowDraft = {
  about: null,
  low: "",
  high: "",
  unit: "mg/L",
  drawFrom: "",
  drawTo: "",
  basis: "",
};

export function windowDraft(window: TargetWindow): WindowDraft {
  return {
    about: window.quantity,
    low: numberPlain(window.low.value),
    high: numberPlain(window.high.value),
    unit: window.low.unit,
    drawFrom: window.drawFrom ? numberPlain(window.drawFrom.value) : "",
    drawTo: window.drawTo ? numberPlain(window.drawTo.value) : "",
    basis: window.basis,
  };
}

export function windowUnits(about: WindowDraft["about"]): readonly WindowUnit[] {
  return WINDOW_UNITS.filter((unit) => (unit === "mg.h/L") === (about === "auc24"));
}

/** The units offered: those a concentration of this medicine may be typed in, and the one the draft has. */
export function windowUnitsFor(draft: WindowDraft, record: MedicineRecord): readonly WindowUnit[] {
  if (draft.about === "auc24") return windowUnits(draft.about);
  const offered: readonly WindowUnit[] = concentrationUnits(record);
  return offered.includes(draft.unit) || draft.unit === "mg.h/L" ? offered : [...offered, draft.unit];
}

/** An empty draft in the unit the medicine is read in. */
export function windowDraftEmpty(record: MedicineRecord): WindowDraft {
  return { ...EMPTY_WINDOW, unit: record.displayUnit };
}

/** Asks about a window whose middle is everyday for the medicine only in another unit, or far from all it is used at. */
export function windowAsk(draft: WindowDraft, record: MedicineRecord): FieldAsk<WindowDraft> | null {
  const { unit, about } = draft;
  const [low, high] = [numberRead(draft.low), numberRead(draft.high)];
  if (about === "auc24" || unit === "mg.h/L" || !low.ok || !high.ok) return null;
  const print = (value: Quantity) =>
    `${numberPlain(low.value)} to ${numberPlain(high.value)}\u00a0${unitSpoken(value.unit, "screen")}`;
  const ask = concentrationAsk({ value: (low.value + high.value) / 2, unit }, record, print);
  return (
    ask && {
      ...ask,
      answers: ask.answers.map((answer) => ({ ...answer, value: { ...draft, unit: answer.value.unit } })),
    }
  );
}

/** The window as stored, or an issue a field: path "about", "low", "high", "drawFrom", "drawTo" or "basis". */
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
  const drawn = drawnRead(draft);
  if (!drawn.ok) faults.push(...drawn.issues);
  if (faults.length > 0 || about === null || !low.ok || !high.ok || !drawn.ok) return fail(...faults);
  const stored = STORED[unit] ?? (unit as TargetWindow["low"]["unit"]);
  const end = (value: number) => ({ value: quantityConvert({ value, unit }, stored), unit: stored });
  return succeed({ quantity: about, low: end(low.value), high: end(high.value), ...drawn.value, basis });
}

type Drawn = Pick<TargetWindow, "drawFrom" | "drawTo">;

/** The hours after the dose, of a trough only; a first hour alone is "so many hours or more", a second alone says nothing. */
function drawnRead({ about, drawFrom, drawTo }: WindowDraft): Result<Drawn> {
  const typed = [["drawFrom", drawFrom.trim()] as const, ["drawTo", drawTo.trim()] as const];
  if (about !== "trough" || typed.every(([, text]) => text === "")) return succeed({});
  if (drawFrom.trim() === "") return fail(issue("window-draw-from-missing", {}, ["drawFrom"]));
  const drawn: { drawFrom?: Drawn["drawFrom"]; drawTo?: Drawn["drawTo"] } = {};
  const faults: Issue[] = [];
  for (const [name, text] of typed) {
    if (text === "") continue;
    const read = numberRead(text);
    if (!read.ok) faults.push(...read.issues.map((one) => ({ ...one, path: [name] })));
    else if (!(read.value >= 0 && read.value <= LATEST_DRAW_H))
      faults.push(issue("window-draw-hours", { found: read.value, most: LATEST_DRAW_H }, [name]));
    else drawn[name] = { value: read.value, unit: "h" };
  }
  if (drawn.drawFrom && drawn.drawTo && drawn.drawFrom.value >= drawn.drawTo.value)
    faults.push(issue("window-draw-order", { from: drawn.drawFrom.value, to: drawn.drawTo.value }, ["drawTo"]));
  return faults.length > 0 ? fail(...faults) : succeed(drawn);
}
