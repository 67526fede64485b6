import { issue } from "../result/index.ts";
import { type Quantity, quantityConvert } from "../units/index.ts";
import type { Doubt } from "./doubt.ts";

/** g/L: outside, refused. As wide as the everyday values typed with the other unit, so that those are asked about, not just refused. */
const LOWEST = 1;
const HIGHEST = 600;
/** g/L: outside, asked about. */
const LOW = 15;
const HIGH = 55;
const G_PER_L_IN_G_PER_DL = 10;

/** A look at a serum albumin: impossible, the other unit by the look of it, or improbable. */
export function albuminQuestion(albumin: Quantity<"g/L" | "g/dL">): Doubt | null {
  const { value, unit } = albumin;
  const gPerL = Number.isFinite(value) ? quantityConvert(albumin, "g/L") : Number.NaN;
  const factor = unit === "g/L" ? 1 : G_PER_L_IN_G_PER_DL;
  if (!(gPerL >= LOWEST && gPerL <= HIGHEST)) {
    const data = { value, unit, lowest: LOWEST / factor, highest: HIGHEST / factor };
    return { verdict: "impossible", issue: issue("albumin-impossible", data) };
  }
  if (gPerL >= LOW && gPerL <= HIGH) return null;
  const otherUnit = unit === "g/L" ? "g/dL" : "g/L";
  const otherGPerL = quantityConvert({ value, unit: otherUnit }, "g/L");
  const code = otherGPerL >= LOW && otherGPerL <= HIGH ? "albumin-other-unit" : "albumin-improbable";
  return { verdict: "improbable", issue: issue(code, { value, unit, otherUnit }) };
}
