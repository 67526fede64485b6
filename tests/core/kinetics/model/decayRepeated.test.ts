import { expect, test } from "vitest";
import { decayRepeated } from "../../../../src/core/kinetics/model/decayRepeated.ts";
import { decayChain } from "../../../../src/core/numerics/index.ts";

const RATES = [0, 0.01, 0.3, 0.999, 1, 1.0000001, 1.9, 5, 40];
const TIMES = [0, 1e-3, 0.5, 1, 2, 20];

test("the general chain of decays, to 2e-15 of the larger decay × u²", () => {
  let compared = 0;
  for (const a of RATES) {
    for (const b of RATES) {
      for (const u of TIMES) {
        const leftA = Math.exp(-a * u);
        const leftB = Math.exp(-b * u);
        const error = Math.abs(decayRepeated(a, b, u, leftA, leftB) - decayChain([a, a, b], u));
        expect(error, `${a} ${b} ${u}`).toBeLessThanOrEqual(2e-15 * u * u * Math.max(leftA, leftB));
        compared++;
      }
    }
  }
  expect(compared).toBe(RATES.length ** 2 * TIMES.length);
});
