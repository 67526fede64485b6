import { issue } from "../result/index.ts";
import type { Doubt } from "./doubt.ts";

/** cm: outside, refused. */
const LOWEST = 30;
const HIGHEST = 272;
/** cm: an adult outside these is asked about. */
const ADULT_LOW = 120;
const ADULT_HIGH = 215;
const ADULT_FROM_YEARS = 18;
/** An adult's height in inches, and in metres, as a number. */
const AS_INCHES = [48, 84] as const;
const AS_METRES = [1, 2.72] as const;

/** A look at a height taken as centimetres: impossible (metres by the look of it), inches by the look of it, or improbable. Without an age, an adult is assumed. */
export function heightQuestion(entry: { readonly heightCm: number; readonly ageYears?: number }): Doubt | null {
  const { heightCm, ageYears } = entry;
  if (heightCm >= AS_METRES[0] && heightCm <= AS_METRES[1])
    return { verdict: "impossible", issue: issue("height-metres", { heightCm }) };
  if (!(heightCm >= LOWEST && heightCm <= HIGHEST)) {
    return { verdict: "impossible", issue: issue("height-impossible", { heightCm, lowest: LOWEST, highest: HIGHEST }) };
  }
  if (ageYears !== undefined && ageYears < ADULT_FROM_YEARS) return null;
  if (heightCm >= AS_INCHES[0] && heightCm <= AS_INCHES[1])
    return { verdict: "improbable", issue: issue("height-inches", { heightCm }) };
  if (heightCm < ADULT_LOW || heightCm > ADULT_HIGH)
    return { verdict: "improbable", issue: issue("height-improbable", { heightCm }) };
  return null;
}
