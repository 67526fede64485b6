export { benchWords } from "./benchWords.ts";
export { type ConcernWords, concernMessage, GRAVITY_WORDS } from "./concernMessages.ts";
export { editLabel } from "./editWords.ts";
export { MESSAGE_CODES, issueMessage } from "./issueMessage.ts";
export type { MessageFunction } from "./messageFunction.ts";
export { windowQuantityWord } from "./windowWords.ts";
export * from "./fieldWords.ts";
export * from "./screenWords.ts";
export { readingWorking, tracedWords, type WorkingWords } from "./workingWords.ts";
