import { bodySegmentHours, bodySegmentPeak } from "./bodySegment.ts";
import type { BodyState } from "./bodyState.ts";
import { ExposureTally, type WindowHours } from "./exposureTally.ts";

/** Gathers readings segment by segment: amounts in the body mg, area mg·h; levels are these over the volume. */
export class SegmentTally extends ExposureTally {
  /** The stretch of `length` h from the instant `at` + `atRest`, whose state is given. Its end is left to the next. */
  segment(state: BodyState, at: number, atRest: number, length: number): void {
    this.level(state.body, at + atRest);
    const peak = bodySegmentPeak(state, length);
    if (peak !== undefined) this.level(state.bodyAt(peak), at + (atRest + peak));
    this.part(state.areaOver(length), length, (edge, side) => bodySegmentHours(state, length, peak, edge, side));
  }

  protected override rounded(hours: WindowHours, total: number): WindowHours {
    const longest = hours.indexOf(Math.max(...hours));
    // Twice: the first correction is itself rounded.
    for (let i = 0; i < 2; i++) {
      const missing = total - (hours[0] + hours[1] + hours[2]);
      if (Number.isFinite(missing)) hours[longest]! += missing;
    }
    return hours;
  }
}
