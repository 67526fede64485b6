import { describe, expect, it } from "vitest";
import { simplexMinimise } from "../../bench/simplexMinimise.ts";
import { STANDARD_PROBLEMS } from "./standardProblems.ts";

describe("the simplex search of the benchmark", () => {
  it.each(STANDARD_PROBLEMS.filter(({ name }) => /^(Rosenbrock|Beale|Wood)/.test(name)))(
    "$name: x to 1e-4",
    ({ value, start, minimum }) => {
      const found = simplexMinimise(value, start, 0.5, 1e-14);
      expect(found.converged).toBe(true);
      for (const [i, each] of minimum[0]!.entries()) expect(Math.abs(found.x[i]! - each)).toBeLessThanOrEqual(1e-4);
      expect(found.value).toBe(value(found.x));
    },
  );

  it("counts its evaluations and stops at their number", () => {
    let calls = 0;
    const falling = ([x]: readonly number[]) => {
      calls++;
      return -x!;
    };
    const found = simplexMinimise(falling, [0], 1, 1e-300, 50);
    expect(found.converged).toBe(false);
    expect(found.evaluations).toBe(calls);
    expect(calls).toBeLessThanOrEqual(53);
  });

  it("goes round what is not a number: x − ln x from 0.1 with long edges", () => {
    const found = simplexMinimise(([x]) => (x! > 0 ? x! - Math.log(x!) : Number.NaN), [0.1], 5, 1e-14);
    // A value within 1e-14 is an x within 1e-7.
    expect(Math.abs(found.x[0]! - 1)).toBeLessThanOrEqual(5e-7);
  });
});
