import { describe, expect, it } from "vitest";
import { historyProfile, profile, steadyStateConcentration } from "../../../src/core/kinetics/index.ts";
import { historySets } from "./historySets.ts";
import { SEVERAL_PRODUCTS } from "./severalProducts.ts";
import { WorstError } from "./worstError.ts";

describe("any history", () => {
  it("15 histories × 20 times in 25 digits: to 5e-15 of the largest level", () => {
    const worst = new WorstError();
    const sets = historySets();
    expect(sets).toHaveLength(15);
    for (const { id, kinetics, doses, times, levels } of sets) {
      expect(times).toHaveLength(20);
      const found = profile(kinetics, doses, times);
      const largest = Math.max(...levels);
      for (const [i, level] of levels.entries()) {
        worst.note("level / largest", Math.abs(found[i]! - level) / largest, `${id} t ${times[i]}`);
        // Before the first dose and at the very instant absorption begins: exactly 0, not nearly.
        if (level === 0) worst.note("zero", found[i]!, `${id} t ${times[i]}`);
      }
    }
    worst.report("histories");
    expect(worst.of("level / largest")).toBeLessThanOrEqual(5e-15);
    // One step tighter than stated.
    expect(worst.of("level / largest")).toBeLessThanOrEqual(5e-16);
    expect(worst.of("zero")).toBe(0);
  });

  it.each(SEVERAL_PRODUCTS)("several products, $name: to 1e-15 of the largest level", (set) => {
    const found = historyProfile(set, set.courses, set.times);
    const largest = Math.max(...set.levels);
    for (const [i, level] of set.levels.entries()) {
      expect(Math.abs(found[i]! - level) / largest).toBeLessThanOrEqual(1e-15);
    }
  });

  // The error of a plain sweep grows with the number of doses the body still remembers (here 1/(k·6 h) = 1,700: 1e-13).
  it.each([
    { ka: 1, ke: 1e-4 },
    { ka: 1e-4, ke: 0.2 },
    { ka: 1e-3, ke: 1e-3 },
  ])("after 100,000 doses ka $ka ke $ke is at the closed-form steady state, to 5e-15", ({ ka, ke }) => {
    const kinetics = { ka, ke, volume: 40, bioavailability: 0.7, lag: 0.5 };
    const doses = Array.from({ length: 100_000 }, (_, i) => ({ time: 6 * (i - 99_999), amount: 50 }));
    const s = [0, 0.5, 1.5, 3, 6];
    const found = profile(kinetics, doses, s);
    const wanted = s.map((t) => steadyStateConcentration(kinetics, 50, 6, t));
    const largest = Math.max(...wanted);
    const worst = new WorstError();
    for (const [i, level] of wanted.entries())
      worst.note("level / largest", Math.abs(found[i]! - level) / largest, `s ${s[i]}`);
    worst.report(`100,000 doses, ka ${ka} ke ${ke}`);
    expect(worst.of("level / largest")).toBeLessThanOrEqual(5e-15);
  });

  it("lag + time is not rounded: 0.1 + 0.2 h and late clock times keep their digits", () => {
    // 8760.3 h + 0.1 h is not a double. One short step after it the level is nearly linear in the time since.
    const kinetics = { ka: 12, ke: 0.3, volume: 10, bioavailability: 1, lag: 0.1 };
    const time = 8760.3;
    const t = 8760.4 + 2 ** -20;
    const u = t - 8760.3 - 0.1;
    const [level] = profile(kinetics, [{ time, amount: 100 }], [t]);
    const wanted = (100 * 12 * (Math.exp(-0.3 * u) - Math.exp(-12 * u))) / (10 * 11.7);
    // The textbook form here is good to 1e-10; rounding 8760.4 first would be off by 1e-6.
    expect(Math.abs(level! - wanted) / wanted).toBeLessThanOrEqual(1e-9);
  });

  it("doses at one time add; times may repeat; a Float64Array and an array give the same", () => {
    const kinetics = { ka: 1, ke: 0.2, volume: 10, bioavailability: 1, lag: 0 };
    const two = [
      { time: 1, amount: 30 },
      { time: 1, amount: 70 },
    ];
    const times = [0, 1, 1, 2, 2, 9];
    const found = profile(kinetics, two, times);
    expect([...found]).toEqual([...profile(kinetics, [{ time: 1, amount: 100 }], times)]);
    expect([...found]).toEqual([...profile(kinetics, two, Float64Array.from(times))]);
    expect(found[1]).toBe(0);
    expect(found[3]).toBe(found[4]);
  });

  it("no doses, no times", () => {
    const kinetics = { ka: 1, ke: 0.2, volume: 10, bioavailability: 1, lag: 0 };
    expect([...profile(kinetics, [], [0, 1])]).toEqual([0, 0]);
    expect(profile(kinetics, [{ time: 0, amount: 1 }], [])).toHaveLength(0);
    expect([...historyProfile(kinetics, [], [3])]).toEqual([0]);
  });
});
