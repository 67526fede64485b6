import { expect, it } from "vitest";
import { bothReadings, FLIP_FLOP_SETTLED_BY } from "../../../src/core/kinetics/index.ts";

const slow = { ka: 0.125, ke: 0.2, volume: 10, bioavailability: 1, lag: 0 };

it("exchanges the rates, keeps the clearance, and says which reading is flip-flop", () => {
  const { assumed, alternative, distinguishable, reason } = bothReadings(slow);
  expect(assumed).toEqual({
    ka: 0.125,
    ke: 0.2,
    volume: 10,
    clearance: 2,
    eliminationHalfLife: Math.LN2 / 0.2,
    absorptionHalfLife: Math.LN2 / 0.125,
    flipFlop: true,
  });
  expect(alternative).toEqual({
    ka: 0.2,
    ke: 0.125,
    volume: 16,
    clearance: 2,
    eliminationHalfLife: Math.LN2 / 0.125,
    absorptionHalfLife: Math.LN2 / 0.2,
    flipFlop: false,
  });
  expect(distinguishable).toBe(false);
  expect(reason).toBe("levels-alone-cannot-tell");
  expect(FLIP_FLOP_SETTLED_BY).toHaveLength(3);
});

// 20 % of ke, both edges included.
it.each([
  [0.79, "levels-alone-cannot-tell"],
  [0.8, "rates-within-20-percent"],
  [1, "rates-within-20-percent"],
  [1.2, "rates-within-20-percent"],
  [1.21, "levels-alone-cannot-tell"],
])("ka at %d of ke: %s", (ratio, reason) => {
  const both = bothReadings({ ...slow, ke: 1, ka: ratio });
  expect(both.reason).toBe(reason);
  expect(both.distinguishable).toBe(false);
});

it("equal rates: the two readings are one", () => {
  const { assumed, alternative } = bothReadings({ ...slow, ka: 0.2 });
  expect(alternative).toEqual(assumed);
  expect(assumed.flipFlop).toBe(false);
});
