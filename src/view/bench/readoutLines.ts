import {
  type Analysis,
  concentrationAt,
  hoursSinceDose,
  type LevelResult,
  type Spread,
} from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { fitWords } from "../../core/messages/index.ts";
import { numberPrint, unitSpoken } from "../../core/units/index.ts";
import { bandAt, bandOf } from "../chart/bandAt.ts";
import { type ShownUnit, unitFactor } from "./shownUnit.ts";

/** What stands at an instant on one curve, mg/L. */
export interface Readout {
  /** null: the doses given. */
  readonly option: string | null;
  readonly typical: number;
  /** This patient's limits, where there is a fit. */
  readonly individual: Spread | null;
  /** Since the last counted dose, h; null before the first. */
  readonly sinceDoseH: number | null;
}

/** Which curves exist at an instant: the doses given up to the now line, the options from it on. */
function curvesAt(analysis: Analysis, hours: number): readonly (string | null)[] {
  const options = analysis.options.filter((option) => option.curve !== null).map((option) => option.id);
  return hours < analysis.clock.nowH || options.length === 0 ? [null] : options;
}

/**
 * Every curve at an instant. At a level of the doses given this patient's limits are the level's own, found there and not read
 * off the drawing.
 */
export function readoutsAt(analysis: Analysis, hours: number): readonly Readout[] {
  return curvesAt(analysis, hours).flatMap((option) => {
    const found = concentrationAt(analysis, option, [hours]);
    if (!found) return [];
    const band = bandOf(analysis, option);
    const level = option === null ? analysis.levels.find(({ atH, fit }) => atH === hours && fit !== null) : undefined;
    return {
      option,
      typical: found[0]!,
      individual: level?.fit?.predicted ?? (band && bandAt(band, hours)),
      sinceDoseH: hoursSinceDose(analysis, option, hours),
    };
  });
}

/** What the readout says under its clock time: each curve's value, for this patient with its 90 % interval, and the hours since its last dose. */
export function readoutLines(value: Case, readouts: readonly Readout[], unit: ShownUnit): string[] {
  const { three, shown } = printing(value, unit);
  return readouts.map(({ option, individual, typical, sinceDoseH }) => {
    const after =
      sinceDoseH === null ? "no dose before" : `${numberPrint(sinceDoseH, { decimals: 1 })} h after the dose`;
    const name = option === null ? "" : `${option}  `;
    const figures = individual
      ? `${three(individual.q50)} ${shown}, ${fitWords.interval} ${range(individual, three)}; ${fitWords.typical} ${three(typical)}`
      : `${three(typical)} ${shown}`;
    return `${name}${figures}, ${after}`;
  });
}

/** How near the pointer counts as on a level, px. */
const NEAR = 10;

/** The level at an instant, within a few pixels; the nearest where there are several. */
export function levelNear(analysis: Analysis, hours: number, pxPerHour: number): LevelResult | null {
  const near = analysis.levels.filter((level) => Math.abs(level.atH - hours) * pxPerHour <= NEAR);
  return near.sort((a, b) => Math.abs(a.atH - hours) - Math.abs(b.atH - hours))[0] ?? null;
}

/** What the readout adds at a level: what was measured, and whether the forecast before it held. */
export function levelLines(value: Case, level: LevelResult, unit: ShownUnit): string[] {
  const { three, shown } = printing(value, unit);
  const { fit } = level;
  const out = level.excluded === null ? "" : `, ${fitWords.leftOut(level.excluded)}`;
  return [
    `${fitWords.level} ${level.belowLimit ? "below " : ""}${three(level.measured)} ${shown}${out}`,
    ...(fit?.forecast
      ? [
          `${fitWords.forecast(fit.forecast.levelsKnown)} ${range(fit.forecast.predictive, three)}: ${fitWords.held(fit.forecast.held)}`,
        ]
      : []),
  ];
}

function range(spread: Spread, print: (mgPerL: number) => string): string {
  return `${print(spread.q05)} to ${print(spread.q95)}`;
}

function printing(value: Case, unit: ShownUnit) {
  const factor = unitFactor(value, unit);
  return {
    three: (mgPerL: number) => numberPrint(mgPerL * factor, { significant: 3 }),
    shown: unitSpoken(unit, "screen"),
  };
}
