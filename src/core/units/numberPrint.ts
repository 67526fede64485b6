import { type Decimal, decimalMagnitude, decimalOf, decimalRound, decimalText } from "./decimal.ts";

export interface NumberPrintOptions {
  /** Significant digits to round to, 1 to 15. Whole-number digits are never rounded away: 1256 stays 1,256. */
  readonly significant?: number;
  /** Decimal places to round to, 0 to 15. */
  readonly decimals?: number;
}

/** U+2212: a minus that is neither a hyphen nor a dash and does not break from its number at a line's end. Screen and print. */
const MINUS = "\u2212";

/** The rounded decimal that `numberPrint` shows; with no option the value as it is. */
export function decimalRounded(value: number, options: NumberPrintOptions): Decimal {
  const { significant, decimals } = options;
  if (significant !== undefined && decimals !== undefined)
    throw new RangeError("options: give significant or decimals, not both");
  const exact = decimalOf(value);
  if (decimals !== undefined) {
    if (!Number.isInteger(decimals) || decimals < 0 || decimals > 15)
      throw new RangeError(`decimals: ${decimals}; allowed 0 to 15`);
    return decimalRound(exact, -decimals);
  }
  if (significant !== undefined) {
    if (!Number.isInteger(significant) || significant < 1 || significant > 15) {
      throw new RangeError(`significant: ${significant}; allowed 1 to 15`);
    }
    return decimalRound(exact, Math.min(0, decimalMagnitude(exact) - significant + 1));
  }
  return exact;
}

function wholeAndFraction(decimal: Decimal, minus: string, separator: string): string {
  const { whole, fraction } = decimalText(decimal);
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, separator);
  const sign = decimal.isNegative && decimal.digits !== 0n ? minus : "";
  return `${sign}${grouped}${fraction === "" ? "" : `.${fraction}`}`;
}

/**
 * A number for the eye, by the published rules for error-prone notation: no trailing zero, a leading zero below one,
 * a comma between thousands from 1,000 on, never an exponent, rounding half away from zero on the decimal as written.
 * A value that is not finite throws RangeError: it must not reach a screen.
 */
export function numberPrint(value: number, options: NumberPrintOptions = {}): string {
  return wholeAndFraction(decimalRounded(value, options), MINUS, ",");
}

/** A number for a text field: exact, no thousands comma, a plain hyphen for minus; `numberRead` reads it back to the same value. */
export function numberPlain(value: number): string {
  return wholeAndFraction(decimalOf(value), "-", "");
}
