import { CompensatedSum } from "../numerics/index.ts";

/** A window, 0 <= low <= high: of levels (mg/L) at the door, of amounts in the body (mg) within SegmentTally. */
export interface LevelWindow {
  low: number;
  high: number;
}

/** Hours below, within and above a window. */
export type WindowHours = [below: number, within: number, above: number];

/** Gathers readings part by part of a course, in one unit: mg/L, or in SegmentTally mg. Times h, the area in this unit times h. */
export abstract class ExposureTally {
  peak = -Infinity;
  timeOfPeak = 0;
  lowest = Infinity;
  timeOfLowest = 0;
  readonly #window: LevelWindow | undefined;
  readonly #area = new CompensatedSum();
  readonly #below = new CompensatedSum();
  readonly #within = new CompensatedSum();
  readonly #above = new CompensatedSum();

  constructor(window?: LevelWindow) {
    this.#window = window;
  }

  /** One level. The earliest of equal ones stands. */
  level(level: number, timeH: number): void {
    if (level > this.peak) {
      this.peak = level;
      this.timeOfPeak = timeH;
    }
    if (level < this.lowest) {
      this.lowest = level;
      this.timeOfLowest = timeH;
    }
  }

  /** The area of a part `length` h long, and its hours strictly beyond an edge of the window. */
  protected part(area: number, length: number, beyond: (edge: number, side: "below" | "above") => number): void {
    this.#area.add(area);
    if (this.#window === undefined) return;
    const below = beyond(this.#window.low, "below");
    const above = beyond(this.#window.high, "above");
    this.#below.add(below);
    this.#above.add(above);
    this.#within.add(Math.max(0, length - below - above));
  }

  get area(): number {
    return this.#area.value;
  }

  /** Puts the rounding of the parts into the longest, where it is least, so that the three add up to `total`. */
  protected abstract rounded(hours: WindowHours, total: number): WindowHours;

  /** Hours below, within and above the window; without one all hours count as within. The three add up to `total`. */
  hours(total: number): { hoursBelow: number; hoursWithin: number; hoursAbove: number } {
    if (this.#window === undefined) return { hoursBelow: 0, hoursWithin: total, hoursAbove: 0 };
    const gathered: WindowHours = [this.#below.value, this.#within.value, this.#above.value];
    const [hoursBelow, hoursWithin, hoursAbove] = this.rounded(gathered, total);
    return { hoursBelow, hoursWithin, hoursAbove };
  }
}
