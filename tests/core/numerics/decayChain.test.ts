import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { decay, decayChain, decayDifference, passedTwoSteps } from "../../../src/core/numerics/index.ts";
import { relativeError, WorstError } from "../kinetics/worstError.ts";

interface Case {
  rates: string[];
  time: string;
  value: string;
}

/** How they were worked out stands in the file: matrix exponentials in 150 digits. */
const { cases } = JSON.parse(readFileSync(new URL("../../fixtures/decay_chain.json", import.meta.url), "utf8")) as {
  cases: Case[];
};

describe("decayChain", () => {
  it("is right to 1e-15 relative: 2 to 4 rates, spread, nearly equal, equal and 0", () => {
    const worst = new WorstError();
    for (const { rates, time, value } of cases) {
      const found = decayChain(rates.map(Number), Number(time));
      worst.note(`${rates.length} rates`, relativeError(found, Number(value)), JSON.stringify([rates, time]));
    }
    worst.report("decayChain");
    for (const n of [2, 3, 4]) expect(worst.of(`${n} rates`), `${n} rates`).toBeLessThanOrEqual(1e-15);
  });

  it("does not depend on the order of the rates", () => {
    expect(decayChain([3, 0.2, 1], 2)).toBe(decayChain([0.2, 1, 3], 2));
  });

  it("equals the functions it extends", () => {
    expect(decayChain([0.3], 2)).toBe(decay(0.3, 2));
    expect(decayChain([0.3, 2], 2)).toBe(decayDifference(0.3, 2, 2));
    expect(relativeError(decayChain([0.3, 2, 0], 2), passedTwoSteps(0.3, 2, 2) / 0.6)).toBeLessThanOrEqual(3e-15);
  });

  it("is 0 at time 0 and where nothing is left, and t^(n−1)/(n−1)! without decay", () => {
    expect(decayChain([1, 2, 3], 0)).toBe(0);
    expect(decayChain([1, 2, 3], 1e4)).toBe(0);
    expect(decayChain([0, 0, 0], 3)).toBe(4.5);
    expect(decayChain([0, 0, 0, 0], 3)).toBe(4.5);
  });

  it("does not change the list it is given", () => {
    const rates = [3, 1, 2];
    decayChain(rates, 1);
    expect(rates).toEqual([3, 1, 2]);
  });
});
