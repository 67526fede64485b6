import { quantileOfSorted, SPREAD_PROBABILITIES } from "../../src/core/analysis/spreadOf.ts";
import { systematicDraws } from "../../src/core/analysis/systematicDraws.ts";
import {
  type Draws,
  drawLevels,
  type EstimationProblem,
  estimateMostLikely,
  estimatePosterior,
  priorDraws,
} from "../../src/core/estimation/index.ts";
import { seededRandom } from "../../src/core/numerics/index.ts";
import type { CalibrationModel } from "./calibrationModels.ts";
import type { SimulatedPatient } from "./simulatedPatient.ts";

/** Independent, equally weighted draws the truth is ranked among. */
export const RANK_DRAWS = 104;

/** 5, 25, 50, 75, 95 % of what is forecast, mg/L, one array a probability. */
export type ForecastBand = readonly Float64Array[];

export type PatientFit =
  | { readonly status: "not-converged" | "withheld" }
  | {
      readonly status: "drawn";
      readonly method: "importance" | "chain";
      readonly paretoK: number | null;
      /** Of the truth among the draws, 0 to RANK_DRAWS: each random parameter, then the next trough. */
      readonly ranks: readonly number[];
      readonly band: ForecastBand;
    };

/** What the engine makes of a simulated patient, by the road the program takes. */
export function patientFit(model: CalibrationModel, patient: SimulatedPatient, problem: EstimationProblem): PatientFit {
  const map = estimateMostLikely(problem);
  if (map.status !== "converged") return { status: "not-converged" };
  const posterior = estimatePosterior(problem, map, { draws: model.draws.posterior, seed: patient.seed });
  if (posterior.status !== "drawn") return { status: "withheld" };
  return {
    status: "drawn",
    method: posterior.method,
    paretoK: posterior.paretoK,
    ranks: ranksOf(problem, patient, posterior),
    band: bandOf(problem, patient, posterior, model.draws.carried),
  };
}

/** The forecast before any level. */
export function priorBand(
  model: CalibrationModel,
  patient: SimulatedPatient,
  problem: EstimationProblem,
): ForecastBand {
  const draws = model.draws.carried;
  return bandOf(problem, patient, priorDraws(problem, { draws, seed: patient.seed }), draws);
}

function ranksOf({ random }: EstimationProblem, patient: SimulatedPatient, draws: Draws): number[] {
  const few = independentDraws(draws, patient.seed);
  const [trough] = drawLevels({ history: patient.next, random }, few, [patient.bandTimes.at(-1)!]);
  const rank = (truth: number, values: Float64Array) => values.reduce((sum, each) => sum + (each < truth ? 1 : 0), 0);
  return [...few.eta.map((column, i) => rank(patient.truth[i]!, column)), rank(patient.bandTruth.at(-1)!, trough!)];
}

/** Drawn by weight, each on its own: what a rank needs to be even. */
function independentDraws({ eta, weights }: Draws, seed: number): Draws {
  // Not the patient's own stream again.
  const random = seededRandom((seed ^ 0x5bd1e995) >>> 0);
  const running = new Float64Array(weights.length);
  let total = 0;
  for (let n = 0; n < weights.length; n++) {
    total += weights[n]!;
    running[n] = total;
  }
  const chosen = Array.from({ length: RANK_DRAWS }, () => {
    const wanted = random.uniform() * total;
    let low = 0;
    let high = running.length - 1;
    while (low < high) {
      const middle = (low + high) >>> 1;
      if (running[middle]! > wanted) high = middle;
      else low = middle + 1;
    }
    return low;
  });
  return {
    eta: eta.map((column) => Float64Array.from(chosen, (n) => column[n]!)),
    weights: new Float64Array(RANK_DRAWS).fill(1 / RANK_DRAWS),
  };
}

/** As the bench makes its bands: equally weighted draws taken by weight, their levels in order. */
function bandOf({ random }: EstimationProblem, patient: SimulatedPatient, draws: Draws, carried: number): ForecastBand {
  const chosen = systematicDraws(draws.weights, draws.eta[0]!, carried);
  const equal = {
    eta: draws.eta.map((column) => Float64Array.from(chosen, (n) => column[n]!)),
    weights: new Float64Array(carried).fill(1 / carried),
  };
  const levels = drawLevels({ history: patient.next, random }, equal, patient.bandTimes);
  for (const column of levels) column.sort();
  return SPREAD_PROBABILITIES.map((probability) =>
    Float64Array.from(levels, (sorted) => quantileOfSorted(sorted, probability)),
  );
}
