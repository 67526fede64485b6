import { kineticsDisposition } from "../../../src/core/analysis/kineticsDisposition.ts";
import { modelHalfLife, modelProfile, modelSteadyState } from "../../../src/core/kinetics/index.ts";
import {
  type Covariates,
  doseMg,
  formulaEvaluate,
  type KineticsFormulaName,
  kineticsFormulas,
  type MedicineRecord,
  productAbsorption,
  productOf,
} from "../../../src/core/medicine/index.ts";
import type { DoseAmount } from "../../../src/core/regimen/index.ts";
import { quantityConvert, type UnitCode } from "../../../src/core/units/index.ts";

/** What a built-in record gives for a patient, by the road the program takes: record, formula, product, steady state. */

/** A formula of the record's kinetics with the patient's figures put in, in the unit its kind wants. */
export function recordValue(record: MedicineRecord, name: KineticsFormulaName, covariates: Covariates): number {
  const value = recordValues(record, covariates)[name];
  if (value === undefined) throw new RangeError(`name: "${record.id}" has no ${name}`);
  return value;
}

function recordValues(record: MedicineRecord, covariates: Covariates): Readonly<Record<string, number>> {
  return Object.fromEntries(
    kineticsFormulas(record).map(({ name, formula }) => {
      const result = formulaEvaluate(formula, covariates);
      if (!result.ok) throw new Error(`${record.id}, ${name}: ${result.issues.map(({ code }) => code).join(", ")}`);
      return [name, result.value.value];
    }),
  );
}

/** h; of a saturable record it throws, as none is given. */
export function recordHalfLife(record: MedicineRecord, covariates: Covariates): number {
  const hours = modelHalfLife(kineticsDisposition(record, recordValues(record, covariates)));
  if (hours === null) throw new RangeError(`record: "${record.id}" has no half-life`);
  return hours;
}

export interface Course {
  readonly product: string;
  readonly dose: DoseAmount;
  readonly everyH: number;
}

/** The average at steady state, in `unit`. */
export function recordAverage(
  record: MedicineRecord,
  covariates: Covariates,
  { product: id, dose, everyH }: Course,
  unit: UnitCode = "mg/L",
): number {
  const product = productOf(record, id);
  const mg = doseMg(dose, product);
  if (!mg.ok) throw new Error(`${record.id}, ${id}: ${mg.issues.map(({ code }) => code).join(", ")}`);
  const input = {
    absorption: productAbsorption(product),
    bioavailability: product.bioavailability.value,
    lag: product.lag.value,
    doses: [{ time: 0, amount: mg.value }],
  };
  const steady = modelSteadyState(kineticsDisposition(record, recordValues(record, covariates)), [input], everyH);
  if (steady.status !== "settled") throw new Error(`${record.id}, ${id}: no steady state`);
  return quantityConvert({ value: steady.average, unit: "mg/L" }, unit, record.molarMass.value);
}

/** When a single dose peaks, h after it, to 0.01 h; searched over two days. */
export function recordPeakTime(record: MedicineRecord, covariates: Covariates, id: string): number {
  const product = productOf(record, id);
  const input = {
    absorption: productAbsorption(product),
    bioavailability: product.bioavailability.value,
    lag: product.lag.value,
    doses: [{ time: 0, amount: 100 }],
  };
  const disposition = kineticsDisposition(record, recordValues(record, covariates));
  const times = Array.from({ length: 4_801 }, (_, i) => i / 100);
  const dispositions = [{ from: Number.NEGATIVE_INFINITY, disposition }];
  const levels = modelProfile({ dispositions, inputs: [input] }, times);
  let best = 0;
  for (let i = 1; i < levels.length; i += 1) if (levels[i]! > levels[best]!) best = i;
  return times[best]!;
}

/** Of a window of the record, its ends in `unit`. */
export function recordWindow(record: MedicineRecord, id: string, unit: UnitCode): readonly [low: number, high: number] {
  const window = record.windows.find((each) => each.id === id);
  if (!window) throw new RangeError(`id: "${record.id}" has no window "${id}"`);
  const ends = [window.low, window.high].map((end) => quantityConvert(end, unit, record.molarMass.value));
  return ends as [number, number];
}

/** Molar units in one mass unit, by the record's molar mass: what sources print as the factor between the two. */
export function recordFactor(record: MedicineRecord, from: UnitCode, to: UnitCode): number {
  return quantityConvert({ value: 1, unit: from }, to, record.molarMass.value);
}
