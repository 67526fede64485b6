import { chainDiagnostics } from "./chainDiagnostics.ts";
import { choleskyFactor, type Matrix } from "./choleskyFactor.ts";
import type { BatchLogDensity } from "./importanceSample.ts";
import { type SeededRandom, seededRandom } from "./seededRandom.ts";

export interface ChainProblem {
  /** Called with one point a chain; the arrays are used again for the next call. */
  readonly logDensity: BatchLogDensity;
  /** A point where the density is above 0, near its middle. */
  readonly start: readonly number[];
  /** A guess at the covariance, positive definite. */
  readonly scale: Matrix;
  /** How many draws to return, 64 or more. */
  readonly draws: number;
  /** Whole number, 0 to 2^32 − 1. */
  readonly seed: number;
}

export type ChainSample =
  | {
      readonly status: "drawn";
      /** One array a dimension, each of `draws` numbers that weigh the same. */
      readonly points: Float64Array[];
      /** The largest of the dimensions. */
      readonly rHat: number;
      /** The smallest of the dimensions. */
      readonly effectiveSize: number;
    }
  | { readonly status: "not-converged"; readonly rHat: number; readonly effectiveSize: number }
  /** The covariance given is not positive definite, or the start has density 0. */
  | { readonly status: "no-scale" | "no-start" };

/** Chains agree when R̂ is at most this, and say enough with 100 independent draws each: Vehtari et al. 2021, section 4. */
export const LARGEST_R_HAT = 1.01;
export const SMALLEST_EFFECTIVE_SIZE = 400;

const CHAINS = 4;
/** The best share of steps taken in a few dimensions, and the best step for a normal density: Roberts, Gelman & Gilks 1997. */
const TAKEN = 0.3;
const BEST_STEP = 2.38;
/** Steps of one stage of warming up; the covariance is learnt anew after each. */
const STAGE = 300;
const STAGES = 4;
/** Steps for each draw kept, in the first round; each further round takes twice as many. */
const FIRST_THINNING = 5;
const ROUNDS = 4;
/** Degrees of the t the starts are spread by: wider than the density. */
const START_DEGREES = 4;

/**
 * Draws from a density known up to a factor, by a Markov chain that learns its step first.
 *
 * Formula: Metropolis steps x + (2.38/√d)·s·L·z, z normal, in 4 chains started from a t with 4 degrees about `start`. In 4 stages of
 * 300 steps s is tuned to 30 % of steps taken and L·Lᵀ learnt from all chains; then both stand still, so that what is kept comes
 * from one fixed chain. If R̂ > 1.01 or the effective size is below 400 in any dimension (chainDiagnostics), a round of twice the length
 * follows, four rounds in all.
 * @param problem see ChainProblem; 1 to about 10 dimensions
 * @returns see ChainSample; never draws from chains that disagree. Two separate heaps with all four starts in one of them go unseen
 * Outside: RangeError for sizes that don't fit, a seed or number of draws out of range, a log density of NaN or Infinity.
 * Accuracy: of a mean 1/√effectiveSize standard deviations (tests/core/numerics/adaptiveChain.test.ts). Same seed, same bits, within
 * one engine.
 * Source: Haario, Saksman & Tamminen, An adaptive Metropolis algorithm, Bernoulli 7 (2001) 223–242, with the learning ended before
 * draws are kept (from memory, unverified).
 * @example adaptiveChain({ logDensity: ([x]) => x!.map((each) => -each * each / 2), start: [0], scale: [[1]], draws: 2000, seed: 1 }).status // "drawn"
 */
export function adaptiveChain(problem: ChainProblem): ChainSample {
  const { start, draws } = problem;
  if (!(Number.isInteger(draws) && draws >= 64))
    throw new RangeError(`draws: ${draws}; must be a whole number, 64 or more`);
  if (problem.scale.length !== start.length)
    throw new RangeError(`scale: ${problem.scale.length} rows for ${start.length} dimensions`);
  let factor = choleskyFactor(problem.scale);
  if (factor === null) return { status: "no-scale" };
  const random = seededRandom(problem.seed);

  // 1. Scattered starts.
  const chains = scatteredStarts(problem, factor, random);
  if (chains === null) return { status: "no-start" };

  // 2. Learning the step.
  let stretch = 1;
  for (let stage = 0; stage < STAGES; stage++) {
    const seen: number[][] = [];
    for (let n = 1; n <= STAGE; n++) {
      const taken = chains.step(factor, stretch);
      // Robbins & Monro: smaller corrections as the stage goes on.
      stretch *= Math.exp((taken / CHAINS - TAKEN) / Math.sqrt(n));
      if (2 * n > STAGE) seen.push(...chains.states());
    }
    const learnt = choleskyFactor(covariance(seen));
    if (learnt) {
      factor = learnt;
      stretch = 1;
    }
  }

  // 3. Keeping, until the chains agree.
  const each = 2 * Math.ceil(draws / CHAINS / 2);
  let rHat = Infinity;
  let effectiveSize = 0;
  for (let round = 0; round < ROUNDS; round++) {
    const kept = start.map(() => Array.from({ length: CHAINS }, () => new Float64Array(each)));
    for (let n = 0; n < each; n++) {
      for (let skip = 0; skip < FIRST_THINNING * 2 ** round; skip++) chains.step(factor, stretch);
      for (const [c, state] of chains.states().entries()) {
        for (const [i, value] of state.entries()) kept[i]![c]![n] = value;
      }
    }
    const found = kept.map(chainDiagnostics);
    rHat = Math.max(...found.map((one) => one.rHat));
    effectiveSize = Math.min(...found.map((one) => one.effectiveSize));
    // So few draws may be wanted that 400 can't be reached.
    if (rHat <= LARGEST_R_HAT && effectiveSize >= Math.min(SMALLEST_EFFECTIVE_SIZE, draws / 2)) {
      const points = kept.map((byChain) =>
        Float64Array.from({ length: draws }, (_, n) => byChain[n % CHAINS]![Math.floor(n / CHAINS)]!),
      );
      return { status: "drawn", points, rHat, effectiveSize };
    }
  }
  return { status: "not-converged", rHat, effectiveSize };
}

interface Chains {
  /** One Metropolis step of every chain; how many moved. */
  step(factor: Matrix, stretch: number): number;
  states(): number[][];
}

function scatteredStarts(problem: ChainProblem, factor: Matrix, random: SeededRandom): Chains | null {
  const { start, logDensity } = problem;
  const batch = start.map(() => new Float64Array(CHAINS));
  const place = (points: readonly (readonly number[])[]) => {
    for (const [c, point] of points.entries()) {
      for (const [i, value] of point.entries()) batch[i]![c] = value;
    }
    const logs = logDensity(batch);
    if (logs.length !== CHAINS) throw new RangeError(`logDensity: ${logs.length} numbers for ${CHAINS} points`);
    for (const log of logs) {
      if (Number.isNaN(log) || log === Infinity) throw new RangeError(`logDensity: ${log}; must be below Infinity`);
    }
    return logs;
  };

  let states = Array.from({ length: CHAINS }, () => {
    let chiSquare = 0;
    for (let k = 0; k < START_DEGREES; k++) chiSquare += random.normal() ** 2;
    return moved(start, factor, Math.sqrt(START_DEGREES / chiSquare), random);
  });
  let logs = place(states);
  // A start outside the density comes nearer to the middle.
  for (let tries = 0; tries < 60 && logs.some((log) => log === -Infinity); tries++) {
    states = states.map((state, c) => (logs[c] === -Infinity ? state.map((each, i) => (each + start[i]!) / 2) : state));
    logs = place(states);
  }
  if (logs.some((log) => log === -Infinity)) return null;
  const current = [...logs];

  return {
    states: () => states,
    step(by, stretch) {
      const length = (BEST_STEP / Math.sqrt(start.length)) * stretch;
      const proposed = states.map((state) => moved(state, by, length, random));
      const proposedLogs = place(proposed);
      let taken = 0;
      states = states.map((state, c) => {
        if (Math.log(random.uniform()) >= proposedLogs[c]! - current[c]!) return state;
        current[c] = proposedLogs[c]!;
        taken++;
        return proposed[c]!;
      });
      return taken;
    },
  };
}

/** from + length·L·z. */
function moved(from: readonly number[], factor: Matrix, length: number, random: SeededRandom): number[] {
  const z = from.map(() => random.normal());
  return from.map((each, i) => {
    let sum = 0;
    for (let j = 0; j <= i; j++) sum += factor[i]![j]! * z[j]!;
    return each + length * sum;
  });
}

function covariance(points: readonly (readonly number[])[]): number[][] {
  const d = points[0]!.length;
  const means = Array.from({ length: d }, (_, i) => points.reduce((sum, point) => sum + point[i]!, 0) / points.length);
  return means.map((mean, i) =>
    means.map(
      (other, j) =>
        points.reduce((sum, point) => sum + (point[i]! - mean) * (point[j]! - other), 0) / (points.length - 1),
    ),
  );
}
