import { fail, issue, type Result, succeed } from "../result/index.ts";

/** A double holds this many decimal digits without loss. */
const MOST_DIGITS = 15;

/**
 * Reads a decimal number strictly: ASCII digits, one optional point between digits, an optional leading hyphen for minus, spaces around trimmed.
 * Everything else is refused with a code (number-*) and, where one can be named, a suggestion; nothing is guessed.
 */
export function numberRead(text: string): Result<number> {
  const trimmed = text.replace(/^[ \t]+|[ \t]+$/g, "");
  const refuse = (code: string, data: Record<string, unknown> = {}) =>
    fail<number>(issue(code, { text: trimmed, ...data }));

  if (trimmed === "") return refuse("number-empty");
  if (/[\u00a0\u2000-\u200b\u202f\u205f\u3000\ufeff]/.test(trimmed)) return refuse("number-space");
  if (/[\u2212\u2010-\u2015]/.test(trimmed)) return refuse("number-minus");
  if (/[^\P{Nd}0-9]/u.test(trimmed)) return refuse("number-digits");
  if (/^-?\d+,\d+$/.test(trimmed) && !/^-?[1-9]\d{0,2},\d{3}$/.test(trimmed)) {
    return refuse("number-comma", { suggestion: trimmed.replace(",", ".") });
  }
  if (/^-?[1-9]\d{0,2}(,\d{3})+(\.\d+)?$/.test(trimmed)) {
    return refuse("number-thousands", { suggestion: trimmed.replaceAll(",", "") });
  }
  if (/^-?(\d+\.?\d*|\.\d+)e[+-]?\d+$/i.test(trimmed)) return refuse("number-exponent");
  if (/^-?\.\d+$/.test(trimmed)) return refuse("number-leading-point", { suggestion: trimmed.replace(".", "0.") });
  if (/^-?\d+\.$/.test(trimmed)) return refuse("number-trailing-point", { suggestion: trimmed.slice(0, -1) });
  if (/^-?0\d/.test(trimmed)) return refuse("number-leading-zero");
  if (!/^-?\d+(\.\d+)?$/.test(trimmed)) return refuse("number-format");
  if (trimmed.replace(/^[-0.]+|\./g, "").length > MOST_DIGITS) return refuse("number-too-long", { most: MOST_DIGITS });
  const value = Number(trimmed);
  return succeed(value === 0 ? 0 : value);
}
