import fc from "fast-check";
import { describe, expect, test } from "vitest";
import {
  type ModelDisposition,
  type ModelInput,
  modelExposure,
  modelHalfLife,
  modelProfile,
  modelSteadyProfile,
  modelSteadyState,
  patternSteadyState,
} from "../../../../src/core/kinetics/index.ts";
import { absorption, dispositionOf, even, KINDS, type Kind, quarter, RUNS } from "./modelArbitraries.ts";

const PERIOD = 24;

const inputs: fc.Arbitrary<ModelInput[]> = fc.array(
  fc
    .record({
      absorption,
      bioavailability: even(0.1, 1),
      lag: fc.oneof(fc.constant(0), quarter(0, 30)),
      doses: fc.array(fc.record({ time: quarter(0, 23), amount: fc.integer({ min: 1, max: 150 }) }), {
        minLength: 1,
        maxLength: 3,
      }),
    })
    .map((one) => ({ ...one, doses: one.doses.sort((a, b) => a.time - b.time) })),
  { minLength: 1, maxLength: 2 },
);

/** The same doses, given for so many periods. */
const repeated = (list: readonly ModelInput[], periods: number): ModelInput[] =>
  list.map((one) => ({
    ...one,
    doses: Array.from({ length: periods }, (_, p) =>
      one.doses.map((dose) => ({ ...dose, time: dose.time + p * PERIOD })),
    ).flat(),
  }));

const absorbedOf = (list: readonly ModelInput[]) =>
  list.reduce((sum, one) => sum + one.doses.reduce((part, dose) => part + one.bioavailability * dose.amount, 0), 0);

/** One that gets to steady state within some two hundred periods. */
const brisk = (kind: Kind) => dispositionOf(kind).filter((d) => (modelHalfLife(d) ?? 0) < 100);

describe.each(KINDS)("steady state of %s", (kind) => {
  test("is what the same doses lead to when they are given long enough, to 1e-9 of the peak", () => {
    let compared = 0;
    fc.assert(
      fc.property(brisk(kind), inputs, (disposition, list) => {
        const steady = modelSteadyState(disposition, list, PERIOD);
        if (disposition.kind === "saturable") {
          // What is missing shrinks about as e^(−Vmax/(Km·V)·(1 − R/Vmax)²·t): close to Vmax it would take years.
          const { vmax, km, volume } = disposition;
          const rate = (vmax / (km * volume)) * (1 - absorbedOf(list) / PERIOD / vmax) ** 2;
          if (absorbedOf(list) / PERIOD >= vmax || rate * 200 * PERIOD < 40) return;
        }
        if (steady.status === "none") throw new Error("there is one below the capacity");
        compared++;
        const periods = 200;
        const history = {
          dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition }],
          inputs: repeated(list, periods),
        };
        const last = (periods - 1) * PERIOD;
        const found = modelExposure(history, last, last + PERIOD);
        for (const figure of ["peak", "lowest", "average"] as const) {
          expect(Math.abs(found[figure] - steady[figure]) / steady.peak, figure).toBeLessThanOrEqual(1e-9);
        }
        const phases = Array.from({ length: 25 }, (_, i) => i);
        const levels = modelSteadyProfile(disposition, list, PERIOD, phases);
        const expected = modelProfile(
          history,
          phases.map((phase) => last + phase),
        );
        for (const [i, level] of levels.entries()) {
          // At the very start the history still has the dose before it only.
          expect(Math.abs(level - expected[i]!) / steady.peak).toBeLessThanOrEqual(1e-9);
        }
      }),
      { ...RUNS, numRuns: 50 },
    );
    expect(compared).toBeGreaterThan(25);
  });

  test("the period gives back what it started from, and any number of periods later it is the same", () => {
    fc.assert(
      fc.property(dispositionOf(kind), inputs, (disposition, list) => {
        const steady = modelSteadyState(disposition, list, PERIOD);
        if (steady.status === "none") return;
        const [back, start, end, later] = modelSteadyProfile(disposition, list, PERIOD, [-19, 5, 29, 5 + 50 * PERIOD]);
        for (const level of [back, end, later]) {
          expect(Math.abs(level! - start!)).toBeLessThanOrEqual(1e-11 * steady.peak);
        }
        expect(steady.lowest).toBeLessThanOrEqual(steady.average * (1 + 1e-12));
        expect(steady.average).toBeLessThanOrEqual(steady.peak * (1 + 1e-12));
      }),
      RUNS,
    );
  });
});

test("linear kinds: the average is dose rate over clearance, to 1e-13", () => {
  fc.assert(
    fc.property(
      fc.oneof(dispositionOf("one-compartment"), dispositionOf("two-compartment")),
      inputs,
      (disposition, list) => {
        if (disposition.kind === "saturable") return;
        const steady = modelSteadyState(disposition, list, PERIOD);
        if (steady.status === "none") throw new Error("a linear kind has one");
        const average = absorbedOf(list) / PERIOD / disposition.clearance;
        expect(Math.abs(steady.average / average - 1)).toBeLessThanOrEqual(1e-13);
      },
    ),
    RUNS,
  );
});

test("one compartment with first-order absorption is patternSteadyState itself", () => {
  const disposition = { kind: "one-compartment", clearance: 3, volume: 30 } as const;
  const doses = [
    { time: 8, amount: 200 },
    { time: 22, amount: 300 },
  ];
  const product = { bioavailability: 0.9, lag: 0.25, doses };
  const { status, ...figures } = modelSteadyState(
    disposition,
    [{ absorption: { kind: "first-order", ka: 1 }, ...product }],
    24,
  );
  expect(status).toBe("settled");
  expect(figures).toEqual(patternSteadyState({ ke: 3 / 30, volume: 30 }, [{ ka: 1, ...product }], 24));
});

describe("saturable elimination", () => {
  const PHENYTOIN_LIKE = { kind: "saturable", vmax: 490 / 24, km: 4, volume: 45.5 } as const;
  const daily = (amount: number): ModelInput[] => [
    { absorption: { kind: "first-order", ka: 0.4 }, bioavailability: 0.92, lag: 0.5, doses: [{ time: 0, amount }] },
  ];

  test.each([20, 100, 300, 400, 460, 500, 530, 532.6, 532.608])(
    "%d mg a day: the mean of Vmax·C/(Km + C) over the period is the dose rate, to 1e-9",
    (amount) => {
      // Gauss–Legendre, five points a piece, between the start of absorption and the next one: none of the core's own integrals.
      const points = [0, 0.5384693101056831, -0.5384693101056831, 0.906179845938664, -0.906179845938664];
      const weights = [
        0.5688888888888889, 0.47862867049936647, 0.47862867049936647, 0.23692688505618908, 0.23692688505618908,
      ];
      const pieces = 600;
      const width = 24 / pieces;
      const at: { time: number; weight: number }[] = [];
      for (let p = 0; p < pieces; p++) {
        for (const [i, x] of points.entries()) {
          at.push({ time: 0.5 + (p + (x + 1) / 2) * width, weight: (weights[i]! * width) / 2 });
        }
      }
      at.sort((a, b) => a.time - b.time);
      const levels = modelSteadyProfile(
        PHENYTOIN_LIKE,
        daily(amount),
        24,
        at.map(({ time }) => time),
      );
      const { vmax, km } = PHENYTOIN_LIKE;
      let eliminated = 0;
      for (const [i, { weight }] of at.entries()) eliminated += (weight * vmax * levels[i]!) / (km + levels[i]!);
      expect(Math.abs(eliminated / (0.92 * amount) - 1)).toBeLessThanOrEqual(1e-9);
    },
  );

  test("at Vmax and above there is no steady state: said as a result, with both rates", () => {
    const doseRate = (0.92 * 540) / 24;
    expect(modelSteadyState(PHENYTOIN_LIKE, daily(540), 24)).toEqual({
      status: "none",
      reason: "dose-rate-at-or-above-vmax",
      doseRate,
      vmax: 490 / 24,
    });
    const exactly = { ...PHENYTOIN_LIKE, vmax: 20 };
    const inputs_ = [{ ...daily(480)[0]!, bioavailability: 1 }];
    expect(modelSteadyState(exactly, inputs_, 24).status).toBe("none");
    expect(() => modelSteadyProfile(PHENYTOIN_LIKE, daily(540), 24, [0])).toThrow(/the dose rate is 20\.7/);
  });

  test("the average rises out of proportion to the dose", () => {
    const average = (amount: number) => {
      const steady = modelSteadyState(PHENYTOIN_LIKE, daily(amount), 24);
      return steady.status === "settled" ? steady.average : Number.NaN;
    };
    expect(average(450) / average(300)).toBeGreaterThan(3);
    // Under intermittent dosing the mean level is never below that of a constant input at the same rate.
    const rate = 0.92 * 450;
    expect(average(450)).toBeGreaterThan((4 * rate) / (490 - rate));
  });
});

describe("bad patterns", () => {
  const disposition: ModelDisposition = { kind: "one-compartment", clearance: 3, volume: 30 };
  const one: ModelInput = {
    absorption: { kind: "zero-order", duration: 4 },
    bioavailability: 1,
    lag: 0,
    doses: [{ time: 0, amount: 100 }],
  };

  test.each([
    [
      [{ ...one, doses: [{ time: 24, amount: 1 }] }],
      24,
      "inputs[0].doses[0].time is 24 h; allowed: 0 to below the period, 24 h",
    ],
    [
      [{ ...one, doses: [{ time: -1, amount: 1 }] }],
      24,
      "inputs[0].doses[0].time is -1 h; allowed: 0 to below the period, 24 h",
    ],
    [[one], 0, "period is 0 h; allowed: above 0, 1e-30 to 1e+30"],
    [[one], Number.NaN, "period is NaN h; allowed: above 0, 1e-30 to 1e+30"],
    [[], 24, "the sum of absorbed doses in the period is 0 mg; allowed: above 0"],
  ] as const)("%j every %d h", (list, period, message) => {
    expect(() => modelSteadyState(disposition, list, period)).toThrow(new RangeError(message));
  });
});
