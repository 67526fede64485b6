import { DRAW_COUNTS, type DrawCounts } from "../../src/core/analysis/drawCounts.ts";
import { omegaOfVariation } from "../../src/core/analysis/fitProblem.ts";
import { kineticsDisposition } from "../../src/core/analysis/kineticsDisposition.ts";
import { type ReferencePatient, referenceCovariates } from "../../src/core/analysis/referenceCovariates.ts";
import type { EstimationProblem } from "../../src/core/estimation/index.ts";
import type { KineticsParameter, ModelDisposition, ModelInput } from "../../src/core/kinetics/index.ts";
import {
  doseMg,
  formulaEvaluate,
  kineticsFormulas,
  type MedicineRecord,
  productAbsorption,
  productOf,
  recordById,
} from "../../src/core/medicine/index.ts";

/** A dose and an interval as they may be prescribed. */
export interface CalibrationCourse {
  readonly product: string;
  /** mg as labelled. */
  readonly doseMg: number;
  readonly intervalH: number;
}

/** Where the simulated patients of a row of the table come from. */
export interface CalibrationModel {
  readonly id: string;
  readonly name: string;
  readonly record: MedicineRecord;
  readonly random: EstimationProblem["random"];
  /** Symbols of `random`, in its order. */
  readonly symbols: readonly string[];
  readonly correlation: readonly (readonly number[])[];
  readonly residual: EstimationProblem["residual"];
  /** Levels below it are reported as below it, mg/L. */
  readonly limit: number;
  readonly disposition: ModelDisposition;
  /** Patients take them in turn. */
  readonly courses: readonly CalibrationCourse[];
  /** As this patient's figures have them. */
  readonly draws: Pick<DrawCounts, "posterior" | "carried">;
}

/** Invented: one reference patient, so that all that differs between the simulated ones is what the record says differs. */
export const CALIBRATION_PATIENT: ReferencePatient = {
  sex: "male",
  ageYears: 50,
  weightKg: 70,
  heightCm: 172,
  creatinineClearanceMlPerMin: 90,
  albuminGPerL: 40,
};

type Stated = Exclude<
  keyof MedicineRecord["variability"],
  "residualProportional" | "residualAdditive" | "correlations"
>;
type Varied = readonly [symbol: string, name: KineticsParameter, stated: Stated];

const LINEAR: readonly Varied[] = [
  ["CL", "clearance", "clearance"],
  ["V", "volume", "volume"],
  ["ka", "ka", "absorptionRate"],
];
const SATURABLE: readonly Varied[] = [
  ["Vmax", "vmax", "maximumRate"],
  ["Km", "km", "halfMaximum"],
  ["V", "volume", "volume"],
];

/** The three models. Doses and intervals are invented, within what the record allows. */
export function calibrationModels(): readonly CalibrationModel[] {
  const immediate = ["tablet"].flatMap((product) => [
    { product, doseMg: 250, intervalH: 12 },
    { product, doseMg: 125, intervalH: 6 },
    { product, doseMg: 250, intervalH: 8 },
    { product, doseMg: 125, intervalH: 8 },
  ]);
  const modified = ["capsule-slow", "capsule-two-phase"].flatMap((product) => [
    { product, doseMg: 200, intervalH: 12 },
    { product, doseMg: 300, intervalH: 12 },
    { product, doseMg: 400, intervalH: 24 },
  ]);
  const saturable = [
    { doseMg: 200, intervalH: 24 },
    { doseMg: 300, intervalH: 24 },
    { doseMg: 100, intervalH: 8 },
    { doseMg: 200, intervalH: 12 },
  ].map((course) => ({ product: "capsule-er", ...course }));
  return [
    modelOf("immediate", "one compartment, immediate release", "theophylline", LINEAR, 0.5, immediate),
    modelOf(
      "modified",
      "one compartment, modified release: slow first-order (flip-flop) and two-phase capsules by turns",
      "demoxiline",
      LINEAR,
      0.4,
      modified,
    ),
    modelOf("saturable", "Michaelis–Menten", "phenytoin", SATURABLE, 0.5, saturable),
  ];
}

function modelOf(
  id: string,
  name: string,
  recordId: string,
  varied: readonly Varied[],
  limit: number,
  courses: readonly CalibrationCourse[],
): CalibrationModel {
  const record = recordById(recordId);
  if (!record) throw new RangeError(`recordId: no record "${recordId}"`);
  const { variability } = record;
  const covariates = referenceCovariates(CALIBRATION_PATIENT);
  const values = Object.fromEntries(
    kineticsFormulas(record).map((formula) => {
      const found = formulaEvaluate(formula.formula, covariates);
      if (!found.ok) throw new RangeError(`${recordId} ${formula.name}: ${JSON.stringify(found.issues)}`);
      return [formula.name, found.value.value];
    }),
  );
  const omega = ([symbol, , stated]: Varied) => {
    const figure = variability[stated];
    if (figure?.unit !== "%") throw new RangeError(`${recordId}: no variability of ${symbol} in %`);
    return omegaOfVariation(figure.value / 100);
  };
  const correlation = varied.map(([, , a]) =>
    varied.map(([, , b]) => {
      if (a === b) return 1;
      return variability.correlations?.find(({ between }) => between.includes(a) && between.includes(b))?.value ?? 0;
    }),
  );
  const disposition = kineticsDisposition(record, values);
  const { posterior, carried } = DRAW_COUNTS[disposition.kind];
  return {
    id,
    name,
    record,
    random: varied.map((each) => ({ name: each[1], omega: omega(each) })),
    symbols: varied.map(([symbol]) => symbol),
    correlation,
    residual: {
      additive: variability.residualAdditive?.value ?? 0,
      proportional: (variability.residualProportional?.value ?? 0) / 100,
    },
    limit,
    disposition,
    courses,
    draws: { posterior, carried },
  };
}

/** A course's product with doses at the given times, h. */
export function calibrationInput(
  { record }: CalibrationModel,
  course: CalibrationCourse,
  times: readonly number[],
): ModelInput {
  const product = productOf(record, course.product);
  const active = doseMg({ value: course.doseMg, unit: "mg" }, product);
  if (!active.ok) throw new RangeError(`doseMg: ${course.doseMg} mg`);
  return {
    absorption: productAbsorption(product),
    bioavailability: product.bioavailability.value,
    lag: product.lag.value,
    doses: times.map((time) => ({ time, amount: active.value })),
  };
}
