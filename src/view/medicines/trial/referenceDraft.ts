import type { ReferencePatient } from "../../../core/analysis/index.ts";
import { type QuantityDraft, quantityDraftRead } from "../../ui/quantityDraft.ts";

/** The reference patient as typed. */
export interface ReferenceDraft {
  readonly sex: "female" | "male";
  readonly age: QuantityDraft<"a">;
  readonly weight: QuantityDraft<"kg">;
  readonly height: QuantityDraft<"cm">;
  readonly creatinineClearance: QuantityDraft<"mL/min">;
  readonly albumin: QuantityDraft<"g/L">;
}

/** Thought up: an adult of middling size with good kidneys. */
export const REFERENCE_AT_FIRST: ReferenceDraft = {
  sex: "female",
  age: { text: "45", unit: "a" },
  weight: { text: "70", unit: "kg" },
  height: { text: "170", unit: "cm" },
  creatinineClearance: { text: "100", unit: "mL/min" },
  albumin: { text: "42", unit: "g/L" },
};

/** What is left empty, or can't be read, is not stated; its field says why. */
export function referenceDraftRead(draft: ReferenceDraft): ReferencePatient {
  const read = (one: QuantityDraft<"a" | "kg" | "cm" | "mL/min" | "g/L">): number | null => {
    const found = quantityDraftRead(one, [one.unit]);
    return found.ok && found.value.value > 0 ? found.value.value : null;
  };
  return {
    sex: draft.sex,
    ageYears: read(draft.age),
    weightKg: read(draft.weight),
    heightCm: read(draft.height),
    creatinineClearanceMlPerMin: read(draft.creatinineClearance),
    albuminGPerL: read(draft.albumin),
  };
}
