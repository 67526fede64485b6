import { describe, expect, it } from "vitest";
import { hessianByDifferences } from "../../../src/core/numerics/index.ts";

describe("hessianByDifferences", () => {
  it("of x²·y: 1e-10", () => {
    const found = hessianByDifferences(([x, y]) => [2 * x! * y!, x! * x!], [1, 3], [1, 1])!;
    const wanted = [
      [6, 2],
      [2, 0],
    ];
    for (const [i, row] of wanted.entries()) {
      for (const [j, each] of row.entries()) expect(Math.abs(found[i]![j]! - each)).toBeLessThanOrEqual(1e-10);
    }
    expect(found[0]![1]).toBe(found[1]![0]);
  });

  it("of a sum of exponentials of very different sizes, given their scales: relative 1e-9", () => {
    const gradient = ([x, y]: readonly number[]) => [1e-6 * Math.exp(1e-6 * x!), 1e3 * Math.exp(1e3 * y!)];
    const found = hessianByDifferences(gradient, [1e5, 2e-4], [1e6, 1e-3])!;
    expect(Math.abs(found[0]![0]! / (1e-12 * Math.exp(0.1)) - 1)).toBeLessThanOrEqual(1e-9);
    expect(Math.abs(found[1]![1]! / (1e6 * Math.exp(0.2)) - 1)).toBeLessThanOrEqual(1e-9);
  });

  it("comes nearer where a side is not finite, and says null where none is", () => {
    const edge = ([x]: readonly number[]) => [x! > 1 - 1e-7 ? x! * x! : Number.NaN];
    // 1e-7: rounding over a step of 3e-8.
    expect(Math.abs(hessianByDifferences(edge, [1], [1])![0]![0]! - 2)).toBeLessThanOrEqual(1e-7);
    expect(hessianByDifferences(() => [Number.NaN], [1], [1])).toBeNull();
  });
});
