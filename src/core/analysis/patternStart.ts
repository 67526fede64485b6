import { type DoseLine, doseLineFirstMs } from "../regimen/index.ts";
import { instantIso, MS_PER_HOUR } from "../time/index.ts";

/** A repeating line and when its first dose is due by the schedule, epoch ms. */
export interface BegunLine {
  readonly line: DoseLine;
  readonly firstMs: number;
}

/**
 * The dose from which on repeating lines give their whole pattern: the earliest of their first doses after which none of them still has to join.
 * Lines that begin together begin with whichever dose comes first; one that joins others already running begins it with its own first dose.
 * Example: 300 mg at 22:00 from Wednesday, 200 mg at 08:00 from Thursday: Wednesday 22:00.
 */
export function patternStartMs(begun: readonly BegunLine[], zone: string): number {
  const firsts = begun.map(({ firstMs }) => firstMs).sort((a, b) => a - b);
  const found = firsts.find((fromMs) => begun.every((each) => !isStillToJoin(each, fromMs, zone)));
  if (found === undefined) throw new RangeError("begun: at least one repeating line is needed");
  return found;
}

/** Whether a line, had it always run, would have given a dose from `fromMs` on before the first it gives. */
function isStillToJoin({ line, firstMs }: BegunLine, fromMs: number, zone: string): boolean {
  const { repeat } = line;
  if (!repeat || firstMs <= fromMs) return false;
  if ("every" in repeat) return firstMs - Math.round(repeat.every.value * MS_PER_HOUR) >= fromMs;
  const { days: _, ...endless } = repeat;
  const beganMs = doseLineFirstMs({ ...line, start: instantIso(fromMs, zone), repeat: endless }, zone);
  return beganMs !== null && beganMs < firstMs;
}
