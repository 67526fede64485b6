import { describe, expect, it } from "vitest";
import { issueMessage } from "../../../src/core/messages/index.ts";
import {
  ageQuestion,
  creatinineQuestion,
  type Doubt,
  heightQuestion,
  weightQuestion,
} from "../../../src/core/patient/index.ts";

const said = (doubt: Doubt | null) =>
  doubt ? [doubt.verdict, doubt.issue.code, issueMessage(doubt.issue).replaceAll("\u00a0", " ")] : null;

describe("weightQuestion", () => {
  it.each([
    [{ weightKg: 58, heightCm: 162 }],
    [{ weightKg: 58 }],
    [{ weightKg: 110, heightCm: 175 }],
    [{ weightKg: 150, heightCm: 190 }],
    [{ weightKg: 170 }],
    [{ weightKg: 36, heightCm: 150 }],
    // A child's weight is not an adult's improbable one.
    [{ weightKg: 12, ageYears: 3 }],
  ])("takes %j without a word", (entry) => {
    expect(weightQuestion(entry)).toBeNull();
  });

  it.each([
    [
      { weightKg: 150, heightCm: 162 },
      "improbable",
      "weight-pounds",
      "150 kg at a height of 162 cm looks like pounds: as pounds it is 68.04 kg. Is it meant in kilograms?",
    ],
    [
      { weightKg: 154, heightCm: 178 },
      "improbable",
      "weight-pounds",
      "154 kg at a height of 178 cm looks like pounds: as pounds it is 69.85 kg. Is it meant in kilograms?",
    ],
    [
      { weightKg: 190 },
      "improbable",
      "weight-pounds",
      "190 kg looks like pounds: as pounds it is 86.18 kg. Is it meant in kilograms?",
    ],
    [{ weightKg: 400 }, "improbable", "weight-improbable", "400 kg is unusual. Is it meant?"],
    [
      { weightKg: 260, heightCm: 165 },
      "improbable",
      "weight-improbable",
      "260 kg at a height of 165 cm is unusual. Is it meant?",
    ],
    [{ weightKg: 25 }, "improbable", "weight-improbable", "25 kg is unusual. Is it meant?"],
    [
      { weightKg: 32, heightCm: 180 },
      "improbable",
      "weight-improbable",
      "32 kg at a height of 180 cm is unusual. Is it meant?",
    ],
    [
      { weightKg: 400.5 },
      "impossible",
      "weight-impossible",
      "400.5 kg is no adult's weight: write one from 2 kg to 400 kg.",
    ],
    [
      { weightKg: 1.9 },
      "impossible",
      "weight-impossible",
      "1.9 kg is no adult's weight: write one from 2 kg to 400 kg.",
    ],
    [
      { weightKg: -60 },
      "impossible",
      "weight-impossible",
      "\u221260 kg is no adult's weight: write one from 2 kg to 400 kg.",
    ],
    [
      { weightKg: Number.NaN },
      "impossible",
      "weight-impossible",
      "This value is no adult's weight: write one from 2 kg to 400 kg.",
    ],
  ])("%j", (entry, verdict, code, sentence) => {
    expect(said(weightQuestion(entry))).toEqual([verdict, code, sentence]);
  });

  it("a height that is no height does not stop it", () => {
    expect(weightQuestion({ weightKg: 70, heightCm: 1.7 })).toBeNull();
    expect(weightQuestion({ weightKg: 190, heightCm: 1.7 })?.issue.code).toBe("weight-pounds");
  });
});

describe("creatinineQuestion", () => {
  it.each([
    [0.2, "mg/dL"],
    [1.1, "mg/dL"],
    [15, "mg/dL"],
    [97, "umol/L"],
    [18, "umol/L"],
    [1300, "umol/L"],
  ] as const)("takes %d %s without a word", (value, unit) => {
    expect(creatinineQuestion({ value, unit })).toBeNull();
  });

  it.each([
    [97, "mg/dL", "improbable", "creatinine-other-unit", "97 mg/dL looks like micromol/L. Is it meant in mg/dL?"],
    [120, "mg/dL", "improbable", "creatinine-other-unit", "120 mg/dL looks like micromol/L. Is it meant in mg/dL?"],
    [
      1.1,
      "umol/L",
      "improbable",
      "creatinine-other-unit",
      "1.1 micromol/L looks like mg/dL. Is it meant in micromol/L?",
    ],
    [16, "mg/dL", "improbable", "creatinine-improbable", "A creatinine of 16 mg/dL is unusual. Is it meant?"],
    [0.1, "mg/dL", "improbable", "creatinine-improbable", "A creatinine of 0.1 mg/dL is unusual. Is it meant?"],
    [
      1500,
      "umol/L",
      "improbable",
      "creatinine-improbable",
      "A creatinine of 1,500 micromol/L is unusual. Is it meant?",
    ],
    [
      200,
      "mg/dL",
      "impossible",
      "creatinine-impossible",
      "200 mg/dL is no serum creatinine: write one from 0.005 mg/dL to 150 mg/dL.",
    ],
    [
      0,
      "umol/L",
      "impossible",
      "creatinine-impossible",
      "0 micromol/L is no serum creatinine: write one from 0.442 micromol/L to 13,260 micromol/L.",
    ],
    [
      -1,
      "mg/dL",
      "impossible",
      "creatinine-impossible",
      "\u22121 mg/dL is no serum creatinine: write one from 0.005 mg/dL to 150 mg/dL.",
    ],
    [
      Number.NaN,
      "mg/dL",
      "impossible",
      "creatinine-impossible",
      "This value is no serum creatinine: write one from 0.005 mg/dL to 150 mg/dL.",
    ],
  ] as const)("%d %s", (value, unit, verdict, code, sentence) => {
    expect(said(creatinineQuestion({ value, unit }))).toEqual([verdict, code, sentence]);
  });
});

describe("ageQuestion", () => {
  it.each([18, 64, 105])("takes %d without a word", (age) => {
    expect(ageQuestion(age)).toBeNull();
  });
  it.each([
    [106, "improbable", "age-improbable", "An age of 106 years is unusual. Is it meant?"],
    [
      12,
      "improbable",
      "age-under-adult",
      "An age of 12 years is below 18 years: the clearance and ideal weight here are for adults. Is it meant?",
    ],
    [1962, "impossible", "age-birth-year", "1962 looks like a year of birth: write the age in years."],
    [131, "impossible", "age-impossible", "131 years is no age: write one above 0, up to 130 years."],
    [0, "impossible", "age-impossible", "0 years is no age: write one above 0, up to 130 years."],
    [-3, "impossible", "age-impossible", "\u22123 years is no age: write one above 0, up to 130 years."],
  ])("%d", (age, verdict, code, sentence) => {
    expect(said(ageQuestion(age))).toEqual([verdict, code, sentence]);
  });
});

describe("heightQuestion", () => {
  it.each([{ heightCm: 162 }, { heightCm: 120 }, { heightCm: 215 }, { heightCm: 64, ageYears: 0.5 }])(
    "takes %j without a word",
    (entry) => {
      expect(heightQuestion(entry)).toBeNull();
    },
  );
  it.each([
    [
      { heightCm: 64 },
      "improbable",
      "height-inches",
      "64 cm looks like inches: as inches it is 162.6 cm. Is it meant in centimetres?",
    ],
    [{ heightCm: 95 }, "improbable", "height-improbable", "A height of 95 cm is unusual. Is it meant?"],
    [{ heightCm: 230 }, "improbable", "height-improbable", "A height of 230 cm is unusual. Is it meant?"],
    [{ heightCm: 1.62 }, "impossible", "height-metres", "1.62 cm looks like metres: write 162 cm."],
    [{ heightCm: 16 }, "impossible", "height-impossible", "16 cm is no height: write one from 30 cm to 272 cm."],
    [{ heightCm: 300 }, "impossible", "height-impossible", "300 cm is no height: write one from 30 cm to 272 cm."],
    [
      { heightCm: Number.NaN },
      "impossible",
      "height-impossible",
      "This value is no height: write one from 30 cm to 272 cm.",
    ],
  ])("%j", (entry, verdict, code, sentence) => {
    expect(said(heightQuestion(entry))).toEqual([verdict, code, sentence]);
  });
});
