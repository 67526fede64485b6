import { type Quantity, quantityConvert, unitDimension } from "../units/index.ts";
import type { MedicineRecord } from "./medicineRecord.ts";

export type ConcentrationUnit = "mg/L" | "ug/mL" | "ug/L" | "ng/mL" | "umol/L" | "nmol/L" | "mmol/L";

/** A concentration is everyday from the lowest wanted over 1.5 to twice the highest wanted, and up to the toxic limit. Our choice, common practice. */
const EVERYDAY_BELOW = 1.5;
const EVERYDAY_ABOVE = 2;
/** Beyond this factor of what the record knows no other unit is needed to doubt it: units slip by 1000, seldom by less. Our choice, common practice. */
const FAR = 20;
/** Units a number may have been meant in, the commonest first; those that are another name of one of them are left out. */
const UNITS = ["mg/L", "ug/L", "umol/L", "nmol/L", "mmol/L"] as const;

export interface ConcentrationSense {
  /** "other-unit": everyday only in one of `units`; "far": beyond twenty times what the record knows. */
  readonly verdict: "usual" | "other-unit" | "far";
  /** Beyond twenty times what the record knows, whether or not another unit helps. */
  readonly isFar: boolean;
  /** Units in which the same number would be everyday; the record's own first. Empty where it is usual. */
  readonly units: readonly (typeof UNITS)[number][];
  /** What the record's windows span, mg/L; without one, up to the toxic limit. */
  readonly lowMgPerL: number;
  readonly highMgPerL: number;
}

/**
 * Whether a concentration as typed makes sense for a medicine: judged by the record's concentration windows and toxic limit.
 * low = lowest lower end (its upper end where that is 0); high = highest upper end.
 * Usual: low / 1.5 to the higher of high · 2 and the toxic limit; or, where no unit makes better sense, low / 20 to high · 20. Without a window the toxic limit stands for high.
 * A number that is usual as it is typed is never questioned, even where it would be usual in another unit too.
 * null without any concentration window or limit: there is nothing to judge by.
 * Example: lithium (0.6 to 1.2 mmol/L), 0.8 mg/L is 0.115 mmol/L: "other-unit", mmol/L.
 */
export function concentrationSense(
  typed: Quantity<ConcentrationUnit>,
  record: Pick<MedicineRecord, "windows" | "toxicFrom" | "molarMass" | "displayUnit">,
): ConcentrationSense | null {
  const mgPerL = (quantity: Quantity) => quantityConvert(quantity, "mg/L", record.molarMass.value);
  const windows = record.windows.filter(({ high }) => unitDimension(high.unit) !== "exposure");
  const lows = windows.map(({ low, high }) => mgPerL(low) || mgPerL(high));
  const toxic = record.toxicFrom ? mgPerL(record.toxicFrom) : 0;
  if (windows.length === 0 && toxic === 0) return null;
  const high = Math.max(0, ...windows.map((window) => mgPerL(window.high)));
  // A record with only a toxic limit knows no low end: nothing is too low for it.
  const low = lows.length === 0 ? 0 : Math.min(...lows);
  const isEveryday = (value: number) =>
    value >= low / EVERYDAY_BELOW && value <= Math.max(high * EVERYDAY_ABOVE, toxic);
  const isNear = (value: number) => value >= low / FAR && value <= (high || toxic) * FAR;
  const span = { isFar: !isNear(mgPerL(typed)), lowMgPerL: low, highMgPerL: high || toxic };

  const value = mgPerL(typed);
  if (isEveryday(value)) return { verdict: "usual", units: [], ...span };
  const own = record.displayUnit;
  const units = [own, ...UNITS.filter((unit) => unit !== own)].filter((unit) => {
    const other = mgPerL({ value: typed.value, unit });
    return other !== value && isEveryday(other);
  });
  if (units.length > 0) return { verdict: "other-unit", units, ...span };
  return { verdict: span.isFar ? "far" : "usual", units: [], ...span };
}
