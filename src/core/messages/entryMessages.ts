import type { MessageFunction } from "./messageFunction.ts";

type Data = Readonly<Record<string, unknown>>;

/** Sentences about what was typed into the entry panels. */
export const entryMessages: Readonly<Record<string, MessageFunction>> = {
  "window-about-missing": () => "Choose what the window is about: the lowest, the highest, the average, or both ends.",
  "window-basis-missing": () => "Say on what basis: local policy, a guideline, or a reason.",
  "window-ends": ({ low, high, unit }: Data) =>
    `The low end, ${String(low)}, must lie below the high end, ${String(high)} ${String(unit)}, and not below 0.`,
};
