export type * from "./analysisTypes.ts";
export { laneDoses } from "./caseDoses.ts";
export { concentrationAt, hoursSinceDose } from "./concentrationAt.ts";
export { derive, ENGINE } from "./derive.ts";
