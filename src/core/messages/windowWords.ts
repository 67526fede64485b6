import type { TargetWindow } from "../case/index.ts";

/** What a target window is about, in words. */
const WORDS: Readonly<Record<TargetWindow["quantity"], string>> = {
  trough: "lowest",
  peak: "highest",
  average: "average",
  auc24: "AUC in 24 hours",
  "lowest-and-highest": "lowest and highest",
};

export function windowQuantityWord(quantity: TargetWindow["quantity"]): string {
  return WORDS[quantity];
}
