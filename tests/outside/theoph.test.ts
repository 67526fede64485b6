import { describe, expect, it } from "vitest";
import { aucAfterDose, peakAfterDose, profile, timeOfPeak } from "../../src/core/kinetics/index.ts";
import { theophFits, theophRows } from "./theophRows.ts";
import { relativeError } from "./workedExample.ts";

/*
 * R's data set Theoph (132 levels of theophylline in 12 subjects after one oral dose; study by Robert Upton, reported in Boeckmann,
 * Sheiner & Beal 1994; analysed in Davidian & Giltinan 1995, sections 5.5 and 6.6, and Pinheiro & Bates 2000, appendix A.29) and the
 * least-squares fits of R's own self-starting model to each subject (R 4.2.2, nls with SSfol). Nothing is fitted here: the model at
 * those fits must leave the same residual sum of squares, and have the same peak, time of peak and area.
 * Dose is per kg, so volume is L/kg; bioavailability is part of clearance and volume.
 */
interface Subject {
  readonly subject: string;
  readonly dose_mg_per_kg: number;
  readonly nls: {
    readonly coef: { readonly lKe: number; readonly lKa: number; readonly lCl: number };
    readonly rss: number;
    readonly derived: { readonly tmax_h: number; readonly cmax_mgL: number; readonly aucInf_mg_h_L: number };
  };
}

const { subjects } = theophFits<{ subjects: Subject[] }>("theoph_fits.json");

it("is all there: 12 subjects, 132 levels", () => {
  expect(subjects).toHaveLength(12);
  expect(theophRows).toHaveLength(132);
});

describe.each(subjects)("subject $subject", ({ subject, dose_mg_per_kg, nls }) => {
  const ke = Math.exp(nls.coef.lKe);
  const kinetics = { ka: Math.exp(nls.coef.lKa), ke, volume: Math.exp(nls.coef.lCl) / ke, bioavailability: 1, lag: 0 };

  it("leaves the residual sum of squares of R's fit", () => {
    const own = theophRows.filter((row) => row.subject === subject);
    expect(own).toHaveLength(11);
    expect(own.every((row) => row.dose === dose_mg_per_kg)).toBe(true);
    const levels = profile(
      kinetics,
      [{ time: 0, amount: dose_mg_per_kg }],
      own.map((row) => row.time),
    );
    const sum = own.reduce((total, row, i) => total + (row.level - levels[i]!) ** 2, 0);
    // Relative 1e-12: the coefficients are given to 16 digits and the sum is flat at its minimum.
    expect(relativeError(sum, nls.rss)).toBeLessThanOrEqual(1e-12);
  });

  it("has the peak, time of peak and area of R's fit", () => {
    // Relative 1e-13: differences of logarithms and exponentials in the reference.
    expect(relativeError(timeOfPeak(kinetics), nls.derived.tmax_h)).toBeLessThanOrEqual(1e-13);
    expect(relativeError(peakAfterDose(kinetics, dose_mg_per_kg), nls.derived.cmax_mgL)).toBeLessThanOrEqual(1e-13);
    expect(relativeError(aucAfterDose(kinetics, dose_mg_per_kg), nls.derived.aucInf_mg_h_L)).toBeLessThanOrEqual(1e-13);
  });
});
