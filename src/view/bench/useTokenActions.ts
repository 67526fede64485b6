import type { DoseMark } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { doseStepped, productOf } from "../../core/medicine/index.ts";
import { instantIso } from "../../core/time/index.ts";
import { useWorkbench } from "../useWorkbench.ts";

/** What can be done to one dose, the same for keys, buttons and drags. */
export function useTokenActions(value: Case, lane: string, mark: DoseMark, originMs: number) {
  const edit = useWorkbench((state) => state.edit);
  const address = { lane, lineId: mark.lineId, index: mark.index };
  const token = `${lane} ${mark.lineId} ${mark.index}`;
  const moveTo = (ms: number) =>
    edit("doseMove", { ...address, at: instantIso(Math.round(ms), value.timeZone) }, token);
  return {
    moveTo,
    moveByMinutes: (minutes: number) => moveTo(originMs + mark.atH * 3_600_000 + minutes * 60_000),
    toggleMissed: () => edit("doseMark", { ...address, status: mark.status === "missed" ? "taken" : "missed" }),
    /** The next amount that can be made of the product, up or down. */
    step: (direction: -1 | 1) => {
      if (mark.status === "missed") return;
      const amount = doseStepped(mark.amount, productOf(value.medicine, mark.product), direction);
      // No further step: an amount that stays is no exception of the dose.
      if (amount === mark.amount) return;
      edit("doseScale", lane === "given" ? { ...address, amount } : { lane, lineId: mark.lineId, amount }, token);
    },
    remove: () => edit("lineRemove", { lane, id: mark.lineId }),
  };
}
