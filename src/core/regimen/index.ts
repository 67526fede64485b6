export { type AmountSteps, amountSteps } from "./amountSteps.ts";
export {
  clockTimeSchema,
  DOSE_UNITS,
  type DoseAmount,
  type DoseException,
  type DoseLine,
  type DoseRepeat,
  doseAmountSchema,
  doseLineSchema,
} from "./doseLine.ts";
export { doseLineCount, doseLineEndMs, doseLineFirstMs, doseLineScheduledMs } from "./doseLineEndMs.ts";
export { type DoseEvent, type DoseLineSpan, doseLineExpand, isEndlessLine, MOST_DOSES } from "./doseLineExpand.ts";
export { doseLineGapHours, doseLinePeriodHours } from "./doseLinePeriodHours.ts";
export { type DoseLineTextContext, doseLineText } from "./doseLineText.ts";
export type { DoseProduct } from "./doseProduct.ts";
export type { DoseTextContext } from "./doseText/doseSegment.ts";
export { doseTextRead } from "./doseTextRead.ts";
export { type Divisible, type TabletCount, tabletsFor } from "./tabletsFor.ts";
export { VOLUME_STEP_ML, volumeSteps } from "./volumeSteps.ts";
