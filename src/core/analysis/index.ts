export { type AmountsOverTime, amountsOverTime } from "./amountsAt.ts";
export type * from "./analysisTypes.ts";
export { laneDoses } from "./caseDoses.ts";
export { concentrationAt, hoursSinceDose } from "./concentrationAt.ts";
export { crossCheckAdded } from "./crossCheckAdded.ts";
export { type DeriveOptions, derive, deriveSteps, ENGINE } from "./derive.ts";
export { eventInteractions, interactionsFor } from "./eventInteractions.ts";
export type * from "./fitTypes.ts";
export { concentrationWindow } from "./optionReadings.ts";
export {
  RECORD_DOSE_MOST_MG,
  RECORD_INTERVAL_LEAST_H,
  RECORD_INTERVAL_MOST_H,
  type RecordCourse,
  type RecordProfile,
  type RecordReadings,
  recordProfile,
} from "./recordProfile.ts";
export { type ReferencePatient, referenceCovariates } from "./referenceCovariates.ts";
export { TAUGHT_LITTLE, TAUGHT_MUCH } from "./taughtThresholds.ts";
export { BEFORE_DOSE_H } from "./troughTime.ts";
export { windowDrawH, windowDrawnAt } from "./windowTiming.ts";
