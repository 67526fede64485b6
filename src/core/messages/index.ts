export { benchWords } from "./benchWords.ts";
export type { ConcernWords } from "./concernFigures.ts";
export { CONCERN_CODES, concernMessage, GRAVITY_WORDS } from "./concernMessages.ts";
export { dragWords } from "./dragWords.ts";
export { editLabel } from "./editWords.ts";
export * from "./entryWords.ts";
export { amountsWords, eventEffectWords, eventLine, eventName, eventWords, isEventMoment } from "./eventWords.ts";
export * from "./fieldWords.ts";
export { FIT_CONCERN_CODES, fitFailureSentence, fitLine, noFitSentence } from "./fitMessages.ts";
export {
  chanceWords,
  fitWords,
  influenceWords,
  symbolWords,
  taughtSentence,
  taughtWord,
  windowChanceWords,
} from "./fitWords.ts";
export {
  fitWorkingWords,
  flipFlopWords,
  individualWorking,
  learntDescription,
  levelTimes,
  parameterFigures,
} from "./fitWorkingWords.ts";
export { issueMessage, MESSAGE_CODES } from "./issueMessage.ts";
export { laneLineWords, laneTokenWords } from "./laneWords.ts";
export { levelFitWords } from "./levelFitWords.ts";
export type { MessageFunction } from "./messageFunction.ts";
export { lowestBeforeWords, neverSteadyWords, steadyWithheldWords } from "./patientSteadyWords.ts";
export { recordWords } from "./recordWords.ts";
export { type DoseSentenceContext, doseAmountWords, doseLineSentence } from "./regimenWords.ts";
export { richWords } from "./richWords.ts";
export * from "./screenWords.ts";
export * from "./summaryNextLevelWords.ts";
export * from "./summaryPatientWords.ts";
export * from "./summaryWords.ts";
export { weekdayList, weekdayName } from "./weekdayWords.ts";
export { windowAboutWords, windowQuantityWord, windowRangeWords, windowRemarkWords } from "./windowWords.ts";
export { readingWorking, tracedWords, type WorkingWords } from "./workingWords.ts";
