import type { Concern, DoseMark } from "../analysisTypes.ts";
import { type ConcernContext, type ConcernRule, clockMs, concern } from "../concernRule.ts";

/** Counted doses of one product that share an instant: a history entered twice, or one dose split over two lines. One concern a lane. */
export const dosesSameTime: ConcernRule = (context) => [
  ...laneConcern(context, { kind: "given" }, context.given),
  ...context.options.flatMap((option) => laneConcern(context, { kind: "option", id: option.id }, option.doses)),
];

function laneConcern(context: ConcernContext, about: Concern["about"], marks: readonly DoseMark[]): readonly Concern[] {
  const together = new Map<string, DoseMark[]>();
  for (const mark of marks) {
    if (mark.countedMg === 0) continue;
    const key = `${mark.atH} ${mark.product}`;
    together.set(key, [...(together.get(key) ?? []), mark]);
  }
  const found = [...together.values()].filter((same) => same.length > 1);
  const [first] = found.flat();
  if (!first) return [];
  const data = {
    option: about.id ?? null,
    count: found.length,
    most: Math.max(...found.map((same) => same.length)),
    atMs: clockMs(context, first.atH),
    zone: context.case.timeZone,
  };
  return [concern("doses-same-time", "check", about, data)];
}
