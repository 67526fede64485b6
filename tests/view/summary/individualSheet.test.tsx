import { render, screen, within } from "@testing-library/react";
import { beforeAll, describe, expect, it } from "vitest";
import type { IndividualFit, Spread } from "../../../src/core/analysis/index.ts";
import { forbiddenForms } from "../../../src/core/units/index.ts";
import { buildSummary } from "../../../src/view/summary/buildSummary.ts";
import { SummarySheet } from "../../../src/view/summary/SummarySheet.tsx";
import type { SummaryInput } from "../../../src/view/summary/summaryInput.ts";
import type { SummaryModel, SummaryRow } from "../../../src/view/summary/summaryModel.ts";
import { summaryScene } from "../../../src/view/summary/summaryScene.ts";
import { fittedInputOf, summaryCase, typicalAnalysis } from "./summaryFixture.ts";

const plain = <T,>(value: T): T => JSON.parse(JSON.stringify(value).replaceAll("\u00a0", " ")) as T;
const row = (rows: readonly SummaryRow[] | undefined, label: string) =>
  rows?.find((each) => each.label === label)?.value;
const three = (value: number) => String(Number(value.toPrecision(3)));
const printed = ({ q05, q50, q95 }: Spread, unit: string) =>
  `${three(q50)} ${unit} (90 %: ${three(q05)} to ${three(q95)})`;

const value = {
  ...summaryCase(),
  fit: { use: "individual", residualModel: "normal" } as const,
  levels: [
    ...summaryCase().levels,
    {
      id: "l3",
      at: "2026-03-03T09:00:00+00:00",
      quantity: { value: 19, unit: "mg/L" as const },
      kind: "measured" as const,
      excluded: "drawn from the line",
    },
  ],
};

let input: SummaryInput;
let fit: IndividualFit;
let model: SummaryModel;
// One fit for the whole file: it takes seconds on a busy machine.
beforeAll(() => {
  input = fittedInputOf(value);
  if (input.analysis.fit.kind !== "fitted") throw new Error(JSON.stringify(input.analysis.fit));
  fit = input.analysis.fit.fit;
  model = plain(buildSummary(input));
}, 120_000);

const own = () => input.analysis.options[0]!.individual!;
const withFit = (change: Partial<SummaryInput["analysis"]>) =>
  plain(buildSummary({ ...input, analysis: { ...input.analysis, ...change } }));

describe("the sheet of this patient", () => {
  it("has every reading as the median with its 90 % interval", () => {
    const { title, rows } = model.expected!;
    const steady = own().steadyState!;
    expect(title).toBe("Expected at steady state, this patient");
    expect(row(rows, "Highest")).toBe(printed(steady.peak, "mg per L"));
    expect(row(rows, "Lowest")).toBe(printed(steady.lowest, "mg per L"));
    expect(row(rows, "Average")).toBe(printed(steady.average, "mg per L"));
    expect(row(rows, "Accumulation")).toBe(printed(steady.accumulation, "times"));
    expect(steady.peak.q05).toBeLessThan(steady.peak.q50);
    expect(steady.peak.q50).toBeLessThan(steady.peak.q95);
  });

  it("says the chances in words and the hours with intervals", () => {
    const { title, columns, rows, span } = model.hours!;
    expect(title).toBe("Window 8 to 15 mg per L: chance, hours");
    expect(columns).toEqual(["chance when steady", "these days", "hours (90 %)"]);
    expect(rows.map(({ label }) => label)).toEqual(["below", "within", "above"]);
    const chance = own().steadyChance!;
    rows.forEach(({ label, cells }) => {
      const share = chance[label as "below" | "within" | "above"];
      const words = share < 0.01 ? "under 1 %" : share > 0.99 ? "over 99 %" : `${Math.round(share * 100)} %`;
      expect(cells[0]).toBe(words);
      expect(cells[2]).toMatch(/^[\d.]+ \([\d.]+ to [\d.]+\)$/);
    });
    expect(span).toMatch(/^Chances: of the whole curve\. These days: Wed 4 March, 12:00 to /);
  });

  it("names clearance, volume and half-life with intervals, and what the levels taught", () => {
    const { title, rows, sentences } = model.kinetics;
    expect(title).toBe("Kinetic basis, this patient");
    const clearance = fit.parameters.find(({ symbol }) => symbol === "CL")!;
    expect(rows[0]!.value).toBe(printed(clearance.posterior, "L per h"));
    const { q05, q50, q95 } = fit.halfLife!.posterior;
    const tenth = (hours: number) => String(Number(hours.toFixed(1)));
    expect(row(rows, "Half-life")).toBe(`${tenth(q50)} hours (90 %: ${tenth(q05)} to ${tenth(q95)})`);
    expect(sentences[0]).toMatch(/^The levels taught (much|something) about clearance/);
  });

  it("shows each level with prediction, residual and the forecast made before it; one left out hollow, with its reason", () => {
    const { rows, remark, isIndividual } = model.levels;
    expect(isIndividual).toBe(true);
    expect(remark).toMatch(/^2 used to adjust the prediction, 1 left out \(hollow\)/);
    const [first, leftOut] = rows;
    const found = input.analysis.levels.find(({ id }) => id === "l1")!.fit!;
    const { q05, q50, q95 } = found.predicted;
    expect(first!.predicted).toBe(`${three(q50)} mg per L (${three(q05)} to ${three(q95)})`);
    const { predictive, held } = found.forecast!;
    expect(first!.forecast).toBe(
      `${three(predictive.q05)} to ${three(predictive.q95)} mg per L: ${held ? "held" : "did NOT hold"}`,
    );
    const size = String(Number(Math.abs(found.standardised!).toFixed(1)));
    expect(first!.residual).toBe(`${found.standardised! > 0 ? "+" : "−"} ${size}`);
    expect(leftOut).toMatchObject({ remark: "left out: drawn from the line", isLeftOut: true, forecast: "" });
    for (const { measured, predicted, difference } of rows) {
      const shown = Number(difference.replace("−", "-").replace(" ", ""));
      expect(Number.parseFloat(measured) - Number.parseFloat(predicted)).toBeCloseTo(shown, 9);
    }
  });

  it("says how it was found: levels, residuals, method, seed, draws, effective size, Pareto k", () => {
    expect(model.assumes).toEqual(
      expect.arrayContaining([
        "one-compartment model, this patient: adjusted by the levels",
        "levels used: Mon 2 March, 19:30 and Wed 4 March, 07:30; left out: Tue 3 March, 09:00",
        expect.stringMatching(
          /^normal residuals; importance sampling, seed 1, 2,048 draws, effective size [\d,]+, Pareto k −?[\d.]+ \(trusted to 0\.7\)$/,
        ),
        "cross-check: profile and exposure worked out again by plain numerical integration, and agree",
      ]),
    );
    const { individual } = model.details;
    expect(individual!.parameters.rows.map(({ label }) => label)).toEqual([
      ...fit.parameters.map(({ symbol, words }) => (symbol === "CL" ? "Clearance" : symbol === "V" ? "Volume" : words)),
      "Half-life",
    ]);
    expect(individual!.method).toContain("docs/methods/levels-to-this-patient.md");
    expect(individual!.levels).toHaveLength(3);
  });

  it("waits for this patient where the upper end of the interval lies beyond the typical time, and says so", () => {
    const { typical, individual } = input.analysis.options[0]!;
    const steady = typical!.steadyState!;
    const slow = { ...individual!.steadyState!.timeTo90H, q95: steady.timeTo90H + 48 };
    const fast = { ...slow, q95: steady.timeTo90H - 1 };
    const { steadyStateAfter, ...record } = input.case.medicine;
    const waiting = (timeTo90H: Spread, medicine: SummaryInput["case"]["medicine"] = record) => {
      const options = [
        {
          ...input.analysis.options[0]!,
          individual: { ...individual!, steadyState: { ...individual!.steadyState!, timeTo90H } },
        },
      ];
      const change = { case: { ...input.case, medicine }, analysis: { ...input.analysis, options } };
      return plain(buildSummary({ ...input, ...change })).nextLevel.sentences;
    };
    expect(waiting(fast)[0]).toMatch(/^Thursday 5 March 2026/);
    expect(waiting(slow)[0]).toMatch(/^Saturday 7 March 2026/);
    expect(waiting(slow)[1]).toBe(
      "This patient may take longer than the typical one (up to 70.5 hours to 90 % of steady state, the upper end of the 90 % interval; typical 22.5 hours): the longer wait is used."
        .replace("70.5", String(Number((steady.timeTo90H + 48).toFixed(1))))
        .replace("22.5", String(Number(steady.timeTo90H.toFixed(1)))),
    );
    expect(waiting(fast).join(" ")).not.toContain("may take longer");
    expect(waiting({ ...slow, q95: 5000 })[0]).toMatch(/^90 % of steady state may take 208 days in this patient/);
    // The record's 3 days are longer than this patient's 70.5 hours.
    expect(steadyStateAfter).toMatchObject({ value: 3, unit: "d" });
    expect(waiting(slow, input.case.medicine)[1]).toContain(
      "longer than 90 % of steady state: up to 70.5 hours in this patient (90 % interval)".replace(
        "70.5",
        String(Number((steady.timeTo90H + 48).toFixed(1))),
      ),
    );
  });

  describe("where so many draws never settle that no steady-state figure is given", () => {
    const never = (change: object = {}) => {
      const [option] = input.analysis.options;
      const individual = { ...option!.individual!, steadyState: null, shareNeverSteady: 0.17, ...change };
      return withFit({ options: [{ ...option!, individual }] });
    };

    it("gives the share as the reason, not that the option does not repeat; and says how the chance counts them", () => {
      const { expected, hours, nextLevel } = never();
      const reason =
        "In 17 % of what the levels leave possible the level never settles under this dose: no steady-state figures are given.";
      expect(expected!.title).toBe("Expected over the days shown, this patient");
      expect(expected!.remark).toBe(`${reason} Median (90 % interval).`);
      expect(hours!.span).toContain(
        "With a chance of 17 % a steady state is never reached: counted as above in the chance at steady state.",
      );
      expect(nextLevel.sentences[0]).toBe(reason);
      expect(nextLevel.sentences).toContain("Time the next level by the clinical question.");
      expect(nextLevel.sentences.join(" ")).not.toContain("90 %");
    });

    it("an option that does not repeat keeps its own reason", () => {
      const [option] = input.analysis.options;
      const typical = { ...option!.typical!, steadyState: null, noSteadyState: "no-repeat" as const };
      const individual = { ...option!.individual!, steadyState: null, steadyChance: null, shareNeverSteady: 0 };
      const { expected, nextLevel } = withFit({ options: [{ ...option!, typical, individual }] });
      expect(expected!.remark).toMatch(/^The option does not repeat/);
      expect(nextLevel.sentences[0]).toMatch(/^The option does not repeat/);
    });
  });

  it("few draws that never settle: left out of the figures, counted in the chance", () => {
    const [option] = input.analysis.options;
    const found = withFit({
      options: [{ ...option!, individual: { ...option!.individual!, shareNeverSteady: 0.03 } }],
    });
    expect(found.expected!.remark).toContain(
      "With a chance of 3 % a steady state is never reached: left out of the steady-state figures, counted as above in the chance at steady state.",
    );
    expect(found.hours!.span).not.toContain("never reached");
  });

  it("a typical patient who never settles does not speak for this one, who does", () => {
    const [option] = input.analysis.options;
    const typical = { ...option!.typical!, steadyState: null, noSteadyState: "dose-rate-at-or-above-vmax" as const };
    const { expected, nextLevel } = withFit({ options: [{ ...option!, typical }] });
    expect(expected!.title).toBe("Expected at steady state, this patient");
    expect(nextLevel.sentences[0]).toMatch(
      /^The typical patient never settles under this dose; this patient may take up to [\d.]+ (hours|days) to 90 % of steady state/,
    );
  });

  it("names the typical patient where the longest wait is that one's", () => {
    const [option] = input.analysis.options;
    const { typical, individual } = option!;
    const settled = typical!.steadyState!;
    const startH = settled.steady90AtH - settled.timeTo90H;
    const steady = { ...settled, timeTo90H: 807 * 24, steady90AtH: startH + 807 * 24 };
    const own = { ...individual!.steadyState!, timeTo90H: { ...individual!.steadyState!.timeTo90H, q95: 480 } };
    const { nextLevel } = withFit({
      options: [
        { ...option!, typical: { ...typical!, steadyState: steady }, individual: { ...individual!, steadyState: own } },
      ],
    });
    expect(nextLevel.sentences[0]).toBe(
      "90 % of steady state may take 807 days in the typical patient, up to 20 days in this one (upper end of the 90 % interval): too long to wait for it.",
    );
  });

  it("names whose 90 % of steady state the record's wait is held against", () => {
    const [option] = input.analysis.options;
    const { individual } = option!;
    const source = Object.keys(value.medicine.sources)[0]!;
    const steadyStateAfter = { value: 30, unit: "d", source, basis: "seen" } as const;
    const waits = (q95: number) => {
      const timeTo90H = { ...individual!.steadyState!.timeTo90H, q95 };
      const own = { ...individual!, steadyState: { ...individual!.steadyState!, timeTo90H } };
      const found = buildSummary({
        ...input,
        case: { ...value, medicine: { ...value.medicine, steadyStateAfter } },
        analysis: { ...input.analysis, options: [{ ...option!, individual: own }] },
      });
      return plain(found).nextLevel.sentences[1];
    };
    expect(waits(1)).toMatch(/longer than 90 % of steady state: [\d.]+ hours in the typical patient\.$/);
    expect(waits(100)).toMatch(/longer than 90 % of steady state: up to [\d.]+ (hours|days) in this patient/);
  });

  it("says under the chances where the lowest is the level before the option acts", () => {
    const [option] = input.analysis.options;
    const { span } = option!.individual!;
    const under = (lowestBeforeOption: number) =>
      withFit({
        options: [
          {
            ...option!,
            individual: {
              ...option!.individual!,
              span: { ...span, chance: { below: 0.9, within: 0.1, above: 0 }, lowestBeforeOption },
            },
          },
        ],
      }).hours!.span;
    expect(under(0.98)).toContain(
      "In 98 % of what the levels leave possible the lowest of these days comes before the option's first dose acts: the option can't change it.",
    );
    expect(under(0.2)).not.toContain("level now");
  });

  it("draws the median thick, the bands, and the typical patient thin", () => {
    const scene = summaryScene(input, model.chart);
    expect(scene.curves.map(({ id, isThin }) => [id, isThin])).toEqual([
      ["given-typical", true],
      ["given", false],
      ["A-typical", true],
      ["A", false],
    ]);
    expect(scene.bands.map(({ id, isFilled }) => [id, isFilled])).toEqual([
      ["given", true],
      ["A", true],
    ]);
    expect(model.chart.key).toContain("dotted: typical patient");
  });

  it("prints no error-prone form", () => {
    const titles = Object.values(value.medicine.sources).map(({ authors, title, year, place }) =>
      [authors, title, year, place].filter((part) => part !== undefined).join(", "),
    );
    const own = leaves(model)
      .map((text) => titles.reduce((rest, title) => rest.replaceAll(title, ""), text))
      .filter((text) => !/^[0-9a-f ]{19,}$/.test(text));
    expect(own.flatMap((text) => forbiddenForms(text).map(({ rule, found }) => [rule, found, text]))).toEqual([]);
  });

  it("leaves no string of the model unprinted", () => {
    const { container } = render(<SummarySheet model={model} chart={<svg role="img" aria-label="profile" />} />);
    const text = (container.textContent ?? "").replace(/\s+/g, " ");
    const { chart, pageSize: _, running: _margin, marks: _none, ...body } = model;
    const missing = [...leaves(body), chart.key].filter((each) => !text.includes(each.replace(/\s+/g, " ")));
    expect(missing).toEqual([]);
    const levels = within(screen.getByRole("region", { name: "Levels" }));
    expect(levels.getAllByRole("row")).toHaveLength(4);
  });
});

describe("the sheet of the typical patient says why", () => {
  it.each([
    ["no levels", { kind: "none", reason: "no-levels" }, "No level has been entered."],
    ["all left out", { kind: "none", reason: "all-left-out" }, "Every level is left out."],
    ["withheld", { kind: "withheld", reason: "not-converged", data: {} }, "did not come to rest"],
  ] as const)("%s", (_, state, reason) => {
    const typical = { ...typicalAnalysis(value), fit: state };
    const found = plain(buildSummary({ ...input, analysis: typical }));
    expect(found.expected!.title).toBe("Expected at steady state, typical patient");
    expect(found.expected!.remark).toMatch(/^For the typical patient: no interval and no chance/);
    expect(found.expected!.remark).toContain(reason);
    expect(found.levels.isIndividual).toBe(false);
    expect(found.details.individual).toBeNull();
    expect(summaryScene({ ...input, analysis: typical }, found.chart).bands).toEqual([]);
  });

  it("set to order by the typical patient's figures although there is a fit", () => {
    const asked = { ...input, case: { ...value, fit: { ...value.fit, use: "typical" as const } } };
    const found = plain(buildSummary(asked));
    expect(found.expected!.remark).toContain(
      "2 levels adjust this patient's curve, but the case is set to order by the typical patient's figures.",
    );
    expect(found.kinetics.title).toBe("Kinetic basis, typical patient");
    expect(found.chart.key).toBe("");
    const scene = summaryScene(asked, found.chart);
    expect(scene.bands).toEqual([]);
    expect(scene.levels.every(({ forecast }) => forecast === null)).toBe(true);
  });

  it("puts a level that no patient could have had across the sheet", () => {
    const state = { kind: "withheld", reason: "level-not-explained", data: {} } as const;
    const stop = {
      id: "fit-withheld",
      code: "fit-withheld",
      gravity: "stop" as const,
      about: { kind: "case" as const },
      data: { reason: "level-not-explained", data: {} },
    };
    const found = withFit({ fit: state, concerns: [stop] });
    expect(found.banners[0]).toMatchObject({ gravity: "stop", title: "This patient's figures are withheld" });
    expect(found.marks).toBe("This patient's figures are withheld");
  });
});

function leaves(found: unknown): readonly string[] {
  if (typeof found === "string") return ["stop", "check", "note"].includes(found) ? [] : [found];
  if (Array.isArray(found)) return found.flatMap(leaves);
  return found !== null && typeof found === "object" ? Object.values(found).flatMap(leaves) : [];
}
