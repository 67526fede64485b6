import { numberPrint } from "../../core/units/index.ts";
import { type ProfileScene, profileScene } from "../chart/profileScene.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryChart } from "./summaryModel.ts";
import { chosenOption } from "./summaryOrder.ts";

/** One unit of the drawing is about a CSS pixel on the sheet: 184 mm wide and 62 mm high. */
const SIZE = { width: 696, height: 234 };
const MARGIN = { top: 26, right: 40, bottom: 26, left: 34 };

/** The profile of the doses given and the chosen option, in mg per L, for print.css to set in millimetres. */
export function summaryScene({ case: value, analysis }: SummaryInput, words: SummaryChart): ProfileScene {
  const { clock, givenCurve } = analysis;
  const chosen = analysis.options.find(({ id }) => id === chosenOption(value)?.id);
  const { window } = value;
  const scene = profileScene({
    ...SIZE,
    margin: MARGIN,
    fromH: clock.fromH,
    toH: clock.toH,
    nowH: clock.nowH,
    midnightsH: clock.midnightsH,
    scale: "linear",
    factor: 1,
    window: window?.low.unit === "mg/L" ? { low: window.low.value, high: window.high.value } : null,
    curves: [
      ...(givenCurve ? [{ id: "given", name: "", ...givenCurve }] : []),
      ...(chosen?.curve ? [{ id: chosen.id, name: "", ...chosen.curve }] : []),
    ],
    levels: analysis.levels.map((level) => ({
      id: level.id,
      atH: level.atH,
      value: level.measured,
      sd: level.assaySd,
      excluded: level.excluded !== null,
      belowLimit: level.belowLimit,
      label: words.levels.find(({ id }) => id === level.id)?.text ?? numberPrint(level.measured, { significant: 3 }),
    })),
  });
  // On paper the days are named at their midnights; hour figures would run into them.
  return { ...scene, hourTicks: [] };
}
