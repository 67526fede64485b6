import { describe, expect, it } from "vitest";
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
});
