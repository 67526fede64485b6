import { type ConcentrationUnit, concentrationSense, type MedicineRecord } from "../../core/medicine/index.ts";
import { askWords, issueMessage } from "../../core/messages/index.ts";
import { issue } from "../../core/result/index.ts";
import { type Quantity, quantityConvert, quantityPrint } from "../../core/units/index.ts";
import type { QuantityAsk } from "./QuantityField.tsx";

/** More than these would be a list to choose from, not a question. */
const MOST_OFFERED = 2;

const shown = (value: Quantity) => quantityPrint(value, { style: "screen", significant: 4 });

/**
 * A concentration that is everyday for the medicine only in another unit, or far from all it is used at, is asked about.
 * `print`: how the answers name it with a unit (a window its two ends). null: nothing to ask.
 */
export function concentrationAsk<U extends ConcentrationUnit>(
  typed: Quantity<U>,
  record: MedicineRecord,
  print: (value: Quantity) => string = shown,
): QuantityAsk<ConcentrationUnit> | null {
  const sense = concentrationSense(typed, record);
  if (sense === null || sense.verdict === "usual") return null;
  const own = (mgPerL: number) =>
    shown({
      value: quantityConvert({ value: mgPerL, unit: "mg/L" }, record.displayUnit, record.molarMass.value),
      unit: record.displayUnit,
    });
  const others = sense.units.slice(0, MOST_OFFERED).map((unit) => {
    const value = { value: typed.value, unit };
    return { label: askWords.itIs(print(value)), value, isConfirmed: false };
  });
  return {
    text: issueMessage(
      issue(sense.verdict === "far" ? "concentration-far" : "concentration-other-unit", {
        typed: print(typed),
        low: own(sense.lowMgPerL),
        high: own(sense.highMgPerL),
      }),
    ),
    answers: [{ label: askWords.itIs(print(typed)), value: typed, isConfirmed: true }, ...others],
  };
}
