import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { doseLabelledMg, doseMg, productDoseUnits, productOf, recordById } from "../../../src/core/medicine/index.ts";
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

  it("counts the active moiety of a salt, and only there: the label stays as it is", () => {
    const capsule = productOf(recordById("phenytoin")!, "capsule-er");
    const mg = doseMg({ value: 300, unit: "mg" }, capsule);
    // Relative tolerance 2.3e-16: one rounding.
    expect(mg.ok && Math.abs(mg.value / 276 - 1)).toBeLessThan(2.3e-16);
    expect(doseLabelledMg({ value: 300, unit: "mg" }, capsule)).toEqual({ ok: true, value: 300 });
    for (const product of [tablet, solution]) {
      expect(doseMg({ value: 300, unit: "mg" }, product)).toEqual(doseLabelledMg({ value: 300, unit: "mg" }, product));
    }
  });

  it("a salt given as a liquid counts by concentration and salt factor", () => {
    const salt = { ...solution, saltFactor: { value: 0.5, unit: "1", source: "x", basis: "seen" } } as const;
    expect(doseMg({ value: 15, unit: "mL" }, salt)).toEqual({ ok: true, value: 40 });
    expect(doseMg({ value: 0, unit: "mL" }, salt)).toMatchObject({ ok: false, issues: [{ code: "dose-amount" }] });
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
