import { type Case, caseEdit, type Lane } from "../../core/case/index.ts";
import { doseMg, productOf } from "../../core/medicine/index.ts";
import { type DoseAmount, type DoseEvent, type DoseLine, doseLineExpand } from "../../core/regimen/index.ts";
import { type Issue, issue } from "../../core/result/index.ts";
import { instantMs, MS_PER_HOUR } from "../../core/time/index.ts";

/** A line without an end is laid out this far when it is looked at: past the next change of the clocks would be too far to ask about. */
const LOOK_AHEAD_H = 30 * 24;

/** What is wrong with a changed line, before it becomes an edit: an amount the product can't give, a clock time that does not exist, a mark without its dose. */
export function lineFault(line: DoseLine, before: DoseLine, value: Case): Issue | null {
  const isOtherRepeat = repeatKind(line) !== repeatKind(before);
  if (isOtherRepeat && (before.except ?? []).length > 0) return issue("dose-line-has-exceptions");
  const product = productOf(value.medicine, line.product);
  const amounts = [line.amount, ...(line.except ?? []).flatMap((one) => (one.amount ? [one.amount] : []))];
  for (const amount of amounts) {
    const mg = doseMg(amount, product);
    if (!mg.ok) return mg.issues[0] ?? null;
  }
  const fromMs = Math.max(instantMs(line.start), instantMs(value.now));
  const doses = doseLineExpand(line, { zone: value.timeZone, untilMs: fromMs + LOOK_AHEAD_H * MS_PER_HOUR });
  if (!doses.ok) return doses.issues[0] ?? null;
  return doses.value.length === 0 ? issue("dose-none") : null;
}

export function repeatKind({ repeat }: DoseLine): "once" | "every" | "clock" {
  if (!repeat) return "once";
  return "every" in repeat ? "every" : "clock";
}

/** What became of one dose, as one edit: the same steps that keys and drags take, put together. */
export function lineWithDose(
  value: Case,
  lane: Lane,
  line: DoseLine,
  dose: DoseEvent,
  became: { readonly kind: "taken" | "missed" } | { readonly kind: "at"; readonly at: string },
  amount: DoseAmount,
): DoseLine {
  const address = { lane, lineId: line.id, index: dose.index };
  let changed = caseEdit(value, "doseMark", { ...address, status: became.kind === "missed" ? "missed" : "taken" });
  if (became.kind === "at") changed = caseEdit(changed, "doseMove", { ...address, at: became.at });
  const isOtherAmount = amount.value !== dose.amount.value || amount.unit !== dose.amount.unit;
  if (became.kind !== "missed" && isOtherAmount) changed = caseEdit(changed, "doseScale", { ...address, amount });
  const lines = lane === "given" ? changed.given : (changed.options.find((one) => one.id === lane)?.lines ?? []);
  return lines.find((one) => one.id === line.id) ?? line;
}
