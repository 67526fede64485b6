import { type ConcernRule, concern } from "../concernRule.ts";

/** The patient's age lies outside the population the record's figures come from. */
export const ageOutside: ConcernRule = ({ case: { patient, medicine } }) => {
  const age = patient.age?.value;
  if (age === undefined) return [];
  const range = medicine.population.ranges.find((each) => each.covariate === "age");
  const [ageMin, ageMax] = [range?.low, range?.high];
  const outside = (ageMin !== undefined && age < ageMin) || (ageMax !== undefined && age > ageMax);
  return outside
    ? [
        concern(
          "age-outside-population",
          age < 18 ? "stop" : "check",
          { kind: "patient" },
          {
            age,
            ageMin: ageMin ?? null,
            ageMax: ageMax ?? null,
            population: medicine.population.text,
          },
        ),
      ]
    : [];
};
