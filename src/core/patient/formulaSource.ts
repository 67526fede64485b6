export type Sex = "female" | "male";

/** Where a formula comes from, shown beside its result. `basis`: read in published text, recalled, or a rule of thumb. */
export interface FormulaSource {
  /** Plain text, names as in the working. */
  readonly formula: string;
  readonly citation: string;
  readonly basis: "seen" | "memory" | "common practice";
}
