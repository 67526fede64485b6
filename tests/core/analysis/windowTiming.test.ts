import { describe, expect, it } from "vitest";
import { dueLevels, timedLevels, windowDrawH } from "../../../src/core/analysis/windowTiming.ts";
import { steadyStateConcentration } from "../../../src/core/kinetics/index.ts";
import { caseFixture } from "./caseFixture.ts";

const disposition = { kind: "one-compartment", clearance: 1.4, volume: 33 } as const;
const input = (doses: { time: number; amount: number }[]) => ({
  absorption: { kind: "first-order", ka: 0.9 } as const,
  bioavailability: 1,
  lag: 0,
  doses,
});
const kinetics = { ka: 0.9, ke: 1.4 / 33, volume: 33, bioavailability: 1, lag: 0 };

/** A window whose level is drawn 11.5 to 12.5 h after a dose. */
const DRAW = { afterDoseH: 12, fromH: 11.5 };
const at = (...times: number[]) => [input(times.map((time) => ({ time, amount: 60 })))];
/** The level at an hour of the day when 60 mg has long been given at each of the times: each dose's own course once a day, added up. */
const superposed = (times: readonly number[], hour: number) =>
  times.reduce((sum, time) => sum + steadyStateConcentration(kinetics, 60, 24, (hour - time + 48) % 24 || 24), 0);

describe("levels at a stated time after the dose", () => {
  it("are those 12 h on of a dose once a day, above the lowest of the day", () => {
    const { lowest, highest } = timedLevels(disposition, [input([{ time: 0, amount: 160 }])], 24, DRAW)!;
    const at12 = steadyStateConcentration(kinetics, 160, 24, 12);
    expect(lowest).toBe(highest);
    expect(Math.abs(lowest / at12 - 1)).toBeLessThan(1e-12);
    expect(lowest).toBeGreaterThan(1.2 * steadyStateConcentration(kinetics, 160, 24, 24));
  });

  it("at 08:00, 14:00 and 20:00 there is one, before the dose of 08:00: 14:00 and 20:00 come six hours after a dose", () => {
    const times = [8, 14, 20];
    const found = timedLevels(disposition, at(...times), 24, DRAW)!;
    expect(found.lowest).toBe(found.highest);
    expect(Math.abs(found.lowest / superposed(times, 8) - 1)).toBeLessThan(1e-12);
    // What was mixed in before: a fifth and more above it.
    expect(superposed(times, 20) / found.lowest).toBeGreaterThan(1.15);
    expect(Math.abs(dueLevels(disposition, at(...times), 24, 12).highest / superposed(times, 20) - 1)).toBeLessThan(
      1e-12,
    );
  });

  it("every 8 hours there is none", () => {
    expect(timedLevels(disposition, at(0), 8, DRAW)).toBeNull();
    expect(timedLevels(disposition, at(0, 8, 16), 24, DRAW)).toBeNull();
  });

  it("are taken just before the next dose where that comes within the hours the level may be drawn", () => {
    const times = [8, 19.75];
    const found = timedLevels(disposition, at(...times), 24, DRAW)!;
    // 11.75 h after the morning dose and 12 h after the evening one; a gap of 11.25 h would be too short.
    const both = [superposed(times, 19.75), superposed(times, 7.75)];
    expect(Math.abs(found.lowest / Math.min(...both) - 1)).toBeLessThan(1e-12);
    expect(Math.abs(found.highest / Math.max(...both) - 1)).toBeLessThan(1e-12);
    const later = timedLevels(disposition, at(8, 19.25), 24, DRAW)!;
    expect(later.lowest).toBe(later.highest);
    expect(Math.abs(later.lowest / superposed([8, 19.25], 7.25) - 1)).toBeLessThan(1e-12);
  });

  it("of unequal doses are several: the lowest and the highest are given", () => {
    const inputs = [
      input([
        { time: 8, amount: 40 },
        { time: 20, amount: 120 },
      ]),
    ];
    const { lowest, highest } = timedLevels(disposition, inputs, 24, DRAW)!;
    expect(highest / lowest).toBeGreaterThan(1.05);
  });
});

describe("when the window's level is drawn", () => {
  const window = {
    quantity: "trough",
    low: { value: 0.6, unit: "mmol/L" },
    high: { value: 1, unit: "mmol/L" },
    basis: "",
  } as const;
  const hours = (value: number) => ({ value, unit: "h" }) as const;
  it.each([
    ["not stated", window, null],
    ["between two times: their middle", { ...window, drawFrom: hours(11), drawTo: hours(13) }, 12],
    ["from a time on, without an end: the next dose", { ...window, drawFrom: hours(6) }, null],
    ["of a peak: not asked here", { ...window, quantity: "peak" as const, drawFrom: hours(1), drawTo: hours(2) }, null],
  ])("%s", (_, own, wanted) => {
    expect(windowDrawH(caseFixture({ window: own }))).toBe(wanted);
  });
});
