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

describe("several doses a day, a window for the level 12 hours after one", () => {
  const at = (start: string, ...clock: string[]): Case => ({
    ...lithium,
    options: [
      {
        id: "A",
        label: "",
        chosen: true,
        lines: [
          {
            id: "a",
            product: "tablet-er",
            amount: { value: 300, unit: "mg" },
            start: `2026-03-${start}:00+00:00`,
            repeat: { clock },
          },
        ],
      },
    ],
  });
  const LABEL = "12 hours after a dose";
  const plain = (text: string) => text.replaceAll("\u00a0", " ");
  const codes = (value: Case, isFitted: boolean) => derive(value, { isFitted }).concerns.map(({ code }) => code);

  it("at 08:00, 14:00 and 20:00 there is one such level, and the next sample is that one", () => {
    const value = { ...at("06T08:00", "08:00", "14:00", "20:00"), fit: { ...lithium.fit, use: "typical" as const } };
    const analysis = derive(value);
    const { timed, lowest } = analysis.options[0]!.typical!.steadyState!;
    expect(timed!.lowest).toBe(timed!.highest);
    // Just before the 08:00 dose is also the lowest of the day.
    expect(Math.abs(timed!.lowest / lowest - 1)).toBeLessThan(0.03);
    const sheet = buildSummary({ ...summaryInputOf(value), analysis });
    expect(sheet.expected!.rows.filter(({ label }) => label.startsWith(LABEL))).toHaveLength(1);
    expect(sheet.nextLevel.sentences[0]).toMatch(/between 07:30 and 08:00, after the dose of .*, 20:00/);
    expect(codes(value, false)).not.toContain("window-hour-never");
  });

  it("every 8 hours there is none: said on the sheet and as a concern, no chance and no verdict by the window", () => {
    const value = at("06T06:00", "06:00", "14:00", "22:00");
    const analysis = derive(value, { isFitted: true, isCrossChecked: true });
    const [option] = analysis.options;
    expect(option!.typical!.steadyState!.timed).toBeNull();
    expect(option!.individual!.steadyState!.timed).toBeNull();
    expect(option!.individual!.steadyChance).toBeNull();
    const found = analysis.concerns.map(({ code }) => code);
    expect(
      found.filter((code) => /^option-(chance-)?(above|below)/.test(code) || code === "option-below-window"),
    ).toEqual([]);
    const sheet = buildSummary({ ...summaryInputOf(value), analysis });
    expect(sheet.expected!.rows.find(({ label }) => label === LABEL)!.value).toBe("never: the next dose comes sooner");
    const { title, text } = sheet.concerns.find((one) => one.title.includes("no level is"))!;
    expect(plain(title)).toBe("Option A: no level is 12 hours after a dose");
    expect(plain(text)).toContain("or hold a dose for the level, by local policy");
    expect(plain(text)).toContain("with 0.8 mmol per L to 1 mmol per L");
    expect(sheet.nextLevel.sentences[0]).toMatch(/before the \d\d:00 dose/);
    expect(sheet.nextLevel.sentences[1]).toMatch(/^Here no dose is followed by 12 hours without another/);
  });
});
