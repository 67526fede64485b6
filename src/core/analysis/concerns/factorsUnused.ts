import { type ConcernRule, concern } from "../concernRule.ts";

/** Recorded events the model does not take into account, and those it does by the user's own figure. */
export const factorsUnused: ConcernRule = ({ case: { patient } }) =>
  patient.factors.map((factor, index) => {
    const about = { kind: "patient", id: `factor-${index}` } as const;
    const { kind, detail, effect } = factor;
    return effect
      ? concern("factor-by-hand", "check", about, {
          kind,
          detail,
          clearance: effect.clearance,
          volume: effect.volume ?? 1,
          onsetDays: effect.onset?.value ?? 0,
        })
      : concern("factor-not-used", "check", about, { kind, detail });
  });
