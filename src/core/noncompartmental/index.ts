export { type Area, type AreaMethod, areasUpTo } from "./areaUnderCurve.ts";
export type { LevelPoint } from "./levelPoints.ts";
export { type LogLine, logLineAt } from "./logLine.ts";
export { type NoncompartmentalOptions, noncompartmental } from "./noncompartmental.ts";
export {
  type AfterOneDose,
  type EndLevel,
  EXTRAPOLATED_LIMIT,
  type Noncompartmental,
  type ToInfinity,
  type WithinInterval,
} from "./noncompartmentalTypes.ts";
export type { PointChoice } from "./pointChoice.ts";
export { type Residual, type ResidualsOptions, type ResidualsReading, residualsMethod } from "./residualsMethod.ts";
export { type TerminalCandidate, type TerminalLine, TIE_WITHIN, terminalCandidates } from "./terminalLine.ts";
export { type AbsorbedPoint, type WagnerNelson, wagnerNelson } from "./wagnerNelson.ts";
export { wagnerNelsonRate } from "./wagnerNelsonRate.ts";
