import type { MessageFunction } from "./messageFunction.ts";

/** What went wrong with, or was done to, the user's own medicine records. */
export const recordMessages: Readonly<Record<string, MessageFunction>> = {
  "medicine-removed": ({ name }) =>
    `The record “${String(name)}” is removed from this device. Cases that use it keep the record as it was when they were started.`,
  "medicine-replaced": ({ name, recordVersion }) =>
    `“${String(name)}” stood here before as record version ${String(recordVersion)} with other figures; the imported file has taken its place.`,
  "medicine-not-back": ({ name }) => `The record “${String(name)}” could not be put back:`,
  "record-draft-not-kept": () =>
    "What you change in a record lasts only while this page is open: it could not be stored until it is saved.",
  "record-profile-failed": ({ detail }) =>
    `No curve can be made of these figures (${String(detail)}): one of them is far outside what the calculation takes.`,
  "record-course-amount": ({ found, most }) =>
    `The dose is ${String(found)} mg; it must be above 0 and at most ${String(most)} mg.`,
  "record-course-interval": ({ found, least, most }) =>
    `The interval is ${String(found)} h; it must be from ${String(least)} to ${String(most)} h.`,
};
