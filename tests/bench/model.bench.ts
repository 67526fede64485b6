import { writeFileSync } from "node:fs";
import { bench, describe } from "vitest";
import {
  type Absorption,
  crossCheck,
  crossCheckExposure,
  type ModelDisposition,
  type ModelHistory,
  modelExposure,
  modelProfile,
  twoCompartmentConstants,
} from "../../src/core/kinetics/index.ts";
import { odexRun } from "../core/kinetics/model/odexRun.ts";
import { timeInTurn } from "./timeInTurn.ts";

/*
 * What each kind of model costs, as ratios: linear kinds against the textbook sum over all earlier doses, saturable elimination
 * against odex at equal accuracy, exposure and the second road, and the growth with doses and times. Set WRITE_RESULTS=1 to write
 * tests/bench/modelResults.json, from which docs/methods quotes.
 */
const DOSES = 60;
const TIMES = 2000;
const INTERVAL_H = 12;

const ONE = { kind: "one-compartment", clearance: 4.5, volume: 30 } as const;
const TWO = { kind: "two-compartment", clearance: 4.5, volume: 20, exchange: 8, peripheralVolume: 60 } as const;
const SATURABLE = { kind: "saturable", vmax: 40, km: 6, volume: 30 } as const;
const FIRST = { kind: "first-order", ka: 1 } as const;
const ZERO = { kind: "zero-order", duration: 6 } as const;
const MIXED = { kind: "mixed", fastFraction: 0.4, fastKa: 1.5, slow: ZERO, slowLag: 1 } as const;

const dosesOf = (count: number) => Array.from({ length: count }, (_, i) => ({ time: i * INTERVAL_H, amount: 300 }));
const timesOf = (count: number, doses: number) =>
  Float64Array.from({ length: count }, (_, i) => (i * doses * INTERVAL_H) / count);
const historyOf = (disposition: ModelDisposition, absorption: Absorption, count = DOSES): ModelHistory => ({
  dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition }],
  inputs: [{ absorption, bioavailability: 0.9, lag: 0.25, doses: dosesOf(count) }],
});

const times = timesOf(TIMES, DOSES);
const doses = dosesOf(DOSES);
/** Keeps results from being thrown away unseen. */
let sink = 0;

/** The textbook level per mg absorbed, u h after absorption began. */
type Textbook = (u: number) => number;

const oneFirst: Textbook = (u) => {
  const ke = ONE.clearance / ONE.volume;
  return (FIRST.ka / (ONE.volume * (FIRST.ka - ke))) * (Math.exp(-ke * u) - Math.exp(-FIRST.ka * u));
};
const oneZero: Textbook = (u) => {
  const ke = ONE.clearance / ONE.volume;
  const fed = Math.min(u, ZERO.duration);
  return ((1 - Math.exp(-ke * fed)) / (ZERO.duration * ONE.clearance)) * Math.exp(-ke * (u - fed));
};
const { alpha, beta, k21 } = twoCompartmentConstants(TWO);
const { ka } = FIRST;
const twoFirst: Textbook = (u) =>
  (ka / TWO.volume) *
  (((k21 - alpha) / ((beta - alpha) * (ka - alpha))) * Math.exp(-alpha * u) +
    ((k21 - beta) / ((alpha - beta) * (ka - beta))) * Math.exp(-beta * u) +
    ((k21 - ka) / ((alpha - ka) * (beta - ka))) * Math.exp(-ka * u));

function directSum(textbook: Textbook): Float64Array {
  const levels = new Float64Array(times.length);
  for (let i = 0; i < times.length; i++) {
    let level = 0;
    for (const dose of doses) {
      const u = times[i]! - dose.time - 0.25;
      if (u > 0) level += 0.9 * dose.amount * textbook(u);
    }
    levels[i] = level;
  }
  return levels;
}

const linear = (
  [
    ["one compartment, first-order", historyOf(ONE, FIRST), oneFirst],
    ["one compartment, zero-order", historyOf(ONE, ZERO), oneZero],
    ["two compartments, first-order", historyOf(TWO, FIRST), twoFirst],
  ] as const
).map(([name, history, textbook]) => {
  const exact = modelProfile(history, times);
  const sum = directSum(textbook);
  // Not a test of either, but a ratio between two things that are not the same would mean nothing.
  const apart = Math.max(...exact.map((level, i) => Math.abs(level - sum[i]!))) / Math.max(...exact);
  if (!(apart < 1e-11)) throw new Error(`${name}: the direct sum is off by ${apart}`);
  const best = timeInTurn(
    {
      model: () => {
        sink += modelProfile(history, times)[77]!;
      },
      direct: () => {
        sink += directSum(textbook)[77]!;
      },
    },
    200,
  );
  const ratio = best.direct / best.model;
  console.info(
    `modelProfile, ${name}, ${DOSES} doses × ${TIMES} times: ${best.model.toFixed(0)} µs, ${ratio.toFixed(1)} × faster than the direct sum`,
  );
  return { name, microseconds: best.model, fasterThanDirectSum: ratio };
});

const largestError = (levels: ArrayLike<number>, exact: Float64Array) =>
  Math.max(...exact.map((level, i) => Math.abs(levels[i]! - level))) / Math.max(...exact);

const few = timesOf(200, DOSES);
const saturable = [FIRST, MIXED].map((absorption) => {
  const history = historyOf(SATURABLE, absorption);
  const exact = modelProfile(history, few);
  const tolerance = 1e-11;
  const byOdex = () => odexRun(history, [...few], tolerance).states.map(({ level }) => level);
  const odexError = largestError(byOdex(), exact);
  const best = timeInTurn(
    {
      model: () => {
        sink += modelProfile(history, few)[77]!;
      },
      odex: () => {
        sink += byOdex()[77]!;
      },
    },
    100,
  );
  const ratio = best.odex / best.model;
  console.info(
    `modelProfile, saturable, ${absorption.kind}, ${DOSES} doses × ${few.length} times: ${best.model.toFixed(0)} µs, ` +
      `${ratio.toFixed(1)} × faster than odex, which is then ${odexError.toExponential(1)} off`,
  );
  return { absorption: absorption.kind, microseconds: best.model, fasterThanOdex: ratio, odexError };
});

const roads = [ONE, TWO, SATURABLE].map((disposition) => {
  const history = historyOf(disposition, MIXED);
  const best = timeInTurn(
    {
      profile: () => {
        sink += modelProfile(history, times)[77]!;
      },
      exposure: () => {
        sink += modelExposure(history, 0, DOSES * INTERVAL_H, { low: 5, high: 10 }).peak;
      },
      crossCheck: () => {
        sink += crossCheck(history, times)[77]!;
      },
      crossCheckExposure: () => {
        sink += crossCheckExposure(history, 0, DOSES * INTERVAL_H, { low: 5, high: 10 }).peak;
      },
    },
    30,
  );
  const ms = (microseconds: number) => (microseconds / 1000).toFixed(1);
  console.info(
    `${disposition.kind}, mixed, ${DOSES} doses: profile of ${TIMES} times ${ms(best.profile)} ms, exposure ${ms(best.exposure)} ms; ` +
      `cross-check ${ms(best.crossCheck)} and ${ms(best.crossCheckExposure)} ms`,
  );
  return { kind: disposition.kind, ...best };
});

const growth = [ONE, TWO, SATURABLE].map((disposition) => {
  const each = [100, 10_000].map((count) => {
    const history = historyOf(disposition, ZERO, count);
    const at = timesOf(count, count);
    const best = timeInTurn(
      {
        run: () => {
          sink += modelProfile(history, at)[7]!;
        },
      },
      Math.max(20, 2000 / count),
    );
    return (best.run * 1000) / (2 * count);
  });
  const ratio = each[1]! / each[0]!;
  console.info(
    `modelProfile, ${disposition.kind}: ${each[0]!.toFixed(0)} ns a dose or time at 100 of each, ${each[1]!.toFixed(0)} at 10,000 ` +
      `(${ratio.toFixed(2)} ×; 1 is linear)`,
  );
  return { kind: disposition.kind, nanosecondsEach: each, ratio };
});

if (process.env.WRITE_RESULTS === "1") {
  const results = {
    date: new Date().toISOString().slice(0, 10),
    machine: `${process.platform} ${process.arch}, Node ${process.version}`,
    linear,
    saturable,
    roads,
    growth,
  };
  writeFileSync(new URL("modelResults.json", import.meta.url), `${JSON.stringify(results, null, 2)}\n`);
}

describe(`${DOSES} doses × ${TIMES} times`, () => {
  for (const disposition of [ONE, TWO, SATURABLE]) {
    const history = historyOf(disposition, MIXED);
    bench(`modelProfile, ${disposition.kind}, mixed`, () => {
      sink += modelProfile(history, times)[77]!;
    });
  }
});

// Read once, so that nothing above can be left out as unused.
if (Number.isNaN(sink)) throw new Error("a benchmark gave NaN");
