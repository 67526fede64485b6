import type { Case } from "../case/index.ts";
import { type ModelHistory, modelScaled, modelSteadyState, modelTimeToSteadyState } from "../kinetics/index.ts";
import type { DoseLine } from "../regimen/index.ts";
import type { Model } from "./analysisTypes.ts";
import type { DrawnFigures } from "./drawnCurve.ts";
import type { DrawnPatients } from "./drawnPatients.ts";
import type { IndividualReadings, Spread, WindowChance } from "./fitTypes.ts";
import { finalDisposition, modelInputs } from "./modelInputs.ts";
import { regimenPattern } from "./regimenPattern.ts";
import { spreadOfEqual } from "./spreadOf.ts";
import { toxicChance } from "./toxicChance.ts";
import { type WindowFigures, windowChance } from "./windowChance.ts";
import { windowLimits } from "./windowLimits.ts";
import { BEFORE_NEXT_DOSE, dueLevels, timedLevels, type WindowDraw, windowDraw } from "./windowTiming.ts";

const STEADY_NAMES = ["peak", "lowest", "average", "accumulation", "swing", "fluctuation"] as const;

/** Of draws that never settle so many, and the interval of the others would hide them: no steady-state figure is given. */
export const MOST_NEVER_STEADY = 0.05;

type SteadyColumns = Record<
  (typeof STEADY_NAMES)[number] | "timeTo90H" | "timedLowest" | "timedHighest" | "highestTrough",
  Float64Array
>;

/**
 * The readings of an option for every draw of this patient, as intervals: over the span from the drawn curves, of the steady state as the
 * typical patient's are found, draw by draw. Yields between the draws how many are done.
 */
export function* individualReadings(
  value: Case,
  lines: readonly DoseLine[],
  typical: Model,
  patients: DrawnPatients,
  figures: DrawnFigures,
  { fromH, toH, actsFromH }: { readonly fromH: number; readonly toH: number; readonly actsFromH: number | null },
  halfLifeH: Spread | null,
): Generator<number, IndividualReadings> {
  const settled = yield* steadyDraws(value, lines, typical, patients);
  const chance = (own: Omit<WindowFigures, "auc24" | "average"> & { readonly average: Float64Array }) => {
    const limits = windowLimits(value);
    if (!limits || !value.window) return null;
    return windowChance(value.window.quantity, limits, { ...own, auc24: own.average.map((level) => level * 24) });
  };
  // A window for a level at a time after the dose is not about the lowest level of a span. Chances first: spreads put a column in order.
  const spanChance = settled.draw === null ? chance(figures) : null;
  const chanceSettled = steadyChance(settled, patients.count, value.window !== undefined, chance);
  const chanceToxic = toxicChance(value, {
    span: figures.peak,
    steady: settled.isRepeating ? settled.highest : null,
  });
  const steadyState = steadyReadings(settled, patients.count);
  const hasWindow = value.window !== undefined && value.window.quantity !== "auc24";
  const hours = (column: Float64Array) => (hasWindow ? spreadOfEqual(column) : null);
  const average = spreadOfEqual(figures.average);
  return {
    span: {
      fromH,
      toH,
      peak: spreadOfEqual(figures.peak),
      lowest: spreadOfEqual(figures.lowest),
      average,
      auc: times(average, toH - fromH),
      auc24: times(average, 24),
      hoursBelow: hours(figures.hoursBelow),
      hoursWithin: hours(figures.hoursWithin),
      hoursAbove: hours(figures.hoursAbove),
      chance: spanChance,
      lowestBeforeOption: actsFromH === null ? null : shareBy(figures.lowestAtH, actsFromH),
    },
    steadyState,
    steadyChance: chanceSettled,
    shareNeverSteady: settled.isRepeating ? (patients.count - settled.count) / patients.count : 0,
    toxicChance: chanceToxic,
    halfLifeH,
  };
}

interface SteadyDraws {
  readonly isRepeating: boolean;
  /** When after a dose the window asks for its level. */
  readonly draw: WindowDraw | null;
  /** Whether a dose of the pattern is followed by so long a gap. */
  readonly isHourComing: boolean;
  readonly isTroughToxic: boolean;
  /** How many settle at all; the columns have so many rows. */
  readonly count: number;
  readonly columns: SteadyColumns;
  /** Of every draw: the highest level, or of those before a dose where the toxic limit is for them; infinite where it never settles. */
  readonly highest: Float64Array;
}

function* steadyDraws(
  value: Case,
  lines: readonly DoseLine[],
  typical: Model,
  { names, count, eta }: DrawnPatients,
): Generator<number, SteadyDraws> {
  const found = regimenPattern(value, lines);
  const draw = windowDraw(value);
  let isHourComing = false;
  const isTroughToxic = value.medicine.toxicAt === "trough";
  const history: ModelHistory = {
    dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition: finalDisposition(typical) }],
    inputs: found.ok ? modelInputs(typical, found.pattern.courses) : [],
  };
  const columns = Object.fromEntries(
    [...STEADY_NAMES, "timeTo90H", "timedLowest", "timedHighest", "highestTrough"].map((name) => [
      name,
      new Float64Array(count),
    ]),
  ) as SteadyColumns;
  const highest = new Float64Array(count).fill(Number.POSITIVE_INFINITY);
  let settled = 0;
  for (let n = 0; n < count; n++) {
    const own = modelScaled(
      history,
      names,
      eta.map((column) => column[n]!),
    );
    const { disposition } = own.dispositions[0]!;
    if (found.ok) {
      const { periodH } = found.pattern;
      const state = modelSteadyState(disposition, own.inputs, periodH);
      if (state.status === "settled") {
        for (const name of STEADY_NAMES) columns[name][settled] = state[name];
        columns.timeTo90H[settled] = modelTimeToSteadyState(disposition, own.inputs, periodH, 0.9).hours;
        const timed = draw && timedLevels(disposition, own.inputs, periodH, draw);
        if (timed) {
          isHourComing = true;
          columns.timedLowest[settled] = timed.lowest;
          columns.timedHighest[settled] = timed.highest;
        }
        if (isTroughToxic)
          columns.highestTrough[settled] = dueLevels(
            disposition,
            own.inputs,
            periodH,
            draw?.afterDoseH ?? BEFORE_NEXT_DOSE,
          ).highest;
        highest[n] = isTroughToxic ? columns.highestTrough[settled]! : state.peak;
        settled++;
      }
    }
    yield n + 1;
  }
  for (const name of Object.keys(columns) as (keyof SteadyColumns)[])
    columns[name] = columns[name].subarray(0, settled);
  return {
    isRepeating: found.ok,
    draw,
    isHourComing,
    isTroughToxic,
    count: settled,
    columns,
    highest,
  };
}

type ChanceOf = (
  own: Omit<WindowFigures, "auc24" | "average"> & { readonly average: Float64Array },
) => WindowChance | null;

function steadyReadings(
  { columns, draw, isHourComing, isTroughToxic, count, isRepeating }: SteadyDraws,
  draws: number,
): IndividualReadings["steadyState"] {
  if (!isRepeating || draws - count > MOST_NEVER_STEADY * draws) return null;
  const { peak, lowest, average, timedLowest, timedHighest } = columns;
  const mean = spreadOfEqual(average);
  return {
    peak: spreadOfEqual(peak),
    lowest: spreadOfEqual(lowest),
    average: mean,
    auc24: times(mean, 24),
    accumulation: spreadOfEqual(columns.accumulation),
    swing: spreadOfEqual(columns.swing),
    fluctuation: spreadOfEqual(columns.fluctuation),
    timeTo90H: spreadOfEqual(columns.timeTo90H),
    timed:
      draw === null || !isHourComing
        ? null
        : { afterDoseH: draw.afterDoseH, lowest: spreadOfEqual(timedLowest), highest: spreadOfEqual(timedHighest) },
    highestTrough: isTroughToxic ? spreadOfEqual(columns.highestTrough) : null,
  };
}

/** Of what the window is about, before a spread puts the columns in order; also where too many draws never settle for any other figure. */
function steadyChance(
  { columns, draw, isHourComing, count, isRepeating }: SteadyDraws,
  draws: number,
  hasWindow: boolean,
  chanceOf: ChanceOf,
): WindowChance | null {
  if (!isRepeating || !hasWindow) return null;
  if (count === 0) return { below: 0, within: 0, above: 1 };
  // The lowest is not what the window is about: where its hour never comes there is no chance of it.
  if (draw !== null && !isHourComing) return null;
  const { peak, lowest, average, timedLowest, timedHighest } = columns;
  const settled = chanceOf(
    draw === null ? { peak, lowest, average } : { peak, lowest: timedLowest, timedHighest, average },
  );
  return withNeverSteady(settled, (draws - count) / draws);
}

/** A draw that never settles rises above every window. */
function withNeverSteady(chance: WindowChance | null, share: number): WindowChance | null {
  if (!chance) return null;
  const rest = 1 - share;
  return { below: chance.below * rest, within: chance.within * rest, above: chance.above * rest + share };
}

/** Rounding of a time on the clock, h. */
const SAME_TIME_H = 1e-6;

function shareBy(timesH: Float64Array, untilH: number): number {
  return timesH.filter((time) => time <= untilH + SAME_TIME_H).length / timesH.length;
}

function times({ q05, q25, q50, q75, q95 }: Spread, factor: number): Spread {
  return { q05: q05 * factor, q25: q25 * factor, q50: q50 * factor, q75: q75 * factor, q95: q95 * factor };
}
