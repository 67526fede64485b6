import { CompensatedSum } from "../../numerics/index.ts";
import type { LevelWindow } from "../exposureTally.ts";
import type { RunStretch } from "./modelRun.ts";
import { stretchHours } from "./stretchHours.ts";

/** Gathers readings stretch by stretch. Levels mg/L, times h, area mg·h/L. */
export class StretchTally {
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

  /** A stretch counts with both its ends: where the volume changes the level jumps, and both sides of the jump are levels. */
  add({ stretch, at, rest, nextAt, nextRest, length }: RunStretch): void {
    const turns = stretch.turns(length);
    this.level(stretch.levelAt(0), at + rest);
    for (const turn of turns) this.level(stretch.levelAt(turn), at + (rest + turn));
    this.level(stretch.levelAt(length), nextAt + nextRest);
    this.#area.add(stretch.areaTo(length));
    if (this.#window === undefined) return;
    const below = stretchHours(stretch, length, turns, this.#window.low, "below");
    const above = stretchHours(stretch, length, turns, this.#window.high, "above");
    this.#below.add(below);
    this.#above.add(above);
    this.#within.add(Math.max(0, length - below - above));
  }

  get auc(): number {
    return this.#area.value;
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
