import type { UnitCode } from "../units/index.ts";

/** The names a record's formula may use, each with the unit its number is in. `isFemale` is 1 for a woman, 0 for a man. */
export const COVARIATES = {
  weight: "kg",
  idealWeight: "kg",
  adjustedWeight: "kg",
  leanWeight: "kg",
  height: "cm",
  age: "a",
  creatinineClearance: "mL/min",
  albumin: "g/L",
  bodySurface: "m2",
  isFemale: "1",
} as const satisfies Record<string, UnitCode>;

export type CovariateName = keyof typeof COVARIATES;
export const COVARIATE_NAMES = Object.keys(COVARIATES) as [CovariateName, ...CovariateName[]];
/** What is known of the patient; what is not known is left out or undefined. */
export type Covariates = { readonly [N in CovariateName]?: number | undefined };

export function isCovariateName(name: string): name is CovariateName {
  return Object.hasOwn(COVARIATES, name);
}
