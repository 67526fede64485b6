import { describe, expect, it } from "vitest";
import { timedLevels, windowDrawH } from "../../../src/core/analysis/windowTiming.ts";
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

describe("levels at a stated time after the dose", () => {
  it("are those 12 h on of a dose once a day, above the lowest of the day", () => {
    const { lowest, highest } = timedLevels(disposition, [input([{ time: 0, amount: 160 }])], 24, 12);
    const at12 = steadyStateConcentration(kinetics, 160, 24, 12);
    expect(lowest).toBe(highest);
    expect(Math.abs(lowest / at12 - 1)).toBeLessThan(1e-12);
    expect(lowest).toBeGreaterThan(1.2 * steadyStateConcentration(kinetics, 160, 24, 24));
  });

  it("are taken just before the next dose where that comes first", () => {
    const { lowest } = timedLevels(disposition, [input([{ time: 0, amount: 60 }])], 8, 12);
    expect(Math.abs(lowest / steadyStateConcentration(kinetics, 60, 8, 8) - 1)).toBeLessThan(1e-12);
  });

  it("of unequal doses are several: the lowest and the highest are given", () => {
    const inputs = [
      input([
        { time: 8, amount: 40 },
        { time: 20, amount: 120 },
      ]),
    ];
    const { lowest, highest } = timedLevels(disposition, inputs, 24, 12);
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
