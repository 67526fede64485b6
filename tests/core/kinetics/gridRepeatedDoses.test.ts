import { expect, it } from "vitest";
import { profile } from "../../../src/core/kinetics/index.ts";
import { gridSets } from "./gridSets.ts";
import { WorstError } from "./worstError.ts";

it("s hours after the 2nd, 5th and 12th dose: 200 sets in 25 digits, to 5e-15 of the largest level", () => {
  const worst = new WorstError();
  for (const { id, kinetics, dose, interval, afterDoses, peak } of gridSets()) {
    for (const { n, s, level } of afterDoses) {
      // The last dose at 0, so that `s` itself is not rounded.
      const doses = Array.from({ length: n }, (_, i) => ({ time: (i + 1 - n) * interval, amount: dose }));
      const found = profile(kinetics, doses, [s])[0]!;
      // The highest level is at least that of one dose.
      worst.note("level / highest", Math.abs(found - level) / Math.max(peak, level), `${id} N ${n}`);
    }
  }
  worst.report("repeated doses");
  expect(worst.of("level / highest")).toBeLessThanOrEqual(5e-15);
  // One step tighter than stated.
  expect(worst.of("level / highest")).toBeLessThanOrEqual(1e-15);
});
