import { describe, expect, it } from "vitest";
import { caseNew, caseParse, casePrint, caseValidate } from "../../../src/core/case/index.ts";
import { issueMessage } from "../../../src/core/messages/index.ts";
import type { Issue } from "../../../src/core/result/index.ts";
import { recordOf } from "../medicine/recordOf.ts";
import { sampleCase } from "./sampleCase.ts";

/** A case as short as one can be, on one line, with letters of two bytes. */
const demoxiline = recordOf("demoxiline");
const small = casePrint(
  caseNew({
    id: "small",
    label: "Ünit é",
    timeZone: "Europe/Lisbon",
    now: "2026-03-04T12:00:00+00:00",
    medicine: {
      ...demoxiline,
      variability: {},
      products: demoxiline.products.slice(0, 1),
      windows: [],
      doseLimits: [],
      sampling: [],
      cautions: [],
    },
  }),
).replace(/\n */g, " ");

function sentences(issues: readonly Issue[]): string[] {
  return issues.map((each) => {
    const sentence = issueMessage(each);
    expect(sentence).not.toMatch(/undefined|\[object/);
    return sentence;
  });
}

function refusal(text: string): readonly Issue[] {
  const parsed = caseParse(text);
  if (parsed.ok) throw new Error("it was read");
  expect(parsed.issues.length).toBeGreaterThan(0);
  sentences(parsed.issues);
  return parsed.issues;
}

describe("a damaged file", () => {
  it("cut at every length is said to be cut off, or empty", () => {
    const cut = small.trimEnd();
    expect(caseParse(cut).ok).toBe(true);
    for (let length = 0; length < cut.length; length += 1) {
      const codes = refusal(cut.slice(0, length)).map((each) => each.code);
      expect([length, codes]).toEqual([length, [length === 0 ? "file-empty" : "file-truncated"]]);
    }
  }, 60_000);

  it("with any one byte changed is refused, or reads as exactly what then stands in it", () => {
    const bytes = new TextEncoder().encode(small);
    // One of each class: control, blank, quote, digit, letter, bracket, backslash, continuation byte, lead bytes of 2, 3 and 4, never valid.
    const classes = [
      0x00, 0x0a, 0x20, 0x22, 0x2c, 0x2d, 0x30, 0x41, 0x5b, 0x5c, 0x7d, 0x7f, 0x80, 0xc3, 0xe2, 0xf0, 0xff,
    ];
    let refused = 0;
    let read = 0;
    for (let at = 0; at < bytes.length; at += 7) {
      for (const byte of classes) {
        if (bytes[at] === byte) continue;
        const damaged = bytes.slice();
        damaged[at] = byte;
        const text = new TextDecoder().decode(damaged);
        const parsed = caseParse(text);
        if (parsed.ok) {
          expect(parsed.value).toEqual(JSON.parse(text));
          expect(text).not.toContain("\ufffd");
          read += 1;
        } else {
          sentences(parsed.issues);
          refused += 1;
        }
      }
    }
    // Most changes break it; a letter of a free text changed into another can't be known.
    expect(refused).toBeGreaterThan(read);
    expect(read).toBeGreaterThan(0);
  }, 60_000);

  it("with any one byte taken out is refused, or reads as what then stands in it", () => {
    const bytes = new TextEncoder().encode(small);
    for (let at = 0; at < bytes.length; at += 3) {
      const text = new TextDecoder().decode(Uint8Array.from([...bytes.slice(0, at), ...bytes.slice(at + 1)]));
      const parsed = caseParse(text);
      if (parsed.ok) expect(parsed.value).toEqual(JSON.parse(text));
      else sentences(parsed.issues);
    }
  }, 60_000);
});

describe("what the file says it is", () => {
  const changed = (change: Record<string, unknown>) => JSON.stringify({ ...JSON.parse(small), ...change });
  const sentence = (text: string) => sentences(refusal(text)).join(" ");

  it.each([
    [
      changed({ version: 3 }),
      "made by a newer version of Ebbline: its file version is 3, and this program reads up to 2",
    ],
    [changed({ version: 99, anything: [] }), "made by a newer version"],
    [changed({ version: 0 }), 'version "0" can\'t be'],
    [changed({ version: 1.5 }), 'version "1.5" can\'t be'],
    [changed({ version: "1" }), 'version "1" can\'t be'],
    [changed({ version: null }), "does not state its version"],
    [changed({ format: "ebbline-medicine" }), 'is a "ebbline-medicine", not a case'],
    [changed({ format: undefined }), "does not say that it is a case"],
    ["[]", "is not a case"],
    ["null", "is not a case"],
    ["3", "is not a case"],
    ['"text"', "is not a case"],
  ])("%#", (text, words) => {
    expect(sentence(text)).toContain(words);
  });

  it("a newer version is nothing else besides: no list of fields it does not know", () => {
    expect(refusal(changed({ version: 3, novelty: 1 })).map((each) => [each.code, each.path])).toEqual([
      ["case-newer", ["version"]],
    ]);
  });
});

describe("shape", () => {
  /** The sample with one part changed, as code, path and sentence. */
  function faults(change: (value: Record<string, unknown>) => void): [string, string, string][] {
    const value = structuredClone(sampleCase()) as unknown as Record<string, unknown>;
    change(value);
    const validated = caseValidate(value);
    return validated.ok
      ? []
      : validated.issues.map((each, i) => [each.code, each.path.join("."), sentences(validated.issues)[i]!]);
  }
  const put = (path: string, to: unknown) => (value: Record<string, unknown>) => {
    const keys = path.split(".");
    const last = keys.pop() as string;
    const part = keys.reduce<unknown>((each, key) => (each as Record<string, unknown>)[key], value) as Record<
      string,
      unknown
    >;
    if (to === undefined) delete part[last];
    else part[last] = to;
  };

  it.each<[string, unknown, string, string]>([
    ["extra", 1, "field-unknown", "The field extra is not known here."],
    ["patient.colour", 1, "field-unknown", "The field patient.colour is not known here."],
    ["levels.0.quantity.extra", 1, "field-unknown", "The field levels[0].quantity.extra is not known here."],
    ["label", undefined, "field-missing", "The field label is missing."],
    ["label", 3, "value-wrong-kind", "label is 3; it must be text in quotes."],
    ["label", "x".repeat(121), "value-too-big", "at most 120 characters."],
    ["patient.age.value", "64", "value-wrong-kind", 'patient.age.value is "64"; it must be a number.'],
    ["patient.age.unit", "years", "value-not-listed", 'patient.age.unit is "years"; it must be a.'],
    ["patient.sex", "f", "value-not-listed", 'patient.sex is "f"; it must be female or male.'],
    ["patient.observations.0.kind", "mass", "value-not-listed", "it must be weight, serumCreatinine or albumin."],
    ["patient.observations.0.quantity.unit", "mg/dL", "value-not-listed", "it must be kg or [lb_av]."],
    [
      "patient.observations.0",
      4,
      "value-wrong-kind",
      "patient.observations[0] is 4; it must be a group of fields in braces.",
    ],
    [
      "now",
      "2026-02-30T12:00:00Z",
      "value-malformed",
      "it must be an instant with its offset, of a date that exists, such as",
    ],
    ["now", "2026-03-04 12:00", "value-malformed", "it must be an instant with its offset"],
    ["timeZone", "Europe/Atlantis", "value-malformed", "it must be a named time zone such as Europe/Lisbon."],
    ["timeZone", "+01:00", "value-malformed", "it must be a named time zone"],
    ["options.1.lines.0.repeat.clock.0", "8:00", "value-malformed", "it must be a 24-hour clock time such as 08:00."],
    [
      "options.1.lines.0.repeat.weekdays",
      [3, 1],
      "line-weekdays-order",
      "Weekdays of a dose line are numbers from 1 (Monday) to 7 (Sunday), in ascending order, each once.",
    ],
    ["options.1.lines.0.repeat.weekdays", [1, 1], "line-weekdays-order", "in ascending order, each once."],
    ["options.1.lines.0.repeat.weekdays", [], "value-too-small", "at least 1"],
    ["options.1.lines.0.repeat.extra", 1, "field-unknown", "options[1].lines[0].repeat.extra is not known here."],
    ["options.1.lines.0.repeat.days", 1.5, "value-wrong-kind", "it must be a whole number."],
    ["options.0.lines.0.repeat.count", 0, "value-too-small", "it must be at least 1."],
    ["given.0.except.0.status", "skipped", "value-not-listed", "it must be missed, late or moved."],
    ["given", {}, "value-wrong-kind", "it must be a list in square brackets."],
    ["demo", false, "value-not-listed", "demo is false; it must be true."],
    [
      "medicine.products.0.lag.source",
      undefined,
      "record-figure-without-source",
      "The lag of the 12-hour modified-release tablet in the record of theophylline has no source (medicine.products[0].lag)",
    ],
    [
      "medicine.products.0.lag.value",
      -1,
      "record-range",
      "medicine.products[0].lag.value is -1; it must be at least 0 h.",
    ],
    ["window.basis", undefined, "field-missing", "The field window.basis is missing."],
  ])("%s = %j: %s", (path, to, code, words) => {
    const found = faults(put(path, to));
    expect(found.map((each) => each[0])).toEqual([code]);
    expect(found[0]![1]).toBe(path);
    expect(found[0]![2]).toContain(words);
  });

  it("tells every fault, not only the first", () => {
    const found = faults((value) => {
      for (const path of ["label", "patient.age.value", "levels.1.at"]) put(path, null)(value);
    });
    expect(found.map((each) => each[1])).toEqual(["label", "patient.age.value", "levels.1.at"]);
  });
});
