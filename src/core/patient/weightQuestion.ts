import { issue } from "../result/index.ts";
import { quantityConvert } from "../units/index.ts";
import { bodyMassIndex } from "./bodyMassIndex.ts";
import type { Doubt } from "./doubt.ts";
import type { Sex } from "./formulaSource.ts";

/** kg: outside, refused. */
const WEIGHT_LOWEST = 2;
const WEIGHT_HIGHEST = 400;
/** kg: an adult outside these is asked about. */
const ADULT_WEIGHT_LOW = 30;
const ADULT_WEIGHT_HIGH = 200;
const ADULT_FROM_YEARS = 18;
/** kg/m²: beyond these an adult's weight is asked about. */
const BMI_LOW = 12;
const BMI_HIGH = 60;
/** kg/m²: above, the number is tried as pounds. */
const BMI_TRY_POUNDS = 45;
/** kg/m²: where a weight read as pounds makes an everyday adult. */
const BMI_EVERYDAY = [15, 40] as const;
/** kg, where the height is unknown: above, the number is tried as pounds; read as pounds, an everyday adult weighs this much. */
const WEIGHT_TRY_POUNDS = 180;
const WEIGHT_EVERYDAY = [40, 160] as const;

/** A look at a weight taken as kilograms: impossible, pounds by the look of it, or improbable. Without an age, an adult is assumed. */
export function weightQuestion(entry: {
  readonly weightKg: number;
  readonly heightCm?: number;
  readonly sex?: Sex;
  readonly ageYears?: number;
}): Doubt | null {
  const { weightKg, heightCm, ageYears } = entry;
  if (!(weightKg >= WEIGHT_LOWEST && weightKg <= WEIGHT_HIGHEST)) {
    return {
      verdict: "impossible",
      issue: issue("weight-impossible", { weightKg, lowest: WEIGHT_LOWEST, highest: WEIGHT_HIGHEST }),
    };
  }
  const asPoundsKg = quantityConvert({ value: weightKg, unit: "[lb_av]" }, "kg");
  if (looksLikePounds(weightKg, asPoundsKg, heightCm)) {
    return {
      verdict: "improbable",
      issue: issue("weight-pounds", { weightKg, asPoundsKg, ...(heightCm === undefined ? {} : { heightCm }) }),
    };
  }
  if (ageYears !== undefined && ageYears < ADULT_FROM_YEARS) return null;
  const isOutside = weightKg < ADULT_WEIGHT_LOW || weightKg > ADULT_WEIGHT_HIGH;
  const index = heightCm === undefined || !isHeight(heightCm) ? null : bodyMassIndex({ weightKg, heightCm });
  const isOddForHeight = index !== null && (index < BMI_LOW || index > BMI_HIGH);
  if (!isOutside && !isOddForHeight) return null;
  return {
    verdict: "improbable",
    issue: issue("weight-improbable", { weightKg, ...(heightCm === undefined ? {} : { heightCm }) }),
  };
}

const isHeight = (heightCm: number): boolean => heightCm >= 30 && heightCm <= 275;
const within = (value: number, [low, high]: readonly [number, number]): boolean => value >= low && value <= high;

function looksLikePounds(weightKg: number, asPoundsKg: number, heightCm: number | undefined): boolean {
  if (heightCm === undefined || !isHeight(heightCm))
    return weightKg > WEIGHT_TRY_POUNDS && within(asPoundsKg, WEIGHT_EVERYDAY);
  return (
    bodyMassIndex({ weightKg, heightCm }) > BMI_TRY_POUNDS &&
    within(bodyMassIndex({ weightKg: asPoundsKg, heightCm }), BMI_EVERYDAY)
  );
}
