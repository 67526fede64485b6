import type { Case } from "../../core/case/index.ts";
import { doseSense } from "../../core/medicine/index.ts";
import { askWords, issueMessage } from "../../core/messages/index.ts";
import type { DoseLine } from "../../core/regimen/index.ts";
import { issue } from "../../core/result/index.ts";
import { quantityPrint } from "../../core/units/index.ts";
import type { FieldAsk } from "../ui/fieldQuestion.ts";

const shown = (mg: number) => quantityPrint({ value: mg, unit: "mg" }, { style: "screen", significant: 6 });

/** A dose far above the record's maximum is asked about before it counts; `taken` is what counts then. null: nothing to ask. */
export function doseAsk<T>(lines: readonly DoseLine[], { medicine }: Case, taken: T): FieldAsk<T> | null {
  const [sense] = lines.flatMap((line) => doseSense(line, medicine) ?? []);
  if (!sense) return null;
  const typed = shown(sense.mg);
  return {
    text: issueMessage(
      issue("dose-far-above", { typed, per: sense.per, limit: shown(sense.limitMg), of: sense.limit }),
    ),
    answers: [{ label: askWords.meant(typed), value: taken, isConfirmed: true }],
  };
}
