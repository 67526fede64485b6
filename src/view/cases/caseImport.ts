import type { Case } from "../../core/case/index.ts";
import type { Result } from "../../core/result/index.ts";

/** What came of the last file given to the screen. */
export interface ImportOutcome {
  readonly fileName: string;
  readonly result: Result<Case>;
}

/** Read at most this much, bytes: more than any file the parser takes, so that it is the parser that refuses a larger one. */
const READ_MOST = 64 * 1024 * 1024;

/** Reads the file as text and hands it to the one import; the file's own name goes into the sentences. */
export async function caseImport(
  file: File,
  importFile: (name: string, text: string) => Promise<Result<Case>>,
): Promise<ImportOutcome> {
  return { fileName: file.name, result: await importFile(file.name, await file.slice(0, READ_MOST).text()) };
}
