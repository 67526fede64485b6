import { describe, expect, it } from "vitest";
import {
  type Course,
  historyExposure,
  historyProfile,
  patternProfile,
  patternSteadyState,
  steadyState,
  steadyStateConcentration,
} from "../../../src/core/kinetics/index.ts";
import { relativeError } from "./worstError.ts";

/** What the pattern is after so many periods that no double can tell the difference. */
function repeated(courses: readonly Course[], period: number, periods: number): Course[] {
  return courses.map((course) => ({
    ...course,
    doses: Array.from({ length: periods }, (_, n) =>
      course.doses.map(({ time, amount }) => ({ time: (n + 1 - periods) * period + time, amount })),
    ).flat(),
  }));
}

const PATTERNS = [
  {
    name: "200 mg at 8 h and 300 mg at 22 h",
    disposition: { ke: 0.1, volume: 30 },
    period: 24,
    courses: [
      {
        ka: 1,
        bioavailability: 1,
        lag: 0,
        doses: [
          { time: 8, amount: 200 },
          { time: 22, amount: 300 },
        ],
      },
    ],
  },
  {
    name: "two products, a lag that carries a dose past the end of the period",
    disposition: { ke: 0.06, volume: 42 },
    period: 24,
    courses: [
      {
        ka: 0.9,
        bioavailability: 0.95,
        lag: 0.5,
        doses: [
          { time: 0, amount: 100 },
          { time: 23.75, amount: 150 },
        ],
      },
      { ka: 0.05, bioavailability: 0.8, lag: 4, doses: [{ time: 21, amount: 400 }] },
    ],
  },
  {
    name: "a lag longer than the period",
    disposition: { ke: 0.3, volume: 10 },
    period: 6,
    courses: [{ ka: 0.3, bioavailability: 1, lag: 14.5, doses: [{ time: 1, amount: 50 }] }],
  },
  {
    name: "four uneven doses over two days, flip-flop",
    disposition: { ke: 0.4, volume: 25 },
    period: 48,
    courses: [
      {
        ka: 0.07,
        bioavailability: 0.6,
        lag: 1,
        doses: [
          { time: 3, amount: 100 },
          { time: 3, amount: 20 },
          { time: 17, amount: 10 },
          { time: 40, amount: 250 },
        ],
      },
    ],
  },
];

describe("a repeating pattern", () => {
  it.each(PATTERNS)("$name: equals the history of 400 periods, to 5e-15 of the peak", (pattern) => {
    const { disposition, courses, period } = pattern;
    const history = repeated(courses, period, 400);
    const found = patternSteadyState(disposition, courses, period);
    const swept = historyExposure(disposition, history, 0, period);
    expect(relativeError(found.peak, swept.peak)).toBeLessThanOrEqual(5e-15);
    expect(Math.abs(found.lowest - swept.lowest) / swept.peak).toBeLessThanOrEqual(5e-15);
    expect(relativeError(found.auc, swept.auc)).toBeLessThanOrEqual(5e-15);
    expect(found.average).toBe(found.auc / period);
    // Times: a flat maximum moves by 1e-11 h for an error of 1e-16 in the slope.
    expect(Math.abs(found.timeOfPeak - (swept.timeOfPeak % period))).toBeLessThanOrEqual(1e-11);
    expect(Math.abs(found.timeOfLowest - (swept.timeOfLowest % period))).toBeLessThanOrEqual(1e-11);
    // From amounts, not from the levels shown: 2e-15.
    expect(relativeError(found.swing, (found.peak - found.lowest) / found.lowest)).toBeLessThanOrEqual(2e-15);
    expect(relativeError(found.fluctuation, (found.peak - found.lowest) / found.average)).toBeLessThanOrEqual(2e-15);

    const firstPeriod = historyExposure(disposition, courses, 0, period).auc;
    if (firstPeriod === 0) expect(found.accumulation).toBe(Infinity);
    else expect(relativeError(found.accumulation, found.auc / firstPeriod)).toBeLessThanOrEqual(5e-15);

    const times = Array.from({ length: 97 }, (_, i) => (i * period) / 96);
    const levels = patternProfile(disposition, courses, period, times);
    const wanted = historyProfile(disposition, history, times);
    for (let i = 0; i < times.length; i++) {
      expect(Math.abs(levels[i]! - wanted[i]!) / found.peak).toBeLessThanOrEqual(5e-15);
      expect(levels[i]!).toBeLessThanOrEqual(found.peak * (1 + 1e-15));
      expect(levels[i]!).toBeGreaterThanOrEqual(found.lowest * (1 - 1e-15));
    }
  });

  it("repeats: the profile is the same in every period, negative times included", () => {
    const { disposition, courses, period } = PATTERNS[1]!;
    const phases = [0, 1.25, 7.5, 23.9375];
    const once = patternProfile(disposition, courses, period, phases);
    const times = [-3, -1, 0, 1, 5].flatMap((n) => phases.map((phase) => n * period + phase));
    const levels = patternProfile(disposition, courses, period, times);
    for (const [i, level] of levels.entries()) expect(level).toBe(once[i % phases.length]);
  });

  it("one dose at time 0 is steadyState, with a lag shorter and longer than the interval", () => {
    for (const lag of [0, 0.75, 30]) {
      const kinetics = { ka: 0.7, ke: 0.12, volume: 20, bioavailability: 0.9, lag };
      const courses = [{ ...kinetics, doses: [{ time: 0, amount: 120 }] }];
      const found = patternSteadyState(kinetics, courses, 12);
      const wanted = steadyState(kinetics, 120, 12);
      expect(relativeError(found.peak, wanted.peak)).toBeLessThanOrEqual(2e-15);
      expect(relativeError(found.lowest, wanted.trough)).toBeLessThanOrEqual(2e-15);
      expect(Math.abs(found.timeOfPeak - wanted.timeOfPeak)).toBeLessThanOrEqual(1e-12);
      expect(found.timeOfLowest).toBe(lag % 12);
      expect(relativeError(found.accumulation, wanted.accumulation)).toBeLessThanOrEqual(2e-15);
      for (const s of [0, 0.5, 0.75, 2, 11, 12]) {
        const [level] = patternProfile(kinetics, courses, 12, [s]);
        expect(relativeError(level!, steadyStateConcentration(kinetics, 120, 12, s))).toBeLessThanOrEqual(2e-15);
      }
    }
  });

  // The level goes on falling through the lag.
  it("finds a lowest level that is not just before a dose is taken, but a lag after it", () => {
    const courses = [
      {
        ka: 1,
        bioavailability: 1,
        lag: 1.5,
        doses: [
          { time: 8, amount: 200 },
          { time: 20, amount: 200 },
        ],
      },
    ];
    const found = patternSteadyState({ ke: 0.2, volume: 30 }, courses, 24);
    expect([9.5, 21.5]).toContain(found.timeOfLowest);
  });
});
