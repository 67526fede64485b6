/**
 * A number as the decimal a person sees: sign · digits · 10^exponent, from the shortest decimal that reads back to the same double.
 * Printing and converting work on this, so 2.01 g is 2010 mg and 1.005 rounds to 1.01.
 */
export interface Decimal {
  readonly isNegative: boolean;
  readonly digits: bigint;
  readonly exponent: number;
}

export function decimalOf(value: number): Decimal {
  if (!Number.isFinite(value)) throw new RangeError(`value: ${value} is not a finite number`);
  const [mantissa = "0", power = "0"] = Math.abs(value).toExponential().split("e");
  const [whole = "0", fraction = ""] = mantissa.split(".");
  return { isNegative: value < 0, digits: BigInt(whole + fraction), exponent: Number(power) - fraction.length };
}

/** Drops digits right of 10^place, rounding half away from zero. `place` is the lowest power of ten kept: -2 keeps hundredths. */
export function decimalRound(decimal: Decimal, place: number): Decimal {
  const drop = place - decimal.exponent;
  if (drop <= 0) return decimal;
  const scale = 10n ** BigInt(drop);
  return { ...decimal, digits: (decimal.digits + scale / 2n) / scale, exponent: place };
}

/** The power of ten of the leading digit: 2 for 123, -3 for 0.0045. Zero has 0. */
export function decimalMagnitude(decimal: Decimal): number {
  if (decimal.digits === 0n) return 0;
  return decimal.digits.toString().length - 1 + decimal.exponent;
}

/** Whole and fractional digits as text, without sign, without trailing zeros: 0.50 gives ["0", "5"]. */
export function decimalText(decimal: Decimal): { readonly whole: string; readonly fraction: string } {
  const digits = decimal.digits.toString();
  if (decimal.exponent >= 0) {
    const whole = decimal.digits === 0n ? "0" : digits + "0".repeat(decimal.exponent);
    return { whole, fraction: "" };
  }
  const padded = digits.padStart(1 - decimal.exponent, "0");
  const cut = padded.length + decimal.exponent;
  return { whole: padded.slice(0, cut), fraction: padded.slice(cut).replace(/0+$/, "") };
}

/**
 * The double nearest to digits · 10^exponent · numerator / denominator.
 * Kept to 30 significant digits before the one rounding to double, so the result is the correctly rounded one save for ties beyond the 30th digit.
 */
export function decimalScaled(decimal: Decimal, numerator: bigint, denominator: bigint): number {
  const KEPT = 30;
  const top = decimal.digits * numerator;
  const lift = Math.max(0, KEPT - (top.toString().length - denominator.toString().length));
  const quotient = (top * 10n ** BigInt(lift)) / denominator;
  const value = Number(`${quotient}e${decimal.exponent - lift}`);
  return decimal.isNegative ? -value : value;
}
