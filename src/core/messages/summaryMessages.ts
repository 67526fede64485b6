import type { MessageFunction } from "./messageFunction.ts";

/** Why the summary is not printed now. */
export const summaryMessages: Readonly<Record<string, MessageFunction>> = {
  "print-running": () => "The figures of the latest change are still being worked out. Print when they are there.",
  "print-fitting": () => "What the levels make of this patient is still being worked out. Print when it is there.",
  "print-stale": () => "The figures belong to an earlier state of the case. Print when they are worked out again.",
  "print-failed": (data) => `${data.detail} What is shown is from an earlier state of the case.`,
  "print-unsaved": () => "The latest change is not on disk yet. Print when the strip says saved.",
  "print-save-failed": (data) =>
    `${data.detail} The latest change is not on disk: export the case as a file, import it, and print from there.`,
  "print-read-only-changed": () =>
    "This tab is read-only and holds changes that are not on disk. Export the case as a file, import it, and print from there.",
  "print-dragging": () => "A change is under way. Finish or cancel it, then print.",
  "print-no-option": () => "No option is chosen, so there is no order to print. Choose one on the bench.",
  "print-several-options": (data) => `More than one option is chosen (${data.options}). Choose one on the bench.`,
  "print-empty-option": (data) => `The chosen option ${data.option} has no dose line. Add one on the bench.`,
  "print-no-dose-left": (data) =>
    `The chosen option ${data.option} has no dose that counts from the now line on. See its concerns on the bench.`,
};
