import { describe, expect, it } from "vitest";
import { noncompartmental } from "../../src/core/noncompartmental/index.ts";
import { noncompartmentalFixture, referenceFaults } from "./noncompartmentalReference.ts";

/*
 * R's data set Theoph (132 levels of theophylline in 12 subjects after one oral dose; study by Robert Upton, reported in Boeckmann,
 * Sheiner & Beal 1994). The non-compartmental figures were computed in R 4.2.2 from first principles and again with numpy; definitions in
 * tests/fixtures/theoph_fits.json. Dose is per kg, so clearance is L/h/kg and volume L/kg.
 */
const subjects = noncompartmentalFixture("theoph");

it("is all there: 12 subjects, 132 levels, each with a dose and a clearance", () => {
  expect(subjects).toHaveLength(12);
  expect(subjects.flatMap(({ points }) => points)).toHaveLength(132);
  expect(subjects.every(({ dose, nca }) => dose !== null && nca.clOverF_fromLinUpLogDown_clastObs !== null)).toBe(true);
});

describe.each(subjects)("subject $subject", (subject) => {
  it("has every figure of the reference, relative 1e-10", () => {
    expect(referenceFaults(subject, 1e-10)).toEqual([]);
  });
});

it("subject 6 has 3 points on the terminal line, and 7 with the tie of 1e-4", () => {
  const { points, dose } = subjects[5]!;
  const found = noncompartmental(points, { dose: dose!, method: "linear-up-log-down" });
  expect(found.ok && found.value.terminal.indices.length).toBe(7);
  // 7.894998 h: checks printed beside the table, to the digits shown.
  expect(found.ok && found.value.halfLife).toBeCloseTo(7.894998, 6);
});

it("a figure off by 1e-9 is named", () => {
  const [subject] = subjects;
  const planted = { ...subject!, nca: { ...subject!.nca, halfLife: subject!.nca.halfLife * (1 + 1e-9) } };
  expect(referenceFaults(planted, 1e-10)).toEqual([expect.stringContaining("halfLife")]);
});
