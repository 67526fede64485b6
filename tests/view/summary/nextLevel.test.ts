// @vitest-environment node
import { describe, expect, it } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { instantMs, MS_PER_HOUR } from "../../../src/core/time/index.ts";
import { buildSummary } from "../../../src/view/summary/buildSummary.ts";
import { orderedLine } from "../../core/case/orderedLine.ts";
import { caseOrdering, summaryCase, summaryInputOf } from "./summaryFixture.ts";

const sentencesAsRecorded = (value: Case) => buildSummary(summaryInputOf(value)).nextLevel.sentences;
/** With a record that states no wait of its own, so that 90 % of steady state decides. */
function sentences({ medicine, ...rest }: Case): readonly string[] {
  const { steadyStateAfter: _, ...record } = medicine;
  return sentencesAsRecorded({ ...rest, medicine: record });
}
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

  describe("where the record waits longer than 90 % of steady state takes", () => {
    it("waits as long as the record, and says so with its source", () => {
      // Theophylline's record: 3 days; 90 % of the way takes 22.5 h. The option begins on Wednesday 4 March at 20:00.
      const found = sentencesAsRecorded(summaryCase());
      expect(found[0]).toBe(
        "Saturday 7 March 2026, between 19:30 and 20:00, before the 20:00 dose: the first dose at or after the end of the record's wait (Sat 7 March, 20:00).",
      );
      expect(found[1]).toMatch(
        /^The record waits 72 hours \(source \(\d+\) \w+\), longer than 90 % of steady state: 22\.5 hours\.$/,
      );
      const sources = buildSummary(summaryInputOf(summaryCase())).details.sources;
      const number = Number(/source \((\d+)\)/.exec(found[1]!)![1]);
      const { medicine } = summaryCase();
      expect(sources[number - 1]).toContain(medicine.sources[medicine.steadyStateAfter!.source]!.title);
    });

    it("a wait too long to keep is said to be", () => {
      const { medicine } = summaryCase();
      const long = { ...medicine, steadyStateAfter: { ...medicine.steadyStateAfter!, value: 90, unit: "d" as const } };
      expect(sentencesAsRecorded(summaryCase({ medicine: long }))[0]).toMatch(
        /^The record waits 90 days after a regimen begins or changes: too long to wait for it\./,
      );
    });
  });

  /** The case as it is when the option has been given and a level drawn at an instant. */
  function drawnAt(value: Case, atMs: number): Case {
    const at = new Date(atMs).toISOString().replace(".000Z", "+00:00");
    const now = new Date(atMs + MS_PER_HOUR).toISOString().replace(".000Z", "+00:00");
    const measured = { value: 10, unit: "mg/L" as const };
    const [option] = value.options;
    const begins = Math.min(...option!.lines.map(({ start }) => instantMs(start)));
    const before = value.given.map((line) => ({
      ...line,
      repeat: {
        every: { value: 12, unit: "h" as const },
        count: Math.ceil((begins - instantMs(line.start)) / (12 * MS_PER_HOUR)),
      },
    }));
    return {
      ...value,
      now,
      given: [...before, ...option!.lines],
      options: [],
      levels: [{ id: "next", at, quantity: measured, kind: "measured" }],
    };
  }
  const unsteady = (value: Case) => derive(value).concerns.filter(({ code }) => code === "level-not-steady");
  /** When the sheet's sentence lets the sample be drawn at the earliest. */
  function earliest(value: Case): number {
    const [, day, month, from] = /^\w+day (\d+) (\w+) 2026, between (\d\d:\d\d) and /.exec(
      sentencesAsRecorded(value)[0]!,
    )!;
    return Date.parse(`${day} ${month} 2026 ${from} UTC`);
  }
  const morningAndEvening = [
    orderedLine({
      id: "m",
      start: "2026-03-05T08:00:00+00:00",
      amount: { value: 200, unit: "mg" },
      repeat: { clock: ["08:00"] },
    }),
    orderedLine({ id: "e", start: "2026-03-04T22:00:00+00:00", repeat: { clock: ["22:00"] } }),
  ];

  it.each([
    ["every 12 hours", summaryCase()],
    ["two lines that begin together in the evening", caseOrdering(morningAndEvening)],
    [
      "a record without a wait",
      (({ steadyStateAfter: _, ...record }) => summaryCase({ medicine: record }))(summaryCase().medicine),
    ],
    ["nothing given before", summaryCase({ given: [] })],
  ])("a level drawn as the sheet says is not called unsteady later: %s", (_, value) => {
    const atMs = earliest(value);
    expect(unsteady(drawnAt(value, atMs))).toEqual([]);
    // Drawn six hours sooner, it is: the concern looks at this level.
    expect(unsteady(drawnAt(value, atMs - 6 * MS_PER_HOUR))).toHaveLength(1);
  });
});
