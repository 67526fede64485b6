import { choleskyFactor, symmetricInverse } from "../numerics/index.ts";
import { estimationRefuse } from "./estimationCheck.ts";
import type { EstimationProblem } from "./estimationTypes.ts";

/** How η is spread between patients: normal about 0 with covariance Ω. */
export interface Prior {
  /** Ω = factor·factorᵀ, lower triangular. */
  readonly factor: readonly (readonly number[])[];
  /** Ω⁻¹. */
  readonly precision: readonly (readonly number[])[];
}

/**
 * The spread of η between patients.
 *
 * Formula: Ωᵢⱼ = ωᵢ·ωⱼ·ρᵢⱼ. The factor and the inverse are made of the correlations and scaled after, so that ω of very different size
 * cost nothing.
 * Outside: a correlation that is not symmetric with 1 on the diagonal, or not positive definite, throws RangeError.
 */
export function priorOf({ random, correlation }: Pick<EstimationProblem, "random" | "correlation">): Prior {
  const omega = random.map(({ omega }) => omega);
  const rho = correlation ?? omega.map((_, i) => omega.map((__, j) => (i === j ? 1 : 0)));
  for (const [i, row] of rho.entries()) {
    if (row.length !== omega.length) {
      estimationRefuse(`problem.correlation[${i}].length`, row.length, "", `${omega.length}`);
    }
    for (const [j, each] of row.entries()) {
      const isAllowed = i === j ? each === 1 : Math.abs(each) < 1 && each === rho[j]![i];
      if (!isAllowed) {
        const allowed = i === j ? "1" : "between -1 and 1, the same both ways";
        estimationRefuse(`problem.correlation[${i}][${j}]`, each, "", allowed);
      }
    }
  }
  const factor = choleskyFactor(rho);
  const inverse = symmetricInverse(rho);
  if (factor === null || inverse === null) {
    estimationRefuse("problem.correlation", JSON.stringify(rho), "", "a positive definite matrix");
  }
  return {
    factor: factor.map((row, i) => row.map((each) => each * omega[i]!)),
    precision: inverse.map((row, i) => row.map((each, j) => each / omega[i]! / omega[j]!)),
  };
}
