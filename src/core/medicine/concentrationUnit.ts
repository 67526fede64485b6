import { quantityConvert } from "../units/index.ts";
import type { MedicineRecord } from "./medicineRecord.ts";

/** Windows that lie wholly below this are read in micrograms per litre: fewer decimals, fewer slips. mg/L */
const MICROGRAM_BELOW = 0.1;

/** The mass unit in which this medicine's concentrations are shown and printed; the core always counts in mg/L. */
export function concentrationUnit(record: MedicineRecord): "mg/L" | "ug/L" {
  const highs = record.windows.filter((window) => window.high.unit === "mg/L").map((window) => window.high.value);
  if (record.toxicFrom) highs.push(quantityConvert(record.toxicFrom, "mg/L", record.molarMass.value));
  return highs.length > 0 && Math.max(...highs) < MICROGRAM_BELOW ? "ug/L" : "mg/L";
}
