import { ExposureTally, type WindowHours } from "../exposureTally.ts";
import type { RunStretch } from "./modelRun.ts";
import { stretchHours } from "./stretchHours.ts";

/** Gathers readings stretch by stretch. Levels mg/L, area mg·h/L. */
export class StretchTally extends ExposureTally {
  /** A stretch counts with both its ends: where the volume changes the level jumps, and both sides of the jump are levels. */
  add({ stretch, at, rest, nextAt, nextRest, length }: RunStretch): void {
    const turns = stretch.turns(length);
    this.level(stretch.levelAt(0), at + rest);
    for (const turn of turns) this.level(stretch.levelAt(turn), at + (rest + turn));
    this.level(stretch.levelAt(length), nextAt + nextRest);
    this.part(stretch.areaTo(length), length, (edge, side) => stretchHours(stretch, length, turns, edge, side));
  }

  protected override rounded([below, within, above]: WindowHours, total: number): WindowHours {
    const longest = Math.max(below, within, above);
    if (longest === within) return [below, total - below - above, above];
    if (longest === below) return [total - within - above, within, above];
    return [below, within, total - below - within];
  }
}
