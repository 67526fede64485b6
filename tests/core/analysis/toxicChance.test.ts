import { describe, expect, it } from "vitest";
import { toxicChance } from "../../../src/core/analysis/toxicChance.ts";
import type { MedicineRecord } from "../../../src/core/medicine/index.ts";
import { caseFixture } from "./caseFixture.ts";

const fixture = caseFixture();

function limited(from: number, toxicAt: MedicineRecord["toxicAt"] = "any") {
  const { medicine } = fixture;
  const source = Object.keys(medicine.sources)[0]!;
  return {
    ...fixture,
    medicine: { ...medicine, toxicAt, toxicFrom: { value: from, unit: "mg/L", source, basis: "seen" } as const },
  };
}

describe("the chance of reaching the toxic limit", () => {
  it("counts a draw that reaches it over the span, or once steady, or that never settles", () => {
    const steady = [5, 25, Number.POSITIVE_INFINITY, 5];
    expect(toxicChance(limited(20), { span: [20, 5, 5, 19.9], steady })).toBe(0.75);
  });

  it("of a limit for the level before a dose looks at steady state alone", () => {
    expect(toxicChance(limited(20, "trough"), { span: [30, 30], steady: [19, 20] })).toBe(0.5);
    expect(toxicChance(limited(20, "trough"), { span: [30, 30], steady: null })).toBeNull();
  });

  it("of an option that does not repeat is that of the span", () => {
    expect(toxicChance(limited(20), { span: [30, 10], steady: null })).toBe(0.5);
  });

  it("is none without a limit", () => {
    const { toxicFrom: _, ...medicine } = fixture.medicine;
    expect(toxicChance({ ...fixture, medicine }, { span: [30], steady: [30] })).toBeNull();
  });
});
