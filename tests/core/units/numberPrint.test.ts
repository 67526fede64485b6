import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { numberPlain, numberPrint, quantityPrint, UNIT_CODES, unitSpoken } from "../../../src/core/units/index.ts";

describe("numberPrint", () => {
  it.each([
    [0, {}, "0"],
    [-0, {}, "0"],
    [1, {}, "1"],
    [0.5, {}, "0.5"],
    [999, {}, "999"],
    [1000, {}, "1,000"],
    [1234567.25, {}, "1,234,567.25"],
    [-1234.5, {}, "\u22121,234.5"],
    [1e21, {}, "1,000,000,000,000,000,000,000"],
    [1e-9, {}, "0.000000001"],
    [12.34567, { significant: 3 }, "12.3"],
    [0.00123456, { significant: 3 }, "0.00123"],
    [1256.4, { significant: 3 }, "1,256"],
    [99.96, { significant: 3 }, "100"],
    [9.995, { significant: 3 }, "10"],
    [12, { significant: 4 }, "12"],
    [1.005, { decimals: 2 }, "1.01"],
    [2.5, { decimals: 0 }, "3"],
    [-2.5, { decimals: 0 }, "\u22123"],
    [0.5, { decimals: 0 }, "1"],
    [1.45, { decimals: 1 }, "1.5"],
    [0.04, { decimals: 1 }, "0"],
    [-0.04, { decimals: 1 }, "0"],
    [7.1, { decimals: 3 }, "7.1"],
    [999.5, { decimals: 0 }, "1,000"],
  ])("%d with %j is %s", (value, options, text) => {
    expect(numberPrint(value, options)).toBe(text);
  });

  it.each([Number.NaN, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY])("never prints %s", (value) => {
    expect(() => numberPrint(value)).toThrow(RangeError);
    expect(() => numberPlain(value)).toThrow(RangeError);
  });

  it.each([
    { significant: 0 },
    { significant: 16 },
    { significant: 2.5 },
    { decimals: -1 },
    { decimals: 16 },
    { significant: 3, decimals: 1 },
  ])("refuses the options %j", (options) => {
    expect(() => numberPrint(1, options)).toThrow(RangeError);
  });

  it("keeps to the notation for every number: a leading zero, no trailing one, commas, no exponent", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e15, max: 1e15, noNaN: true }),
        fc.option(fc.integer({ min: 1, max: 15 }), { nil: undefined }),
        (value, significant) => {
          const text = numberPrint(value, significant === undefined ? {} : { significant });
          expect(text).toMatch(/^\u2212?(0|[1-9]\d{0,2}(,\d{3})*)(\.\d*[1-9])?$/);
        },
      ),
      { seed: 20260304, numRuns: 1000 },
    );
  });

  it("rounds to within half a unit of the last place kept (relative 1e-12 for the double itself)", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.integer({ min: 0, max: 6 }),
        (value, decimals) => {
          const shown = Number(numberPrint(value, { decimals }).replaceAll(",", "").replace("\u2212", "-"));
          expect(Math.abs(shown - value)).toBeLessThanOrEqual(0.5 * 10 ** -decimals + Math.abs(value) * 1e-12);
        },
      ),
      { seed: 20260304, numRuns: 1000 },
    );
  });
});

describe("quantityPrint", () => {
  const print = { style: "print" } as const;
  const screen = { style: "screen" } as const;

  it.each([
    [{ value: 300, unit: "mg" }, print, "300\u00a0mg"],
    [{ value: 12.4, unit: "mg/L" }, screen, "12.4\u00a0mg/L"],
    [{ value: 12.4, unit: "mg/L" }, print, "12.4\u00a0mg per L"],
    [{ value: 97, unit: "umol/L" }, screen, "97\u00a0micromol/L"],
    [{ value: 97, unit: "umol/L" }, print, "97\u00a0micromol per L"],
    [{ value: 1, unit: "a" }, print, "1\u00a0year"],
    [{ value: 64, unit: "a" }, print, "64\u00a0years"],
    [{ value: 0.5, unit: "a" }, print, "0.5\u00a0years"],
    [{ value: 1, unit: "d" }, print, "1\u00a0day"],
    [{ value: 0.3, unit: "1" }, print, "0.3"],
    [{ value: 0.3, unit: "/h" }, print, "0.3\u00a0per h"],
    [{ value: 0.04, unit: "L/h/kg" }, print, "0.04\u00a0L per h per kg"],
    [{ value: 17.3, unit: "mg/h" }, screen, "17.3\u00a0mg/h"],
    [{ value: 17.3, unit: "mg/h" }, print, "17.3\u00a0mg per h"],
    [{ value: 310, unit: "mg.h/L" }, screen, "310\u00a0mg·h/L"],
    [{ value: 150, unit: "[lb_av]" }, screen, "150\u00a0lb"],
    [{ value: 0.125, unit: "mg" }, print, "125\u00a0microgram"],
    [{ value: 0.125, unit: "mg" }, { ...print, microgram: "mcg" }, "125\u00a0mcg"],
    [{ value: 0.125, unit: "mg" }, screen, "125\u00a0microgram"],
    [{ value: 0.12345, unit: "mg" }, { ...print, significant: 3 }, "123\u00a0microgram"],
    [{ value: 0.12345, unit: "mg" }, print, "123.45\u00a0microgram"],
    [{ value: 0.0625, unit: "mg" }, print, "62.5\u00a0microgram"],
    [{ value: 1.5, unit: "mg" }, print, "1.5\u00a0mg"],
    [{ value: 0, unit: "mg" }, print, "0\u00a0mg"],
    [{ value: 0.9996, unit: "mg" }, { ...print, decimals: 3 }, "1\u00a0mg"],
    [{ value: 0.5, unit: "mg/L" }, print, "0.5\u00a0mg per L"],
    [{ value: 1500, unit: "mg" }, print, "1,500\u00a0mg"],
  ] as const)("%j with %j is %s", (quantity, options, text) => {
    expect(quantityPrint(quantity, options)).toBe(text);
  });

  it("no unit is spoken with the Greek letter, and none with a slash in print", () => {
    for (const unit of UNIT_CODES) {
      for (const style of ["screen", "print"] as const) {
        expect(unitSpoken(unit, style)).not.toMatch(/[\u00b5\u03bc[\]]|\bug\b/);
      }
      expect(unitSpoken(unit, "print")).not.toContain("/");
    }
  });
});
