import { expect, it } from "vitest";
import { relativeError, WorstError } from "./worstError.ts";

it("takes what is not a number, and what was never compared, for the worst error", () => {
  const worst = new WorstError();
  worst.note("a", relativeError(1.5, 1), "x");
  worst.note("a", relativeError(1.25, 1), "y");
  expect(worst.of("a")).toBe(0.5);
  worst.note("a", relativeError(Number.NaN, 1), "z");
  expect(worst.of("a")).toBe(Infinity);
  expect(worst.of("never")).toBe(Infinity);
  expect(relativeError(1e-300, 0)).toBe(Infinity);
  expect(relativeError(0, 0)).toBe(0);
});
