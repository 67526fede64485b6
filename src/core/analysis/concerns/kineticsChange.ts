import { type ConcernRule, clockMs, concern } from "../concernRule.ts";

/** Clearance or volume changes on the clock: steady-state figures refer to the final state, and levels before a change to another one. */
export const kineticsChange: ConcernRule = (context) => {
  const { model, levels } = context;
  if (!model || model.dispositions.length < 2) return [];
  const changes = model.dispositions.slice(1);
  const last = changes.at(-1)!;
  const before = levels.filter((level) => level.excluded === null && level.atH < last.from).length;
  return [
    concern(
      "kinetics-change",
      "check",
      { kind: "patient" },
      {
        count: changes.length,
        lastMs: clockMs(context, last.from),
        zone: context.case.timeZone,
        levelsBefore: before,
      },
    ),
  ];
};
