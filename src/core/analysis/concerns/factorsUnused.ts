import { type ConcernRule, concern } from "../concernRule.ts";
import { eventInteractions } from "../eventInteractions.ts";

/** Recorded events the model does not take into account, and those it does by a figure entered with them. What the record knows of is interactionKnown's. */
export const factorsUnused: ConcernRule = ({ case: value }) =>
  value.patient.factors.flatMap((factor, index) => {
    if (eventInteractions(value, factor).length > 0) return [];
    const about = { kind: "patient", id: `factor-${index}` } as const;
    const { kind, detail, effect } = factor;
    return effect
      ? concern("factor-by-hand", "check", about, {
          kind,
          detail,
          clearance: effect.clearance,
          volume: effect.volume ?? 1,
          onsetDays: effect.onset?.value ?? 0,
          source: effect.source ?? null,
        })
      : concern("factor-not-used", "check", about, { kind, detail });
  });
