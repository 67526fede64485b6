import type { Case } from "../case/index.ts";
import { quantityConvert } from "../units/index.ts";

/** A figure a draw, in the order of the draws, mg/L. */
interface HighestLevels {
  /** Over the span shown. */
  readonly span: ArrayLike<number>;
  /** At steady state, of what the limit is for; infinite where the draw never settles. null for an option that does not repeat. */
  readonly steady: ArrayLike<number> | null;
}

/**
 * Share of the draws that reach the record's toxic limit, over the span or once steady; a level that rises without end reaches it. Where the
 * limit is for the level just before a dose, at steady state alone. null without a limit or anything it is about.
 */
export function toxicChance({ medicine }: Case, { span, steady }: HighestLevels): number | null {
  const limit = medicine.toxicFrom;
  const isTrough = medicine.toxicAt === "trough";
  if (!limit || (isTrough && !steady)) return null;
  const from = quantityConvert({ value: limit.value, unit: limit.unit }, "mg/L", medicine.molarMass.value);
  let reached = 0;
  for (let n = 0; n < span.length; n++) {
    const highest = Math.max(isTrough ? 0 : span[n]!, steady?.[n] ?? 0);
    if (highest >= from) reached++;
  }
  return reached / span.length;
}
