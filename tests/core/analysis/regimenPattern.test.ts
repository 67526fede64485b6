import { describe, expect, it } from "vitest";
import { regimenPattern } from "../../../src/core/analysis/regimenPattern.ts";
import type { DoseLine } from "../../../src/core/regimen/index.ts";
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
    // Counted from the line that joins last, 22:00.
    expect(found.courses.get("tablet-12h")).toEqual([
      { time: 0, amount: 300 },
      { time: 10, amount: 200 },
    ]);
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

  it("two products keep their own courses", () => {
    const found = pattern(
      line(200, "2026-03-05T08:00:00+00:00", every(12)),
      line(100, "2026-03-05T14:00:00+00:00", every(24), "tablet"),
    );
    expect([...found.courses.keys()].sort()).toEqual(["tablet", "tablet-12h"]);
    expect(found.courses.get("tablet-12h")!.map((dose) => dose.time)).toEqual([6, 18]);
    expect(found.courses.get("tablet")!.map((dose) => dose.time)).toEqual([0]);
  });
});
