import { type ConcernRule, concern } from "../concernRule.ts";

export const windowMissing: ConcernRule = ({ case: { window, medicine } }) =>
  window ? [] : [concern("window-missing", "check", { kind: "case" }, { choices: medicine.windows.length })];
