export { type AmountsOverTime, amountsOverTime } from "./amountsAt.ts";
export type * from "./analysisTypes.ts";
export { laneDoses } from "./caseDoses.ts";
export { concentrationAt, hoursSinceDose } from "./concentrationAt.ts";
export { type DeriveOptions, derive, ENGINE } from "./derive.ts";
export type * from "./fitTypes.ts";
