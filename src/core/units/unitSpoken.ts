import type { UnitCode } from "./quantity.ts";

/** "screen": compact, a slash is allowed. "print": the rules for printed orders, "per" instead of a slash. Neither has the Greek letter. */
export type UnitStyle = "screen" | "print";
/** Word for the unit ug: in full (British use) or "mcg" (American use). */
export type MicrogramWord = "microgram" | "mcg";

const PIECES: Readonly<Record<string, string>> = {
  "[lb_av]": "lb",
  "[in_i]": "in",
  a: "years",
  mo: "months",
  d: "days",
  umol: "micromol",
  m2: "m\u00b2",
  "{1.73_m2}": "1.73\u00a0m\u00b2",
  "1": "",
};

/** The word for a unit. Empty for the pure number. */
export function unitSpoken(unit: UnitCode, style: UnitStyle, microgram: MicrogramWord = "microgram"): string {
  if (unit === "/h") return "per h";
  const piece = (code: string): string => (code === "ug" ? microgram : (PIECES[code] ?? code));
  // What stands in braces is a remark with a point in it, not a product.
  const parts = unit
    .split("/")
    .map((part) => (part.startsWith("{") ? [part] : part.split(".")).map(piece).join(style === "screen" ? "·" : " "));
  return parts.join(style === "screen" ? "/" : " per ");
}

/** The word for one of a unit: "year" for exactly 1 a. Units that are symbols have no plural. */
export function unitSpokenOne(unit: UnitCode, style: UnitStyle, microgram: MicrogramWord = "microgram"): string {
  const word = unitSpoken(unit, style, microgram);
  return unit === "a" || unit === "mo" || unit === "d" ? word.slice(0, -1) : word;
}
