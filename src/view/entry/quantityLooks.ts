import { askWords, issueMessage } from "../../core/messages/index.ts";
import {
  ageQuestion,
  albuminQuestion,
  creatinineQuestion,
  type Doubt,
  heightQuestion,
  weightQuestion,
} from "../../core/patient/index.ts";
import { type Quantity, quantityConvert, quantityPrint, type UnitCode } from "../../core/units/index.ts";
import type { QuantityAsk, QuantityLook } from "../ui/QuantityField.tsx";

/** Second looks at what was typed about the patient: core/patient says what is odd, here are the answers that are offered. */

export type WeightUnit = "kg" | "[lb_av]";
export type CreatinineUnit = "mg/dL" | "umol/L";
export type AlbuminUnit = "g/L" | "g/dL";
export type HeightUnit = "cm" | "[in_i]" | "m";

/** What is already known and makes a value odd or not. */
export interface KnownTraits {
  readonly ageYears?: number;
  readonly heightCm?: number;
  readonly sex?: "female" | "male";
}

const shown = (value: Quantity) => quantityPrint(value, { style: "screen", significant: 4 });

function lookOf<U extends UnitCode>(
  doubt: Doubt | null,
  typed: Quantity<U>,
  answers: QuantityAsk<U>["answers"] = [],
): QuantityLook<U> {
  if (!doubt) return { kind: "fine" };
  if (doubt.verdict === "impossible") return { kind: "refused", issue: doubt.issue };
  const own = answers.length > 0 ? askWords.itIs(shown(typed)) : askWords.meant(shown(typed));
  return {
    kind: "asked",
    ask: { text: issueMessage(doubt.issue), answers: [{ label: own, value: typed, isConfirmed: true }, ...answers] },
  };
}

export function ageLook(typed: Quantity<"a">): QuantityLook<"a"> {
  return lookOf(ageQuestion(typed.value), typed);
}

export function heightLook(typed: Quantity<HeightUnit>, known: KnownTraits): QuantityLook<HeightUnit> {
  const heightCm = quantityConvert(typed, "cm");
  const doubt = heightQuestion({ heightCm, ...(known.ageYears === undefined ? {} : { ageYears: known.ageYears }) });
  const asInches = { value: typed.value, unit: "[in_i]" } as const;
  const isInches = doubt?.issue.code === "height-inches" && typed.unit === "cm";
  return lookOf(doubt, typed, isInches ? [converted(asInches, "cm")] : []);
}

export function weightLook(typed: Quantity<WeightUnit>, known: KnownTraits): QuantityLook<WeightUnit> {
  const doubt = weightQuestion({ weightKg: quantityConvert(typed, "kg"), ...known });
  const isPounds = doubt?.issue.code === "weight-pounds";
  // Said to be pounds already: "looks like pounds" has been answered.
  if (isPounds && typed.unit === "[lb_av]") return { kind: "fine" };
  const asPounds = { value: typed.value, unit: "[lb_av]" } as const;
  return lookOf(doubt, typed, isPounds ? [converted(asPounds, "kg")] : []);
}

export function creatinineLook(typed: Quantity<CreatinineUnit>): QuantityLook<CreatinineUnit> {
  const doubt = creatinineQuestion(typed);
  if (doubt?.issue.code !== "creatinine-other-unit") return lookOf(doubt, typed);
  const other = { value: typed.value, unit: typed.unit === "mg/dL" ? "umol/L" : "mg/dL" } as const;
  return lookOf(doubt, typed, [{ label: askWords.itIs(shown(other)), value: other, isConfirmed: false }]);
}

export function albuminLook(typed: Quantity<AlbuminUnit>): QuantityLook<AlbuminUnit> {
  const doubt = albuminQuestion(typed);
  if (doubt?.issue.code !== "albumin-other-unit") return lookOf(doubt, typed);
  const other = { value: typed.value, unit: typed.unit === "g/L" ? "g/dL" : "g/L" } as const;
  return lookOf(doubt, typed, [{ label: askWords.itIs(shown(other)), value: other, isConfirmed: false }]);
}

/** "It is 180 lb: use 81.65 kg": kept as pounds, the unit it was measured in. */
function converted<U extends UnitCode>(value: Quantity<U>, to: UnitCode): QuantityAsk<U>["answers"][number] {
  const label = askWords.itIsUse(shown(value), shown({ value: quantityConvert(value, to), unit: to }));
  return { label, value, isConfirmed: false };
}
