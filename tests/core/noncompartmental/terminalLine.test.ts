import { describe, expect, it } from "vitest";
import {
  type NoncompartmentalOptions,
  noncompartmental,
  terminalCandidates,
} from "../../../src/core/noncompartmental/index.ts";
import { levelsAt, ORAL } from "./levelSets.ts";

const options: NoncompartmentalOptions = { dose: 100, method: "linear-up-log-down" };
const terminal = (points: ReturnType<typeof levelsAt>, change: Partial<NoncompartmentalOptions> = {}) => {
  const found = noncompartmental(points, { ...options, ...change });
  return found.ok ? found.value.terminal : null;
};

describe("the terminal line", () => {
  it("of levels that halve every hour falls at ln 2 per hour, all points after the peak on it, relative 1e-14", () => {
    const found = terminal(levelsAt([0, 16, 8, 4, 2, 1]))!;
    expect(Math.abs(found.rate / Math.LN2 - 1)).toBeLessThanOrEqual(1e-14);
    expect(found.intercept).toBeCloseTo(Math.log(32), 13);
    expect(found.indices).toEqual([2, 3, 4, 5]);
    expect(found.chosenBy).toBe("fit");
    expect(found.rSquared).toBeCloseTo(1, 14);
  });

  it("offers 3 points up to all after the first of the highest", () => {
    const found = terminalCandidates(levelsAt([1, 9, 9, 6, 4, 3]));
    expect(found.map(({ indices }) => indices)).toEqual([
      [3, 4, 5],
      [2, 3, 4, 5],
    ]);
  });

  it("takes the best adjusted R² with no tie, and more points within the tie", () => {
    // A last three that lie better, by less than 1e-4, than all five.
    const points = levelsAt([0, 40, 20.03, 10, 5, 2.5, 1.25]);
    const [three, ...rest] = terminalCandidates(points);
    expect(rest.at(-1)!.adjustedRSquared).toBeLessThan(three!.adjustedRSquared);
    expect(terminal(points, { tieWithin: 1e-4 })!.indices).toHaveLength(5);
    expect(terminal(points, { tieWithin: 0 })!.indices.length).toBeLessThan(5);
  });

  it("follows the user's hours, or places in any order, and says so", () => {
    const byHours = terminal(ORAL, { terminal: { from: 5, to: 24.3 } })!;
    expect(byHours.indices).toEqual([6, 7, 8, 9, 10]);
    expect(byHours.chosenBy).toBe("user");
    expect(terminal(ORAL, { terminal: [10, 6, 8, 7, 9, 9] })).toEqual(byHours);
    expect([byHours.fromTime, byHours.toTime]).toEqual([5.02, 24.3]);
  });

  it("may leave a point in the middle out and may have the highest on it", () => {
    expect(terminal(ORAL, { terminal: [4, 7, 10] })!.indices).toEqual([4, 7, 10]);
  });

  it("three equal last levels fit worse than any that fall", () => {
    const found = terminal(levelsAt([0, 8, 4, 2, 1, 1, 1]))!;
    expect(found.indices.length).toBeGreaterThan(3);
  });

  it("a negative tie is a programmer's mistake", () => {
    expect(() => terminal(ORAL, { tieWithin: -1 })).toThrow("tieWithin is -1");
  });
});
