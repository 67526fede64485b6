import { expect, test } from "vitest";
import { DOSE_FAR, doseSense, type MedicineRecord, recordById } from "../../../src/core/medicine/index.ts";
import type { DoseLine } from "../../../src/core/regimen/index.ts";
import { orderedLine } from "../case/orderedLine.ts";

const theophylline = recordById("theophylline")!;
const limit = (value: number) => ({ ...theophylline.limits.maximumDailyDose!, value });
const record = (single: number | null, daily: number | null): MedicineRecord => ({
  ...theophylline,
  limits: {
    ...(single === null ? {} : { maximumSingleDose: limit(single) }),
    ...(daily === null ? {} : { maximumDailyDose: limit(daily) }),
  },
});
const every = (mg: number, hours: number, count?: number): DoseLine =>
  orderedLine({
    amount: { value: mg, unit: "mg" },
    repeat: { every: { value: hours, unit: "h" }, ...(count === undefined ? {} : { count }) },
  });

test("above three times the maximum single dose, not at it", () => {
  expect(DOSE_FAR).toBe(3);
  expect(doseSense(every(1201, 12), record(400, null))).toEqual({
    per: "dose",
    mg: 1201,
    limitMg: 400,
    limit: "single",
  });
  expect(doseSense(every(1200, 12), record(400, null))).toBeNull();
});

test("one dose is held against the daily maximum too, a day of the line by how often it comes", () => {
  expect(doseSense(every(2000, 12), theophylline)).toEqual({ per: "dose", mg: 2000, limitMg: 600, limit: "daily" });
  const daily = record(null, 600);
  expect(doseSense(every(600, 6), daily)).toEqual({ per: "day", mg: 2400, limitMg: 600, limit: "daily" });
  expect(doseSense(every(450, 6), daily)).toBeNull();
  // Two doses and no more; every other day is never less than the dose itself.
  expect(doseSense(every(600, 6, 2), daily)).toBeNull();
  expect(doseSense(every(1801, 48), daily)).toMatchObject({ per: "dose", mg: 1801 });
  const clock = (times: string[]) => orderedLine({ amount: { value: 1, unit: "g" }, repeat: { clock: times } });
  expect(doseSense(clock(["08:00", "20:00"]), daily)).toMatchObject({ per: "day", mg: 2000 });
  expect(doseSense(clock(["08:00"]), daily)).toBeNull();
});

test("without a maximum in the record nothing is asked; an amount the product can't have is another matter", () => {
  expect(doseSense(every(99_999, 12), record(null, null))).toBeNull();
  expect(doseSense(orderedLine({ amount: { value: 9000, unit: "mL" } }), theophylline)).toBeNull();
});
