import { fail, issue, succeed } from "../../result/index.ts";
import { instantPhraseRead } from "../../time/index.ts";
import { amountClause } from "./amountClause.ts";
import type { ClauseRead, ExceptionPhrase } from "./doseSegment.ts";
import { wordCount } from "./wordNumber.ts";

/** "dose 3 missed", "dose 4 late at 10:15", "dose 4 moved to Thu 5 March 10:15 150 mg". */
export function exceptionClause(words: readonly string[], from: number): ClauseRead<ExceptionPhrase> {
  if (words[from]?.toLowerCase() !== "dose") return succeed(null);
  const dose = wordCount(words[from + 1]);
  const statusAt = words[from + 2]?.toLowerCase() === "was" ? from + 3 : from + 2;
  const status = words[statusAt]?.toLowerCase();
  if (dose === null || (status !== "missed" && status !== "late" && status !== "moved")) {
    const part = words.slice(from, statusAt + 1).join(" ");
    return fail(
      issue("dose-text-unreadable", {
        part,
        expected: ["dose 3 missed", "dose 3 late at 10:15", "dose 3 moved to 10:15"],
      }),
    );
  }
  if (status === "missed") return succeed({ value: { dose, status }, next: statusAt + 1 });
  const at = /^(at|to|until)$/i.test(words[statusAt + 1] ?? "") ? statusAt + 2 : statusAt + 1;
  const phrase = instantPhraseRead(words, at);
  if (!phrase.ok) return phrase;
  if (!phrase.value) return fail(issue("dose-exception-needs-at", { dose, status }));
  const amount = amountClause(words, phrase.value.next);
  if (!amount.ok) return amount;
  const value: ExceptionPhrase = {
    dose,
    status,
    at: phrase.value.value,
    ...(amount.value ? { amount: amount.value.value } : {}),
  };
  return succeed({ value, next: amount.value?.next ?? phrase.value.next });
}
