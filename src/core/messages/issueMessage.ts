import type { Issue } from "../result/index.ts";
import { caseMessages } from "./caseMessages.ts";
import { entryMessages } from "./entryMessages.ts";
import { eventMessages } from "./eventMessages.ts";
import { medicineMessages } from "./medicineMessages.ts";
import type { MessageFunction } from "./messageFunction.ts";
import { noncompartmentalMessages } from "./noncompartmentalMessages.ts";
import { numberMessages } from "./numberMessages.ts";
import { patientMessages } from "./patientMessages.ts";
import { recordMessages } from "./recordMessages.ts";
import { regimenMessages } from "./regimenMessages.ts";
import { storageMessages } from "./storageMessages.ts";
import { summaryMessages } from "./summaryMessages.ts";
import { timeMessages } from "./timeMessages.ts";

/** Every sentence a user can read about a fault, one function a code. A folder's sentences stand in one file: one import and one line here. */
const catalogue: Readonly<Record<string, MessageFunction>> = {
  ...medicineMessages,
  ...caseMessages,
  ...entryMessages,
  ...eventMessages,
  ...noncompartmentalMessages,
  ...numberMessages,
  ...patientMessages,
  ...recordMessages,
  ...regimenMessages,
  ...storageMessages,
  ...summaryMessages,
  ...timeMessages,
};

export const MESSAGE_CODES: readonly string[] = Object.keys(catalogue);

/** The sentence for an issue. An unknown code is a programmer's mistake and throws. */
export function issueMessage(issue: Issue): string {
  const message = catalogue[issue.code];
  if (!message) throw new RangeError(`no message for the code "${issue.code}"`);
  return message(issue.data);
}
