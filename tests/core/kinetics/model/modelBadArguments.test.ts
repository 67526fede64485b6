import { describe, expect, test } from "vitest";
import * as core from "../../../../src/core/kinetics/index.ts";

const ONE = { kind: "one-compartment", clearance: 3, volume: 30 } as const;
const TWO = { kind: "two-compartment", clearance: 3, volume: 20, exchange: 6, peripheralVolume: 50 } as const;
const SATURABLE = { kind: "saturable", vmax: 20, km: 4, volume: 45 } as const;
const FIRST = { kind: "first-order", ka: 1 } as const;
const ZERO = { kind: "zero-order", duration: 4 } as const;
const MIXED = { kind: "mixed", fastFraction: 0.4, fastKa: 1.5, slow: ZERO, slowLag: 2 } as const;
const INPUT = { absorption: FIRST, bioavailability: 0.9, lag: 0.5, doses: [{ time: 0, amount: 100 }] };
const ALWAYS = Number.NEGATIVE_INFINITY;

const historyOf = (disposition: core.ModelDisposition, input: Partial<core.ModelInput> = {}): core.ModelHistory => ({
  dispositions: [{ from: ALWAYS, disposition }],
  inputs: [{ ...INPUT, ...input }],
});

/** Every function that takes a history; the two roads must refuse the same. */
const ON_HISTORY: Record<string, (history: core.ModelHistory) => unknown> = {
  modelProfile: (history) => core.modelProfile(history, [1]),
  modelAmounts: (history) => core.modelAmounts(history, [1]),
  modelExposure: (history) => core.modelExposure(history, 0, 1),
  crossCheck: (history) => core.crossCheck(history, [1]),
  crossCheckExposure: (history) => core.crossCheckExposure(history, 0, 1),
};

const NOT_POSITIVE = [0, -1, Number.NaN, Number.POSITIVE_INFINITY];
const POSITIVE = "above 0, 1e-30 to 1e+30";

const figures = (
  disposition: core.ModelDisposition,
  units: Record<string, string>,
): [string, core.ModelHistory, string][] =>
  Object.entries(units).flatMap(([figure, unit]) =>
    NOT_POSITIVE.map((value): [string, core.ModelHistory, string] => [
      `${disposition.kind} ${figure} ${value}`,
      historyOf({ ...disposition, [figure]: value } as core.ModelDisposition),
      `history.dispositions[0].disposition.${figure} is ${value} ${unit}; allowed: ${POSITIVE}`,
    ]),
  );

const absorptions = (
  absorption: core.Absorption,
  figure: string,
  values: readonly number[],
  unit: string,
  allowed: string,
): [string, core.ModelHistory, string][] =>
  values.map((value) => {
    const bad =
      figure.startsWith("slow.") && absorption.kind === "mixed"
        ? { ...absorption, slow: { ...absorption.slow, [figure.slice(5)]: value } }
        : { ...absorption, [figure]: value };
    return [
      `${absorption.kind} ${figure} ${value}`,
      historyOf(ONE, { absorption: bad as core.Absorption }),
      `history.inputs[0].absorption.${figure} is ${value}${unit}; allowed: ${allowed}`,
    ];
  });

const CASES: [string, core.ModelHistory, string][] = [
  ...figures(ONE, { clearance: "L/h", volume: "L" }),
  ...figures(TWO, { clearance: "L/h", volume: "L", exchange: "L/h", peripheralVolume: "L" }),
  ...figures(SATURABLE, { vmax: "mg/h", km: "mg/L", volume: "L" }),
  ...absorptions(FIRST, "ka", NOT_POSITIVE, " /h", POSITIVE),
  ...absorptions(ZERO, "duration", NOT_POSITIVE, " h", POSITIVE),
  ...absorptions(MIXED, "fastKa", NOT_POSITIVE, " /h", POSITIVE),
  ...absorptions(MIXED, "fastFraction", [-0.1, 1.1, Number.NaN], "", "0 to 1"),
  ...absorptions(MIXED, "slowLag", [-1, Number.NaN, Number.POSITIVE_INFINITY], " h", "0 to 1e+30"),
  ...absorptions(MIXED, "slow.duration", NOT_POSITIVE, " h", POSITIVE),
  ...absorptions({ ...MIXED, slow: FIRST }, "slow.ka", NOT_POSITIVE, " /h", POSITIVE),
  ...[-0.1, 1.1, Number.NaN].map((value): [string, core.ModelHistory, string] => [
    `bioavailability ${value}`,
    historyOf(TWO, { bioavailability: value }),
    `history.inputs[0].bioavailability is ${value}; allowed: 0 to 1`,
  ]),
  ...[-1, Number.NaN].map((value): [string, core.ModelHistory, string] => [
    `lag ${value}`,
    historyOf(TWO, { lag: value }),
    `history.inputs[0].lag is ${value} h; allowed: 0 to 1e+30`,
  ]),
  ...[-1, Number.NaN, Number.POSITIVE_INFINITY].map((value): [string, core.ModelHistory, string] => [
    `amount ${value}`,
    historyOf(SATURABLE, { doses: [{ time: 0, amount: value }] }),
    `history.inputs[0].doses[0].amount is ${value} mg; allowed: 0, or 1e-30 to 1e+30`,
  ]),
  [
    "time NaN",
    historyOf(SATURABLE, { doses: [{ time: Number.NaN, amount: 1 }] }),
    "history.inputs[0].doses[0].time is NaN h; allowed: -1e+30 to 1e+30",
  ],
  [
    "unsorted doses",
    historyOf(ONE, {
      doses: [
        { time: 5, amount: 1 },
        { time: 4, amount: 1 },
      ],
    }),
    "history.inputs[0].doses[1].time is 4 h; allowed: not before that of the dose before it, 5 h",
  ],
  ["no disposition", { dispositions: [], inputs: [INPUT] }, "history.dispositions.length is 0; allowed: 1 or more"],
  [
    "unsorted spans",
    {
      dispositions: [
        { from: ALWAYS, disposition: ONE },
        { from: 9, disposition: ONE },
        { from: 9, disposition: ONE },
      ],
      inputs: [INPUT],
    },
    "history.dispositions[2].from is 9 h; allowed: after that of the span before it, 9 h",
  ],
  [
    "a span from NaN",
    {
      dispositions: [
        { from: ALWAYS, disposition: ONE },
        { from: Number.NaN, disposition: ONE },
      ],
      inputs: [INPUT],
    },
    "history.dispositions[1].from is NaN h; allowed: -1e+30 to 1e+30",
  ],
  [
    "a dose before the first span",
    { dispositions: [{ from: 1, disposition: ONE }], inputs: [INPUT] },
    "history.inputs[0].doses[0].time is 0 h; allowed: not before the first span, 1 h",
  ],
  [
    "two kinds in one history",
    {
      dispositions: [
        { from: ALWAYS, disposition: ONE },
        { from: 9, disposition: SATURABLE },
      ],
      inputs: [INPUT],
    },
    "history.dispositions[1].disposition.kind is saturable; allowed: the kind of the first, one-compartment",
  ],
  [
    "an unknown kind of disposition",
    historyOf({ ...ONE, kind: "three-compartment" } as unknown as core.ModelDisposition),
    "history.dispositions[0].disposition.kind is three-compartment; allowed: one-compartment, saturable, two-compartment",
  ],
  [
    "an unknown kind of absorption",
    historyOf(ONE, { absorption: { kind: "transit" } as unknown as core.Absorption }),
    "history.inputs[0].absorption.kind is transit; allowed: first-order or zero-order",
  ],
];

describe.each(CASES)("%s", (_, history, message) => {
  test.each(Object.entries(ON_HISTORY))(
    "%s refuses it, naming argument, value, unit and what is allowed",
    (_name, call) => {
      expect(() => call(history)).toThrow(new RangeError(message));
    },
  );
});

test.each(Object.entries(ON_HISTORY))("%s takes good histories of every kind", (_, call) => {
  for (const disposition of [ONE, TWO, SATURABLE]) {
    for (const absorption of [FIRST, ZERO, MIXED]) {
      expect(() => call(historyOf(disposition, { absorption }))).not.toThrow();
    }
  }
});

describe("other arguments", () => {
  const history = historyOf(TWO);

  test.each([
    [[2, 1], "times[1] is 1 h; allowed: not before the time before it, 2 h"],
    [[Number.NaN], "times[0] is NaN h; allowed: any finite number"],
  ])("times %j", (times, message) => {
    expect(() => core.modelProfile(history, times)).toThrow(new RangeError(message));
    expect(() => core.modelAmounts(history, times)).toThrow(new RangeError(message));
    expect(() => core.crossCheck(history, times)).toThrow(new RangeError(message));
    expect(() => core.modelSteadyProfile(TWO, [INPUT], 24, times)).toThrow(new RangeError(message));
  });

  test.each([
    [5, 5, undefined, "to is 5 h; allowed: after from, 5 h"],
    [Number.NaN, 5, undefined, "from is NaN h; allowed: -1e+30 to 1e+30"],
    [0, 5, { low: 3, high: 2 }, "window.low is 3 mg/L; allowed: at most window.high, 2 mg/L"],
    [0, 5, { low: -1, high: 2 }, "window.low is -1 mg/L; allowed: a finite number, 0 or more"],
  ] as const)("exposure from %d to %d, window %j", (from, to, window, message) => {
    expect(() => core.modelExposure(history, from, to, window)).toThrow(new RangeError(message));
    expect(() => core.crossCheckExposure(history, from, to, window)).toThrow(new RangeError(message));
  });

  test("an input too short to be told from its instant", () => {
    const late = historyOf(TWO, {
      absorption: { kind: "zero-order", duration: 1e-28 },
      lag: 0.3,
      doses: [{ time: 1e15, amount: 1 }],
    });
    expect(() => core.modelProfile(late, [1])).toThrow(/^absorption\.duration is 1e-28 h; allowed: long enough/);
  });

  test("saturable elimination too fast to be followed", () => {
    const quick = historyOf({ ...SATURABLE, vmax: 1e9 }, { absorption: { kind: "first-order", ka: 0.01 } });
    expect(() => core.modelProfile(quick, [900])).toThrow(/^vmax \/ \(km × volume\) is 5555555\.\d+ \/h; allowed: /);
  });
});

test("where the dose is: waiting for its lag, in the gut, in the body, gone", () => {
  const history = historyOf(ONE, {
    absorption: { ...MIXED, fastFraction: 0.5 },
    bioavailability: 0.5,
    lag: 1,
    doses: [{ time: 0, amount: 800 }],
  });
  const { gut, body, peripheral, eliminated } = core.modelAmounts(history, [0, 0.5, 1, 3, 5, 500]);
  // At its very instant a dose has not been taken; the slow half, 200 mg, goes in at 50 mg/h from 3 h on.
  expect([...gut].slice(0, 3)).toEqual([0, 400, 400]);
  expect(Math.abs(gut[3]! - (200 + 200 * Math.exp(-3)))).toBeLessThanOrEqual(1e-12);
  expect(Math.abs(gut[4]! - (100 + 200 * Math.exp(-6)))).toBeLessThanOrEqual(1e-12);
  expect(gut[5]).toBeLessThanOrEqual(1e-300);
  expect([...body].slice(0, 3)).toEqual([0, 0, 0]);
  expect([...peripheral]).toEqual([0, 0, 0, 0, 0, 0]);
  expect(Math.abs(eliminated[5]! - 400)).toBeLessThanOrEqual(1e-12);
});
