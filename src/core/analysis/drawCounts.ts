import type { Model } from "./analysisTypes.ts";

export interface DrawCounts {
  /** From the posterior. */
  readonly posterior: number;
  /** For each level's forecast and the typical patient's range. */
  readonly aside: number;
  /** Of the posterior by weight, those that carry the bands and readings. */
  readonly carried: number;
}

/** How many draws, as the kind's cost allows. */
export const DRAW_COUNTS: Readonly<Record<Model["kind"], DrawCounts>> = {
  "one-compartment": { posterior: 2_048, aside: 1_024, carried: 1_024 },
  "two-compartment": { posterior: 2_048, aside: 512, carried: 512 },
  saturable: { posterior: 1_024, aside: 256, carried: 256 },
};
