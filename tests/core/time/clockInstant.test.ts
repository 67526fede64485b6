import fc from "fast-check";
import { Temporal } from "temporal-polyfill";
import { describe, expect, it } from "vitest";
import {
  clockInstant,
  clockOnDay,
  instantMs,
  localDays,
  localMidnight,
  midnightsBetween,
  wallClock,
} from "../../../src/core/time/index.ts";

const ZONES = ["Europe/London", "America/St_Johns", "Australia/Lord_Howe", "America/Sao_Paulo", "Pacific/Apia"];
const HOUR = 3_600_000;

describe("clockInstant", () => {
  it.each([
    ["2026-03-04", "07:30", "Europe/London", "2026-03-04T07:30:00+00:00"],
    ["2026-07-04", "07:30", "Europe/London", "2026-07-04T07:30:00+01:00"],
    ["2026-03-29", "00:59", "Europe/London", "2026-03-29T00:59:00+00:00"],
    ["2026-03-29", "02:00", "Europe/London", "2026-03-29T02:00:00+01:00"],
    ["2026-10-25", "00:59", "Europe/London", "2026-10-25T00:59:00+01:00"],
    ["2026-10-25", "02:00", "Europe/London", "2026-10-25T02:00:00+00:00"],
    ["2026-03-04", "07:30", "America/St_Johns", "2026-03-04T07:30:00-03:30"],
  ])("%s %s in %s is %s", (date, time, zone, iso) => {
    expect(clockInstant(date, time, zone)).toEqual({ ok: true, value: iso });
  });

  it.each([
    [
      "2026-03-29",
      "01:00",
      "Europe/London",
      ["00:59", "02:00"],
      ["2026-03-29T00:59:00+00:00", "2026-03-29T02:00:00+01:00"],
    ],
    [
      "2026-03-29",
      "01:59",
      "Europe/London",
      ["00:59", "02:00"],
      ["2026-03-29T00:59:00+00:00", "2026-03-29T02:00:00+01:00"],
    ],
    [
      "2026-03-08",
      "02:30",
      "America/St_Johns",
      ["01:59", "03:00"],
      ["2026-03-08T01:59:00-03:30", "2026-03-08T03:00:00-02:30"],
    ],
    // A change of half an hour.
    [
      "2026-10-04",
      "02:15",
      "Australia/Lord_Howe",
      ["01:59", "02:30"],
      ["2026-10-04T01:59:00+10:30", "2026-10-04T02:30:00+11:00"],
    ],
    // A change at midnight: the day begins at 01:00.
    [
      "2018-11-04",
      "00:30",
      "America/Sao_Paulo",
      ["23:59", "01:00"],
      ["2018-11-03T23:59:00-03:00", "2018-11-04T01:00:00-02:00"],
    ],
    // A day that was left out at the date line.
    [
      "2011-12-30",
      "12:00",
      "Pacific/Apia",
      ["23:59", "00:00"],
      ["2011-12-29T23:59:00-10:00", "2011-12-31T00:00:00+14:00"],
    ],
  ])("%s %s in %s is skipped", (date, time, zone, nearest, candidates) => {
    const result = clockInstant(date, time, zone);
    expect(result).toEqual({
      ok: false,
      issues: [{ code: "clock-skipped", path: [], data: { date, time, zone, nearest, candidates } }],
    });
  });

  it.each([
    ["2026-10-25", "01:00", "Europe/London", ["2026-10-25T01:00:00+01:00", "2026-10-25T01:00:00+00:00"]],
    ["2026-10-25", "01:59", "Europe/London", ["2026-10-25T01:59:00+01:00", "2026-10-25T01:59:00+00:00"]],
    ["2026-11-01", "01:30", "America/St_Johns", ["2026-11-01T01:30:00-02:30", "2026-11-01T01:30:00-03:30"]],
    ["2026-04-05", "01:45", "Australia/Lord_Howe", ["2026-04-05T01:45:00+11:00", "2026-04-05T01:45:00+10:30"]],
  ])("%s %s in %s comes twice", (date, time, zone, candidates) => {
    const result = clockInstant(date, time, zone);
    expect(result).toEqual({
      ok: false,
      issues: [{ code: "clock-twice", path: [], data: { date, time, zone, candidates } }],
    });
  });

  it.each([
    ["2026-02-30", "07:30"],
    ["2026-03-04", "24:00"],
    ["2026-03-04", "7:30"],
    ["4 March", "07:30"],
  ])("a date or time that is none, %s %s, is a programmer's mistake", (date, time) => {
    expect(() => clockInstant(date, time, "UTC")).toThrow(RangeError);
  });

  it("finds every instant's own wall clock again: once, or among the two", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 40_000_000 }), fc.constantFrom(...ZONES), (minutes, zone) => {
        const ms = Date.UTC(1990, 0, 1) + minutes * 60_000;
        const { date, time } = wallClock(ms, zone);
        const found = clockOnDay(date, time, zone);
        if (found.kind === "once") expect(found.ms).toBe(ms);
        else if (found.kind === "twice") expect([found.firstMs, found.secondMs]).toContain(ms);
        else expect.fail(`${date} ${time} in ${zone} exists, but was called skipped`);
      }),
      { seed: 20260304, numRuns: 300 },
    );
  });
});

describe("wallClock", () => {
  it("says what the wall shows", () => {
    expect(wallClock(instantMs("2026-03-04T09:05:07+00:00"), "America/St_Johns")).toEqual({
      year: 2026,
      month: 3,
      day: 4,
      weekday: 3,
      hour: 5,
      minute: 35,
      second: 7,
      date: "2026-03-04",
      time: "05:35",
    });
  });
  it("Sunday is 7", () => {
    expect(wallClock(instantMs("2026-03-29T12:00:00+00:00"), "UTC").weekday).toBe(7);
  });
});

describe("midnights", () => {
  const at = (iso: string) => instantMs(iso);

  it("localMidnight is the start of the local day", () => {
    expect(localMidnight(at("2026-03-29T23:30:00+01:00"), "Europe/London")).toBe(at("2026-03-29T00:00:00+00:00"));
    expect(localMidnight(at("2026-03-29T00:00:00+00:00"), "Europe/London")).toBe(at("2026-03-29T00:00:00+00:00"));
  });

  it("where midnight is skipped, it is the day's first instant", () => {
    expect(localMidnight(at("2018-11-04T12:00:00-02:00"), "America/Sao_Paulo")).toBe(at("2018-11-04T01:00:00-02:00"));
  });

  it("midnightsBetween takes both ends in and steps 23, 24 and 25 h", () => {
    const spring = midnightsBetween(at("2026-03-28T00:00:00+00:00"), at("2026-03-31T00:00:00+01:00"), "Europe/London");
    expect(spring.map((ms, i) => (i === 0 ? 0 : (ms - spring[i - 1]!) / HOUR))).toEqual([0, 24, 23, 24]);
    const autumn = midnightsBetween(at("2026-10-24T00:00:01+01:00"), at("2026-10-26T23:59:59+00:00"), "Europe/London");
    expect(autumn).toEqual([at("2026-10-25T00:00:00+01:00"), at("2026-10-26T00:00:00+00:00")]);
    expect((autumn[1]! - autumn[0]!) / HOUR).toBe(25);
  });

  it("none in a span that holds none", () => {
    expect(midnightsBetween(at("2026-03-04T01:00:00+00:00"), at("2026-03-04T23:00:00+00:00"), "UTC")).toEqual([]);
  });

  it("every one shows the start of its day and no day is left out, in every zone", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 12_000 }),
        fc.integer({ min: 1, max: 200 }),
        fc.constantFrom(...ZONES),
        (day, days, zone) => {
          const from = Date.UTC(2000, 0, 1) + day * 24 * HOUR;
          const midnights = midnightsBetween(from, from + days * 24 * HOUR, zone);
          for (const ms of midnights) expect(localMidnight(ms, zone)).toBe(ms);
          midnights.slice(1).forEach((ms, i) => {
            expect(localMidnight(ms - 1, zone)).toBe(midnights[i]);
          });
        },
      ),
      { seed: 20260304, numRuns: 20 },
    );
  });
});

describe("localDays", () => {
  // A year from before Samoa left out a day; it holds every kind of change of these zones.
  it.each(ZONES)(
    "counts the same days as the table of %s asked day by day; a plain day has each of its times once",
    (zone) => {
      let date = Temporal.PlainDate.from("2011-09-01");
      const days = localDays(date.toZonedDateTime(zone).epochMilliseconds, zone);
      let last = Number.NaN;
      for (let step = 0; step < 366; step += 1, date = date.add({ days: 1 })) {
        const startMs = date.toZonedDateTime(zone).epochMilliseconds;
        const endMs = date.add({ days: 1 }).toZonedDateTime(zone).epochMilliseconds;
        if (startMs === endMs || startMs === last) continue;
        last = startMs;
        const day = days.next().value;
        expect([day.startMs, day.endMs], `${date}`).toEqual([startMs, endMs]);
        for (const hour of day.isPlain ? [0, 2, 12, 23] : []) {
          const time = `${String(hour).padStart(2, "0")}:15`;
          expect(clockOnDay(date.toString(), time, zone), `${date} ${time}`).toEqual({
            kind: "once",
            ms: startMs + (hour + 0.25) * HOUR,
          });
        }
      }
    },
    30_000,
  );

  it("nearly every day is plain, so the table is seldom asked", () => {
    const days = localDays(instantMs("2026-01-01T00:00:00+00:00"), "Europe/London");
    const year = Array.from({ length: 365 }, () => days.next().value);
    expect(year.filter((day) => !day.isPlain)).toHaveLength(2);
  });
});
