import { fail, issue, succeed } from "../../result/index.ts";
import { quantityConvert, unitDimension, unitWordRead } from "../../units/index.ts";
import { DOSE_UNITS, type DoseAmount } from "../doseLine.ts";
import type { AmountPhrase, ClauseRead } from "./doseSegment.ts";
import { wordNumber } from "./wordNumber.ts";

const COUNTED = /^(tablet|tab|capsule|cap)s?$/i;
/** Words that make the number before them something other than an amount. */
const NOT_AMOUNTS = /^(doses?|days?|weeks?|times?|hourly)$/i;
/** Words that begin the next clause, so that the number before them stands without a unit. */
const CLAUSE_WORDS = /^(once|twice|daily|every|each|from|at|on|for|and|then|of|starting|tomorrow|today)$/i;

/** "300 mg", "5 mL", "2 tablets of 200 mg", "2 tablets", "half a tablet". */
export function amountClause(words: readonly string[], from: number): ClauseRead<AmountPhrase> {
  if (
    words[from]?.toLowerCase() === "half" &&
    words[from + 1]?.toLowerCase() === "a" &&
    COUNTED.test(words[from + 2] ?? "")
  ) {
    return countedAmount(words, from, from + 2, 0.5);
  }
  const number = wordNumber(words[from]);
  if (!number.ok) return number;
  const value = number.value;
  const unitWord = words[from + 1];
  if (value === null || (unitWord !== undefined && NOT_AMOUNTS.test(unitWord))) return succeed(null);
  const part = words.slice(from, from + 2).join(" ");
  if (unitWord === undefined || unitWord === "," || /^\d/.test(unitWord) || CLAUSE_WORDS.test(unitWord)) {
    return fail(issue("dose-text-needs-unit", { part: words[from], expected: "300 mg" }));
  }
  if (value <= 0) return fail(issue("dose-text-amount-not-positive", { part }));
  if (COUNTED.test(unitWord)) return countedAmount(words, from, from + 1, value);
  const unit = DOSE_UNITS.find((code) => code === unitWordRead(unitWord));
  if (unit === undefined) return fail(issue("dose-text-unit", { part: unitWord, amount: words[from] }));
  return succeed({ value: { kind: "measured", amount: { value, unit }, part }, next: from + 2 });
}

function countedAmount(
  words: readonly string[],
  from: number,
  wordAt: number,
  count: number,
): ClauseRead<AmountPhrase> {
  const word = words[wordAt] ?? "";
  if (!Number.isInteger(count * 2)) {
    return fail(issue("dose-text-tablet-part", { part: words.slice(from, wordAt + 1).join(" ") }));
  }
  const strength = words[wordAt + 1]?.toLowerCase() === "of" ? amountClause(words, wordAt + 2) : succeed(null);
  if (!strength.ok) return strength;
  const of = strength.value?.value;
  if (of?.kind !== "measured" || unitDimension(of.amount.unit) !== "mass") {
    return succeed({
      value: { kind: "counted", count, word, part: words.slice(from, wordAt + 1).join(" ") },
      next: wordAt + 1,
    });
  }
  const next = strength.value?.next ?? wordAt + 1;
  const strengthMg = massMg(of.amount);
  return succeed({
    value: { kind: "counted", count, word, strengthMg, part: words.slice(from, next).join(" ") },
    next,
  });
}

function massMg(amount: DoseAmount): number {
  return quantityConvert(amount, "mg");
}
