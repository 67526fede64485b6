import type { DoseLine } from "../../regimen/index.ts";
import { instantIso, instantMs } from "../../time/index.ts";
import type { Case } from "../caseSchema.ts";
import { exceptionOf, lineWithException } from "./doseException.ts";
import { type Lane, laneLine, laneWithLine } from "./lane.ts";
import { lineScheduledMs } from "./lineSchedule.ts";

/**
 * Moves a dose to the instant `at`. Given lane: that dose alone, "late" after its scheduled time and "moved" before it.
 * Option: the whole line moves with it.
 */
export function doseMove(
  value: Case,
  { lane, lineId, index, at }: { lane: Lane; lineId: string; index: number; at: string },
): Case {
  const line = laneLine(value, lane, lineId);
  const shiftMs = instantMs(at) - lineScheduledMs(line, index, value.timeZone);
  const moved = lane === "given" ? doseAt(line, index, at, shiftMs) : lineShifted(value, line, shiftMs);
  return laneWithLine(value, lane, moved);
}

function doseAt(line: DoseLine, index: number, at: string, shiftMs: number): DoseLine {
  const amount = exceptionOf(line, index)?.amount;
  if (shiftMs === 0 && !amount) return lineWithException(line, index, null);
  return lineWithException(line, index, { status: shiftMs > 0 ? "late" : "moved", at, ...(amount && { amount }) });
}

function lineShifted(value: Case, line: DoseLine, shiftMs: number): DoseLine {
  return { ...line, start: instantIso(instantMs(line.start) + shiftMs, value.timeZone) };
}
