import { issueMessage } from "../../core/messages/index.ts";
import { type Issue, issue } from "../../core/result/index.ts";
import type { SaveOutcome } from "./ports.ts";
import type { Saving } from "./workbenchState.ts";

export type SavingReason = NonNullable<Saving["reason"]>;
type Failure = Extract<SaveOutcome, { ok: false }>;

const SAVE_CODES: Readonly<Record<Failure["reason"], string>> = {
  quota: "save-quota",
  newer: "save-newer",
  closed: "save-closed",
  failed: "save-failed",
  // The writer's place is claimed before a case is edited; a save still refused met another tab's later save.
  "read-only": "save-overtaken",
};

export function failureIssue({ reason, detail }: Failure): Issue {
  return issue(SAVE_CODES[reason], { detail });
}

export function failureSaving(failure: Failure, savedAt: number | null): Saving {
  const reason: SavingReason = failure.reason === "read-only" ? "other-tab" : failure.reason;
  return { status: "failed", savedAt, reason, detail: issueMessage(failureIssue(failure)) };
}

const READER_CODES = { newer: "save-newer", "other-tab": "save-other-tab" } as const;

export function readerSaving(reason: keyof typeof READER_CODES, savedAt: number | null): Saving {
  return { status: "read-only", savedAt, reason, detail: issueMessage(issue(READER_CODES[reason])) };
}
