import { fail, issue, type Result, succeed } from "../../result/index.ts";
import { instantIso, instantMs, instantPhraseResolve, MS_PER_HOUR, wallClock } from "../../time/index.ts";
import type { DoseException, DoseLine } from "../doseLine.ts";
import { doseLineCount, doseLineScheduledMs } from "../doseLineEndMs.ts";
import type { DoseProduct } from "../doseProduct.ts";
import type { DoseTextContext, ExceptionPhrase } from "./doseSegment.ts";
import { segmentAmount } from "./segmentAmount.ts";

/** The exceptions of a line. A time without a day means, for a late dose, the next such time after it was due; for a moved one, that of the day it was due. */
export function segmentExceptions(
  phrases: readonly ExceptionPhrase[],
  line: DoseLine,
  product: DoseProduct,
  context: DoseTextContext,
): Result<DoseException[]> {
  const exceptions: DoseException[] = [];
  const doses = doseLineCount(line, context.zone);
  for (const phrase of phrases) {
    if (phrase.dose > doses) return fail(issue("dose-exception-beyond", { dose: phrase.dose, doses }));
    const index = phrase.dose - 1;
    const at = phrase.at ? exceptionAt(phrase, doseLineScheduledMs(line, index, context.zone), context) : null;
    if (at && !at.ok) return at;
    const amount = phrase.amount ? segmentAmount(phrase.amount, product) : null;
    if (amount && !amount.ok) return amount;
    exceptions.push({
      index,
      status: phrase.status,
      ...(at ? { at: at.value } : {}),
      ...(amount ? { amount: amount.value } : {}),
    });
  }
  return succeed(exceptions.sort((a, b) => a.index - b.index));
}

function exceptionAt(
  { at, status }: ExceptionPhrase,
  dueMs: number,
  { zone, nowIso }: DoseTextContext,
): Result<string> {
  if (!at || at.iso !== undefined || at.date) return instantPhraseResolve(at ?? {}, zone, nowIso);
  const due = wallClock(dueMs, zone).date;
  const same = instantPhraseResolve(at, zone, instantIso(dueMs, zone), due);
  if (!same.ok || status === "moved" || instantMs(same.value) >= dueMs) return same;
  const next = wallClock(dueMs + 24 * MS_PER_HOUR, zone).date;
  return instantPhraseResolve(at, zone, instantIso(dueMs, zone), next);
}
