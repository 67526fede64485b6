import type { Issue } from "../result/index.ts";

/**
 * What a look at an entered value says. "impossible": refused. "improbable": asked about, and the answer recorded.
 * The limits are ours, chosen wide (basis: common practice); each stands as a named constant beside its question.
 */
export interface Doubt {
  readonly verdict: "impossible" | "improbable";
  readonly issue: Issue;
}
