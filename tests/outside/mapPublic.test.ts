import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { drawMoments, mapEstimate, type OralProblem, posterior, predictBand } from "../../src/core/estimation/index.ts";

/**
 * Most likely values and posteriors of tests/fixtures/map_public.json: R optimisers from 49 starts polished in 50-digit arithmetic
 * (mpmath), posteriors by three-dimensional quadrature (numpy) and a million Metropolis draws in R. Its `generator` and `formula` say how.
 */
interface Moments {
  mean: number;
  sd: number;
  p5: number;
  p50: number;
  p95: number;
}

interface Case {
  id: string;
  population: { F: number; CL_L_per_h: number; V_L: number; ka_per_h: number; tlag_h: number };
  omegaSD: { CL: number; V: number; ka: number };
  residual: { a_additiveSD: number; b_proportional: number };
  doses: { t_h: number; dose: number }[];
  levels: { t_h: number; y: number }[];
  nextRegimen: { dose: number; tau_h: number };
  MAP: {
    eta: { CL: string; V: string; ka: string };
    objective: string;
    predictionsAtLevels: string[];
    weightedResiduals: number[];
    hessian: string[][];
  };
  posterior: Record<"CL" | "V" | "ka" | "cssTrough", Moments>;
}

const { cases } = JSON.parse(readFileSync(new URL("../fixtures/map_public.json", import.meta.url), "utf8")) as {
  cases: Case[];
};

function problemOf({ population, omegaSD, residual, doses, levels }: Case): OralProblem {
  return {
    population: {
      clearance: population.CL_L_per_h,
      volume: population.V_L,
      ka: population.ka_per_h,
      bioavailability: population.F,
      lag: population.tlag_h,
    },
    omega: { clearance: omegaSD.CL, volume: omegaSD.V, ka: omegaSD.ka },
    residual: { additive: residual.a_additiveSD, proportional: residual.b_proportional },
    doses: doses.map(({ t_h, dose }) => ({ time: t_h, amount: dose })),
    levels: levels.map(({ t_h, y }) => ({ time: t_h, value: y, kind: "measured" })),
  };
}

const NAMED = cases.map((one) => [one.id, one] as const);
const largestError = (found: readonly number[], expected: readonly number[]) =>
  Math.max(...expected.map((value, i) => Math.abs(found[i]! - value)));

describe("most likely values of six published-form cases", () => {
  test("six cases", () => {
    expect(cases).toHaveLength(6);
  });

  // 1e-5 is asked for; reached is 5e-9.
  test.each(NAMED)("%s: every η within 1e-7, objective no higher than the reference + 1e-10", (_id, one) => {
    const map = mapEstimate(problemOf(one));
    if (map.status !== "converged") throw new Error(map.status);
    const { eta, objective, predictionsAtLevels, weightedResiduals, hessian } = one.MAP;
    expect(largestError(map.eta, [eta.CL, eta.V, eta.ka].map(Number))).toBeLessThanOrEqual(1e-7);
    expect(map.objective).toBeLessThanOrEqual(Number(objective) + 1e-10);
    const predictions = predictionsAtLevels.map(Number);
    expect(largestError(map.predictions, predictions)).toBeLessThanOrEqual(1e-6 * Math.max(...predictions));
    expect(largestError(map.standardisedResiduals as number[], weightedResiduals)).toBeLessThanOrEqual(1e-6);
    const expected = hessian.flat().map(Number);
    const largest = Math.max(...expected.map(Math.abs));
    expect(largestError(map.hessian.flat(), expected)).toBeLessThanOrEqual(1e-6 * largest);
    expect(map.gradientNorm).toBeLessThanOrEqual(1e-6);
    expect(map.clearance).toBe(one.population.CL_L_per_h * Math.exp(map.eta[0]));
  });
});

/** A steady-state trough is the level after as many doses as leave nothing to come. */
const PERIODS = 80;
/**
 * Not every seed keeps the bounds: of seeds 1001 to 1060, on which nothing was chosen, the worst are 2.4 % (MP3, 5 % of the trough) and
 * 4.2 % (MP4, sd of ka); all else keeps them.
 */
const SEEDS = [1, 2, 3];

describe("posteriors of the same cases by quadrature, 4,000 draws", () => {
  test.each(NAMED)("%s: mean within 1 %, sd within 3 %, trough percentiles within 2 %", (_id, one) => {
    for (const seed of SEEDS) {
      const drawn = posterior(problemOf(one), { draws: 4000, seed });
      expect(drawn.method).toBe("importance");
      for (const [name, key] of [
        ["clearance", "CL"],
        ["volume", "V"],
        ["ka", "ka"],
      ] as const) {
        const { mean, sd } = drawMoments(drawn[name], drawn.weights);
        const expected = one.posterior[key];
        expect(Math.abs(mean / expected.mean - 1), `mean of ${key}, seed ${seed}`).toBeLessThanOrEqual(0.01);
        expect(Math.abs(sd / expected.sd - 1), `sd of ${key}, seed ${seed}`).toBeLessThanOrEqual(0.03);
      }
      const { dose, tau_h } = one.nextRegimen;
      const doses = Array.from({ length: PERIODS }, (_, i) => ({ time: i * tau_h, amount: dose }));
      // Under a lag the lowest level comes that much later.
      const trough = PERIODS * tau_h + one.population.tlag_h;
      const band = predictBand(drawn, doses, [trough], [0.05, 0.5, 0.95]).map(([level]) => level!);
      const { p5, p50, p95 } = one.posterior.cssTrough;
      for (const [i, expected] of [p5, p50, p95].entries()) {
        expect(Math.abs(band[i]! / expected - 1), `trough percentile ${i}, seed ${seed}`).toBeLessThanOrEqual(0.02);
      }
    }
  });
});
