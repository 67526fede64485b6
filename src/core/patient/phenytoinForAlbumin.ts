import { issue } from "../result/index.ts";
import type { Doubt } from "./doubt.ts";
import type { FormulaSource } from "./formulaSource.ts";
import { requireWithin } from "./requireWithin.ts";

export type PhenytoinForm = "usual" | "kidney-failure";

const PER_ALBUMIN: Readonly<Record<PhenytoinForm, number>> = { usual: 0.2, "kidney-failure": 0.1 };
/** The share of phenytoin that is free with normal albumin. */
const FREE = 0.1;
/** g/dL: the normal albumin of the formula. From here on there is no low albumin to correct for. */
export const PHENYTOIN_ALBUMIN_NORMAL_G_PER_DL = 4.4;
/** What the formula takes: mg/L and g/dL. */
export const PHENYTOIN_FOR_ALBUMIN_RANGE = { measuredMgPerL: [0, 500], albuminGPerDl: [0.5, 7] } as const;
/** mL/min: below, the form for kidney failure. */
export const PHENYTOIN_KIDNEY_FAILURE_BELOW = 20;

export const phenytoinForAlbuminSource: Readonly<Record<PhenytoinForm, FormulaSource>> = {
  usual: {
    formula: "corrected = measured ÷ (0.2 × albumin in g per dL + 0.1)",
    citation:
      "Sheiner LB, Tozer TN, in Melmon KL, Morelli HF (eds), Clinical Pharmacology, 1978 (citation from memory; formula and its normal albumin of 4.4 g per dL read in a medical-algorithm reference text). Bias: Ann Pharmacother 1995;29:667-670",
    basis: "seen",
  },
  "kidney-failure": {
    formula: "corrected = measured ÷ (0.1 × albumin in g per dL + 0.1)",
    citation:
      "Sheiner LB, Tozer TN, in Melmon KL, Morelli HF (eds), Clinical Pharmacology, 1978 (citation and this form, for kidney failure or a clearance below 20 mL per min, from memory, unverified). Bias: Ann Pharmacother 1995;29:667-670",
    basis: "memory",
  },
};

/**
 * The total phenytoin level that would be measured, with the same free level, if albumin were normal (Sheiner–Tozer).
 *
 * corrected = measured / (0.2 · albumin + 0.1); in kidney failure (0.1 · albumin + 0.1)
 *
 * @param level.measuredMgPerL total phenytoin, mg/L, 0 to 500
 * @param level.albuminGPerDl g/dL, 0.5 to 7
 * @param level.form "kidney-failure" below 20 mL/min
 * @returns mg/L
 *
 * Outside: throws RangeError. Accuracy: rounding only (relative error ≤ 1e-15).
 * Known bias: underpredicts the free level by 12.4 % (−2.7 mg/L; Ann Pharmacother 1995;29:667-670); poor in kidney failure and
 * with displacing medicines (valproate). 0.2 is 0.9 / 4.4 rounded: at 4.4 g/dL, 10 becomes 10.2.
 * Source: Sheiner & Tozer 1978 (citation from memory); the form for kidney failure from memory, unverified.
 * Example: 8 mg/L at 2.5 g/dL: 13.33 mg/L.
 */
export function phenytoinForAlbumin(level: {
  readonly measuredMgPerL: number;
  readonly albuminGPerDl: number;
  readonly form: PhenytoinForm;
}): number {
  const { measuredMgPerL, albuminGPerDl, form } = level;
  requireWithin("measuredMgPerL", measuredMgPerL, "mg/L", ...PHENYTOIN_FOR_ALBUMIN_RANGE.measuredMgPerL);
  requireWithin("albuminGPerDl", albuminGPerDl, "g/dL", ...PHENYTOIN_FOR_ALBUMIN_RANGE.albuminGPerDl);
  return measuredMgPerL / (PER_ALBUMIN[form] * albuminGPerDl + FREE);
}

/** Whether there is a low albumin to correct for. */
export function phenytoinForAlbuminQuestion(albuminGPerDl: number): Doubt | null {
  if (albuminGPerDl < PHENYTOIN_ALBUMIN_NORMAL_G_PER_DL) return null;
  const data = { albuminGPerDl, normal: PHENYTOIN_ALBUMIN_NORMAL_G_PER_DL };
  return { verdict: "improbable", issue: issue("phenytoin-albumin-normal", data) };
}
