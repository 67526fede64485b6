import { type DoseLine, doseLinePeriodHours } from "../../regimen/index.ts";
import { quantityConvert } from "../../units/index.ts";
import { type ConcernContext, type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { sourceText } from "../typicalModel.ts";

/** Share of the way to steady state by which the model's own time is taken. */
const NINE_TENTHS_IN_HALF_LIVES = Math.log2(10);

/**
 * A level drawn before steady state: sooner after the last change of the regimen than the record's rule,
 * or, by the model, than nine tenths of the way (3.32 half-lives of elimination). A fit follows every dose and needs no steady state; a window does.
 * What the fitted half-life says is another rule's (levelsBeforeSteady); here it is the record's rule and the typical patient.
 */
export const levelNotSteady: ConcernRule = (context) => {
  const { steadyStateAfter } = context.case.medicine;
  const recordH = steadyStateAfter ? quantityConvert(steadyStateAfter, "h") : null;
  const halfLifeH = context.model?.halfLife?.value ?? null;
  const modelH = halfLifeH === null || context.fit.kind === "fitted" ? null : NINE_TENTHS_IN_HALF_LIVES * halfLifeH;
  const neededH = Math.max(recordH ?? 0, modelH ?? 0);
  if (neededH === 0) return [];
  return context.levels.flatMap((level) => {
    const startH = regimenStart(context, level.atH);
    if (level.excluded !== null || level.atH > context.clock.nowH || startH === null) return [];
    const sinceH = level.atH - startH;
    if (sinceH >= neededH) return [];
    return [
      concern(
        "level-not-steady",
        context.case.window ? "check" : "note",
        { kind: "level", id: level.id },
        {
          atMs: clockMs(context, level.atH),
          zone: context.case.timeZone,
          sinceH,
          recordH: recordH !== null && sinceH < recordH ? recordH : null,
          modelH: modelH !== null && sinceH < modelH ? modelH : null,
          source: steadyStateAfter ? sourceText(context.case.medicine, steadyStateAfter.source) : null,
          hasWindow: context.case.window !== undefined,
        },
      ),
    ];
  });
};

/** When the regimen a level was drawn under began: the first dose of the latest line that does not merely go on where one like it stopped. */
function regimenStart({ case: { given: lines }, given }: ConcernContext, levelH: number): number | null {
  const timesOf = (line: DoseLine) =>
    given.filter((mark) => mark.lineId === line.id && mark.countedMg > 0 && mark.atH < levelH).map((mark) => mark.atH);
  const taken = lines.flatMap((line) => {
    const times = timesOf(line);
    return times.length === 0 ? [] : [{ line, times, firstH: times[0]! }];
  });
  const begun = taken.filter(
    ({ line, firstH }) =>
      !taken.some(
        (earlier) =>
          earlier.line !== line &&
          isSameRegimen(earlier.line, line) &&
          earlier.times.some((atH) => atH < firstH && firstH - atH <= GOES_ON * (doseLinePeriodHours(line) ?? 0)),
      ),
  );
  return begun.length === 0 ? null : Math.max(...begun.map(({ firstH }) => firstH));
}

/** A line that follows one like it within so many of its periods goes on; later, it starts again. */
const GOES_ON = 1.5;

function isSameRegimen(a: DoseLine, b: DoseLine): boolean {
  const key = ({ product, amount, repeat }: DoseLine) => {
    if (!repeat) return null;
    const pattern = "every" in repeat ? repeat.every : [repeat.clock, repeat.weekdays ?? null];
    return JSON.stringify([product, amount, pattern]);
  };
  return a.repeat !== undefined && key(a) === key(b);
}
