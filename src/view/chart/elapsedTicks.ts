import type { ClockScale, ClockTick } from "./clockScale.ts";

/** Hours that a reader counts in: parts of a day, days, weeks. */
const STEPS_H = [1, 2, 3, 6, 12, 24, 48, 72, 168, 336, 672] as const;
/** Room a number of hours needs, px. */
const TICK_ROOM = 40;

/** Marks of elapsed hours from 0 on, at the finest step that leaves room for the numbers: for a curve that stands on no clock. */
export function elapsedTicks(scale: ClockScale): ClockTick[] {
  const perHour = (scale.right - scale.left) / (scale.toH - scale.fromH);
  const step = STEPS_H.find((each) => each * perHour >= TICK_ROOM) ?? STEPS_H[STEPS_H.length - 1]!;
  const ticks: ClockTick[] = [];
  for (let hours = Math.ceil(scale.fromH / step) * step; hours <= scale.toH; hours += step) {
    ticks.push({ hours, x: scale.x(hours), label: String(hours) });
  }
  return ticks;
}
