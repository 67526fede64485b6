import { ENGINE } from "../../src/core/analysis/index.ts";
import { type CalibrationModel, calibrationModels } from "./calibrationModels.ts";
import type {
  CalibrationResults,
  ForecastRow,
  MeanWithError,
  ModelCalibration,
  PlantedFault,
  RankedQuantity,
} from "./calibrationResults.ts";
import { RANK_DRAWS } from "./patientFit.ts";
import { type ForecastLook, type PatientLook, patientLook } from "./patientLook.ts";
import { rankUniformity } from "./rankUniformity.ts";
import { MOST_LEVELS } from "./simulatedPatient.ts";

export interface CalibrationPlan {
  /** A model. */
  readonly patients: number;
  readonly planted: number;
}

export const FULL_PLAN: CalibrationPlan = { patients: 500, planted: 100 };
export const quickPlan = (patients: number): CalibrationPlan => ({ patients, planted: patients });

const SEEDS_A_MODEL = 1_000_000;

/** Everything but what the clock and the machine say. `told` hears how far it is. */
export function calibrate(
  { patients, planted }: CalibrationPlan,
  told: (line: string) => void,
): Omit<CalibrationResults, "date" | "machine" | "seconds"> {
  const models = calibrationModels();
  const looked = models.map((model, m) => {
    const looks = Array.from({ length: patients }, (_, nth) => {
      if (nth > 0 && nth % 50 === 0) told(`${model.id}: ${nth} of ${patients} patients`);
      return patientLook(model, nth, firstSeed(m) + nth);
    });
    return modelCalibration(model, firstSeed(m), looks);
  });
  told(`a fault put in on purpose: ${planted} patients`);
  const looks = Array.from({ length: planted }, (_, nth) => plantedLook(models, nth));
  return { engine: ENGINE, rankDraws: RANK_DRAWS, models: looked, planted: plantedFault(models, looks) };
}

/** Of the nth model. */
export const firstSeed = (nth: number) => (nth + 1) * SEEDS_A_MODEL;

/** The first model's fits are told half the residual error that the levels have. */
export function plantedLook(models: readonly CalibrationModel[], nth: number): PatientLook {
  const { additive, proportional } = models[0]!.residual;
  const residual = { additive: additive / 2, proportional: proportional / 2 };
  return patientLook(models[0]!, nth, firstSeed(models.length) + nth, { residual });
}

export function plantedFault(models: readonly CalibrationModel[], looks: readonly PatientLook[]): PlantedFault {
  const ranks = rankedQuantities(models[0]!, looks);
  const { quantity, counts, chiSquare, p } = ranks.at(-1)!;
  const fault = "the fits are told half the residual error that the levels have";
  return { fault, model: models[0]!.id, patients: sum(counts), quantity, chiSquare, p };
}

export function modelCalibration(
  model: CalibrationModel,
  first: number,
  looks: readonly PatientLook[],
): ModelCalibration {
  const count = (outcome: PatientLook["outcome"]) => looks.filter((look) => look.outcome === outcome).length;
  const figures = Object.entries(model.disposition).filter((entry): entry is [string, number] => entry[0] !== "kind");
  return {
    id: model.id,
    name: model.name,
    record: model.record.id,
    recordVersion: model.record.recordVersion,
    typical: Object.fromEntries(figures.map(([name, value]) => [name, rounded(value)])),
    random: model.random.map(({ omega }, i) => ({ symbol: model.symbols[i]!, omega: rounded(omega) })),
    residual: { additive: rounded(model.residual.additive), proportional: rounded(model.residual.proportional) },
    limit: model.limit,
    draws: model.draws,
    patients: looks.length,
    firstSeed: first,
    fits: {
      notConverged: count("not-converged"),
      withheld: count("withheld"),
      chain: count("chain"),
      levels: sum(looks.map(({ levels }) => levels)),
      belowLimit: sum(looks.map(({ belowLimit }) => belowLimit)),
    },
    ranks: rankedQuantities(model, looks),
    coverage: coverageOf(looks.filter(({ ranks }) => ranks !== null)),
    forecasts: Array.from({ length: MOST_LEVELS + 1 }, (_, known) =>
      forecastRow(
        known,
        looks.flatMap(({ typical, levels, forecast }) => {
          if (known === 0) return [typical];
          return levels === known && forecast ? [forecast] : [];
        }),
      ),
    ).filter(({ patients }) => patients > 0),
  };
}

function rankedQuantities(model: CalibrationModel, looks: readonly PatientLook[]): RankedQuantity[] {
  return [...model.symbols, "next trough"].map((quantity, q) => {
    const counts = Array.from({ length: RANK_DRAWS + 1 }, () => 0);
    for (const { ranks } of looks) if (ranks) counts[ranks[q]!]!++;
    const { chiSquare, p } = rankUniformity(counts);
    return { quantity, counts, chiSquare: rounded(chiSquare), p: rounded(p) };
  });
}

function coverageOf(drawn: readonly PatientLook[]): ModelCalibration["coverage"] {
  const trough = (rows: readonly (readonly boolean[])[]) => rounded(share(rows.map((row) => row.at(-1)!)));
  const half = drawn.map(({ isWithin50 }) => isWithin50);
  const most = drawn.map(({ isWithin90 }) => isWithin90);
  return {
    patients: drawn.length,
    trough50: trough(half),
    trough90: trough(most),
    band50: meanWithError(half.map(share)),
    band90: meanWithError(most.map(share)),
  };
}

function forecastRow(levels: number, looks: readonly ForecastLook[]): ForecastRow {
  const errors = looks.map(({ error }) => error);
  const sizes = errors.map(Math.abs).sort((a, b) => a - b);
  const middle = (sizes.length - 1) / 2;
  return {
    levels,
    patients: looks.length,
    meanError: meanWithError(errors),
    rootMeanSquare: rounded(Math.sqrt(mean(errors.map((error) => error * error)))),
    medianAbsolute: rounded((sizes[Math.floor(middle)]! + sizes[Math.ceil(middle)]!) / 2),
    cover90: rounded(share(looks.map(({ isCovered }) => isCovered))),
  };
}

function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}

function mean(values: readonly number[]): number {
  return sum(values) / values.length;
}

function share(truths: readonly boolean[]): number {
  return truths.filter(Boolean).length / truths.length;
}

function meanWithError(values: readonly number[]): MeanWithError {
  const middle = mean(values);
  const squares = sum(values.map((value) => (value - middle) ** 2));
  const standardError = Math.sqrt(squares / Math.max(1, values.length - 1) / values.length);
  return { mean: rounded(middle), standardError: rounded(standardError) };
}

/** Four places are more than chance leaves. */
function rounded(value: number): number {
  return Number(value.toPrecision(4));
}
