import { describe, expect, it } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { profileParts } from "../../../src/view/chart/profileParts.ts";
import { demoCase } from "../../fixtures/demoCase.ts";

describe("the window on the bench's profile", () => {
  const value = demoCase("modified-release");
  const analysis = derive(value);
  const drawn = (window: NonNullable<Case["window"]>) => profileParts({ ...value, window }, analysis, 1, null).window;

  it.each([
    ["mg/L", 1],
    ["ug/L", 1_000],
    ["umol/L", 4],
    ["mmol/L", 0.004],
  ] as const)("stated in %s is drawn in mg/L, at 250 g/mol", (unit, factor) => {
    const { quantity, basis } = value.window!;
    const window = { quantity, basis, low: { value: 4 * factor, unit }, high: { value: 8 * factor, unit } };
    // Tolerance 0: these conversions are exact.
    expect(drawn(window)).toEqual({ low: 4, high: 8 });
  });

  it("is not drawn where it is one of exposure", () => {
    const ends = { low: { value: 1, unit: "mg.h/L" }, high: { value: 2, unit: "mg.h/L" } } as const;
    expect(drawn({ quantity: "auc24", ...ends, basis: "" })).toBeNull();
  });
});
