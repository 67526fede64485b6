import { UcumLhcUtils } from "@lhncbc/ucum-lhc";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  quantityConvert,
  UNIT_CODES,
  type UnitCode,
  unitDimension,
  unitsCompatible,
} from "../../../src/core/units/index.ts";

const MOLAR_MASS = 180.17;
const ucum = UcumLhcUtils.getInstance();
const PAIRS = UNIT_CODES.flatMap((from) => UNIT_CODES.map((to) => [from, to] as const));
const relative = (found: number, wanted: number) => Math.abs(found - wanted) / Math.abs(wanted);

describe("against the UCUM conversion library", () => {
  // The library converts through floating magnitudes, so it is the coarser of the two: measured 3.4e-16 (mmol/L to mg/mL).
  const TOLERANCE = 4e-16;

  // UCUM holds the mole a pure number, so with a molar mass at hand the library turns g/mol into 1 or %. Here it is a dimension of its own.
  const isMoleAsNumber = (from: UnitCode, to: UnitCode) =>
    [from, to].includes("g/mol") && (from === "1" || from === "%" || to === "1" || to === "%");

  // UCUM takes what stands in braces for a remark, so that the library turns mL/min/{1.73_m2} into mL/min without the body surface.
  const isRemarkDropped = (from: UnitCode, to: UnitCode) =>
    (from === "mL/min/{1.73_m2}") !== (to === "mL/min/{1.73_m2}") &&
    [from, to].every((unit) => unit === "L/h" || unit.startsWith("mL/min"));

  it("every pair of the table converts to the same number, or is refused by both", () => {
    let converted = 0;
    for (const [from, to] of PAIRS) {
      const theirs = ucum.convertUnitTo(from, 7.3, to, { molecularWeight: MOLAR_MASS });
      const isOurs = unitsCompatible(from, to, { molarMass: true });
      if (isMoleAsNumber(from, to) || isRemarkDropped(from, to)) {
        expect(theirs.status, `${from} to ${to}: no exception is needed`).toBe("succeeded");
        expect(isOurs, `${from} to ${to}`).toBe(false);
        continue;
      }
      expect(theirs.status === "succeeded", `${from} to ${to}: ${theirs.msg.join(" ")}`).toBe(isOurs);
      if (!isOurs) continue;
      converted += 1;
      const ours = quantityConvert({ value: 7.3, unit: from }, to, MOLAR_MASS);
      expect(relative(ours, theirs.toVal ?? Number.NaN), `${from} to ${to}`).toBeLessThanOrEqual(TOLERANCE);
    }
    // (5 + 1)² mass or mmol, 3² length, 2² volume, 5² time, (8 + 3)² concentration, 2² flow, 2² number, 9 alone.
    expect(converted).toBe(36 + 9 + 4 + 25 + 121 + 4 + 4 + 9);
  });

  it.each([6.94, 252.27, 780.94, 804.02])("every mass and molar pair with a molar mass of %d g/mol", (molarMass) => {
    const molar = PAIRS.filter(
      ([from, to]) => !unitsCompatible(from, to) && unitsCompatible(from, to, { molarMass: true }),
    );
    // 8 · 3 concentrations and 5 · 1 amounts, both ways.
    expect(molar).toHaveLength(2 * (24 + 5));
    for (const [from, to] of molar) {
      for (const value of [0.8, 55, 1.3e-3]) {
        const theirs = ucum.convertUnitTo(from, value, to, { molecularWeight: molarMass }).toVal ?? Number.NaN;
        const ours = quantityConvert({ value, unit: from }, to, molarMass);
        // The library's rounding again: measured 4.05e-16 (0.0013 umol/L to mg/L at 804.02 g/mol, where ours is exact, see below).
        expect(relative(ours, theirs), `${value} ${from} to ${to}`).toBeLessThanOrEqual(4.1e-16);
      }
    }
  });
});

describe("exactness", () => {
  it.each([
    [5, "mg", "g", 0.005],
    [0.005, "g", "mg", 5],
    [2.01, "g", "mg", 2010],
    [0.57, "m", "cm", 57],
    [1.1, "mg", "ug", 1100],
    [150, "[lb_av]", "kg", 68.0388555],
    [64, "[in_i]", "cm", 162.56],
    [1, "a", "d", 365.25],
    [1, "L/h", "mL/min", 1000 / 60],
    [60, "mL/min", "L/h", 3.6],
    [50, "%", "1", 0.5],
    [0, "mg", "g", 0],
    [-5, "mg", "g", -0.005],
    [1e-300, "kg", "ug", 1e-291],
  ] as const)("%d %s is %s: %d, to the last bit", (value, unit, to, wanted) => {
    expect(quantityConvert({ value, unit }, to)).toBe(wanted);
  });

  it("mass and mole, to the last bit", () => {
    expect(quantityConvert({ value: 0.0013, unit: "umol/L" }, "mg/L", 804.02)).toBe(0.001045226);
    expect(quantityConvert({ value: 0.6, unit: "mmol/L" }, "mg/L", 6.94)).toBe(4.164);
    expect(quantityConvert({ value: 4.164, unit: "mg/L" }, "mmol/L", 6.94)).toBe(0.6);
    expect(quantityConvert({ value: 24.36, unit: "mmol" }, "mg", 6.94)).toBe(169.0584);
  });

  it("there and back is the same number, for every decimal a person types (up to 12 digits) in every pair of powers of ten", () => {
    const tens: readonly (readonly [UnitCode, UnitCode])[] = [
      ["kg", "ug"],
      ["g", "mg"],
      ["mg/dL", "g/L"],
      ["mmol/L", "nmol/L"],
      ["L", "mL"],
      ["m", "cm"],
      ["1", "%"],
    ];
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 999_999_999_999 }), fc.integer({ min: -9, max: 3 }), (digits, power) => {
        const value = Number(`${digits}e${power}`);
        for (const [from, to] of tens) {
          expect(quantityConvert({ value: quantityConvert({ value, unit: from }, to), unit: to }, from)).toBe(value);
        }
      }),
      { seed: 20260304, numRuns: 300 },
    );
  });

  it("mass and molar concentration undo each other to one rounding each (2.3e-16)", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-6, max: 1e6, noNaN: true }),
        fc.double({ min: 2, max: 2000, noNaN: true }),
        (value, molarMass) => {
          const molar = quantityConvert({ value, unit: "mg/L" }, "umol/L", molarMass);
          const back = quantityConvert({ value: molar, unit: "umol/L" }, "mg/L", molarMass);
          expect(relative(back, value)).toBeLessThanOrEqual(2.3e-16);
        },
      ),
      { seed: 20260304, numRuns: 500 },
    );
  });
});

describe("refusals", () => {
  it("names both units when the dimensions differ", () => {
    expect(() => quantityConvert({ value: 1, unit: "mg" }, "mL")).toThrow(
      /mg \(mass\) cannot be converted to mL \(volume\)/,
    );
  });

  it.each([undefined, 0, -1, Number.NaN, Number.POSITIVE_INFINITY])(
    "mass to molar with the molar mass %s",
    (molarMass) => {
      expect(() => quantityConvert({ value: 1, unit: "mg/L" }, "umol/L", molarMass)).toThrow(RangeError);
      expect(() => quantityConvert({ value: 1, unit: "umol/L" }, "mg/L", molarMass)).toThrow(RangeError);
    },
  );

  it.each([Number.NaN, Number.POSITIVE_INFINITY])("the value %s, also into its own unit", (value) => {
    expect(() => quantityConvert({ value, unit: "mg" }, "mg")).toThrow(RangeError);
  });
});

describe("unitsCompatible", () => {
  it("agrees with quantityConvert for every pair, with and without the molar mass", () => {
    for (const [from, to] of PAIRS) {
      for (const molarMass of [true, false]) {
        const convert = () => quantityConvert({ value: 1, unit: from }, to, molarMass ? MOLAR_MASS : undefined);
        if (unitsCompatible(from, to, { molarMass })) expect(convert(), `${from} to ${to}`).toBeGreaterThan(0);
        else expect(convert, `${from} to ${to}`).toThrow(RangeError);
      }
    }
  });

  it("takes no molar mass for granted", () => {
    expect(unitsCompatible("mg/L", "umol/L")).toBe(false);
    expect(unitsCompatible("umol/L", "mg/L", { molarMass: true })).toBe(true);
  });
});

it("unitDimension names the dimension", () => {
  expect(unitDimension("ug/mL")).toBe("mass concentration");
  expect(unitDimension("mg.h/L")).toBe("exposure");
  expect(unitDimension("mg/h")).toBe("mass rate");
});
