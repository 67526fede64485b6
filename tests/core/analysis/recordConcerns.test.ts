import { describe, expect, it } from "vitest";
import { eventInteractions } from "../../../src/core/analysis/eventInteractions.ts";
import { derive } from "../../../src/core/analysis/index.ts";
import type { Case, Factor } from "../../../src/core/case/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";
import { concernMessage } from "../../../src/core/messages/index.ts";
import { RECORD_CONCERN_CODES } from "../../../src/core/messages/recordConcernMessages.ts";
import { forbiddenForms } from "../../../src/core/units/index.ts";
import {
  clearanceOf,
  event,
  figure,
  found,
  interactions,
  kineticsFromMemory,
  known,
  level,
  optionOf,
  otherProduct,
  plain,
  quiet,
  TROUGH,
  tablet12h,
  trough,
  troughOf,
  troughWindow,
  value,
  withLevel,
} from "./recordConcernCases.ts";

/** For every concern: a case that raises it, and one as like it as can be that does not. */
const TABLE: readonly (readonly [code: string, raises: Case, doesNot: Case])[] = [
  [
    "outside-population",
    value({ population: { ...quiet.population, ranges: [{ covariate: "weight", low: 60, unit: "kg", ...known }] } }),
    value({ population: { ...quiet.population, ranges: [{ covariate: "weight", low: 58, unit: "kg", ...known }] } }),
  ],
  [
    "formula-step",
    // The patient weighs 58 kg.
    value(clearanceOf("weight >= 60 kg ? 3 L/h : 2 L/h")),
    value(clearanceOf("weight >= 61 kg ? 3 L/h : 2 L/h")),
  ],
  [
    "dose-above-single",
    value({ limits: { maximumSingleDose: figure(250, "mg") } }),
    value({ limits: { maximumSingleDose: figure(300, "mg") } }),
  ],
  [
    "dose-above-daily",
    value({ limits: { maximumDailyDose: figure(590, "mg") } }),
    value({ limits: { maximumDailyDose: figure(600, "mg") } }),
  ],
  [
    "product-switch",
    value(otherProduct({ saltFactor: figure(0.8, "1"), salt: "aminophylline" }), { options: optionOf("other", 200) }),
    value(otherProduct({ saltFactor: figure(0.8, "1"), salt: "aminophylline" }), { options: optionOf("other", 300) }),
  ],
  [
    "salt-switch",
    value(otherProduct({ saltFactor: figure(0.8, "1"), salt: "aminophylline" }), { options: optionOf("other", 300) }),
    // Another salt by name of the same active part in one mg.
    value(otherProduct({ saltFactor: figure(1, "1"), salt: "monohydrate" }), { options: optionOf("other", 300) }),
  ],
  [
    "level-unit-doubtful",
    value({}, { levels: [level(TROUGH, { quantity: { value: 55, unit: "mg/L" } })] }),
    value({}, { levels: [level(TROUGH, { quantity: { value: 55, unit: "mg/L" }, confirmed: true })] }),
  ],
  [
    "level-toxic",
    withLevel({ toxicFrom: figure(6, "mg/L"), toxicAt: "trough" }),
    // Seven hours after the dose and five before the next: no trough.
    withLevel({ toxicFrom: figure(6, "mg/L"), toxicAt: "trough" }, "2026-03-04T03:00:00+00:00"),
  ],
  ["level-too-early", withLevel({ earliestSample: figure(12, "h") }), withLevel({ earliestSample: figure(11, "h") })],
  [
    "level-not-steady",
    withLevel({ steadyStateAfter: figure(4, "d") }),
    // The level is drawn 71.5 h after the first dose, and 90 % of the way takes less for the typical patient.
    withLevel({ steadyStateAfter: figure(71, "h") }),
  ],
  [
    "autoinduction-unsettled",
    value({ autoinduction: { text: "Clearance rises.", ...known, settledAfter: figure(28, "d") } }),
    value({ autoinduction: { text: "Clearance rises.", ...known, settledAfter: figure(3, "d") } }),
  ],
  [
    "interaction-not-applied",
    value({ interactions }, event("Sodium valproate 500 mg twice daily")),
    value({ interactions }, event("Levetiracetam 500 mg twice daily")),
  ],
  [
    "interaction-own-figure",
    value({ interactions }, event("valproate", { effect: { clearance: 0.6 } })),
    value({ interactions }, event("valproate", { effect: { clearance: 0.49, source: "from the record: invented" } })),
  ],
  [
    "interaction-applied",
    value({ interactions }, event("valproate", { effect: { clearance: 0.49, source: "from the record: invented" } })),
    value({ interactions }, event("valproate", { effect: { clearance: 0.49 } })),
  ],
  [
    "level-off-window-time",
    withLevel({ windows: [{ ...trough, drawFrom: figure(4, "h"), drawTo: figure(8, "h") }] }, TROUGH, {
      window: troughWindow!,
    }),
    withLevel({ windows: [{ ...trough, drawFrom: figure(10, "h"), drawTo: figure(12, "h") }] }, TROUGH, {
      window: troughWindow!,
    }),
  ],
  [
    "level-not-trough",
    withLevel({}, "2026-03-04T03:00:00+00:00", { window: troughWindow! }),
    withLevel({}, TROUGH, { window: troughWindow! }),
  ],
  [
    "level-above-window",
    withLevel({}, TROUGH, { window: troughOf(1, 4) }),
    withLevel({}, "2026-03-04T03:00:00+00:00", { window: troughOf(1, 4) }),
  ],
  [
    "level-below-window",
    withLevel({}, TROUGH, { window: troughOf(20, 30) }),
    withLevel({}, TROUGH, { window: troughOf(1, 30) }),
  ],
  ["figures-from-memory", value(kineticsFromMemory()), value(quiet)],
  [
    "figures-pieced-together",
    value({ estimates: { from: "pieced-together", text: "Clearance and volume from two studies.", ...known } }),
    value(),
  ],
  [
    "linear-approximation",
    value({ cautions: [{ text: "Linear near 200 mg.", category: "linear-approximation", ...known }] }),
    value({ cautions: [{ text: "Take with food.", category: "food", ...known }] }),
  ],
];

describe("concerns from the record", () => {
  it.each(TABLE)("%s is raised where it should be and not where it should not", (code, raises, doesNot) => {
    expect(found(raises, code)).not.toEqual([]);
    expect(found(doesNot, code)).toEqual([]);
  });

  it("the table has every one there is a sentence for", () => {
    expect(TABLE.map(([code]) => code).sort()).toEqual([...RECORD_CONCERN_CODES].sort());
  });

  it.each(TABLE)("%s reads as whole sentences, fit to be printed, with nothing left open", (code, raises) => {
    for (const one of found(raises, code)) {
      const { title, text } = concernMessage(one);
      for (const words of [title, text]) {
        expect(words).not.toMatch(/undefined|NaN|null|\[object/);
        expect(forbiddenForms(words)).toEqual([]);
      }
      expect(text).toMatch(/[.?]$/);
    }
  });

  it("a child among adults must not be relied on; which covariate, its value, the range and the source are named", () => {
    const [one] = found(
      value({}, { patient: { ...plain.patient, age: { value: 14, unit: "a" } } }),
      "outside-population",
    );
    expect(one).toMatchObject({ gravity: "stop", data: { covariate: "age", value: 14, low: 18, high: 90 } });
    expect(concernMessage(one!).text.replaceAll("\u00a0", " ")).toBe(
      "14 years; the patients studied had 18 to 90 years: Adults (Invented for tests). The prediction may not hold.",
    );
  });

  it("what is not known of the patient lies outside nothing", () => {
    const ranges = [{ covariate: "albumin" as const, low: 30, unit: "g/L" as const, ...known }];
    expect(found(value({ population: { ...quiet.population, ranges } }), "outside-population")).toEqual([]);
  });

  it("a range in another unit of the covariate is compared in it", () => {
    const ranges = [{ covariate: "creatinineClearance" as const, low: 3.6, unit: "L/h" as const, ...known }];
    // 51.7 mL/min is 3.10 L/h.
    expect(found(value({ population: { ...quiet.population, ranges } }), "outside-population")).toHaveLength(1);
  });

  it("doses given above the maximum are a note, doses of an option are to be checked", () => {
    const limits = { maximumSingleDose: figure(150, "mg") };
    expect(found(value({ limits }), "dose-above-single").map((each) => [each.about.kind, each.gravity])).toEqual([
      ["option", "check"],
      ["given", "note"],
    ]);
  });

  it("days long before the span shown are days of their own", () => {
    const long = value({ limits: { maximumDailyDose: figure(400, "mg") } });
    const given: Case["given"] = [
      {
        ...long.given[0]!,
        start: "2026-01-01T08:00:00+00:00",
        repeat: { every: { value: 12, unit: "h" }, count: 120 },
      },
    ];
    // 400 mg a day for two months, the first weeks of them not shown.
    const shown = { ...long, given, options: [] };
    expect(found(shown, "dose-above-daily")).toEqual([]);
    const over = value({ limits: { maximumDailyDose: figure(390, "mg") } });
    expect(found({ ...over, given, options: [] }, "dose-above-daily")).toMatchObject([{ data: { mg: 400 } }]);
  });

  it("on the day of the change the dose given that morning counts towards the day", () => {
    // 200 mg given at 08:00 and 300 mg proposed at 20:00; the days after have 600 mg.
    const once = value({ limits: { maximumDailyDose: figure(499, "mg") } });
    const lines = [{ ...once.options[0]!.lines[0]!, repeat: undefined }].map(({ repeat: _, ...line }) => line);
    const change = { ...once, options: [{ ...once.options[0]!, lines }] };
    expect(found(change, "dose-above-daily")).toMatchObject([{ about: { kind: "option" }, data: { mg: 500 } }]);
  });

  it("a salt counts as labelled, not as what is active", () => {
    const record = otherProduct({ saltFactor: figure(0.8, "1") });
    const limits = (mg: number) => ({ ...record, limits: { maximumSingleDose: figure(mg, "mg") } });
    expect(found(value(limits(299), { options: optionOf("other", 300) }), "dose-above-single")).toHaveLength(1);
    expect(found(value(limits(300), { options: optionOf("other", 300) }), "dose-above-single")).toEqual([]);
  });

  it("another release form or bioavailability mg for mg is pointed out, the same product in other strengths is not", () => {
    const release = value(otherProduct({ release: "immediate" }), { options: optionOf("other", 200) });
    expect(found(release, "product-switch")).toMatchObject([{ data: { differs: ["release"], ratio: 1 } }]);
    const weaker = value(otherProduct({ bioavailability: figure(0.48, "1") }), { options: optionOf("other", 200) });
    expect(found(weaker, "product-switch")).toMatchObject([{ data: { differs: ["bioavailability"] } }]);
    expect(found(value(otherProduct({}), { options: optionOf("other", 200) }), "product-switch")).toEqual([]);
    expect(found(value({}, { options: optionOf("tablet-12h", 200) }), "product-switch")).toEqual([]);
  });

  it("another salt in another amount: what is active before and after; of the same product only the amount changes", () => {
    const salt = value(otherProduct({ saltFactor: figure(0.8, "1"), salt: "aminophylline" }), {
      options: optionOf("other", 300),
    });
    // 400 mg a day of the moiety before, 600 mg of the salt after: 480 mg active.
    const [said] = found(salt, "salt-switch").map(concernMessage);
    expect(said!.text.replaceAll("\u00a0", " ")).toContain(
      "one is labelled as the active moiety, the other as the aminophylline salt. Labelled 400 mg on the last day given and 600 mg on the option's first; active 400 mg and 480 mg, that is 120 % of before.",
    );
    expect(found(value({}, { options: optionOf("tablet-12h", 300) }), "salt-switch")).toEqual([]);
    expect(
      found(value(otherProduct({ release: "immediate" }), { options: optionOf("other", 300) }), "salt-switch"),
    ).toEqual([]);
  });

  it("a regimen that goes on under another line has not begun anew; another amount has", () => {
    const [line] = plain.given;
    const first = { ...line!, repeat: { every: { value: 12, unit: "h" as const }, count: 4 } };
    const next = { ...first, id: "h", start: "2026-03-03T08:00:00+00:00", repeat: { ...first.repeat, count: 3 } };
    const record = { steadyStateAfter: figure(48, "h") };
    const given = (amount: number): Case["given"] => [first, { ...next, amount: { value: amount, unit: "mg" } }];
    expect(found(withLevel(record, TROUGH, { given: given(200) }), "level-not-steady")).toEqual([]);
    expect(found(withLevel(record, TROUGH, { given: given(300) }), "level-not-steady")).toMatchObject([
      { data: { sinceH: 23.5, recordH: 48 } },
    ]);
  });

  it("what the record's earliest time says is not said twice", () => {
    const early = withLevel({ earliestSample: figure(6, "h") }, "2026-03-04T09:00:00+00:00");
    const codes = derive(early).concerns.map((each) => each.code);
    expect(codes).toContain("level-too-early");
    expect(codes).not.toContain("level-while-distributing");
    expect(codes).not.toContain("level-while-absorbing");
  });

  it("lithium is spoken of in mmol/L", () => {
    const medicine = recordById("lithium")!;
    const given = plain.given.map((line) => ({ ...line, product: medicine.products[0]!.id }));
    const lithium = (mmolPerL: number) =>
      value(
        {},
        { medicine, given, options: [], levels: [level(TROUGH, { quantity: { value: mmolPerL, unit: "mmol/L" } })] },
      );
    const [one] = derive(lithium(40)).concerns.filter((each) => each.code === "level-out-of-range");
    expect(concernMessage(one!).text).toContain(
      "40 mmol per L; the record's windows lie between 0.4 mmol per L and 1.2 mmol per L",
    );
    expect(derive(lithium(0.8)).concerns.map((each) => each.code)).not.toContain("level-out-of-range");
    expect(derive(lithium(0.8)).concerns.map((each) => each.code)).not.toContain("level-unit-doubtful");
  });

  it("the times a case's own window is for go before the record's", () => {
    const timed = {
      ...troughWindow!,
      drawFrom: { value: 12, unit: "h" as const },
      drawTo: { value: 13, unit: "h" as const },
    };
    const windows = [{ ...trough, drawFrom: figure(10, "h"), drawTo: figure(12, "h") }];
    expect(found(withLevel({ windows }, TROUGH, { window: timed }), "level-off-window-time")).toMatchObject([
      { data: { fromH: 12, toH: 13, afterDoseH: 11.5 } },
    ]);
  });

  it("a step of a formula is told with both sides of it, one so steep that it is none is not", () => {
    expect(found(value(clearanceOf("age >= 63 a ? 2 L/h : 3 L/h")), "formula-step")).toMatchObject([
      { data: { covariate: "age", at: 64, here: 2, there: 3 } },
    ]);
    expect(found(value(clearanceOf("2 L/h * (weight / 70 kg)^4")), "formula-step")).toEqual([]);
    expect(found(value(clearanceOf("age >= 63 a ? 2.4 L/h : 2.9 L/h")), "formula-step")).toEqual([]);
    const { kinetics } = recordById("levetiracetam")!;
    if (kinetics.kind !== "one-compartment-oral") throw new RangeError("levetiracetam: one compartment expected");
    // The patient's 52.3 mL/min lie just above the border of 50.
    const [one] = found(value(clearanceOf(kinetics.clearance.formula)), "formula-step");
    expect(one).toMatchObject({ data: { covariate: "creatinineClearance" } });
    expect(concernMessage(one!).title).toBe(
      "The record's clearance jumps close to this patient's creatinine clearance",
    );
  });

  it("a window that was asked about and confirmed stays visible", () => {
    const window = { ...troughWindow!, confirmed: true as const };
    expect(found(value({}, { window }), "value-confirmed")).toMatchObject([{ id: "value-confirmed:window" }]);
    expect(found(value({}, { window: troughWindow! }), "value-confirmed")).toEqual([]);
  });

  it("an event the record knows of is spoken of once", () => {
    const codes = derive(value({ interactions }, event("valproate"))).concerns.map((each) => each.code);
    expect(codes).toContain("interaction-not-applied");
    expect(codes).not.toContain("factor-not-used");
  });

  it("a memory figure of a product that is not in use, or of a window that is not chosen, is left alone", () => {
    const products = [...quiet.products, { ...tablet12h!, id: "other", bioavailability: figure(0.5, "1", "memory") }];
    expect(found(value({ products }), "figures-from-memory")).toEqual([]);
    expect(found(value({ products }, { options: optionOf("other", 300) }), "figures-from-memory")).toHaveLength(1);
    const windows = [{ ...trough, basis: "memory" as const, low: { value: 1, unit: "mg/L" as const } }];
    expect(found(value({ windows }), "figures-from-memory")).toEqual([]);
  });
});

describe("which interactions an event names", () => {
  const named = (medicine: string, detail: string, change: Partial<Factor> = {}) => {
    const one = value({ interactions: [{ ...interactions[0]!, medicine }] }, event(detail, change));
    return eventInteractions(one, one.patient.factors[0]!).length === 1;
  };

  it.each([
    ["valproate", "Sodium Valproate, 500 mg", true],
    ["valproate", "valproates", false],
    ["diltiazem, nifedipine or verapamil", "verapamil started", true],
    ["diltiazem, nifedipine or verapamil", "amlodipine started", false],
    ["phenytoin with phenobarbital or felbamate", "phenytoin", false],
    ["phenytoin with phenobarbital or felbamate", "phenytoin and phenobarbital", true],
    ["phenytoin with phenobarbital or felbamate", "felbamate beside phenytoin", true],
    ["phenytoin with phenobarbital or felbamate", "phenobarbital and felbamate", false],
    ["two or more of phenytoin, phenobarbital and carbamazepine", "carbamazepine", false],
    ["two or more of phenytoin, phenobarbital and carbamazepine", "carbamazepine, phenytoin", true],
  ])("%s, by the words “%s”: %s", (medicine, detail, wanted) => {
    expect(named(medicine, detail)).toBe(wanted);
  });

  it("smoking names tobacco smoke, of the patient's sex (a woman here)", () => {
    expect(named("tobacco smoke, woman", "", { kind: "smoking" })).toBe(true);
    expect(named("tobacco smoke, man", "", { kind: "smoking" })).toBe(false);
    expect(named("tobacco smoke, woman", "", { kind: "meal" })).toBe(false);
  });
});
