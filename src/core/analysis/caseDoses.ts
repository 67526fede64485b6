import type { Case } from "../case/index.ts";
import { doseMg, productOf } from "../medicine/index.ts";
import { type DoseLine, doseLineExpand, isEndlessLine } from "../regimen/index.ts";
import type { Issue } from "../result/index.ts";
import type { DoseMark } from "./analysisTypes.ts";

const HOUR_MS = 3_600_000;

/** Which side of the now line counts for a lane: doses given count before it, doses of an option from it on. */
export type LaneSide = "given" | "option";

interface ExpandedLane {
  readonly marks: readonly DoseMark[];
  /** Faults with the line they belong to. */
  readonly issues: readonly { readonly lineId: string; readonly issue: Issue }[];
}

/**
 * Every dose of a lane as a mark on the clock, in time order.
 * A mark on the wrong side of the now line stays visible but counts nothing.
 */
export function laneDoses(
  value: Case,
  lines: readonly DoseLine[],
  side: LaneSide,
  clock: { readonly originMs: number; readonly nowMs: number; readonly untilMs: number },
): ExpandedLane {
  const marks: DoseMark[] = [];
  const issues: { lineId: string; issue: Issue }[] = [];
  const hours = (ms: number) => (ms - clock.originMs) / HOUR_MS;
  for (const line of lines) {
    const product = productOf(value.medicine, line.product);
    // Until further notice on the given lane: up to the now line, not at it; a dose due right now is still to be given.
    const untilMs = side === "given" && isEndlessLine(line) ? clock.nowMs - 1 : clock.untilMs;
    const expanded = doseLineExpand(line, { zone: value.timeZone, untilMs });
    if (!expanded.ok) {
      issues.push(...expanded.issues.map((issue) => ({ lineId: line.id, issue })));
      continue;
    }
    for (const event of expanded.value) {
      const mg = doseMg(event.amount, product);
      if (!mg.ok) {
        issues.push(...mg.issues.map((issue) => ({ lineId: line.id, issue })));
        break;
      }
      const outside = side === "given" ? event.atMs > clock.nowMs : event.atMs < clock.nowMs;
      // An exception that only changes the amount leaves the dose where it was.
      const asTaken = event.status === "moved" && event.atMs === event.scheduledMs ? "taken" : event.status;
      const status = outside ? (side === "given" ? "after-now" : "before-now") : asTaken;
      marks.push({
        lineId: line.id,
        index: event.index,
        product: line.product,
        atH: hours(event.atMs),
        scheduledH: hours(event.scheduledMs),
        amount: event.amount,
        countedMg: outside || event.status === "missed" ? 0 : mg.value,
        status: event.status === "missed" ? "missed" : status,
      });
    }
  }
  marks.sort((a, b) => a.atH - b.atH);
  return { marks, issues };
}

/** The doses that count, one course a product, as the kinetics core takes them. */
export function countedByProduct(marks: readonly DoseMark[]): Map<string, { time: number; amount: number }[]> {
  const courses = new Map<string, { time: number; amount: number }[]>();
  for (const mark of marks) {
    if (mark.countedMg === 0) continue;
    const doses = courses.get(mark.product) ?? [];
    doses.push({ time: mark.atH, amount: mark.countedMg });
    courses.set(mark.product, doses);
  }
  return courses;
}
