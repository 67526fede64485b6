import type { DoseMark } from "../../../core/analysis/index.ts";
import type { Case } from "../../../core/case/index.ts";
import { doseStepped, productOf } from "../../../core/medicine/index.ts";
import { dragWords } from "../../../core/messages/index.ts";
import { instantIso, instantText } from "../../../core/time/index.ts";
import { quantityPrint } from "../../../core/units/index.ts";
import type { ClockScale } from "../../chart/clockScale.ts";
import { useWorkbench } from "../../useWorkbench.ts";
import { tokenSnap } from "./tokenSnap.ts";
import { type DragAxis, useAxisDrag } from "./useAxisDrag.ts";

interface DoseDrag {
  readonly value: Case;
  readonly lane: string;
  readonly mark: DoseMark;
  readonly scale: ClockScale;
  readonly originMs: number;
  readonly onPress: () => void;
  /** What is being changed, from what to what; null: no longer. */
  readonly onWords: (words: string | null) => void;
}

const HOUR_MS = 3_600_000;
/** From one amount that can be made to the next, px. */
const STEP_PX = 14;

/** Only what is proposed can be scaled by hand: how much was given is a fact, changed by keys, buttons or its form. */
export function doseDragAxes(lane: string, mark: DoseMark): readonly DragAxis[] {
  return lane === "given" || mark.status === "missed" ? ["clock"] : ["clock", "amount"];
}

/** A dose dragged along the clock; one of an option also up and down, which scales its line by what the product's strengths allow. */
export function useDoseDrag({ value, lane, mark, scale, originMs, onPress, onWords }: DoseDrag) {
  const edit = useWorkbench((state) => state.edit);
  const previewEdit = useWorkbench((state) => state.previewEdit);
  const cancelPreview = useWorkbench((state) => state.cancelPreview);

  const atMs = originMs + mark.atH * HOUR_MS;
  const movedMs = (px: number, isFine: boolean): number =>
    tokenSnap(atMs + (scale.hours(scale.left + px) - scale.hours(scale.left)) * HOUR_MS, isFine);
  const moved = (px: number, isFine: boolean) => ({
    lane,
    lineId: mark.lineId,
    index: mark.index,
    at: instantIso(movedMs(px, isFine), value.timeZone),
  });
  const amountAt = (px: number) =>
    doseStepped(mark.amount, productOf(value.medicine, mark.product), Math.round(px / STEP_PX));
  const scaled = (px: number) => ({ lane, lineId: mark.lineId, amount: amountAt(px) });
  const say = (axis: DragAxis, px: number, isFine: boolean): string => {
    if (axis === "clock") {
      const clockText = (ms: number) => instantText(ms, value.timeZone, "dayClock");
      return dragWords.timeWas(clockText(atMs), clockText(movedMs(px, isFine)));
    }
    const print = (amount: DoseMark["amount"]) => quantityPrint(amount, { style: "screen", microgram: "microgram" });
    return dragWords.doseWas(print(mark.amount), print(amountAt(px)));
  };
  const end = () => {
    onWords(null);
    cancelPreview();
  };

  return useAxisDrag({
    axes: doseDragAxes(lane, mark),
    onMove: (axis, px, isFine) => {
      onWords(say(axis, px, isFine));
      if (axis === "clock") previewEdit("doseMove", moved(px, isFine));
      else previewEdit("doseScale", scaled(px));
    },
    onDrop: (axis, px, isFine) => {
      end();
      if (axis === "clock") edit("doseMove", moved(px, isFine));
      else edit("doseScale", scaled(px));
    },
    onCancel: end,
    onPress,
  });
}
