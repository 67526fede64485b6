import { type Case, type Level, levelValueNear } from "../../../core/case/index.ts";
import { dragWords } from "../../../core/messages/index.ts";
import { instantMs, instantText } from "../../../core/time/index.ts";
import { quantityConvert, quantityPrint } from "../../../core/units/index.ts";
import type { ProfileScene } from "../../chart/profileScene.ts";
import { useWorkbench } from "../../useWorkbench.ts";
import { levelIsAsked, levelTimeNear } from "./levelPlace.ts";
import { type DragAxis, useAxisDrag } from "./useAxisDrag.ts";

interface LevelDrag {
  readonly value: Case;
  readonly level: Level;
  readonly scene: ProfileScene;
  /** Its form is wanted: pressed, or dropped at a value that has to be asked about. */
  readonly onOpen: () => void;
  /** What is being changed, from what to what; null: no longer. */
  readonly onWords: (words: string | null) => void;
}

const HOUR_MS = 3_600_000;

/** A level dragged along the clock, or up and down in its own unit; the other of the two stays as it was. */
export function useLevelDrag({ value, level, scene, onOpen, onWords }: LevelDrag) {
  const edit = useWorkbench((state) => state.edit);
  const previewEdit = useWorkbench((state) => state.previewEdit);
  const cancelPreview = useWorkbench((state) => state.cancelPreview);
  const { id, quantity } = level;
  const { clock, concentration, factor } = scene;

  const timeAt = (px: number, isFine: boolean): string =>
    levelTimeNear(
      value,
      level,
      instantMs(level.at) + (clock.hours(clock.left + px) - clock.hours(clock.left)) * HOUR_MS,
      isFine,
    );
  const numberAt = (px: number): number => {
    const molarMass = value.medicine.molarMass.value;
    const shown = quantityConvert(quantity, "mg/L", molarMass) * factor;
    const mgPerL = concentration.value(concentration.y(shown) - px) / factor;
    return levelValueNear(value, level, quantityConvert({ value: mgPerL, unit: "mg/L" }, quantity.unit, molarMass));
  };
  const print = (number: number): string => quantityPrint({ value: number, unit: quantity.unit }, { style: "screen" });
  const say = (axis: DragAxis, px: number, isFine: boolean): string => {
    if (axis === "amount") return dragWords.valueWas(print(quantity.value), print(numberAt(px)));
    const clockText = (at: string) => instantText(instantMs(at), value.timeZone, "dayClock");
    return dragWords.timeWas(clockText(level.at), clockText(timeAt(px, isFine)));
  };
  const end = () => {
    onWords(null);
    cancelPreview();
  };

  return useAxisDrag({
    axes: ["clock", "amount"],
    onMove: (axis, px, isFine) => {
      onWords(say(axis, px, isFine));
      if (axis === "clock") previewEdit("levelMove", { id, at: timeAt(px, isFine) });
      else previewEdit("levelRevalue", { id, number: numberAt(px) });
    },
    onDrop: (axis, px, isFine) => {
      end();
      if (axis === "clock") edit("levelMove", { id, at: timeAt(px, isFine) });
      else if (numberAt(px) !== quantity.value && levelIsAsked(value, level, numberAt(px))) onOpen();
      else edit("levelRevalue", { id, number: numberAt(px) });
    },
    onCancel: end,
    onPress: onOpen,
  });
}
