import { describe, expect, it } from "vitest";
import { doseLineSentence } from "../../../src/core/messages/index.ts";
import type { DoseLine } from "../../../src/core/regimen/index.ts";
import { forbiddenForms } from "../../../src/core/units/index.ts";
import { PRODUCTS } from "../regimen/doseTextContext.ts";

const base: DoseLine = {
  id: "L1",
  product: "mr",
  amount: { value: 300, unit: "mg" },
  start: "2026-03-04T20:00:00+00:00",
};
const words = (line: DoseLine, rest = {}) =>
  doseLineSentence(line, { zone: "Europe/London", products: PRODUCTS, ...rest }).replaceAll("\u00a0", " ");

const SENTENCES: readonly (readonly [string, DoseLine])[] = [
  [
    "300 mg of 12-hour modified-release tablet every 12 hours, first dose Wednesday 4 March 2026 at 20:00, last Monday 9 March at 08:00: 10 doses",
    { ...base, repeat: { every: { value: 12, unit: "h" }, count: 10 } },
  ],
  ["300 mg of 12-hour modified-release tablet once, on Wednesday 4 March 2026 at 20:00", base],
  [
    "300 mg of 12-hour modified-release tablet each day at 08:00 and 20:00, first dose Wednesday 4 March 2026 at 20:00, last Thursday 5 March at 20:00: 3 doses",
    { ...base, repeat: { clock: ["20:00", "08:00"], days: 2 } },
  ],
  [
    "300 mg of 12-hour modified-release tablet every 8 hours, first dose Wednesday 4 March 2026 at 20:00, until further notice",
    { ...base, repeat: { every: { value: 8, unit: "h" } } },
  ],
  [
    "300 mg of 12-hour modified-release tablet each day at 08:00, first dose Thursday 5 March 2026 at 08:00, until further notice",
    { ...base, repeat: { clock: ["08:00"] } },
  ],
  [
    "300 mg of 12-hour modified-release tablet every 1 hour, only dose Wednesday 4 March 2026 at 20:00: 1 dose",
    { ...base, repeat: { every: { value: 1, unit: "h" }, count: 1 } },
  ],
  [
    "300 mg of 12-hour modified-release tablet every 24 hours, first dose Wednesday 30 December 2026 at 20:00, last Friday 1 January 2027 at 20:00: 3 doses",
    { ...base, start: "2026-12-30T20:00:00+00:00", repeat: { every: { value: 24, unit: "h" }, count: 3 } },
  ],
  [
    "5 mL (250 mg) of oral solution once, on Wednesday 4 March 2026 at 20:00",
    { ...base, product: "solution", amount: { value: 5, unit: "mL" } },
  ],
  [
    "125 microgram of tablet once, on Wednesday 4 March 2026 at 20:00",
    { ...base, product: "ir", amount: { value: 0.125, unit: "mg" } },
  ],
  [
    "1,500 mg of tablet once, on Wednesday 4 March 2026 at 20:00",
    { ...base, product: "ir", amount: { value: 1500, unit: "mg" } },
  ],
  [
    "300 mg of 12-hour modified-release tablet once, on Sunday 25 October 2026 at 01:30 (UTC+00:00)",
    { ...base, start: "2026-10-25T01:30:00+00:00" },
  ],
  [
    "300 mg of 12-hour modified-release tablet every 12 hours, first dose Wednesday 4 March 2026 at 20:00, last Thursday 5 March at 20:00: 3 doses; dose 1 missed; dose 2 taken late, Thursday 5 March at 10:15; dose 3 moved to Thursday 5 March at 18:00, 200 mg",
    {
      ...base,
      repeat: { every: { value: 12, unit: "h" }, count: 3 },
      except: [
        { index: 0, status: "missed" },
        { index: 1, status: "late", at: "2026-03-05T10:15:00+00:00" },
        { index: 2, status: "moved", at: "2026-03-05T18:00:00+00:00", amount: { value: 200, unit: "mg" } },
      ],
    },
  ],
];

describe("doseLineSentence", () => {
  it.each(SENTENCES)("%s", (wanted, line) => {
    expect(words(line)).toBe(wanted);
  });

  it("in print, with mcg where the setting says so", () => {
    expect(words({ ...base, amount: { value: 0.125, unit: "mg" } }, { style: "print", microgram: "mcg" })).toMatch(
      /^125 mcg of /,
    );
  });

  it("has no form that may not be printed", () => {
    for (const [, line] of SENTENCES) expect(forbiddenForms(words(line, { style: "print" })), words(line)).toEqual([]);
  });

  it("names a product that the record has not by its id, rather than nothing", () => {
    expect(words({ ...base, product: "gone" })).toMatch(/^300 mg of gone once/);
  });

  it("says so when a line has no dose", () => {
    expect(words({ ...base, start: "2026-03-04T22:00:00+00:00", repeat: { clock: ["08:00"], days: 1 } })).toBe(
      "300 mg of 12-hour modified-release tablet each day at 08:00: no dose",
    );
  });
});
