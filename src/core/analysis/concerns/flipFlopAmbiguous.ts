import { type ConcernRule, concern } from "../concernRule.ts";

/** This patient's levels leave both readings of the curve standing. */
export const flipFlopAmbiguous: ConcernRule = ({ fit }) => {
  const found = fit.kind === "fitted" ? fit.fit.flipFlop : null;
  if (!found?.isAmbiguous || !found.fastAbsorption || !found.slowAbsorption) return [];
  const { fastAbsorption: fast, slowAbsorption: slow } = found;
  return [
    concern(
      "flip-flop-ambiguous",
      "check",
      { kind: "case" },
      {
        shareSlow: found.shareSlowAbsorption,
        fastAbsorptionH: Math.LN2 / fast.ka,
        fastEliminationH: Math.LN2 / fast.ke,
        fastVolume: fast.volume,
        slowAbsorptionH: Math.LN2 / slow.ka,
        slowEliminationH: Math.LN2 / slow.ke,
        slowVolume: slow.volume,
      },
    ),
  ];
};
