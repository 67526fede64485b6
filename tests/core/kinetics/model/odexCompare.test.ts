import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { modelAmounts, modelExposure, modelProfile } from "../../../../src/core/kinetics/index.ts";
import { WorstError } from "../worstError.ts";
import { absorbedOf, historyOf, KINDS, times } from "./modelArbitraries.ts";
import { odexRun } from "./odexRun.ts";

/** Of all doses: what odex itself is good to at the tolerance it is run with (1e-13 a step). */
const BAR = 1e-10;
const RUNS = { seed: 7, numRuns: 25 };

describe.each(KINDS)("%s against an independent integrator", (kind) => {
  test("levels, amounts and area", { timeout: 120_000 }, () => {
    const worst = new WorstError();
    fc.assert(
      fc.property(historyOf(kind), times, (history, at) => {
        const total = absorbedOf(history);
        const from = at[0]! - 1;
        const to = at[at.length - 1]! + 1;
        const { states } = odexRun(history, [from, ...at, to]);
        const levels = modelProfile(history, at);
        const amounts = modelAmounts(history, at);
        for (const [i, time] of at.entries()) {
          const state = states[i + 1]!;
          const where = JSON.stringify([history, time]);
          const volume = state.level === 0 ? 1 : state.body / state.level;
          worst.note("level", (Math.abs(levels[i]! - state.level) * volume) / total, where);
          worst.note("body", Math.abs(amounts.body[i]! - state.body) / total, where);
          worst.note("peripheral", Math.abs(amounts.peripheral[i]! - state.peripheral) / total, where);
          worst.note("eliminated", Math.abs(amounts.eliminated[i]! - state.eliminated) / total, where);
        }
        const { auc } = modelExposure(history, from, to);
        const area = states[states.length - 1]!.area - states[0]!.area;
        // The integrator's absolute tolerance is a part of the dose, for the area as for the amounts.
        worst.note("area", Math.abs(auc - area) / Math.max(area, total / 100), JSON.stringify(history));
      }),
      RUNS,
    );
    worst.report(kind);
    for (const figure of ["level", "body", "eliminated", "area", "peripheral"]) {
      expect(worst.of(figure), figure).toBeLessThanOrEqual(BAR);
    }
  });
});
