import { describe, expect, it } from "vitest";
import { clockScale, hourTicks } from "../../../src/view/chart/clockScale.ts";
import { concentrationScale } from "../../../src/view/chart/concentrationScale.ts";
import { labelSpread } from "../../../src/view/chart/labelSpread.ts";

describe("clockScale", () => {
  it("goes there and back", () => {
    const scale = clockScale(-3, 93, 10, 970);
    expect(scale.x(-3)).toBe(10);
    expect(scale.x(93)).toBe(970);
    for (const hours of [-3, 0, 12.25, 92]) expect(Math.abs(scale.hours(scale.x(hours)) - hours)).toBeLessThan(1e-12);
  });
});

describe("hourTicks", () => {
  it("takes the finest step that leaves room", () => {
    const day = clockScale(0, 24, 0, 1200);
    expect(hourTicks(day, [0, 24], 46).map((tick) => tick.label)).toHaveLength(23);
    const week = clockScale(0, 168, 0, 700);
    expect(hourTicks(week, [0, 24, 48, 72, 96, 120, 144, 168], 46).map((tick) => tick.label)).toEqual([
      "12",
      "12",
      "12",
      "12",
      "12",
      "12",
      "12",
    ]);
    expect(hourTicks(clockScale(0, 1000, 0, 300), [0], 46)).toEqual([]);
  });

  it("counts from the midnight of a day of 23 hours", () => {
    const scale = clockScale(0, 47, 0, 800);
    const noon = hourTicks(scale, [0, 23, 47], 200).map((tick) => tick.hours);
    expect(noon).toEqual([12, 35]);
  });
});

describe("concentrationScale", () => {
  it("linear begins at 0 and holds the highest value", () => {
    const scale = concentrationScale("linear", 17.3, 10, 410);
    expect(scale.low).toBe(0);
    expect(scale.high).toBeGreaterThanOrEqual(17.3);
    expect(scale.y(0)).toBe(410);
    expect(scale.y(scale.high)).toBe(10);
  });

  it("log shows two decades and puts what is below on the floor", () => {
    const scale = concentrationScale("log", 20, 10, 410);
    expect(Math.abs(scale.high / scale.low - 100)).toBeLessThan(1e-9);
    expect(scale.y(0)).toBe(scale.y(scale.low));
    expect(Math.abs(scale.value(scale.y(5)) - 5)).toBeLessThan(1e-9);
  });
});

describe("labelSpread", () => {
  it("keeps order and distance, and the bounds where there is room", () => {
    expect(labelSpread([100, 102, 300], 17, 0, 400)).toEqual([100, 117, 300]);
    const low = labelSpread([395, 398], 17, 0, 400);
    expect(low[1]! - low[0]!).toBeGreaterThanOrEqual(17);
    expect(Math.max(...low)).toBeLessThanOrEqual(400);
  });

  it("returns the order it was given", () => {
    const [first, second] = labelSpread([50, 10], 17, 0, 100);
    expect(first!).toBeGreaterThan(second!);
  });
});
