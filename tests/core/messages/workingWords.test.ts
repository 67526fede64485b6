import { describe, expect, it } from "vitest";
import { type Analysis, derive } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";
import { concernMessage, individualWorking, readingWorking } from "../../../src/core/messages/index.ts";
import { caseFixture } from "../analysis/caseFixture.ts";
import { fittedAnalysis, spread } from "../analysis/fitFixture.ts";

const lithium = recordById("lithium")!;
const hours = (value: number) => ({ value, unit: "h" }) as const;
/** Once a day in the evening, judged by the level 12 hours after the dose; invented. */
const value: Case = caseFixture({
  medicine: lithium,
  fit: { use: "typical", residualModel: "normal" },
  window: {
    quantity: "trough",
    low: { value: 0.6, unit: "mmol/L" },
    high: { value: 0.8, unit: "mmol/L" },
    drawFrom: hours(11.5),
    drawTo: hours(12.5),
    basis: "invented",
  },
  given: [],
  levels: [],
  options: [
    {
      id: "A",
      label: "",
      chosen: true,
      lines: [
        {
          id: "a-1",
          product: "tablet-er",
          amount: { value: 300, unit: "mg" },
          start: "2026-03-04T22:00:00+00:00",
          repeat: { every: hours(24) },
        },
      ],
    },
  ],
});
const analysis: Analysis = derive(value);
const steady = analysis.options[0]!.typical!.steadyState!;
/** mmol/L of mg/L: the molar mass of lithium is 6.94 g/mol. */
const mmol = (mgPerL: number) => mgPerL / 6.94;

describe("the working of a reading in the unit the bench shows", () => {
  it.each([
    ["peak", steady.peak],
    ["lowest", steady.lowest],
    ["average", steady.average],
    ["timed", steady.timed!.lowest],
    ["spanPeak", analysis.options[0]!.typical!.span.peak],
    ["spanAverage", analysis.options[0]!.typical!.span.average],
  ])("%s of lithium is in mmol/L, and says how it came from mg/L", (row, mgPerL) => {
    const working = readingWorking(value, analysis, "A", row)!;
    expect(working.result).toMatch(/mmol\/L/);
    expect(working.result).not.toMatch(/mg\/L/);
    // Printed to six digits.
    expect(Math.abs(Number.parseFloat(working.result) / mmol(mgPerL) - 1)).toBeLessThan(1e-5);
    expect(working.steps.at(-1)).toBe("counted in mg/L; 1 mg/L = 0.144092 mmol/L, by the molar mass 6.94 g/mol");
  });

  it("an AUC is in mmol·h/L", () => {
    const { result } = readingWorking(value, analysis, "A", "auc24")!;
    expect(result).toMatch(/mmol·h\/L$/);
    expect(Math.abs(Number.parseFloat(result) / mmol(steady.auc24) - 1)).toBeLessThan(1e-5);
  });

  it("a unit chosen on the bench is the working's", () => {
    const { result, steps } = readingWorking(value, analysis, "A", "peak", "mg/L")!;
    expect(result).toMatch(/^[\d.]+ mg\/L$/);
    expect(steps.join()).not.toContain("counted in mg/L");
  });

  it("this patient's are in it too, and those at 12 hours are there", () => {
    const fitted = fittedAnalysis(analysis);
    const timed = { afterDoseH: 12, lowest: spread(4.2), highest: spread(4.2) };
    const options = fitted.options.map((option) => ({
      ...option,
      individual: { ...option.individual!, steadyState: { ...option.individual!.steadyState!, timed } },
    }));
    const found = individualWorking(value, { ...fitted, options }, "A", "timed")!;
    expect(found.title).toBe("Level 12 hours after the dose at steady state");
    expect(found.result).toMatch(
      /^median 0\.605187 mmol\/L; 50 % between 0\.504323 and 0\.726225, 90 % between .* mmol\/L$/,
    );
    for (const row of ["peak", "lowest", "average", "auc24", "spanPeak"]) {
      expect(individualWorking(value, { ...fitted, options }, "A", row)!.result).not.toMatch(/mg/);
    }
  });
});

it("a concern about a timed window says which level was compared", () => {
  const [below] = analysis.concerns.filter(({ code }) => code === "option-below-window");
  const { text } = concernMessage(below!);
  expect(text.replaceAll("\u00a0", " ")).toMatch(
    /^Expected level 12 hours after the dose at steady state 0\.\d+ mmol per L; the window's lower edge is 0\.6 mmol per L\.$/,
  );
});
