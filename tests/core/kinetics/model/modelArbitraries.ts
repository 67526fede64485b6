import fc from "fast-check";
import type {
  Absorption,
  Dose,
  ModelDisposition,
  ModelHistory,
  ModelInput,
} from "../../../../src/core/kinetics/index.ts";

/** Histories of invented medicines, within and somewhat beyond what real ones are. */
export const RUNS = { seed: 40302, numRuns: 150 };

export const KINDS = ["one-compartment", "two-compartment", "saturable"] as const;
export type Kind = (typeof KINDS)[number];
export const LINEAR_KINDS = ["one-compartment", "two-compartment"] as const;

/**
 * Evenly over [min, max]. Not `fc.double`: that is even over the bit patterns of doubles, so that nearly all of its numbers lie
 * close to 0, and nearly all powers of ten made of them close to 1.
 */
export const even = (min: number, max: number) =>
  fc.integer({ min: 0, max: 1_000_000 }).map((n) => min + ((max - min) * n) / 1_000_000);

export const powerOfTen = (min: number, max: number) => even(min, max).map((x) => 10 ** x);

/** Quarter hours, so that shifting and splitting times rounds nothing. */
export const quarter = (min: number, max: number) => fc.integer({ min: min * 4, max: max * 4 }).map((n) => n / 4);

const firstOrder = powerOfTen(-1.7, 0.8).map((ka) => ({ kind: "first-order", ka }) as const);
const zeroOrder = quarter(1, 40).map((duration) => ({ kind: "zero-order", duration }) as const);
const mixed = fc
  .record({
    fastFraction: even(0, 1),
    fastKa: powerOfTen(-0.5, 0.8),
    slow: fc.oneof(firstOrder, zeroOrder),
    slowLag: fc.oneof(fc.constant(0), quarter(0, 6)),
  })
  .map((parts) => ({ kind: "mixed", ...parts }) as const);

export const absorption: fc.Arbitrary<Absorption> = fc.oneof(firstOrder, zeroOrder, mixed);

const volume = even(5, 200);
const rate = powerOfTen(-2, 0);

const dispositions: Record<Kind, fc.Arbitrary<ModelDisposition>> = {
  "one-compartment": fc
    .record({ volume, rate })
    .map((d) => ({ kind: "one-compartment", volume: d.volume, clearance: d.rate * d.volume })),
  "two-compartment": fc
    .record({ volume, rate, exchange: powerOfTen(-2, 0.5), ratio: powerOfTen(-1, 1.3) })
    .map((d) => ({
      kind: "two-compartment",
      volume: d.volume,
      clearance: d.rate * d.volume,
      exchange: d.exchange * d.volume,
      peripheralVolume: d.ratio * d.volume,
    })),
  saturable: fc
    .record({ volume, vmax: even(5, 80), km: powerOfTen(-0.5, 1.5) })
    .map((d) => ({ kind: "saturable", ...d })),
};

export const dispositionOf = (kind: Kind) => dispositions[kind];

export const doses: fc.Arbitrary<Dose[]> = fc
  .array(fc.record({ time: quarter(0, 120), amount: fc.integer({ min: 1, max: 800 }) }), { minLength: 1, maxLength: 8 })
  .map((list) => list.sort((a, b) => a.time - b.time));

export const input: fc.Arbitrary<ModelInput> = fc.record({
  absorption,
  bioavailability: even(0.1, 1),
  lag: fc.oneof(fc.constant(0), quarter(0, 3)),
  doses,
});

/** One to three products, one to three dispositions one after another. */
export const historyOf = (kind: Kind, mostSpans = 3): fc.Arbitrary<ModelHistory> =>
  fc
    .record({
      inputs: fc.array(input, { minLength: 1, maxLength: 3 }),
      list: fc.array(dispositionOf(kind), { minLength: 1, maxLength: mostSpans }),
      starts: fc.uniqueArray(quarter(1, 130), { minLength: 2, maxLength: 2 }),
    })
    .map(({ inputs, list, starts }) => {
      const from = [Number.NEGATIVE_INFINITY, ...starts.sort((a, b) => a - b)];
      return { inputs, dispositions: list.map((disposition, i) => ({ from: from[i]!, disposition })) };
    });

export const times = fc
  .array(quarter(-5, 200), { minLength: 1, maxLength: 25 })
  .map((list) => list.sort((a, b) => a - b));

/** mg that reach the circulation, all doses together. */
export function absorbedOf({ inputs }: ModelHistory): number {
  return inputs.reduce(
    (sum, { bioavailability, doses: list }) =>
      sum + list.reduce((part, dose) => part + bioavailability * dose.amount, 0),
    0,
  );
}

/** Every quarter hour: dense enough to know the largest level well. */
export const EVERY_QUARTER = Array.from({ length: 4 * 205 }, (_, i) => i / 4 - 5);
