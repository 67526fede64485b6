import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  type DoseLine,
  doseLineCount,
  doseLineExpand,
  doseLineText,
  doseTextRead,
} from "../../../src/core/regimen/index.ts";
import { instantIso } from "../../../src/core/time/index.ts";
import { doseTextContext, PRODUCTS } from "./doseTextContext.ts";

const ZONES = ["Europe/London", "America/St_Johns", "UTC"] as const;
const text = (line: DoseLine, zone = "Europe/London") =>
  doseLineText(line, { zone, products: PRODUCTS, defaultProduct: "mr" });
const base: DoseLine = {
  id: "L1",
  product: "mr",
  amount: { value: 300, unit: "mg" },
  start: "2026-03-04T20:00:00+00:00",
};

describe("doseLineText", () => {
  it.each<[string, DoseLine]>([
    ["300 mg once at Wed 4 March 2026 20:00", base],
    ["300 mg of tablet once at Wed 4 March 2026 20:00", { ...base, product: "ir" }],
    ["1.25 g once at Wed 4 March 2026 20:00", { ...base, amount: { value: 1.25, unit: "g" } }],
    ["1500 microgram once at Wed 4 March 2026 20:00", { ...base, amount: { value: 1500, unit: "ug" } }],
    [
      "300 mg every 12 h from Wed 4 March 2026 20:00, 10 doses",
      { ...base, repeat: { every: { value: 12, unit: "h" }, count: 10 } },
    ],
    ["300 mg every 7.5 h from Wed 4 March 2026 20:00", { ...base, repeat: { every: { value: 7.5, unit: "h" } } }],
    [
      "300 mg daily at 08:00 and 20:00 from Wed 4 March 2026 20:00 for 7 days",
      { ...base, repeat: { clock: ["20:00", "08:00"], days: 7 } },
    ],
    [
      "300 mg daily at 06:00, 14:00 and 22:00 from Wed 4 March 2026 20:00",
      { ...base, repeat: { clock: ["06:00", "14:00", "22:00"] } },
    ],
    [
      "300 mg at 08:00 on Mon, Wed and Fri from Wed 4 March 2026 20:00",
      { ...base, repeat: { clock: ["08:00"], weekdays: [1, 3, 5] } },
    ],
    [
      "300 mg at 08:00 and 20:00 every Sun from Wed 4 March 2026 20:00 for 28 days",
      { ...base, repeat: { clock: ["08:00", "20:00"], days: 28, weekdays: [7] } },
    ],
    [
      "300 mg every 12 h from Wed 4 March 2026 20:00, 3 doses, dose 1 missed, dose 2 late at Thu 5 March 2026 10:15, dose 3 moved to Thu 5 March 2026 18:00 200 mg",
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
    ["300 mg once at Sun 25 October 2026 01:30 (UTC+00:00)", { ...base, start: "2026-10-25T01:30:00+00:00" }],
    ["300 mg once at 2026-03-04T20:00:30+00:00", { ...base, start: "2026-03-04T20:00:30+00:00" }],
  ])("%s", (wanted, line) => {
    expect(text(line)).toBe(wanted);
  });
});

/** Any line that can be laid out, anywhere in five years, exceptions included; also in the hours that come twice. */
function lines(zone: string): fc.Arbitrary<DoseLine> {
  const minute = fc.oneof(
    fc.integer({ min: 0, max: 5 * 365 * 24 * 60 }),
    // Around the changes of October and November 2026.
    fc.integer({ min: 1_480_000, max: 1_500_000 }),
  );
  const instant = minute.map((minutes) => instantIso(Date.UTC(2024, 0, 1) + minutes * 60_000, zone));
  const clock = fc
    .uniqueArray(fc.integer({ min: 180, max: 1439 }), { minLength: 1, maxLength: 4 })
    .map((times) =>
      times
        .sort((a, b) => a - b)
        .map((time) => `${String(Math.floor(time / 60)).padStart(2, "0")}:${String(time % 60).padStart(2, "0")}`),
    );
  const amount = fc.record({
    value: fc.integer({ min: 1, max: 500_000 }).map((steps) => steps / 100),
    unit: fc.constantFrom("mg" as const, "g" as const, "ug" as const),
  });
  const every = fc.record(
    {
      every: fc.record({
        value: fc.integer({ min: 1, max: 300 }).map((steps) => steps / 4),
        unit: fc.constant("h" as const),
      }),
      count: fc.integer({ min: 1, max: 60 }),
    },
    { requiredKeys: ["every"] },
  );
  const daily = fc.record(
    { clock, days: fc.integer({ min: 1, max: 60 }), weekdays: fc.subarray([1, 2, 3, 4, 5, 6, 7], { minLength: 1 }) },
    { requiredKeys: ["clock"] },
  );
  const exception = fc.record(
    {
      index: fc.integer({ min: 0, max: 5 }),
      status: fc.constantFrom("missed" as const, "late" as const, "moved" as const),
      at: instant,
      amount,
    },
    { requiredKeys: ["index", "status", "at"] },
  );
  return fc
    .record(
      {
        id: fc.constant("L1"),
        product: fc.constantFrom("mr", "ir", "cap", "solution"),
        amount,
        start: instant,
        repeat: fc.oneof(every, daily),
        except: fc.uniqueArray(exception, { minLength: 1, maxLength: 3, selector: ({ index }) => index }),
      },
      { requiredKeys: ["id", "product", "amount", "start"] },
    )
    .map(({ except, ...line }): DoseLine => {
      const doses = doseLineCount(line, zone);
      const kept = (except ?? [])
        .filter(({ index }) => index < doses)
        .sort((a, b) => a.index - b.index)
        .map(({ at, amount: changed, ...rest }) =>
          rest.status === "missed" ? rest : { ...rest, at, ...(changed ? { amount: changed } : {}) },
        );
      return kept.length > 0 ? { ...line, except: kept } : line;
    })
    .filter((line) => doseLineExpand(line, { zone, untilMs: 0 }).ok);
}

describe("what doseLineText writes, doseTextRead reads back to the same line", () => {
  it.each(ZONES)(
    "in %s, in either lane, whatever now is",
    (zone) => {
      fc.assert(
        fc.property(lines(zone), fc.constantFrom("given", "option"), (line, lane) => {
          const read = doseTextRead(text(line, zone), doseTextContext({ zone, lane }));
          expect(read, text(line, zone)).toEqual({ ok: true, value: [line] });
        }),
        { seed: 20260304, numRuns: 150 },
      );
    },
    60_000,
  );
});
