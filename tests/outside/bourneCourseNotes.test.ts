import { describe, expect, it } from "vitest";
import {
  aucAfterDose,
  concentrationAfterDose,
  peakAfterDose,
  steadyState,
  timeOfPeak,
} from "../../src/core/kinetics/index.ts";
import { relativeError, workedExample } from "./workedExample.ts";

/*
 * D. W. A. Bourne, PHAR 7632/7633 pharmacokinetics course notes, University of Oklahoma: the worked examples on oral dosing,
 * repeated dosing and dose design. The chapter and page stand beside each check. "To full precision" compares with the value
 * worked out outside this project from the formula on the page; "printed" with the figure on the page to the digits it shows.
 */

/** Absorption so fast that a dose is as good as injected; what is left of it is relative (ke/ka)·ln(ka/ke), about 1e-11. */
const AT_ONCE = 1e12;

function numbersOf(example: { inputs: unknown }): Record<string, number> {
  return example.inputs as Record<string, number>;
}
const half = (decimals: number) => 0.5 * 10 ** -decimals;

describe("single oral dose, ch. 17 page c1703 (2003)", () => {
  it.each([
    // The printed answers are from memory, unverified: the page shows them as pictures.
    { id: "W01", printed: { timeOfPeak: 2.23, peak: 12.9 } },
    { id: "W02", printed: { timeOfPeak: 5.75, peak: 7.6 } },
  ])("$id: time of peak, peak, area and level", ({ id, printed }) => {
    const example = workedExample(id);
    const { F, dose_mg, V_L, ka, ke } = numbersOf(example);
    const kinetics = { ka: ka!, ke: ke!, volume: V_L!, bioavailability: F!, lag: 0 };
    const wanted = example.computed as Record<string, number>;
    // To full precision: relative 1e-15.
    expect(relativeError(timeOfPeak(kinetics), wanted.tmax_h!)).toBeLessThanOrEqual(1e-15);
    expect(relativeError(peakAfterDose(kinetics, dose_mg!), wanted.Cmax_mgL!)).toBeLessThanOrEqual(2e-15);
    if (wanted.AUCinf)
      expect(relativeError(aucAfterDose(kinetics, dose_mg!), wanted.AUCinf)).toBeLessThanOrEqual(1e-15);
    if (wanted.C_at_6h) {
      expect(relativeError(concentrationAfterDose(kinetics, dose_mg!, 6), wanted.C_at_6h)).toBeLessThanOrEqual(1e-15);
    }
    expect(Math.abs(timeOfPeak(kinetics) - printed.timeOfPeak)).toBeLessThanOrEqual(half(2));
    expect(Math.abs(peakAfterDose(kinetics, dose_mg!) - printed.peak)).toBeLessThanOrEqual(half(1));
  });
});

describe("time of peak for three absorption rates, one of them flip-flop, ch. 8 page Ch0804", () => {
  const example = workedExample("W03");
  const { ka, ke } = example.inputs as { ka: number[]; ke: number };
  const wanted = example.computed.tmax_h as number[];
  const printed = [1, 2.75, 6.25];

  it.each(ka.map((rate, i) => ({ rate, i })))("W03: ka $rate /h", ({ rate, i }) => {
    const found = timeOfPeak({ ka: rate, ke, volume: 1, bioavailability: 1, lag: 0 });
    expect(relativeError(found, wanted[i]!)).toBeLessThanOrEqual(1e-15);
    // The printed values are read off a figure: ±0.04 h.
    expect(Math.abs(found - printed[i]!)).toBeLessThanOrEqual(0.04);
  });
});

describe("dose for an average, ch. 15 page c1504 and ch. 26 page c2603 (2003)", () => {
  const example = workedExample("W10");
  const { F, V_L, halfLife_h, tau_h, targetCavg_mgL } = numbersOf(example);
  const wanted = example.computed as Record<string, number>;
  const kinetics = { ka: AT_ONCE, ke: Math.LN2 / halfLife_h!, volume: V_L!, bioavailability: F!, lag: 0 };

  it("W10: the dose for 15 mg/L gives 15 mg/L, and 624 mg gives 15.004", () => {
    expect(relativeError(steadyState(kinetics, wanted.dose_mg!, tau_h!).average, targetCavg_mgL!)).toBeLessThanOrEqual(
      1e-15,
    );
    expect(relativeError(steadyState(kinetics, 624, 12).average, wanted.CssAvg_for_624mg!)).toBeLessThanOrEqual(1e-15);
  });

  // Lowest level of an absorption at once, as the page assumes (ka much above ke). What is left of absorption: relative 1e-9.
  it("W10: lowest levels every 12 and every 6 h, and the loading dose", () => {
    const every12 = steadyState(kinetics, 624, 12);
    const every6 = steadyState(kinetics, 312, 6);
    expect(relativeError(every12.trough, wanted.approxCmin_624_q12!)).toBeLessThanOrEqual(1e-9);
    expect(relativeError(every6.trough, wanted.approxCmin_312_q6!)).toBeLessThanOrEqual(1e-9);
    // The loading dose reaches at once the peak of steady state.
    expect(relativeError(peakAfterDose(kinetics, wanted.loadingDose_mg!), every12.peak)).toBeLessThanOrEqual(1e-9);
    // Printed: "fluctuate between 7 and 23 mg/L"; "between about 10.4 to 20": the upper one is twice the average less the lower.
    expect(Math.abs(every12.trough - 7)).toBeLessThanOrEqual(half(0));
    expect(Math.abs(2 * every12.average - every12.trough - 23)).toBeLessThanOrEqual(half(0));
    expect(Math.abs(every6.trough - 10.4)).toBeLessThanOrEqual(half(1));
    expect(Math.abs(2 * every6.average - every6.trough - 20)).toBeLessThanOrEqual(half(0));
  });
});

describe("dose for an average of 15 mg/L, homework 1995/01 #5, problem 4, page hwa951501d", () => {
  const example = workedExample("W12");
  const { halfLife_h, V_L, F, tau_h, targetCavg } = numbersOf(example);
  const wanted = example.computed as Record<string, number>;
  const kinetics = { ka: AT_ONCE, ke: Math.LN2 / halfLife_h!, volume: V_L!, bioavailability: F!, lag: 0 };

  it("W12: dose, average and lowest level of 150 mg", () => {
    expect(relativeError(steadyState(kinetics, wanted.dose_mg!, tau_h!).average, targetCavg!)).toBeLessThanOrEqual(
      1e-15,
    );
    const found = steadyState(kinetics, 150, tau_h!);
    expect(relativeError(found.average, wanted.CssAvg_150mg!)).toBeLessThanOrEqual(1e-15);
    // ka much above ke: relative 1e-9.
    expect(relativeError(found.trough, wanted.approxCmin_150mg!)).toBeLessThanOrEqual(1e-9);
    expect(relativeError(2 * found.average - found.trough, wanted.approxCmax_2avg_minus_min!)).toBeLessThanOrEqual(
      1e-9,
    );
    // Printed: 145 mg, 15.5, 12.8 and 18.2 (from the two rounded figures: 31 − 12.8).
    expect(Math.abs(wanted.dose_mg! - 145)).toBeLessThanOrEqual(half(0));
    expect(Math.abs(found.average - 15.5)).toBeLessThanOrEqual(half(1));
    expect(Math.abs(found.trough - 12.8)).toBeLessThanOrEqual(half(1));
    expect(Math.abs(2 * found.average - found.trough - 18.2)).toBeLessThanOrEqual(0.15);
  });
});

describe("absorption at once is an intravenous bolus, ch. 14 pages c1407, Ch1408", () => {
  it("W14: highest and lowest level every 6 h", () => {
    const example = workedExample("W14");
    const { dose_mg, V_L, halfLife_h, tau_h } = numbersOf(example);
    const wanted = example.computed as Record<string, number>;
    const at = (ka: number) =>
      steadyState({ ka, ke: Math.LN2 / halfLife_h!, volume: V_L!, bioavailability: 1, lag: 0 }, dose_mg!, tau_h!);
    // ka 1e6: what is left of absorption is (ke/ka)·ln(ka/ke) = 3e-6 of the peak. ka 1e12: 1e-9.
    expect(relativeError(at(1e6).peak, wanted.Cmax_exact!)).toBeLessThanOrEqual(5e-6);
    expect(relativeError(at(1e6).trough, wanted.Cmin_exact!)).toBeLessThanOrEqual(5e-6);
    expect(relativeError(at(AT_ONCE).peak, wanted.Cmax_exact!)).toBeLessThanOrEqual(1e-9);
    expect(relativeError(at(AT_ONCE).trough, wanted.Cmin_exact!)).toBeLessThanOrEqual(1e-9);
    // Printed 15.5 and 5.4; the page rounds its factors first, hence ±0.1.
    expect(Math.abs(at(AT_ONCE).peak - 15.5)).toBeLessThanOrEqual(0.1);
    expect(Math.abs(at(AT_ONCE).trough - 5.4)).toBeLessThanOrEqual(0.1);
  });

  it("W15: interval and doses from a window of 10 to 35 mg/L", () => {
    const example = workedExample("W15");
    const { V_L, ke, maxC, minC } = numbersOf(example);
    const wanted = example.computed as Record<string, number>;
    const kinetics = { ka: AT_ONCE, ke: ke!, volume: V_L!, bioavailability: 1, lag: 0 };
    // At the longest interval the levels of steady state just span the window. ka much above ke: relative 1e-9.
    const longest = steadyState(kinetics, 100, wanted.tauMax_h!);
    expect(relativeError(longest.peak / longest.trough, maxC! / minC!)).toBeLessThanOrEqual(1e-9);
    expect(relativeError(steadyState(kinetics, wanted.maintenance_q8h_mg!, 8).peak, maxC!)).toBeLessThanOrEqual(1e-9);
    expect(relativeError(peakAfterDose(kinetics, wanted.maximumLoading_mg!), maxC!)).toBeLessThanOrEqual(1e-9);
    // Printed 8.35 h, and 612 mg with a factor rounded to 0.301.
    expect(Math.abs(wanted.tauMax_h! - 8.35)).toBeLessThanOrEqual(half(2));
    expect(Math.abs(wanted.maintenance_q8h_mg! - 612)).toBeLessThanOrEqual(1);
  });
});
