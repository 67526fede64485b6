import { describe, expect, it } from "vitest";
import { concentrationWindow, derive } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { windowRangeWords } from "../../../src/core/messages/index.ts";
import { demoCase } from "../../fixtures/demoCase.ts";

const byMass = demoCase("modified-release");

/** The same window in other units: at 250 g/mol, 4 mg/L are 16 umol/L exactly. */
const molar = (unit: "umol/L" | "nmol/L" | "mmol/L" | "ug/L", factor: number): Case => ({
  ...byMass,
  window: {
    ...byMass.window!,
    low: { value: 4 * factor, unit },
    high: { value: 8 * factor, unit },
  },
});

describe("a target window in another unit", () => {
  it("is 4 to 8 mg/L in the demo case of 250 g/mol", () => {
    expect(byMass.window).toMatchObject({ low: { value: 4, unit: "mg/L" }, high: { value: 8, unit: "mg/L" } });
    expect(byMass.medicine.molarMass.value).toBe(250);
  });

  it.each([
    ["umol/L", 4],
    ["nmol/L", 4_000],
    ["mmol/L", 0.004],
    ["ug/L", 1_000],
  ] as const)("in %s gives the same readings and concerns", (unit, factor) => {
    const other = molar(unit, factor);
    // Tolerance 0: these conversions are exact.
    expect(concentrationWindow(other)).toEqual({ low: 4, high: 8 });
    const [here, there] = [derive(byMass), derive(other)];
    expect(there.options).toEqual(here.options);
    expect(there.concerns).toEqual(here.concerns);
    expect(there.fingerprint).not.toBe(here.fingerprint);
  });

  it("is a target of exposure no window of the curve", () => {
    const window = {
      quantity: "auc24",
      low: { value: 1, unit: "mg.h/L" },
      high: { value: 2, unit: "mg.h/L" },
      basis: "",
    } as const;
    expect(concentrationWindow({ ...byMass, window })).toBeNull();
  });

  it("is said in the medicine's unit where it was stated by mass, as it was stated where it was not", () => {
    expect(windowRangeWords(molar("ug/L", 1_000).window!, "mg/L")).toBe("4 to 8 mg/L");
    expect(windowRangeWords(molar("umol/L", 4).window!, "mg/L")).toBe("16 to 32 micromol/L");
  });
});
