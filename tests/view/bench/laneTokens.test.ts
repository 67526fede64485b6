// @vitest-environment node
import { expect, test } from "vitest";
import type { DoseMark } from "../../../src/core/analysis/index.ts";
import { laneTokens } from "../../../src/view/bench/laneTokens.ts";
import { clockScale } from "../../../src/view/chart/clockScale.ts";

/** 5 px an hour: a day in 120, an interval of 12 h in 60. */
const scale = clockScale(0, 96, 0, 480);
const narrow = clockScale(0, 96, 0, 240);

const mark = (lineId: string, index: number, atH: number, change: Partial<DoseMark> = {}): DoseMark => ({
  lineId,
  index,
  product: "tablet",
  atH,
  scheduledH: atH,
  amount: { value: 300, unit: "mg" },
  countedMg: 300,
  status: "taken",
  ...change,
});
const times = [12, 24, 36];
const once = times.map((atH, index) => mark("a", index, atH));
const twice = times.flatMap((atH, index) => [mark("a", index, atH), mark("b", index, atH)]);

test("a token stands at its time, alone or with others of that time", () => {
  for (const token of [...laneTokens(once, scale, 300), ...laneTokens(twice, scale, 300)]) {
    expect(token.x).toBe(token.mark.atH * 5);
  }
});

test("doses of one time stand over each other, within the height of one, the lowest with how many they are", () => {
  const [low, high] = laneTokens(twice, scale, 300);
  expect([low!.above, low!.isTop, low!.label]).toEqual([0, false, "2× 300"]);
  expect([high!.isTop, high!.label]).toEqual([true, ""]);
  // No overlap, and none taller than the single dose (36 px).
  expect(high!.above).toBeGreaterThan(low!.height);
  expect(high!.above + high!.height).toBeCloseTo(36, 9);
  const many = laneTokens(
    Array.from({ length: 40 }, (_, i) => mark(`l${i}`, 0, 12)),
    scale,
    300,
  );
  expect(many.every(({ height }) => height > 0)).toBe(true);
  expect(many[0]!.label).toBe("40× 300");
});

test("how many is said where the amount has no room or they differ; a single dose keeps its label", () => {
  expect(laneTokens(twice, narrow, 300)[0]!.label).toBe("2×");
  const [first, second] = twice;
  const other = { ...second!, amount: { value: 200, unit: "mg" as const } };
  expect(laneTokens([first!, other], scale, 300)[0]!.label).toBe("2×");
  const missed = { ...second!, status: "missed" as const, countedMg: 0 };
  expect(laneTokens([first!, missed], scale, 300)[0]!.label).toBe("2×");
  const alone = laneTokens(once, scale, 600)[0]!;
  expect([alone.label, alone.height, alone.above, alone.isTop]).toEqual(["300", 18, 0, true]);
  expect(laneTokens([missed], scale, 300)[0]!.label).toBe("missed");
});
