import type { Case } from "../../case/index.ts";
import type { RecordWindow } from "../../medicine/index.ts";
import { type Quantity, quantityConvert } from "../../units/index.ts";
import { type ConcernContext, type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { sourceText } from "../typicalModel.ts";

/** A trough is drawn in the last part of the interval: this much of it, or two hours where that is less, may be left (our own rule, common practice). */
const TROUGH_SHARE = 0.25;
const TROUGH_LEAST_H = 2;

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
    if (leftH === null || leftH <= Math.max(TROUGH_LEAST_H, TROUGH_SHARE * (leftH + level.afterDoseH))) return [];
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

/** Hours from a level to the next dose as given; where none was given after it, the last interval goes on. null with a single dose. */
function untilNextDose({ given }: ConcernContext, levelH: number, afterDoseH: number): number | null {
  const times = given.filter((mark) => mark.countedMg > 0).map((mark) => mark.atH);
  const next = times.find((atH) => atH >= levelH);
  if (next !== undefined) return next - levelH;
  const lastH = levelH - afterDoseH;
  const before = times.filter((atH) => atH < lastH).at(-1);
  return before === undefined ? null : Math.max(0, lastH - before - afterDoseH);
}
