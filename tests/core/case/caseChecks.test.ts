import { describe, expect, it } from "vitest";
import { type Case, caseValidate } from "../../../src/core/case/index.ts";
import { issueMessage } from "../../../src/core/messages/index.ts";
import { sampleCase } from "./sampleCase.ts";

type Change = (value: Case) => unknown;

const mgL = (value: number) => ({ value, unit: "mg/L" as const });

/** Each row breaks one thing across fields; the shape stays right. */
const ROWS: readonly (readonly [string, Change, string, string])[] = [
  ["two levels of one id", (c) => (c.levels[1]!.id = "l1"), "id-twice", "levels.1.id"],
  [
    "two observations of one id",
    (c) => (c.patient.observations[2]!.id = "o1"),
    "id-twice",
    "patient.observations.2.id",
  ],
  ["two given lines of one id", (c) => (c.given[1]!.id = "g1"), "id-twice", "given.1.id"],
  ["two lines of an option of one id", (c) => (c.options[1]!.lines[1]!.id = "b1"), "id-twice", "options.1.lines.1.id"],
  ["two options of one id", (c) => (c.options[1]!.id = "A"), "id-twice", "options.1.id"],
  ["an option called given", (c) => (c.options[1]!.id = "given"), "option-named-given", "options.1.id"],
  ["two chosen options", (c) => (c.options[1]!.chosen = true), "options-two-chosen", "options"],
  [
    "a product that is not in the record",
    (c) => (c.given[0]!.product = "patch"),
    "line-product-unknown",
    "given.0.product",
  ],
  [
    "a volume of tablets",
    (c) => (c.options[0]!.lines[0]!.amount = { value: 5, unit: "mL" }),
    "dose-unit-mismatch",
    "options.0.lines.0.amount.unit",
  ],
  ["a dose of 0", (c) => (c.given[0]!.amount.value = 0), "dose-amount", "given.0.amount.value"],
  ["a negative dose", (c) => (c.given[1]!.amount.value = -15), "dose-amount", "given.1.amount.value"],
  [
    "an exception's amount of 0",
    (c) => (c.given[0]!.except![0]!.amount = { value: 0, unit: "mg" }),
    "dose-amount",
    "given.0.except.0.amount.value",
  ],
  [
    "an interval of 0",
    (c) => (c.given[0]!.repeat = { every: { value: 0, unit: "h" } }),
    "line-interval",
    "given.0.repeat.every.value",
  ],
  [
    "a clock time twice",
    (c) => (c.given[1]!.repeat = { clock: ["08:00", "08:00"] }),
    "line-clock-twice",
    "given.1.repeat.clock",
  ],
  [
    "more doses than a line may have",
    (c) => (c.given[1]!.repeat = { clock: ["08:00", "12:00", "20:00"], days: 3660 }),
    "line-too-many-doses",
    "given.1.repeat",
  ],
  [
    "an exception past the end",
    (c) => (c.given[0]!.except![1]!.index = 7),
    "exception-beyond-line",
    "given.0.except.1.index",
  ],
  [
    "an exception of a second dose of a single one",
    (c) => (c.given[1]!.except = [{ index: 1, status: "missed" }]),
    "exception-beyond-line",
    "given.1.except.0.index",
  ],
  [
    "an exception past the last clock time",
    (c) => (c.options[1]!.lines[0]!.except = [{ index: 5, status: "missed" }]),
    "exception-beyond-line",
    "options.1.lines.0.except.0.index",
  ],
  [
    "two exceptions of one dose",
    (c) => (c.given[0]!.except![1]!.index = 2),
    "exception-twice",
    "given.0.except.1.index",
  ],
  [
    "missed, with a time",
    (c) => (c.given[0]!.except![1]!.at = c.now),
    "exception-missed-with-time",
    "given.0.except.1",
  ],
  [
    "missed, with an amount",
    (c) => (c.given[0]!.except![1]!.amount = { value: 100, unit: "mg" }),
    "exception-missed-with-time",
    "given.0.except.1",
  ],
  ["late, without a time", (c) => delete c.given[0]!.except![0]!.at, "exception-without-time", "given.0.except.0"],
  ["a level of 0", (c) => (c.levels[0]!.quantity.value = 0), "level-not-positive", "levels.0.quantity.value"],
  ["a negative level", (c) => (c.levels[0]!.quantity.value = -2), "level-not-positive", "levels.0.quantity.value"],
  ["a window upside down", (c) => (c.window!.low.value = 20), "window-order", "window"],
  ["a window of no width", (c) => (c.window!.low.value = 15), "window-order", "window"],
  [
    "an exposure window in mg/L",
    (c) => (c.window = { quantity: "auc24", low: { value: 1, unit: "mg.h/L" }, high: mgL(2), basis: "" }),
    "window-unit",
    "window.high.unit",
  ],
  [
    "a trough window of exposure",
    (c) => (c.window = { quantity: "trough", low: mgL(1), high: { value: 2, unit: "mg.h/L" }, basis: "" }),
    "window-unit",
    "window.high.unit",
  ],
  [
    "a window in two units",
    (c) => (c.window = { quantity: "trough", low: mgL(1), high: { value: 80, unit: "umol/L" }, basis: "" }),
    "window-units-differ",
    "window.high.unit",
  ],
  [
    "a window drawn before the dose",
    (c) => (c.window!.drawFrom = { value: -1, unit: "h" }),
    "window-draw-hours",
    "window.drawFrom.value",
  ],
  [
    "a window drawn from a later hour than to",
    (c) => Object.assign(c.window!, { drawFrom: { value: 13, unit: "h" }, drawTo: { value: 12, unit: "h" } }),
    "window-draw-order",
    "window",
  ],
  ["an impossible age", (c) => (c.patient.age!.value = 200), "age-impossible", "patient.age.value"],
  ["a year of birth as age", (c) => (c.patient.age!.value = 1961), "age-birth-year", "patient.age.value"],
  [
    "a height in metres as centimetres",
    (c) => (c.patient.height!.value = 1.62),
    "height-metres",
    "patient.height.value",
  ],
  [
    "an impossible weight",
    (c) => (c.patient.observations[0]!.quantity.value = 0),
    "weight-impossible",
    "patient.observations.0.quantity.value",
  ],
  [
    "an impossible creatinine",
    (c) => (c.patient.observations[1]!.quantity.value = -1),
    "creatinine-impossible",
    "patient.observations.1.quantity.value",
  ],
  [
    "an impossible albumin",
    (c) => (c.patient.observations[2]!.quantity.value = 0.5),
    "albumin-impossible",
    "patient.observations.2.quantity.value",
  ],
  [
    "a meal that ends before it begins",
    (c) => (c.patient.factors[0]!.to = "2026-03-02T11:59:00+00:00"),
    "factor-order",
    "patient.factors.0.to",
  ],
  [
    "a factor with an effect that is over as it begins",
    (c) =>
      (c.patient.factors[0] = {
        ...c.patient.factors[0]!,
        to: c.patient.factors[0]!.from,
        effect: { clearance: 0.5 },
      }),
    "factor-effect-empty",
    "patient.factors.0.to",
  ],
  ...[0, -1, 366].map((value): (typeof ROWS)[number] => [
    `an onset of ${value} d`,
    (c) => (c.patient.factors[0]!.effect = { clearance: 0.5, onset: { value, unit: "d" } }),
    "factor-onset",
    "patient.factors.0.effect.onset.value",
  ]),
  ...[0, 0.04, -1, 21].map((clearance): (typeof ROWS)[number] => [
    `an effect of ${clearance} times the clearance`,
    (c) => (c.patient.factors[0]!.effect = { clearance }),
    clearance > 1 ? "value-too-big" : "value-too-small",
    "patient.factors.0.effect.clearance",
  ]),
  [
    "an effect on the volume of 0",
    (c) => (c.patient.factors[0]!.effect = { clearance: 1, volume: 0 }),
    "value-too-small",
    "patient.factors.0.effect.volume",
  ],
  [
    "an effect that is no number",
    (c) => (c.patient.factors[0]!.effect = { clearance: Number.POSITIVE_INFINITY }),
    "value-wrong-kind",
    "patient.factors.0.effect.clearance",
  ],
];

describe("across fields", () => {
  it("the sample is sound", () => {
    expect(caseValidate(sampleCase())).toEqual({ ok: true, value: sampleCase() });
  });

  it.each(ROWS)("%s is refused", (_, change, code, path) => {
    const value = structuredClone(sampleCase());
    change(value);
    const validated = caseValidate(value);
    const issues = validated.ok ? [] : validated.issues;
    expect(issues.map((each) => `${each.code} ${each.path.join(".")}`)).toEqual([`${code} ${path}`]);
    expect(issueMessage(issues[0]!)).not.toMatch(/undefined|\[object|NaN/);
  });

  it.each<[string, Change]>([
    ["the same line id in two lanes", (c) => (c.options[0]!.lines[0]!.id = "g1")],
    ["an improbable weight: asked about where it is entered", (c) => (c.patient.observations[0]!.quantity.value = 250)],
    ["a height of 1.62 m", (c) => (c.patient.height = { value: 1.62, unit: "m" })],
    [
      "an exception far out on a line without end",
      (c) => (c.options[1]!.lines[1]!.except = [{ index: 400, status: "missed" }]),
    ],
    ["the last dose of a line missed", (c) => (c.given[0]!.except![1]!.index = 6)],
    ["a liquid in mg", (c) => (c.given[1]!.amount = { value: 80, unit: "mg" })],
    ["no option chosen", (c) => (c.options[0]!.chosen = false)],
    ["no window", (c) => delete c.window],
    [
      "a factor with an effect, an onset and no end",
      (c) =>
        (c.patient.factors[0] = {
          kind: "interacting-medicine",
          from: "2026-03-01T00:00:00+00:00",
          detail: "",
          effect: { clearance: 0.05, volume: 5, onset: { value: 365, unit: "d" } },
        }),
    ],
    ["a meal that is over as it begins", (c) => (c.patient.factors[0]!.to = c.patient.factors[0]!.from)],
  ])("%s is fine", (_, change) => {
    const value = structuredClone(sampleCase());
    change(value);
    expect(caseValidate(value)).toEqual({ ok: true, value });
  });
});
