import { instantText } from "../time/index.ts";
import { numberPrint } from "../units/index.ts";

/** A concern as a human reads it: a title that says it all, and what to do about it. */
export interface ConcernWords {
  readonly title: string;
  readonly text: string;
}

export type ConcernData = Readonly<Record<string, unknown>>;

export const dataNumber = (data: ConcernData, key: string): number => data[key] as number;
export const dataText = (data: ConcernData, key: string): string => data[key] as string;
export const figure = (value: number): string => numberPrint(value, { significant: 3 });
/** Low ones in micrograms: fewer decimals. */
export const concentration = (value: number): string =>
  Math.abs(value) < 0.1 && value !== 0 ? `${figure(value * 1000)} microgram per L` : `${figure(value)} mg per L`;
export const hours = (value: number): string => `${figure(value)} hours`;
export const when = (data: ConcernData): string =>
  instantText(dataNumber(data, "atMs"), dataText(data, "zone"), "dayClock");
export const countWords = (count: number, one: string, many: string): string => `${count} ${count === 1 ? one : many}`;

/** "CL", "CL and V", "CL, V and ka". */
export function wordList(words: readonly string[]): string {
  const last = words.at(-1) ?? "";
  return words.length < 2 ? last : `${words.slice(0, -1).join(", ")} and ${last}`;
}
