import {
  type DoseAmount,
  type DoseLine,
  type DoseRepeat,
  doseLineCount,
  doseLineScheduledMs,
} from "../../regimen/index.ts";
import { instantIso } from "../../time/index.ts";
import type { Case } from "../caseSchema.ts";
import { exceptionOf, lineWithException, lineWithExceptions } from "./doseException.ts";
import { doseMove } from "./doseMove.ts";
import { type Lane, laneLine, laneWithLine } from "./lane.ts";

interface DoseAddress {
  lane: Lane;
  lineId: string;
  index: number;
}

/** "taken": as the line says; another amount, if one was noted, stays. */
function doseMark(value: Case, { lane, lineId, index, status }: DoseAddress & { status: "missed" | "taken" }): Case {
  const line = laneLine(value, lane, lineId);
  const scheduledMs = doseLineScheduledMs(line, index, value.timeZone);
  if (status === "missed") return laneWithLine(value, lane, lineWithException(line, index, { status }));
  const amount = exceptionOf(line, index)?.amount;
  const at = instantIso(scheduledMs, value.timeZone);
  return laneWithLine(value, lane, lineWithException(line, index, amount ? { status: "moved", at, amount } : null));
}

/** Given lane with an index: that dose alone, as an exception. Otherwise the line's amount. */
function doseScale(
  value: Case,
  { lane, lineId, index, amount }: { lane: Lane; lineId: string; index?: number; amount: DoseAmount },
): Case {
  const line = laneLine(value, lane, lineId);
  if (lane !== "given" || index === undefined) return laneWithLine(value, lane, { ...line, amount });
  const scheduledMs = doseLineScheduledMs(line, index, value.timeZone);
  const present = exceptionOf(line, index);
  if (present?.status === "missed")
    throw new RangeError(`index: dose ${index} of "${lineId}" was missed and has no amount`);
  const timing = present ?? { status: "moved" as const, at: instantIso(scheduledMs, value.timeZone) };
  return laneWithLine(value, lane, lineWithException(line, index, { ...timing, amount }));
}

/**
 * Sets how far a repeat reaches: `count` doses, or `days` for clock times; neither: until further notice.
 * Exceptions of doses past the new end go with them.
 */
function lineStretch(
  value: Case,
  { lane, lineId, count, days }: { lane: Lane; lineId: string; count?: number; days?: number },
): Case {
  const line = laneLine(value, lane, lineId);
  const changed: DoseLine = { ...line, repeat: stretched(line, count, days) };
  const doses = doseLineCount(changed, value.timeZone);
  const except = (line.except ?? []).filter((each) => each.index < doses);
  return laneWithLine(value, lane, lineWithExceptions(changed, except));
}

function stretched(line: DoseLine, count: number | undefined, days: number | undefined): DoseRepeat {
  if (!line.repeat) throw new RangeError(`lineId: dose line "${line.id}" is a single dose and has no length`);
  if ("every" in line.repeat) {
    if (days !== undefined) throw new RangeError(`days: dose line "${line.id}" repeats by hours; give count`);
    return { every: line.repeat.every, ...(count !== undefined && { count }) };
  }
  if (count !== undefined) throw new RangeError(`count: dose line "${line.id}" repeats by clock times; give days`);
  const { clock, weekdays } = line.repeat;
  return { clock, ...(days !== undefined && { days }), ...(weekdays && { weekdays }) };
}

/** Edits of single doses of a line, and of how far a line reaches. */
export const doseEdits = { doseMove, doseMark, doseScale, lineStretch };
