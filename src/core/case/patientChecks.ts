import {
  ageQuestion,
  albuminQuestion,
  creatinineQuestion,
  type Doubt,
  heightQuestion,
  weightQuestion,
} from "../patient/index.ts";
import { type Issue, issue } from "../result/index.ts";
import { instantMs } from "../time/index.ts";
import { quantityConvert } from "../units/index.ts";
import type { Factor, Observation, Patient } from "./caseSchema.ts";
import { duplicateIds } from "./duplicateIds.ts";

type Path = readonly (string | number)[];

/** What can't be true of a patient. What is only improbable is asked about where it is entered, not here. */
export function patientChecks({ age, height, observations, factors }: Patient): Issue[] {
  const issues = duplicateIds(observations, ["patient", "observations"]);
  if (age) issues.push(...impossible(ageQuestion(age.value), ["patient", "age", "value"]));
  if (height) {
    const heightCm = quantityConvert(height, "cm");
    issues.push(...impossible(heightQuestion({ heightCm }), ["patient", "height", "value"]));
  }
  observations.forEach((each, i) => {
    issues.push(...observationIssues(each, ["patient", "observations", i, "quantity", "value"]));
  });
  factors.forEach((factor, i) => {
    issues.push(...factorIssues(factor, ["patient", "factors", i]));
  });
  return issues;
}

/** Ours: slower than any known enzyme induction; and one step a day is worked out for each day of it. */
const LONGEST_ONSET_D = 365;

function factorIssues({ from, to, effect }: Factor, path: Path): Issue[] {
  const issues: Issue[] = [];
  const lasts = to === undefined ? Number.POSITIVE_INFINITY : instantMs(to) - instantMs(from);
  if (lasts < 0) issues.push(issue("factor-order", { from, to }, [...path, "to"]));
  if (effect && lasts === 0) issues.push(issue("factor-effect-empty", { from }, [...path, "to"]));
  const onset = effect?.onset?.value;
  if (onset !== undefined && !(onset > 0 && onset <= LONGEST_ONSET_D)) {
    issues.push(issue("factor-onset", { found: onset, most: LONGEST_ONSET_D }, [...path, "effect", "onset", "value"]));
  }
  return issues;
}

function observationIssues(observation: Observation, path: Path): Issue[] {
  switch (observation.kind) {
    case "weight":
      return impossible(weightQuestion({ weightKg: quantityConvert(observation.quantity, "kg") }), path);
    case "serumCreatinine":
      return impossible(creatinineQuestion(observation.quantity), path);
    case "albumin":
      return impossible(albuminQuestion(observation.quantity), path);
  }
}

function impossible(doubt: Doubt | null, path: Path): Issue[] {
  return doubt?.verdict === "impossible" ? [{ ...doubt.issue, path }] : [];
}
