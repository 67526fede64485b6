import { type ReferencePatient, recordProfile } from "../../../core/analysis/index.ts";
import { type MedicineRecord, type Product, productOf } from "../../../core/medicine/index.ts";
import { numberPlain, quantityConvert } from "../../../core/units/index.ts";
import { type QuantityDraft, quantityDraftRead } from "../../ui/quantityDraft.ts";

/** Dose and interval as typed. */
export interface CourseDraft {
  readonly dose: QuantityDraft<"mg" | "g" | "ug">;
  readonly interval: QuantityDraft<"h" | "d">;
}

export const DOSE_UNITS = ["mg", "g", "ug"] as const;
export const INTERVAL_UNITS = ["h", "d"] as const;

/** Half-lives from which once a day is what one would try first; a common-practice rule, and only where the fields begin. h */
const ONCE_DAILY_FROM_H = 18;
/** Where a liquid begins. mg */
const LIQUID_DOSE_MG = 100;

/** Where the fields begin: one unit of the product's smallest strength, once or twice a day. */
export function courseDraftAtFirst(record: MedicineRecord, product: string, patient: ReferencePatient): CourseDraft {
  const doseMg = firstDose(productOf(record, product));
  const found = recordProfile(record, patient, { product, doseMg, intervalH: 24 });
  const isFast = found.ok && found.value.halfLifeH !== null && found.value.halfLifeH < ONCE_DAILY_FROM_H;
  return {
    dose: { text: numberPlain(doseMg), unit: "mg" },
    interval: { text: isFast ? "12" : "24", unit: "h" },
  };
}

function firstDose({ strengths }: Product): number {
  return strengths.length > 0 ? Math.min(...strengths.map(({ value }) => value)) : LIQUID_DOSE_MG;
}

export function courseDraftRead(draft: CourseDraft): {
  readonly doseMg: number | null;
  readonly intervalH: number | null;
} {
  const dose = quantityDraftRead(draft.dose, DOSE_UNITS);
  const interval = quantityDraftRead(draft.interval, INTERVAL_UNITS);
  return {
    doseMg: dose.ok ? quantityConvert(dose.value, "mg") : null,
    intervalH: interval.ok ? quantityConvert(interval.value, "h") : null,
  };
}
