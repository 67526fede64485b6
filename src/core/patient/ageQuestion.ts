import { issue } from "../result/index.ts";
import type { Doubt } from "./doubt.ts";

/** Years: outside, refused. */
const HIGHEST = 130;
/** Years: above, asked about. */
const HIGH = 105;
const ADULT_FROM = 18;

/** A look at an age in years: impossible (a year of birth by the look of it), improbable, or not an adult. */
export function ageQuestion(ageYears: number): Doubt | null {
  if (Number.isInteger(ageYears) && ageYears >= 1900 && ageYears < 2200) {
    return { verdict: "impossible", issue: issue("age-birth-year", { ageYears }) };
  }
  if (!(ageYears > 0 && ageYears <= HIGHEST))
    return { verdict: "impossible", issue: issue("age-impossible", { ageYears, highest: HIGHEST }) };
  if (ageYears > HIGH) return { verdict: "improbable", issue: issue("age-improbable", { ageYears }) };
  if (ageYears < ADULT_FROM)
    return { verdict: "improbable", issue: issue("age-under-adult", { ageYears, from: ADULT_FROM }) };
  return null;
}
