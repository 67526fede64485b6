import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { amountSteps, tabletsFor } from "../../../src/core/regimen/index.ts";

describe("tabletsFor", () => {
  it.each([
    [300, [200, 300], "whole", [[300, 1]]],
    [
      500,
      [200, 300],
      "whole",
      [
        [300, 1],
        [200, 1],
      ],
    ],
    [600, [200, 300], "whole", [[300, 2]]],
    [400, [100, 200, 300], "whole", [[200, 2]]],
    [300, [200], "whole", null],
    [300, [200], "unknown", null],
    [300, [200], "half", [[200, 1.5]]],
    [100, [200], "half", [[200, 0.5]]],
    // Whole tablets before a half, even if there are more of them.
    [
      300,
      [200, 100],
      "half",
      [
        [200, 1],
        [100, 1],
      ],
    ],
    [150, [200, 100], "half", [[100, 1.5]]],
    [50, [200], "half", null],
    // As few tablets: one strength before two, else the strongest first.
    [600, [500, 300, 100], "whole", [[300, 2]]],
    [
      700,
      [400, 300, 200, 100, 600],
      "whole",
      [
        [600, 1],
        [100, 1],
      ],
    ],
    // Taking the strongest first would fail here: 250 + … leaves 150.
    [400, [250, 200], "whole", [[200, 2]]],
    [
      0.1875,
      [0.0625, 0.125],
      "whole",
      [
        [0.125, 1],
        [0.0625, 1],
      ],
    ],
    [0.09375, [0.0625], "half", [[0.0625, 1.5]]],
    [0.3, [0.1], "whole", [[0.1, 3]]],
    [100 / 3, [100], "half", null],
    [300, [], "half", null],
    [0, [200], "whole", null],
    [-200, [200], "whole", null],
    [Number.NaN, [200], "whole", null],
  ] as const)("%d mg from %j, %s", (mg, strengths, divisible, wanted) => {
    const found = tabletsFor(mg, strengths, divisible);
    expect(found?.map(({ strengthMg, count }) => [strengthMg, count]) ?? null).toEqual(wanted);
  });

  it.each([0, -5, Number.NaN, Number.POSITIVE_INFINITY])("a strength of %d is a programmer's mistake", (strength) => {
    expect(() => tabletsFor(100, [strength], "whole")).toThrow(RangeError);
  });

  it("makes the amount exactly, and no smaller number of whole tablets does (against trying every count)", () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.constantFrom(25, 50, 75, 100, 200, 250, 300, 400), { minLength: 1, maxLength: 3 }),
        fc.integer({ min: 1, max: 60 }).map((step) => step * 25),
        fc.boolean(),
        (strengths, mg, halves) => {
          const found = tabletsFor(mg, strengths, halves ? "half" : "whole");
          const best = fewestByTrying(mg, strengths);
          if (best !== null) {
            expect(found?.reduce((sum, { count }) => sum + count, 0)).toBe(best);
          } else if (!halves) {
            expect(found).toBeNull();
          }
          if (!found) return;
          expect(found.reduce((sum, { strengthMg, count }) => sum + strengthMg * count, 0)).toBe(mg);
          if (!halves || best !== null) for (const { count } of found) expect(Number.isInteger(count)).toBe(true);
        },
      ),
      { seed: 20260304, numRuns: 500 },
    );
  });
});

/** The plain way: try every number of each tablet. */
function fewestByTrying(mg: number, strengths: readonly number[]): number | null {
  const [first, ...rest] = strengths;
  if (first === undefined) return mg === 0 ? 0 : null;
  const totals: number[] = [];
  for (let count = 0; count * first <= mg; count += 1) {
    const others = fewestByTrying(mg - count * first, rest);
    if (others !== null) totals.push(count + others);
  }
  return totals.length === 0 ? null : Math.min(...totals);
}

describe("amountSteps", () => {
  it.each([
    [300, [200], "whole", 200, 400],
    [300, [200], "half", 200, 400],
    [300, [250, 200], "whole", 250, 400],
    [200, [200], "whole", null, 400],
    [200, [200], "half", 100, 300],
    [0, [200, 300], "whole", null, 200],
    [100, [200, 300], "whole", null, 200],
    [500, [200, 300], "whole", 400, 600],
    [250.5, [200, 300], "whole", 200, 300],
    [0.125, [0.0625], "whole", 0.0625, 0.1875],
    [100 / 3, [100], "whole", null, 100],
    [300, [], "whole", null, null],
  ] as const)("from %d mg with %j, %s: down %s, up %s", (mg, strengths, divisible, down, up) => {
    expect(amountSteps(mg, strengths, divisible)).toEqual({ down, up });
  });

  it.each([-1, Number.NaN, Number.POSITIVE_INFINITY])("an amount of %d is a programmer's mistake", (mg) => {
    expect(() => amountSteps(mg, [200], "whole")).toThrow(RangeError);
  });

  it("each step can be made, nothing between can, and up then down comes back", () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.constantFrom(25, 50, 75, 100, 200, 250, 300), { minLength: 1, maxLength: 3 }),
        fc.integer({ min: 0, max: 60 }).map((step) => step * 25),
        fc.constantFrom("whole" as const, "half" as const),
        (strengths, mg, divisible) => {
          const canMake = (amount: number) => tabletsFor(amount, strengths, divisible) !== null;
          const { down, up } = amountSteps(mg, strengths, divisible);
          expect(up !== null && up > mg && canMake(up)).toBe(true);
          for (let between = mg + 12.5; between < up!; between += 12.5) expect(canMake(between)).toBe(false);
          if (down !== null) expect(down < mg && canMake(down)).toBe(true);
          for (let between = mg - 12.5; between > (down ?? 0); between -= 12.5) expect(canMake(between)).toBe(false);
          if (canMake(mg)) expect(amountSteps(up!, strengths, divisible).down).toBe(mg);
        },
      ),
      { seed: 20260304, numRuns: 300 },
    );
  });
});
