import { instantText } from "../time/index.ts";
import { numberPrint, type UnitCode, unitSpoken } from "../units/index.ts";

/** A concern as a human reads it: a title that says it all, and what to do about it. */
export interface ConcernWords {
  readonly title: string;
  readonly text: string;
}

export type ConcernData = Readonly<Record<string, unknown>>;

export const dataNumber = (data: ConcernData, key: string): number => data[key] as number;
export const dataText = (data: ConcernData, key: string): string => data[key] as string;
export const figure = (value: number): string => numberPrint(value, { significant: 3 });
/**
 * A concentration in mg/L in the unit the medicine is read in, which caseConcerns puts beside the data of every concern.
 * Low ones by mass in micrograms: fewer decimals.
 */
export function concentrationWords(data: ConcernData, mgPerL: number): string {
  const { shownIn } = data as { readonly shownIn?: ShownIn };
  const isLow = Math.abs(mgPerL) < 0.1 && mgPerL !== 0;
  const { unit, factor } =
    shownIn !== undefined && !(shownIn.unit === "mg/L" && isLow)
      ? shownIn
      : ({ unit: isLow ? "ug/L" : "mg/L", factor: isLow ? 1000 : 1 } as const);
  return `${figure(mgPerL * factor)} ${unitSpoken(unit, "print")}`;
}
export const concentration = (data: ConcernData, key: string): string =>
  concentrationWords(data, dataNumber(data, key));
/** How many of `unit` make 1 mg/L. */
interface ShownIn {
  readonly unit: UnitCode;
  readonly factor: number;
}
/** "1 hour", "5.5 hours", "1,000 hours". */
export const hours = (value: number): string => counted(value, "hour");
export const days = (value: number): string => counted(value, "day");
function counted(value: number, word: string): string {
  const shown = figure(value);
  return `${shown} ${word}${shown === "1" ? "" : "s"}`;
}
export const when = (data: ConcernData): string =>
  instantText(dataNumber(data, "atMs"), dataText(data, "zone"), "dayClock");
export const countWords = (count: number, one: string, many: string): string => `${count} ${count === 1 ? one : many}`;

/** "CL", "CL and V", "CL, V and ka". */
export function wordList(words: readonly string[]): string {
  const last = words.at(-1) ?? "";
  return words.length < 2 ? last : `${words.slice(0, -1).join(", ")} and ${last}`;
}

/** Stands behind a figure of the typical patient where this patient has its own beside it; without a fit every figure is the typical one's. */
export const inTypical = (data: ConcernData): string => (data.isFitted === true ? " in the typical patient" : "");
