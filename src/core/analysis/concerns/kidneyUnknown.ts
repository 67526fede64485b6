import { type ConcernRule, concern } from "../concernRule.ts";

export const kidneyUnknown: ConcernRule = ({ patient, case: { patient: facts } }) => {
  if (patient.creatinineClearance) return [];
  const missing = [
    ...(facts.sex === undefined ? ["sex"] : []),
    ...(facts.age === undefined ? ["age"] : []),
    ...(patient.weight === null ? ["weight"] : []),
    ...(patient.creatinine === null ? ["creatinine"] : []),
  ];
  return missing.length === 0 ? [] : [concern("kidney-unknown", "note", { kind: "patient" }, { missing })];
};
