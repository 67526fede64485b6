import type { Case } from "../case/index.ts";
import { estimateMostLikely, estimatePosterior, type MapEstimate, type Posterior } from "../estimation/index.ts";
import { type ModelHistory, modelHalfLife, modelScaled } from "../kinetics/index.ts";
import type { AnalysisClock } from "./analysisClock.ts";
import type { DoseMark, LevelResult, Model, OptionResult } from "./analysisTypes.ts";
import { countedByProduct } from "./caseDoses.ts";
import { DRAW_COUNTS } from "./drawCounts.ts";
import { drawnCurve } from "./drawnCurve.ts";
import type { DrawnPatients } from "./drawnPatients.ts";
import { type FitProblem, fitProblem } from "./fitProblem.ts";
import type { Band, FitState, FittedFigure, IndividualFit } from "./fitTypes.ts";
import { fittedParameters } from "./fittedParameters.ts";
import { flipFlopFinding } from "./flipFlopFinding.ts";
import { individualReadings } from "./individualReadings.ts";
import { levelFits } from "./levelFits.ts";
import { modelHistory } from "./modelInputs.ts";
import { concentrationWindow } from "./optionReadings.ts";
import { spreadOf } from "./spreadOf.ts";
import { systematicDraws } from "./systematicDraws.ts";

/** Part of the engine, so that the same case always gives the same figures. */
export const POSTERIOR_SEED = 1;

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
  const { problem } = posed.value;
  const draws = DRAW_COUNTS[typical!.kind];

  yield 0;
  const map = estimateMostLikely(problem);
  if (map.status === "not-converged") {
    const { iterations, gradientNorm } = map;
    return without({ kind: "withheld", reason: "not-converged", data: { iterations, gradientNorm } });
  }
  yield PART_DRAWN / 4;
  const posterior = estimatePosterior(problem, map, { draws: draws.posterior, seed: POSTERIOR_SEED });
  if (posterior.status === "withheld") {
    const { paretoK, rHat, effectiveSize } = posterior;
    return without({ kind: "withheld", reason: "draws-unreliable", data: { paretoK, rHat, effectiveSize } });
  }
  yield PART_DRAWN;

  const levelSteps = levelFits(levels, {
    fit: posed.value,
    map,
    posterior,
    draws: draws.aside,
    seed: POSTERIOR_SEED,
  });
  const fittedLevels = yield* parts(levelSteps, PART_DRAWN, PART_LEVELS, levels.length + 1);

  const patients = drawnPatients(posed.value, posterior, draws.carried);
  const fit = individualFit(value, typical!, posed.value, map, posterior, levels);
  const { givenBand, fittedOptions } = yield* shownSteps(value, input, posed.value, typical!, patients, fit);
  return {
    fit: { kind: "fitted", fit },
    givenBand,
    levels: fittedLevels,
    options: fittedOptions,
  };
}

/** Bands and readings from the drawn patients. Yields the part done. */
function* shownSteps(
  value: Case,
  { given, options, clock, givenUntilH }: IndividualInput,
  { history }: FitProblem,
  typical: Model,
  patients: DrawnPatients,
  fit: IndividualFit,
): Generator<number, { givenBand: Band; fittedOptions: readonly OptionResult[] }> {
  const drawn = options.filter((option) => option.typical !== null);
  const piece = (1 - PART_LEVELS) / (1 + 2 * drawn.length);
  let done = PART_LEVELS;
  const next = <R>(steps: Generator<number, R>) => {
    const from = done;
    done += piece;
    return parts(steps, from, from + piece, patients.count);
  };
  const past = drawnCurve(history, patients, clock.fromH, givenUntilH, { toH: givenUntilH, window: null });
  const { band: givenBand } = yield* next(past);
  const halfLifeH = fit.halfLife?.posterior ?? null;
  const fitted = new Map<string, Pick<OptionResult, "individual" | "band">>();
  for (const { id, doses } of drawn) {
    const whole: ModelHistory = modelHistory(typical, countedByProduct([...given, ...doses]));
    const lines = value.options.find((option) => option.id === id)!.lines;
    const looked = { toH: clock.readingsToH, window: concentrationWindow(value) };
    const { band, figures } = yield* next(drawnCurve(whole, patients, clock.nowH, clock.toH, looked));
    const span = { fromH: clock.nowH, toH: clock.readingsToH, actsFromH: actsFrom(typical, doses) };
    const individual = yield* next(individualReadings(value, lines, typical, patients, figures, span, halfLifeH));
    fitted.set(id, { individual, band });
  }
  return { givenBand, fittedOptions: options.map((option) => ({ ...option, ...fitted.get(option.id) })) };
}

/** When the first dose of an option begins to be absorbed; null where none counts. */
function actsFrom({ products }: Model, doses: readonly DoseMark[]): number | null {
  const begins = doses
    .filter((mark) => mark.countedMg > 0)
    .map((mark) => mark.atH + (products.find(({ product }) => product === mark.product)?.lag.value ?? 0));
  return begins.length === 0 ? null : Math.min(...begins);
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
  const chosen = systematicDraws(posterior.weights, posterior.eta[0]!, count);
  return {
    names: parameters.map(({ name }) => name),
    count,
    eta: posterior.eta.map((column) => Float64Array.from(chosen, (nth) => column[nth]!)),
  };
}

/** Steps that say how many of `count` are done, as parts of the whole from one part to another. */
function* parts<R>(steps: Generator<number, R>, from: number, to: number, count: number): Generator<number, R> {
  for (;;) {
    const step = steps.next();
    if (step.done) return step.value;
    yield from + ((to - from) * step.value) / count;
  }
}
