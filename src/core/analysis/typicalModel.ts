import type { Case } from "../case/index.ts";
import { distributionEnd, modelBothReadings, modelHalfLife } from "../kinetics/index.ts";
import {
  type Figure,
  formulaEvaluate,
  kineticsFormulas,
  type MedicineRecord,
  productAbsorption,
} from "../medicine/index.ts";
import type { Issue } from "../result/index.ts";
import type { Model, NamedFigure, PatientFigures, ProductModel, Traced } from "./analysisTypes.ts";
import { type KineticsValues, kineticsDisposition } from "./kineticsDisposition.ts";
import { patientCovariates } from "./patientCovariates.ts";

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

/** The model before any event's effect; what changes on the case clock is laid out once the clock is known. */
export interface ModelAtNow extends Pick<Model, "kind" | "parameters" | "products" | "distributionEndH"> {
  readonly halfLifeH: number | null;
}

/**
 * The typical patient's kinetics at the now line: the record's formulas with this patient's figures put in.
 * null with the reasons when a figure the formulas need is missing.
 */
export function typicalModel(
  value: Case,
  patient: PatientFigures,
): { readonly model: ModelAtNow | null; readonly issues: readonly Issue[] } {
  const record = value.medicine;
  const covariates = patientCovariates(value, patient, patient.creatinineClearance?.value);
  const parameters: NamedFigure[] = [];
  const values: Partial<Record<string, number>> = {};
  const issues: Issue[] = [];
  for (const { name, symbol, words, formula } of kineticsFormulas(record)) {
    const result = formulaEvaluate(formula, covariates);
    if (!result.ok) {
      issues.push(...result.issues);
      continue;
    }
    values[name] = result.value.value;
    const figure: Traced = {
      value: result.value.value,
      unit: formula.unit,
      formula: formula.formula,
      inputs: result.value.inputs,
      source: sourceText(record, formula.source),
      basis: formula.basis,
    };
    parameters.push({ symbol, words, figure });
  }
  if (issues.length > 0) return { model: null, issues: withoutRepeats(issues) };

  const disposition = kineticsDisposition(record, values as KineticsValues);
  const products: ProductModel[] = record.products.map((product) => {
    const absorption = productAbsorption(product);
    return {
      product: product.id,
      absorption,
      absorptionRate: product.absorptionRate ? tracedFigure(record, product.absorptionRate) : null,
      inputFigures: Object.entries({ ...product.input, saltFactor: product.saltFactor }).flatMap(([name, figure]) =>
        typeof figure === "object" && figure !== undefined
          ? [{ symbol: name, words: INPUT_WORDS[name] ?? name, figure: tracedFigure(record, figure) }]
          : [],
      ),
      lag: tracedFigure(record, product.lag),
      bioavailability: tracedFigure(record, product.bioavailability),
      readings: modelBothReadings(disposition, absorption, product.bioavailability.value, product.lag.value),
    };
  });
  // What a source says of sampling goes before what the model's own rates would give.
  const earliest = record.earliestSample?.value;
  const distributionEndH = Object.fromEntries(
    products.map((product) => [
      product.product,
      earliest ?? product.lag.value + distributionEnd(disposition, product.absorption),
    ]),
  );
  return {
    model: { kind: disposition.kind, parameters, halfLifeH: modelHalfLife(disposition), products, distributionEndH },
    issues: [],
  };
}

const INPUT_WORDS: Readonly<Record<string, string>> = {
  duration: "Absorbed evenly over",
  fastFraction: "Fast part of the dose",
  slowRate: "Absorption rate of the slow part",
  slowDuration: "Slow part absorbed evenly over",
  slowLag: "Lag of the slow part",
  saltFactor: "Active part of the labelled amount",
};

/** The same missing covariate is told once, however many formulas need it. */
function withoutRepeats(issues: readonly Issue[]): Issue[] {
  const seen = new Set<string>();
  return issues.filter((issue) => {
    const key = JSON.stringify([issue.code, issue.data.name ?? issue.data]);
    return !seen.has(key) && seen.add(key);
  });
}
