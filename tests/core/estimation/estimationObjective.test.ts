import { describe, expect, test } from "vitest";
import { EstimationObjective, type EstimationProblem } from "../../../src/core/estimation/index.ts";
import { levelsAt, ONE, problemOf, SATURABLE, TWO } from "./estimationProblems.ts";

/** Area under a density from far below up to z, by Simpson's rule: nothing of the closed forms. */
function areaBelow(density: (z: number) => number, z: number, from: number): number {
  const count = 20_000;
  const h = (z - from) / count;
  let sum = density(from) + density(z);
  for (let i = 1; i < count; i++) sum += density(from + i * h) * (i % 2 === 1 ? 4 : 2);
  return (sum * h) / 3;
}
const normal = (z: number) => Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI);
const student = (z: number) => (3 / 8) * (1 + (z * z) / 4) ** -2.5;

/** The objective as its definition has it, from the levels of modelProfile. */
function directly(problem: EstimationProblem, eta: readonly number[], inverse: readonly (readonly number[])[]): number {
  const { levels, residual, residualModel } = problem;
  let sum = 0;
  for (const { time, value, kind } of levels) {
    const f = levelsAt(problem, eta, [time])[0]!;
    const s = Math.sqrt(residual.additive ** 2 + (residual.proportional * f) ** 2);
    if (kind === "below-limit") {
      const [density, from] = residualModel === "normal" ? ([normal, -40] as const) : ([student, -400] as const);
      sum -= Math.log(areaBelow(density, (value - f) / s, from));
    } else if (residualModel === "normal") sum += (value - f) ** 2 / (2 * s * s) + Math.log(s);
    else sum += 2.5 * Math.log(1 + (value - f) ** 2 / (4 * s * s)) + Math.log(s);
  }
  for (const [i, row] of inverse.entries())
    for (const [j, each] of row.entries()) sum += (eta[i]! * each * eta[j]!) / 2;
  return sum;
}

const diagonal = (problem: EstimationProblem) =>
  problem.random.map(({ omega }, i) => problem.random.map((_, j) => (i === j ? 1 / omega ** 2 : 0)));

const LEVELS = [
  [97.5, 9.1],
  [14, 11.2],
  [107.9, 4.4, "below-limit"],
  [14, 9.7],
] as const;
const ETA = [0.3, -0.2, 0.4, 0.1, -0.3, 0.2];

describe("the objective is what its definition says", () => {
  test.each(["normal", "robust"] as const)("%s residuals, a level below the limit: 1e-9", (residualModel) => {
    const problem = problemOf(ONE, LEVELS, { residualModel });
    const eta = ETA.slice(0, 3);
    const expected = directly(problem, eta, diagonal(problem));
    expect(Math.abs(new EstimationObjective(problem).value(eta) - expected)).toBeLessThanOrEqual(
      residualModel === "normal" ? 1e-9 : 1e-6, // the Student tail below -400 is left out of the area
    );
  });

  test("correlated parameters: the inverse of a two by two by hand, 1e-12", () => {
    const rho = 0.6;
    const random = [
      { name: "clearance", omega: 0.4 },
      { name: "volume", omega: 0.25 },
    ] as const;
    const problem = problemOf(ONE, LEVELS.slice(0, 2), {
      random,
      correlation: [
        [1, rho],
        [rho, 1],
      ],
    });
    const [a, b, c] = [0.4 ** 2, rho * 0.4 * 0.25, 0.25 ** 2];
    const det = a * c - b * b;
    const inverse = [
      [c / det, -b / det],
      [-b / det, a / det],
    ];
    const expected = directly(problem, [0.3, -0.2], inverse);
    expect(Math.abs(new EstimationObjective(problem).value([0.3, -0.2]) - expected)).toBeLessThanOrEqual(1e-12);
  });
});

describe("the gradient is that of the objective", () => {
  const CASES = Object.entries({ ONE, TWO, SATURABLE }).flatMap(([name, disposition]) =>
    (["normal", "robust"] as const).map(
      (model) => [`${name}, ${model}`, problemOf(disposition, LEVELS, { residualModel: model })] as const,
    ),
  );
  test.each(CASES)("%s: central differences, 1e-6 of the largest slope", (_name, problem) => {
    const objective = new EstimationObjective(problem);
    const eta = ETA.slice(0, problem.random.length);
    const gradient = objective.gradient(eta);
    const largest = Math.max(...gradient.map(Math.abs));
    for (const [i] of eta.entries()) {
      const at = (step: number) => objective.value(eta.map((each, j) => (i === j ? each + step : each)));
      const slope = (h: number) => (at(h) - at(-h)) / (2 * h);
      const h = 1e-3;
      const expected = (4 * slope(h) - slope(2 * h)) / 3;
      expect(Math.abs(gradient[i]! - expected), problem.random[i]!.name).toBeLessThanOrEqual(1e-6 * largest);
    }
  });

  // Saturable values without derivatives are carried to 1e-6 of the largest level only: that is what a weight needs.
  test.each([
    ["ONE", ONE, 1e-9],
    ["TWO", TWO, 1e-9],
    ["SATURABLE", SATURABLE, 1e-4],
  ] as const)("%s: the value is the same with the gradient and without", (_name, disposition, bar) => {
    const problem = problemOf(disposition, LEVELS);
    const objective = new EstimationObjective(problem);
    const eta = ETA.slice(0, problem.random.length);
    expect(Math.abs(objective.valueWithGradient(eta) - objective.value(eta))).toBeLessThanOrEqual(bar);
  });
});

describe("never NaN", () => {
  test("far η, impossible levels: Infinity", () => {
    const objective = new EstimationObjective(problemOf(ONE, LEVELS));
    expect(objective.value([31, 0, 0])).toBe(Number.POSITIVE_INFINITY);
    expect(objective.value([Number.NaN, 0, 0])).toBe(Number.POSITIVE_INFINITY);
    expect(objective.gradient([40, 0, 0]).every((each) => each === Number.POSITIVE_INFINITY)).toBe(true);
    const before = problemOf(ONE, [[-3, 2]], { residual: { additive: 0, proportional: 0.1 } });
    expect(new EstimationObjective(before).value([0, 0, 0])).toBe(Number.POSITIVE_INFINITY);
    for (const big of [-25, -10, 10, 25]) {
      for (const i of [0, 1, 2]) expect(objective.value([0, 0, 0].map((_, j) => (i === j ? big : 0)))).not.toBeNaN();
    }
  });
});
