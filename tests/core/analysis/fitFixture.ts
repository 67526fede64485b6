import type { Analysis, FittedParameter, IndividualFit, LevelFit, Spread } from "../../../src/core/analysis/index.ts";

/** Hand-made pieces of a fit, invented figures: for rules and screens that only read them. */

export function spread(median: number, factor = 1.2): Spread {
  return {
    q05: median / factor ** 2,
    q25: median / factor,
    q50: median,
    q75: median * factor,
    q95: median * factor ** 2,
  };
}

/** Densities of two log-normals over a common grid, each scaled to a highest value of 1. */
function density(typical: number, omega: number, eta: number, sd: number): FittedParameter["density"] {
  const points = 81;
  const reach = 3 * omega;
  const x = Float64Array.from({ length: points }, (_, i) => -reach + (2 * reach * i) / (points - 1));
  return {
    values: x.map((each) => typical * Math.exp(each)),
    prior: x.map((each) => Math.exp(-0.5 * (each / omega) ** 2)),
    posterior: x.map((each) => Math.exp(-0.5 * ((each - eta) / sd) ** 2)),
  };
}

export function parameter(
  change: Partial<FittedParameter> & Pick<FittedParameter, "symbol" | "words">,
): FittedParameter {
  const { typical = 3, omega = 0.3, eta = 0.1, taught = 0.6 } = change;
  const sd = omega * (1 - taught);
  const quantiles = (centre: number, width: number): Spread => ({
    q05: centre * Math.exp(-1.645 * width),
    q25: centre * Math.exp(-0.674 * width),
    q50: centre,
    q75: centre * Math.exp(0.674 * width),
    q95: centre * Math.exp(1.645 * width),
  });
  return {
    unit: "L/h",
    typical,
    omega,
    eta,
    taught,
    mostLikely: typical * Math.exp(eta),
    prior: quantiles(typical, omega),
    posterior: quantiles(typical * Math.exp(eta), sd),
    posteriorMean: typical * Math.exp(eta + sd ** 2 / 2),
    posteriorSd: typical * Math.exp(eta) * sd,
    density: density(typical, omega, eta, sd),
    ...change,
  };
}

export function individualFit(change: Partial<IndividualFit> = {}): IndividualFit {
  return {
    residualModel: "normal",
    method: "importance",
    seed: 1,
    draws: 2000,
    paretoK: 0.21,
    effectiveSize: 1640,
    rHat: null,
    iterations: 7,
    gradientNorm: 2e-9,
    levelsUsed: ["l", "m"],
    levelsLeftOut: [],
    parameters: [
      parameter({ symbol: "CL", words: "Clearance", typical: 2.6, taught: 0.68, eta: -0.22 }),
      parameter({ symbol: "V", words: "Volume", unit: "L", typical: 29, omega: 0.2, taught: 0.24, eta: 0.05 }),
      parameter({
        symbol: "ka",
        words: "Absorption rate",
        unit: "/h",
        typical: 0.3,
        omega: 0.5,
        taught: 0.06,
        eta: 0.02,
      }),
    ],
    halfLife: { typical: 7.7, posterior: spread(9.4, 1.1) },
    flipFlop: null,
    ...change,
  };
}

export function levelFit(predicted: number, change: Partial<LevelFit> = {}): LevelFit {
  return {
    predicted: spread(predicted, 1.06),
    predictive: spread(predicted, 1.12),
    standardised: 0.4,
    priorPredictive: { low: predicted / 2.5, median: predicted, high: predicted * 2.5 },
    isOutsidePrior: false,
    influence: [
      { symbol: "CL", ratio: 1 / 1.12 },
      { symbol: "V", ratio: 1.001 },
    ],
    forecast: { predictive: spread(predicted * 1.1, 1.25), levelsKnown: 1, held: true },
    ...change,
  };
}

/** An analysis with a fit filled in by hand: every curve of this patient is `ratio` times the typical one. */
export function fittedAnalysis(typical: Analysis, change: Partial<IndividualFit> = {}, ratio = 1.18): Analysis {
  const band = (curve: Analysis["givenCurve"]) => {
    if (!curve) return null;
    const at = (factor: number) => curve.values.map((value) => value * ratio * factor);
    return { timesH: curve.timesH, q05: at(0.78), q25: at(0.9), q50: at(1), q75: at(1.11), q95: at(1.3) };
  };
  const used = typical.levels.filter((level) => level.excluded === null).map((level) => level.id);
  const out = typical.levels.filter((level) => level.excluded !== null).map((level) => level.id);
  return {
    ...typical,
    fit: { kind: "fitted", fit: individualFit({ levelsUsed: used, levelsLeftOut: out, ...change }) },
    givenBand: band(typical.givenCurve),
    levels: typical.levels.map((level, i) => ({
      ...level,
      fit: levelFit(
        (level.predicted ?? level.measured) * ratio,
        i === 0 ? { forecast: { predictive: spread(level.measured * 1.4, 1.3), levelsKnown: 0, held: true } } : {},
      ),
    })),
    options: typical.options.map((option) => {
      const { typical: readings } = option;
      if (!readings) return option;
      const { span, steadyState, halfLifeH } = readings;
      const of = (value: number) => spread(value * ratio, 1.12);
      return {
        ...option,
        band: band(option.curve),
        individual: {
          span: {
            fromH: span.fromH,
            toH: span.toH,
            peak: of(span.peak),
            lowest: of(span.lowest),
            average: of(span.average),
            auc: of(span.auc),
            auc24: of(span.auc24),
            hoursBelow: span.hoursBelow === null ? null : spread(span.hoursBelow + 1, 1.4),
            hoursWithin: span.hoursWithin === null ? null : spread(span.hoursWithin + 1, 1.2),
            hoursAbove: span.hoursAbove === null ? null : spread(span.hoursAbove + 1, 1.5),
            chance: { below: 0.31, within: 0.65, above: 0.04 },
            lowestBeforeOption: 0,
          },
          steadyState: steadyState && {
            peak: of(steadyState.peak),
            lowest: of(steadyState.lowest),
            average: of(steadyState.average),
            auc24: of(steadyState.auc24),
            accumulation: spread(steadyState.accumulation * 1.1, 1.05),
            timeTo90H: spread(steadyState.timeTo90H * 1.2, 1.1),
            swing: spread(steadyState.swing, 1.1),
            fluctuation: spread(steadyState.fluctuation, 1.1),
            timed: null,
            highestTrough: null,
          },
          steadyChance: { below: 0.16, within: 0.74, above: 0.1 },
          shareNeverSteady: 0,
          toxicChance: 0,
          halfLifeH: halfLifeH === null ? null : spread(halfLifeH * 1.2, 1.1),
        },
      };
    }),
  };
}
