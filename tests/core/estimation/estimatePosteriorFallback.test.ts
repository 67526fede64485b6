import { describe, expect, test } from "vitest";
import { posteriorFrom } from "../../../src/core/estimation/estimatePosterior.ts";
import { EstimationObjective } from "../../../src/core/estimation/estimationObjective.ts";
import { drawMoments, estimateMostLikely, LARGEST_PARETO_K } from "../../../src/core/estimation/index.ts";
import { ONE, problemOf } from "./estimationProblems.ts";

const RANDOM = [
  { name: "clearance", omega: 0.35 },
  { name: "ka", omega: 0.6 },
] as const;

/** An objective with another density in the place of the levels': a crescent x ~ N(0, 1), y = x² + N(0, thickness²), in units. */
class Crescent extends EstimationObjective {
  readonly #thickness: number;
  readonly #unit: number;

  constructor(thickness: number, unit: number) {
    super(problemOf(ONE, [[14, 11]], { random: RANDOM }));
    this.#thickness = thickness;
    this.#unit = unit;
  }

  override value(eta: ArrayLike<number>): number {
    const x = eta[0]! / this.#unit;
    const y = eta[1]! / this.#unit;
    return x ** 2 / 2 + ((y - x ** 2) / this.#thickness) ** 2 / 2;
  }
}

function drawnFrom(objective: EstimationObjective, curvature: number, seed: number) {
  const map = estimateMostLikely(objective.problem);
  if (map.status !== "converged") throw new Error(map.status);
  const at = {
    ...map,
    eta: [0, 0],
    objective: 0,
    hessian: [
      [curvature, 0],
      [0, curvature],
    ],
    otherMinima: [],
  };
  return posteriorFrom(objective, at, { draws: 1000, seed });
}

describe("a density that importance sampling cannot do", () => {
  test("a chain draws it instead: k̂ says nothing, R̂ does; means to 0.15 and spreads to 15 % of the truth", () => {
    const unit = 30;
    const posterior = drawnFrom(new Crescent(0.5, unit), 1 / unit ** 2, 2);
    if (posterior.status !== "drawn") throw new Error(posterior.status);
    expect(posterior).toMatchObject({ method: "chain", paretoK: null });
    expect(posterior.rHat).toBeLessThanOrEqual(1.01);
    // 400 draws as good as independent: three times 1/√400.
    expect(posterior.effectiveSize).toBeGreaterThanOrEqual(400);
    expect(posterior.weights.every((each) => each === 1 / 1000)).toBe(true);
    const [x, y] = posterior.eta.map((column) => drawMoments(column, posterior.weights));
    // x ~ N(0, 1); y has mean 1 and variance 2 + 0.5².
    expect(Math.abs(x!.mean / unit)).toBeLessThanOrEqual(0.15);
    expect(Math.abs(x!.sd / unit - 1)).toBeLessThanOrEqual(0.15);
    expect(Math.abs(y!.mean / unit - 1)).toBeLessThanOrEqual(0.15 * 1.5);
    expect(Math.abs(y!.sd / unit / 1.5 - 1)).toBeLessThanOrEqual(0.15);
    expect(drawnFrom(new Crescent(0.5, unit), 1 / unit ** 2, 2)).toEqual(posterior);
  });

  test("one as thin as a thread is withheld, with what was found", () => {
    const posterior = drawnFrom(new Crescent(0.001, 4), 1 / 16, 1);
    if (posterior.status !== "withheld") throw new Error(posterior.status);
    expect(posterior.paretoK).toBeGreaterThan(LARGEST_PARETO_K);
    expect(posterior.rHat).toBeGreaterThan(1.01);
    expect(posterior.effectiveSize).toBeLessThan(400);
    expect(Object.keys(posterior)).not.toContain("eta");
  });
});
