import { writeFileSync } from "node:fs";
import { bench, describe } from "vitest";
import { type Dose, type OralKinetics, profile } from "../../src/core/kinetics/index.ts";
import { timeInTurn } from "./timeInTurn.ts";

/*
 * What `profile` costs, as ratios: against the sum over all earlier doses, against a bare loop of as many exponentials, and from
 * 100 to 100,000 doses. Set WRITE_RESULTS=1 to write tests/bench/profileResults.json, from which docs/methods quotes.
 */
const DOSES = 60;
const TIMES = 2000;
const INTERVAL_H = 12;

const kinetics: OralKinetics = { ka: 1, ke: 0.15, volume: 30, bioavailability: 0.9, lag: 0.25 };
const dosesOf = (count: number): Dose[] =>
  Array.from({ length: count }, (_, i) => ({ time: i * INTERVAL_H, amount: 300 }));
const timesOf = (count: number, doses: number) =>
  Float64Array.from({ length: count }, (_, i) => (i * doses * INTERVAL_H) / count);

const doses = dosesOf(DOSES);
const times = timesOf(TIMES, DOSES);
/** Keeps results from being thrown away unseen. */
let sink = 0;

/** One exponential a rate at every time, and the same at every dose to carry the state on: what the sweep evaluates at least. */
const exponents = Float64Array.from({ length: 2 * (TIMES + DOSES) }, (_, i) => -((i * 0.36) % INTERVAL_H) * 0.5);
const exponentials = new Float64Array(exponents.length);

function bareExponentials(): void {
  for (let i = 0; i < exponents.length; i++) exponentials[i] = Math.exp(exponents[i]!);
  sink += exponentials[7]!;
}

/** The textbook way: at each time the sum over all earlier doses. */
function directSum(): void {
  const { ka, ke, volume, bioavailability, lag } = kinetics;
  const scale = (bioavailability * ka) / (volume * (ka - ke));
  const levels = new Float64Array(times.length);
  for (let i = 0; i < times.length; i++) {
    let level = 0;
    for (const dose of doses) {
      const u = times[i]! - dose.time - lag;
      if (u > 0) level += dose.amount * scale * (Math.exp(-ke * u) - Math.exp(-ka * u));
    }
    levels[i] = level;
  }
  sink += levels[77]!;
}

function sweep(k: OralKinetics = kinetics): void {
  sink += profile(k, doses, times)[77]!;
}

const CASES: Record<string, OralKinetics> = {
  "ka 1, ke 0.15": kinetics,
  "flip-flop, ka 0.15, ke 1": { ...kinetics, ka: 0.15, ke: 1 },
  "near-equal, ka 0.151, ke 0.15": { ...kinetics, ka: 0.151 },
  "equal, ka 0.15, ke 0.15": { ...kinetics, ka: 0.15 },
};

const ratios = Object.entries(CASES).map(([name, k]) => {
  const best = timeInTurn({ sweep: () => sweep(k), bareExponentials }, 400, 5);
  const toBare = best.sweep / best.bareExponentials;
  console.info(
    `profile, ${DOSES} doses × ${TIMES} times, ${name}: ${toBare.toFixed(2)} × the bare loop of ${exponents.length} Math.exp (at most 2)`,
  );
  return { name, microseconds: best.sweep, toBareExponentials: toBare };
});

const against = timeInTurn({ sweep: () => sweep(), directSum }, 200, 2);
const fasterThanDirect = against.directSum / against.sweep;
console.info(
  `profile, ${DOSES} doses × ${TIMES} times: ${fasterThanDirect.toFixed(1)} × faster than the direct sum (at least 20)`,
);

const growth = [100, 1000, 10_000, 100_000].map((count) => {
  const many = dosesOf(count);
  const at = timesOf(count, count);
  const run = () => {
    sink += profile(kinetics, many, at)[7]!;
  };
  const best = timeInTurn({ run }, Math.max(20, 400_000 / count));
  const nanoseconds = (best.run * 1000) / (2 * count);
  console.info(`profile, ${count} doses × ${count} times: ${nanoseconds.toFixed(0)} ns a dose or time`);
  return { doses: count, nanosecondsEach: nanoseconds };
});
const growthRatio = growth[growth.length - 1]!.nanosecondsEach / growth[0]!.nanosecondsEach;
console.info(`profile, 100 to 100,000 doses: the cost of each grows ${growthRatio.toFixed(2)} × (1 is linear)`);

if (process.env.WRITE_RESULTS === "1") {
  const results = {
    date: new Date().toISOString().slice(0, 10),
    machine: `${process.platform} ${process.arch}, Node ${process.version}`,
    ratios,
    fasterThanDirectSum: fasterThanDirect,
    growth,
    growthRatio,
  };
  writeFileSync(new URL("profileResults.json", import.meta.url), `${JSON.stringify(results, null, 2)}\n`);
}

describe(`${DOSES} doses × ${TIMES} times`, () => {
  bench("profile", () => sweep());
  bench("bare loop of as many Math.exp", bareExponentials);
  bench("direct sum over all earlier doses", directSum);
});

// Read once, so that nothing above can be left out as unused.
if (Number.isNaN(sink)) throw new Error("a benchmark gave NaN");
