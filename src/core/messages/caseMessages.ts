import type { MessageFunction } from "./messageFunction.ts";

type Data = Parameters<MessageFunction>[0];

const said = (value: unknown): string => `"${String(value)}"`;
const list = (values: unknown): string => (Array.isArray(values) ? values.map(String).join(", ") : String(values));
const place = ({ line, column }: Data): string => `line ${String(line)}, column ${String(column)}`;
const dose = (index: unknown): string => `dose ${Number(index) + 1}`;

/** Faults of a case file as a file, and of a case across its fields. */
export const caseMessages: Readonly<Record<string, MessageFunction>> = {
  "file-empty": () => "The file is empty.",
  "file-too-large": ({ mostMiB }) => `The file is larger than ${String(mostMiB)} MiB, which no file of Ebbline is.`,
  "file-truncated": (data) =>
    `The file is cut off: it ends in the middle, at ${place(data)}. Look for a complete copy.`,
  "file-corrupt": (data) => `The file is damaged or not JSON: ${said(data.found)} does not belong at ${place(data)}.`,
  "file-lost-character": (data) =>
    `The file is damaged or not UTF-8: a character was lost at ${place(data)}. Look for an undamaged copy.`,
  "file-too-deep": (data) =>
    `The file is nested more than ${String(data.most)} levels deep at ${place(data)}, which no file of Ebbline is.`,
  "file-field-twice": (data) =>
    `The file states the field ${said(data.key)} twice, at ${place(data)}: which one counts can't be known.`,
  "file-field-refused": (data) =>
    `The file has a field named ${said(data.key)} at ${place(data)}, which is never accepted.`,
  "file-number-too-large": (data) => `The number ${String(data.found)} at ${place(data)} is too large to hold.`,

  "case-not-object": () => "The file is not a case: a case file holds one group of fields in braces.",
  "case-format": ({ found, allowed }) =>
    found === null
      ? `The file does not say that it is a case: its format should be ${said(allowed)}.`
      : `The file is a ${said(found)}, not a case (${said(allowed)}).`,
  "case-version": ({ found, known }) =>
    found === null
      ? "The case file does not state its version."
      : `The case file's version ${said(found)} can't be: versions are whole numbers from 1 to ${String(known)}.`,
  "case-newer": ({ found, known }) =>
    `The case was made by a newer version of Ebbline: its file version is ${String(found)}, and this program reads up to ${String(known)}. Nothing was changed.`,

  "id-twice": ({ id }) => `The id ${said(id)} is used twice in one list.`,
  "factor-order": ({ from, to }) => `A factor ends at ${String(to)}, before it begins at ${String(from)}.`,
  "factor-effect-empty": ({ from }) =>
    `A factor with an effect ends at ${String(from)}, the moment it begins: it must last, or be taken away.`,
  "factor-onset": ({ found, most }) =>
    `An onset of ${String(found)} days can't be: write a number above 0 and up to ${String(most)}, or none for an effect that is there at once.`,
  "level-not-positive": ({ found, unit }) =>
    `A level of ${String(found)} ${String(unit)} can't be entered: write a value above 0, or the assay's limit marked as below it.`,
  "option-named-given": () => 'An option can\'t be called "given": that is the name of the given lane.',
  "options-two-chosen": ({ chosen }) => `More than one option is chosen (${list(chosen)}): at most one can be.`,
  "line-product-unknown": ({ product, medicine, allowed }) =>
    `A dose line is of the product ${said(product)}, which the record of ${String(medicine)} does not have; it has ${list(allowed)}.`,
  "line-interval": ({ found, unit }) =>
    `A dose every ${String(found)} ${String(unit)} is impossible: the interval must be above 0.`,
  "line-clock-twice": ({ found }) => `The clock time ${String(found)} stands twice in one dose line.`,
  "line-too-many-doses": ({ found, most }) =>
    `A dose line has ${String(found)} doses: at most ${String(most)} are kept.`,
  "exception-beyond-line": ({ index, doses }) =>
    `An exception is for ${dose(index)} of a line that has ${String(doses)}.`,
  "exception-twice": ({ index }) => `There are two exceptions for ${dose(index)} of a line.`,
  "exception-missed-with-time": ({ index }) =>
    `${dose(index)} of a line is marked missed but has a time or an amount.`.replace("dose", "Dose"),
  "exception-without-time": ({ index, status }) =>
    `${dose(index)} of a line is marked ${String(status)} but has no time.`.replace("dose", "Dose"),
};
