import { describe, expect, it } from "vitest";
import {
  aucAfterDose,
  bothReadings,
  concentrationAfterDose,
  peakAfterDose,
  steadyState,
  timeOfPeak,
} from "../../src/core/kinetics/index.ts";
import { relativeError, workedExample } from "./workedExample.ts";

/*
 * Algebra and closed forms, worked out outside this project in double precision from the formula named in
 * tests/fixtures/worked_examples.json: W04 (exchange of ka and ke) and W11 (steady state of one regimen at three ka).
 * Relative 1e-14: the references themselves are the textbook forms in double precision.
 */

describe("W04: C(t) is unchanged under ka ↔ ke with V → V·ke/ka, and the clearance with it", () => {
  const example = workedExample("W04");
  const { F, dose_mg, V_L, ka, ke } = example.inputs as Record<string, number>;
  const wanted = example.computed as Record<string, number>;
  const twin = example.computed.twin as Record<string, number>;
  const kinetics = { ka: ka!, ke: ke!, volume: V_L!, bioavailability: F!, lag: 0 };

  it("the curve", () => {
    expect(relativeError(timeOfPeak(kinetics), wanted.tmax_h!)).toBeLessThanOrEqual(1e-14);
    expect(relativeError(peakAfterDose(kinetics, dose_mg!), wanted.Cmax_mgL!)).toBeLessThanOrEqual(1e-14);
    expect(relativeError(aucAfterDose(kinetics, dose_mg!), wanted.AUCinf!)).toBeLessThanOrEqual(1e-14);
  });

  it("its two readings", () => {
    const { assumed, alternative } = bothReadings(kinetics);
    expect(assumed.flipFlop).toBe(true);
    expect(relativeError(assumed.eliminationHalfLife, wanted.eliminationHalfLife_h!)).toBeLessThanOrEqual(1e-14);
    // The terminal slope is that of absorption: 5.5 h, not the 3.5 h of elimination.
    expect(relativeError(assumed.absorptionHalfLife, wanted.terminalHalfLife_h!)).toBeLessThanOrEqual(1e-14);
    expect([alternative.ka, alternative.ke, alternative.volume]).toEqual([twin.ka, twin.ke, twin.V_L]);
    expect(alternative.clearance).toBe(assumed.clearance);
  });

  it("the same level at 4 h by either", () => {
    const other = { ...kinetics, ka: twin.ka!, ke: twin.ke!, volume: twin.V_L! };
    expect(relativeError(concentrationAfterDose(kinetics, dose_mg!, 4), twin.C_at_4h_original!)).toBeLessThanOrEqual(
      1e-14,
    );
    expect(relativeError(concentrationAfterDose(other, dose_mg!, 4), twin.C_at_4h_twin!)).toBeLessThanOrEqual(1e-14);
  });
});

describe("W11: the exact steady state of 624 mg every 12 h and 312 mg every 6 h", () => {
  const example = workedExample("W11");
  const { F, V_L, halfLife_h } = example.inputs as Record<string, number>;
  const wanted = example.computed as Record<string, Record<string, { Cmin: number; Cmax: number; tmaxSS: number }>>;

  it.each([1, 2, 5])("ka %d /h", (ka) => {
    const kinetics = { ka, ke: Math.LN2 / halfLife_h!, volume: V_L!, bioavailability: F!, lag: 0 };
    for (const [name, amount, interval] of [
      ["q12_624mg", 624, 12],
      ["q6_312mg", 312, 6],
    ] as const) {
      const { Cmin, Cmax, tmaxSS } = wanted[`ka=${ka}`]![name]!;
      const found = steadyState(kinetics, amount, interval);
      expect(relativeError(found.trough, Cmin)).toBeLessThanOrEqual(1e-14);
      expect(relativeError(found.peak, Cmax)).toBeLessThanOrEqual(1e-14);
      expect(relativeError(found.timeOfPeak, tmaxSS)).toBeLessThanOrEqual(1e-14);
    }
  });
});
