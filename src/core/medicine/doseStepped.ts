import { amountSteps, type DoseAmount, volumeSteps } from "../regimen/index.ts";
import { quantityConvert } from "../units/index.ts";
import { doseLabelledMg } from "./doseMg.ts";
import type { Product } from "./medicineRecord.ts";

/**
 * A dose so many steps up or down in what can be made of the product.
 * tablets and capsules: the next amounts their strengths make (amountSteps), in the dose's own unit;
 * liquid: half millilitres (volumeSteps), in mL, since that is what is measured out.
 *
 * @param steps whole number; below 0 down
 * @returns the dose itself for 0 steps, and the last one there is where there are no more: that is the dose itself where there are none at all.
 * Example: 300 mg from 200 mg tablets, 2 steps up: 600 mg. 80 mg of 80 mg in 15 mL, 1 step up: 15.5 mL.
 */
export function doseStepped(amount: DoseAmount, product: Product, steps: number): DoseAmount {
  if (!Number.isInteger(steps)) throw new RangeError(`steps: ${steps}; allowed whole numbers`);
  let stepped = amount;
  for (let made = 0; made < Math.abs(steps); made += 1) {
    const next = doseNext(stepped, product, steps > 0 ? "up" : "down");
    if (next === null) break;
    stepped = next;
  }
  return stepped;
}

function doseNext(amount: DoseAmount, product: Product, way: "up" | "down"): DoseAmount | null {
  if (product.form === "liquid") {
    const volumeMl = doseVolumeMl(amount, product);
    const next = volumeMl === null ? null : volumeSteps(volumeMl)[way];
    return next === null ? null : { value: next, unit: "mL" };
  }
  const mg = doseLabelledMg(amount, product);
  if (!mg.ok) return null;
  const strengthsMg = product.strengths.map((strength) => strength.value);
  const next = amountSteps(mg.value, strengthsMg, product.divisible)[way];
  return next === null ? null : { value: quantityConvert({ value: next, unit: "mg" }, amount.unit), unit: amount.unit };
}

function doseVolumeMl(amount: DoseAmount, product: Product): number | null {
  if (amount.unit === "mL") return amount.value;
  const mgPerMl = product.concentration && quantityConvert(product.concentration, "mg/mL");
  return mgPerMl ? quantityConvert(amount, "mg") / mgPerMl : null;
}
