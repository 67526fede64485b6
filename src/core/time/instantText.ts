import { MONTHS, twoDigits, WEEKDAYS } from "./calendarWords.ts";
import { clockOnDay } from "./clockOnDay.ts";
import { instantIso } from "./instant.ts";
import { type WallClock, wallClock } from "./wallClock.ts";

/**
 * clock "07:30" · day "Wed 4 March" · dayClock "Wed 4 March, 07:30" · date "Wednesday 4 March" · dateYear "Wednesday 4 March 2026" ·
 * full "Wednesday 4 March 2026, 07:30" · typed "Wed 4 March 2026 07:30" and typedShort "Wed 4 March 07:30" (as `instantRead` takes them) ·
 * isoLocal "2026-03-04 07:30"
 */
export type InstantForm =
  | "clock"
  | "day"
  | "dayClock"
  | "date"
  | "dateYear"
  | "full"
  | "typed"
  | "typedShort"
  | "isoLocal";

/** An instant in words and the 24-hour clock of its zone, to the minute. A time that the clocks show twice that day gets its offset: "01:30 (UTC+01:00)". */
export function instantText(ms: number, zone: string, form: InstantForm): string {
  const at = wallClock(ms, zone);
  const weekday = WEEKDAYS[at.weekday - 1] ?? "";
  const dayMonth = `${at.day} ${MONTHS[at.month - 1] ?? ""}`;
  const time = () => clockText(ms, zone, at);
  switch (form) {
    case "clock":
      return time();
    case "day":
      return `${weekday.slice(0, 3)} ${dayMonth}`;
    case "dayClock":
      return `${weekday.slice(0, 3)} ${dayMonth}, ${time()}`;
    case "date":
      return `${weekday} ${dayMonth}`;
    case "dateYear":
      return `${weekday} ${dayMonth} ${at.year}`;
    case "full":
      return `${weekday} ${dayMonth} ${at.year}, ${time()}`;
    case "typed":
      return `${weekday.slice(0, 3)} ${dayMonth} ${at.year} ${time()}`;
    case "typedShort":
      return `${weekday.slice(0, 3)} ${dayMonth} ${time()}`;
    case "isoLocal":
      return `${at.year}-${twoDigits(at.month)}-${twoDigits(at.day)} ${time()}`;
  }
}

function clockText(ms: number, zone: string, at: WallClock): string {
  const isTwice = clockOnDay(at.date, `${at.time}:${twoDigits(at.second)}`, zone).kind === "twice";
  return isTwice ? `${at.time} (UTC${instantIso(ms, zone).slice(19)})` : at.time;
}
