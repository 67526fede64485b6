import { describe, expect, test } from "vitest";
import {
  type EstimationProblem,
  estimateMostLikely,
  estimatePosterior,
  forecasts,
  leaveOneOut,
  mapEstimate,
  priorDraws,
} from "../../../src/core/estimation/index.ts";
import { levelsAt, ONE, problemOf, SATURABLE, TWO } from "./estimationProblems.ts";

function converged(problem: EstimationProblem) {
  const map = estimateMostLikely(problem);
  if (map.status !== "converged") throw new Error(map.status);
  return map;
}

describe("simulated truth comes back", () => {
  const TIMES = [1, 2, 4, 7, 11.9, 13, 16, 25, 30, 49, 55, 97, 99, 103, 110, 120];
  test.each([
    ["one compartment", ONE, [0.3, -0.2, 0.4]],
    ["two compartments", TWO, [0.2, -0.15, 0.25, -0.2, 0.3, 0]],
    ["saturable", SATURABLE, [0.15, -0.3, 0.2, 0.25]],
  ] as const)("%s: exact levels, small errors: every η to 2e-3", (_name, disposition, truth) => {
    const draft = problemOf(disposition, []);
    // Bioavailability and volumes together only scale: it is left out here.
    const random = draft.random.filter(({ name }) => name !== "bioavailability");
    const problem = { ...draft, random, residual: { additive: 1e-4, proportional: 1e-4 } };
    const eta = truth.slice(0, random.length);
    const values = levelsAt(problem, eta, TIMES);
    const levels = TIMES.map((time, i) => ({ time, value: values[i]!, kind: "measured" as const }));
    const map = converged({ ...problem, levels });
    for (const [i, each] of eta.entries()) expect(Math.abs(map.eta[i]! - each)).toBeLessThanOrEqual(2e-3);
  });

  test("without levels the most likely patient is the typical one", () => {
    expect(converged(problemOf(ONE, [])).eta.every((each) => Math.abs(each) <= 1e-9)).toBe(true);
  });

  test("flip-flop: the other minimum is found and reported, the lower one kept", () => {
    const wide = [
      { name: "clearance", omega: 0.5 },
      { name: "volume", omega: 1.5 },
      { name: "ka", omega: 1.5 },
    ] as const;
    const draft = problemOf(ONE, [], { random: wide, residual: { additive: 0.05, proportional: 0.02 } });
    const times = [1, 2, 3, 5, 8, 11.5];
    const values = levelsAt(draft, [0, 0.1, -0.1], times);
    const map = converged({
      ...draft,
      levels: times.map((time, i) => ({ time, value: values[i]!, kind: "measured" as const })),
    });
    expect(map.otherMinima).toHaveLength(1);
    expect(map.otherMinima[0]!.objective).toBeGreaterThan(map.objective);
    const [clearance, volume, ka] = map.otherMinima[0]!.eta;
    const other = { ka: 1.1 * Math.exp(ka!), ke: (4.5 / 30) * Math.exp(clearance! - volume!) };
    expect(other.ka).toBeLessThan(other.ke);
  });
});

describe("what leaving out and coming later do", () => {
  const problem = problemOf(ONE, [
    [14, 11.2],
    [59, 9.3],
    [107, 5.1],
  ]);

  test("leave-one-out is the estimate of the smaller problem, 1e-6", () => {
    const map = converged(problem);
    const without = leaveOneOut(problem, map);
    expect(without).toHaveLength(3);
    const direct = converged({ ...problem, levels: problem.levels.slice(1) });
    const first = without[0]!;
    if (first?.status !== "converged") throw new Error("not converged");
    for (const [i, each] of direct.eta.entries()) expect(Math.abs(first.eta[i]! - each)).toBeLessThanOrEqual(1e-6);
    expect(leaveOneOut(problemOf(ONE, [[14, 11.2]]), map)).toEqual([null]);
  });

  test("forecasts know only what was earlier", () => {
    const options = { draws: 512, seed: 1 };
    const made = forecasts(problem, options, [0.05, 0.5, 0.95]);
    expect(made.map(({ levelsKnown }) => levelsKnown)).toEqual([0, 1, 2]);
    // A later level is as if it were not there.
    const changed = {
      ...problem,
      levels: problem.levels.map((level, i) => (i === 2 ? { ...level, value: 40 } : level)),
    };
    expect(forecasts(changed, options, [0.05, 0.5, 0.95])).toEqual(made);
    // Each level narrows the next forecast.
    const width = ([low, , high]: readonly number[]) => high! / low!;
    expect(width(made[2]!.quantiles!)).toBeLessThan(width(made[0]!.quantiles!));
  });
});

describe("hostile input", () => {
  const refuse = (change: Partial<EstimationProblem>) => () => estimateMostLikely(problemOf(ONE, [[14, 11]], change));
  test("RangeError, with the argument's name", () => {
    expect(refuse({ random: [] })).toThrow(/problem\.random\.length/);
    expect(refuse({ random: [{ name: "clearance", omega: 0 }] })).toThrow(RangeError);
    expect(refuse({ random: [{ name: "vmax", omega: 0.3 }] })).toThrow(/vmax/);
    expect(refuse({ residual: { additive: 0, proportional: 0 } })).toThrow(/problem\.residual/);
    expect(refuse({ residual: { additive: -1, proportional: 0.1 } })).toThrow(/additive/);
    expect(refuse({ levels: [{ time: Number.NaN, value: 3, kind: "measured" }] })).toThrow(/time/);
    expect(refuse({ levels: [{ time: 3, value: -1, kind: "measured" }] })).toThrow(/value/);
    expect(refuse({ correlation: [[1]] })).toThrow(/correlation/);
    const singular = [
      [1, 1, 0],
      [1, 1, 0],
      [0, 0, 1],
    ];
    expect(refuse({ correlation: singular })).toThrow(RangeError);
    expect(() => priorDraws(problemOf(ONE, []), { draws: 10, seed: 1 })).toThrow(/draws/);
    const oral = {
      population: { clearance: 3, volume: 30, ka: 1, bioavailability: 1, lag: 0 },
      omega: { clearance: 0, volume: 0, ka: 0 },
      residual: { additive: 0.1, proportional: 0.1 },
      doses: [{ time: 0, amount: 300 }],
      levels: [],
    };
    expect(() => mapEstimate(oral)).toThrow(/random/);
  });

  test("identical times, a level before the first dose, a value far off: numbers, never NaN", () => {
    const map = converged(
      problemOf(ONE, [
        [14, 11],
        [14, 9],
        [-5, 0.1],
        [107, 900],
      ]),
    );
    const figures = [...map.eta, map.objective, ...map.predictions, ...map.hessian.flat()];
    expect(figures.every(Number.isFinite)).toBe(true);
  });

  test("a level that nothing explains is not converged, not a number", () => {
    const problem = problemOf(ONE, [[-5, 3]], { residual: { additive: 0, proportional: 0.1 } });
    expect(estimateMostLikely(problem)).toMatchObject({ status: "not-converged" });
  });

  test("same seed, same bits; another seed, others", () => {
    const problem = problemOf(ONE, [
      [14, 11],
      [107, 5],
    ]);
    const map = converged(problem);
    const draw = (seed: number) => estimatePosterior(problem, map, { draws: 256, seed });
    expect(draw(3)).toEqual(draw(3));
    expect(draw(3)).not.toEqual(draw(4));
  });
});
