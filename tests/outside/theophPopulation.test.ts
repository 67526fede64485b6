import { describe, expect, test } from "vitest";
import { type EstimationProblem, estimateMostLikely } from "../../src/core/estimation/index.ts";
import { theophFits, theophRows } from "./theophRows.ts";

/**
 * Theophylline levels of 12 subjects (tests/fixtures/theoph.csv) with the population fitted to them as prior: R's nlme with random lKa
 * and lCl, ke fixed; and without a prior the least-squares fits of each subject (tests/fixtures/theoph_fits.json). Doses are mg/kg,
 * clearance L/h/kg. With ke fixed a higher clearance only lowers the whole curve, so lCl is −ln of the bioavailability here.
 */
interface Fits {
  subjects: { subject: string; highPrecisionLS: { lKe: string; lKa: string; lCl: string; rss: string } }[];
  nlme_diagonal_lKa_lCl: {
    fixed: { lKe: number; lKa: number; lCl: number };
    residualSD: number;
    randomSD: { lKa: number; lCl: number };
    ranef: Record<string, { lKa: number; lCl: number }>;
  };
}

const { subjects, nlme_diagonal_lKa_lCl: population } = theophFits<Fits>("theoph_fits.json");

const IDS = subjects.map(({ subject }) => subject);

function problemOf(
  subject: string,
  { lKe, lKa, lCl }: { lKe: number; lKa: number; lCl: number },
  random: EstimationProblem["random"],
  additive: number,
): EstimationProblem {
  const own = theophRows.filter((row) => row.subject === subject);
  const clearance = Math.exp(lCl);
  return {
    history: {
      dispositions: [
        {
          from: Number.NEGATIVE_INFINITY,
          disposition: { kind: "one-compartment", clearance, volume: clearance / Math.exp(lKe) },
        },
      ],
      inputs: [
        {
          absorption: { kind: "first-order", ka: Math.exp(lKa) },
          bioavailability: 1,
          lag: 0,
          doses: [{ time: 0, amount: own[0]!.dose }],
        },
      ],
    },
    random,
    residual: { additive, proportional: 0 },
    levels: own.map(({ time, level }) => ({ time, value: level, kind: "measured" })),
    residualModel: "normal",
  };
}

function etaOf(problem: EstimationProblem): readonly number[] {
  const map = estimateMostLikely(problem);
  if (map.status !== "converged") throw new Error(map.status);
  return map.eta;
}

test("twelve subjects of eleven levels", () => {
  expect(IDS).toHaveLength(12);
  for (const id of IDS) expect(theophRows.filter(({ subject }) => subject === id)).toHaveLength(11);
});

describe("with the population as prior", () => {
  const { fixed, randomSD, residualSD, ranef } = population;
  const random = (times: number) =>
    [
      { name: "ka", omega: times * randomSD.lKa },
      { name: "bioavailability", omega: times * randomSD.lCl },
    ] as const;

  // nlme stops on its own tolerance: its figures are good to three decimals; the farthest here is 1.01e-3 off (subject 9).
  test.each(IDS)("subject %s: the random effects of nlme, 1.1e-3", (id) => {
    const [ka, bioavailability] = etaOf(problemOf(id, fixed, random(1), residualSD));
    expect(Math.abs(ka! - ranef[id]!.lKa)).toBeLessThanOrEqual(1.1e-3);
    expect(Math.abs(-bioavailability! - ranef[id]!.lCl)).toBeLessThanOrEqual(1.1e-3);
  });

  test("shrinks towards it: the prior's distance grows with ω, for every subject, and is less than without a prior", () => {
    for (const id of IDS) {
      const distances = [0.5, 1, 2, 100].map((times) => {
        const eta = etaOf(problemOf(id, fixed, random(times), residualSD));
        return (eta[0]! / randomSD.lKa) ** 2 + (eta[1]! / randomSD.lCl) ** 2;
      });
      for (const [i, distance] of distances.entries()) if (i > 0) expect(distance).toBeGreaterThan(distances[i - 1]!);
    }
  });
});

describe("with next to no prior (ω 100)", () => {
  const free = (["clearance", "volume", "ka"] as const).map((name) => ({ name, omega: 100 }));
  test.each(subjects.map(({ subject, highPrecisionLS }) => [subject, highPrecisionLS] as const))(
    "subject %s: least squares, 1e-4 in lKe, lKa, lCl",
    (id, expected) => {
      const start = population.fixed;
      const [clearance, volume, ka] = etaOf(problemOf(id, start, free, 1));
      const found = { lCl: start.lCl + clearance!, lKa: start.lKa + ka!, lKe: start.lKe + clearance! - volume! };
      for (const name of ["lKe", "lKa", "lCl"] as const) {
        expect(Math.abs(found[name] - Number(expected[name])), name).toBeLessThanOrEqual(1e-4);
      }
    },
  );
});
