import { expect, test } from "vitest";
import { type Case, caseEdit, caseEditTry, levelValueNear, levelValueStep } from "../../../src/core/case/index.ts";
import { sampleCase } from "./sampleCase.ts";

const level = (id: string, value: number, unit: "mg/L" | "umol/L" = "mg/L", at = "2026-03-03T14:00:00+00:00") => ({
  id,
  at,
  quantity: { value, unit },
  kind: "measured" as const,
});
const holding = (...levels: Case["levels"]): Case => ({ ...sampleCase(), levels });

// Exact: one unit in the last place.
test.each([
  [[5.3, 5], 5, 0.1],
  [[5], 5, 1],
  [[120], 120, 1],
  [[5.25, 5.3], 5.3, 0.01],
] as const)("levels of %j mg/L: one of %s goes by %s", (values, own, step) => {
  const value = holding(...values.map((each, i) => level(`l${i}`, each)));
  expect(levelValueStep(value, level("own", own))).toBe(step);
});

test("a level in another unit says nothing of the precision", () => {
  expect(levelValueStep(holding(level("a", 29.42, "umol/L"), level("b", 5)), level("b", 5))).toBe(1);
});

test.each([
  [5.5512, 5.6],
  [5.549, 5.5],
  [0.04, 0.1],
  [-3, 0.1],
] as const)("toward %s on steps of 0.1: %s, never below one step", (toward, reached) => {
  expect(levelValueNear(holding(level("a", 5.3)), level("a", 5.3), toward)).toBe(reached);
});

test("a place that is no number is the caller's mistake", () => {
  expect(() => levelValueNear(holding(level("a", 5)), level("a", 5), Number.NaN)).toThrow("toward: NaN mg/L");
});

test("moved: only its time, and the list stays in order; another value: only its number, and what was confirmed of the old one is gone", () => {
  const early = { ...level("a", 5.3), confirmed: true as const, excluded: "doubtful" };
  const before = holding(early, level("b", 6, "mg/L", "2026-03-04T07:30:00+00:00"));
  const moved = caseEdit(before, "levelMove", { id: "a", at: "2026-03-04T08:00:00+00:00" });
  expect(moved.levels).toEqual([before.levels[1], { ...early, at: "2026-03-04T08:00:00+00:00" }]);
  const { confirmed: _, ...unconfirmed } = early;
  expect(caseEdit(before, "levelRevalue", { id: "a", number: 5.4 }).levels[0]).toEqual({
    ...unconfirmed,
    quantity: { value: 5.4, unit: "mg/L" },
  });
  expect(caseEdit(before, "levelRevalue", { id: "a", number: 5.3 })).toBe(before);
  expect(caseEdit(before, "levelMove", { id: "a", at: early.at })).toBe(before);
  expect(caseEditTry(before, "levelRevalue", { id: "a", number: -1 }).ok).toBe(false);
  expect(() => caseEdit(before, "levelMove", { id: "x", at: early.at })).toThrow('no level "x"');
});
