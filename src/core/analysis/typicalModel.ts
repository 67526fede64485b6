import type { Case } from "../case/index.ts";
import { bothReadings } from "../kinetics/index.ts";
import { type Figure, formulaEvaluate, type MedicineRecord } from "../medicine/index.ts";
import type { Issue } from "../result/index.ts";
import type { Model, PatientFigures, ProductModel, Traced } from "./analysisTypes.ts";

/** Words of a source entry as they stand beside a figure. */
export function sourceText(record: MedicineRecord, id: string): string {
  const source = record.sources[id];
  if (!source) return id;
  return [source.authors, source.title, source.year, source.place].filter((part) => part !== undefined).join(", ");
}

function tracedFigure(record: MedicineRecord, figure: Figure): Traced {
  return {
    value: figure.value,
    unit: figure.unit,
    formula: "",
    inputs: [],
    source: sourceText(record, figure.source),
    basis: figure.basis,
  };
}

/**
 * The typical patient's kinetics: the record's formulas with this patient's figures put in.
 * null with the reasons when a figure the formulas need is missing.
 */
export function typicalModel(value: Case, patient: PatientFigures): { model: Model | null; issues: readonly Issue[] } {
  const record = value.medicine;
  const covariates = {
    weight: patient.weight?.value,
    idealWeight: patient.idealWeight?.value,
    adjustedWeight: patient.adjustedWeight?.value,
    height: patient.heightCm ?? undefined,
    age: value.patient.age?.value,
    creatinineClearance: patient.creatinineClearance?.value,
    isFemale: value.patient.sex === undefined ? undefined : value.patient.sex === "female" ? 1 : 0,
  };
  const clearance = formulaEvaluate(record.kinetics.clearance.formula, covariates);
  const volume = formulaEvaluate(record.kinetics.volume.formula, covariates);
  if (!clearance.ok || !volume.ok) {
    const issues = [...(clearance.ok ? [] : clearance.issues), ...(volume.ok ? [] : volume.issues)];
    return { model: null, issues };
  }
  const traced = (part: typeof record.kinetics.clearance, result: typeof clearance.value): Traced => ({
    value: result.value,
    unit: part.unit,
    formula: part.formula,
    inputs: result.inputs,
    source: sourceText(record, part.source),
    basis: part.basis,
  });
  const cl = traced(record.kinetics.clearance, clearance.value);
  const v = traced(record.kinetics.volume, volume.value);
  const ke = cl.value / v.value;
  const derived = (number: number, unit: Traced["unit"], formula: string, inputs: Traced["inputs"]): Traced => ({
    value: number,
    unit,
    formula,
    inputs,
    source: "definition",
    basis: "derived",
  });
  const eliminationRate = derived(ke, "/h", "CL / V", [
    { name: "CL", value: cl.value, unit: "L/h" },
    { name: "V", value: v.value, unit: "L" },
  ]);
  const halfLife = derived(Math.LN2 / ke, "h", "ln 2 / ke", [{ name: "ke", value: ke, unit: "/h" }]);
  const products: ProductModel[] = record.products.map((product) => ({
    product: product.id,
    absorptionRate: tracedFigure(record, product.absorptionRate),
    lag: tracedFigure(record, product.lag),
    bioavailability: tracedFigure(record, product.bioavailability),
    readings: bothReadings({
      ka: product.absorptionRate.value,
      ke,
      volume: v.value,
      bioavailability: product.bioavailability.value,
      lag: product.lag.value,
    }),
  }));
  return { model: { clearance: cl, volume: v, eliminationRate, halfLife, products }, issues: [] };
}
