import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  hoursBetween,
  instantAddHours,
  instantIso,
  instantMs,
  instantSchema,
  timeZoneSchema,
} from "../../../src/core/time/index.ts";

const ZONES = [
  "Europe/London",
  "America/St_Johns",
  "Australia/Lord_Howe",
  "Asia/Kathmandu",
  "America/Sao_Paulo",
  "UTC",
];

describe("instantSchema takes", () => {
  it.each([
    ["2026-03-04T09:00:00+00:00", Date.UTC(2026, 2, 4, 9)],
    ["2026-03-04T09:00+00:00", Date.UTC(2026, 2, 4, 9)],
    ["2026-03-04T09:00:30Z", Date.UTC(2026, 2, 4, 9, 0, 30)],
    ["2026-03-04T09:00:00-03:30", Date.UTC(2026, 2, 4, 12, 30)],
    ["2024-02-29T23:59:59+14:00", Date.UTC(2024, 1, 29, 9, 59, 59)],
    ["1970-01-01T00:00:00+00:00", 0],
  ])("%s", (iso, ms) => {
    expect(instantSchema.safeParse(iso).success).toBe(true);
    expect(instantMs(iso)).toBe(ms);
  });
});

describe("instantSchema refuses", () => {
  it.each([
    "",
    "2026-03-04",
    "2026-03-04T09:00",
    "2026-03-04T09:00:00",
    "2026-03-04 09:00:00+00:00",
    "2026-03-04T09:00:00+0000",
    "2026-03-04T09:00:00.000+00:00",
    "2026-03-04T09:00:60+00:00",
    "2026-03-04T24:00:00+00:00",
    "2026-03-04T09:60:00+00:00",
    "2026-02-29T09:00:00+00:00",
    "2026-04-31T09:00:00+00:00",
    "2026-13-01T09:00:00+00:00",
    "2026-00-01T09:00:00+00:00",
    "2026-03-00T09:00:00+00:00",
    "1969-12-31T09:00:00+00:00",
    "2200-01-01T09:00:00+00:00",
    "2026-03-04T09:00:00+15:00",
    "2026-03-04T09:00:00\u221203:30",
    "2026-03-04T09:00:00+00:00[Europe/London]",
    " 2026-03-04T09:00:00+00:00",
    "2026-03-04T09:00:00+00:00\n",
    "+002026-03-04T09:00:00+00:00",
  ])("%j", (iso) => {
    expect(instantSchema.safeParse(iso).success).toBe(false);
    expect(() => instantMs(iso)).toThrow(RangeError);
  });

  it.each([20260304, null, undefined, {}])("%j, which is no text", (value) => {
    expect(instantSchema.safeParse(value).success).toBe(false);
  });
});

describe("instantIso", () => {
  it.each([
    [Date.UTC(2026, 2, 4, 9), "Europe/London", "2026-03-04T09:00:00+00:00"],
    [Date.UTC(2026, 6, 4, 9), "Europe/London", "2026-07-04T10:00:00+01:00"],
    [Date.UTC(2026, 2, 4, 9), "America/St_Johns", "2026-03-04T05:30:00-03:30"],
    [Date.UTC(2026, 2, 4, 9, 0, 0, 499), "UTC", "2026-03-04T09:00:00+00:00"],
    [Date.UTC(2026, 2, 4, 9, 0, 0, 500), "UTC", "2026-03-04T09:00:01+00:00"],
  ])("%d in %s is %s", (ms, zone, iso) => {
    expect(instantIso(ms, zone)).toBe(iso);
  });

  it("is undone by instantMs, in every zone, also across the changes of the clocks", () => {
    fc.assert(
      fc.property(fc.integer({ min: 315_532_800, max: 7_000_000_000 }), fc.constantFrom(...ZONES), (seconds, zone) => {
        const iso = instantIso(seconds * 1000, zone);
        expect(instantSchema.safeParse(iso).success).toBe(true);
        expect(instantMs(iso)).toBe(seconds * 1000);
      }),
      { seed: 20260304, numRuns: 500 },
    );
  });

  it.each([Number.NaN, Number.POSITIVE_INFINITY])("throws for %s ms", (ms) => {
    expect(() => instantIso(ms, "UTC")).toThrow(RangeError);
  });
});

describe("elapsed hours", () => {
  it("12 h over the change to summer time: the wall clock gains one", () => {
    expect(instantAddHours("2026-03-28T20:00:00+00:00", 12, "Europe/London")).toBe("2026-03-29T09:00:00+01:00");
  });
  it("12 h over the change back: it loses one", () => {
    expect(instantAddHours("2026-10-24T20:00:00+01:00", 12, "Europe/London")).toBe("2026-10-25T07:00:00+00:00");
  });
  it("a quarter of an hour, and backwards", () => {
    expect(instantAddHours("2026-03-04T09:00:00+00:00", 0.25, "UTC")).toBe("2026-03-04T09:15:00+00:00");
    expect(instantAddHours("2026-03-04T09:00:00+00:00", -9.5, "UTC")).toBe("2026-03-03T23:30:00+00:00");
  });
  it("between two local noons, 23 h and 25 h on the days of the change", () => {
    expect(hoursBetween("2026-03-28T12:00:00+00:00", "2026-03-29T12:00:00+01:00")).toBe(23);
    expect(hoursBetween("2026-10-24T12:00:00+01:00", "2026-10-25T12:00:00+00:00")).toBe(25);
    expect(hoursBetween("2026-03-04T09:00:00+00:00", "2026-03-04T07:30:00+00:00")).toBe(-1.5);
  });
});

describe("timeZoneSchema", () => {
  it.each([...ZONES, "Europe/Lisbon", "America/Argentina/Buenos_Aires", "Etc/GMT+3"])("takes %s", (zone) => {
    expect(timeZoneSchema.safeParse(zone).success).toBe(true);
  });
  it.each(["", "Europe/Atlantis", "+01:00", "UTC+1", "Europe/London ", "../etc", "London", 3])("refuses %j", (zone) => {
    expect(timeZoneSchema.safeParse(zone).success).toBe(false);
  });
});
