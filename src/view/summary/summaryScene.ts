import { type Analysis, concentrationWindow } from "../../core/analysis/index.ts";
import { concentrationFactor } from "../../core/medicine/index.ts";
import { profileParts } from "../chart/profileParts.ts";
import { type ProfileScene, profileScene } from "../chart/profileScene.ts";
import { shownPatient } from "./shownPatient.ts";
import type { SummaryInput } from "./summaryInput.ts";
import type { SummaryChart } from "./summaryModel.ts";
import { chosenOption } from "./summaryOrder.ts";

/** One unit of the drawing is about a CSS pixel on the sheet: 184 mm wide. */
const WIDTH = 696;
/** Letter is 18 mm shorter than A4; the profile gives way, not the words. This patient's sheet has more words. */
const HEIGHT = { A4: { typical: 188, individual: 146 }, Letter: { typical: 146, individual: 100 } };
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

/** The profile of the doses given and the chosen option, of this patient with bands where the sheet is, for print.css to set in millimetres. */
export function summaryScene(input: SummaryInput, words: SummaryChart): ProfileScene {
  const { case: value, settings } = input;
  const analysis = shownAnalysis(input);
  const { clock } = analysis;
  const factor = concentrationFactor(value.medicine);
  const parts = profileParts(value, analysis, factor, analysis.options[0]?.id ?? null);
  const scene = profileScene({
    width: WIDTH,
    height: HEIGHT[settings.pageSize][shownPatient(input).kind],
    margin: MARGIN,
    fromH: clock.fromH,
    toH: clock.toH,
    nowH: clock.nowH,
    midnightsH: clock.midnightsH,
    scale: "linear",
    factor,
    window: concentrationWindow(value),
    curves: parts.curves.map((curve) => ({ ...curve, name: "" })),
    bands: parts.bands ?? [],
    levels: parts.levels.map((level) => ({
      ...level,
      label: words.levels.find(({ id }) => id === level.id)?.text ?? level.label,
    })),
  });
  // On paper the days are named at their midnights; hour figures would run into them.
  return { ...scene, hourTicks: [] };
}

/** The chosen option alone; without anything of this patient where the sheet is of the typical one. */
function shownAnalysis(input: SummaryInput): Analysis {
  const { analysis } = input;
  const chosen = analysis.options.filter(({ id }) => id === chosenOption(input.case)?.id);
  return shownPatient(input).kind === "individual"
    ? { ...analysis, options: chosen }
    : {
        ...analysis,
        givenBand: null,
        options: chosen.map((option) => ({ ...option, band: null })),
        levels: analysis.levels.map((level) => ({ ...level, fit: null })),
      };
}
