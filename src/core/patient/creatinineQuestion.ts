import { issue } from "../result/index.ts";
import type { Quantity } from "../units/index.ts";
import { CREATININE_UMOL_PER_L_PER_MG_PER_DL, creatinineMgPerDl } from "./creatinineMgPerDl.ts";
import type { Doubt } from "./doubt.ts";

/** mg/dL: outside, refused. 0.02 mg/dL is 1.8 umol/L, so that a value typed with the other unit is still asked about, not just refused. */
const LOWEST = 0.005;
const HIGHEST = 150;
/** mg/dL: outside, asked about. */
const LOW = 0.2;
const HIGH = 15;
/** Numbers that are everyday creatinines, in each unit. */
const EVERYDAY = { "mg/dL": [0.2, 15], "umol/L": [18, 1_330] } as const;

/** A look at a serum creatinine: impossible, the other unit by the look of it, or improbable. */
export function creatinineQuestion(creatinine: Quantity<"mg/dL" | "umol/L">): Doubt | null {
  const { value, unit } = creatinine;
  const mgPerDl = Number.isFinite(value) ? creatinineMgPerDl(creatinine) : Number.NaN;
  const data = { value, unit };
  if (!(mgPerDl >= LOWEST && mgPerDl <= HIGHEST)) {
    const factor = unit === "mg/dL" ? 1 : CREATININE_UMOL_PER_L_PER_MG_PER_DL;
    return {
      verdict: "impossible",
      issue: issue("creatinine-impossible", { ...data, lowest: LOWEST * factor, highest: HIGHEST * factor }),
    };
  }
  if (mgPerDl >= LOW && mgPerDl <= HIGH) return null;
  const otherUnit = unit === "mg/dL" ? "umol/L" : "mg/dL";
  const [low, high] = EVERYDAY[otherUnit];
  const code = value >= low && value <= high ? "creatinine-other-unit" : "creatinine-improbable";
  return { verdict: "improbable", issue: issue(code, { ...data, otherUnit }) };
}
