import type { Case } from "../case/index.ts";
import type { DisplayUnit } from "../medicine/index.ts";
import { numberPrint, quantityConvert, unitDimension, unitSpoken } from "../units/index.ts";

/** How a working writes the concentrations the core counts in mg/L: in the unit the bench shows, and how they came to it. */
export interface WorkingUnit {
  readonly factor: number;
  readonly concentration: string;
  readonly exposure: string;
  /** The step from mg/L; none where that is the unit. */
  readonly steps: readonly string[];
}

export function workingUnit({ medicine }: Pick<Case, "medicine">, unit: DisplayUnit): WorkingUnit {
  const molarMass = medicine.molarMass.value;
  const factor = quantityConvert({ value: 1, unit: "mg/L" }, unit, molarMass);
  const concentration = unitSpoken(unit, "screen");
  const by = unitDimension(unit) === "molar concentration" ? `, by the molar mass ${numberPrint(molarMass)} g/mol` : "";
  return {
    factor,
    concentration,
    exposure: concentration.replace("/", "·h/"),
    steps:
      unit === "mg/L"
        ? []
        : [`counted in mg/L; 1 mg/L = ${numberPrint(factor, { significant: 6 })} ${concentration}${by}`],
  };
}
