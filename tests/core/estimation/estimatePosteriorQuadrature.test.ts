import { describe, expect, test } from "vitest";
import {
  drawMoments,
  EstimationObjective,
  type EstimationProblem,
  estimateMostLikely,
  estimatePosterior,
} from "../../../src/core/estimation/index.ts";
import { seededRandom } from "../../../src/core/numerics/index.ts";
import { levelsAt, problemOf } from "./estimationProblems.ts";

/** A patient drawn like those of tests/fixtures/map_public.json: ω 0.2 to 0.7, one to three levels, errors of the usual size. */
function drawnProblem(seed: number): EstimationProblem {
  const random = seededRandom(seed);
  const between = (low: number, high: number) => low + (high - low) * random.uniform();
  const disposition = { kind: "one-compartment", clearance: between(2, 6), volume: between(25, 80) } as const;
  const omega = [between(0.3, 0.45), between(0.2, 0.3), between(0.4, 0.7)];
  const names = ["clearance", "volume", "ka"] as const;
  const draft = problemOf(disposition, [], {
    random: names.map((name, i) => ({ name, omega: omega[i]! })),
    residual: { additive: between(0.1, 0.4), proportional: between(0.08, 0.15) },
  });
  const eta = omega.map((each) => each * random.normal());
  const times = [[60 + between(1, 3)], [50, 95.5], [14, 61, 119]][seed % 3]!;
  const exact = levelsAt(draft, eta, times);
  const levels = times.map((time, j) => ({
    time,
    value: Math.max(0, exact[j]! * (1 + draft.residual.proportional * random.normal())),
    kind: "measured" as const,
  }));
  return { ...draft, levels };
}

interface Box {
  readonly centre: readonly number[];
  readonly half: readonly number[];
}

/** Mean and standard deviation of the parameters by the trapezoid rule over a box of η. */
function quadrature(objective: EstimationObjective, { centre, half }: Box, count: number) {
  const axes = centre.map((middle, i) =>
    Float64Array.from({ length: count }, (_, k) => middle + half[i]! * ((2 * k) / (count - 1) - 1)),
  );
  const weights = new Float64Array(count ** 3);
  const columns = axes.map(() => new Float64Array(count ** 3));
  let n = 0;
  for (const a of axes[0]!) {
    for (const b of axes[1]!) {
      for (const c of axes[2]!) {
        weights[n] = -objective.value([a, b, c]);
        for (const [i, each] of [a, b, c].entries()) columns[i]![n] = each;
        n++;
      }
    }
  }
  let largest = Number.NEGATIVE_INFINITY;
  for (const each of weights) largest = Math.max(largest, each);
  const density = weights.map((each) => Math.exp(each - largest));
  return columns.map((column) => ({
    eta: drawMoments(column, density),
    natural: drawMoments(column.map(Math.exp), density),
  }));
}

describe("three parameters against a quadrature made here, 4,000 draws", () => {
  test.each([3, 4])("patient %d: mean within 1 %, sd within 3 %", (seed) => {
    const problem = drawnProblem(seed);
    const objective = new EstimationObjective(problem);
    // Where it lies, then that part only, twice as fine as needed: both must agree.
    const prior = { centre: [0, 0, 0], half: problem.random.map(({ omega }) => 5 * omega) };
    const rough = quadrature(objective, prior, 25);
    const box = {
      centre: rough.map(({ eta }) => eta.mean),
      half: rough.map(({ eta }) => 6.5 * eta.sd),
    };
    const coarse = quadrature(objective, box, 29);
    const expected = quadrature(objective, box, 37);
    for (const [i, { natural }] of expected.entries()) {
      expect(Math.abs(coarse[i]!.natural.mean / natural.mean - 1)).toBeLessThanOrEqual(1e-3);
      expect(Math.abs(coarse[i]!.natural.sd / natural.sd - 1)).toBeLessThanOrEqual(3e-3);
    }
    const map = estimateMostLikely(problem);
    if (map.status !== "converged") throw new Error(map.status);
    for (const drawSeed of [1, 2]) {
      const posterior = estimatePosterior(problem, map, { draws: 4000, seed: drawSeed });
      if (posterior.status !== "drawn") throw new Error(posterior.status);
      expect(posterior.method).toBe("importance");
      for (const [i, { natural }] of expected.entries()) {
        const found = drawMoments(posterior.eta[i]!.map(Math.exp), posterior.weights);
        expect(Math.abs(found.mean / natural.mean - 1), `mean of ${i}`).toBeLessThanOrEqual(0.01);
        expect(Math.abs(found.sd / natural.sd - 1), `sd of ${i}`).toBeLessThanOrEqual(0.03);
      }
    }
  });
});
