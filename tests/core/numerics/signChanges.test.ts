import { describe, expect, it } from "vitest";
import { signChanges } from "../../../src/core/numerics/index.ts";

const unknown = () => Number.NaN;

describe("signChanges", () => {
  it("finds one root between each two points of opposite sign, with or without a derivative", () => {
    const points = [-4, -1, 1, 4];
    for (const slope of [Math.cos, unknown]) {
      const roots = signChanges(Math.sin, slope, points);
      expect(roots).toHaveLength(3);
      for (const [i, root] of [-Math.PI, 0, Math.PI].entries()) {
        expect(Math.abs(roots[i]! - root)).toBeLessThanOrEqual(2e-15);
      }
    }
  });

  it("counts a root that is one of the points once, and a touch not at all", () => {
    expect(signChanges((x) => x, unknown, [-1, 0, 1])).toEqual([0]);
    expect(signChanges((x) => x * x, unknown, [-1, 0, 1])).toEqual([]);
  });

  it("leaves out a root at the first or last point", () => {
    expect(signChanges((x) => x, unknown, [0, 1])).toEqual([]);
    expect(signChanges((x) => x, unknown, [-1, 0])).toEqual([]);
  });

  it("finds nothing where there is nothing", () => {
    expect(signChanges(() => 0, unknown, [0, 1])).toEqual([]);
    expect(signChanges(() => 1, unknown, [0, 1])).toEqual([]);
  });
});
