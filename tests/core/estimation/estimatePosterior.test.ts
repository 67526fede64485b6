import { describe, expect, test } from "vitest";
import {
  type Draws,
  drawMoments,
  EstimationObjective,
  estimateMostLikely,
  estimatePosterior,
  predictiveAtLevels,
  priorDraws,
  shareSlowAbsorption,
  taught,
} from "../../../src/core/estimation/index.ts";
import { ONE, problemOf } from "./estimationProblems.ts";

const TWO_RANDOM = [
  { name: "clearance", omega: 0.35 },
  { name: "ka", omega: 0.6 },
] as const;

function drawn(problem: ReturnType<typeof problemOf>, draws: number): Draws {
  const map = estimateMostLikely(problem);
  if (map.status !== "converged") throw new Error(map.status);
  const posterior = estimatePosterior(problem, map, { draws, seed: 1 });
  if (posterior.status !== "drawn") throw new Error(posterior.status);
  return posterior;
}

/** Mean and standard deviation of each η by plain quadrature on a grid over ±6 ω. */
function quadrature(problem: ReturnType<typeof problemOf>): { mean: number; sd: number }[] {
  const objective = new EstimationObjective(problem);
  const count = 161;
  const grid = TWO_RANDOM.map(({ omega }) =>
    Array.from({ length: count }, (_, i) => omega * 6 * ((2 * i) / (count - 1) - 1)),
  );
  const points: [number, number, number][] = [];
  let least = Number.POSITIVE_INFINITY;
  for (const a of grid[0]!) {
    for (const b of grid[1]!) {
      const value = objective.value([a, b]);
      points.push([a, b, value]);
      least = Math.min(least, value);
    }
  }
  const weights = points.map(([, , value]) => Math.exp(least - value));
  return [0, 1].map((i) =>
    drawMoments(
      points.map((point) => point[i]!),
      weights,
    ),
  );
}

describe("two parameters against quadrature, 2,000 draws", () => {
  test.each([
    ["one level", problemOf(ONE, [[107, 5.5]], { random: TWO_RANDOM })],
    [
      "a level below the limit",
      problemOf(
        ONE,
        [
          [14, 12],
          [107.8, 3, "below-limit"],
        ],
        { random: TWO_RANDOM },
      ),
    ],
    [
      "robust, an outlier",
      problemOf(
        ONE,
        [
          [14, 30],
          [59, 8],
          [107, 5],
        ],
        { random: TWO_RANDOM, residualModel: "robust" },
      ),
    ],
    [
      "correlated",
      problemOf(ONE, [[13, 9]], {
        random: TWO_RANDOM,
        correlation: [
          [1, 0.5],
          [0.5, 1],
        ],
      }),
    ],
  ])("%s: mean within 3 % of ω, sd within 4 %", (_name, problem) => {
    const { eta, weights } = drawn(problem, 2000);
    for (const [i, expected] of quadrature(problem).entries()) {
      const { mean, sd } = drawMoments(eta[i]!, weights);
      expect(Math.abs(mean - expected.mean)).toBeLessThanOrEqual(0.03 * TWO_RANDOM[i]!.omega);
      expect(Math.abs(sd / expected.sd - 1)).toBeLessThanOrEqual(0.04);
    }
  });
});

describe("what draws say", () => {
  const problem = problemOf(ONE, [
    [97.5, 9],
    [107, 5.5],
  ]);
  test("the prior: mean 0 and sd ω to 1 %, nothing taught", () => {
    const draws = priorDraws(problem, { draws: 4096, seed: 1 });
    for (const [i, { omega }] of problem.random.entries()) {
      const { mean, sd } = drawMoments(draws.eta[i]!, draws.weights);
      expect(Math.abs(mean)).toBeLessThanOrEqual(0.01 * omega);
      expect(Math.abs(sd / omega - 1)).toBeLessThanOrEqual(0.01);
    }
    for (const each of taught(problem.random, draws)) expect(Math.abs(each)).toBeLessThanOrEqual(0.01);
  });

  test("a trough teaches clearance more than absorption; its predictive interval is narrower than the prior's", () => {
    const posterior = drawn(problem, 1024);
    const [clearance, , ka] = taught(problem.random, posterior);
    expect(clearance).toBeGreaterThan(ka!);
    const width = (draws: Draws) => {
      const [low, high] = predictiveAtLevels(problem, draws, [0.025, 0.975])[1]!;
      return high! - low!;
    };
    expect(width(posterior)).toBeLessThan(width(priorDraws(problem, { draws: 1024, seed: 1 })));
    // ka 1.1, ke 0.15: hardly ever the other way round, but not never under ω 0.4.
    expect(shareSlowAbsorption(problem, posterior)).toBeLessThan(0.01);
  });
});
