import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import {
  distributionEnd,
  type ModelHistory,
  modelAmounts,
  modelExposure,
  modelHalfLife,
  modelProfile,
  modelSteadyProfile,
  modelSteadyState,
  twoCompartmentConstants,
} from "../../../../src/core/kinetics/index.ts";
import { relativeError, WorstError } from "../worstError.ts";

interface Case {
  kind: string;
  clearance: string;
  volume: string;
  exchange: string;
  peripheralVolume: string;
  ka: string;
  dose: string;
  period: string;
  alpha: string;
  beta: string;
  points: { t: string; C: string; peripheral: string; area: string }[];
  steady: { s: string; C: string }[];
}

/** How they were worked out stands in the file: matrix exponentials in 120 digits. */
const { cases } = JSON.parse(
  readFileSync(new URL("../../../fixtures/two_compartment_near.json", import.meta.url), "utf8"),
) as { cases: Case[] };

const dispositionOf = (one: Case) =>
  ({
    kind: "two-compartment",
    clearance: Number(one.clearance),
    volume: Number(one.volume),
    exchange: Number(one.exchange),
    peripheralVolume: Number(one.peripheralVolume),
  }) as const;

const inputOf = (one: Case) =>
  ({
    absorption: { kind: "first-order", ka: Number(one.ka) },
    bioavailability: 1,
    lag: 0,
    doses: [{ time: 0, amount: Number(one.dose) }],
  }) as const;

describe("two compartments whose rates coincide, or nearly: 120-digit references", () => {
  test("levels, peripheral amounts and steady state 1e-15 of the largest, areas and constants 1e-15 relative", () => {
    const worst = new WorstError();
    for (const one of cases) {
      const disposition = dispositionOf(one);
      const history: ModelHistory = {
        dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition }],
        inputs: [inputOf(one)],
      };
      const where = JSON.stringify(one).slice(0, 160);
      const { alpha, beta } = twoCompartmentConstants(disposition);
      worst.note("alpha", relativeError(alpha, Number(one.alpha)), where);
      worst.note("beta", relativeError(beta, Number(one.beta)), where);
      const at = one.points.map(({ t }) => Number(t));
      const levels = modelProfile(history, at);
      const { peripheral } = modelAmounts(history, at);
      const largest = Math.max(...one.points.map(({ C }) => Number(C)));
      const most = Math.max(...one.points.map((point) => Number(point.peripheral)));
      for (const [i, point] of one.points.entries()) {
        worst.note("level", Math.abs(levels[i]! - Number(point.C)) / largest, where);
        worst.note("peripheral", Math.abs(peripheral[i]! - Number(point.peripheral)) / most, where);
        worst.note("area", relativeError(modelExposure(history, 0, at[i]!).auc, Number(point.area)), where);
      }
      const steady = modelSteadyProfile(
        disposition,
        [inputOf(one)],
        Number(one.period),
        one.steady.map(({ s }) => Number(s)),
      );
      const largestSteady = Math.max(...one.steady.map(({ C }) => Number(C)));
      for (const [i, { C }] of one.steady.entries()) {
        worst.note("steady state", Math.abs(steady[i]! - Number(C)) / largestSteady, where);
      }
    }
    worst.report("two compartments");
    for (const figure of ["alpha", "beta", "level", "peripheral", "area", "steady state"]) {
      expect(worst.of(figure), figure).toBeLessThanOrEqual(1e-15);
    }
  });

  test("the textbook partial fractions would fail here: the references can tell", () => {
    let worst = 0;
    for (const one of cases) {
      const { k21, alpha, beta } = twoCompartmentConstants(dispositionOf(one));
      const ka = Number(one.ka);
      const largest = Math.max(...one.points.map(({ C }) => Number(C)));
      for (const { t, C } of one.points) {
        const u = Number(t);
        const sum =
          ((k21 - alpha) / ((beta - alpha) * (ka - alpha))) * Math.exp(-alpha * u) +
          ((k21 - beta) / ((alpha - beta) * (ka - beta))) * Math.exp(-beta * u) +
          ((k21 - ka) / ((alpha - ka) * (beta - ka))) * Math.exp(-ka * u);
        const error = Math.abs((Number(one.dose) * ka * sum) / Number(one.volume) - Number(C)) / largest;
        if (!(error <= worst)) worst = error;
      }
    }
    expect(worst).not.toBeLessThan(0.1);
  });
});

const DIGOXIN_LIKE = {
  kind: "two-compartment",
  clearance: 7,
  volume: 36,
  exchange: 40,
  peripheralVolume: 500,
} as const;

describe("two-compartment constants", () => {
  test("macro constants satisfy their definitions, to 4e-15 relative", () => {
    const c = twoCompartmentConstants(DIGOXIN_LIKE);
    expect(relativeError(c.alpha + c.beta, c.k10 + c.k12 + c.k21)).toBeLessThanOrEqual(4e-15);
    expect(relativeError(c.alpha * c.beta, c.k10 * c.k21)).toBeLessThanOrEqual(4e-15);
    expect(relativeError(c.alpha - c.beta, c.gap)).toBeLessThanOrEqual(4e-15);
    expect(relativeError(c.alphaOverOut, c.alpha - c.k10 - c.k12)).toBeLessThanOrEqual(1e-12);
    expect(relativeError(c.alphaOverBack, c.alpha - c.k21)).toBeLessThanOrEqual(4e-15);
    expect(c.alphaShare + c.betaShare).toBeCloseTo(1, 14);
    // The area under one unit put into the central compartment is 1/k10.
    expect(relativeError(c.alphaShare / c.alpha + c.betaShare / c.beta, 1 / c.k10)).toBeLessThanOrEqual(4e-15);
    expect(c.volumeSteady).toBe(536);
    expect(relativeError(c.volumeTerminal, 7 / c.beta)).toBeLessThanOrEqual(4e-15);
    expect(modelHalfLife(DIGOXIN_LIKE)).toBe(c.betaHalfLife);
  });
});

describe("end of the distribution phase", () => {
  const end = (absorption: Parameters<typeof distributionEnd>[1]) => distributionEnd(DIGOXIN_LIKE, absorption);
  const steepness = (absorption: Parameters<typeof distributionEnd>[1], t: number) => {
    const history: ModelHistory = {
      dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition: DIGOXIN_LIKE }],
      inputs: [{ absorption, bioavailability: 1, lag: 0, doses: [{ time: 0, amount: 1 }] }],
    };
    const [a, b] = modelProfile(history, [t - 1e-4, t + 1e-4]);
    return Math.log(a! / b!) / 2e-4;
  };
  const { beta } = twoCompartmentConstants(DIGOXIN_LIKE);

  test.each([
    [{ kind: "first-order", ka: 100 }],
    [{ kind: "first-order", ka: 1 }],
    [{ kind: "first-order", ka: 0.1 }],
    [{ kind: "zero-order", duration: 6 }],
    [
      {
        kind: "mixed",
        fastFraction: 0.5,
        fastKa: 2,
        slow: { kind: "zero-order", duration: 6 },
        slowLag: 3,
      },
    ],
  ] as const)("%j: there the level falls 1.5 times as fast as in the end, later never faster", (absorption) => {
    const at = end(absorption);
    expect(at).toBeGreaterThan(0);
    expect(relativeError(steepness(absorption, at), 1.5 * beta)).toBeLessThanOrEqual(1e-6);
    for (let t = at + 0.1; t < at + 100; t += 0.5) expect(steepness(absorption, t)).toBeLessThan(1.5 * beta);
  });

  test("an absorption so slow that the level never falls faster than in the end has no distribution phase", () => {
    expect(end({ kind: "first-order", ka: 0.02 })).toBe(0);
    expect(end({ kind: "first-order", ka: 0.005 })).toBe(0);
  });

  test("a slower absorption makes it later, as long as there is one", () => {
    const ends = [10, 3, 1, 0.5, 0.2].map((ka) => end({ kind: "first-order", ka }));
    expect([...ends].sort((a, b) => a - b)).toEqual(ends);
  });

  test("other kinds have none", () => {
    const absorption = { kind: "first-order", ka: 1 } as const;
    expect(distributionEnd({ kind: "one-compartment", clearance: 3, volume: 30 }, absorption)).toBe(0);
    expect(distributionEnd({ kind: "saturable", vmax: 20, km: 4, volume: 45 }, absorption)).toBe(0);
  });
});

describe("turns of a two-compartment level", () => {
  test("a level that falls, rises and falls again between two doses: each turn is found", () => {
    // A quick dose distributes while a slow product still feeds: a dip, then a second, later maximum.
    const history: ModelHistory = {
      dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition: { ...DIGOXIN_LIKE, exchange: 100 } }],
      inputs: [
        { absorption: { kind: "first-order", ka: 8 }, bioavailability: 1, lag: 0, doses: [{ time: 0, amount: 100 }] },
        {
          absorption: { kind: "first-order", ka: 0.05 },
          bioavailability: 1,
          lag: 0,
          doses: [{ time: 0, amount: 400 }],
        },
      ],
    };
    const { peak, timeOfPeak } = modelExposure(history, 0, 100);
    expect(timeOfPeak).toBeLessThan(1);
    const after = modelExposure(history, 2, 100);
    const dip = modelExposure(history, 0.5, after.timeOfPeak);
    expect(dip.timeOfLowest).toBeGreaterThan(0.6);
    expect(dip.lowest).toBeLessThan(after.peak);
    expect(after.timeOfPeak).toBeGreaterThan(dip.timeOfLowest + 1);
    expect(after.peak).toBeLessThan(peak);
    const levels = modelProfile(
      history,
      Array.from({ length: 20_000 }, (_, i) => 0.5 + i * 0.001),
    );
    expect(Math.min(...levels)).toBeGreaterThanOrEqual(dip.lowest * (1 - 1e-14));
  });

  test("steady state: the lowest level is where it is, and the average is dose rate over clearance", () => {
    const inputs = [
      {
        absorption: { kind: "first-order", ka: 1.2 },
        bioavailability: 0.7,
        lag: 0.5,
        doses: [
          { time: 8, amount: 0.25 },
          { time: 20, amount: 0.125 },
        ],
      },
    ] as const;
    const found = modelSteadyState(DIGOXIN_LIKE, inputs, 24);
    if (found.status === "none") throw new Error("a linear kind has a steady state");
    expect(relativeError(found.average, (0.7 * 0.375) / 24 / 7)).toBeLessThanOrEqual(2e-15);
    expect(found.timeOfLowest).toBe(8.5);
    expect(found.accumulation).toBeGreaterThan(1);
  });
});
