import { type ConcernRule, concern } from "../concernRule.ts";

/** Chance of a level that rises without end from which it is grave. Our choice, no published limit; as for the toxic limit. */
const GRAVE_FROM = 0.25;

/**
 * Saturable elimination and a dose rate it can't keep up with: the level rises without end. Of this patient wherever so many draws do that
 * no steady-state figure is given; of the typical patient where the order rests on that one.
 */
export const neverSteady: ConcernRule = ({ case: value, options, fit }) =>
  options.flatMap((option) => {
    const { id, individual, typical } = option;
    const about = { kind: "option", id } as const;
    const share = individual?.shareNeverSteady ?? 0;
    return [
      ...(individual && share > 0 && individual.steadyState === null
        ? [concern("never-steady-chance", share >= GRAVE_FROM ? "stop" : "check", about, { option: id, share })]
        : []),
      ...(typical?.noSteadyState === "dose-rate-at-or-above-vmax" && !(individual && value.fit.use === "individual")
        ? [concern("never-steady", "stop", about, { option: id, isFitted: fit.kind === "fitted" })]
        : []),
    ];
  });
