import type { Case } from "../../case/index.ts";
import type { RecordWindow } from "../../medicine/index.ts";
import { type Quantity, quantityConvert } from "../../units/index.ts";
import { type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { isTroughTime, untilNextDose } from "../troughTime.ts";
import { sourceText } from "../typicalModel.ts";

/** A level drawn at another time after the dose than the window is about: the two are not to be compared as they stand. */
export const windowSampling: ConcernRule = (context) => {
  const { window } = context.case;
  if (!window) return [];
  const earliest = context.case.medicine.earliestSample;
  const ofRecord = recordWindow(context.case);
  const drawn = drawnBetween(window) ?? (ofRecord && drawnBetween(ofRecord));
  if (!drawn && window.quantity !== "trough") return [];
  return context.levels.flatMap((level) => {
    if (level.excluded !== null || level.afterDoseH === null || level.atH > context.clock.nowH) return [];
    // Sooner than the record allows at all is levelTooEarly's to say.
    if (earliest && level.afterDoseH < quantityConvert(earliest, "h")) return [];
    const about = { kind: "level", id: level.id } as const;
    const data = {
      atMs: clockMs(context, level.atH),
      zone: context.case.timeZone,
      afterDoseH: level.afterDoseH,
      quantity: window.quantity,
    };
    if (drawn) {
      const { fromH, toH } = drawn;
      const isOff = (fromH !== null && level.afterDoseH < fromH) || (toH !== null && level.afterDoseH > toH);
      const source = ofRecord ? sourceText(context.case.medicine, ofRecord.source) : window.basis;
      return isOff ? [concern("level-off-window-time", "check", about, { ...data, fromH, toH, source })] : [];
    }
    const leftH = untilNextDose(context, level.atH, level.afterDoseH);
    if (leftH === null || isTroughTime(level.afterDoseH, leftH)) return [];
    return [concern("level-not-trough", "check", about, { ...data, leftH })];
  });
};

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
