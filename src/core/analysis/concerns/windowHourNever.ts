import { type ConcernRule, concern } from "../concernRule.ts";
import { concentrationWindow } from "../optionReadings.ts";
import { windowDraw } from "../windowTiming.ts";

/** An option in which no dose is followed by so long a gap as the window's level is drawn after: the window is for a level it never has. */
export const windowHourNever: ConcernRule = ({ case: value, options, fit }) => {
  const draw = windowDraw(value);
  const ends = concentrationWindow(value);
  if (!draw || !ends) return [];
  return options.flatMap(({ id, typical }) => {
    const settled = typical?.steadyState;
    if (!settled || settled.timed) return [];
    const data = {
      option: id,
      afterDoseH: draw.afterDoseH,
      lowest: settled.lowest,
      ...ends,
      isFitted: fit.kind === "fitted",
    };
    return [concern("window-hour-never", "check", { kind: "option", id }, data)];
  });
};
