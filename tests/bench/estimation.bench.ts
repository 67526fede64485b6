import { writeFileSync } from "node:fs";
import { cpus, loadavg } from "node:os";
import { bench, describe } from "vitest";
import { estimationStarts } from "../../src/core/estimation/estimationStarts.ts";
import {
  drawBand,
  drawLevels,
  EstimationObjective,
  type EstimationProblem,
  estimateMostLikely,
  estimatePosterior,
  residualSd,
} from "../../src/core/estimation/index.ts";
import {
  type KineticsParameter,
  type ModelDisposition,
  ModelSweep,
  modelProfile,
  modelScaled,
} from "../../src/core/kinetics/index.ts";
import { simplexMinimise } from "./simplexMinimise.ts";
import { timeInTurn } from "./timeInTurn.ts";

/*
 * What an estimate costs: the most likely values against a general simplex search that is given the same objective as values only
 * (written plainly with modelProfile, and once more through the engine's own fast values), and 2,000 draws with a band on 300 times
 * against the bare model evaluations in it. Set WRITE_RESULTS=1 to write tests/bench/estimationResults.json.
 */
const DOSES = 30;
const INTERVAL_H = 12;
const DRAWS = 2000;
const BAND_TIMES = Float64Array.from({ length: 300 }, (_, i) => (i + 0.5) * ((DOSES * INTERVAL_H) / 300));
const PROBABILITIES = [0.05, 0.25, 0.5, 0.75, 0.95];

const KINDS: Record<string, { disposition: ModelDisposition; names: readonly KineticsParameter[] }> = {
  "one compartment": {
    disposition: { kind: "one-compartment", clearance: 4.5, volume: 30 },
    names: ["clearance", "volume", "ka"],
  },
  "two compartments": {
    disposition: { kind: "two-compartment", clearance: 4.5, volume: 20, exchange: 8, peripheralVolume: 60 },
    names: ["clearance", "volume", "ka"],
  },
  saturable: { disposition: { kind: "saturable", vmax: 40, km: 6, volume: 30 }, names: ["vmax", "km", "ka"] },
};

const LEVEL_TIMES = [50, 118, 262, 347.5];
const TRUTH = [0.25, -0.15, 0.3];
const NOISE = [0.06, -0.08, 0.05, -0.03];

function problemOf({ disposition, names }: (typeof KINDS)[string]): EstimationProblem {
  const history = {
    dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition }],
    inputs: [
      {
        absorption: { kind: "first-order", ka: 1 } as const,
        bioavailability: 0.9,
        lag: 0.25,
        doses: Array.from({ length: DOSES }, (_, i) => ({ time: i * INTERVAL_H, amount: 300 })),
      },
    ],
  };
  const levels = modelProfile(modelScaled(history, names, TRUTH), LEVEL_TIMES);
  return {
    history,
    random: names.map((name) => ({ name, omega: 0.35 })),
    residual: { additive: 0.2, proportional: 0.1 },
    levels: LEVEL_TIMES.map((time, i) => ({ time, value: levels[i]! * (1 + NOISE[i]!), kind: "measured" })),
    residualModel: "normal",
  };
}

/** The objective as anyone would write it. */
function plainObjective({ history, random, residual, levels }: EstimationProblem): (eta: readonly number[]) => number {
  const names = random.map(({ name }) => name);
  const times = levels.map(({ time }) => time);
  return (eta) => {
    const predictions = modelProfile(modelScaled(history, names, eta), times);
    let sum = 0;
    for (const [i, { omega }] of random.entries()) sum += eta[i]! ** 2 / (2 * omega ** 2);
    for (const [j, { value }] of levels.entries()) {
      const s = residualSd(residual, predictions[j]!);
      sum += (value - predictions[j]!) ** 2 / (2 * s * s) + Math.log(s);
    }
    return sum;
  };
}

/** Keeps results from being thrown away unseen. */
let sink = 0;

const results = Object.entries(KINDS).map(([name, kind]) => {
  const problem = problemOf(kind);
  const objective = new EstimationObjective(problem);
  const plain = plainObjective(problem);
  const map = estimateMostLikely(problem);
  if (map.status !== "converged") throw new Error(`${name}: ${map.status}`);
  const start = problem.random.map(() => 0);
  const from = (begin: readonly number[], value: (eta: readonly number[]) => number) =>
    simplexMinimise(value, begin, 0.2, 1e-9);
  const search = (value: (eta: readonly number[]) => number) => from(start, value);
  const starts = estimationStarts(problem);
  const found = search(plain);
  // To the same objective, or the comparison says nothing.
  if (!(Math.abs(found.value - map.objective) < 1e-8)) throw new Error(`${name}: ${found.value} and ${map.objective}`);
  const isSlow = name === "saturable";
  // As in a page that has been open for a while: compiled.
  for (let n = 0; n < (isSlow ? 2 : 1000); n++) sink += estimateMostLikely(problem).iterations;
  const search_ = timeInTurn(
    {
      map: () => {
        sink += estimateMostLikely(problem).iterations;
      },
      simplex: () => {
        sink += search(plain).value;
      },
      simplexSameStarts: () => {
        for (const begin of starts) sink += from(begin, plain).value;
      },
      simplexFastValues: () => {
        sink += search((eta) => objective.value(eta)).value;
      },
    },
    isSlow ? 3 : 40,
  );
  const faster = search_.simplex / search_.map;
  const fasterSameStarts = search_.simplexSameStarts / search_.map;
  const fasterThanFast = search_.simplexFastValues / search_.map;
  console.info(
    `${name}: most likely values of 4 levels, ${DOSES} doses: ${(search_.map / 1000).toFixed(2)} ms, ${faster.toFixed(1)} × faster than a simplex search (${found.evaluations} values; at least 10 for one compartment), ${fasterSameStarts.toFixed(1)} × from the same ${starts.length} starts, ${fasterThanFast.toFixed(1)} × with the engine's own values`,
  );

  const options = { draws: DRAWS, seed: 1 };
  const posterior = estimatePosterior(problem, map, options);
  if (posterior.status !== "drawn") throw new Error(`${name}: ${posterior.status}`);
  const names = problem.random.map((parameter) => parameter.name);
  const sweep = new ModelSweep(problem.history, names, BAND_TIMES, false);
  const draws = timeInTurn(
    {
      posterior: () => {
        sink += estimatePosterior(problem, map, options).effectiveSize;
      },
      band: () => {
        sink += drawBand(problem, posterior, BAND_TIMES, PROBABILITIES)[2]![7]!;
      },
      levels: () => {
        sink += drawLevels(problem, posterior, BAND_TIMES)[7]![7]!;
      },
      bare: () => {
        for (let n = 0; n < DRAWS; n++) {
          sweep.run(posterior.eta.map((column) => column[n]!));
          sink += sweep.levels[7]!;
        }
      },
    },
    isSlow ? 2 : 5,
  );
  const total = draws.posterior + draws.band;
  console.info(
    `${name}: ${DRAWS} draws ${(draws.posterior / 1000).toFixed(0)} ms, band on 300 times ${(draws.band / 1000).toFixed(0)} ms; ${((100 * draws.bare) / draws.band).toFixed(0)} % of the band are bare model evaluations`,
  );
  return {
    name,
    mapMilliseconds: search_.map / 1000,
    simplexEvaluations: found.evaluations,
    fasterThanSimplex: faster,
    fasterThanSimplexSameStarts: fasterSameStarts,
    fasterThanSimplexOnFastValues: fasterThanFast,
    posteriorMilliseconds: draws.posterior / 1000,
    bandMilliseconds: draws.band / 1000,
    totalMilliseconds: total / 1000,
    bareShareOfBand: draws.bare / draws.band,
  };
});

if (process.env.WRITE_RESULTS === "1") {
  const file = {
    date: new Date().toISOString().slice(0, 10),
    machine: `${process.platform} ${process.arch}, Node ${process.version}`,
    load: `${loadavg()[0]!.toFixed(1)} on ${cpus().length} processors: best of the rounds, all cases in turn in each`,
    doses: DOSES,
    draws: DRAWS,
    results,
  };
  writeFileSync(new URL("estimationResults.json", import.meta.url), `${JSON.stringify(file, null, 2)}\n`);
}

describe("4 levels, 30 doses, one compartment", () => {
  const problem = problemOf(KINDS["one compartment"]!);
  const plain = plainObjective(problem);
  bench("most likely values", () => {
    sink += estimateMostLikely(problem).iterations;
  });
  bench("simplex search", () => {
    sink += simplexMinimise(plain, [0, 0, 0], 0.2, 1e-9).value;
  });
});

// Read once, so that nothing above can be left out as unused.
if (Number.isNaN(sink)) throw new Error("a benchmark gave NaN");
