// @vitest-environment node
import { describe, expect, it } from "vitest";
import type { Case } from "../../../src/core/case/index.ts";
import { instantMs, MS_PER_HOUR } from "../../../src/core/time/index.ts";
import { buildSummary } from "../../../src/view/summary/buildSummary.ts";
import { orderedLine } from "../../core/case/orderedLine.ts";
import { caseOrdering, summaryCase, summaryInputOf } from "./summaryFixture.ts";

const sentences = (value: Case) => buildSummary(summaryInputOf(value)).nextLevel.sentences;
const WRITE = "Write the time of the last dose and of the sample on the request.";

describe("when to draw the next level", () => {
  it("is within the half-hour before the first dose at or after 90 % of steady state", () => {
    const input = summaryInputOf(summaryCase());
    const { originMs } = input.analysis.clock;
    const steadyMs = originMs + input.analysis.options[0]!.typical!.steadyState!.steady90AtH * MS_PER_HOUR;
    const doseMs = instantMs("2026-03-05T20:00:00+00:00");
    expect(doseMs - 12 * MS_PER_HOUR).toBeLessThan(steadyMs);
    expect(doseMs).toBeGreaterThanOrEqual(steadyMs);
    expect(sentences(summaryCase())).toEqual([
      "Thursday 5 March 2026, between 19:30 and 20:00, before the 20:00 dose: the first dose at or after 90 % of steady state (Thu 5 March, 18:30).",
      WRITE,
    ]);
  });

  it("names both days when the half-hour goes over midnight", () => {
    expect(sentences(caseOrdering([orderedLine({ start: "2026-03-05T00:00:00+00:00" })]))[0]).toBe(
      "Between Thursday 5 March 2026, 23:30 and Friday 6 March 2026, 00:00, before the 00:00 dose: the first dose at or after 90 % of steady state (Thu 5 March, 22:30).",
    );
  });

  it("waits anew after a lead-in that outlasts the first wait", () => {
    const leadIn = orderedLine({
      id: "lead",
      amount: { value: 450, unit: "mg" },
      repeat: { every: { value: 12, unit: "h" }, count: 14 },
    });
    const value = caseOrdering([leadIn, orderedLine({ start: "2026-03-05T08:00:00+00:00" })]);
    const last = instantMs("2026-03-11T08:00:00+00:00");
    const { timeTo90H } = summaryInputOf(value).analysis.options[0]!.typical!.steadyState!;
    expect(timeTo90H).toBeGreaterThan(12);
    expect(timeTo90H).toBeLessThan(24);
    expect(new Date(last + timeTo90H * MS_PER_HOUR).toISOString().slice(0, 10)).toBe("2026-03-12");
    expect(sentences(value)[0]).toMatch(/^Thursday 12 March 2026, between 07:30 and 08:00, before the 08:00 dose/);
  });

  describe("for a window about a level at a stated time after the dose", () => {
    const window = {
      quantity: "trough" as const,
      low: { value: 8, unit: "mg/L" as const },
      high: { value: 15, unit: "mg/L" as const },
      drawFrom: { value: 11.5, unit: "h" as const },
      drawTo: { value: 12.5, unit: "h" as const },
      basis: "invented",
    };
    const every = (hours: number) => [orderedLine({ repeat: { every: { value: hours, unit: "h" } } })];

    it("is drawn then", () => {
      expect(sentences(caseOrdering(every(24), { window }))[0]).toMatch(
        /^Friday 6 March 2026, between 07:30 and 08:30, after the dose of Thu 5 March, 20:00: the first dose at or after 90 % of steady state /,
      );
    });

    it("is drawn before the next dose where that comes first", () => {
      expect(sentences(caseOrdering(every(12), { window }))[0]).toMatch(
        /^Friday 6 March 2026, between 07:30 and 08:00, after the dose of Thu 5 March, 20:00/,
      );
      expect(sentences(caseOrdering(every(8), { window }))[0]).toMatch(/between \d\d:30 and \d\d:00, before the/);
    });
  });

  it("says that a short course ends before a steady level could be drawn", () => {
    const found = sentences(caseOrdering([orderedLine({ repeat: { every: { value: 12, unit: "h" }, count: 2 } })]));
    expect(found[0]).toMatch(
      /^The last dose of the option \(Thursday 5 March 2026, 08:00\) comes before 90 % of steady state \(Thursday 5 March 2026, 18:30\)\./,
    );
  });

  it("leaves it to the clinical question without a steady state, a model or an option", () => {
    const { repeat: _, ...single } = orderedLine();
    expect(sentences(caseOrdering([single]))[0]).toBe("The option does not repeat, so it has no steady state.");
    expect(sentences(summaryCase({ options: [] }))).toEqual(["No option is chosen, so no time can be given."]);
    expect(sentences(summaryCase({ patient: { observations: [], factors: [] } }))).toEqual([
      "There is no prediction, so no time can be given.",
    ]);
  });
});
