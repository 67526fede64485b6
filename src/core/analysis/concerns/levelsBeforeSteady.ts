import { instantText } from "../../time/index.ts";
import { type ConcernRule, clockMs, concern } from "../concernRule.ts";
import { usedLevels } from "../usedLevels.ts";

/** Used levels drawn before 90 % of the way to steady state: ln 10 / ke from the first counted dose, this patient's half-life. One single dose has no steady state to wait for. */
export const levelsBeforeSteady: ConcernRule = (context) => {
  const { fit, given } = context;
  if (fit.kind !== "fitted" || fit.fit.halfLife === null) return [];
  const counted = given.filter((mark) => mark.countedMg > 0);
  const first = counted[0];
  if (!first || counted.length < 2) return [];
  const steadyH = (Math.log(10) / Math.LN2) * fit.fit.halfLife.posterior.q50;
  const early = usedLevels(context).filter((level) => level.atH > first.atH && level.atH < first.atH + steadyH);
  if (early.length === 0) return [];
  const times = early.map((level) => instantText(clockMs(context, level.atH), context.case.timeZone, "dayClock"));
  return [concern("levels-before-steady", "note", { kind: "case" }, { count: early.length, times, steadyH })];
};
