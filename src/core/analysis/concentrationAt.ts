import { modelProfile } from "../kinetics/index.ts";
import type { Analysis } from "./analysisTypes.ts";
import { countedByProduct } from "./caseDoses.ts";
import { modelHistory } from "./modelInputs.ts";

/**
 * Concentrations at chosen instants, mg/L, by the same sweep that drew the curve (not read off the drawing).
 * `option`: an option's id, or null for the doses given alone. `hours` ascending. null without a prediction.
 */
export function concentrationAt(analysis: Analysis, option: string | null, hours: readonly number[]): number[] | null {
  if (!analysis.typical) return null;
  const doses = option === null ? [] : (analysis.options.find((candidate) => candidate.id === option)?.doses ?? []);
  const history = modelHistory(analysis.typical, countedByProduct([...analysis.given, ...doses]));
  return [...modelProfile(history, hours)];
}

/** Hours since the last counted dose before an instant; null before the first. */
export function hoursSinceDose(analysis: Analysis, option: string | null, hours: number): number | null {
  const doses = option === null ? [] : (analysis.options.find((candidate) => candidate.id === option)?.doses ?? []);
  const last = [...analysis.given, ...doses]
    .filter((mark) => mark.countedMg > 0 && mark.atH <= hours)
    .reduce<number | null>((latest, mark) => (latest === null || mark.atH > latest ? mark.atH : latest), null);
  return last === null ? null : hours - last;
}
