import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { choleskyFactor, minimise, symmetricEigen } from "../../../src/core/numerics/index.ts";
import { STANDARD_PROBLEMS, VALLEY_WITHOUT_END } from "./standardProblems.ts";

describe.each(STANDARD_PROBLEMS)("$name", ({ name, value, gradient, start, minimum, tolerance }) => {
  it.each([1, 0.1, 10])("is solved from its standard start times %d", (factor) => {
    const found = minimise({ value, gradient, start: start.map((each) => each * factor) });
    if (factor === 10 && VALLEY_WITHOUT_END.includes(name)) {
      expect(found.status).toBe("not-converged");
      return;
    }
    expect(found.end).toBe("minimum");
    expect(found.status).toBe("converged");
    const gaps = minimum.map((one) =>
      Math.max(...one.map((each, i) => Math.abs(found.x[i]! - each) / Math.max(1, Math.abs(each)))),
    );
    // Any of the known minima; each problem states how near.
    expect(Math.min(...gaps)).toBeLessThanOrEqual(tolerance);
    expect(found.value).toBe(value(found.x));
    expect(found.hessian).toHaveLength(start.length);
  });

  it("states a gradient that is the slope of its value", () => {
    // Relative 1e-5: a central difference of the value. The start is moved off symmetric places.
    const x = start.map((each, i) => each + 0.1 + 0.01 * i);
    const slope = gradient(x);
    const size = Math.max(...slope.map(Math.abs));
    for (const i of x.keys()) {
      const h = 1e-5 * Math.max(1, Math.abs(x[i]!));
      const side = (sign: number) => value(x.map((each, j) => (i === j ? each + sign * h : each)));
      expect(Math.abs((side(1) - side(-1)) / (2 * h) - slope[i]!) / size).toBeLessThanOrEqual(1e-5);
    }
  });
});

const bowl = { value: ([x]: readonly number[]) => (x! - 3) ** 2, gradient: ([x]: readonly number[]) => [2 * (x! - 3)] };

describe("where there is no easy way down", () => {
  it("a value that is not a number shortens the step: x − ln x beside 0 and from far out", () => {
    // x − ln x, defined above 0 only; Newton from 0.01 and from 30 oversteps it. Minimum at 1.
    const value = ([x]: readonly number[]) => (x! > 0 ? x! - Math.log(x!) : Number.NaN);
    const gradient = ([x]: readonly number[]) => [x! > 0 ? 1 - 1 / x! : Number.NaN];
    for (const start of [1e-6, 0.01, 1.9, 2.1, 30, 1e4]) {
      const found = minimise({ value, gradient, start: [start] });
      expect(found.status).toBe("converged");
      expect(Math.abs(found.x[0]! - 1)).toBeLessThanOrEqual(1e-8);
    }
  });

  it("an infinite value does too, and an infinite gradient at a finite value", () => {
    const value = ([x]: readonly number[]) => (x! < 5 ? (x! - 3) ** 2 : Infinity);
    const steep = ([x]: readonly number[]) => [x! < 4 ? 2 * (x! - 3) : Infinity];
    const found = minimise({
      value,
      gradient: steep,
      start: [-100],
      options: { firstRadius: 10 },
      hessian: () => [[0.01]],
    });
    expect(found.status).toBe("converged");
    // 1e-7: the curvature given is 200 times too small, so the last step says little.
    expect(Math.abs(found.x[0]! - 3)).toBeLessThanOrEqual(1e-7);
  });

  it("−Infinity is no fall to be taken", () => {
    const value = ([x]: readonly number[]) => (x! < 5 ? (x! - 3) ** 2 : -Infinity);
    const found = minimise({
      value,
      gradient: bowl.gradient,
      start: [-100],
      options: { firstRadius: 10 },
      hessian: () => [[0.01]],
    });
    expect(found.status).toBe("converged");
    expect(Math.abs(found.x[0]! - 3)).toBeLessThanOrEqual(1e-7);
  });

  it("a large constant hides the last falls in rounding; the gradient still leads to the minimum", () => {
    const { value, gradient, start } = STANDARD_PROBLEMS[0]!;
    const found = minimise({ value: (x) => value(x) + 1e8, gradient, start, options: { gradientTolerance: 1e-15 } });
    expect(found.status).toBe("converged");
    expect(Math.max(...found.x.map((each) => Math.abs(each - 1)))).toBeLessThanOrEqual(1e-7);
  });

  it("leaves a saddle at which it is started exactly", () => {
    // x² + y⁴/4 − y²/2: saddle at 0, minima at (0, ±1).
    const found = minimise({
      value: ([x, y]) => x! * x! + y! ** 4 / 4 - (y! * y!) / 2,
      gradient: ([x, y]) => [2 * x!, y! ** 3 - y!],
      start: [0, 0],
    });
    expect(found.status).toBe("converged");
    expect(Math.abs(found.x[0]!)).toBeLessThanOrEqual(1e-9);
    expect(Math.abs(Math.abs(found.x[1]!) - 1)).toBeLessThanOrEqual(1e-9);
  });

  it("leaves a hilltop, and a plateau with next to no slope", () => {
    const value = ([x]: readonly number[]) => -Math.exp(-x! * x!);
    const gradient = ([x]: readonly number[]) => [2 * x! * Math.exp(-x! * x!)];
    for (const start of [-5, 3, 8]) {
      const found = minimise({ value, gradient, start: [start] });
      expect(found.status).toBe("converged");
      expect(Math.abs(found.x[0]!)).toBeLessThanOrEqual(1e-9);
    }
    const top = minimise({ value: ([x]) => Math.cos(x!), gradient: ([x]) => [-Math.sin(x!)], start: [0] });
    expect(top.status).toBe("converged");
    expect(Math.abs(Math.cos(top.x[0]!) + 1)).toBeLessThanOrEqual(1e-15);
  });

  it("a surface without any slope is no minimum", () => {
    const found = minimise({ value: () => 1, gradient: () => [0, 0], start: [1, 2] });
    expect(found).toMatchObject({ status: "not-converged", end: "flat", x: [1, 2] });
  });

  it("a function without a minimum does not converge", () => {
    const found = minimise({
      value: ([x]) => Math.exp(-x!),
      gradient: ([x]) => [-Math.exp(-x!)],
      start: [0],
      options: { mostIterations: 12 },
    });
    expect(found).toMatchObject({ status: "not-converged", end: "most-iterations", iterations: 12 });
  });

  it("a kink is not passed off as a minimum", () => {
    const found = minimise({ value: ([x]) => Math.abs(x!), gradient: ([x]) => [Math.sign(x!) || 1], start: [1.3] });
    expect(found.status).toBe("not-converged");
  });

  it("a gradient of the wrong sign does not converge", () => {
    const found = minimise({ value: bowl.value, gradient: (x) => bowl.gradient(x).map((g) => -g), start: [0] });
    expect(found.status).toBe("not-converged");
  });

  it("a start without a value says so", () => {
    expect(minimise({ ...bowl, value: () => Number.NaN, start: [0] })).toMatchObject({
      status: "not-converged",
      end: "not-finite",
      iterations: 0,
    });
    expect(minimise({ ...bowl, gradient: () => [Infinity], start: [0] }).end).toBe("not-finite");
    expect(minimise({ ...bowl, hessian: () => [[Number.NaN]], start: [0] }).end).toBe("not-finite");
  });

  it("a valley flat in one direction converges to a point of it, with a matrix that has no root", () => {
    const found = minimise({
      value: ([x, y]) => (x! + y! - 1) ** 2,
      gradient: ([x, y]) => [2 * (x! + y! - 1), 2 * (x! + y! - 1)],
      start: [5, -2],
      hessian: () => [
        [2, 2],
        [2, 2],
      ],
    });
    expect(found.status).toBe("converged");
    expect(Math.abs(found.x[0]! + found.x[1]! - 1)).toBeLessThanOrEqual(1e-14);
    expect(choleskyFactor(found.hessian)).toBeNull();
  });
});

describe("what it costs and returns", () => {
  it("one Newton step on a parabola, and the second derivatives with it", () => {
    const found = minimise({ ...bowl, start: [0], options: { firstRadius: 10 } });
    expect(found.iterations).toBe(1);
    expect(found.evaluations).toBe(2);
    // 1e-9: differences of a linear gradient.
    expect(Math.abs(found.hessian[0]![0]! - 2)).toBeLessThanOrEqual(1e-9);
  });

  it("takes the second derivatives given, and calls the gradient once a step then", () => {
    const found = minimise({ ...bowl, start: [0], hessian: () => [[2]] });
    expect(found.status).toBe("converged");
    expect(found.gradientEvaluations).toBeLessThanOrEqual(found.iterations + 1);
    expect(found.hessian).toEqual([[2]]);
  });

  it("leaves its start alone and gives the same bits again", () => {
    const start = [-1.2, 1];
    const { value, gradient } = STANDARD_PROBLEMS[0]!;
    const one = minimise({ value, gradient, start });
    expect(start).toEqual([-1.2, 1]);
    expect(minimise({ value, gradient, start })).toEqual(one);
  });

  it("refuses arguments that are a mistake", () => {
    expect(() => minimise({ ...bowl, start: [] })).toThrow(RangeError);
    expect(() => minimise({ ...bowl, start: [1], options: { scale: [1, 1] } })).toThrow(
      /scale: 2 numbers for 1 variables/,
    );
    expect(() => minimise({ ...bowl, start: [1], options: { scale: [0] } })).toThrow(/scale\[0\]: 0; must be above 0/);
    expect(() => minimise({ ...bowl, start: [1], options: { stepTolerance: 0 } })).toThrow(/stepTolerance/);
  });
});

it("random bowls of 1 to 6 variables, conditions to 1e6 and scales to 1e6 apart: the minimum to 1e-8 of its size", () => {
  const entries = fc.integer({ min: -1000, max: 1000 }).map((each) => each / 1000);
  fc.assert(
    fc.property(
      fc.integer({ min: 1, max: 6 }),
      fc.array(entries, { minLength: 36, maxLength: 36 }),
      fc.array(entries, { minLength: 18, maxLength: 18 }),
      (n, random, more) => {
        const seed = Array.from({ length: n }, (_, i) =>
          Array.from({ length: n }, (_, j) => random[6 * i + j]! + random[6 * j + i]!),
        );
        const { vectors } = symmetricEigen(seed);
        const curvatures = vectors.map((_, k) => 10 ** (3 * more[k]!));
        const scale = vectors.map((_, i) => 10 ** (3 * more[6 + i]!));
        const matrix = vectors.map((_, i) =>
          vectors.map((_, j) =>
            vectors.reduce((sum, v, k) => sum + (curvatures[k]! * v[i]! * v[j]!) / scale[i]! / scale[j]!, 0),
          ),
        );
        const wanted = scale.map((each, i) => each * more[12 + i]! * 5);
        const times = (x: readonly number[]) =>
          matrix.map((row) => row.reduce((sum, each, j) => sum + each * (x[j]! - wanted[j]!), 0));
        const found = minimise({
          value: (x) => times(x).reduce((sum, each, i) => sum + (each * (x[i]! - wanted[i]!)) / 2, 0),
          gradient: times,
          start: scale.map(() => 0),
          options: { scale },
        });
        return (
          found.status === "converged" &&
          found.x.every((each, i) => Math.abs(each - wanted[i]!) <= 1e-8 * Math.max(scale[i]!, Math.abs(wanted[i]!)))
        );
      },
    ),
    { seed: 1983, numRuns: 200 },
  );
});
