import { expect, it } from "vitest";
import { steadyState } from "../../src/core/kinetics/index.ts";
import { relativeError, workedExample } from "./workedExample.ts";

/*
 * J. G. Wagner, textbook chapter 3 (University of Michigan), discussion of table 3-1, seen as a court exhibit: medicine accumulates
 * when the interval is less than 1.443 half-lives. Example W17: half-life and interval both 24 h.
 */
const example = workedExample("W17");
const { halfLife_h, tau_h } = example.inputs as Record<string, number>;
const wanted = example.computed as Record<string, number>;
const kinetics = { ka: 1e12, ke: Math.LN2 / halfLife_h!, volume: 30, bioavailability: 1, lag: 0 };

it("W17: on average 1.443 doses are in the body at steady state", () => {
  const { average } = steadyState(kinetics, 100, tau_h!);
  expect(relativeError((average * kinetics.volume) / 100, wanted.R!)).toBeLessThanOrEqual(1e-15);
});

it("W17: twice the first interval's area at steady state, when a dose is absorbed at once", () => {
  const { accumulation } = steadyState(kinetics, 100, tau_h!);
  // What is left of absorption at ka = 1e12 /h is relative 1e-13.
  expect(relativeError(accumulation, wanted.R_bolus_1_over_1_minus_exp!)).toBeLessThanOrEqual(1e-12);
});
