import type { Case, Level } from "../../core/case/index.ts";
import { concentrationUnits, type MedicineRecord } from "../../core/medicine/index.ts";
import { doseLineExpand } from "../../core/regimen/index.ts";
import { fail, type Issue, issue, type Result, succeed } from "../../core/result/index.ts";
import { instantMs, instantRead, instantText } from "../../core/time/index.ts";
import type { Quantity } from "../../core/units/index.ts";
import { concentrationAsk } from "../ui/concentrationAsk.ts";
import { instantTyped } from "../ui/InstantInput.tsx";
import type { QuantityLook } from "../ui/QuantityField.tsx";
import { type QuantityDraft, quantityDraft, quantityDraftRead } from "../ui/quantityDraft.ts";

export const LEVEL_UNIT_CHOICES = ["mg/L", "ug/mL", "ug/L", "ng/mL", "umol/L", "nmol/L", "mmol/L"] as const;
export type LevelUnit = (typeof LEVEL_UNIT_CHOICES)[number];

/** A level being typed. */
export interface LevelDraft {
  readonly quantity: QuantityDraft<LevelUnit>;
  readonly at: string;
  readonly kind: Level["kind"];
}

/** A level as text that reads back to it. */
export function levelDraft(level: Level, zone: string): LevelDraft {
  return {
    quantity: quantityDraft(level.quantity, level.quantity.unit),
    at: instantTyped(level.at, zone),
    kind: level.kind,
  };
}

/** The level, or its faults: path "quantity" or "at". A level lies between the first dose given and the now line. */
export function levelDraftRead(draft: LevelDraft, value: Case): Result<Omit<Level, "id">> {
  const quantity = quantityDraftRead(draft.quantity, LEVEL_UNIT_CHOICES);
  const at = instantRead(draft.at, value.timeZone, value.now);
  const faults: Issue[] = [];
  if (!quantity.ok) faults.push(...quantity.issues.map((one) => ({ ...one, path: ["quantity"] })));
  else if (quantity.value.value <= 0) {
    const { value: found, unit } = quantity.value;
    faults.push(issue("level-not-positive", { found, unit }, ["quantity"]));
  }
  if (!at.ok) faults.push(...at.issues.map((one) => ({ ...one, path: ["at"] })));
  else faults.push(...placeFaults(at.value, value));
  if (faults.length > 0 || !quantity.ok || !at.ok) return fail(...faults);
  return succeed({ at: at.value, quantity: quantity.value, kind: draft.kind });
}

function placeFaults(at: string, value: Case): readonly Issue[] {
  const words = (ms: number) => instantText(ms, value.timeZone, "full");
  const atMs = instantMs(at);
  const nowMs = instantMs(value.now);
  if (atMs > nowMs) return [issue("level-after-now", { at: words(atMs), now: words(nowMs) }, ["at"])];
  const firstMs = firstDoseMs(value);
  if (firstMs === null) return [issue("level-no-dose", {}, ["at"])];
  return atMs < firstMs ? [issue("level-before-dose", { at: words(atMs), first: words(firstMs) }, ["at"])] : [];
}

/** When the first dose of the given lane was taken; null without any. A line whose clock times can't be placed counts from its start. */
export function firstDoseMs(value: Case): number | null {
  const untilMs = instantMs(value.now);
  const firsts = value.given.flatMap((line) => {
    const doses = doseLineExpand(line, { zone: value.timeZone, untilMs });
    if (!doses.ok) return [instantMs(line.start)];
    return doses.value.filter((dose) => dose.status !== "missed").map((dose) => dose.atMs);
  });
  return firsts.length === 0 ? null : firsts.reduce((a, b) => Math.min(a, b));
}

/** Asks about a level that is everyday for the medicine only in another unit, or far from all it is used at. */
export function levelLook(typed: Quantity<LevelUnit>, record: MedicineRecord): QuantityLook<LevelUnit> {
  const ask = concentrationAsk(typed, record);
  return ask ? { kind: "asked", ask } : { kind: "fine" };
}

/** The units offered beside the number: the record's, and any the case already has. */
export function levelUnits(value: Case, also?: LevelUnit): readonly LevelUnit[] {
  const offered = concentrationUnits(value.medicine);
  const others = [...value.levels.map((level) => level.quantity.unit), ...(also ? [also] : [])];
  return [...offered, ...LEVEL_UNIT_CHOICES.filter((unit) => !offered.includes(unit) && others.includes(unit))];
}
