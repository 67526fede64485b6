import { describe, expect, it, test } from "vitest";
import type { FitFailure, NoFitReason } from "../../../src/core/analysis/index.ts";
import {
  chanceWords,
  fitFailureSentence,
  fitLine,
  influenceWords,
  noFitSentence,
  taughtSentence,
} from "../../../src/core/messages/index.ts";
import { individualFit } from "../analysis/fitFixture.ts";

test.each([
  [0, "under 1\u00a0%"],
  [0.0099, "under 1\u00a0%"],
  [0.01, "1\u00a0%"],
  [0.374, "37\u00a0%"],
  [0.99, "99\u00a0%"],
  [0.9901, "over 99\u00a0%"],
  [1, "over 99\u00a0%"],
])("a chance of %d is said as %s: never nothing, never certain", (share, words) => {
  expect(chanceWords(share)).toBe(words);
});

describe("what the levels taught", () => {
  const parameter = (words: string, taught: number) => ({ words, taught });
  it("groups by how much, each threshold on its side", () => {
    expect(
      taughtSentence([parameter("Clearance", 0.5), parameter("Volume", 0.2), parameter("Absorption rate", 0.199)], 2),
    ).toBe("The levels taught much about clearance, something about volume, little about absorption rate.");
  });
  it("joins those alike, and speaks of one level as one", () => {
    expect(taughtSentence([parameter("Volume", 0.1), parameter("Absorption rate", -0.02)], 1)).toBe(
      "The level taught little about volume and absorption rate.",
    );
  });
});

describe("influence of a level", () => {
  it("of one used: what leaving it out would do", () => {
    expect(influenceWords([{ symbol: "CL", ratio: 1 / 1.12 }])).toBe("Without it clearance would be 12 % higher");
    expect(influenceWords([{ symbol: "CL", ratio: 1.25 }])).toBe("Without it clearance would be 20 % lower");
  });
  it("of one left out: what taking it in would do", () => {
    expect(influenceWords([{ symbol: "CL", ratio: 1.25 }], undefined, true)).toBe(
      "With it clearance would be 25 % higher",
    );
  });
  it("what hardly changes is left unsaid, and nothing is said as nothing", () => {
    expect(
      influenceWords([
        { symbol: "CL", ratio: 1 / 1.12 },
        { symbol: "V", ratio: 1.004 },
      ]),
    ).not.toContain("volume");
    expect(influenceWords([{ symbol: "V", ratio: 1 }])).toBe("Without it nothing would change");
    expect(influenceWords(null)).toBe("");
  });
});

describe("the line on what the figures rest on", () => {
  const none: readonly NoFitReason[] = [
    "no-levels",
    "all-left-out",
    "no-model",
    "no-variability",
    "no-residual",
    "before-first-dose",
  ];
  const failures: readonly FitFailure[] = ["not-converged", "draws-unreliable", "level-not-explained"];

  it.each(none)("%s has its sentence", (reason) => {
    expect(noFitSentence(reason)).toMatch(/^[A-Z].*\.$/);
    expect(fitLine({ kind: "none", reason }, 2)).toContain(noFitSentence(reason));
  });
  it.each(failures)("%s has its sentence, with and without figures", (reason) => {
    for (const data of [{}, { paretoK: 0.912, rHat: 1.31, iterations: 40 }]) {
      const sentence = fitFailureSentence(reason, data);
      expect(sentence).toMatch(/^[A-Z].*\.$/);
      expect(sentence).not.toMatch(/undefined|NaN/);
      expect(fitLine({ kind: "withheld", reason, data }, 2)).toContain(sentence);
    }
    expect(fitFailureSentence("draws-unreliable", { paretoK: 0.912 })).toContain("0.91");
  });
  it("counts the levels used and left out", () => {
    const fit = individualFit({ levelsUsed: ["a"], levelsLeftOut: ["b", "c"] });
    expect(fitLine({ kind: "fitted", fit }, 3)).toBe("this patient: 1 level used, 2 left out");
    expect(fitLine({ kind: "none", reason: "no-levels" }, 0)).toBe("typical patient only: no level");
  });
});
