import type { Case } from "../case/index.ts";
import { estimateMostLikely, estimatePosterior, type MapEstimate, type Posterior } from "../estimation/index.ts";
import { type ModelHistory, modelHalfLife, modelScaled } from "../kinetics/index.ts";
import type { AnalysisClock } from "./analysisClock.ts";
import type { DoseMark, LevelResult, Model, OptionResult } from "./analysisTypes.ts";
import { countedByProduct } from "./caseDoses.ts";
import { type FitProblem, fitProblem } from "./fitProblem.ts";
import type { Band, FitState, FittedFigure, IndividualFit } from "./fitTypes.ts";
import { fittedParameters } from "./fittedParameters.ts";
import { flipFlopFinding } from "./flipFlopFinding.ts";
import { individualBand } from "./individualBand.ts";
import { type DrawnPatients, individualReadings } from "./individualReadings.ts";
import { levelFits } from "./levelFits.ts";
import { modelHistory } from "./modelInputs.ts";
import { spreadOf } from "./spreadOf.ts";
import { systematicDraws } from "./systematicDraws.ts";

/** Draws from the posterior, and the seed they come from: part of the engine, so that the same case always gives the same figures. */
export const POSTERIOR_DRAWS = 2_048;
export const POSTERIOR_SEED = 1;

/** Of them so many, taken by weight, carry the bands and readings: as many as the kind's cost allows while a key is held down. */
const DRAWN_PATIENTS: Readonly<Record<Model["kind"], number>> = {
  "one-compartment": 1_024,
  "two-compartment": 512,
  saturable: 512,
};

/** Share of the work that is done when the draws are there, and when the levels have been looked at one by one. */
const PART_DRAWN = 0.2;
const PART_LEVELS = 0.35;

export interface IndividualInput {
  readonly typical: Model | null;
  readonly given: readonly DoseMark[];
  readonly levels: readonly LevelResult[];
  readonly options: readonly OptionResult[];
  /** End of the curve of what was given. */
  readonly givenUntilH: number;
  readonly clock: AnalysisClock;
  readonly isFitted: boolean;
}

export interface IndividualOutput {
  readonly fit: FitState;
  readonly givenBand: Band | null;
  readonly levels: readonly LevelResult[];
  readonly options: readonly OptionResult[];
}

type Converged = Extract<MapEstimate, { status: "converged" }>;
type Drawn = Extract<Posterior, { status: "drawn" }>;

/**
 * What the levels make of this patient: the most likely values, draws from what they leave possible, and from the draws everything shown.
 * Where there is nothing to fit, or the fit cannot be trusted, the state says why and the typical patient stays. Yields the part done, 0 to 1.
 */
export function* individualSteps(value: Case, input: IndividualInput): Generator<number, IndividualOutput> {
  const { typical, given, levels, options } = input;
  const without = (fit: FitState): IndividualOutput => ({ fit, givenBand: null, levels, options });
  const posed = fitProblem(value, typical, given, levels);
  if (!posed.ok) return without({ kind: "none", reason: posed.reason });
  if (!input.isFitted) return without({ kind: "pending" });
  const { problem, used } = posed.value;

  yield 0;
  const map = estimateMostLikely(problem);
  if (map.status === "not-converged") {
    const { iterations, gradientNorm } = map;
    return without({ kind: "withheld", reason: "not-converged", data: { iterations, gradientNorm } });
  }
  yield PART_DRAWN / 4;
  const posterior = estimatePosterior(problem, map, { draws: POSTERIOR_DRAWS, seed: POSTERIOR_SEED });
  if (posterior.status === "withheld") {
    const { paretoK, rHat, effectiveSize } = posterior;
    return without({ kind: "withheld", reason: "draws-unreliable", data: { paretoK, rHat, effectiveSize } });
  }
  yield PART_DRAWN;

  const levelSteps = levelFits(levels, {
    fit: posed.value,
    map,
    posterior,
    draws: POSTERIOR_DRAWS,
    seed: POSTERIOR_SEED,
  });
  const fittedLevels = yield* parts(levelSteps, PART_DRAWN, PART_LEVELS, 4 + 2 * used.length);

  const patients = drawnPatients(posed.value, posterior, DRAWN_PATIENTS[typical!.kind]);
  const shown = shownSteps(value, input, posed.value, typical!, patients);
  const steps = patients.count * (1 + 2 * options.length);
  const { givenBand, fittedOptions } = yield* parts(shown, PART_LEVELS, 1, steps);
  return {
    fit: { kind: "fitted", fit: individualFit(value, typical!, posed.value, map, posterior, levels) },
    givenBand,
    levels: fittedLevels,
    options: fittedOptions,
  };
}

/** Bands and readings from the drawn patients. Yields after each. */
function* shownSteps(
  value: Case,
  { given, options, clock, givenUntilH }: IndividualInput,
  { history }: FitProblem,
  typical: Model,
  patients: DrawnPatients,
): Generator<void, { givenBand: Band; fittedOptions: readonly OptionResult[] }> {
  const givenBand = yield* individualBand(history, patients, clock.fromH, givenUntilH);
  const fittedOptions: OptionResult[] = [];
  for (const option of options) {
    if (option.typical === null) {
      fittedOptions.push(option);
      continue;
    }
    const whole: ModelHistory = modelHistory(typical, countedByProduct([...given, ...option.doses]));
    const lines = value.options.find(({ id }) => id === option.id)!.lines;
    const span = { fromH: clock.nowH, toH: clock.readingsToH };
    fittedOptions.push({
      ...option,
      individual: yield* individualReadings(value, lines, whole, typical, patients, span),
      band: yield* individualBand(whole, patients, clock.nowH, clock.toH),
    });
  }
  return { givenBand, fittedOptions };
}

function individualFit(
  value: Case,
  typical: Model,
  posed: FitProblem,
  map: Converged,
  posterior: Drawn,
  levels: readonly LevelResult[],
): IndividualFit {
  return {
    residualModel: value.fit.residualModel,
    method: posterior.method,
    seed: POSTERIOR_SEED,
    draws: posterior.weights.length,
    paretoK: posterior.paretoK,
    effectiveSize: posterior.effectiveSize,
    rHat: posterior.rHat,
    iterations: map.iterations,
    gradientNorm: map.gradientNorm,
    levelsUsed: posed.used.map(({ id }) => id),
    levelsLeftOut: levels.filter((level) => level.excluded !== null).map(({ id }) => id),
    parameters: fittedParameters(typical, posed.parameters, map, posterior),
    halfLife: halfLifeOf(posed, posterior),
    flipFlop: flipFlopFinding(posed, posterior),
  };
}

/** Of the final state; null where it depends on the level. */
function halfLifeOf({ history, parameters }: FitProblem, posterior: Drawn): FittedFigure | null {
  const final: ModelHistory = {
    dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition: history.dispositions.at(-1)!.disposition }],
    inputs: [],
  };
  const typical = modelHalfLife(final.dispositions[0]!.disposition);
  if (typical === null) return null;
  const ofDisposition = parameters.flatMap(({ name }, i) =>
    name === "ka" || name === "bioavailability" ? [] : [{ name, eta: posterior.eta[i]! }],
  );
  const names = ofDisposition.map(({ name }) => name);
  const halfLives = Float64Array.from(posterior.weights, (_, n) => {
    const own = modelScaled(
      final,
      names,
      ofDisposition.map(({ eta }) => eta[n]!),
    );
    return modelHalfLife(own.dispositions[0]!.disposition)!;
  });
  return { typical, posterior: spreadOf(halfLives, posterior.weights) };
}

function drawnPatients({ parameters }: FitProblem, posterior: Drawn, count: number): DrawnPatients {
  const chosen = systematicDraws(posterior.weights, count);
  return {
    names: parameters.map(({ name }) => name),
    count,
    eta: (nth) => posterior.eta.map((column) => column[chosen[nth]!]!),
  };
}

/** Steps of equal size as parts of the whole, from one part to another. */
function* parts<R>(steps: Generator<void, R>, from: number, to: number, count: number): Generator<number, R> {
  for (let done = 1; ; done++) {
    const step = steps.next();
    if (step.done) return step.value;
    yield from + (to - from) * Math.min(1, done / count);
  }
}
