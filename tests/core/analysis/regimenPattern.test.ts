import { describe, expect, it } from "vitest";
import { regimenPattern } from "../../../src/core/analysis/regimenPattern.ts";
import { historyExposure, patternSteadyState } from "../../../src/core/kinetics/index.ts";
import { type DoseLine, doseLineExpand } from "../../../src/core/regimen/index.ts";
import { caseFixture } from "./caseFixture.ts";

const value = caseFixture();
let count = 0;
function line(amount: number, start: string, repeat?: DoseLine["repeat"], product = "tablet-12h"): DoseLine {
  count += 1;
  return { id: `l${count}`, product, amount: { value: amount, unit: "mg" }, start, ...(repeat && { repeat }) };
}
const every = (hours: number, doses?: number): DoseLine["repeat"] => ({
  every: { value: hours, unit: "h" },
  ...(doses !== undefined && { count: doses }),
});

function pattern(...lines: DoseLine[]) {
  const found = regimenPattern(value, lines);
  if (!found.ok) throw new Error(found.reason);
  return found.pattern;
}

describe("regimenPattern", () => {
  it("a single dose has none", () => {
    expect(regimenPattern(value, [line(450, "2026-03-04T20:00:00+00:00")])).toEqual({ ok: false, reason: "no-repeat" });
    expect(regimenPattern(value, [])).toEqual({ ok: false, reason: "no-repeat" });
  });

  it("unequal doses at unequal clock times share a day", () => {
    const found = pattern(
      line(200, "2026-03-05T08:00:00+00:00", { clock: ["08:00"], days: 7 }),
      line(300, "2026-03-05T22:00:00+00:00", { clock: ["22:00"], days: 7 }),
    );
    expect(found.periodH).toBe(24);
    expect(found.dosePerPeriodMg).toBe(500);
    expect(found.startMs).toBe(Date.parse("2026-03-05T08:00:00Z"));
    expect(found.courses.get("tablet-12h")).toEqual([
      { time: 0, amount: 200 },
      { time: 14, amount: 300 },
    ]);
  });

  it("begins with the dose the option gives first, whichever line it is on and wherever that line's start stands", () => {
    const doses = [
      { time: 0, amount: 300 },
      { time: 10, amount: 200 },
    ];
    const evening = "2026-03-04T22:00:00+00:00";
    for (const morning of ["2026-03-05T08:00:00+00:00", evening]) {
      const found = pattern(line(200, morning, { clock: ["08:00"] }), line(300, evening, { clock: ["22:00"] }));
      expect(found.startMs).toBe(Date.parse("2026-03-04T22:00:00Z"));
      expect(found.courses.get("tablet-12h")).toEqual(doses);
    }
    const hourly = pattern(line(200, "2026-03-05T08:00:00+00:00", every(24)), line(300, evening, every(24)));
    expect([hourly.startMs, hourly.courses.get("tablet-12h")]).toEqual([Date.parse("2026-03-04T22:00:00Z"), doses]);
  });

  it("begins with a line that joins others already running", () => {
    const found = pattern(
      line(200, "2026-03-01T08:00:00+00:00", { clock: ["08:00"] }),
      line(300, "2026-03-05T22:00:00+00:00", { clock: ["22:00"] }),
    );
    expect(found.startMs).toBe(Date.parse("2026-03-05T22:00:00Z"));
    expect(found.courses.get("tablet-12h")!.map((dose) => dose.time)).toEqual([0, 10]);
  });

  it("begins with the first dose also over a night in which the clocks change", () => {
    // 28 March 2026: the clocks of Berlin go on at 02:00, so the 08:00 dose comes 9 h after 22:00. A steady day has 24 h.
    const found = regimenPattern({ ...value, timeZone: "Europe/Berlin" }, [
      line(200, "2026-03-29T08:00:00+02:00", { clock: ["08:00"] }),
      line(300, "2026-03-28T22:00:00+01:00", { clock: ["22:00"] }),
    ]);
    if (!found.ok) throw new Error(found.reason);
    expect(found.pattern.startMs).toBe(Date.parse("2026-03-28T21:00:00Z"));
    expect(found.pattern.courses.get("tablet-12h")!.map((dose) => dose.time)).toEqual([0, 10]);
  });

  it("several clock times on one line", () => {
    const found = pattern(line(200, "2026-03-05T08:00:00+00:00", { clock: ["08:00", "20:00"] }));
    expect(found.courses.get("tablet-12h")!.map((dose) => dose.time)).toEqual([0, 12]);
  });

  it("a loading dose and a lower first step are a lead-in, not part of the pattern", () => {
    const found = pattern(
      line(450, "2026-03-04T20:00:00+00:00"),
      line(200, "2026-03-05T08:00:00+00:00", every(12, 4)),
      line(300, "2026-03-07T08:00:00+00:00", every(12, 10)),
    );
    expect(found.dosePerPeriodMg).toBe(300);
    expect(found.startMs).toBe(Date.parse("2026-03-07T08:00:00Z"));
  });

  it("lines of different interval meet in their least common multiple", () => {
    const found = pattern(
      line(100, "2026-03-05T08:00:00+00:00", every(8)),
      line(200, "2026-03-05T08:00:00+00:00", every(12)),
    );
    expect(found.periodH).toBe(24);
    expect(found.dosePerPeriodMg).toBe(3 * 100 + 2 * 200);
  });

  it("intervals with no common period within two weeks are said to have none", () => {
    const found = regimenPattern(value, [
      line(100, "2026-03-05T08:00:00+00:00", every(11)),
      line(200, "2026-03-05T08:00:00+00:00", every(13.5)),
      line(200, "2026-03-05T08:00:00+00:00", every(17)),
    ]);
    expect(found).toEqual({ ok: false, reason: "no-common-period" });
  });

  it("exceptions don't change it", () => {
    const plain = line(300, "2026-03-05T08:00:00+00:00", every(12, 10));
    expect(pattern({ ...plain, except: [{ index: 2, status: "missed" }] })).toEqual(pattern(plain));
  });

  it("weekdays repeat after a week, counted from the first dose", () => {
    // Starts on Wednesday 4 March at 20:00; the doses are at 08:00, the first on Friday.
    const found = pattern(line(200, "2026-03-04T20:00:00+00:00", { clock: ["08:00"], weekdays: [1, 3, 5] }));
    expect(found.periodH).toBe(168);
    expect(found.dosePerPeriodMg).toBe(600);
    expect(found.courses.get("tablet-12h")!.map((dose) => dose.time)).toEqual([0, 72, 120]);
    expect(found.startMs).toBe(Date.parse("2026-03-06T08:00:00Z"));
    const beside = pattern(
      line(200, "2026-03-04T08:00:00+00:00", { clock: ["08:00"], weekdays: [7] }),
      line(100, "2026-03-04T08:00:00+00:00", every(12)),
    );
    expect([beside.periodH, beside.dosePerPeriodMg]).toEqual([168, 14 * 100 + 200]);
    // Mondays 200 mg and Thursdays 300 mg, begun on Thursday 5 March.
    const thursday = pattern(
      line(200, "2026-03-05T08:00:00+00:00", { clock: ["08:00"], weekdays: [1] }),
      line(300, "2026-03-05T08:00:00+00:00", { clock: ["08:00"], weekdays: [4] }),
    );
    expect(thursday.courses.get("tablet-12h")).toEqual([
      { time: 0, amount: 300 },
      { time: 96, amount: 200 },
    ]);
  });

  it("a line on weekdays that ends before a weekend is ongoing beside one that ends in it", () => {
    const found = pattern(
      line(200, "2026-03-02T08:00:00+00:00", { clock: ["08:00"], days: 28, weekdays: [1, 2, 3, 4, 5] }),
      line(300, "2026-03-02T10:00:00+00:00", { clock: ["10:00"], days: 28, weekdays: [6, 7] }),
    );
    expect(found.dosePerPeriodMg).toBe(5 * 200 + 2 * 300);
    // A Monday line that ended a week and more before is a lead-in.
    const led = pattern(
      line(200, "2026-03-02T08:00:00+00:00", { clock: ["08:00"], days: 7, weekdays: [1] }),
      line(300, "2026-03-09T08:00:00+00:00", { clock: ["08:00"], days: 7 }),
    );
    expect([led.periodH, led.dosePerPeriodMg]).toEqual([24, 300]);
  });

  it("steady state of a Monday, Wednesday and Friday line is what many weeks of its doses come to", () => {
    const zone = "UTC";
    const kinetics = { ka: 0.4, bioavailability: 1, lag: 0.5 };
    // A half-life of 46 h: a week is 3.6 of them, thirty weeks leave 2^-108.
    const disposition = { ke: 0.015, volume: 28 };
    const dosed = line(300, "2026-01-07T12:00:00+00:00", { clock: ["08:00", "21:30"], weekdays: [1, 3, 5] });
    const found = regimenPattern({ ...value, timeZone: zone }, [dosed]);
    if (!found.ok) throw new Error(found.reason);
    const { pattern: weekly } = found;
    const settled = patternSteadyState(
      disposition,
      [{ ...kinetics, doses: weekly.courses.get("tablet-12h")! }],
      weekly.periodH,
    );
    const WEEKS = 30;
    // The dose at the very end begins the next week.
    const untilMs = weekly.startMs + WEEKS * 168 * 3_600_000 - 1;
    const events = doseLineExpand(dosed, { zone, untilMs });
    if (!events.ok) throw new Error("the line can't be laid out");
    const doses = events.value.map(({ atMs }) => ({ time: (atMs - weekly.startMs) / 3_600_000, amount: 300 }));
    expect(doses.length).toBe(WEEKS * 6);
    const last = historyExposure(disposition, [{ ...kinetics, doses }], (WEEKS - 1) * 168, WEEKS * 168);
    // Both roads carry 5e-15 of the peak a level; a hundred steps of time rounding leave 1e-12.
    for (const key of ["peak", "lowest", "average", "auc"] as const) {
      expect(Math.abs(settled[key] / last[key] - 1), key).toBeLessThan(1e-12);
    }
    expect(Math.abs(settled.timeOfPeak - (last.timeOfPeak - (WEEKS - 1) * 168))).toBeLessThan(1e-9);
    expect(Math.abs(settled.timeOfLowest - (last.timeOfLowest - (WEEKS - 1) * 168))).toBeLessThan(1e-9);
  });

  it("two products keep their own courses", () => {
    const found = pattern(
      line(200, "2026-03-05T08:00:00+00:00", every(12)),
      line(100, "2026-03-05T14:00:00+00:00", every(24), "tablet"),
    );
    expect([...found.courses.keys()].sort()).toEqual(["tablet", "tablet-12h"]);
    expect(found.courses.get("tablet-12h")!.map((dose) => dose.time)).toEqual([0, 12]);
    expect(found.courses.get("tablet")!.map((dose) => dose.time)).toEqual([6]);
  });
});
