import { type Analysis, concentrationAt, hoursSinceDose } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { numberPrint, unitSpoken } from "../../core/units/index.ts";
import { type ShownUnit, unitFactor } from "./shownUnit.ts";

/** Which curves exist at an instant: the doses given up to the now line, the options from it on. */
export function curvesAt(analysis: Analysis, hours: number): readonly (string | null)[] {
  const options = analysis.options.filter((option) => option.curve !== null).map((option) => option.id);
  return hours < analysis.clock.nowH || options.length === 0 ? [null] : options;
}

/** What the readout says under its clock time: each curve's exact value and the hours since its last dose. */
export function readoutLines(value: Case, analysis: Analysis, hours: number, unit: ShownUnit): string[] {
  const factor = unitFactor(value, unit);
  return curvesAt(analysis, hours).flatMap((option) => {
    const found = concentrationAt(analysis, option, [hours]);
    if (!found) return [];
    const since = hoursSinceDose(analysis, option, hours);
    const after = since === null ? "no dose before" : `${numberPrint(since, { decimals: 1 })} h after the dose`;
    const name = option === null ? "" : `${option}  `;
    return [`${name}${numberPrint(found[0]! * factor, { significant: 3 })} ${unitSpoken(unit, "screen")}, ${after}`];
  });
}
