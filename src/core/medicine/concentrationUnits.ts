import { quantityConvert, unitDimension } from "../units/index.ts";
import type { ConcentrationUnit } from "./concentrationSense.ts";
import type { MedicineRecord } from "./medicineRecord.ts";

const UNITS: readonly ConcentrationUnit[] = ["mg/L", "ug/mL", "umol/L", "ug/L", "ng/mL", "nmol/L", "mmol/L"];
/** A laboratory writes numbers of this size, not 0.0008 or 80,000. Our choice, common practice. */
const LEAST = 0.1;
const MOST = 5_000;

/**
 * The units a concentration of this medicine may be typed in, the record's own first: those in which the middle of its windows is
 * a number from 0.1 to 5,000. Without a concentration window all of them.
 * Example: digoxin ug/L, ng/mL, nmol/L; lithium mmol/L, mg/L, ug/mL, umol/L.
 */
export function concentrationUnits(
  record: Pick<MedicineRecord, "windows" | "molarMass" | "displayUnit">,
): readonly ConcentrationUnit[] {
  const own = record.displayUnit;
  const windows = record.windows.filter(({ high }) => unitDimension(high.unit) !== "exposure");
  const others = UNITS.filter((unit) => unit !== own).filter((unit) => {
    const convert = (end: (typeof windows)[number]["low"]) => quantityConvert(end, unit, record.molarMass.value);
    const middles = windows.map(({ low, high }) => (convert(low) + convert(high)) / 2);
    return middles.every((middle) => middle >= LEAST && middle <= MOST);
  });
  return [own, ...others];
}
