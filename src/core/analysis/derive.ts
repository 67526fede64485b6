import { type Case, caseFingerprint } from "../case/index.ts";
import { historyProfile } from "../kinetics/index.ts";
import { analysisClock } from "./analysisClock.ts";
import type { Analysis, Curve, DoseMark, Model } from "./analysisTypes.ts";
import { caseConcerns } from "./caseConcerns.ts";
import { countedByProduct, laneDoses } from "./caseDoses.ts";
import { curveTimes } from "./curveTimes.ts";
import { levelResults } from "./levelResults.ts";
import { modelCourses, modelDisposition } from "./modelCourses.ts";
import { optionReadings } from "./optionReadings.ts";
import { patientFigures } from "./patientFigures.ts";
import { typicalModel } from "./typicalModel.ts";

/** Part of the fingerprint: changes whenever the same case may give other figures. */
export const ENGINE = "ebbline-core 1";

/**
 * The whole pipeline: a case in, everything the screens, the summary and `recompute` show out.
 * Pure and deterministic; the case's own now line is the only clock.
 */
export function derive(value: Case): Analysis {
  // 1. Patient: size and kidney function at the now line.
  const patient = patientFigures(value);

  // 2. Model: the record's formulas with this patient's figures put in.
  const { model: typical, issues: modelIssues } = typicalModel(value, patient);

  // 3. Clock: the span shown, from the first thing that happened to where the options have settled.
  const clock = analysisClock(value, typical?.halfLife.value ?? null);

  // 4. Doses: every line unfolded on the clock.
  const given = laneDoses(value, value.given, "given", clock);
  const lanes = value.options.map((option) => ({ option, ...laneDoses(value, option.lines, "option", clock) }));

  // 5. Curves: what was, and what each option would make of it.
  const until = lanes.some((lane) => lane.marks.some((mark) => mark.countedMg > 0)) ? clock.nowH : clock.toH;
  const givenCurve = typical && curve(typical, given.marks, clock.fromH, until);
  const optionCurves = lanes.map(({ marks }) =>
    typical && marks.length > 0 ? curve(typical, [...given.marks, ...marks], clock.nowH, clock.toH) : null,
  );

  // 6. Levels: measured beside predicted.
  const levels = levelResults(value, given.marks, typical, clock.originMs);

  // 7. Readings: found on the segments of the curve, never on the plotting grid.
  const options = lanes.map(({ option, marks }, i) => ({
    id: option.id,
    doses: marks,
    curve: optionCurves[i] ?? null,
    typical:
      typical && marks.length > 0
        ? optionReadings(value, option.lines, countedByProduct([...given.marks, ...marks]), typical, {
            originMs: clock.originMs,
            fromH: clock.nowH,
            toH: clock.toH,
          })
        : null,
    individual: null,
  }));

  // 8. Concerns: what a human has to look at, gravest first.
  const concerns = caseConcerns({
    case: value,
    clock,
    patient,
    model: typical,
    modelIssues,
    given: given.marks,
    lineIssues: [
      ...given.issues.map((entry) => ({ ...entry, lane: "given" })),
      ...lanes.flatMap(({ option, issues }) => issues.map((entry) => ({ ...entry, lane: option.id }))),
    ],
    levels,
    options,
  });

  // 9. Fingerprint: the inputs that matter and the engine that turned them into figures.
  const fingerprint = caseFingerprint(value, ENGINE);

  const { originMs, nowH, fromH, toH, midnightsH } = clock;
  return {
    clock: { originMs, timeZone: value.timeZone, nowH, fromH, toH, midnightsH },
    patient,
    typical,
    individual: null,
    given: given.marks,
    givenCurve,
    levels,
    options,
    concerns,
    fingerprint,
    engine: ENGINE,
  };
}

function curve(model: Model, marks: readonly DoseMark[], fromH: number, toH: number): Curve {
  const courses = modelCourses(model, countedByProduct(marks));
  const timesH = curveTimes(courses, fromH, toH);
  return { timesH, values: historyProfile(modelDisposition(model), courses, timesH) };
}
