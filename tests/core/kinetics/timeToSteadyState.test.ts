import { expect, it } from "vitest";
import { timeToSteadyState } from "../../../src/core/kinetics/index.ts";

const kinetics = { ka: 1, ke: 0.1, volume: 30, bioavailability: 1, lag: 0 };

it("is ln(1/(1 − fraction)) over the slower rate, and says which that is", () => {
  // Relative 1e-15.
  expect(timeToSteadyState(kinetics).hours / (Math.LN10 / 0.1)).toBeCloseTo(1, 15);
  expect(timeToSteadyState(kinetics).slower).toBe("elimination");
  expect(timeToSteadyState({ ...kinetics, ka: 0.02 })).toEqual({
    hours: timeToSteadyState(kinetics).hours * 5,
    slower: "absorption",
  });
  expect(timeToSteadyState(kinetics, 0.5).hours / (Math.LN2 / 0.1)).toBeCloseTo(1, 15);
  expect(timeToSteadyState({ ...kinetics, ka: 0.1 }).slower).toBe("elimination");
});
