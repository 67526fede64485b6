import { type ModelDisposition, modelDispositionCheck } from "./modelHistory.ts";

/**
 * The terminal half-life of elimination.
 *
 * Formula: ln 2/ke; two compartments ln 2/β; saturable elimination has none: it is longer the higher the level.
 * @param disposition see ModelDisposition
 * @returns h, or null
 * Outside: bad arguments throw RangeError.
 * Accuracy: relative 1e-15.
 * Source: standard result.
 * @example modelHalfLife({ kind: "one-compartment", clearance: 3, volume: 30 }) // 6.931471805599453
 */
export function modelHalfLife(disposition: ModelDisposition): number | null {
  return modelDispositionCheck("disposition", disposition).halfLife(disposition);
}
