import { type DoseLine, doseLineEndMs, doseLineGapHours, doseLinePeriodHours } from "../../regimen/index.ts";
import { MS_PER_HOUR } from "../../time/index.ts";
import { quantityConvert } from "../../units/index.ts";
import { type ConcernContext, type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { patternStartMs } from "../patternStart.ts";
import { BEFORE_DOSE_H } from "../troughTime.ts";
import { sourceText } from "../typicalModel.ts";
import { TOGETHER_H } from "../windowTiming.ts";

/** Half-lives until nine tenths of the way to steady state. */
const NINE_TENTHS_IN_HALF_LIVES = Math.log2(10);

/**
 * A level drawn before steady state: sooner after the last change of the regimen than the record's rule,
 * or, by the model, than nine tenths of the way (3.32 half-lives of elimination). A fit follows every dose and needs no steady state; a window does.
 * A level drawn before the dose that the wait ends with is drawn a little sooner: that much is allowed.
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
    const waitedH = sinceH + BEFORE_DOSE_H + TOGETHER_H;
    if (waitedH >= neededH) return [];
    return [
      concern(
        "level-not-steady",
        context.case.window ? "check" : "note",
        { kind: "level", id: level.id },
        {
          atMs: clockMs(context, level.atH),
          zone: context.case.timeZone,
          sinceH,
          recordH: recordH !== null && waitedH < recordH ? recordH : null,
          modelH: modelH !== null && waitedH < modelH ? modelH : null,
          source: steadyStateAfter ? sourceText(context.case.medicine, steadyStateAfter.source) : null,
          hasWindow: context.case.window !== undefined,
        },
      ),
    ];
  });
};

/**
 * When the regimen a level was drawn under began, counted as the wait for the next level is: the first dose of the latest line that does not
 * merely go on where one like it stopped; of lines that began together as one pattern, the one that came first.
 */
function regimenStart(context: ConcernContext, levelH: number): number | null {
  const begun = begunLines(context, levelH);
  const latest = begun.reduce<Begun | null>((last, each) => (last && last.firstH >= each.firstH ? last : each), null);
  if (!latest?.line.repeat) return latest?.firstH ?? null;
  const { timeZone } = context.case;
  const pattern = begun.filter(({ line }) => line.repeat && isGivenUntil(line, latest.scheduledMs, timeZone));
  const startMs = patternStartMs(
    pattern.map(({ line, scheduledMs }) => ({ line, firstMs: scheduledMs })),
    timeZone,
  );
  const starts = pattern.filter(({ scheduledMs }) => scheduledMs === startMs).map(({ firstH }) => firstH);
  const singles = begun.filter(({ line }) => !line.repeat).map(({ firstH }) => firstH);
  return Math.max(...starts, ...singles);
}

/** A line with the first of its doses that counts: when it was taken, and when it was due. */
interface Begun {
  readonly line: DoseLine;
  readonly firstH: number;
  readonly scheduledMs: number;
}

function begunLines(context: ConcernContext, levelH: number): readonly Begun[] {
  const { given } = context;
  const taken = context.case.given.flatMap((line) => {
    const marks = given.filter((mark) => mark.lineId === line.id && mark.countedMg > 0 && mark.atH < levelH);
    const [first] = marks;
    if (!first) return [];
    const scheduledMs = Math.round(clockMs(context, first.scheduledH));
    return [{ line, times: marks.map((mark) => mark.atH), firstH: first.atH, scheduledMs }];
  });
  return taken.filter(
    ({ line, firstH }) =>
      !taken.some(
        (earlier) =>
          earlier.line !== line &&
          isSameRegimen(earlier.line, line) &&
          earlier.times.some((atH) => atH < firstH && firstH - atH <= GOES_ON * (doseLinePeriodHours(line) ?? 0)),
      ),
  );
}

/** Whether a line's next dose by its schedule would come after `ms`. */
function isGivenUntil(line: DoseLine, ms: number, zone: string): boolean {
  const endMs = doseLineEndMs(line, zone) ?? Number.POSITIVE_INFINITY;
  return endMs + (doseLineGapHours(line) ?? 0) * MS_PER_HOUR > ms;
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
