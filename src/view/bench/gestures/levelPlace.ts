import { type Case, type Level, levelValueNear, levelValueStep } from "../../../core/case/index.ts";
import { instantIso, instantMs } from "../../../core/time/index.ts";
import { firstDoseMs } from "../../entry/levelDraft.ts";
import { concentrationAsk } from "../../ui/concentrationAsk.ts";
import { tokenNudge, tokenSnap } from "./tokenSnap.ts";

/** Where a level can be put: its time between the first dose given and the now line, its value on its steps. One that lies outside already may stay there. */

function within(value: Case, level: Level, ms: number): string {
  const atMs = instantMs(level.at);
  const fromMs = Math.min(atMs, firstDoseMs(value) ?? atMs);
  const toMs = Math.max(atMs, instantMs(value.now));
  return instantIso(Math.round(Math.min(Math.max(ms, fromMs), toMs)), value.timeZone);
}

/** The time nearest to one the pointer is at. */
export function levelTimeNear(value: Case, level: Level, ms: number, isFine: boolean): string {
  return within(value, level, tokenSnap(ms, isFine));
}

export function levelTimeNudged(value: Case, level: Level, direction: -1 | 1, isFine: boolean): string {
  return within(value, level, tokenNudge(instantMs(level.at), direction, isFine));
}

/** The value one step up or down. */
export function levelValueNudged(value: Case, level: Level, direction: -1 | 1): number {
  return levelValueNear(value, level, level.quantity.value + direction * levelValueStep(value, level));
}

/** A value its form would ask about is set in the form alone. */
export function levelIsAsked(value: Case, level: Level, number: number): boolean {
  return concentrationAsk({ value: number, unit: level.quantity.unit }, value.medicine) !== null;
}
