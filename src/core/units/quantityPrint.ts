import { decimalOf, decimalText } from "./decimal.ts";
import { decimalRounded, type NumberPrintOptions, numberPrint } from "./numberPrint.ts";
import type { Quantity } from "./quantity.ts";
import { quantityConvert } from "./quantityConvert.ts";
import { type MicrogramWord, type UnitStyle, unitSpoken, unitSpokenOne } from "./unitSpoken.ts";

export interface QuantityPrintOptions extends NumberPrintOptions {
  readonly style: UnitStyle;
  readonly microgram?: MicrogramWord;
}

const NO_BREAK_SPACE = "\u00a0";

/**
 * A number and its unit for the eye, joined by a non-breaking space.
 * A decimal mg amount below 1 mg is written in micrograms, with the decimals that saves: 0.125 mg prints as 125 microgram, 0.0625 mg as 62.5.
 */
export function quantityPrint(quantity: Quantity, options: QuantityPrintOptions): string {
  const { style, microgram = "microgram" } = options;
  const shown = asMicrograms(quantity, options) ?? { quantity, number: numberPrint(quantity.value, options) };
  const word =
    shown.number === "1"
      ? unitSpokenOne(shown.quantity.unit, style, microgram)
      : unitSpoken(shown.quantity.unit, style, microgram);
  return word === "" ? shown.number : `${shown.number}${NO_BREAK_SPACE}${word}`;
}

function asMicrograms(
  quantity: Quantity,
  options: QuantityPrintOptions,
): { quantity: Quantity; number: string } | null {
  if (quantity.unit !== "mg") return null;
  const rounded = decimalRounded(quantity.value, options);
  const { whole, fraction } = decimalText(rounded);
  if (whole !== "0" || fraction === "") return null;
  const mg = Number(`${rounded.isNegative ? "-" : ""}0.${fraction}`);
  const ug = quantityConvert({ value: mg, unit: "mg" }, "ug");
  // Only where it saves decimals: 0.0625 mg is 62.5 microgram, but nothing is won for an amount of many decimals in both.
  if (decimalText(decimalOf(ug)).fraction.length > Math.max(0, fraction.length - 3)) return null;
  return { quantity: { value: ug, unit: "ug" }, number: numberPrint(ug) };
}
