import { scaleLinear } from "d3-scale";

/** The shared clock: elapsed hours to horizontal position. Every row of the bench and the summary use the same one. */
export interface ClockScale {
  readonly fromH: number;
  readonly toH: number;
  readonly left: number;
  readonly right: number;
  x(hours: number): number;
  hours(x: number): number;
}

export function clockScale(fromH: number, toH: number, left: number, right: number): ClockScale {
  const scale = scaleLinear([fromH, toH], [left, right]);
  return { fromH, toH, left, right, x: (hours) => scale(hours), hours: (x) => scale.invert(x) };
}

export interface ClockTick {
  readonly hours: number;
  readonly x: number;
  readonly label: string;
}

const STEPS = [1, 2, 3, 6, 12] as const;
/** Room a clock label needs, px. */
const TICK_ROOM = 46;

/**
 * Hour marks between midnights at the finest of 1, 2, 3, 6 or 12 h that leaves room for the labels; none when even noon has no room.
 * `midnights` are elapsed hours of local midnights, so a day of 23 or 25 h keeps its marks on the wall clock's midnight.
 */
export function hourTicks(scale: ClockScale, midnights: readonly number[], room: number = TICK_ROOM): ClockTick[] {
  const perHour = (scale.right - scale.left) / (scale.toH - scale.fromH);
  const step = STEPS.find((candidate) => candidate * perHour >= room);
  if (step === undefined) return [];
  const ticks: ClockTick[] = [];
  const bounds = [(midnights[0] ?? scale.fromH) - 24, ...midnights];
  for (const midnight of bounds) {
    for (let hour = step; hour < 24; hour += step) {
      const hours = midnight + hour;
      if (hours > scale.fromH && hours < scale.toH) {
        ticks.push({ hours, x: scale.x(hours), label: step === 12 ? "12" : `${String(hour).padStart(2, "0")}:00` });
      }
    }
  }
  return ticks;
}
