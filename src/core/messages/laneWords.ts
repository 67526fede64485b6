import type { DoseLine } from "../regimen/index.ts";
import { instantMs, instantText } from "../time/index.ts";
import { numberPrint, quantityPrint } from "../units/index.ts";
import { weekdayList } from "./weekdayWords.ts";

/** A dose line in the few words that fit beside its lane: "300 mg every 12 h from Wed 4 March, 20:00, 10 doses". */
export function laneLineWords(line: DoseLine, zone: string): string {
  const amount = quantityPrint(line.amount, { style: "screen", microgram: "microgram" });
  const start = instantText(instantMs(line.start), zone, "dayClock");
  const { repeat } = line;
  if (!repeat) return `${amount} once, ${start}`;
  const exceptions = line.except?.length ? `, ${line.except.length} not as planned` : "";
  if ("every" in repeat) {
    const reach = repeat.count === undefined ? "" : `, ${repeat.count} ${repeat.count === 1 ? "dose" : "doses"}`;
    return `${amount} every ${numberPrint(repeat.every.value, {})} h from ${start}${reach}${exceptions}`;
  }
  const reach = repeat.days === undefined ? "" : `, ${repeat.days} ${repeat.days === 1 ? "day" : "days"}`;
  const on = repeat.weekdays ? ` on ${weekdayList(repeat.weekdays, "short")}` : "";
  return `${amount} at ${repeat.clock.join(" and ")}${on} from ${start}${reach}${exceptions}`;
}
