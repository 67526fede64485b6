import { numberPrint, quantityConvert, quantityPrint, type UnitCode } from "../units/index.ts";
import type { MessageFunction } from "./messageFunction.ts";

type Data = Readonly<Record<string, unknown>>;

const shown = (value: unknown, unit: UnitCode): string =>
  typeof value === "number" && Number.isFinite(value)
    ? quantityPrint({ value, unit }, { style: "screen", significant: 4 })
    : "This value";
const asUnit = (unit: unknown): UnitCode => (unit === "umol/L" ? "umol/L" : "mg/dL");
const word = (unit: unknown): string => (unit === "umol/L" ? "micromol/L" : "mg/dL");
const forHeight = ({ heightCm }: Data): string =>
  heightCm === undefined ? "" : ` at a height of ${shown(heightCm, "cm")}`;

export const patientMessages: Readonly<Record<string, MessageFunction>> = {
  "weight-impossible": ({ weightKg, lowest, highest }: Data) =>
    `${shown(weightKg, "kg")} is no adult's weight: write one from ${shown(lowest, "kg")} to ${shown(highest, "kg")}.`,
  "weight-pounds": (data: Data) =>
    `${shown(data.weightKg, "kg")}${forHeight(data)} looks like pounds: as pounds it is ${shown(data.asPoundsKg, "kg")}. Is it meant in kilograms?`,
  "weight-improbable": (data: Data) => `${shown(data.weightKg, "kg")}${forHeight(data)} is unusual. Is it meant?`,
  "creatinine-impossible": ({ value, unit, lowest, highest }: Data) =>
    `${shown(value, asUnit(unit))} is no serum creatinine: write one from ${shown(lowest, asUnit(unit))} to ${shown(highest, asUnit(unit))}.`,
  "creatinine-other-unit": ({ value, unit, otherUnit }: Data) =>
    `${shown(value, asUnit(unit))} looks like ${word(otherUnit)}. Is it meant in ${word(unit)}?`,
  "creatinine-improbable": ({ value, unit }: Data) =>
    `A creatinine of ${shown(value, asUnit(unit))} is unusual. Is it meant?`,
  "age-impossible": ({ ageYears, highest }: Data) =>
    `${shown(ageYears, "a")} is no age: write one above 0, up to ${shown(highest, "a")}.`,
  "age-birth-year": ({ ageYears }: Data) => `${String(ageYears)} looks like a year of birth: write the age in years.`,
  "age-improbable": ({ ageYears }: Data) => `An age of ${shown(ageYears, "a")} is unusual. Is it meant?`,
  "age-under-adult": ({ ageYears, from }: Data) =>
    `An age of ${shown(ageYears, "a")} is below ${shown(from, "a")}: the formulas here are for adults. Is it meant?`,
  "height-metres": ({ heightCm }: Data) =>
    `${shown(heightCm, "cm")} looks like metres: write ${numberPrint(quantityConvert({ value: Number(heightCm), unit: "m" }, "cm"))} cm.`,
  "height-impossible": ({ heightCm, lowest, highest }: Data) =>
    `${shown(heightCm, "cm")} is no height: write one from ${shown(lowest, "cm")} to ${shown(highest, "cm")}.`,
  "height-inches": ({ heightCm }: Data) =>
    `${shown(heightCm, "cm")} looks like inches: as inches it is ${shown(quantityConvert({ value: Number(heightCm), unit: "[in_i]" }, "cm"), "cm")}. Is it meant in centimetres?`,
  "height-improbable": ({ heightCm }: Data) => `A height of ${shown(heightCm, "cm")} is unusual. Is it meant?`,
  "clearance-under-age": ({ ageYears, from }: Data) =>
    `The creatinine clearance formula was made in adults of ${shown(from, "a")} and over; this patient is ${shown(ageYears, "a")} old.`,
};
