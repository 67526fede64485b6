import { expect, test } from "vitest";
import { EstimationObjective } from "../../../src/core/estimation/estimationObjective.ts";
import { type EstimationProblem, estimateMostLikely } from "../../../src/core/estimation/index.ts";
import { calibrationModels } from "../../calibration/calibrationModels.ts";
import { simulatedPatient, simulatedProblem } from "../../calibration/simulatedPatient.ts";

/** Patients whose most likely ka lets a zero-order part end at a level's time: found by calibration. */
test.each([
  [87, 3],
  [178, 2],
  [316, 1],
])("a lowest point at a kink is a minimum: simulated patient %i, %i levels", (nth, levels) => {
  const model = calibrationModels()[1]!;
  const patient = simulatedPatient(model, nth, 2_000_000 + nth);
  const problem: EstimationProblem = simulatedProblem(model, patient, levels);
  const map = estimateMostLikely(problem);
  if (map.status !== "converged") throw new Error(JSON.stringify(map));
  const objective = new EstimationObjective(problem);
  const least = objective.value(map.eta);
  expect(least).toBe(map.objective);
  // Higher all around: 200 points on spheres of three sizes about it.
  for (const radius of [1e-5, 1e-3, 0.05]) {
    for (let n = 0; n < 200; n++) {
      const direction = map.eta.map((_, i) => Math.sin(12.9898 * (n + 1) * (i + 1)));
      const length = Math.hypot(...direction);
      const near = map.eta.map((each, i) => each + (radius * direction[i]!) / length);
      expect(objective.value(near)).toBeGreaterThan(least);
    }
  }
});
