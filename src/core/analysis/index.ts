export type * from "./analysisTypes.ts";
export { laneDoses } from "./caseDoses.ts";
export { derive, ENGINE } from "./derive.ts";
export { concentrationAt, hoursSinceDose } from "./concentrationAt.ts";
