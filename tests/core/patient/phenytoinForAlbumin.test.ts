import { describe, expect, it } from "vitest";
import { issueMessage } from "../../../src/core/messages/index.ts";
import {
  albuminQuestion,
  type Doubt,
  phenytoinForAlbumin,
  phenytoinForAlbuminQuestion,
} from "../../../src/core/patient/index.ts";

const level = { measuredMgPerL: 10, albuminGPerDl: 4.4, form: "usual" } as const;

describe("phenytoinForAlbumin", () => {
  it("at the normal albumin of 4.4 g/dL makes 10.2 of 10: the known rounding of the formula", () => {
    expect(phenytoinForAlbumin(level).toFixed(1)).toBe("10.2");
  });

  it("rises as albumin falls, and more so in kidney failure", () => {
    const low = phenytoinForAlbumin({ ...level, albuminGPerDl: 2.5 });
    expect(low).toBeGreaterThan(phenytoinForAlbumin(level));
    expect(phenytoinForAlbumin({ ...level, albuminGPerDl: 2.5, form: "kidney-failure" })).toBeGreaterThan(low);
  });

  it.each([
    ["measuredMgPerL", -1],
    ["measuredMgPerL", 501],
    // An albumin in g/L by mistake.
    ["albuminGPerDl", 25],
    ["albuminGPerDl", 0],
  ])("%s of %d throws, naming it", (argument, value) => {
    expect(() => phenytoinForAlbumin({ ...level, [argument]: value })).toThrow(new RegExp(`^${argument}: `));
  });

  it("from the normal albumin on, says that there is nothing to correct", () => {
    expect(phenytoinForAlbuminQuestion(4.3)).toBeNull();
    expect(phenytoinForAlbuminQuestion(4.4)?.issue.code).toBe("phenytoin-albumin-normal");
  });
});

const said = (doubt: Doubt | null) =>
  doubt ? [doubt.verdict, doubt.issue.code, issueMessage(doubt.issue).replaceAll("\u00a0", " ")] : null;

describe("albuminQuestion", () => {
  it.each([
    [42, "g/L"],
    [15, "g/L"],
    [55, "g/L"],
    [4.2, "g/dL"],
  ] as const)("takes %d %s without a word", (value, unit) => {
    expect(albuminQuestion({ value, unit })).toBeNull();
  });

  it.each([
    [4.2, "g/L", "improbable", "albumin-other-unit", "4.2 g/L looks like g/dL. Is it meant in g/L?"],
    [35, "g/dL", "improbable", "albumin-other-unit", "35 g/dL looks like g/L. Is it meant in g/dL?"],
    [60, "g/L", "improbable", "albumin-improbable", "An albumin of 60 g/L is unusual. Is it meant?"],
    [0.5, "g/L", "impossible", "albumin-impossible", "0.5 g/L is no serum albumin: write one from 1 g/L to 600 g/L."],
    [
      70,
      "g/dL",
      "impossible",
      "albumin-impossible",
      "70 g/dL is no serum albumin: write one from 0.1 g/dL to 60 g/dL.",
    ],
    [
      Number.NaN,
      "g/L",
      "impossible",
      "albumin-impossible",
      "This value is no serum albumin: write one from 1 g/L to 600 g/L.",
    ],
  ] as const)("%d %s", (value, unit, verdict, code, sentence) => {
    expect(said(albuminQuestion({ value, unit }))).toEqual([verdict, code, sentence]);
  });
});
