import { instantMs, instantText, MONTHS } from "../time/index.ts";
import type { MessageFunction } from "./messageFunction.ts";

type Data = Readonly<Record<string, unknown>>;
const strings = (value: unknown): readonly string[] => (Array.isArray(value) ? value.map(String) : []);

/** "Sunday 29 March 2026", from "2026-03-29": a date needs no zone. */
export function dateWords(date: unknown): string {
  return instantText(instantMs(`${String(date)}T12:00:00+00:00`), "UTC", "dateYear");
}

const offsetOf = (iso: string): string => `UTC${iso.slice(19)}`;

export const timeMessages: Readonly<Record<string, MessageFunction>> = {
  "clock-skipped": ({ date, time, zone, nearest }: Data) =>
    `${String(time)} does not exist on ${dateWords(date)} in ${String(zone)}: the clocks go forward. Write ${strings(nearest).join(" or ")}.`,
  "clock-twice": ({ date, time, zone, candidates }: Data) => {
    const [first = "", second = ""] = strings(candidates).map(offsetOf);
    return `${String(time)} comes twice on ${dateWords(date)} in ${String(zone)}: the clocks go back. Write "${String(time)} first" (${first}) or "${String(time)} second" (${second}).`;
  },
  "instant-empty": () => "Write a day and a time, such as 4 March 07:30.",
  "instant-unreadable": ({ part }: Data) =>
    `"${String(part)}" could not be read as a day and a time: write it like 4 March 07:30, 2026-03-04 07:30, or 07:30 for today.`,
  "instant-numeric-date": ({ part }: Data) =>
    `"${String(part)}" can be read as two different days: write the month by name, such as 4 March.`,
  "instant-twelve-hour": ({ part, suggestion }: Data) =>
    typeof suggestion === "string"
      ? `"${String(part)}" is on the 12-hour clock: write ${suggestion}.`
      : `"${String(part)}" is no time of day: write it on the 24-hour clock, such as 19:30.`,
  "instant-no-such-time": ({ part }: Data) =>
    `"${String(part)}" is not on the 24-hour clock: write a time from 00:00 to 23:59.`,
  "instant-no-such-date": ({ day, month, year }: Data) =>
    `There is no ${String(day)} ${MONTHS[Number(month) - 1] ?? `month ${String(month)}`}${year === undefined ? "" : ` ${String(year)}`}: check the day and month.`,
  "instant-weekday": ({ date, said, actual }: Data) =>
    `${dateWords(date)} is a ${String(actual)}, not a ${String(said)}: check the date, or leave the weekday out.`,
  "instant-needs-date": ({ part }: Data) =>
    `"${String(part)}" alone can mean several days: add the date, such as ${String(part)} 4 March.`,
  "instant-needs-time": ({ date }: Data) => `${dateWords(date)} has no time with it: add one, such as 07:30.`,
  "instant-offset": ({ date, time, offset, candidates }: Data) =>
    `${String(time)} on ${dateWords(date)} is not at UTC${String(offset)}: write ${strings(candidates).map(offsetOf).join(" or ")}, or leave it out.`,
  "instant-once": ({ date, time, which }: Data) =>
    `${String(time)} comes only once on ${dateWords(date)}: leave "${String(which)}" out.`,
};
