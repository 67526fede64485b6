import { describe, expect, it } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";
import { CONCERN_CODES, concernMessage } from "../../../src/core/messages/index.ts";
import { caseFixture } from "./caseFixture.ts";

const base = caseFixture();
const level = (change: Partial<Case["levels"][number]> = {}): Case["levels"][number] => ({
  id: "l",
  at: "2026-03-04T07:30:00+00:00",
  quantity: { value: 6, unit: "mg/L" },
  kind: "measured",
  ...change,
});
const line = (change: Partial<Case["given"][number]> = {}): Case["given"][number] => ({
  id: "x",
  product: "tablet-12h",
  amount: { value: 300, unit: "mg" },
  start: "2026-03-04T20:00:00+00:00",
  repeat: { every: { value: 12, unit: "h" } },
  ...change,
});
const option = (lines: Case["given"], id = "A"): Case["options"][number] => ({ id, label: "", chosen: false, lines });
const record = base.medicine;

/** For every concern: a case that raises it, and one as like it as can be that does not. */
const TABLE: readonly (readonly [code: string, raises: Case, doesNot: Case])[] = [
  ["model-incomplete", { ...base, patient: { ...base.patient, observations: [] } }, base],
  [
    "line-not-counted",
    {
      ...base,
      timeZone: "Europe/London",
      given: [line({ start: "2026-03-28T01:30:00+00:00", repeat: { clock: ["01:30"], days: 3 } })],
    },
    {
      ...base,
      timeZone: "Europe/London",
      given: [line({ start: "2026-03-28T02:30:00+00:00", repeat: { clock: ["02:30"], days: 3 } })],
    },
  ],
  ["medicine-invented", { ...base, medicine: { ...record, invented: true } }, base],
  [
    "option-toxic",
    { ...base, options: [option([line({ amount: { value: 900, unit: "mg" } })])] },
    { ...base, options: [option([line({ amount: { value: 200, unit: "mg" } })])] },
  ],
  ["age-outside-population", { ...base, patient: { ...base.patient, age: { value: 14, unit: "a" } } }, base],
  [
    "level-after-now",
    { ...base, levels: [level({ at: "2026-03-04T12:00:01+00:00" })] },
    { ...base, levels: [level({ at: "2026-03-04T12:00:00+00:00" })] },
  ],
  [
    "level-before-dose",
    { ...base, levels: [level({ at: "2026-03-01T08:00:00+00:00" })] },
    { ...base, levels: [level({ at: "2026-03-01T08:00:01+00:00" })] },
  ],
  [
    "level-while-absorbing",
    { ...base, levels: [level({ at: "2026-03-04T11:00:00+00:00" })] },
    { ...base, levels: [level()] },
  ],
  [
    "level-far-off",
    { ...base, levels: [level({ quantity: { value: 30, unit: "mg/L" } })] },
    { ...base, levels: [level()] },
  ],
  ["level-left-out", { ...base, levels: [level({ excluded: "haemolysed" })] }, { ...base, levels: [level()] }],
  ["levels-not-used", { ...base, levels: [level()] }, base],
  [
    "option-above-window",
    { ...base, options: [option([line({ amount: { value: 600, unit: "mg" } })])] },
    { ...base, options: [option([line({ amount: { value: 100, unit: "mg" } })])] },
  ],
  [
    "option-below-window",
    { ...base, options: [option([line({ amount: { value: 100, unit: "mg" } })])] },
    { ...base, options: [option([line({ amount: { value: 600, unit: "mg" } })])] },
  ],
  [
    "first-dose-close",
    { ...base, options: [option([line({ start: "2026-03-04T12:30:00+00:00" })])] },
    { ...base, options: [option([line({ start: "2026-03-04T20:00:00+00:00" })])] },
  ],
  [
    "dose-not-makeable",
    { ...base, options: [option([line({ amount: { value: 333, unit: "mg" } })])] },
    { ...base, options: [option([line({ amount: { value: 300, unit: "mg" } })])] },
  ],
  ["given-after-now", { ...base, now: "2026-03-02T12:00:00+00:00" }, base],
  [
    "option-before-now",
    { ...base, options: [option([line({ start: "2026-03-04T11:00:00+00:00" })])] },
    { ...base, options: [option([line({ start: "2026-03-04T12:00:00+00:00" })])] },
  ],
  ["window-missing", (({ window: _, ...rest }) => rest)(base) as Case, base],
  [
    "factor-not-used",
    {
      ...base,
      patient: { ...base.patient, factors: [{ kind: "smoking", from: base.now, detail: "stopped smoking" }] },
    },
    base,
  ],
  [
    "factor-by-hand",
    {
      ...base,
      patient: {
        ...base.patient,
        factors: [
          { kind: "interacting-medicine", from: base.now, detail: "invented inhibitor", effect: { clearance: 0.5 } },
        ],
      },
    },
    base,
  ],
  [
    "kinetics-change",
    {
      ...base,
      patient: {
        ...base.patient,
        factors: [
          { kind: "interacting-medicine", from: base.now, detail: "invented inhibitor", effect: { clearance: 0.5 } },
        ],
      },
    },
    base,
  ],
  ["value-confirmed", { ...base, levels: [level({ confirmed: true })] }, { ...base, levels: [level()] }],
  ["flip-flop", base, { ...base, given: [], options: [option([line({ product: "tablet" })])] }],
  [
    "no-steady-state",
    {
      ...base,
      options: [
        option([
          { id: "o", product: "tablet-12h", amount: { value: 450, unit: "mg" }, start: "2026-03-04T20:00:00+00:00" },
        ]),
      ],
    },
    base,
  ],
  ["starts-from-nothing", { ...base, given: [] }, base],
  [
    "kidney-unknown",
    {
      ...base,
      patient: {
        ...base.patient,
        observations: base.patient.observations.filter((each) => each.kind !== "serumCreatinine"),
      },
    },
    base,
  ],
  [
    "record-not-reviewed",
    base,
    { ...base, medicine: { ...record, review: { status: "reviewed", by: "invented reviewer", on: "2026-01-01" } } },
  ],
];

const codes = (value: Case) => derive(value).concerns.map((concern) => concern.code);

describe("concerns", () => {
  it.each(TABLE)("%s is raised where it should be and not where it should not", (code, raises, doesNot) => {
    expect(codes(raises)).toContain(code);
    expect(codes(doesNot)).not.toContain(code);
  });

  it("the table has every concern there is a sentence for", () => {
    expect(TABLE.map(([code]) => code).sort()).toEqual([...CONCERN_CODES].sort());
  });

  it.each(TABLE)("%s reads as whole sentences with nothing left open", (code, raises) => {
    for (const concern of derive(raises).concerns.filter((each) => each.code === code)) {
      const { title, text } = concernMessage(concern);
      expect(title).not.toMatch(/undefined|NaN|null|\[object/);
      expect(text).not.toMatch(/undefined|NaN|null|\[object/);
      expect(text).toMatch(/[.?]$/);
    }
  });

  it("ids are unique, gravest first", () => {
    const { concerns } = derive({ ...base, levels: [level(), level({ id: "m", at: "2026-03-01T07:00:00+00:00" })] });
    expect(new Set(concerns.map((concern) => concern.id)).size).toBe(concerns.length);
    const order = concerns.map((concern) => ["stop", "check", "note"].indexOf(concern.gravity));
    expect(order).toEqual([...order].sort((a, b) => a - b));
  });

  it("lamotrigine too derives without an exception", () => {
    const medicine = recordById("lamotrigine")!;
    const product = medicine.products[0]!;
    const value = {
      ...base,
      medicine,
      given: [],
      options: [option([line({ product: product.id, amount: { value: 100, unit: "mg" } })])],
    };
    expect(derive(value).typical).not.toBeNull();
  });
});
