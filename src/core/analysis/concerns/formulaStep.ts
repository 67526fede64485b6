import { COVARIATE_NAMES, COVARIATES, formulaEvaluate, kineticsFormulas } from "../../medicine/index.ts";
import type { Concern } from "../analysisTypes.ts";
import { type ConcernRule, concern } from "../concernRule.ts";
import { patientCovariates } from "../patientCovariates.ts";
import { sourceText } from "../typicalModel.ts";

/** So far to either side of the patient's value it is looked. */
const NEAR = 0.05;
/** A step: more than a smooth formula moves over so little (a fourth power: by 22.8 %). Our choice. */
const STEP_LEAST = 0.23;

/** A formula of the record jumps close to this patient's value: a little more or less of it would give quite other figures. */
export const formulaStep: ConcernRule = ({ case: value, patient }) => {
  const record = value.medicine;
  const covariates = patientCovariates(value, patient, patient.creatinineClearance?.value);
  return kineticsFormulas(record).flatMap(({ name, words, formula }): Concern[] => {
    const evaluated = (own: typeof covariates) => {
      const result = formulaEvaluate(formula, own);
      return result.ok ? result.value.value : null;
    };
    const here = evaluated(covariates);
    if (here === null || here <= 0) return [];
    return COVARIATE_NAMES.flatMap((covariate): Concern[] => {
      const at = covariates[covariate];
      if (at === undefined || covariate === "isFemale") return [];
      const sides = [1 - NEAR, 1 + NEAR].flatMap((factor) => {
        const there = evaluated({ ...covariates, [covariate]: at * factor });
        return there !== null && there > 0 ? [{ at: at * factor, there, jump: Math.abs(Math.log(there / here)) }] : [];
      });
      const [steepest] = sides.sort((a, b) => b.jump - a.jump);
      if (!steepest || steepest.jump <= Math.log1p(STEP_LEAST)) return [];
      const data = {
        words: words.charAt(0).toLowerCase() + words.slice(1),
        covariate,
        covariateUnit: COVARIATES[covariate],
        at,
        here,
        nearAt: steepest.at,
        there: steepest.there,
        unit: formula.unit,
        source: sourceText(record, formula.source),
      };
      return [concern("formula-step", "check", { kind: "case", id: `${name}-${covariate}` }, data)];
    });
  });
};
