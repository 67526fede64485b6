import { describe, expect, test } from "vitest";
import {
  type Absorption,
  type ModelDisposition,
  type ModelHistory,
  modelAmounts,
  modelProfile,
  modelSteadyState,
} from "../../../../src/core/kinetics/index.ts";

const DOSES = [
  { time: 0, amount: 400 },
  { time: 9, amount: 200 },
  { time: 24, amount: 400 },
];
const AT = Array.from({ length: 241 }, (_, i) => i / 4);
const ONE = { kind: "one-compartment", clearance: 3, volume: 30 } as const;

const historyOf = (disposition: ModelDisposition, absorption: Absorption, lag = 0.5): ModelHistory => ({
  dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition }],
  inputs: [{ absorption, bioavailability: 0.8, lag, doses: DOSES }],
});

/** Largest difference over the largest level. */
function difference(a: ModelHistory, b: ModelHistory): number {
  const left = modelProfile(a, AT);
  const right = modelProfile(b, AT);
  return Math.max(...left.map((level, i) => Math.abs(level - right[i]!))) / Math.max(...left);
}

const FIRST = { kind: "first-order", ka: 0.7 } as const;
const ZERO = { kind: "zero-order", duration: 5 } as const;
const MIXED = {
  kind: "mixed",
  fastFraction: 0.4,
  fastKa: 1.5,
  slow: { kind: "first-order", ka: 0.1 },
  slowLag: 2,
} as const;
const ABSORPTIONS = [FIRST, ZERO, MIXED, { ...MIXED, slow: ZERO }] as const;

describe.each(ABSORPTIONS)("absorption %j", (absorption) => {
  test("two compartments with next to no exchange are one: the difference shrinks with the exchange", () => {
    const two = (exchange: number) =>
      historyOf({ kind: "two-compartment", clearance: 3, volume: 30, exchange, peripheralVolume: 50 }, absorption);
    const one = historyOf(ONE, absorption);
    expect(difference(one, two(1e-3))).toBeLessThanOrEqual(1e-2);
    expect(difference(one, two(1e-3))).toBeGreaterThan(1e-5);
    expect(difference(one, two(1e-12))).toBeLessThanOrEqual(1e-11);
  });

  test("two compartments with very fast exchange are one of both volumes", () => {
    const two = (exchange: number) =>
      historyOf({ kind: "two-compartment", clearance: 3, volume: 10, exchange, peripheralVolume: 20 }, absorption);
    expect(difference(historyOf(ONE, absorption), two(1e9))).toBeLessThanOrEqual(1e-7);
  });

  test("saturable elimination far below Km is one compartment with CL = Vmax/Km", () => {
    const saturable = (km: number) => historyOf({ kind: "saturable", vmax: 3 * km, km, volume: 30 }, absorption);
    const one = historyOf(ONE, absorption);
    expect(difference(one, saturable(1e3))).toBeGreaterThan(1e-4);
    expect(difference(one, saturable(1e6))).toBeLessThanOrEqual(1e-4);
    expect(difference(one, saturable(1e14))).toBeLessThanOrEqual(1e-12);
  });
});

describe("limits of the input", () => {
  const dispositions: ModelDisposition[] = [
    ONE,
    { kind: "two-compartment", clearance: 3, volume: 20, exchange: 6, peripheralVolume: 50 },
    { kind: "saturable", vmax: 40, km: 6, volume: 30 },
  ];

  test.each(dispositions)(
    "$kind: a very short zero-order input, and a very fast first-order one, are both a bolus",
    (disposition) => {
      const short = (duration: number) => historyOf(disposition, { kind: "zero-order", duration }, 0.6);
      const fast = (ka: number) => historyOf(disposition, { kind: "first-order", ka }, 0.6);
      expect(difference(short(1e-3), fast(1e3))).toBeGreaterThan(1e-6);
      expect(difference(short(1e-9), fast(1e9))).toBeLessThanOrEqual(1e-8);
    },
  );

  test.each(dispositions)(
    "$kind: mixed with all of it fast is first-order, with none of it fast the slow part alone",
    (disposition) => {
      const fast = historyOf(disposition, { ...MIXED, fastFraction: 1 });
      expect(difference(fast, historyOf(disposition, { kind: "first-order", ka: 1.5 }))).toBe(0);
      for (const slow of [{ kind: "first-order", ka: 0.1 }, ZERO] as const) {
        const late = historyOf(disposition, { ...MIXED, slow, fastFraction: 0 });
        expect(difference(late, historyOf(disposition, slow, 2.5))).toBe(0);
      }
    },
  );

  test.each(dispositions)(
    "$kind: mixed is its two parts taken as two products, to 1e-13 of the largest level",
    (disposition) => {
      const whole = historyOf(disposition, { ...MIXED, slow: ZERO });
      const [input] = whole.inputs;
      const parts: ModelHistory = {
        ...whole,
        inputs: [
          { ...input!, absorption: { kind: "first-order", ka: 1.5 }, bioavailability: 0.8 * 0.4 },
          { ...input!, absorption: ZERO, bioavailability: 0.8 * 0.6, lag: 2.5 },
        ],
      };
      expect(difference(whole, parts)).toBeLessThanOrEqual(1e-13);
    },
  );

  test("a zero-order input longer than the dosing interval: at steady state a constant input, and a constant level", () => {
    const inputs = [
      {
        absorption: { kind: "zero-order", duration: 36 },
        bioavailability: 0.5,
        lag: 3,
        doses: [{ time: 0, amount: 240 }],
      },
    ] as const;
    for (const disposition of dispositions) {
      const steady = modelSteadyState(disposition, inputs, 12);
      if (steady.status === "none") throw new Error("below the capacity");
      // 10 mg/h go in: C = 10/3, and Km·R/(Vmax − R) = 2.
      const level = disposition.kind === "saturable" ? 2 : 10 / 3;
      for (const figure of ["peak", "lowest", "average"] as const) {
        expect(Math.abs(steady[figure] / level - 1)).toBeLessThanOrEqual(1e-13);
      }
    }
  });

  test("a share of 0 that reaches the circulation gives 0 throughout", () => {
    for (const disposition of dispositions) {
      const history = historyOf(disposition, { ...MIXED, slow: ZERO });
      const none = { ...history, inputs: history.inputs.map((input) => ({ ...input, bioavailability: 0 })) };
      expect([...modelProfile(none, AT)]).toEqual(AT.map(() => 0));
      expect([...modelAmounts(none, AT).gut]).toEqual(AT.map(() => 0));
    }
  });
});

describe("a change of clearance or volume", () => {
  const changed = (from: number, later: ModelDisposition): ModelHistory => {
    const history = historyOf(ONE, ZERO);
    return { ...history, dispositions: [...history.dispositions, { from, disposition: later }] };
  };

  test("before it the levels are those without it; after it they follow from the amounts then in the body", () => {
    const history = changed(12, { ...ONE, clearance: 1.5 });
    const before = AT.filter((time) => time <= 12);
    expect(modelProfile(history, before)).toEqual(modelProfile(historyOf(ONE, ZERO), before));
    // From 17 h, when the dose of 9.5 h is all in, until 24.5 h nothing comes in: half the rate constant.
    const [early, late] = modelProfile(history, [17, 24]);
    expect(Math.abs(late! / early! / Math.exp(-0.05 * 7) - 1)).toBeLessThanOrEqual(1e-14);
  });

  test("the amount carries over and the level jumps: just before at the instant itself", () => {
    const history = changed(20, { ...ONE, clearance: 3, volume: 15 });
    const [at, after] = modelProfile(history, [20, 20 + 1e-9]);
    expect(Math.abs(after! / at! - 2)).toBeLessThanOrEqual(1e-8);
    const { body } = modelAmounts(history, [20, 20 + 1e-9]);
    expect(Math.abs(body[1]! / body[0]! - 1)).toBeLessThanOrEqual(1e-8);
  });
});
