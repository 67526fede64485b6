import { CompensatedSum } from "../numerics/index.ts";
import { bodySegmentHours, bodySegmentPeak } from "./bodySegment.ts";
import type { BodyState } from "./bodyState.ts";

/** A window, 0 <= low <= high: of levels (mg/L) at the door, of amounts in the body (mg) within the tally. */
export interface LevelWindow {
  low: number;
  high: number;
}

/** Gathers readings segment by segment: amounts in the body mg, times h, area mg·h; levels are these over the volume. */
export class ExposureTally {
  peakMg = -Infinity;
  timeOfPeak = 0;
  lowestMg = Infinity;
  timeOfLowest = 0;
  readonly #window: LevelWindow | undefined;
  readonly #area = new CompensatedSum();
  readonly #below = new CompensatedSum();
  readonly #within = new CompensatedSum();
  readonly #above = new CompensatedSum();

  constructor(window?: LevelWindow) {
    this.#window = window;
  }

  /** One instant. The earliest of equal ones stands. */
  instant(bodyMg: number, timeH: number): void {
    if (bodyMg > this.peakMg) {
      this.peakMg = bodyMg;
      this.timeOfPeak = timeH;
    }
    if (bodyMg < this.lowestMg) {
      this.lowestMg = bodyMg;
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
    const below = bodySegmentHours(state, length, peak, this.#window.low, "below");
    const above = bodySegmentHours(state, length, peak, this.#window.high, "above");
    this.#below.add(below);
    this.#above.add(above);
    this.#within.add(Math.max(0, length - below - above));
  }

  /** mg·h */
  get areaMgH(): number {
    return this.#area.value;
  }

  /** Hours below, within and above the window; without one all hours count as within. The three add up to `total`. */
  hours(total: number): { hoursBelow: number; hoursWithin: number; hoursAbove: number } {
    if (this.#window === undefined) return { hoursBelow: 0, hoursWithin: total, hoursAbove: 0 };
    const hours = [this.#below.value, this.#within.value, this.#above.value] as [number, number, number];
    // Rounding of the parts goes into the longest, where it is least. Twice: the first correction is itself rounded.
    const longest = hours.indexOf(Math.max(...hours));
    for (let i = 0; i < 2; i++) {
      const missing = total - (hours[0] + hours[1] + hours[2]);
      if (Number.isFinite(missing)) hours[longest]! += missing;
    }
    return { hoursBelow: hours[0], hoursWithin: hours[1], hoursAbove: hours[2] };
  }
}
