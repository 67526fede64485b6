import type { Dose } from "../kinetics/index.ts";
import { estimationRefuse } from "./estimationCheck.ts";
import type {
  EstimationLevel,
  EstimationProblem,
  RandomParameter,
  Residual,
  ResidualModel,
} from "./estimationTypes.ts";

/** Levels and a typical patient of the one-compartment oral model: the simple door to the engine. */
export interface OralProblem {
  /** L/h, L, 1/h, 0–1, h. */
  readonly population: {
    readonly clearance: number;
    readonly volume: number;
    readonly ka: number;
    readonly bioavailability: number;
    readonly lag: number;
  };
  /** Standard deviations on the ln scale; 0: does not differ between patients. */
  readonly omega: { readonly clearance: number; readonly volume: number; readonly ka: number };
  readonly residual: Residual;
  /** In order of time. */
  readonly doses: readonly Dose[];
  readonly levels: readonly EstimationLevel[];
  /** Default "normal". */
  readonly residualModel?: ResidualModel;
}

export const ORAL_PARAMETERS = ["clearance", "volume", "ka"] as const;
export type OralParameter = (typeof ORAL_PARAMETERS)[number];

/** The history the engine works on. */
export function oralHistory(
  population: OralProblem["population"],
  doses: readonly Dose[],
): EstimationProblem["history"] {
  const { clearance, volume, ka, bioavailability, lag } = population;
  return {
    dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition: { kind: "one-compartment", clearance, volume } }],
    inputs: [{ absorption: { kind: "first-order", ka }, bioavailability, lag, doses }],
  };
}

/** The same problem for the engine; all omega 0 throws a RangeError: there is nothing to fit. */
export function oralEstimationProblem(problem: OralProblem): EstimationProblem {
  const { population, omega, residual, doses, levels, residualModel = "normal" } = problem;
  const random: RandomParameter[] = [];
  for (const name of ORAL_PARAMETERS) {
    const sd = omega[name];
    if (!(sd >= 0 && sd < Infinity)) estimationRefuse(`omega.${name}`, sd, "", "a finite number, 0 or more");
    if (sd > 0) random.push({ name, omega: sd });
  }
  return { history: oralHistory(population, doses), random, residual, levels, residualModel };
}

/** η of clearance, volume and ka from those of the random ones: 0 for a fixed one. */
export function oralEta(random: readonly RandomParameter[], eta: ArrayLike<number>): [number, number, number] {
  const of = (name: OralParameter) => {
    const at = random.findIndex((parameter) => parameter.name === name);
    return at < 0 ? 0 : eta[at]!;
  };
  return [of("clearance"), of("volume"), of("ka")];
}
