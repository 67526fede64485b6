import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  historyExposure,
  historyProfile,
  type ModelHistory,
  modelAmounts,
  modelExposure,
  modelProfile,
} from "../../../../src/core/kinetics/index.ts";
import {
  absorbedOf,
  dispositionOf,
  EVERY_QUARTER,
  even,
  historyOf,
  input,
  KINDS,
  LINEAR_KINDS,
  quarter,
  RUNS,
  times,
} from "./modelArbitraries.ts";

const largestOf = (history: ModelHistory) => Math.max(...modelProfile(history, EVERY_QUARTER));

describe.each(KINDS)("properties of %s", (kind) => {
  test("gut, body, peripheral and eliminated add up to F × all doses taken, to 1e-13, and none is negative", () => {
    fc.assert(
      fc.property(historyOf(kind), times, (history, at) => {
        const { gut, body, peripheral, eliminated } = modelAmounts(history, at);
        const total = absorbedOf(history);
        for (const [i, time] of at.entries()) {
          let taken = 0;
          for (const { bioavailability, doses } of history.inputs) {
            for (const dose of doses) if (dose.time < time) taken += bioavailability * dose.amount;
          }
          const sum = gut[i]! + body[i]! + peripheral[i]! + eliminated[i]!;
          expect(Math.abs(sum - taken) / total).toBeLessThanOrEqual(1e-13);
          expect(Math.min(gut[i]!, body[i]!, peripheral[i]!, eliminated[i]!)).toBeGreaterThanOrEqual(0);
        }
      }),
      RUNS,
    );
  });

  test("the level is the body amount over the volume then in force, and never negative", () => {
    fc.assert(
      fc.property(historyOf(kind), times, (history, at) => {
        const { body } = modelAmounts(history, at);
        const levels = modelProfile(history, at);
        const largest = largestOf(history);
        for (const [i, time] of at.entries()) {
          // At the very instant of a change the level is the one just before it.
          const { disposition } = history.dispositions.findLast((span) => span.from < time)!;
          expect(Math.abs(levels[i]! - body[i]! / disposition.volume) / largest).toBeLessThanOrEqual(1e-13);
          expect(levels[i]).toBeGreaterThanOrEqual(0);
        }
      }),
      RUNS,
    );
  });

  test("time shift: all times later by the same, the same levels to 1e-12 of the largest", () => {
    fc.assert(
      fc.property(historyOf(kind), times, quarter(-2000, 2000), (history, at, shift) => {
        const moved: ModelHistory = {
          dispositions: history.dispositions.map((span) => ({ ...span, from: span.from + shift })),
          inputs: history.inputs.map((one) => ({
            ...one,
            doses: one.doses.map((dose) => ({ ...dose, time: dose.time + shift })),
          })),
        };
        const largest = largestOf(history);
        const levels = modelProfile(history, at);
        const movedLevels = modelProfile(
          moved,
          at.map((time) => time + shift),
        );
        for (const [i, level] of levels.entries()) {
          expect(Math.abs(movedLevels[i]! - level) / largest).toBeLessThanOrEqual(1e-12);
        }
      }),
      RUNS,
    );
  });

  test("a change to an equal disposition changes nothing", () => {
    fc.assert(
      fc.property(historyOf(kind, 1), times, quarter(0, 100), (history, at, from) => {
        const { disposition } = history.dispositions[0]!;
        const again = {
          ...history,
          dispositions: [...history.dispositions, { from, disposition: { ...disposition } }],
        };
        expect(modelProfile(again, at)).toEqual(modelProfile(history, at));
      }),
      RUNS,
    );
  });

  test("a split dose, and products in another order, change nothing beyond 1e-12 of the largest level", () => {
    fc.assert(
      fc.property(historyOf(kind), times, (history, at) => {
        const halves = history.inputs.toReversed().map((one) => ({
          ...one,
          doses: one.doses.flatMap((dose) => [
            { ...dose, amount: dose.amount / 2 },
            { ...dose, amount: dose.amount / 2 },
          ]),
        }));
        const largest = largestOf(history);
        const levels = modelProfile(history, at);
        const other = modelProfile({ ...history, inputs: halves }, at);
        for (const [i, level] of levels.entries())
          expect(Math.abs(other[i]! - level) / largest).toBeLessThanOrEqual(1e-12);
      }),
      RUNS,
    );
  });

  test("exposure over [a, c] is that over [a, b] and [b, c] together", () => {
    fc.assert(
      fc.property(
        historyOf(kind),
        fc.uniqueArray(quarter(-10, 220), { minLength: 3, maxLength: 3 }),
        // Below half: at exactly half the upper edge would touch the peak, where rounding decides the hours.
        even(0.05, 0.45),
        (history, ends, part) => {
          const [a, b, c] = ends.sort((x, y) => x - y) as [number, number, number];
          const largest = largestOf(history);
          const window = { low: part * largest, high: 2 * part * largest };
          const whole = modelExposure(history, a, c, window);
          const first = modelExposure(history, a, b, window);
          const second = modelExposure(history, b, c, window);
          expect(whole.hoursBelow + whole.hoursWithin + whole.hoursAbove).toBeCloseTo(c - a, 11);
          expect(Math.abs(first.auc + second.auc - whole.auc)).toBeLessThanOrEqual(1e-12 * largest * (c - a));
          expect(Math.abs(Math.max(first.peak, second.peak) - whole.peak)).toBeLessThanOrEqual(1e-12 * largest);
          expect(Math.abs(Math.min(first.lowest, second.lowest) - whole.lowest)).toBeLessThanOrEqual(1e-12 * largest);
          for (const side of ["hoursBelow", "hoursWithin", "hoursAbove"] as const) {
            expect(Math.abs(first[side] + second[side] - whole[side])).toBeLessThanOrEqual(1e-6);
          }
        },
      ),
      RUNS,
    );
  });
});

describe.each(LINEAR_KINDS)("properties of %s, a linear kind", (kind) => {
  test("dose scaling: twice the doses, exactly twice the levels", () => {
    fc.assert(
      fc.property(historyOf(kind), times, (history, at) => {
        const twice = history.inputs.map((one) => ({
          ...one,
          doses: one.doses.map((dose) => ({ ...dose, amount: 2 * dose.amount })),
        }));
        expect([...modelProfile({ ...history, inputs: twice }, at)]).toEqual(
          [...modelProfile(history, at)].map((level) => 2 * level),
        );
      }),
      RUNS,
    );
  });

  test("superposition: a history is the sum of its doses taken alone, to 1e-12 of the largest level", () => {
    fc.assert(
      fc.property(historyOf(kind), times, (history, at) => {
        const sum = new Float64Array(at.length);
        for (const one of history.inputs) {
          for (const dose of one.doses) {
            const alone = modelProfile({ ...history, inputs: [{ ...one, doses: [dose] }] }, at);
            for (const [i, level] of alone.entries()) sum[i] = sum[i]! + level;
          }
        }
        const largest = largestOf(history);
        for (const [i, level] of modelProfile(history, at).entries()) {
          expect(Math.abs(level - sum[i]!) / largest).toBeLessThanOrEqual(1e-12);
        }
      }),
      RUNS,
    );
  });
});

test("one compartment with first-order absorption is historyProfile and historyExposure, bit for bit", () => {
  fc.assert(
    fc.property(
      dispositionOf("one-compartment"),
      fc.array(input, { minLength: 1, maxLength: 3 }),
      times,
      (disposition, list, at) => {
        if (disposition.kind !== "one-compartment") return;
        const inputs = list.map((one, i) => ({
          ...one,
          absorption: { kind: "first-order", ka: 0.3 * (i + 1) } as const,
        }));
        const history = { dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition }], inputs };
        const plain = { ke: disposition.clearance / disposition.volume, volume: disposition.volume };
        const courses = inputs.map(({ absorption, ...one }) => ({ ...one, ka: absorption.ka }));
        expect(modelProfile(history, at)).toEqual(historyProfile(plain, courses, at));
        const window = { low: 1, high: 4 };
        expect(modelExposure(history, 3, 150, window)).toEqual(historyExposure(plain, courses, 3, 150, window));
      },
    ),
    RUNS,
  );
});

test("superposition does not hold for saturable elimination: the sum of doses taken alone is far off", () => {
  const disposition = { kind: "saturable", vmax: 20, km: 4, volume: 45 } as const;
  const one = (doses: { time: number; amount: number }[]): ModelHistory => ({
    dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition }],
    inputs: [{ absorption: { kind: "first-order", ka: 0.5 }, bioavailability: 1, lag: 0, doses }],
  });
  const doses = Array.from({ length: 10 }, (_, i) => ({ time: 24 * i, amount: 350 }));
  const together = modelProfile(one(doses), [240])[0]!;
  const summed = doses.reduce((sum, dose) => sum + modelProfile(one([dose]), [240])[0]!, 0);
  expect(together / summed).toBeGreaterThan(2);
});
