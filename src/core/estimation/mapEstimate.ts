import { estimateMostLikely } from "./estimateMostLikely.ts";
import { type OralProblem, oralEstimationProblem, oralEta } from "./oralProblem.ts";

export type OralMapEstimate =
  | {
      readonly status: "converged";
      /** Of clearance, volume and ka; 0 for a fixed one. */
      readonly eta: readonly [number, number, number];
      /** L/h, L, 1/h. */
      readonly clearance: number;
      readonly volume: number;
      readonly ka: number;
      readonly objective: number;
      readonly gradientNorm: number;
      /** Of the objective over the η that are not fixed, in that order. */
      readonly hessian: readonly (readonly number[])[];
      /** mg/L at each level. */
      readonly predictions: readonly number[];
      /** (level − prediction)/residual sd; null for a level below the limit. */
      readonly standardisedResiduals: readonly (number | null)[];
      readonly iterations: number;
    }
  | { readonly status: "not-converged"; readonly iterations: number; readonly gradientNorm: number };

/**
 * The most likely clearance, volume and absorption rate of a patient: see estimateMostLikely.
 *
 * Formula: CL = CLtyp·e^η₁, V = Vtyp·e^η₂, ka = katyp·e^η₃ at the minimum of O(η) = Σ residual terms + ½·Σ ηₖ²/ωₖ².
 * @param problem see OralProblem
 * @returns see OralMapEstimate: no figure unless converged
 * Outside: bad arguments, and all omega 0, throw RangeError.
 * Accuracy: η to 1e-5 (tests/outside/mapPublic.test.ts).
 * Source: docs/methods/levels-to-this-patient.md.
 */
export function mapEstimate(problem: OralProblem): OralMapEstimate {
  const estimation = oralEstimationProblem(problem);
  const map = estimateMostLikely(estimation);
  if (map.status !== "converged") return map;
  const { otherMinima: _, ...rest } = map;
  const eta = oralEta(estimation.random, map.eta);
  const { population } = problem;
  return {
    ...rest,
    eta,
    clearance: population.clearance * Math.exp(eta[0]),
    volume: population.volume * Math.exp(eta[1]),
    ka: population.ka * Math.exp(eta[2]),
  };
}
