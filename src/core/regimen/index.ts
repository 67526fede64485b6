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
