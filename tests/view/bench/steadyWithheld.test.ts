import { expect, test } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import { isSteadyWithheld, steadyWithheldNotes } from "../../../src/view/bench/steadyWithheld.ts";
import { caseFixture } from "../../core/analysis/caseFixture.ts";
import { fittedAnalysis } from "../../core/analysis/fitFixture.ts";

const fitted = fittedAnalysis(
  derive(
    caseFixture({
      levels: [{ id: "l", at: "2026-03-04T07:30:00+00:00", quantity: { value: 5, unit: "mg/L" }, kind: "measured" }],
    }),
  ),
);
const [option] = fitted.options;

test("a figure not given for want of draws that settle is known as that, and the reason is said with the share", () => {
  const never = { ...option!, individual: { ...option!.individual!, steadyState: null, shareNeverSteady: 0.17 } };
  expect(["peak", "timeTo90", "peakAfterDose", "spanPeak"].map((row) => isSteadyWithheld(row, never))).toEqual([
    true,
    true,
    false,
    false,
  ]);
  expect(isSteadyWithheld("peak", option!)).toBe(false);
  expect(isSteadyWithheld("peak", { ...option!, individual: null })).toBe(false);
  const notes = steadyWithheldNotes({ ...fitted, options: [never] });
  expect(notes.map((note) => note.replaceAll("\u00a0", " "))).toEqual([
    "Option A, this patient: in 17 % of what the levels leave possible the level never settles under this dose: no steady-state figures are given.",
  ]);
  expect(steadyWithheldNotes(fitted)).toEqual([]);
});

test("the typical patient without a steady state has its own reason", () => {
  const typical = { ...option!.typical!, steadyState: null, noSteadyState: "dose-rate-at-or-above-vmax" as const };
  expect(steadyWithheldNotes({ ...fitted, options: [{ ...option!, typical }] })).toEqual([
    "Option A, typical patient: more is taken than can be eliminated, so there is no steady state.",
  ]);
});
