import { describe, expect, it } from "vitest";
import { quantityPrint, quantityRead, UNIT_CODES, type UnitCode, unitWordRead } from "../../../src/core/units/index.ts";

const read = (text: string, defaultUnit?: UnitCode) =>
  quantityRead(text, defaultUnit === undefined ? { units: UNIT_CODES } : { units: UNIT_CODES, defaultUnit });
const code = (result: ReturnType<typeof read>) => (result.ok ? null : result.issues[0]?.code);

describe("quantityRead takes", () => {
  it.each([
    ["58 kg", 58, "kg"],
    ["58kg", 58, "kg"],
    [" 58  kilograms ", 58, "kg"],
    ["150 lb", 150, "[lb_av]"],
    ["150 pounds", 150, "[lb_av]"],
    ["64 in", 64, "[in_i]"],
    ["64 years", 64, "a"],
    ["64 y", 64, "a"],
    ["1.1 mg/dL", 1.1, "mg/dL"],
    ["1.1 mg/dl", 1.1, "mg/dL"],
    ["97 umol/L", 97, "umol/L"],
    ["97 \u00b5mol/L", 97, "umol/L"],
    ["97 \u03bcmol/L", 97, "umol/L"],
    ["97 micromol per litre", 97, "umol/L"],
    ["125 mcg", 125, "ug"],
    ["125 microgram", 125, "ug"],
    ["125 micrograms", 125, "ug"],
    ["125 \u00b5g", 125, "ug"],
    ["12.4 mg/L", 12.4, "mg/L"],
    ["12.4 mcg/mL", 12.4, "ug/mL"],
    ["3.2 L/h", 3.2, "L/h"],
    ["3.2 litres per hour", 3.2, "L/h"],
    ["0.04 L/h/kg", 0.04, "L/h/kg"],
    ["17.3 mg/h", 17.3, "mg/h"],
    ["17.3 mg per hour", 17.3, "mg/h"],
    ["0.3 /h", 0.3, "/h"],
    ["0.3 per hour", 0.3, "/h"],
    ["300 mg.h/L", 300, "mg.h/L"],
    ["300 mg·h/L", 300, "mg.h/L"],
    ["12 hours", 12, "h"],
    ["5 ml", 5, "mL"],
    ["1.9 m\u00b2", 1.9, "m2"],
    ["95 mL/min/1.73 m\u00b2", 95, "mL/min/{1.73_m2}"],
    ["95 mL/min per 1.73m2", 95, "mL/min/{1.73_m2}"],
    ["16.2 mmol", 16.2, "mmol"],
    ["50 %", 50, "%"],
    ["-3 mg", -3, "mg"],
  ] as const)("%j", (text, value, unit) => {
    expect(read(text)).toEqual({ ok: true, value: { value, unit } });
  });

  it("a bare number in the field's own unit, and only then", () => {
    expect(read("58", "kg")).toEqual({ ok: true, value: { value: 58, unit: "kg" } });
    expect(code(read("58"))).toBe("quantity-no-unit");
  });

  it("every unit's own code, and what the screen and the print write for it", () => {
    for (const unit of UNIT_CODES) {
      if (unit !== "1") expect(unitWordRead(unit), unit).toBe(unit);
      for (const style of ["screen", "print"] as const) {
        const text = quantityPrint({ value: 2, unit }, { style });
        expect(read(text, "1"), text).toEqual({ ok: true, value: { value: 2, unit } });
      }
    }
  });
});

describe("quantityRead refuses", () => {
  it.each([
    ["1,5 kg", "number-comma"],
    ["kg", "number-empty"],
    ["", "number-empty"],
    ["\u22123 kg", "number-minus"],
    ["1e3 mg", "number-exponent"],
    ["1.5 furlong", "quantity-unknown-unit"],
    ["1.5 mg/kg", "quantity-unknown-unit"],
    ["1.5 mg kg", "quantity-unknown-unit"],
    ["1.5 U", "quantity-unknown-unit"],
    ["1.5 mgs", "quantity-unknown-unit"],
    ["58 58 kg", "number-format"],
  ])("%j with %s", (text, wanted) => {
    expect(code(read(text))).toBe(wanted);
  });

  it("a unit of the table that the field does not take, naming what it takes", () => {
    const result = quantityRead("58 cm", { units: ["kg", "[lb_av]"] });
    expect(result).toMatchObject({
      ok: false,
      issues: [{ code: "quantity-unit-refused", data: { unit: "cm", units: ["kg", "[lb_av]"] } }],
    });
  });
});
