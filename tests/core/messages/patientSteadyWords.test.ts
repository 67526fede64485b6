import { describe, expect, it } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import {
  lowestBeforeWords,
  neverSteadyWords,
  steadyWithheldWords,
} from "../../../src/core/messages/patientSteadyWords.ts";
import { caseFixture } from "../analysis/caseFixture.ts";
import { fittedAnalysis } from "../analysis/fitFixture.ts";

const own = fittedAnalysis(derive(caseFixture({ levels: [] }))).options[0]!.individual!;
const plain = (text: string | null) => text?.replaceAll("\u00a0", " ") ?? null;

describe("draws that never settle", () => {
  it("so many that no figure is given: the share and why; an option that does not repeat has another reason", () => {
    const never = { ...own, steadyState: null, shareNeverSteady: 0.17 };
    expect(plain(steadyWithheldWords(never))).toBe(
      "In 17 % of what the levels leave possible the level never settles under this dose: no steady-state figures are given.",
    );
    expect(steadyWithheldWords({ steadyState: null, shareNeverSteady: 0 })).toBeNull();
    expect(steadyWithheldWords({ ...own, shareNeverSteady: 0.03 })).toBeNull();
    expect(plain(neverSteadyWords(never))).toBe(
      "With a chance of 17 % a steady state is never reached: counted as above in the chance at steady state.",
    );
    expect(neverSteadyWords({ ...never, steadyChance: null })).toBeNull();
  });

  it("few: left out of the figures, counted in the chance where there is one", () => {
    const few = { ...own, shareNeverSteady: 0.03 };
    expect(plain(neverSteadyWords(few))).toBe(
      "With a chance of 3 % a steady state is never reached: left out of the steady-state figures, counted as above in the chance at steady state.",
    );
    expect(plain(neverSteadyWords({ ...few, steadyChance: null }))).toMatch(/left out of the steady-state figures\.$/);
    expect(neverSteadyWords(own)).toBeNull();
  });
});

describe("the lowest of a span that is the level before the option acts", () => {
  const span = { chance: { below: 0.92, within: 0.08, above: 0 }, lowestBeforeOption: 0.98 };

  it("is said where the chance is about the lowest, any draw lies below, and most come before", () => {
    expect(plain(lowestBeforeWords("trough", span))).toBe(
      "In 98 % of what the levels leave possible the lowest of these days comes before the option's first dose acts: the option can't change it.",
    );
    expect(lowestBeforeWords("lowest-and-highest", { ...span, lowestBeforeOption: 0.5 })).not.toBeNull();
  });

  it.each([
    ["of another figure", "average", span],
    ["of few draws", "trough", { ...span, lowestBeforeOption: 0.49 }],
    ["without a dose", "trough", { ...span, lowestBeforeOption: null }],
    ["none below", "trough", { ...span, chance: { below: 0, within: 1, above: 0 } }],
    ["no chance given", "trough", { ...span, chance: null }],
  ] as const)("not %s", (_, quantity, found) => {
    expect(lowestBeforeWords(quantity, found)).toBeNull();
  });
});
