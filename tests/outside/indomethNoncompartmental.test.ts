import { describe, expect, it } from "vitest";
import { noncompartmental } from "../../src/core/noncompartmental/index.ts";
import { noncompartmentalFixture, referenceFaults } from "./noncompartmentalReference.ts";

/*
 * R's data set Indometh (66 levels of indometacin in 6 subjects after an intravenous dose; Kwan et al., J Pharmacokinet Biopharm
 * 1976;4:255-280). The non-compartmental figures were computed in R 4.2.2 from first principles; definitions in
 * tests/fixtures/indometh_fits.json. The area begins at the first level; the dose is not part of the data, so there is no clearance.
 */
const subjects = noncompartmentalFixture("indometh");

it("is all there: 6 subjects, 66 levels", () => {
  expect(subjects).toHaveLength(6);
  expect(subjects.flatMap(({ points }) => points)).toHaveLength(66);
});

describe.each(subjects)("subject $subject", (subject) => {
  it("has every figure of the reference, relative 1e-10", () => {
    expect(referenceFaults(subject, 1e-10)).toEqual([]);
  });

  it("says that the area begins at the first level", () => {
    const found = noncompartmental(subject.points, { dose: 1, method: "linear" });
    expect(found.ok && found.value.flags.map(({ code }) => code)).toContain("nca-area-begins-late");
  });
});
