import type { DoseMark } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { doseLabelledMg, productOf } from "../../core/medicine/index.ts";
import { amountSteps } from "../../core/regimen/index.ts";
import { instantIso } from "../../core/time/index.ts";
import { quantityConvert } from "../../core/units/index.ts";
import { useWorkbench } from "../useWorkbench.ts";

/** What can be done to one dose, the same for keys, buttons and drags. */
export function useTokenActions(value: Case, lane: string, mark: DoseMark, originMs: number) {
  const edit = useWorkbench((state) => state.edit);
  const address = { lane, lineId: mark.lineId, index: mark.index };
  return {
    moveTo: (ms: number) => edit("doseMove", { ...address, at: instantIso(Math.round(ms), value.timeZone) }),
    moveByMinutes: (minutes: number) =>
      edit("doseMove", {
        ...address,
        at: instantIso(Math.round(originMs + mark.atH * 3_600_000 + minutes * 60_000), value.timeZone),
      }),
    toggleMissed: () => edit("doseMark", { ...address, status: mark.status === "missed" ? "taken" : "missed" }),
    /** The next amount the product's strengths allow, up or down. */
    step: (direction: -1 | 1) => {
      if (mark.status === "missed") return;
      const product = productOf(value.medicine, mark.product);
      const mg = doseLabelledMg(mark.amount, product);
      if (!mg.ok || product.form === "liquid") return;
      const steps = amountSteps(
        mg.value,
        product.strengths.map((strength) => strength.value),
        product.divisible,
      );
      const next = direction > 0 ? steps.up : steps.down;
      if (next === null) return;
      const amount =
        mark.amount.unit === "mL"
          ? mark.amount
          : { value: quantityConvert({ value: next, unit: "mg" }, mark.amount.unit), unit: mark.amount.unit };
      edit("doseScale", lane === "given" ? { ...address, amount } : { lane, lineId: mark.lineId, amount });
    },
    remove: () => edit("lineRemove", { lane, id: mark.lineId }),
  };
}
