import type { Covariates } from "../../../src/core/medicine/index.ts";

/** Invented, with a figure for every name a formula may use. */
export const woman = {
  weight: 58,
  idealWeight: 54.2,
  adjustedWeight: 55.7,
  leanWeight: 41.3,
  height: 162,
  age: 64,
  creatinineClearance: 52,
  albumin: 36,
  bodySurface: 1.6,
  isFemale: 1,
} as const satisfies Required<Covariates>;
