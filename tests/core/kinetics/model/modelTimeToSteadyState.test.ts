import { describe, expect, test } from "vitest";
import {
  type ModelDisposition,
  type ModelInput,
  modelBothReadings,
  modelHalfLife,
  modelProfile,
  modelTimeToSteadyState,
} from "../../../../src/core/kinetics/index.ts";
import { relativeError } from "../worstError.ts";

const ONE = { kind: "one-compartment", clearance: 3, volume: 30 } as const;
const TWO = { kind: "two-compartment", clearance: 7, volume: 36, exchange: 40, peripheralVolume: 500 } as const;
const SATURABLE = { kind: "saturable", vmax: 20, km: 4, volume: 45 } as const;

const input = (absorption: ModelInput["absorption"], amount = 240): ModelInput => ({
  absorption,
  bioavailability: 1,
  lag: 0,
  doses: [{ time: 0, amount }],
});
const FAST = input({ kind: "first-order", ka: 1 });

describe("time to steady state", () => {
  test("linear kinds: by the slowest rate, relative 1e-15", () => {
    const ninety = Math.log(10);
    const found = (disposition: ModelDisposition, absorption: ModelInput["absorption"], fraction?: number) =>
      modelTimeToSteadyState(disposition, [input(absorption)], 24, fraction);
    expect(relativeError(found(ONE, { kind: "first-order", ka: 1 }).hours, ninety / 0.1)).toBeLessThanOrEqual(1e-15);
    expect(found(ONE, { kind: "first-order", ka: 1 }).slower).toBe("elimination");
    expect(found(ONE, { kind: "first-order", ka: 0.1 }).slower).toBe("elimination");
    expect(relativeError(found(ONE, { kind: "first-order", ka: 0.05 }).hours, ninety / 0.05)).toBeLessThanOrEqual(
      1e-15,
    );
    expect(found(ONE, { kind: "first-order", ka: 0.05 }).slower).toBe("absorption");
    const half = found(ONE, { kind: "first-order", ka: 1 }, 0.5).hours;
    expect(relativeError(half, Math.LN2 / 0.1)).toBeLessThanOrEqual(1e-15);
    const halfLife = modelHalfLife(TWO)!;
    const two = found(TWO, { kind: "first-order", ka: 1 }).hours;
    expect(relativeError(two, (ninety / Math.LN2) * halfLife)).toBeLessThanOrEqual(2e-15);
  });

  test("an input that lasts longer than elimination takes sets the time", () => {
    const quick = { ...ONE, clearance: 30 };
    expect(modelTimeToSteadyState(quick, [input({ kind: "zero-order", duration: 36 })], 12)).toEqual({
      hours: 0.9 * 36,
      slower: "absorption",
    });
  });

  test("a part of a mixed absorption that carries nothing does not count, nor does a product without doses", () => {
    const slow = { kind: "first-order", ka: 0.01 } as const;
    const mixed = { kind: "mixed", fastFraction: 1, fastKa: 1, slow, slowLag: 0 } as const;
    expect(modelTimeToSteadyState(ONE, [input(mixed)], 24)).toEqual(modelTimeToSteadyState(ONE, [FAST], 24));
    expect(modelTimeToSteadyState(ONE, [FAST, { ...input(slow), doses: [] }], 24).slower).toBe("elimination");
  });

  test("saturable: the rule is exact for a constant input into an empty body, to 1e-9 of the level", () => {
    for (const rate of [2, 10, 16, 19]) {
      for (const fraction of [0.5, 0.9]) {
        const constant = input({ kind: "zero-order", duration: 1e5 }, rate * 1e5);
        const { hours, slower } = modelTimeToSteadyState(
          SATURABLE,
          [{ ...FAST, doses: [{ time: 0, amount: rate * 24 }] }],
          24,
          fraction,
        );
        expect(slower).toBe("elimination");
        const [level] = modelProfile(
          { dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition: SATURABLE }], inputs: [constant] },
          [hours],
        );
        expect(relativeError(level!, (fraction * 4 * rate) / (20 - rate))).toBeLessThanOrEqual(1e-9);
      }
    }
  });

  test("no steady state: never", () => {
    expect(modelTimeToSteadyState(SATURABLE, [input({ kind: "first-order", ka: 1 }, 480)], 24)).toEqual({
      hours: Number.POSITIVE_INFINITY,
      slower: "elimination",
    });
  });

  test.each([0, 1, -1, Number.NaN])("a fraction of %d is refused", (fraction) => {
    expect(() => modelTimeToSteadyState(ONE, [FAST], 24, fraction)).toThrow(
      new RangeError(`fraction is ${fraction}; allowed: above 0 and below 1`),
    );
  });
});

test("half-life: ln 2 over the terminal rate; saturable elimination has none", () => {
  expect(modelHalfLife(ONE)).toBe(Math.LN2 / 0.1);
  expect(modelHalfLife(SATURABLE)).toBeNull();
});

describe("both readings", () => {
  test("one compartment with first-order absorption has them", () => {
    const readings = modelBothReadings({ ...ONE, clearance: 2, volume: 10 }, { kind: "first-order", ka: 0.125 }, 1, 0);
    expect(readings?.alternative.volume).toBe(16);
    expect(readings?.assumed.flipFlop).toBe(true);
  });

  test("nothing else does", () => {
    const absorption = { kind: "first-order", ka: 0.125 } as const;
    expect(modelBothReadings(TWO, absorption, 1, 0)).toBeNull();
    expect(modelBothReadings(SATURABLE, absorption, 1, 0)).toBeNull();
    expect(modelBothReadings(ONE, { kind: "zero-order", duration: 3 }, 1, 0)).toBeNull();
  });
});
