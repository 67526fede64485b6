import { type Case, caseFingerprint } from "../case/index.ts";
import { modelProfile } from "../kinetics/index.ts";
import { analysisClock } from "./analysisClock.ts";
import type { Analysis, Curve, DoseMark, Model } from "./analysisTypes.ts";
import { caseConcerns } from "./caseConcerns.ts";
import { countedByProduct, laneDoses } from "./caseDoses.ts";
import { crossCheckFigures } from "./crossCheckFigures.ts";
import { curveTimes } from "./curveTimes.ts";
import { finalModel } from "./finalModel.ts";
import { individualSteps } from "./individualSteps.ts";
import { kineticsChanges } from "./kineticsChanges.ts";
import { levelResults } from "./levelResults.ts";
import { modelHistory } from "./modelInputs.ts";
import { optionReadings } from "./optionReadings.ts";
import { patientFigures } from "./patientFigures.ts";
import { typicalModel } from "./typicalModel.ts";

/** Part of the fingerprint: changes whenever the same case may give other figures. */
export const ENGINE = "ebbline-core 3";

export interface DeriveOptions {
  /** Fits the levels too; without it a case that has levels to fit says "pending". It takes longer than the rest together. */
  readonly isFitted?: boolean;
  /** Makes the cross-check too: the second road to every figure. It takes many times as long, so a drag goes without. */
  readonly isCrossChecked?: boolean;
}

/**
 * The whole pipeline: a case in, everything the screens, the summary and `recompute` show out.
 * Pure and deterministic; the case's own now line is the only clock.
 */
export function derive(value: Case, options: DeriveOptions = {}): Analysis {
  const steps = deriveSteps(value, options);
  for (;;) {
    const step = steps.next();
    if (step.done) return step.value;
  }
}

/** The same in steps, for a caller that has to listen in between: yields the part of the fit done, 0 to 1. */
export function* deriveSteps(
  value: Case,
  { isFitted = false, isCrossChecked = false }: DeriveOptions = {},
): Generator<number, Analysis> {
  // 1. Patient: size and kidney function at the now line.
  const patient = patientFigures(value);

  // 2. Model: the record's formulas with this patient's figures put in, at the now line.
  const { model: atNow, issues: modelIssues } = typicalModel(value, patient);

  // 3. Clock: the span shown, from the first thing that happened to where the options have settled; and on it, what changes the kinetics.
  const clock = analysisClock(value, atNow?.halfLifeH ?? null, atNow?.kind === "saturable");
  const typical = atNow && finalModel(atNow, kineticsChanges(value, patient, clock.originMs));

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
  const typicalLevels = levelResults(value, given.marks, typical, clock.originMs);

  // 7. Readings: found on the segments of the curve, never on the plotting grid.
  const typicalOptions = lanes.map(({ option, marks }, i) => ({
    id: option.id,
    doses: marks,
    curve: optionCurves[i] ?? null,
    typical:
      typical && marks.length > 0
        ? optionReadings(value, option.lines, countedByProduct([...given.marks, ...marks]), typical, {
            originMs: clock.originMs,
            fromH: clock.nowH,
            toH: clock.readingsToH,
          })
        : null,
    individual: null,
    band: null,
  }));

  // 8. This patient: what the levels make of it, with bands and intervals from the draws.
  const individual = yield* individualSteps(value, {
    typical,
    given: given.marks,
    levels: typicalLevels,
    options: typicalOptions,
    givenUntilH: until,
    clock,
    isFitted,
  });
  const { levels, options } = individual;

  // 9. Cross-check: the displayed profile and exposure by another road.
  const crossCheck = isCrossChecked && typical ? crossCheckFigures(value, typical, given.marks, options, clock) : null;

  // 10. Concerns: what a human has to look at, gravest first.
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
    fit: individual.fit,
    options,
    crossCheck,
  });

  // 11. Fingerprint: the inputs that matter and the engine that turned them into figures.
  const fingerprint = caseFingerprint(value, ENGINE);

  const { originMs, nowH, fromH, toH, readingsToH, midnightsH } = clock;
  return {
    clock: { originMs, timeZone: value.timeZone, nowH, fromH, toH, readingsToH, midnightsH },
    patient,
    typical,
    fit: individual.fit,
    given: given.marks,
    givenCurve,
    givenBand: individual.givenBand,
    levels,
    options,
    concerns,
    crossCheck,
    fingerprint,
    engine: ENGINE,
  };
}

function curve(model: Model, marks: readonly DoseMark[], fromH: number, toH: number): Curve {
  const history = modelHistory(model, countedByProduct(marks));
  const timesH = curveTimes(history, fromH, toH);
  return { timesH, values: modelProfile(history, timesH) };
}
