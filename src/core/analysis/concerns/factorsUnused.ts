import { type ConcernRule, concern } from "../concernRule.ts";

/** Recorded events the model does not take into account. */
export const factorsUnused: ConcernRule = ({ case: { patient } }) =>
  patient.factors.map((factor, index) =>
    concern(
      "factor-not-used",
      "check",
      { kind: "patient", id: String(index) },
      { kind: factor.kind, detail: factor.detail },
    ),
  );
