import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  type DoseLine,
  doseLineCount,
  doseLineEndMs,
  doseLineExpand,
  doseLineGapHours,
  doseLinePeriodHours,
  doseLineScheduledMs,
  MOST_DOSES,
} from "../../../src/core/regimen/index.ts";
import { instantIso, instantMs, wallClock } from "../../../src/core/time/index.ts";

const LONDON = "Europe/London";
const ST_JOHNS = "America/St_Johns";
const HOUR = 3_600_000;
const amount = { value: 300, unit: "mg" } as const;

function line(start: string, rest: Partial<DoseLine> = {}): DoseLine {
  return { id: "L1", product: "mr", amount, start, ...rest };
}

function expand(dose: DoseLine, zone = LONDON, until = "2027-01-01T00:00:00+00:00") {
  const result = doseLineExpand(dose, { zone, untilMs: instantMs(until) });
  if (!result.ok) throw new Error(result.issues.map((issue) => issue.code).join(", "));
  return result.value;
}

function issuesOf(dose: DoseLine, zone = LONDON, until = "2027-01-01T00:00:00+00:00") {
  const result = doseLineExpand(dose, { zone, untilMs: instantMs(until) });
  return result.ok ? [] : result.issues;
}

const at = (dose: DoseLine, zone = LONDON, until?: string) =>
  expand(dose, zone, until).map((event) => instantIso(event.atMs, zone));

describe("doseLineExpand", () => {
  it("a single dose", () => {
    expect(expand(line("2026-03-04T20:00:00+00:00"))).toEqual([
      {
        index: 0,
        scheduledMs: instantMs("2026-03-04T20:00:00+00:00"),
        atMs: instantMs("2026-03-04T20:00:00+00:00"),
        amount,
        status: "taken",
      },
    ]);
  });

  it("every 12 h counts elapsed hours: the wall clock shifts over the change to summer time", () => {
    const dose = line("2026-03-28T08:00:00+00:00", { repeat: { every: { value: 12, unit: "h" }, count: 4 } });
    expect(at(dose)).toEqual([
      "2026-03-28T08:00:00+00:00",
      "2026-03-28T20:00:00+00:00",
      "2026-03-29T09:00:00+01:00",
      "2026-03-29T21:00:00+01:00",
    ]);
  });

  it("a clock repeat follows the wall clock through the same change, and back", () => {
    const spring = line("2026-03-28T08:00:00+00:00", { repeat: { clock: ["20:00", "08:00"], days: 2 } });
    expect(at(spring)).toEqual([
      "2026-03-28T08:00:00+00:00",
      "2026-03-28T20:00:00+00:00",
      "2026-03-29T08:00:00+01:00",
      "2026-03-29T20:00:00+01:00",
    ]);
    const autumn = line("2026-10-31T20:00:00-02:30", { repeat: { clock: ["20:00"], days: 3 } });
    expect(at(autumn, ST_JOHNS)).toEqual([
      "2026-10-31T20:00:00-02:30",
      "2026-11-01T20:00:00-03:30",
      "2026-11-02T20:00:00-03:30",
    ]);
  });

  it("days count calendar days from that of the start; what comes before the start on its day is no dose", () => {
    const dose = line("2026-03-04T20:00:00+00:00", { repeat: { clock: ["08:00", "20:00"], days: 2 } });
    expect(at(dose)).toEqual(["2026-03-04T20:00:00+00:00", "2026-03-05T08:00:00+00:00", "2026-03-05T20:00:00+00:00"]);
    expect(expand(dose).map((event) => event.index)).toEqual([0, 1, 2]);
  });

  it("without an end, up to and including untilMs", () => {
    const every = line("2026-03-04T08:00:00+00:00", { repeat: { every: { value: 8, unit: "h" } } });
    expect(at(every, LONDON, "2026-03-05T08:00:00+00:00")).toHaveLength(4);
    expect(at(every, LONDON, "2026-03-05T07:59:00+00:00")).toHaveLength(3);
    expect(at(every, LONDON, "2026-03-04T07:00:00+00:00")).toEqual([]);
    const clock = line("2026-03-04T08:00:00+00:00", { repeat: { clock: ["08:00"] } });
    expect(at(clock, LONDON, "2026-03-06T08:00:00+00:00")).toHaveLength(3);
  });

  it("with an end, all of it, whatever untilMs says", () => {
    const dose = line("2026-03-04T08:00:00+00:00", { repeat: { every: { value: 12, unit: "h" }, count: 10 } });
    expect(at(dose, LONDON, "2026-03-04T08:00:00+00:00")).toHaveLength(10);
  });

  it("a decimal interval does not drift: dose k is k intervals from the start, to the millisecond", () => {
    const dose = line("2026-03-04T08:00:00+00:00", { repeat: { every: { value: 0.1, unit: "h" }, count: 1001 } });
    expect(expand(dose).at(-1)?.atMs).toBe(instantMs("2026-03-04T08:00:00+00:00") + 100 * HOUR);
  });
});

describe("weekdays", () => {
  it("only those days have doses, by the wall clock over the change to summer time; index counts doses", () => {
    // 29 March 2026, a Sunday, has 23 hours in London.
    const dose = line("2026-03-26T08:00:00+00:00", { repeat: { clock: ["08:00"], days: 7, weekdays: [1, 5, 7] } });
    expect(at(dose)).toEqual(["2026-03-27T08:00:00+00:00", "2026-03-29T08:00:00+01:00", "2026-03-30T08:00:00+01:00"]);
    expect(expand(dose).map((event) => event.index)).toEqual([0, 1, 2]);
    expect([doseLineCount(dose, LONDON), doseLineEndMs(dose, LONDON)]).toEqual([
      3,
      instantMs("2026-03-30T08:00:00+01:00"),
    ]);
    expect(doseLineScheduledMs(dose, 1, LONDON)).toBe(instantMs("2026-03-29T08:00:00+01:00"));
  });

  it("and back, in a zone that is not on whole hours", () => {
    // 1 November 2026, a Sunday, has 25 hours in St John's.
    const dose = line("2026-10-29T20:00:00-02:30", { repeat: { clock: ["08:00", "20:00"], weekdays: [4, 7] } });
    expect(at(dose, ST_JOHNS, "2026-11-06T00:00:00-03:30")).toEqual([
      "2026-10-29T20:00:00-02:30",
      "2026-11-01T08:00:00-03:30",
      "2026-11-01T20:00:00-03:30",
      "2026-11-05T08:00:00-03:30",
      "2026-11-05T20:00:00-03:30",
    ]);
  });

  it("a skipped clock time is a fault on a listed day only", () => {
    const start = "2026-03-28T01:30:00+00:00";
    const on = (weekdays: number[]) => line(start, { repeat: { clock: ["01:30"], days: 3, weekdays } });
    expect(issuesOf(on([6, 7]))).toMatchObject([{ code: "dose-clock-skipped", data: { dose: 2 } }]);
    expect(at(on([1, 6]))).toEqual(["2026-03-28T01:30:00+00:00", "2026-03-30T01:30:00+01:00"]);
  });

  it("keep in step where a zone left a date out", () => {
    // Apia had no Friday 30 December 2011.
    const dose = line("2011-12-28T08:00:00-10:00", { repeat: { clock: ["08:00"], days: 6, weekdays: [4, 5, 6, 7] } });
    expect(at(dose, "Pacific/Apia")).toEqual([
      "2011-12-29T08:00:00-10:00",
      "2011-12-31T08:00:00+14:00",
      "2012-01-01T08:00:00+14:00",
    ]);
  });

  it("a length without any of its days has no dose, which is said", () => {
    // Wednesday and Thursday.
    const dose = line("2026-03-04T08:00:00+00:00", { repeat: { clock: ["08:00"], days: 2, weekdays: [1] } });
    expect(issuesOf(dose).map((issue) => issue.code)).toEqual(["dose-none"]);
    expect([doseLineCount(dose, LONDON), doseLineEndMs(dose, LONDON)]).toEqual([0, null]);
  });

  it("repeat after 168 h; the longest gap reaches over the weekend", () => {
    const on = (weekdays: number[]) => line("2026-03-04T08:00:00+00:00", { repeat: { clock: ["08:00"], weekdays } });
    expect(doseLinePeriodHours(on([1, 3, 5]))).toBe(168);
    expect([[1, 3, 5], [2], [1, 2, 3, 4, 5, 6, 7], [6, 7], [3, 7]].map((days) => doseLineGapHours(on(days)))).toEqual([
      72, 168, 24, 144, 96,
    ]);
  });
});

describe("exceptions", () => {
  const repeat = { every: { value: 12, unit: "h" as const }, count: 4 };
  const start = "2026-03-04T08:00:00+00:00";

  it("missed, late and moved", () => {
    const events = expand(
      line(start, {
        repeat,
        except: [
          { index: 1, status: "missed" },
          { index: 2, status: "late", at: "2026-03-05T10:15:00+00:00" },
          { index: 3, status: "moved", at: "2026-03-05T18:00:00+00:00", amount: { value: 200, unit: "mg" } },
        ],
      }),
    );
    expect(
      events.map((event) => [
        event.index,
        event.status,
        instantIso(event.scheduledMs, LONDON).slice(11, 16),
        instantIso(event.atMs, LONDON).slice(11, 16),
        event.amount.value,
      ]),
    ).toEqual([
      [0, "taken", "08:00", "08:00", 300],
      [1, "missed", "20:00", "20:00", 300],
      [2, "late", "08:00", "10:15", 300],
      [3, "moved", "20:00", "18:00", 200],
    ]);
  });

  it("of a dose that the line does not have", () => {
    expect(issuesOf(line(start, { repeat, except: [{ index: 4, status: "missed" }] }))).toEqual([
      { code: "dose-exception-beyond", path: [], data: { dose: 5, doses: 4 } },
    ]);
  });

  it("of a dose beyond the cut of a line without an end is not a fault", () => {
    const dose = line(start, {
      repeat: { every: { value: 12, unit: "h" } },
      except: [{ index: 40, status: "missed" }],
    });
    expect(issuesOf(dose, LONDON, "2026-03-05T08:00:00+00:00")).toEqual([]);
  });

  it("two of one dose, or late without a time", () => {
    expect(
      issuesOf(
        line(start, {
          repeat,
          except: [
            { index: 1, status: "missed" },
            { index: 1, status: "missed" },
          ],
        }),
      ).map((i) => i.code),
    ).toEqual(["dose-exception-twice"]);
    expect(issuesOf(line(start, { repeat, except: [{ index: 1, status: "late" }] })).map((i) => i.code)).toEqual([
      "dose-exception-needs-at",
    ]);
  });
});

describe("a clock time that does not exist or comes twice", () => {
  const skipped = line("2026-03-28T01:30:00+00:00", { repeat: { clock: ["01:30"], days: 3 } });
  const twice = line("2026-10-24T01:30:00+01:00", { repeat: { clock: ["01:30"], days: 3 } });

  it("is an issue that says which dose, when, and what would be valid", () => {
    expect(issuesOf(skipped)).toEqual([
      {
        code: "dose-clock-skipped",
        path: [],
        data: {
          dose: 2,
          index: 1,
          date: "2026-03-29",
          time: "01:30",
          zone: LONDON,
          nearest: ["00:59", "02:00"],
          candidates: ["2026-03-29T00:59:00+00:00", "2026-03-29T02:00:00+01:00"],
        },
      },
    ]);
    expect(issuesOf(twice)).toMatchObject([
      {
        code: "dose-clock-twice",
        data: { dose: 2, candidates: ["2026-10-25T01:30:00+01:00", "2026-10-25T01:30:00+00:00"] },
      },
    ]);
  });

  it("is settled by an exception of that dose", () => {
    const moved = { ...skipped, except: [{ index: 1, status: "moved" as const, at: "2026-03-29T02:00:00+01:00" }] };
    expect(at(moved)).toEqual(["2026-03-28T01:30:00+00:00", "2026-03-29T02:00:00+01:00", "2026-03-30T01:30:00+01:00"]);
    for (const which of ["2026-10-25T01:30:00+01:00", "2026-10-25T01:30:00+00:00"]) {
      const chosen = expand({ ...twice, except: [{ index: 1, status: "moved" as const, at: which }] })[1];
      expect([chosen?.atMs, chosen?.scheduledMs]).toEqual([instantMs(which), instantMs(which)]);
    }
    const missed = expand({ ...twice, except: [{ index: 1, status: "missed" as const }] })[1];
    expect(missed).toMatchObject({ status: "missed", scheduledMs: instantMs("2026-10-25T01:30:00+01:00") });
  });

  it("is settled by a start that is one of the two", () => {
    const first = line("2026-10-25T01:30:00+01:00", { repeat: { clock: ["01:30"], days: 2 } });
    const second = line("2026-10-25T01:30:00+00:00", { repeat: { clock: ["01:30"], days: 2 } });
    expect(at(first)).toEqual(["2026-10-25T01:30:00+01:00", "2026-10-26T01:30:00+00:00"]);
    expect(at(second)).toEqual(["2026-10-25T01:30:00+00:00", "2026-10-26T01:30:00+00:00"]);
  });

  it("is no dose, and no issue, before a start later that day", () => {
    const dose = line("2026-03-29T08:00:00+01:00", { repeat: { clock: ["01:30", "08:00"], days: 2 } });
    expect(at(dose)).toEqual(["2026-03-29T08:00:00+01:00", "2026-03-30T01:30:00+01:00", "2026-03-30T08:00:00+01:00"]);
  });

  it("does not disturb a zone without daylight saving", () => {
    expect(issuesOf(skipped, "Asia/Kolkata")).toEqual([]);
  });
});

describe("limits", () => {
  it("more doses than the most, with or without an end", () => {
    const endless = line("2026-03-04T08:00:00+00:00", { repeat: { every: { value: 0.001, unit: "h" } } });
    expect(issuesOf(endless).map((issue) => issue.code)).toEqual(["dose-too-many"]);
    const long = line("2026-03-04T08:00:00+00:00", {
      repeat: { clock: Array.from({ length: 24 }, (_, hour) => `${String(hour).padStart(2, "0")}:45`), days: 3660 },
    });
    expect(issuesOf(long, "UTC").map((issue) => issue.code)).toEqual(["dose-too-many"]);
    const most = line("2026-03-04T08:00:00+00:00", { repeat: { every: { value: 12, unit: "h" }, count: MOST_DOSES } });
    expect(expand(most)).toHaveLength(MOST_DOSES);
  });

  it("a line whose only day is over at its start has no dose, which is said", () => {
    const dose = line("2026-03-04T22:00:00+00:00", { repeat: { clock: ["08:00"], days: 1 } });
    expect(issuesOf(dose).map((issue) => issue.code)).toEqual(["dose-none"]);
    expect(doseLineEndMs(dose, LONDON)).toBeNull();
  });
});

describe("count, end, schedule and period", () => {
  const every = line("2026-03-28T08:00:00+00:00", { repeat: { every: { value: 12, unit: "h" }, count: 10 } });
  const clock = line("2026-03-28T20:00:00+00:00", { repeat: { clock: ["08:00", "20:00"], days: 3 } });
  const endless = line("2026-03-28T20:00:00+00:00", { repeat: { clock: ["08:00"] } });
  const once = line("2026-03-28T20:00:00+00:00");

  it("agree with the expansion", () => {
    for (const dose of [every, clock, once]) {
      const events = expand(dose);
      expect(doseLineCount(dose, LONDON)).toBe(events.length);
      expect(doseLineEndMs(dose, LONDON)).toBe(events.at(-1)?.scheduledMs);
      for (const event of events) expect(doseLineScheduledMs(dose, event.index, LONDON)).toBe(event.scheduledMs);
    }
  });

  it("of a line without an end", () => {
    expect(doseLineCount(endless, LONDON)).toBe(Number.POSITIVE_INFINITY);
    expect(doseLineEndMs(endless, LONDON)).toBeNull();
    expect(doseLineScheduledMs(endless, 2, LONDON)).toBe(instantMs("2026-03-31T08:00:00+01:00"));
  });

  it.each([-1, 10, 1.5, Number.NaN])("a dose %d that the line has not is a programmer's mistake", (index) => {
    expect(() => doseLineScheduledMs(every, index, LONDON)).toThrow(RangeError);
  });

  it("period: the interval, 24 for a clock repeat, none for a single dose", () => {
    expect([every, clock, once].map(doseLinePeriodHours)).toEqual([12, 24, null]);
  });
});

describe("properties", () => {
  const settings = { seed: 20260304, numRuns: 150 };
  const starts = fc.integer({ min: 0, max: 5 * 365 * 24 * 60 }).map((minute) => Date.UTC(2024, 0, 1) + minute * 60_000);
  const zones = fc.constantFrom(LONDON, ST_JOHNS, "Australia/Lord_Howe", "UTC");

  it("an elapsed-hours repeat depends on no zone, and its gaps are all equal", () => {
    fc.assert(
      fc.property(
        starts,
        fc.integer({ min: 1, max: 48 }),
        fc.integer({ min: 2, max: 60 }),
        zones,
        (ms, hours, count, zone) => {
          const dose = line(instantIso(ms, zone), { repeat: { every: { value: hours, unit: "h" }, count } });
          const events = expand(dose, zone);
          expect(events.map((event) => event.atMs)).toEqual(
            Array.from({ length: count }, (_, k) => ms + k * hours * HOUR),
          );
        },
      ),
      settings,
    );
  });

  it("a repeat on weekdays is the daily one without its other days", () => {
    const weekdays = fc.subarray([1, 2, 3, 4, 5, 6, 7], { minLength: 1 });
    fc.assert(
      fc.property(starts, weekdays, fc.integer({ min: 1, max: 400 }), zones, (ms, listed, days, zone) => {
        const repeat = { clock: ["08:00", "21:30"], days };
        const whole = doseLineExpand(line(instantIso(ms, zone), { repeat }), { zone, untilMs: 0 });
        const some = line(instantIso(ms, zone), { repeat: { ...repeat, weekdays: listed } });
        const found = doseLineExpand(some, { zone, untilMs: 0 });
        const wanted = (whole.ok ? whole.value : [])
          .map((event) => event.atMs)
          .filter((at) => listed.includes(wallClock(at, zone).weekday));
        expect(found.ok ? found.value.map((event) => event.atMs) : []).toEqual(wanted);
        expect(doseLineCount(some, zone)).toBe(wanted.length);
      }),
      { ...settings, numRuns: 60 },
    );
  }, 30_000);

  it("every dose of a clock repeat shows one of its times on the wall, in order, each day at most once each", () => {
    const times = fc.uniqueArray(fc.integer({ min: 240, max: 1439 }), { minLength: 1, maxLength: 4 });
    fc.assert(
      fc.property(starts, times, fc.integer({ min: 1, max: 400 }), zones, (ms, minutes, days, zone) => {
        const clock = minutes.map(
          (minute) => `${String(Math.floor(minute / 60)).padStart(2, "0")}:${String(minute % 60).padStart(2, "0")}`,
        );
        const result = doseLineExpand(line(instantIso(ms, zone), { repeat: { clock, days } }), { zone, untilMs: 0 });
        if (!result.ok) {
          expect(result.issues.map((issue) => issue.code)).toEqual(["dose-none"]);
          expect(days).toBe(1);
          return;
        }
        const seen = result.value.map((event) => wallClock(event.atMs, zone));
        for (const { time } of seen) expect(clock).toContain(time);
        expect(new Set(seen.map(({ date, time }) => `${date} ${time}`)).size).toBe(seen.length);
        const order = result.value.map((event) => event.atMs);
        expect(order).toEqual([...order].sort((a, b) => a - b));
        // All whole days after the first are complete.
        expect(seen.length).toBeGreaterThanOrEqual((days - 1) * clock.length);
        expect(seen.length).toBeLessThanOrEqual(days * clock.length);
      }),
      { ...settings, numRuns: 60 },
    );
  }, 30_000);
});
