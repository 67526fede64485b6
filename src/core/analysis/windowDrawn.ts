import type { Case } from "../case/index.ts";
import type { RecordWindow } from "../medicine/index.ts";
import { type Quantity, quantityConvert } from "../units/index.ts";
import type { LevelResult } from "./analysisTypes.ts";
import type { ConcernContext } from "./concernRule.ts";
import { isTroughTime, untilNextDose } from "./troughTime.ts";
import { sourceText } from "./typicalModel.ts";

/** When a level was drawn, beside what the case's target window is meant for. */
export type WindowDrawn =
  | { readonly kind: "as-meant" }
  /** Outside the hours after a dose that the window is for; null where one side is open. */
  | { readonly kind: "off-hours"; readonly fromH: number | null; readonly toH: number | null; readonly source: string }
  /** The window is for the level just before a dose; this one was drawn so many hours sooner. */
  | { readonly kind: "not-trough"; readonly leftH: number };

/**
 * null where the two can't be held against each other: no window; a peak, an average or an AUC that no hours after the dose are stated for; no
 * dose before the level; or no interval to judge a trough by.
 */
export function windowDrawn(
  context: Pick<ConcernContext, "case" | "given">,
  { atH, afterDoseH }: Pick<LevelResult, "atH" | "afterDoseH">,
): WindowDrawn | null {
  const { window, medicine } = context.case;
  if (!window || afterDoseH === null) return null;
  const ofRecord = recordWindow(context.case);
  const drawn = drawnBetween(window) ?? (ofRecord && drawnBetween(ofRecord));
  if (drawn) {
    const { fromH, toH } = drawn;
    const isOff = (fromH !== null && afterDoseH < fromH) || (toH !== null && afterDoseH > toH);
    const source = ofRecord ? sourceText(medicine, ofRecord.source) : window.basis;
    return isOff ? { kind: "off-hours", fromH, toH, source } : { kind: "as-meant" };
  }
  // Every level is to lie between lowest and highest.
  if (window.quantity === "lowest-and-highest") return { kind: "as-meant" };
  if (window.quantity !== "trough") return null;
  const leftH = untilNextDose(context, atH, afterDoseH);
  if (leftH === null) return null;
  return isTroughTime(afterDoseH, leftH) ? { kind: "as-meant" } : { kind: "not-trough", leftH };
}

type Drawn = { readonly [E in "drawFrom" | "drawTo"]?: Quantity | undefined };

/** The record's window that the case's is: the same quantity and ends. */
function recordWindow({ window, medicine }: Case): RecordWindow | null {
  const key = (one: Pick<RecordWindow, "quantity" | "low" | "high">) =>
    JSON.stringify([one.quantity, one.low.value, one.low.unit, one.high.value, one.high.unit]);
  return window ? (medicine.windows.find((each) => key(each) === key(window)) ?? null) : null;
}

/** The case's own times go before those of the record's window. */
function drawnBetween({ drawFrom, drawTo }: Drawn): { fromH: number | null; toH: number | null } | null {
  if (!drawFrom && !drawTo) return null;
  return { fromH: drawFrom ? quantityConvert(drawFrom, "h") : null, toH: drawTo ? quantityConvert(drawTo, "h") : null };
}
