import { numberPrint, quantityConvert, quantityPrint, type UnitCode } from "../units/index.ts";
import type { MessageFunction } from "./messageFunction.ts";

type Data = Readonly<Record<string, unknown>>;

const shown = (value: unknown, unit: UnitCode): string =>
  typeof value === "number" && Number.isFinite(value)
    ? quantityPrint({ value, unit }, { style: "screen", significant: 4 })
    : "This value";
const asUnit = (unit: unknown): UnitCode => (unit === "umol/L" ? "umol/L" : "mg/dL");
const word = (unit: unknown): string => (unit === "umol/L" ? "micromol/L" : "mg/dL");
const asAlbuminUnit = (unit: unknown): UnitCode => (unit === "g/dL" ? "g/dL" : "g/L");
const plain = (value: unknown): string => numberPrint(Number(value), { significant: 4 });
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
    `An age of ${shown(ageYears, "a")} is below ${shown(from, "a")}: the clearance and ideal weight here are for adults. Is it meant?`,
  "height-metres": ({ heightCm }: Data) =>
    `${shown(heightCm, "cm")} looks like metres: write ${numberPrint(quantityConvert({ value: Number(heightCm), unit: "m" }, "cm"))} cm.`,
  "height-impossible": ({ heightCm, lowest, highest }: Data) =>
    `${shown(heightCm, "cm")} is no height: write one from ${shown(lowest, "cm")} to ${shown(highest, "cm")}.`,
  "height-inches": ({ heightCm }: Data) =>
    `${shown(heightCm, "cm")} looks like inches: as inches it is ${shown(quantityConvert({ value: Number(heightCm), unit: "[in_i]" }, "cm"), "cm")}. Is it meant in centimetres?`,
  "height-improbable": ({ heightCm }: Data) => `A height of ${shown(heightCm, "cm")} is unusual. Is it meant?`,
  "albumin-impossible": ({ value, unit, lowest, highest }: Data) =>
    `${shown(value, asAlbuminUnit(unit))} is no serum albumin: write one from ${shown(lowest, asAlbuminUnit(unit))} to ${shown(highest, asAlbuminUnit(unit))}.`,
  "albumin-other-unit": ({ value, unit, otherUnit }: Data) =>
    `${shown(value, asAlbuminUnit(unit))} looks like ${asAlbuminUnit(otherUnit)}. Is it meant in ${asAlbuminUnit(unit)}?`,
  "albumin-improbable": ({ value, unit }: Data) =>
    `An albumin of ${shown(value, asAlbuminUnit(unit))} is unusual. Is it meant?`,
  "lean-weight-outside": ({ index, from, to, isChild }: Data) =>
    `The lean-weight formula was made in adults with a body mass index of ${plain(from)} to ${shown(to, "kg/m2")}; this patient ${isChild === true ? "is a child" : `has ${shown(index, "kg/m2")}`}.`,
  "ideal-weight-short": ({ heightCm }: Data) =>
    `The ideal-weight formula starts at ${shown(152.4, "cm")}; at ${shown(heightCm, "cm")} its line is continued.`,
  "kidney-for-comparison": () =>
    "For comparison only: the formulas of the medicine records use the Cockcroft–Gault clearance.",
  "kidney-per-surface": () =>
    "Per 1.73 m² of body surface: not to be compared with a clearance in mL/min until it is de-indexed.",
  "kidney-rate-of-child": () => "For children from 1 year to below 18 years. No medicine record's formula uses it.",
  "phenytoin-albumin-warning": () =>
    "Never used in the fit or the prediction. The correction underpredicts the free level (in one study by 12.4 %, bias −2.7 mg/L) and is poor in kidney failure and beside displacing medicines such as valproate. Measure the free level where it matters.",
  "phenytoin-albumin-normal": ({ albuminGPerDl, normal }: Data) =>
    `Albumin ${shown(albuminGPerDl, "g/dL")} is not low (${shown(normal, "g/dL")} is the formula's normal): there is nothing to correct.`,
  "phenytoin-albumin-kidney-unknown": () =>
    "Kidney function is not known, so that the usual form is used; below 20 mL/min another form would apply.",
  "phenytoin-albumin-displaced": ({ detail }: Data) =>
    `A displacing medicine is recorded (${String(detail)}): the correction does not hold.`,
  "clearance-under-age": ({ ageYears, from }: Data) =>
    `The creatinine clearance formula was made in adults of ${shown(from, "a")} and over; this patient is ${shown(ageYears, "a")} old.`,
};
