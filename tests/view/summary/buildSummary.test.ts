// @vitest-environment node
import { describe, expect, it } from "vitest";
import type { Case } from "../../../src/core/case/index.ts";
import { buildSummary, fingerprintGroups } from "../../../src/view/summary/buildSummary.ts";
import { formulaPrint } from "../../../src/view/summary/figuresText.ts";
import type { SummaryInput } from "../../../src/view/summary/summaryInput.ts";
import type { SummaryModel, SummaryRow } from "../../../src/view/summary/summaryModel.ts";
import { orderedLine } from "../../core/case/orderedLine.ts";
import { caseOrdering, summaryCase, summaryInputOf } from "./summaryFixture.ts";

const plain = <T>(value: T): T => JSON.parse(JSON.stringify(value).replaceAll("\u00a0", " ")) as T;
const summary = (change: Partial<Case> = {}, input: Partial<SummaryInput> = {}): SummaryModel =>
  plain(buildSummary(summaryInputOf(summaryCase(change), input)));
const row = (rows: readonly SummaryRow[] | undefined, label: string) =>
  rows?.find((each) => each.label === label)?.value;

describe("who and when", () => {
  it("names the case, the patient, the instant in the case's zone and when it was saved", () => {
    const model = summary();
    expect(model.label).toBe("Harbour ward 3, bed 12");
    expect(model.person).toBe("woman, 64 years, 58 kg, 162 cm");
    expect(model.printed).toBe("printed Wednesday 4 March 2026, 12:05");
    expect(model.saved).toBe("saved Wed 4 March 2026 12:03");
    expect(summary({ timeZone: "America/New_York" }).saved).toBe("saved Wed 4 March 2026 07:03");
    expect(summary({ timeZone: "America/New_York" }).printed).toBe("printed Wednesday 4 March 2026, 07:05");
  });

  it("prints what is not recorded as not recorded", () => {
    const model = summary({
      patient: { observations: [], factors: [] },
      window: undefined,
      levels: [],
      given: [],
      label: "",
    } as unknown as Partial<Case>);
    expect(model.person).toBe("sex not recorded, age not recorded, weight not recorded, height not recorded");
    expect(model.label).toBe("case without a label");
    expect(model.assumes).toContain("kidney function not recorded");
    expect(model.levels.remark).toBe("No level is recorded.");
    expect(model.expected).toBeNull();
    expect(model.kinetics.sentences).toEqual([
      "No prediction: something the model needs is missing. See the concerns.",
    ]);
    expect(model.order?.sentences).toContain("No dose is recorded as given before.");
    for (const label of [
      "Target",
      "Regimen before",
      "Kidney function",
      "Albumin",
      "Smoking",
      "Other medicines",
      "Adherence",
    ]) {
      expect([label, row(model.details.elements, label)]).toEqual([label, "not recorded"]);
    }
  });

  it("has a line for every element a note should contain, none of them blank", () => {
    const { elements } = summary().details;
    expect(elements.map(({ label }) => label)).toEqual([
      "Purpose, requester",
      "Specimen, assay",
      "Regimen before",
      "Duration of therapy",
      "Salt or base, brand",
      "Steady at the levels",
      "Kidney function",
      "Liver function",
      "Albumin",
      "Haematocrit",
      "Pregnancy, genotype",
      "Smoking",
      "Other medicines",
      "Food, vomiting, other",
      "Adherence",
      "Response, toxicity",
      "Target",
      "Interpretation",
      "Exposure before",
      "Who acts on the level",
      "Told to, read back",
      "Patient told",
    ]);
    for (const { label, value } of elements) expect([label, value.trim()]).not.toEqual([label, ""]);
    expect(row(elements, "Purpose, requester")).toBe("not recorded");
    expect(row(elements, "Other medicines")).toBe("clarithromycin, from Tue 3 March, 08:00");
    expect(row(elements, "Adherence")).toBe("1 of 7 doses missed; how known not recorded");
    expect(row(elements, "Target")).toBe("lowest and highest, 8 to 15 mg per L; basis: invented ward window");
  });

  it("marks a demonstration on the sheet and in every margin, and nothing else", () => {
    expect(summary({ demo: true }).watermark).toBe("demo — invented patient");
    expect(summary({ demo: true }).running).toContain("demo — invented patient");
    expect(summary().watermark).toBeNull();
    expect(JSON.stringify(summary())).not.toContain("demo");
  });

  it("says that a read-only tab printed it", () => {
    const savedAt = Date.UTC(2026, 2, 4, 12, 3);
    expect(summary({}, { saving: { status: "read-only", savedAt, detail: "" }, hasChanges: false }).saved).toBe(
      "saved Wed 4 March 2026 12:03, read-only copy",
    );
  });

  it("says nothing of a saving of an earlier state, and nothing that begins anew when the case is opened again", () => {
    const saving = { status: "saving" as const, savedAt: Date.UTC(2026, 2, 4, 12, 3), detail: "" };
    expect(summary({}, { saving }).saved).toBe("case not saved as shown");
    const analysisStatus = { status: "fresh" as const, revision: 1, failure: null, isFitStale: false };
    expect(summary({}, { revision: 1, analysisStatus })).toEqual(summary());
  });
});

describe("across the sheet", () => {
  it("says when the record is not reviewed, and not when it is", () => {
    expect(summary().banners.map(({ gravity, title }) => [gravity, title])).toEqual([["check", "Unchecked"]]);
    const { medicine } = summaryCase();
    const reviewed = { ...medicine, review: { status: "reviewed" as const, by: "A. Reviewer", on: "2026-01-05" } };
    const model = summary({ medicine: reviewed });
    expect(model.banners).toEqual([]);
    expect(model.assumes.some((text) => text.includes("reviewed by A. Reviewer, 2026-01-05"))).toBe(true);
  });

  it("prints concerns of gravity stop as bands, of the chosen option only", () => {
    const input = summaryInputOf(summaryCase());
    const toxic = (option: string) => ({
      id: `option-toxic:${option}`,
      code: "option-toxic",
      gravity: "stop" as const,
      about: { kind: "option" as const, id: option },
      data: { option, peak: 31.2, from: 25.1, source: "invented" },
    });
    const with_ = (option: string) =>
      buildSummary({
        ...input,
        analysis: { ...input.analysis, concerns: [...input.analysis.concerns, toxic(option)] },
      });
    expect(with_("A").banners[0]?.title).toBe("Option A reaches the toxic limit");
    // A full stop behind a unit could be read as a digit.
    expect(JSON.stringify(with_("A").details.concerns)).not.toMatch(/per\s(L|h|kg)\./);
    expect(with_("A").marks).toBe("Option A reaches the toxic limit");
    expect(with_("B").banners.map(({ title }) => title)).toEqual(["Unchecked"]);
    expect(with_("B").details.concerns.some(({ title }) => title === "Option B reaches the toxic limit")).toBe(true);
  });

  it("says why the sheet is not for use when its figures are stale", () => {
    const model = summary({}, { revision: 15 });
    expect(model.banners[0]).toEqual({
      gravity: "stop",
      title: "Not for use",
      text: "The figures belong to an earlier state of the case. Print when they are worked out again.",
    });
    expect(model.marks).toBe("Not for use");
  });
});

describe("readings", () => {
  it("are those of the analysis, to three digits", () => {
    const input = summaryInputOf(summaryCase());
    const steady = input.analysis.options[0]!.typical!.steadyState!;
    const { expected } = plain(buildSummary(input));
    expect(expected?.title).toBe("Expected at steady state, typical patient");
    expect(row(expected?.rows, "Average")).toBe(`${Number(steady.average.toPrecision(3))} mg per L`);
    expect(row(expected?.rows, "Lowest, just before a dose")).toBe(`${Number(steady.lowest.toPrecision(3))} mg per L`);
    expect(row(expected?.rows, "AUC in 24 hours")).toBe(`${Math.round(steady.auc24)} mg hours per L`);
    expect(expected?.rows[0]?.label).toBe(`Highest, ${Number(steady.peakAfterDoseH.toFixed(1))} hours after a dose`);
  });

  it("are over the stated days when there is no steady state", () => {
    const { repeat: _, ...single } = orderedLine();
    const { expected } = plain(buildSummary(summaryInputOf(caseOrdering([single]))));
    expect(expected?.title).toBe("Expected over the days shown, typical patient");
    expect(expected?.remark).toContain("The option does not repeat, so it has no steady state.");
    expect(expected?.rows.map(({ label }) => label)[0]).toMatch(/^Highest, Thu 5 March, \d\d:\d\d$/);
  });

  it("give hours below, within and above the window that add up to the span", () => {
    const input = summaryInputOf(summaryCase());
    const model = plain(buildSummary(input));
    expect(model.hours?.title).toBe("Hours in the window of 8 to 15 mg per L");
    const { fromH, toH } = input.analysis.options[0]!.typical!.span;
    const sum = model.hours!.rows.reduce((total, { cells }) => total + Number.parseFloat(cells[0]!), 0);
    // Each is rounded to 0.1 h.
    expect(Math.abs(sum - (toH - fromH))).toBeLessThanOrEqual(0.15);
    expect(summary({ window: undefined } as unknown as Partial<Case>).hours).toBeNull();
  });

  it("say which half-life the model takes for which process with a modified-release product, and are silent without one", () => {
    expect(summary().kinetics.sentences[0]).toMatch(
      /^Half-life taken as 6\.8 hours for elimination and 2\.9 hours for absorption from the 12-hour modified-release tablet;/,
    );
    const immediate = caseOrdering([orderedLine({ product: "tablet", amount: { value: 250, unit: "mg" } })], {
      given: [],
    });
    expect(buildSummary(summaryInputOf(immediate)).kinetics.sentences).toEqual([]);
  });
});

describe("levels", () => {
  it("stand with hours after the dose, predicted value and a difference that adds up as printed", () => {
    const { rows, remark } = summary().levels;
    expect(remark).toBe("Compared with the prediction, not used to adjust it.");
    expect(rows.map(({ drawn, afterDose, measured }) => [drawn, afterDose, measured])).toEqual([
      ["Mon 2 March, 19:30", "11.5 h", "6.5 mg per L"],
      ["Wed 4 March, 07:30", "11.5 h", "5.2 mg per L"],
    ]);
    for (const { measured, predicted, difference } of rows) {
      const shown = Number(difference.replace("−", "-").replace(" ", ""));
      expect(Number.parseFloat(measured) - Number.parseFloat(predicted)).toBeCloseTo(shown, 9);
    }
  });

  it("keep the unit they were reported in, say what was left out and why, and never print a limit as a value", () => {
    const { rows } = summary({
      levels: [
        { id: "a", at: "2026-03-02T19:30:00+00:00", quantity: { value: 36, unit: "umol/L" }, kind: "measured" },
        { id: "b", at: "2026-03-03T19:30:00+00:00", quantity: { value: 2, unit: "mg/L" }, kind: "below-limit" },
        {
          id: "c",
          at: "2026-03-04T07:30:00+00:00",
          quantity: { value: 5.2, unit: "mg/L" },
          kind: "measured",
          excluded: "drawn from the line",
        },
      ],
    }).levels;
    expect(rows[0]?.measured).toBe("36 micromol per L (6.49 mg per L)");
    expect(rows[1]?.measured).toBe("below the limit of 2 mg per L");
    expect(rows[1]?.difference).toBe("");
    expect(rows[2]?.remark).toBe("left out: drawn from the line");
  });
});

describe("units", () => {
  it("lithium stands in mmol per L, exposure too; the window as it was stated", () => {
    const line = orderedLine({ product: "capsule", amount: { value: 300, unit: "mg" } });
    const window = {
      quantity: "trough" as const,
      low: { value: 0.6, unit: "mmol/L" as const },
      high: { value: 1, unit: "mmol/L" as const },
      basis: "invented",
    };
    const at = "2026-03-03T19:30:00+00:00";
    const levels = [
      { id: "a", at, quantity: { value: 0.8, unit: "mmol/L" as const }, kind: "measured" as const },
      { id: "b", at, quantity: { value: 5, unit: "mg/L" as const }, kind: "measured" as const },
    ];
    const input = summaryInputOf(
      caseOrdering([line], { window, levels, given: [{ ...line, id: "g", start: at }] }, "lithium"),
    );
    const { expected, hours, levels: shown, chart } = plain(buildSummary(input));
    const steady = input.analysis.options[0]!.typical!.steadyState!;
    // 6.94 g per mol: mg per L over it is mmol per L.
    expect(row(expected?.rows, "Average")).toBe(`${Number((steady.average / 6.94).toPrecision(3))} mmol per L`);
    expect(row(expected?.rows, "AUC in 24 hours")).toBe(
      `${Number((steady.auc24 / 6.94).toPrecision(3))} mmol hours per L`,
    );
    expect(hours?.title).toBe("Hours in the window of 0.6 to 1 mmol per L");
    expect(shown.rows.map(({ measured }) => measured)).toEqual(["0.8 mmol per L", "5 mg per L (0.72 mmol per L)"]);
    expect(chart.unit).toBe("mmol per L");
  });

  it("formulas are read out on paper", () => {
    expect(formulaPrint("(0.0134 L/h/kg * weight) * (age >= 70 a ? 0.749 : 1)")).toBe(
      "(0.0134 L ÷ h ÷ kg × weight) × (age at least 70 a, then 0.749, else 1)",
    );
    expect(formulaPrint("1633 L")).toBe("1,633 L");
    expect(formulaPrint("0.12345 * x1000")).toBe("0.12345 × x1000");
  });
});

describe("assumptions", () => {
  it("name missed and late doses, kidney function with formula and weight, the now line and the zone", () => {
    const given = summaryCase().given.map((line) => ({
      ...line,
      except: [
        { index: 3, status: "missed" as const },
        { index: 4, status: "late" as const, at: "2026-03-03T10:00:00+00:00" },
      ],
    }));
    const { assumes } = summary({ given });
    expect(assumes).toEqual([
      "one-compartment model, typical patient: levels are compared and not used to adjust",
      "cross-check by numerical integration not made",
      expect.stringMatching(
        /^record “theophylline” version \d+, not independently reviewed; \d+ of \d+ figures unverified$/,
      ),
      "the record's figures were pieced together from different studies, never estimated together",
      "6 doses taken as listed; missed: Mon 2 March, 20:00; late or moved: Tue 3 March, 08:00 taken Tue 3 March, 10:00",
      "kidney function 51.8 mL per min (Cockcroft–Gault, ideal weight)",
      "doses up to the now line (Wednesday 4 March 2026, 12:00) as given, from it on as proposed; clock times of Europe/Lisbon",
    ]);
  });
});

describe("sources", () => {
  it("are numbered, and every number that is cited is listed", () => {
    const model = summary();
    const cited = [
      ...model.nextLevel.sentences,
      ...model.cautions,
      ...model.details.figures.map(({ source }) => source),
    ].flatMap((text) => [...text.matchAll(/\((\d+)\)/g)].map((match) => Number(match[1])));
    expect(Math.max(...cited)).toBe(model.details.sources.length);
    expect(new Set(cited).size).toBe(model.details.sources.length);
  });

  it("mark a caution nobody has read in its source", () => {
    const { medicine } = summaryCase();
    const model = summary();
    medicine.cautions.forEach(({ basis }, index) => {
      expect(model.cautions[index]!.includes(" *")).toBe(basis !== "seen");
    });
    expect(model.cautions).toHaveLength(medicine.cautions.length);
  });

  it("print the fingerprint in groups of four, whole in the details", () => {
    const model = summary();
    expect(model.footer).toMatch(
      /^Ebbline 0\.1\.0 · record “theophylline” version \d+ · fingerprint [0-9a-f]{4} [0-9a-f]{4} [0-9a-f]{4}$/,
    );
    expect(model.details.fingerprint.replaceAll(" ", "")).toBe(summaryInputOf(summaryCase()).analysis.fingerprint);
    expect(fingerprintGroups("0123456789")).toBe("0123 4567 89");
  });
});
