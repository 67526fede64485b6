import fc from "fast-check";
import { expect, test } from "vitest";
import * as core from "../../../../src/core/kinetics/index.ts";
import { even, powerOfTen } from "./modelArbitraries.ts";

/** All magnitudes that are let in, with a liking for the edges and for those of medicines. */
const positive = fc.oneof(
  fc.constantFrom(1e-30, 1, 1e30),
  even(-29.999, 29.999).map((x) => 10 ** x),
  powerOfTen(-4, 4),
);
const delay = fc.oneof(fc.constant(0), positive);
const part = fc.oneof(
  { weight: 1, arbitrary: fc.constantFrom(0, 1, 1e-300) },
  { weight: 4, arbitrary: fc.integer({ min: 1, max: 999 }).map((n) => n / 1000) },
);

const simple = fc.oneof(
  positive.map((ka) => ({ kind: "first-order", ka }) as const),
  positive.map((duration) => ({ kind: "zero-order", duration }) as const),
);
const absorption: fc.Arbitrary<core.Absorption> = fc.oneof(
  simple,
  fc
    .record({ fastFraction: part, fastKa: positive, slow: simple, slowLag: delay })
    .map((parts) => ({ kind: "mixed", ...parts }) as const),
);
const dispositions: fc.Arbitrary<[core.ModelDisposition, core.ModelDisposition]> = fc.oneof(
  fc
    .record({ clearance: positive, volume: positive, other: positive })
    .map(({ other, ...d }): [core.ModelDisposition, core.ModelDisposition] => [
      { kind: "one-compartment", ...d },
      { kind: "one-compartment", ...d, clearance: other },
    ]),
  fc
    .record({ clearance: positive, volume: positive, exchange: positive, peripheralVolume: positive, other: positive })
    .map(({ other, ...d }): [core.ModelDisposition, core.ModelDisposition] => [
      { kind: "two-compartment", ...d },
      { kind: "two-compartment", ...d, exchange: other },
    ]),
  fc
    .record({ vmax: positive, km: positive, volume: positive, other: positive })
    .map(({ other, ...d }): [core.ModelDisposition, core.ModelDisposition] => [
      { kind: "saturable", ...d },
      { kind: "saturable", ...d, vmax: other },
    ]),
);

function numbersOf(value: unknown): number[] {
  if (typeof value === "number") return [value];
  if (ArrayBuffer.isView(value)) return [...(value as Float64Array)];
  if (typeof value === "object" && value !== null) return Object.values(value).flatMap(numbersOf);
  return [];
}

test("nothing is ever not a number or negative, at any magnitude: a result or a RangeError", {
  timeout: 120_000,
}, () => {
  const answered = new Map<string, number>();
  const args = fc.record({
    pair: dispositions,
    one: absorption,
    two: absorption,
    bioavailability: part,
    lag: delay,
    mg: fc.oneof(fc.constant(0), positive),
    mg2: positive,
    t: positive,
    period: positive,
    within: even(0, 0.99),
    level: positive,
  });
  fc.assert(
    fc.property(args, ({ pair, one, two, bioavailability, lag, mg, mg2, t, period, within, level }) => {
      const [disposition, later] = pair;
      const product = { bioavailability, lag };
      const history: core.ModelHistory = {
        dispositions: [
          { from: Number.NEGATIVE_INFINITY, disposition },
          { from: t * within, disposition: later },
        ],
        inputs: [
          { ...product, absorption: one, doses: [-t, 0, t].map((time) => ({ time, amount: mg })) },
          { ...product, absorption: two, doses: [{ time: t * within, amount: mg2 }] },
        ],
      };
      const pattern = [
        { ...product, absorption: one, doses: [{ time: 0, amount: mg }] },
        { ...product, absorption: two, doses: [{ time: within * period, amount: mg2 }] },
      ];
      const window = { low: level / 2, high: level };
      const calls: Record<string, () => unknown> = {
        modelProfile: () => core.modelProfile(history, [-t, 0, t * within, t, 1e30]),
        modelAmounts: () => core.modelAmounts(history, [-t, 0, t, 1e30]),
        modelExposure: () => core.modelExposure(history, -t, t, window).hoursAbove,
        modelExposureLate: () => core.modelExposure(history, t, 1e30, window).auc,
        modelSteadyState: () => core.modelSteadyState(disposition, pattern, period),
        modelSteadyProfile: () => core.modelSteadyProfile(disposition, pattern, period, [0, within * period, period]),
        modelTimeToSteadyState: () => core.modelTimeToSteadyState(disposition, pattern, period),
        modelHalfLife: () => core.modelHalfLife(disposition),
        modelBothReadings: () => core.modelBothReadings(disposition, one, bioavailability, lag),
        distributionEnd: () => core.distributionEnd(disposition, one),
      };
      for (const [name, call] of Object.entries(calls)) {
        try {
          const numbers = numbersOf(call());
          answered.set(name, (answered.get(name) ?? 0) + 1);
          expect(
            numbers.every((number) => number >= 0 || number === -t),
            `${name} gave ${numbers.join(" ")}`,
          ).toBe(true);
        } catch (error) {
          if (!(error instanceof RangeError)) throw error;
        }
      }
    }),
    { seed: 3022, numRuns: 400 },
  );
  // The test would pass if everything were refused: most is answered.
  for (const [name, count] of answered) expect(count, name).toBeGreaterThan(130);
  expect(answered.size).toBe(10);
});
