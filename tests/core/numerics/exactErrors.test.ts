import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { CompensatedSum, productError, sumError } from "../../../src/core/numerics/index.ts";

/** A double as an exact fraction n/2^1074. */
function exactly(x: number): bigint {
  const [mantissa, exponent] = [new DataView(new ArrayBuffer(8))].map((view) => {
    view.setFloat64(0, x);
    const bits = view.getBigUint64(0);
    const power = (bits >> 52n) & 0x7ffn;
    const fraction = bits & 0xfffffffffffffn;
    return [power === 0n ? fraction : fraction | (1n << 52n), power === 0n ? 0n : power - 1n] as const;
  })[0]!;
  return (x < 0 ? -1n : 1n) * (mantissa << exponent);
}

const moderate = fc.double({ min: -1e9, max: 1e9, noNaN: true }).filter((x) => x === 0 || Math.abs(x) > 1e-9);
const RUNS = { seed: 53, numRuns: 1000 };

describe("what rounding took, exactly", () => {
  it("sumError: sum and error together are the two terms", () => {
    fc.assert(
      fc.property(moderate, moderate, (a, b) => {
        const s = a + b;
        expect(exactly(s) + exactly(sumError(a, b, s))).toBe(exactly(a) + exactly(b));
      }),
      RUNS,
    );
    expect(sumError(1, 1e-17, 1)).toBe(1e-17);
  });

  it("productError: product and error together are the two factors multiplied", () => {
    fc.assert(
      fc.property(moderate, moderate, (a, b) => {
        const p = a * b;
        // Both sides in units of 2^-2148.
        expect((exactly(p) + exactly(productError(a, b, p))) << 1074n).toBe(exactly(a) * exactly(b));
      }),
      RUNS,
    );
    expect(productError(0.1, 10, 1)).toBe(5.551115123125783e-17);
    expect(productError(2 ** 1000, 0.1, 2 ** 1000 * 0.1)).toBe(0);
  });
});

describe("CompensatedSum", () => {
  it("adds ten times 0.1 to 1, which a plain sum does not", () => {
    const sum = new CompensatedSum();
    let plain = 0;
    for (let i = 0; i < 10; i++) {
      sum.add(0.1);
      plain += 0.1;
    }
    expect(plain).not.toBe(1);
    expect(sum.value).toBe(1);
  });

  it("keeps what is far smaller, and overflows to Infinity, not to NaN", () => {
    const sum = new CompensatedSum();
    for (const term of [1e16, 1, 1, -1e16]) sum.add(term);
    expect(sum.value).toBe(2);
    const large = new CompensatedSum();
    large.add(Number.MAX_VALUE);
    large.add(Number.MAX_VALUE);
    expect(large.value).toBe(Infinity);
    expect(new CompensatedSum().value).toBe(0);
  });
});
