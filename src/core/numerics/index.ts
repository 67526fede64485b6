export { CompensatedSum } from "./compensatedSum.ts";
export { decay } from "./decay.ts";
export { decayDifference } from "./decayDifference.ts";
export { decayDifferenceIntegral } from "./decayDifferenceIntegral.ts";
export { decayIntegral } from "./decayIntegral.ts";
export { expm1Excess } from "./expm1Excess.ts";
export { productError } from "./productError.ts";
export { type Root, rootBracketed } from "./rootBracketed.ts";
export { sumError } from "./sumError.ts";
