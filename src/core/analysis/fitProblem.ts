import type { Case } from "../case/index.ts";
import type { EstimationLevel, EstimationProblem, RandomParameter } from "../estimation/index.ts";
import type { KineticsParameter, ModelHistory } from "../kinetics/index.ts";
import type { MedicineRecord } from "../medicine/index.ts";
import type { DoseMark, LevelResult, Model } from "./analysisTypes.ts";
import { countedByProduct } from "./caseDoses.ts";
import type { NoFitReason } from "./fitTypes.ts";
import { modelHistory } from "./modelInputs.ts";

/** A parameter that varies between patients, with what it is called and where the record states by how much. */
export interface FitParameter extends RandomParameter {
  readonly symbol: string;
  /** Of the record's variability. */
  readonly stated: VariabilityName;
}

type VariabilityName = Exclude<
  keyof MedicineRecord["variability"],
  "residualProportional" | "residualAdditive" | "correlations"
>;

/** Which figure of a record's variability stands for which parameter of the kinetics; the symbols are those of the record's formulas. */
const PARAMETERS: Readonly<
  Record<Model["kind"], readonly { readonly name: KineticsParameter; stated: VariabilityName; symbol: string }[]>
> = {
  "one-compartment": [
    { name: "clearance", stated: "clearance", symbol: "CL" },
    { name: "volume", stated: "volume", symbol: "V" },
  ],
  "two-compartment": [
    { name: "clearance", stated: "clearance", symbol: "CL" },
    { name: "volume", stated: "volume", symbol: "V1" },
    { name: "exchange", stated: "exchange", symbol: "Q" },
    { name: "peripheralVolume", stated: "peripheralVolume", symbol: "V2" },
  ],
  saturable: [
    { name: "vmax", stated: "maximumRate", symbol: "Vmax" },
    { name: "km", stated: "halfMaximum", symbol: "Km" },
    { name: "volume", stated: "volume", symbol: "V" },
  ],
};

const OF_PRODUCTS = [
  { name: "ka", stated: "absorptionRate", symbol: "ka" },
  { name: "bioavailability", stated: "bioavailability", symbol: "F" },
] as const;

export interface FitProblem {
  readonly problem: EstimationProblem;
  readonly parameters: readonly FitParameter[];
  /** In the order of the problem's levels. */
  readonly used: readonly LevelResult[];
  /** The typical patient's history of what was given. */
  readonly history: ModelHistory;
}

export type FitProblemResult =
  | { readonly ok: true; readonly value: FitProblem }
  | { readonly ok: false; readonly reason: NoFitReason };

/**
 * The levels and the typical patient as the estimation takes them. A level left out by the user or drawn before the first dose is not in it.
 * Residual error and variation between patients are the record's own.
 */
export function fitProblem(
  value: Case,
  typical: Model | null,
  given: readonly DoseMark[],
  levels: readonly LevelResult[],
): FitProblemResult {
  if (levels.length === 0) return { ok: false, reason: "no-levels" };
  const notLeftOut = levels.filter((level) => level.excluded === null);
  if (notLeftOut.length === 0) return { ok: false, reason: "all-left-out" };
  if (!typical) return { ok: false, reason: "no-model" };
  const used = notLeftOut.filter((level) => level.afterDoseH !== null);
  if (used.length === 0) return { ok: false, reason: "before-first-dose" };
  const parameters = fitParameters(value.medicine, typical.kind);
  if (parameters.length === 0) return { ok: false, reason: "no-variability" };
  const residual = recordResidual(value.medicine);
  if (!residual) return { ok: false, reason: "no-residual" };
  const history = modelHistory(typical, countedByProduct(given));
  const correlation = correlationOf(value.medicine, parameters);
  const problem: EstimationProblem = {
    history,
    random: parameters.map(({ name, omega }) => ({ name, omega })),
    ...(correlation && { correlation }),
    residual,
    levels: used.map(
      (level): EstimationLevel => ({
        time: level.atH,
        value: level.measured,
        kind: level.belowLimit ? "below-limit" : "measured",
      }),
    ),
    residualModel: value.fit.residualModel,
  };
  return { ok: true, value: { problem, parameters, used, history } };
}

/** What varies between patients, as the record states it. */
function fitParameters({ variability }: MedicineRecord, kind: Model["kind"]): FitParameter[] {
  return [...PARAMETERS[kind], ...OF_PRODUCTS].flatMap((parameter) => {
    const figure = variability[parameter.stated];
    if (!figure || figure.value === 0) return [];
    return [{ ...parameter, omega: omegaOfVariation(figure.unit === "%" ? figure.value / 100 : figure.value) }];
  });
}

/**
 * Standard deviation on the ln scale of a log-normal quantity whose coefficient of variation is `variation`.
 * omega = sqrt(ln(1 + variation²)). Example: 0.335 gives 0.3263.
 * Source: property of the log-normal distribution.
 */
export function omegaOfVariation(variation: number): number {
  return Math.sqrt(Math.log1p(variation * variation));
}

function recordResidual({ variability }: MedicineRecord): EstimationProblem["residual"] | null {
  const { residualAdditive, residualProportional } = variability;
  const additive = residualAdditive?.value ?? 0;
  const proportional = (residualProportional?.value ?? 0) / 100;
  return additive > 0 || proportional > 0 ? { additive, proportional } : null;
}

function correlationOf({ variability }: MedicineRecord, parameters: readonly FitParameter[]): number[][] | undefined {
  const stated = variability.correlations;
  if (!stated || stated.length === 0) return undefined;
  return parameters.map((row) =>
    parameters.map((column) => {
      if (row === column) return 1;
      const found = stated.find(({ between: [a, b] }) => isPair(a, b, row.stated, column.stated));
      return found?.value ?? 0;
    }),
  );
}

function isPair(a: string, b: string, one: string, other: string): boolean {
  return (a === one && b === other) || (a === other && b === one);
}
