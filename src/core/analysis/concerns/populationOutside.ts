import { COVARIATES, type PopulationRange } from "../../medicine/index.ts";
import { quantityConvert, unitsCompatible } from "../../units/index.ts";
import { type ConcernRule, concern } from "../concernRule.ts";
import { patientCovariates } from "../patientCovariates.ts";
import { sourceText } from "../typicalModel.ts";

const ADULT_YEARS = 18;

/** Something known of the patient lies outside the people the record's figures come from: one concern a covariate. */
export const populationOutside: ConcernRule = ({ case: value, patient }) => {
  const { population } = value.medicine;
  const covariates = patientCovariates(value, patient, patient.creatinineClearance?.value);
  return population.ranges.flatMap((range) => {
    const found = covariates[range.covariate];
    if (found === undefined || !isOutside(found, range)) return [];
    const { covariate, low = null, high = null, unit } = range;
    const isChildAmongAdults = covariate === "age" && found < ADULT_YEARS;
    return [
      concern(
        "outside-population",
        isChildAmongAdults ? "stop" : "check",
        { kind: "patient", id: covariate },
        {
          covariate,
          value: found,
          valueUnit: COVARIATES[covariate],
          low,
          high,
          unit,
          population: population.text,
          source: sourceText(value.medicine, range.source),
        },
      ),
    ];
  });
};

/** Ends belong to the range: it is where the patients lay. */
function isOutside(found: number, { covariate, low, high, unit }: PopulationRange): boolean {
  const own = COVARIATES[covariate];
  if (!unitsCompatible(own, unit)) return false;
  const value = quantityConvert({ value: found, unit: own }, unit);
  return (low !== undefined && value < low) || (high !== undefined && value > high);
}
