import { type ConcernRule, clockMs, concern } from "../concernRule.ts";

/** The option's first dose falls much sooner, or much later, after the last dose given than the option's own doses follow each other. */
export const firstDoseClose: ConcernRule = (context) => {
  const last = context.given.filter((mark) => mark.countedMg > 0).at(-1);
  if (!last) return [];
  return context.options.flatMap((option) => {
    const counted = option.doses.filter((mark) => mark.countedMg > 0);
    const [first] = counted;
    const second = counted.find((mark) => first !== undefined && mark.atH > first.atH);
    if (!first || !second) return [];
    const gapH = first.atH - last.atH;
    // Less than half the interval, or more than one and a half: our own rule, to be looked at, not a limit.
    const share = gapH / (second.atH - first.atH);
    return share < 0.5 || share > 1.5
      ? [
          concern(
            share < 0.5 ? "first-dose-close" : "first-dose-late",
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
