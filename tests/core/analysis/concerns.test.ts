import { describe, expect, it } from "vitest";
import type { ConcernContext } from "../../../src/core/analysis/concernRule.ts";
import { roadsDiffer } from "../../../src/core/analysis/concerns/roadsDiffer.ts";
import { derive } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";
import { CONCERN_CODES, concernMessage, FIT_CONCERN_CODES } from "../../../src/core/messages/index.ts";
import { RECORD_CONCERN_CODES } from "../../../src/core/messages/recordConcernMessages.ts";
import { orderedLine } from "../case/orderedLine.ts";
import { caseFixture } from "./caseFixture.ts";
import { phenytoinCase } from "./phenytoinCase.ts";

const base = caseFixture();
const level = (change: Partial<Case["levels"][number]> = {}): Case["levels"][number] => ({
  id: "l",
  at: "2026-03-04T07:30:00+00:00",
  quantity: { value: 6, unit: "mg/L" },
  kind: "measured",
  ...change,
});
const line = (change: Partial<Case["given"][number]> = {}) => orderedLine({ id: "x", ...change });
const option = (lines: Case["given"], id = "A"): Case["options"][number] => ({ id, label: "", chosen: false, lines });
const record = base.medicine;

function phenytoin(mg: number): Case {
  const medicine = recordById("phenytoin")!;
  const product = medicine.products.find((each) => each.release === "modified")!;
  return {
    ...base,
    medicine,
    given: [],
    options: [option([line({ product: product.id, amount: { value: mg, unit: "mg" } })])],
  };
}

function digoxin(at: string): Case {
  // Without the record's own earliest time, which goes before what its rates would give.
  const { earliestSample: _, ...medicine } = recordById("digoxin")!;
  const tablet = medicine.products.find((each) => each.form === "tablet")!;
  const amount = { value: 125, unit: "ug" } as const;
  return {
    ...base,
    medicine,
    given: [
      line({
        id: "g",
        product: tablet.id,
        amount,
        start: "2026-03-01T08:00:00+00:00",
        repeat: { every: { value: 24, unit: "h" }, count: 4 },
      }),
    ],
    options: [],
    levels: [level({ at, quantity: { value: 0.8, unit: "ng/mL" } })],
  };
}

/** An option every so many hours, the window for a level 11.5 to 12.5 h after a dose. */
function everyHours(hours: number): Case {
  const drawn = (value: number) => ({ value, unit: "h" as const });
  return {
    ...base,
    window: { ...base.window!, quantity: "trough", drawFrom: drawn(11.5), drawTo: drawn(12.5) },
    options: [option([line({ repeat: { every: { value: hours, unit: "h" } } })])],
  };
}

const again = (given: Case["given"][number]) => ({ ...given, id: `${given.id}-again` });
/** The same doses a minute on: near, but not at one time. */
const later = (given: Case["given"][number]) => ({ ...again(given), start: "2026-03-01T08:01:00+00:00" });

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
  ["window-hour-never", everyHours(8), everyHours(12)],
  ["phenytoin-albumin", phenytoinCase(8.4, 3.1), phenytoinCase(8.4, 4.5)],
  [
    "doses-same-time",
    { ...base, given: [...base.given, ...base.given.map(again)] },
    { ...base, given: [...base.given, ...base.given.map(later)] },
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
  [
    "first-dose-late",
    { ...base, options: [option([line({ start: "2026-03-05T08:00:00+00:00" })])] },
    { ...base, options: [option([line({ start: "2026-03-04T20:00:00+00:00" })])] },
  ],
  ["never-steady", phenytoin(500), phenytoin(150)],
  ["level-while-distributing", digoxin("2026-03-04T10:00:00+00:00"), digoxin("2026-03-04T07:30:00+00:00")],
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
    // "roads-differ" can't be raised by any case while the program is right; it has a test of its own.
    // Those about a fit and those from the record have tables of their own, in fitConcerns.test.ts and recordConcerns.test.ts.
    const others = CONCERN_CODES.filter(
      (code) => !FIT_CONCERN_CODES.includes(code) && !RECORD_CONCERN_CODES.includes(code),
    );
    expect([...TABLE.map(([code]) => code), "roads-differ"].sort()).toEqual([...others].sort());
  });

  it.each(TABLE)("%s reads as whole sentences with nothing left open", (code, raises) => {
    for (const concern of derive(raises).concerns.filter((each) => each.code === code)) {
      const { title, text } = concernMessage(concern);
      expect(title).not.toMatch(/undefined|NaN|null|\[object/);
      expect(text).not.toMatch(/undefined|NaN|null|\[object/);
      expect(text).toMatch(/[.?]$/);
    }
  });

  it("two roads that differ are said in the gravest words, and agreement is not mentioned", () => {
    const context = (worst: number) =>
      ({ crossCheck: { worst, where: "A", isAgreed: worst <= 1e-6 } }) as unknown as ConcernContext;
    expect(roadsDiffer(context(1e-9))).toEqual([]);
    const [found] = roadsDiffer(context(0.02));
    expect(found).toMatchObject({ code: "roads-differ", gravity: "stop" });
    expect(concernMessage(found!).text).toContain("option A");
  });

  it("doses at one time are counted and the first is named, of the given lane and of an option; missed ones and other products are not", () => {
    const said = (value: Case) =>
      derive(value).concerns.flatMap((each) => (each.code === "doses-same-time" ? [concernMessage(each)] : []));
    const twice = { ...base, given: [...base.given, ...base.given.map(again)] };
    expect(said(twice)).toEqual([
      {
        title: "Doses given: 7 times two doses of one product stand at one time",
        text: "First at Sun 1 March, 08:00. Entered twice, or meant? Every one of them is counted, and what the levels say is read from them.",
      },
    ]);
    const loading = [line(), line({ id: "y", repeat: { every: { value: 12, unit: "h" }, count: 1 } })];
    expect(said({ ...base, options: [option(loading), option([line()], "B")] })).toEqual([
      {
        title: "Option A: two doses of one product stand at one time",
        text: "At Wed 4 March, 20:00. Entered twice, or meant? Every one of them is counted.",
      },
    ]);
    const missed = Array.from({ length: 7 }, (_, index) => ({ index, status: "missed" as const }));
    expect(said({ ...base, given: [...base.given, { ...again(base.given[0]!), except: missed }] })).toEqual([]);
    expect(said({ ...base, given: [...base.given, { ...again(base.given[0]!), product: "tablet" }] })).toEqual([]);
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
