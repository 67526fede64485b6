import { type ConcernRule, concern } from "../concernRule.ts";

/** Standard deviations between patients: about 1 patient in 20 lies beyond (definition of a normal distribution). */
export const UNUSUAL_OMEGAS = 2;

/** A most likely figure far from the typical patient's. */
export const parameterUnusual: ConcernRule = ({ fit }) =>
  fit.kind !== "fitted"
    ? []
    : fit.fit.parameters.flatMap(({ symbol, words, eta, omega }) =>
        omega > 0 && Math.abs(eta) > UNUSUAL_OMEGAS * omega
          ? [
              concern(
                "parameter-unusual",
                "check",
                { kind: "patient", id: symbol },
                { words, ratio: Math.exp(eta), omegas: eta / omega },
              ),
            ]
          : [],
      );
