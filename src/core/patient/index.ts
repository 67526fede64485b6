export { adjustedWeight, adjustedWeightSource } from "./adjustedWeight.ts";
export { ageQuestion } from "./ageQuestion.ts";
export { albuminQuestion } from "./albuminQuestion.ts";
export {
  bedsideSchwartz,
  bedsideSchwartzSource,
  SCHWARTZ_BELOW_YEARS,
  SCHWARTZ_FROM_YEARS,
} from "./bedsideSchwartz.ts";
export { bodyMassIndex, bodyMassIndexSource } from "./bodyMassIndex.ts";
export {
  bodySurfaceDuBois,
  bodySurfaceDuBoisSource,
  bodySurfaceMosteller,
  bodySurfaceMostellerSource,
} from "./bodySurface.ts";
export { CKD_EPI_FROM_YEARS, ckdEpi2021, ckdEpi2021Source } from "./ckdEpi2021.ts";
export { clearanceDeindexed, clearanceDeindexedSource, STANDARD_SURFACE_M2 } from "./clearanceDeindexed.ts";
export { clearanceWeight, clearanceWeightSource } from "./clearanceWeight.ts";
export { clearanceQuestion, cockcroftGault, cockcroftGaultSource } from "./cockcroftGault.ts";
export { CREATININE_UMOL_PER_L_PER_MG_PER_DL, creatinineMgPerDl } from "./creatinineMgPerDl.ts";
export { creatinineQuestion } from "./creatinineQuestion.ts";
export type { Doubt } from "./doubt.ts";
export type { FormulaSource, Sex } from "./formulaSource.ts";
export { heightQuestion } from "./heightQuestion.ts";
export { IDEAL_WEIGHT_LOWEST_CM, idealWeightDevine, idealWeightDevineSource } from "./idealWeightDevine.ts";
export {
  LEAN_WEIGHT_LOWEST_INDEX,
  leanWeightJanmahasatian,
  leanWeightJanmahasatianSource,
  leanWeightQuestion,
} from "./leanWeightJanmahasatian.ts";
export {
  PHENYTOIN_ALBUMIN_NORMAL_G_PER_DL,
  PHENYTOIN_FOR_ALBUMIN_RANGE,
  PHENYTOIN_KIDNEY_FAILURE_BELOW,
  type PhenytoinForm,
  phenytoinForAlbumin,
  phenytoinForAlbuminQuestion,
  phenytoinForAlbuminSource,
} from "./phenytoinForAlbumin.ts";
export { weightQuestion } from "./weightQuestion.ts";
