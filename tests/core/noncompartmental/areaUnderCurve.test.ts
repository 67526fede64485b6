import { describe, expect, it } from "vitest";
import { areasUpTo, type LevelPoint } from "../../../src/core/noncompartmental/index.ts";

const off = (found: number, wanted: number) => Math.abs(found - wanted) / Math.abs(wanted);

describe("areasUpTo", () => {
  // mpmath, 50 digits, from the closed forms in the docstring, rounded to double.
  it.each<[string, LevelPoint, LevelPoint, number, number]>([
    ["halved in an hour", { time: 0, value: 2 }, { time: 1, value: 1 }, Math.LOG2E, 0.6386739401166444],
    [
      "a fall of a part in 1e12",
      { time: 3, value: 5 },
      { time: 7, value: 4.999999999995 },
      19.99999999999,
      99.99999999994334,
    ],
    [
      "a fall of twelve decades",
      { time: 0.25, value: 1e6 },
      { time: 0.5, value: 1e-6 },
      9047.801706308699,
      2343.813142291677,
    ],
    [
      "a small fall late",
      { time: 12, value: 0.5 },
      { time: 24, value: 0.49999 },
      5.999939999799998,
      107.99879999639997,
    ],
    ["below a factor e", { time: 1, value: 8 }, { time: 2.5, value: 3 }, 7.646590858674496, 12.458729437860322],
    [
      "just within a factor e",
      { time: 2, value: 3 },
      { time: 3, value: 1.103638323514327 },
      1.896361676485673,
      4.585446705942692,
    ],
  ])("%s: both areas, relative 1e-14", (_, from, to, auc, aumc) => {
    const found = areasUpTo([from, to], "linear-up-log-down")[1]!;
    expect(off(found.auc, auc)).toBeLessThanOrEqual(1e-14);
    expect(off(found.aumc, aumc)).toBeLessThanOrEqual(1e-14);
  });

  it("is linear where the level rises, stays, or reaches 0, whatever the method", () => {
    const points = [
      { time: 0, value: 0 },
      { time: 1, value: 4 },
      { time: 2, value: 4 },
      { time: 4, value: 0 },
    ];
    expect(areasUpTo(points, "linear-up-log-down")).toEqual(areasUpTo(points, "linear"));
    expect(areasUpTo(points, "linear").map((area) => area.auc)).toEqual([0, 2, 6, 10]);
    expect(areasUpTo(points, "linear").map((area) => area.aumc)).toEqual([0, 2, 8, 16]);
  });

  it("never lies above the linear area on the way down", () => {
    const points = [10, 7, 3, 2.9, 0.2].map((value, time) => ({ time, value }));
    const logDown = areasUpTo(points, "linear-up-log-down");
    for (const [i, { auc }] of areasUpTo(points, "linear").entries()) expect(logDown[i]!.auc).toBeLessThanOrEqual(auc);
    expect(logDown.at(-1)!.auc).toBeLessThan(18);
  });

  it("is empty for no points", () => {
    expect(areasUpTo([], "linear")).toEqual([]);
  });
});
