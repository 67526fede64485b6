import { type ConcernRule, clockMs, concern } from "../concernRule.ts";

/** The option's first dose falls much sooner after the last dose given than the option's own doses follow each other. */
export const firstDoseClose: ConcernRule = (context) => {
  const last = context.given.filter((mark) => mark.countedMg > 0).at(-1);
  if (!last) return [];
  return context.options.flatMap((option) => {
    const counted = option.doses.filter((mark) => mark.countedMg > 0);
    const [first, second] = counted;
    if (!first || !second) return [];
    const gapH = first.atH - last.atH;
    // Less than half the interval: our own rule, to be looked at, not a limit.
    return gapH < (second.atH - first.atH) / 2
      ? [
          concern(
            "first-dose-close",
            "check",
            { kind: "option", id: option.id },
            {
              option: option.id,
              gapH,
              intervalH: second.atH - first.atH,
              lastMs: clockMs(context, last.atH),
              zone: context.case.timeZone,
            },
          ),
        ]
      : [];
  });
};
