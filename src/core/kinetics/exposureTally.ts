import { CompensatedSum } from "../numerics/index.ts";
import { bodySegmentHours, bodySegmentPeak } from "./bodySegment.ts";
import type { BodyState } from "./bodyState.ts";

/** A window of levels, mg/L, 0 <= low <= high. */
export interface LevelWindow {
  low: number;
  high: number;
}

/** Gathers readings segment by segment. Levels mg/L, times h, area mg·h/L. */
export class ExposureTally {
  peak = -Infinity;
  timeOfPeak = 0;
  lowest = Infinity;
  timeOfLowest = 0;
  readonly #volume: number;
  readonly #window: LevelWindow | undefined;
  readonly #area = new CompensatedSum();
  readonly #below = new CompensatedSum();
  readonly #within = new CompensatedSum();
  readonly #above = new CompensatedSum();

  constructor(volume: number, window?: LevelWindow) {
    this.#volume = volume;
    this.#window = window;
  }

  /** One instant's level. The earliest of equal ones stands. */
  instant(bodyMg: number, timeH: number): void {
    const level = bodyMg / this.#volume;
    if (level > this.peak) {
      this.peak = level;
      this.timeOfPeak = timeH;
    }
    if (level < this.lowest) {
      this.lowest = level;
      this.timeOfLowest = timeH;
    }
  }

  /** The stretch of `length` h from the instant `at` + `atRest`, whose state is given. Its end is left to the next. */
  segment(state: BodyState, at: number, atRest: number, length: number): void {
    this.instant(state.body, at + atRest);
    const peak = bodySegmentPeak(state, length);
    if (peak !== undefined) this.instant(state.bodyAt(peak), at + (atRest + peak));
    this.#area.add(state.areaOver(length));
    if (this.#window === undefined) return;
    const below = bodySegmentHours(state, length, peak, this.#window.low * this.#volume, "below");
    const above = bodySegmentHours(state, length, peak, this.#window.high * this.#volume, "above");
    this.#below.add(below);
    this.#above.add(above);
    this.#within.add(Math.max(0, length - below - above));
  }

  get auc(): number {
    return this.#area.value / this.#volume;
  }

  /** Hours below, within and above the window; without one all hours count as within. The three add up to `total`. */
  hours(total: number): { hoursBelow: number; hoursWithin: number; hoursAbove: number } {
    if (this.#window === undefined) return { hoursBelow: 0, hoursWithin: total, hoursAbove: 0 };
    const below = this.#below.value;
    const within = this.#within.value;
    const above = this.#above.value;
    // Rounding of the parts goes into the longest, where it is least.
    const longest = Math.max(below, within, above);
    if (longest === within) return { hoursBelow: below, hoursWithin: total - below - above, hoursAbove: above };
    if (longest === below) return { hoursBelow: total - within - above, hoursWithin: within, hoursAbove: above };
    return { hoursBelow: below, hoursWithin: within, hoursAbove: total - below - within };
  }
}
