import { expect, it } from "vitest";
import { steadyState } from "../../src/core/kinetics/index.ts";
import { relativeError, workedExample } from "./workedExample.ts";

/*
 * "Pharmacokinetic Exercises List", exercise 4 (digoxin 0.25, then 0.375 mg a day, clearance 9 L/h); bioavailability 0.7 from the
 * digoxin tablet label (LANOXIN, table 1: tablets 60–80 %). Example D01: average levels at steady state, µg/L.
 */
const example = workedExample("D01");
const { CL_L_per_h } = example.inputs as { CL_L_per_h: number };
const wanted = example.computed as Record<string, number>;

it.each([
  ["Css_250_F1", 250, 1],
  ["Css_250_F0p7", 250, 0.7],
  ["Css_375_F1", 375, 1],
  ["Css_375_F0p7", 375, 0.7],
] as const)("D01 %s", (key, microgramsADay, bioavailability) => {
  // The average does not depend on the volume nor on ka; any will do.
  for (const volume of [400, 600]) {
    const kinetics = { ka: 0.8, ke: CL_L_per_h / volume, volume, bioavailability, lag: 0.3 };
    const { average } = steadyState(kinetics, microgramsADay / 1000, 24);
    expect(relativeError(average * 1000, wanted[key]!)).toBeLessThanOrEqual(1e-15);
  }
});
