import type { DoseLine } from "../regimen/index.ts";
import { instantMs, instantText } from "../time/index.ts";
import { numberPrint, quantityPrint } from "../units/index.ts";
import { weekdayList } from "./weekdayWords.ts";

/**
 * A dose line in the few words that fit beside its lane: "300 mg every 12 h from Wed 4 March 20:00, 10 doses". They are words of the dose
 * text, so that what is read off a lane can be typed again; the product, the year and what was not as planned are left to the panel.
 */
export function laneLineWords(line: DoseLine, zone: string): string {
  const amount = quantityPrint(line.amount, { style: "screen", microgram: "microgram" });
  const start = instantText(instantMs(line.start), zone, "typedShort");
  const { repeat } = line;
  if (!repeat) return `${amount} once at ${start}`;
  const exceptions = line.except?.length ? `, ${line.except.length} not as planned` : "";
  if ("every" in repeat) {
    const reach = repeat.count === undefined ? "" : `, ${repeat.count} ${repeat.count === 1 ? "dose" : "doses"}`;
    return `${amount} every ${numberPrint(repeat.every.value, {})} h from ${start}${reach}${exceptions}`;
  }
  const reach = repeat.days === undefined ? "" : ` for ${repeat.days} ${repeat.days === 1 ? "day" : "days"}`;
  return `${amount} ${clockWords(repeat.clock, repeat.weekdays)} from ${start}${reach}${exceptions}`;
}

function clockWords(clock: readonly string[], weekdays: readonly number[] | undefined): string {
  const times = [...clock].sort();
  const list = times.length < 2 ? times.join("") : `${times.slice(0, -1).join(", ")} and ${times.at(-1)}`;
  if (!weekdays) return `daily at ${list}`;
  // One weekday as "every Mon": "on Mon" could be a single one.
  return `at ${list} ${weekdays.length === 1 ? "every" : "on"} ${weekdayList(weekdays, "short")}`;
}

/** Under the tokens of a lane. */
export const laneTokenWords = {
  missed: "missed",
  /** "2× 300"; "2×" where the amounts differ. */
  together: (count: number, text: string) => (text === "" ? `${count}×` : `${count}× ${text}`),
} as const;
