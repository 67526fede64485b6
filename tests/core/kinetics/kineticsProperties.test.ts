import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  amountsAfterDose,
  aucAfterDose,
  bothReadings,
  concentrationAfterDose,
  type Dose,
  exposure,
  historyProfile,
  type OralKinetics,
  peakAfterDose,
  profile,
  steadyStateConcentration,
} from "../../../src/core/kinetics/index.ts";
import { even } from "./model/modelArbitraries.ts";
import { relativeError } from "./worstError.ts";

const RUNS = { seed: 20261, numRuns: 300 };

/** Log-uniform over the rates of real medicines and well beyond, half of the pairs near or exactly equal or flip-flop. */
const rate = even(-3, 1.5).map((x) => 10 ** x);
const kinetics: fc.Arbitrary<OralKinetics> = fc
  .record({
    ka: rate,
    ratio: fc.oneof(
      even(-2, 2).map((x) => 10 ** x),
      even(-1e-6, 1e-6).map((x) => 1 + x),
      fc.constant(1),
    ),
    volume: even(1, 500),
    bioavailability: even(0.05, 1),
    lag: fc.oneof(fc.constant(0), even(0, 3)),
  })
  .map(({ ratio, ...rest }) => ({ ...rest, ke: rest.ka * ratio }));

/** Quarter hours, so that shifting and splitting times rounds nothing. */
const quarter = (min: number, max: number) => fc.integer({ min: min * 4, max: max * 4 }).map((n) => n / 4);
const amount = fc.integer({ min: 1, max: 2000 });
const doses: fc.Arbitrary<Dose[]> = fc
  .array(fc.record({ time: quarter(-50, 200), amount }), { minLength: 1, maxLength: 12 })
  .map((list) => list.sort((a, b) => a.time - b.time));
const times = fc.array(quarter(-60, 300), { minLength: 1, maxLength: 20 }).map((list) => list.sort((a, b) => a - b));

const largest = (k: OralKinetics, list: readonly Dose[]) =>
  list.reduce((sum, dose) => sum + peakAfterDose(k, dose.amount), 0);

describe("properties of the oral model", () => {
  it("superposition: a history is the sum of its doses, to 5e-15 of the sum of their peaks", () => {
    fc.assert(
      fc.property(kinetics, doses, times, (k, list, at) => {
        const found = profile(k, list, at);
        for (const [i, t] of at.entries()) {
          const sum = list.reduce((level, d) => level + concentrationAfterDose(k, d.amount, t - d.time), 0);
          expect(Math.abs(found[i]! - sum) / largest(k, list)).toBeLessThanOrEqual(5e-15);
        }
      }),
      RUNS,
    );
  });

  it("dose scaling: twice the doses, exactly twice the levels", () => {
    fc.assert(
      fc.property(kinetics, doses, times, (k, list, at) => {
        const twice = list.map((d) => ({ ...d, amount: 2 * d.amount }));
        const once = profile(k, list, at);
        profile(k, twice, at).forEach((level, i) => {
          // Doubling is exact in binary, but not among the subnormal numbers a sweep passes through on its way to a level below this.
          if (once[i]! > 1e-290) expect(level).toBe(2 * once[i]!);
          else expect(Math.abs(level - 2 * once[i]!)).toBeLessThan(1e-300);
        });
      }),
      RUNS,
    );
  });

  it("time shift: all times later by the same, the same levels to 5e-15 of the largest", () => {
    fc.assert(
      fc.property(kinetics, doses, times, quarter(-5000, 5000), (k, list, at, shift) => {
        const moved = profile(
          k,
          list.map((d) => ({ ...d, time: d.time + shift })),
          at.map((t) => t + shift),
        );
        const found = profile(k, list, at);
        for (let i = 0; i < at.length; i++) {
          expect(Math.abs(moved[i]! - found[i]!) / largest(k, list)).toBeLessThanOrEqual(5e-15);
        }
      }),
      RUNS,
    );
  });

  it("mass balance: gut + body + eliminated is the absorbed dose to 2e-15, and none is negative", () => {
    fc.assert(
      fc.property(kinetics, amount, even(0, 1000), (k, mg, u) => {
        const { gut, body, eliminated } = amountsAfterDose(k, mg, k.lag + u);
        expect(relativeError(gut + body + eliminated, k.bioavailability * mg)).toBeLessThanOrEqual(2e-15);
        expect(Math.min(gut, body, eliminated)).toBeGreaterThanOrEqual(0);
      }),
      RUNS,
    );
  });

  it("flip-flop twin: the other reading gives the same curve, to relative 1e-14, and the same clearance", () => {
    fc.assert(
      fc.property(kinetics, doses, times, amount, (k, list, at, mg) => {
        const { assumed, alternative } = bothReadings(k);
        const twin = { ...k, ka: alternative.ka, ke: alternative.ke, volume: alternative.volume };
        expect(alternative.clearance).toBe(assumed.clearance);
        expect(alternative.flipFlop).toBe(k.ke < k.ka);
        for (const t of at) {
          const level = concentrationAfterDose(k, mg, t);
          if (level > 1e-290)
            expect(relativeError(concentrationAfterDose(twin, mg, t), level)).toBeLessThanOrEqual(1e-14);
        }
        const found = profile(k, list, at);
        const other = profile(twin, list, at);
        for (let i = 0; i < at.length; i++) {
          expect(Math.abs(found[i]! - other[i]!) / largest(k, list)).toBeLessThanOrEqual(1e-14);
        }
      }),
      RUNS,
    );
  });

  it("no level is negative, and none is 0 once absorption has begun", () => {
    fc.assert(
      fc.property(kinetics, doses, times, (k, list, at) => {
        const start = list[0]!.time + k.lag;
        for (const [i, level] of profile(k, list, at).entries()) {
          if (at[i]! <= start) expect(level).toBe(0);
          // 400 h at up to 3,162 /h may underflow.
          else if (Math.max(k.ka, k.ke) * (at[i]! - start) < 700) expect(level).toBeGreaterThan(0);
          else expect(level).toBeGreaterThanOrEqual(0);
        }
      }),
      RUNS,
    );
  });

  it("exposure over [a, c] is that over [a, b] and [b, c]", () => {
    const cuts = fc
      .uniqueArray(quarter(-60, 300), { minLength: 3, maxLength: 3 })
      .map((list) => list.sort((a, b) => a - b));
    fc.assert(
      fc.property(kinetics, doses, cuts, even(0.01, 1), (k, list, [a, b, c], part) => {
        const high = part * largest(k, list);
        const window = { low: high / 3, high };
        const whole = exposure(k, list, a!, c!, window);
        const left = exposure(k, list, a!, b!, window);
        const right = exposure(k, list, b!, c!, window);
        // Both halves carry the state over b, so areas and peaks agree to a few roundings: relative 1e-14.
        expect(Math.abs(left.auc + right.auc - whole.auc)).toBeLessThanOrEqual(1e-14 * whole.auc);
        expect(Math.abs(Math.max(left.peak, right.peak) - whole.peak)).toBeLessThanOrEqual(1e-14 * whole.peak);
        expect(Math.abs(Math.min(left.lowest, right.lowest) - whole.lowest)).toBeLessThanOrEqual(1e-14 * whole.peak);
        for (const part of ["hoursBelow", "hoursWithin", "hoursAbove"] as const) {
          // Where the curve only just touches the window its crossings are known to about the square root of 1e-16 of an hour.
          expect(Math.abs(left[part] + right[part] - whole[part])).toBeLessThanOrEqual(1e-6);
        }
        const sum = whole.hoursBelow + whole.hoursWithin + whole.hoursAbove;
        expect(relativeError(sum, c! - a!)).toBeLessThanOrEqual(2.3e-16);
      }),
      RUNS,
    );
  });

  it("exposure bounds every level in its interval, and its peak is a level", () => {
    fc.assert(
      fc.property(kinetics, doses, times, (k, list, at) => {
        const found = exposure(k, list, -61, 301);
        for (const level of profile(k, list, at)) {
          expect(level).toBeLessThanOrEqual(found.peak * (1 + 2e-15));
          expect(level).toBeGreaterThanOrEqual(found.lowest * (1 - 2e-15));
        }
        expect(Math.abs(profile(k, list, [found.timeOfPeak])[0]! - found.peak)).toBeLessThanOrEqual(1e-12 * found.peak);
      }),
      RUNS,
    );
  });

  it("one course is profile, to the last bit; courses split by product give the same to 5e-15 of the largest", () => {
    fc.assert(
      fc.property(kinetics, doses, times, (k, list, at) => {
        const found = profile(k, list, at);
        expect([...historyProfile(k, [{ ...k, doses: list }], at)]).toEqual([...found]);
        const odd = { ...k, doses: list.filter((_, i) => i % 2 === 1) };
        const even = { ...k, doses: list.filter((_, i) => i % 2 === 0) };
        const split = historyProfile(k, [odd, even], at);
        for (let i = 0; i < at.length; i++) {
          expect(Math.abs(split[i]! - found[i]!) / largest(k, list)).toBeLessThanOrEqual(5e-15);
        }
      }),
      RUNS,
    );
  });

  it("splitting a dose in two changes nothing, to 1e-15 of the largest", () => {
    fc.assert(
      fc.property(kinetics, doses, times, fc.nat(), (k, list, at, pick) => {
        const i = pick % list.length;
        const half = { time: list[i]!.time, amount: list[i]!.amount / 2 };
        const found = profile(k, list, at);
        const split = profile(k, [...list.slice(0, i), half, half, ...list.slice(i + 1)], at);
        for (let j = 0; j < at.length; j++) {
          expect(Math.abs(split[j]! - found[j]!) / largest(k, list)).toBeLessThanOrEqual(1e-15);
        }
      }),
      RUNS,
    );
  });

  it("many equal doses come to steady state, to 5e-15 of its level at most", () => {
    fc.assert(
      fc.property(kinetics, amount, quarter(4, 48), even(0, 1), (k, mg, interval, part) => {
        const slow = Math.min(k.ka, k.ke);
        const n = Math.ceil((45 / slow + k.lag) / interval) + 1;
        fc.pre(n < 20_000);
        const list = Array.from({ length: n }, (_, i) => ({ time: (i + 1 - n) * interval, amount: mg }));
        const s = part * interval;
        const wanted = steadyStateConcentration(k, mg, interval, s);
        const peak = peakAfterDose(k, mg);
        expect(Math.abs(profile(k, list, [s])[0]! - wanted) / Math.max(peak, wanted)).toBeLessThanOrEqual(5e-15);
      }),
      RUNS,
    );
  });

  it("area over an interval at steady state is the whole area of one dose, to relative 5e-15", () => {
    fc.assert(
      fc.property(kinetics, amount, quarter(4, 48), (k, mg, interval) => {
        const n = Math.ceil((45 / Math.min(k.ka, k.ke) + k.lag) / interval) + 1;
        fc.pre(n < 20_000);
        const list = Array.from({ length: n }, (_, i) => ({ time: (i + 1 - n) * interval, amount: mg }));
        expect(relativeError(exposure(k, list, 0, interval).auc, aucAfterDose(k, mg))).toBeLessThanOrEqual(5e-15);
      }),
      RUNS,
    );
  });
});
