import { describe, expect, it } from "vitest";
import type { Case } from "../../../src/core/case/index.ts";
import { concernMessage } from "../../../src/core/messages/index.ts";
import { figure, found, level, TROUGH, troughOf, value, withLevel } from "./recordConcernCases.ts";

describe("the latest level beside the target window", () => {
  it("only the latest of the levels in use is held against the window, at its very edge it is inside", () => {
    const window = troughOf(1, 4);
    const two = (last: number) => [
      { ...level("2026-03-03T19:30:00+00:00"), id: "a" },
      { ...level(TROUGH, { quantity: { value: last, unit: "mg/L" } }), id: "b" },
    ];
    expect(found(value({}, { levels: two(4), window }), "level-above-window")).toEqual([]);
    expect(found(value({}, { levels: two(4.1), window }), "level-above-window")).toMatchObject([
      { about: { kind: "level", id: "b" }, data: { measured: 4.1, low: 1, high: 4 } },
    ]);
    const left = two(3).map((one) => (one.id === "b" ? { ...one, excluded: "haemolysed" } : one));
    expect(found(value({}, { levels: left, window }), "level-above-window")).toMatchObject([{ about: { id: "a" } }]);
  });

  it("a level that reaches the toxic limit is not also called above the window", () => {
    const above = (toxic: number) =>
      withLevel({ toxicFrom: figure(toxic, "mg/L") }, TROUGH, { window: troughOf(1, 4) });
    expect(found(above(7), "level-above-window")).toHaveLength(1);
    expect(found(above(6), "level-above-window")).toEqual([]);
    expect(found(above(6), "level-toxic")).toHaveLength(1);
  });

  it("below the assay's limit is below the window only where the limit is", () => {
    const below = (low: number) =>
      value({}, { levels: [level(TROUGH, { kind: "below-limit" })], window: troughOf(low, 30) });
    expect(found(below(5), "level-below-window")).toEqual([]);
    const [concern] = found(below(6), "level-below-window");
    expect(concernMessage(concern!).text).toContain("below the assay's limit of 6 mg per L");
  });

  it("a window about a level at an hour after the dose is named by that hour, and one hour is an hour", () => {
    const timed = (from: number, to: number): NonNullable<Case["window"]> => ({
      ...troughOf(1, 4),
      drawFrom: { value: from, unit: "h" },
      drawTo: { value: to, unit: "h" },
    });
    const said = (window: Case["window"], at: string, high: number) =>
      concernMessage(
        found(
          value({}, { levels: [level(at, { quantity: { value: high, unit: "mg/L" } })], window }),
          "level-above-window",
        )[0]!,
      ).text;
    // The dose before is of 3 March at 20:00.
    expect(said(timed(11, 13), TROUGH, 6)).toContain(
      "the window for the level 12 hours after the dose is 1 mg per L to",
    );
    expect(said(timed(0.5, 1.5), "2026-03-03T21:00:00+00:00", 6)).toContain("for the level 1 hour after the dose is");
    expect(said(troughOf(1, 4), TROUGH, 6)).toContain("the window for the lowest is 1 mg per L to");
    const early = withLevel({ earliestSample: figure(12, "h") }, "2026-03-03T21:00:00+00:00");
    expect(concernMessage(found(early, "level-too-early")[0]!).text).toMatch(
      /^1 hour after it; .* not before 12 hours/,
    );
  });
});
