import { createHash } from "node:crypto";
import { describe, expect, it } from "vitest";
import { canonicalJson } from "../../../src/core/case/caseFingerprint.ts";
import {
  type Case,
  caseEdit,
  caseFingerprint,
  caseNew,
  caseParse,
  casePrint,
  EDIT_NAMES,
} from "../../../src/core/case/index.ts";
import { recordOf } from "../medicine/recordOf.ts";
import { sampleCase } from "./sampleCase.ts";

const ENGINE = "test-engine 1";
const fingerprint = (value: Case) => caseFingerprint(value, ENGINE);

function changed(change: (value: Case) => unknown): Case {
  const value = structuredClone(sampleCase());
  change(value);
  return value;
}

describe("caseFingerprint", () => {
  const whole = fingerprint(sampleCase());

  it("is SHA-256 in hex", () => {
    expect(whole).toMatch(/^[0-9a-f]{64}$/);
  });

  it("is the same after printing and reading, and for fields in another order", () => {
    const parsed = caseParse(casePrint(sampleCase()));
    expect(parsed.ok && fingerprint(parsed.value)).toBe(whole);
    const { notes, ...rest } = sampleCase();
    expect(fingerprint({ notes, ...rest })).toBe(whole);
  });

  it.each<[string, (value: Case) => unknown]>([
    ["id", (c) => (c.id = "other")],
    ["label", (c) => (c.label = "other")],
    ["notes", (c) => (c.notes = "other")],
    ["demo", (c) => (c.demo = true)],
    ["label of an option", (c) => (c.options[0]!.label = "other")],
    ["id of a line", (c) => (c.given[0]!.id = "other")],
    ["id of a level", (c) => (c.levels[0]!.id = "other")],
    ["id of an observation", (c) => (c.patient.observations[0]!.id = "other")],
    ["reason of a level left out", (c) => (c.levels[1]!.excluded = "other")],
    ["stated basis of the window", (c) => (c.window!.basis = "other")],
    ["offset in which an instant is written", (c) => (c.now = "2026-03-04T13:00:00+01:00")],
    ["offset of a dose's start", (c) => (c.given[0]!.start = "2026-03-01T10:00:00+02:00")],
    ["offset of an observation", (c) => (c.patient.observations[0]!.at = "2026-03-01T09:00:00+01:00")],
    ["offset of a level", (c) => (c.levels[0]!.at = "2026-03-03T02:30:00-05:00")],
    ["offset of a factor", (c) => (c.patient.factors[0]!.from = "2026-03-02T13:00:00+01:00")],
    ["offset of a factor's end", (c) => (c.patient.factors[0]!.to = "2026-03-02T13:30:00+01:00")],
    ["offset of an option's start", (c) => (c.options[0]!.lines[0]!.start = "2026-03-04T21:00:00+01:00")],
    ["offset of an exception", (c) => (c.given[0]!.except![0]!.at = "2026-03-02T10:30:00+01:00")],
  ])("does not depend on: %s", (_, change) => {
    expect(fingerprint(changed(change))).toBe(whole);
  });

  it.each<[string, (value: Case) => unknown]>([
    ["time zone", (c) => (c.timeZone = "Europe/London")],
    ["now", (c) => (c.now = "2026-03-04T12:15:00+00:00")],
    ["sex", (c) => (c.patient.sex = "male")],
    ["no sex", (c) => delete c.patient.sex],
    ["age", (c) => (c.patient.age!.value = 65)],
    ["height", (c) => (c.patient.height!.value = 163)],
    ["an observation's value", (c) => (c.patient.observations[0]!.quantity.value = 59)],
    ["an observation's unit", (c) => (c.patient.observations[0]!.quantity.unit = "[lb_av]")],
    ["an observation's time", (c) => (c.patient.observations[0]!.at = "2026-03-01T08:00:01+00:00")],
    ["that a value was confirmed", (c) => delete c.patient.observations[2]!.confirmed],
    ["a factor", (c) => c.patient.factors.pop()],
    ["a factor's end", (c) => delete c.patient.factors[0]!.to],
    ["a factor's effect", (c) => (c.patient.factors[0]!.effect = { clearance: 0.5 })],
    ["a factor's onset", (c) => (c.patient.factors[0]!.effect = { clearance: 1, onset: { value: 3, unit: "d" } })],
    ["the record's version", (c) => (c.medicine.recordVersion += 1)],
    ["a figure of the record", (c) => (c.medicine.products[0]!.lag.value = 0.25)],
    ["a formula of the record", (c) => (c.medicine.kinetics.volume.formula = "0.5 L/kg * weight")],
    ["the window", (c) => (c.window!.low.value = 7)],
    ["what the window is about", (c) => (c.window!.quantity = "trough")],
    ["no window", (c) => delete c.window],
    ["an amount given", (c) => (c.given[0]!.amount.value = 300)],
    ["a product given", (c) => (c.given[0]!.product = "tablet")],
    ["a start", (c) => (c.given[0]!.start = "2026-03-01T08:15:00+00:00")],
    ["a repeat", (c) => (c.given[0]!.repeat = { every: { value: 8, unit: "h" }, count: 7 })],
    ["an exception", (c) => c.given[0]!.except!.pop()],
    ["an exception's time", (c) => (c.given[0]!.except![0]!.at = "2026-03-02T09:45:00+00:00")],
    ["a level", (c) => (c.levels[0]!.quantity.value = 6.6)],
    ["a level's time", (c) => (c.levels[0]!.at = "2026-03-03T07:31:00+00:00")],
    ["a level's kind", (c) => (c.levels[0]!.kind = "below-limit")],
    ["that a level is left out", (c) => delete c.levels[1]!.excluded],
    ["an option's lines", (c) => (c.options[1]!.lines[1]!.amount.value = 200)],
    ["an option's clock time", (c) => (c.options[1]!.lines[1]!.repeat = { clock: ["21:00"] })],
    ["the choice", (c) => (c.options[0]!.chosen = false)],
    ["the name of an option", (c) => (c.options[1]!.id = "C")],
    ["how levels are used", (c) => (c.fit.use = "typical")],
    ["the residual model", (c) => (c.fit.residualModel = "robust")],
  ])("depends on: %s", (_, change) => {
    expect(fingerprint(changed(change))).not.toBe(whole);
  });

  it("depends on the engine", () => {
    expect(caseFingerprint(sampleCase(), "test-engine 2")).not.toBe(whole);
  });

  it("an edit and its undoing give it back", () => {
    expect(EDIT_NAMES).toContain("nowSet");
    const moved = caseEdit(sampleCase(), "nowSet", { at: "2026-03-05T12:00:00+00:00" });
    expect(fingerprint(caseEdit(moved, "nowSet", { at: sampleCase().now }))).toBe(whole);
  });
});

describe("canonicalJson (RFC 8785)", () => {
  it.each([
    // Section 3.2.2.3: numbers as ECMAScript prints them.
    [
      [Number("333333333.33333329"), 1e30, 4.5, 2e-3, 0.000000000000000000000000001, -0],
      "[333333333.3333333,1e+30,4.5,0.002,1e-27,0]",
    ],
    // Section 3.2.3: keys by UTF-16 code units, at every depth; no space.
    [
      { "\u20ac": 1, "\r": 2, "\ufb33": 3, "1": 4, "\ud83d\ude00": 5, "\u0080": 6, "\u00f6": 7 },
      '{"\\r":2,"1":4,"\u0080":6,"\u00f6":7,"\u20ac":1,"\ud83d\ude00":5,"\ufb33":3}',
    ],
    [{ b: { d: 1, c: [{ z: null, y: true }] }, a: "x" }, '{"a":"x","b":{"c":[{"y":true,"z":null}],"d":1}}'],
    // Section 3.2.2.2: only what must be escaped is.
    ['\u20ac$\u000f\nA\'B"\\\\"/', '"\u20ac$\\u000f\\nA\'B\\"\\\\\\\\\\"/"'],
    [{ a: undefined, b: 1 }, '{"b":1}'],
  ])("%#", (value, expected) => {
    expect(canonicalJson(value)).toBe(expected);
  });

  it.each([Number.NaN, Number.POSITIVE_INFINITY, [undefined], () => 1])(
    "refuses what JSON has no way to write: %s",
    (value) => {
      expect(() => canonicalJson(value)).toThrow(RangeError);
    },
  );
});

it("is the digest another implementation makes of the documented inputs", () => {
  const medicine = recordOf("demoxiline");
  const value = caseNew({ id: "x", label: "y", timeZone: "Europe/Lisbon", now: "2026-03-04T12:00:00+00:00", medicine });
  const inputs = {
    format: "ebbline-case",
    version: 2,
    timeZone: "Europe/Lisbon",
    now: Date.UTC(2026, 2, 4, 12),
    patient: { observations: [], factors: [] },
    medicine,
    given: [],
    levels: [],
    options: [],
    fit: { use: "individual", residualModel: "normal" },
  };
  const text = canonicalJson({ engine: ENGINE, inputs });
  expect(fingerprint(value)).toBe(createHash("sha256").update(text, "utf8").digest("hex"));
});
