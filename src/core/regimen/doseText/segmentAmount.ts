import { fail, issue, type Result, succeed } from "../../result/index.ts";
import type { DoseAmount } from "../doseLine.ts";
import type { DoseProduct } from "../doseProduct.ts";
import type { AmountPhrase } from "./doseSegment.ts";

const MASS_UNITS = ["mg", "g", "ug"] as const;

/** The amount as it stands in a dose line, if it fits the product: a volume needs a liquid, a count needs tablets or capsules of a known strength. */
export function segmentAmount(phrase: AmountPhrase, product: DoseProduct): Result<DoseAmount> {
  const isLiquid = product.form === "liquid" && product.concentrationMgPerMl !== undefined;
  const mismatch = (unit: string): Result<DoseAmount> =>
    fail(
      issue("dose-unit-mismatch", {
        unit,
        product: product.name,
        allowed: isLiquid ? [...MASS_UNITS, "mL"] : MASS_UNITS,
      }),
    );

  if (phrase.kind === "measured") {
    return phrase.amount.unit === "mL" && !isLiquid ? mismatch("mL") : succeed(phrase.amount);
  }
  const { count, word, strengthMg, part } = phrase;
  const form = /^cap/i.test(word) ? "capsule" : "tablet";
  if (product.form !== form) return mismatch(form);
  const strength = strengthMg ?? (product.strengths.length === 1 ? product.strengths[0] : undefined);
  if (strength === undefined) return fail(issue("dose-text-needs-strength", { part, strengths: product.strengths }));
  if (!product.strengths.includes(strength)) {
    return fail(issue("dose-text-strength", { part, product: product.name, strengths: product.strengths }));
  }
  return succeed({ value: Number((count * strength).toPrecision(15)), unit: "mg" });
}
