import { describe, expect, it } from "vitest";
import { type TerminalInput, terminalScene } from "../../../src/view/chart/terminalScene.ts";

const input: TerminalInput = {
  width: 600,
  height: 300,
  margin: { top: 20, right: 10, bottom: 40, left: 50 },
  factor: 1,
  points: [0, 8, 4, 2, 1].map((value, time) => ({ time, value, isOnLine: time > 1 })),
  line: { rate: Math.LN2, intercept: Math.log(16), fromTime: 2, toTime: 4 },
  untilH: 0,
};

describe("terminalScene", () => {
  it("draws what is above 0, counts what is not, and knows which points lie on the line", () => {
    const scene = terminalScene(input);
    expect(scene.points.map(({ time, isOnLine }) => [time, isOnLine])).toEqual([
      [1, false],
      [2, true],
      [3, true],
      [4, true],
    ]);
    expect(scene.notDrawn).toBe(1);
  });

  it("on a log scale halving is one step, and the fitted line runs through its points, absolute 0.02 px", () => {
    const { points, fitted } = terminalScene(input);
    const steps = points.slice(1).map(({ y }, i) => y - points[i]!.y);
    for (const step of steps) expect(Math.abs(step - steps[0]!)).toBeLessThanOrEqual(0.02);
    expect([fitted!.x1, fitted!.x2]).toEqual([points[1]!.x, points[3]!.x]);
    expect(Math.abs(fitted!.y1 - points[1]!.y)).toBeLessThanOrEqual(0.02);
    expect(Math.abs(fitted!.y2 - points[3]!.y)).toBeLessThanOrEqual(0.02);
  });

  it("carries the line on beyond the last level, within the plot", () => {
    const { carriedOn, fitted, plot } = terminalScene(input);
    expect([carriedOn!.x1, carriedOn!.y1]).toEqual([fitted!.x2, fitted!.y2]);
    expect(carriedOn!.x2).toBe(plot.right);
    expect(carriedOn!.y2).toBeGreaterThan(carriedOn!.y1);
    expect(carriedOn!.y2).toBeLessThan(plot.bottom);
  });

  it("reaches the end of an interval beyond the last level", () => {
    expect(terminalScene({ ...input, untilH: 12 }).points.at(-1)!.x).toBeLessThan(
      terminalScene(input).points.at(-1)!.x,
    );
  });

  it("in another unit only the ticks differ", () => {
    const [mass, molar] = [terminalScene(input), terminalScene({ ...input, factor: 5.55 })];
    expect(molar.points.map(({ x }) => x)).toEqual(mass.points.map(({ x }) => x));
    for (const [i, { y }] of molar.points.entries()) expect(Math.abs(y - mass.points[i]!.y)).toBeLessThanOrEqual(0.02);
    expect(molar.levelTicks.map(({ value }) => value)).not.toEqual(mass.levelTicks.map(({ value }) => value));
  });

  it("has ticks at 1, 2, 5, also over many decades and over a part of one", () => {
    const ticks = (values: readonly number[]) =>
      terminalScene({
        ...input,
        line: null,
        points: values.map((value, time) => ({ time, value, isOnLine: false })),
      }).levelTicks.map(({ value }) => value);
    expect(ticks([0.002, 3])).toEqual(expect.arrayContaining([0.01, 0.1, 1]));
    for (const value of ticks([0.002, 3])) expect(value.toExponential()).toMatch(/^[125]/);
    expect(ticks([6.1, 6.4]).length).toBeGreaterThanOrEqual(2);
  });

  it("without a line, or with nothing to draw, is still a scene of finite numbers", () => {
    for (const points of [input.points, [], [{ time: 0, value: 0, isOnLine: false }]]) {
      const scene = terminalScene({ ...input, line: null, points });
      expect([scene.fitted, scene.carriedOn]).toEqual([null, null]);
      expect(JSON.stringify(scene)).not.toMatch(/NaN|null,"y|Infinity/);
      expect(scene.levelTicks.length).toBeGreaterThan(0);
    }
  });
});
