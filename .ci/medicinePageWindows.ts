import type { MedicineRecord, RecordWindow } from "../src/core/medicine/index.ts";
import {
  numberPrint,
  type Quantity,
  quantityConvert,
  type UnitCode,
  unitDimension,
  unitSpoken,
} from "../src/core/units/index.ts";
import { markdownTable, markdownText } from "./markdown.ts";
import { PROVENANCE, provenanceCells, quantityText, sourcedText } from "./medicinePageFigures.ts";

export function windowsTable(record: MedicineRecord): string {
  return markdownTable(
    ["use", "sampling", "quantity", "mass", "molar", "draw", ...PROVENANCE],
    record.windows.map((window) => [
      markdownText(window.use),
      markdownText(window.sampling),
      window.quantity,
      windowEnds(window, record, "mass"),
      windowEnds(window, record, "molar"),
      drawText(window),
      ...provenanceCells(window),
    ]),
  );
}

/** Both ends in mass and in molar units; the one it is printed in as it is, the other by the molar mass. An AUC has only its own. */
function windowEnds({ low, high }: RecordWindow, record: MedicineRecord, wanted: "mass" | "molar"): string {
  if (low.unit === "mg.h/L") return wanted === "mass" ? `${numberPrint(low.value)} to ${quantityText(high)}` : "";
  return concentrationsText([low, high], record, wanted);
}

/** Concentrations in mass or in molar units: as printed where that is their own kind, else by the molar mass, to three digits. */
export function concentrationsText(
  ends: readonly Quantity[],
  record: MedicineRecord,
  wanted: "mass" | "molar",
): string {
  const first = ends[0] as Quantity;
  const isMolar = unitDimension(first.unit) === "molar concentration";
  const isAsPrinted = isMolar === (wanted === "molar");
  const unit = isAsPrinted ? first.unit : counterpart(first.unit);
  const numbers = ends.map((end) =>
    isAsPrinted && end.unit === unit
      ? numberPrint(end.value)
      : numberPrint(quantityConvert(end, unit, record.molarMass.value), { significant: 3 }),
  );
  return `${numbers.join(" to ")} ${unitSpoken(unit, "screen")}`;
}

/** The unit of the other kind that keeps the numbers readable. */
function counterpart(unit: UnitCode): UnitCode {
  const pairs: Partial<Record<UnitCode, UnitCode>> = {
    "mg/L": "umol/L",
    "ug/L": "nmol/L",
    "umol/L": "mg/L",
    "nmol/L": "ug/L",
    "mmol/L": "mg/L",
  };
  const other = pairs[unit];
  if (!other) throw new RangeError(`unit: "${unit}" is no unit of a window`);
  return other;
}

function drawText({ drawFrom, drawTo }: RecordWindow): string {
  if (!drawFrom && !drawTo) return "";
  const ends = [drawFrom && `from ${sourcedText(drawFrom)}`, drawTo && `to ${sourcedText(drawTo)}`];
  return `hours after the dose: ${ends.filter(Boolean).join(" ")}`;
}
