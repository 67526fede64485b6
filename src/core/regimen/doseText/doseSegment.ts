import type { Result } from "../../result/index.ts";
import type { InstantPhrase } from "../../time/index.ts";
import type { DoseAmount, DoseException } from "../doseLine.ts";
import type { DoseProduct } from "../doseProduct.ts";

export interface DoseTextContext {
  readonly zone: string;
  readonly nowIso: string;
  readonly lane: "given" | "option";
  readonly products: readonly DoseProduct[];
  /** Id of the product meant when none is named. */
  readonly defaultProduct: string;
  readonly newId: () => string;
}

export type ClockPhrase = Required<Pick<InstantPhrase, "time">> & Pick<InstantPhrase, "which">;

/** How the amount was written: a mass or volume, or a number of tablets (of a strength in mg). */
export type AmountPhrase =
  | { readonly kind: "measured"; readonly amount: DoseAmount; readonly part: string }
  | {
      readonly kind: "counted";
      readonly count: number;
      readonly word: string;
      readonly strengthMg?: number;
      readonly part: string;
    };

export interface ExceptionPhrase {
  readonly dose: number;
  readonly status: DoseException["status"];
  readonly at?: InstantPhrase;
  readonly amount?: AmountPhrase;
}

/** What one amount of the text was said to do, clause by clause. */
export interface DoseSegment {
  amount?: AmountPhrase;
  product?: string;
  once?: true;
  everyH?: number;
  timesPerDay?: number;
  isDaily?: true;
  /** 1 for Monday to 7 for Sunday, ascending; `weekdaysPart` is how they were written. */
  weekdays?: readonly number[];
  weekdaysPart?: string;
  /** Several weekdays, "every Monday" or "Mondays": not a single one that needs its date. */
  isWeekly?: true;
  endless?: true;
  days?: number;
  doses?: number;
  iso?: string;
  date?: InstantPhrase["date"];
  /** The day was said with "on" or alone, not with "from": a single day rather than the first of several. */
  isDayOnly?: true;
  startTime?: ClockPhrase;
  clocks: ClockPhrase[];
  exceptions: ExceptionPhrase[];
}

/** A clause read: what it says, and the word after it. null: these words are no such clause. */
export type ClauseRead<T> = Result<{ readonly value: T; readonly next: number } | null>;
