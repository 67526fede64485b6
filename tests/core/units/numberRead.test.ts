import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { numberPlain, numberRead } from "../../../src/core/units/index.ts";

describe("numberRead takes", () => {
  it.each([
    ["0", 0],
    ["7", 7],
    ["1.5", 1.5],
    ["0.125", 0.125],
    ["1.000", 1],
    ["-3.2", -3.2],
    ["-0", 0],
    ["  300 ", 300],
    ["\t300", 300],
    ["123456789012345", 123456789012345],
    ["0.000000000000001", 1e-15],
  ])("%j as %d", (text, value) => {
    const read = numberRead(text);
    expect(read).toEqual({ ok: true, value });
    expect(Object.is(read.ok && read.value, -0)).toBe(false);
  });
});

describe("numberRead refuses", () => {
  it.each([
    ["", "number-empty", undefined],
    ["   ", "number-empty", undefined],
    ["1,5", "number-comma", "1.5"],
    ["-1,5", "number-comma", "-1.5"],
    ["0,125", "number-comma", "0.125"],
    ["1,25", "number-comma", "1.25"],
    ["1234,5", "number-comma", "1234.5"],
    ["1,000", "number-thousands", "1000"],
    ["12,345", "number-thousands", "12345"],
    ["1,000,000", "number-thousands", "1000000"],
    ["1,000.5", "number-thousands", "1000.5"],
    ["1.000,5", "number-format", undefined],
    ["1,,5", "number-format", undefined],
    ["٣٠٠", "number-digits", undefined],
    ["３００", "number-digits", undefined],
    ["1\u00a0000", "number-space", undefined],
    ["\u00a0300", "number-space", undefined],
    ["300\u200b", "number-space", undefined],
    ["1 000", "number-format", undefined],
    ["\u22125", "number-minus", undefined],
    ["\u20135", "number-minus", undefined],
    ["1e3", "number-exponent", undefined],
    ["1.5E-3", "number-exponent", undefined],
    [".5", "number-leading-point", "0.5"],
    ["-.5", "number-leading-point", "-0.5"],
    ["5.", "number-trailing-point", "5"],
    ["05", "number-leading-zero", undefined],
    ["00.5", "number-leading-zero", undefined],
    ["+5", "number-format", undefined],
    ["--5", "number-format", undefined],
    ["- 5", "number-format", undefined],
    ["1.2.3", "number-format", undefined],
    ["five", "number-format", undefined],
    ["0x10", "number-format", undefined],
    ["Infinity", "number-format", undefined],
    ["NaN", "number-format", undefined],
    ["1_000", "number-format", undefined],
    ["½", "number-format", undefined],
    ["1234567890123456", "number-too-long", undefined],
  ])("%j with %s", (text, code, suggestion) => {
    const read = numberRead(text);
    expect(read.ok).toBe(false);
    if (read.ok) return;
    expect(read.issues.map((issue) => issue.code)).toEqual([code]);
    expect(read.issues[0]?.data.suggestion).toBe(suggestion);
  });

  it("suggests only what it would itself take", () => {
    for (const text of ["1,5", "1,000", ".5", "5.", "1,000.5"]) {
      const read = numberRead(text);
      expect(read.ok || numberRead(String(read.issues[0]?.data.suggestion)).ok).toBe(true);
    }
  });
});

it("takes back exactly what numberPlain writes, for every number of at most 15 digits", () => {
  fc.assert(
    fc.property(
      fc.integer({ min: -999_999_999_999_999, max: 999_999_999_999_999 }),
      fc.integer({ min: -12, max: 0 }),
      (digits, power) => {
        const value = Number(`${digits}e${power}`);
        expect(numberRead(numberPlain(value))).toEqual({ ok: true, value: value === 0 ? 0 : value });
      },
    ),
    { seed: 20260304, numRuns: 1000 },
  );
});

it("never reads a text with a comma, whatever stands around it", () => {
  fc.assert(
    fc.property(fc.stringMatching(/^-?[0-9., ]{0,8},[0-9., ]{0,8}$/), (text) => {
      expect(numberRead(text).ok).toBe(false);
    }),
    { seed: 20260304, numRuns: 1000 },
  );
});
