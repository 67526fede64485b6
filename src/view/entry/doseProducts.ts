import type { Case } from "../../core/case/index.ts";
import type { MedicineRecord } from "../../core/medicine/index.ts";
import type { DoseProduct } from "../../core/regimen/index.ts";
import { quantityConvert } from "../../core/units/index.ts";

/** The record's products as they are named in dose text: "12-hour modified-release tablet". */
export function doseProducts(record: MedicineRecord): readonly DoseProduct[] {
  return record.products.map(({ id, name, form, strengths, concentration }) => ({
    id,
    name,
    form,
    strengths: strengths.map((strength) => quantityConvert(strength, "mg")),
    ...(concentration ? { concentrationMgPerMl: quantityConvert(concentration, "mg/mL") } : {}),
  }));
}

/** The same with the medicine's name before each, for sentences that stand alone: "theophylline 12-hour modified-release tablet". */
export function doseProductsInFull(record: MedicineRecord): readonly DoseProduct[] {
  return doseProducts(record).map((product) => ({ ...product, name: `${record.name} ${product.name}` }));
}

/** The product meant until another is said: the one last used in the lane or the case, or the only one; null when there is a choice. */
export function doseProductUsual(value: Case, lane: string): string | null {
  const own = lane === "given" ? value.given : (value.options.find((option) => option.id === lane)?.lines ?? []);
  const last = own.at(-1) ?? value.options.flatMap((option) => option.lines).at(-1) ?? value.given.at(-1);
  if (last) return last.product;
  return value.medicine.products.length === 1 ? (value.medicine.products[0]?.id ?? null) : null;
}
