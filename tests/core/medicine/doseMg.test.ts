import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { doseMg, productDoseUnits, productOf, recordById } from "../../../src/core/medicine/index.ts";
import { issueMessage } from "../../../src/core/messages/index.ts";

const record = recordById("theophylline")!;
const tablet = productOf(record, "tablet-12h");
const solution = productOf(record, "solution");

describe("doseMg", () => {
  it.each([
    [300, "mg", 300],
    [0.3, "g", 300],
    [300_000, "ug", 300],
  ] as const)("%d %s of a tablet is %d mg", (value, unit, expected) => {
    expect(doseMg({ value, unit }, tablet)).toEqual({ ok: true, value: expected });
  });

  it("15 mL of 80 mg in 15 mL is 80 mg", () => {
    expect(doseMg({ value: 15, unit: "mL" }, solution)).toEqual({ ok: true, value: 80 });
    expect(doseMg({ value: 80, unit: "mg" }, solution)).toEqual({ ok: true, value: 80 });
  });

  it("is proportional to the volume", () => {
    fc.assert(
      fc.property(fc.double({ min: 0.001, max: 1000, noNaN: true }), (mL) => {
        const mg = doseMg({ value: mL, unit: "mL" }, solution);
        // Relative tolerance 2e-16: the concentration is 80/15 rounded once, the product once more.
        expect(mg.ok && Math.abs(mg.value / ((mL * 80) / 15) - 1)).toBeLessThan(4e-16);
      }),
      { seed: 1 },
    );
  });

  it("refuses a volume of a tablet, with the unit at fault and what fits", () => {
    const mg = doseMg({ value: 5, unit: "mL" }, tablet);
    expect(mg).toMatchObject({ ok: false, issues: [{ code: "dose-unit-mismatch", path: ["unit"] }] });
    expect(mg.ok ? "" : issueMessage(mg.issues[0]!)).toBe(
      "The 12-hour modified-release tablet is not measured in mL: write mg, g or microgram.",
    );
    expect(productDoseUnits(tablet)).not.toContain("mL");
    expect(productDoseUnits(solution)).toContain("mL");
  });

  it.each([0, -1, Number.NaN, Number.POSITIVE_INFINITY])("refuses an amount of %d", (value) => {
    expect(doseMg({ value, unit: "mg" }, tablet)).toMatchObject({ ok: false, issues: [{ code: "dose-amount" }] });
  });
});

describe("productOf", () => {
  it("throws for a product that is not there", () => {
    expect(() => productOf(record, "nothing")).toThrow(RangeError);
  });
});
