import { WEEKDAYS } from "../time/index.ts";
import { listWords } from "./summaryWords.ts";

/** "Monday, Wednesday and Friday"; short: "Mon, Wed and Fri". `weekdays`: 1 for Monday to 7 for Sunday. */
export function weekdayList(weekdays: readonly number[], form: "full" | "short" = "full"): string {
  return listWords(weekdays.map((day) => weekdayName(day, form)));
}

export function weekdayName(day: number, form: "full" | "short" = "full"): string {
  const name = WEEKDAYS[day - 1];
  if (name === undefined) throw new RangeError(`day: ${day} is no weekday; allowed: 1 (Monday) to 7 (Sunday)`);
  return form === "short" ? name.slice(0, 3) : name;
}
