import { describe, expect, it } from "vitest";
import { profile } from "../../src/core/kinetics/index.ts";
import { decayChain, type Minimum, minimise } from "../../src/core/numerics/index.ts";
import { type TheophRow, theophFits, theophRows } from "./theophRows.ts";
import { relativeError } from "./workedExample.ts";

/*
 * R's data set Theoph (132 levels of theophylline in 12 subjects after one oral dose; study by Robert Upton, reported in Boeckmann,
 * Sheiner & Beal 1994) fitted here, subject by subject, without a prior: least squares over lKe, lKa, lCl from several starts, against
 * the fits of R 4.2.2 (nls with SSfol) and the same minima solved to 20 digits in mpmath. The curve stays the same when lKe and lKa change places, so
 * each sum of squares has two minima of the same depth: a start on the flip-flop side ends in the twin.
 * Dose is per kg, so clearance is L/h/kg; bioavailability is part of it.
 */
interface Coefficients {
  readonly lKe: number;
  readonly lKa: number;
  readonly lCl: number;
}
interface Subject {
  readonly subject: string;
  readonly dose_mg_per_kg: number;
  readonly nls: { readonly coef: Coefficients; readonly rss: number };
}
interface ExactFit {
  readonly subject: string;
  readonly lKe: string;
  readonly lKa: string;
  readonly lCl: string;
  readonly rss: string;
}

const { subjects } = theophFits<{ subjects: Subject[] }>("theoph_fits.json");

/** Levels at the row's times, mg/L, by core/kinetics. */
function levelsOf([lKe = 0, lKa = 0, lCl = 0]: readonly number[], own: readonly TheophRow[]): Float64Array | number[] {
  const [ke, ka] = [Math.exp(lKe), Math.exp(lKa)];
  const kinetics = { ka, ke, volume: Math.exp(lCl) / ke, bioavailability: 1, lag: 0 };
  return own.map(({ dose, time }) => profile(kinetics, [{ time: 0, amount: dose }], [time])[0]!);
}

function sumOfSquares(x: readonly number[], own: readonly TheophRow[]): number {
  const levels = levelsOf(x, own);
  return own.reduce((sum, row, i) => sum + (row.level - levels[i]!) ** 2, 0);
}

/** C = D·ka·ke/Cl·φ, ∂φ/∂ke = −E(ke, ke, ka), ∂φ/∂ka = −E(ke, ka, ka), E the chain of decays (decayChain). */
function slope(x: readonly number[], own: readonly TheophRow[]): number[] {
  const [ke, ka, clearance] = [Math.exp(x[0]!), Math.exp(x[1]!), Math.exp(x[2]!)];
  const levels = levelsOf(x, own);
  const sums = [0, 0, 0];
  for (const [i, { dose, time, level }] of own.entries()) {
    const factor = (dose * ka * ke) / clearance;
    const byKe = levels[i]! - factor * ke * decayChain([ke, ke, ka], time);
    const byKa = levels[i]! - factor * ka * decayChain([ke, ka, ka], time);
    for (const [j, change] of [byKe, byKa, -levels[i]!].entries())
      sums[j] = sums[j]! - 2 * (level - levels[i]!) * change;
  }
  return sums;
}

function fitLevels(own: readonly TheophRow[], start: readonly number[]): Minimum {
  return minimise({ value: (x) => sumOfSquares(x, own), gradient: (x) => slope(x, own), start });
}

/** In 20 digits; R's own fits stop up to 4e-8 short of these. */
const exactFits = new Map(
  theophFits<{ subjects: ExactFit[] }>("theoph_least_squares.json").subjects.map((each) => [each.subject, each]),
);

/**
 * ka above ke; ka below ke; both equal, from where only the curvature leads away; and far off on either side, with levels five times
 * too high, from where the first long steps may change sides.
 */
const STARTS = [
  { side: "usual", start: [-2.5, 0.5, -3] },
  { side: "either", start: [-1, -1, -3] },
  { side: "flip-flop", start: [0.5, -2.5, -3] },
  { side: "either", start: [-1, 1.5, -4.5] },
  { side: "either", start: [1.5, -1, -4.5] },
] as const;

describe.each(subjects)("subject $subject", ({ subject, nls: { coef } }) => {
  const own = theophRows.filter((row) => row.subject === subject);
  const exact = exactFits.get(subject)!;
  const minimum = [exact.lKe, exact.lKa, exact.lCl].map(Number);

  it.each(STARTS)(
    "from $start ($side side): the minimum to 2e-10 in each logarithm, R's fit to its own 4e-8",
    ({ side, start }) => {
      const found = fitLevels(own, start);
      expect(found.end).toBe("minimum");
      // Flat at the minimum: relative 1e-13.
      expect(relativeError(found.value, Number(exact.rss))).toBeLessThanOrEqual(1e-13);
      const isTwin = found.x[0]! > found.x[1]!;
      if (side !== "either") expect(isTwin).toBe(side === "flip-flop");
      const asUsual = isTwin ? [found.x[1]!, found.x[0]!, found.x[2]!] : found.x;
      for (const [i, each] of asUsual.entries()) {
        expect(Math.abs(each - minimum[i]!)).toBeLessThanOrEqual(2e-10);
        expect(Math.abs(each - [coef.lKe, coef.lKa, coef.lCl][i]!)).toBeLessThanOrEqual(4e-8);
      }
    },
  );

  it("the twin is the same curve: relative 1e-12 at every level after time 0", () => {
    const usual = levelsOf([coef.lKe, coef.lKa, coef.lCl], own);
    const twin = levelsOf([coef.lKa, coef.lKe, coef.lCl], own);
    for (const [i, { time }] of own.entries()) {
      if (time > 0) expect(relativeError(twin[i]!, usual[i]!)).toBeLessThanOrEqual(1e-12);
    }
  });
});

it("the slope is that of the sum of squares: central differences, relative 1e-6, equal rates included", () => {
  const own = theophRows.filter((row) => row.subject === "1");
  for (const x of [
    [-2.5, 0.5, -3],
    [-1, -1, -3],
    [0.5, -2, -4],
  ]) {
    const exact = slope(x, own);
    const size = Math.max(...exact.map(Math.abs));
    for (const i of [0, 1, 2]) {
      const side = (h: number) =>
        sumOfSquares(
          x.map((each, j) => (j === i ? each + h : each)),
          own,
        );
      expect(Math.abs((side(1e-5) - side(-1e-5)) / 2e-5 - exact[i]!) / size).toBeLessThanOrEqual(1e-6);
    }
  }
});

it("all 132 levels as if of one subject: R's pooled fit, as printed to 9 figures", () => {
  const found = fitLevels(theophRows, [-2.5, 0.5, -3]);
  expect(found.end).toBe("minimum");
  // lKe −2.52423872, lKa 0.399226633, lCl −3.24826261, sum of squares 274.449135 (R 4.2.2).
  for (const [i, wanted] of [-2.52423872, 0.399226633, -3.24826261].entries()) {
    expect(Math.abs(found.x[i]! - wanted)).toBeLessThanOrEqual(6e-9);
  }
  expect(Math.abs(found.value - 274.449135)).toBeLessThanOrEqual(5e-7);
});
