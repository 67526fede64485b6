// @vitest-environment node
import { describe, expect, it } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { buildSummary } from "../../../src/view/summary/buildSummary.ts";
import { demoCase } from "../../fixtures/demoCase.ts";
import { summaryInputOf } from "./summaryFixture.ts";

const lithium = demoCase("lithium");
const sheetOf = (value: Case) =>
  buildSummary({ ...summaryInputOf(value), analysis: derive(value, { isFitted: true, isCrossChecked: true }) });

/** The lithium demo: once a day, mmol per L, a window 12 hours after the dose. */
describe.each([
  ["this patient", lithium],
  ["the typical patient", { ...lithium, fit: { ...lithium.fit, use: "typical" as const } }],
])("the sheet of lithium, %s", (_, value) => {
  const sheet = sheetOf(value);
  const readings = new Map(
    sheet.expected!.rows.map(({ label, value: text }) => [label, text.replaceAll("\u00a0", " ")]),
  );

  it("has concentrations in mmol per L and the AUC in mmol hours per L", () => {
    expect(readings.get("Average")).toMatch(/^[\d.]+ mmol per L/);
    expect(readings.get("AUC in 24 hours")).toMatch(/^[\d.]+ mmol hours per L/);
    expect([...readings.values()].join()).not.toMatch(/mg (hours )?per L/);
  });

  it("has the level at 12 hours, above the lowest", () => {
    const figure = (label: string) => Number.parseFloat(readings.get(label)!);
    const lowest = [...readings.keys()].find((label) => label.startsWith("Lowest"))!;
    expect(figure("12 hours after a dose")).toBeGreaterThan(1.3 * figure(lowest));
  });

  it("draws the next level 11.5 to 12.5 hours after a dose, not before the next one", () => {
    expect(sheet.nextLevel.sentences[0]).toMatch(/between 09:30 and 10:30, after the dose of .*, 22:00/);
  });

  it("says what the window is about by its hour", () => {
    expect(JSON.stringify(sheet)).toContain("12 hours after the dose, 0.8 to 1");
    expect(sheet.hours!.span).toContain("level 12 hours after the dose");
  });
});
