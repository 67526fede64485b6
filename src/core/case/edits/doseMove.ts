import { type DoseLine, doseLineScheduledMs } from "../../regimen/index.ts";
import { clockOnDay, instantMs, wallClock } from "../../time/index.ts";
import type { Case } from "../caseSchema.ts";
import { exceptionOf, lineWithException } from "./doseException.ts";
import { type Lane, laneLine, laneWithLine } from "./lane.ts";
import { lineShifted } from "./lineShift.ts";

/**
 * Moves a dose to the instant `at`. Given lane: that dose alone, "late" after its scheduled time and "moved" before it.
 * Option: the whole line moves with it (lineShifted).
 */
export function doseMove(
  value: Case,
  { lane, lineId, index, at }: { lane: Lane; lineId: string; index: number; at: string },
): Case {
  const line = laneLine(value, lane, lineId);
  const moved =
    lane === "given"
      ? doseTakenAt(line, index, at, value.timeZone)
      : lineShifted(line, index, instantMs(at), value.timeZone);
  return laneWithLine(value, lane, moved);
}

function doseTakenAt(line: DoseLine, index: number, at: string, zone: string): DoseLine {
  const scheduledMs = doseLineScheduledMs(line, index, zone);
  const amount = exceptionOf(line, index)?.amount;
  const shiftMs = instantMs(at) - scheduledMs;
  if (shiftMs === 0 && !amount && isPlainTime(line, scheduledMs, zone)) return lineWithException(line, index, null);
  return lineWithException(line, index, { status: shiftMs > 0 ? "late" : "moved", at, ...(amount && { amount }) });
}

/** Whether the line alone says when the dose is due: not so where the clocks skip its time or show it twice, and the exception settles it. */
function isPlainTime({ repeat }: DoseLine, scheduledMs: number, zone: string): boolean {
  if (!repeat || "every" in repeat) return true;
  const { date, time } = wallClock(scheduledMs, zone);
  return repeat.clock.includes(time) && clockOnDay(date, time, zone).kind === "once";
}
