import type { Case, Observation } from "../case/index.ts";
import { creatinineMgPerDl, type Doubt, type FormulaSource } from "../patient/index.ts";
import { instantMs } from "../time/index.ts";
import { quantityConvert } from "../units/index.ts";
import type { Traced } from "./analysisTypes.ts";

/** The latest observation of a kind at or before the now line; null when there is none. */
export function latestObservation(value: Case, kind: Observation["kind"]): Observation | null {
  const nowMs = instantMs(value.now);
  return value.patient.observations
    .filter((observation) => observation.kind === kind && instantMs(observation.at) <= nowMs)
    .reduce<Observation | null>(
      (latest, observation) =>
        latest === null || instantMs(observation.at) >= instantMs(latest.at) ? observation : latest,
      null,
    );
}

/** A formula's result with the numbers that went in; what a second look says of them becomes its remarks. */
export function patientTraced(
  value: number,
  unit: Traced["unit"],
  source: FormulaSource,
  inputs: Traced["inputs"],
  ...doubts: readonly (Doubt | Doubt["issue"] | null)[]
): Traced {
  const remarks = doubts.flatMap((each) => (each === null ? [] : ["issue" in each ? each.issue : each]));
  return {
    value,
    unit,
    formula: source.formula,
    inputs,
    source: source.citation,
    basis: source.basis,
    ...(remarks.length === 0 ? {} : { remarks }),
  };
}

/** An observation as the formulas take it: weight in kg, creatinine in mg/dL, albumin in g/L. Its own unit stands in the inputs where it differs. */
export function observationTraced(observation: Observation | null): Traced | null {
  if (observation === null) return null;
  const [value, unit] = inFormulaUnit(observation);
  const { quantity } = observation;
  const inputs =
    observation.kind === "serumCreatinine" || (observation.kind === "albumin" && quantity.unit !== unit)
      ? [{ name: "as reported", value: quantity.value, unit: quantity.unit }]
      : [];
  return { value, unit, formula: "", inputs, source: "entered", basis: "entered" };
}

function inFormulaUnit(observation: Observation): readonly [number, Traced["unit"]] {
  switch (observation.kind) {
    case "weight":
      return [quantityConvert(observation.quantity, "kg"), "kg"];
    case "serumCreatinine":
      return [creatinineMgPerDl(observation.quantity), "mg/dL"];
    case "albumin":
      return [quantityConvert(observation.quantity, "g/L"), "g/L"];
  }
}
