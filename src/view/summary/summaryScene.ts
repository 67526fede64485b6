import { concentrationWindow } from "../../core/analysis/index.ts";
import { concentrationFactor } from "../../core/medicine/index.ts";
import { numberPrint } from "../../core/units/index.ts";
import { type ProfileScene, profileScene } from "../chart/profileScene.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryChart } from "./summaryModel.ts";
import { chosenOption } from "./summaryOrder.ts";

/** One unit of the drawing is about a CSS pixel on the sheet: 184 mm wide. */
const WIDTH = 696;
/** Letter is 18 mm shorter than A4; the profile gives way, not the words. */
const HEIGHT = { A4: 188, Letter: 146 };
/** Room at the right for the window's edges, which stand 34 units beyond the plot. */
const MARGIN = { top: 26, right: 58, bottom: 24, left: 34 };

/** A day's name takes about this much of the axis, in units of the drawing. */
const DAY_CHARACTER_WIDTH = 7.6;
const DAY_GAP = 8;

/** Names of the days where there is room for them: every day, or every second, third one. */
export function summaryDays(
  scene: ProfileScene,
  words: SummaryChart,
): readonly { readonly x: number; readonly text: string }[] {
  const placed = words.days.map(({ atH, text }) => ({ x: scene.clock.x(atH), text }));
  const longest = Math.max(0, ...placed.map(({ text }) => text.length));
  const dayWidth = (placed[1]?.x ?? scene.plot.right) - (placed[0]?.x ?? scene.plot.left);
  const step = Math.max(1, Math.ceil((longest * DAY_CHARACTER_WIDTH + DAY_GAP) / dayWidth));
  const room = (x: number) => x + longest * DAY_CHARACTER_WIDTH <= scene.width;
  return placed.filter(({ x }, index) => index % step === 0 && room(x));
}

/** Left of a now line this near to the axis there is no room for a word beside the unit. */
const UNIT_WIDTH = 110;

/** What stands on either side of the now line. */
export function summaryNowLabels(
  scene: ProfileScene,
  words: SummaryChart,
): { readonly before: string; readonly after: string } {
  return { before: scene.nowX !== null && scene.nowX < UNIT_WIDTH ? "" : words.before, after: words.after };
}

/** The profile of the doses given and the chosen option, in the unit its concentrations are printed in, for print.css to set in millimetres. */
export function summaryScene({ case: value, analysis, settings }: SummaryInput, words: SummaryChart): ProfileScene {
  const { clock, givenCurve } = analysis;
  const chosen = analysis.options.find(({ id }) => id === chosenOption(value)?.id);
  const factor = concentrationFactor(value.medicine);
  const scene = profileScene({
    width: WIDTH,
    height: HEIGHT[settings.pageSize],
    margin: MARGIN,
    fromH: clock.fromH,
    toH: clock.toH,
    nowH: clock.nowH,
    midnightsH: clock.midnightsH,
    scale: "linear",
    factor,
    window: concentrationWindow(value),
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
      label:
        words.levels.find(({ id }) => id === level.id)?.text ??
        numberPrint(level.measured * factor, { significant: 3 }),
    })),
  });
  // On paper the days are named at their midnights; hour figures would run into them.
  return { ...scene, hourTicks: [] };
}
