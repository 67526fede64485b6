import type { MessageFunction } from "./messageFunction.ts";

type Data = Readonly<Record<string, unknown>>;

/** Sentences about what was typed into the entry panels. */
export const entryMessages: Readonly<Record<string, MessageFunction>> = {
  "window-about-missing": () => "Choose what the window is about: the lowest, the highest, the average, or both ends.",
  "window-draw-from-missing": () =>
    "Write from when after the dose the level is drawn, or leave both fields empty for just before the next dose.",
  "window-draw-hours": ({ found, most }: Data) =>
    `${String(found)} hours after the dose can't be: write a number from 0 to ${String(most)}.`,
  "window-basis-missing": () => "Say on what basis: local policy, a guideline, or a reason.",
  "window-ends": ({ low, high, unit }: Data) =>
    `The low end, ${String(low)}, must lie below the high end, ${String(high)} ${String(unit)}, and not below 0.`,
  "observation-after-now": ({ at, now }: Data) =>
    `${String(at)} lies after the now line, ${String(now)}: check the time, or move the now line.`,
  "level-no-dose": () =>
    "There is no dose given yet, so nothing can be compared with this level: enter the doses given first, then add it.",
  "level-before-dose": ({ at, first }: Data) =>
    `${String(at)} lies before the first dose given, ${String(first)}: check the time, or enter the earlier doses first.`,
  "level-after-now": ({ at, now }: Data) =>
    `${String(at)} lies after the now line, ${String(now)}: a level has been drawn. Check the time, or move the now line.`,
  "concentration-other-unit": ({ typed, low, high }: Data) =>
    `${String(typed)} is not near the ${String(low)} to ${String(high)} this medicine is used at; the same number in another unit is. Is the unit right?`,
  "concentration-far": ({ typed, low, high }: Data) =>
    `${String(typed)} is far from the ${String(low)} to ${String(high)} this medicine is used at. Is it meant?`,
  "level-reason-missing": () => "Say why it is left out; the reason stands beside it on the summary.",
  "dose-product-missing": () => "Choose the product first: there is more than one.",
  "dose-line-has-exceptions": () =>
    "Doses of this line are marked missed or moved, and the marks belong to its present times: take them back first, or type the line anew.",
  "dose-clock-list": ({ part }: Data) =>
    `"${String(part)}" is not a list of clock times: write them on the 24-hour clock, such as 08:00, 22:00.`,
  "dose-whole-number": ({ part }: Data) => `"${String(part)}" is not a whole number from 1 on.`,
  "dose-share": ({ found }: Data) =>
    `${String(found)} % of a dose can't be: write a share above 0 and below 100 %, such as 50 for half; nothing of it: mark it missed.`,
  "dose-far-above": ({ typed, per, limit, of }: Data) =>
    `${String(typed)} in one ${String(per)} is far above the ${String(limit)} that the record states as the maximum ${String(of)} dose. Is it meant?`,
  "dose-taken-after-now": ({ at, now }: Data) =>
    `${String(at)} lies after the now line, ${String(now)}: it can't have been taken yet.`,
};
