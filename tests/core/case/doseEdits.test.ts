import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { type Case, caseEdit } from "../../../src/core/case/index.ts";
import { type DoseLine, doseLineExpand } from "../../../src/core/regimen/index.ts";
import { instantIso } from "../../../src/core/time/index.ts";
import { sampleCase } from "./sampleCase.ts";

const mg = (value: number) => ({ value, unit: "mg" as const });

function withLine(
  lane: "given" | "A",
  line: Omit<DoseLine, "id" | "product" | "amount">,
  timeZone = "Europe/Lisbon",
): Case {
  const full: DoseLine = { id: "x", product: "tablet", amount: mg(125), ...line };
  const sample = { ...sampleCase(), timeZone };
  return lane === "given"
    ? { ...sample, given: [full] }
    : { ...sample, options: [{ id: "A", label: "", chosen: false, lines: [full] }] };
}

function lineOf(value: Case, lane: "given" | "A"): DoseLine {
  return lane === "given" ? value.given[0]! : value.options[0]!.lines[0]!;
}

/** When the doses of the line are taken, as the clock of its zone shows it; a missed one is left out. */
function taken(value: Case, lane: "given" | "A", until = "2026-12-31T00:00:00Z"): string[] {
  const expanded = doseLineExpand(lineOf(value, lane), { zone: value.timeZone, untilMs: Date.parse(until) });
  if (!expanded.ok) return expanded.issues.map((each) => each.code);
  return expanded.value
    .filter((each) => each.status !== "missed")
    .map((each) => instantIso(each.atMs, value.timeZone).slice(0, 16));
}

const hourly = { start: "2026-03-01T08:00:00+00:00", repeat: { every: { value: 12, unit: "h" as const }, count: 4 } };
const clock = { start: "2026-03-01T08:00:00+00:00", repeat: { clock: ["08:00", "22:00"], days: 2 } };

describe("doseMove of a dose given", () => {
  const move = (value: Case, index: number, at: string) =>
    caseEdit(value, "doseMove", { lane: "given", lineId: "x", index, at });

  it("is late after its time, moved before it, and neither when it comes back", () => {
    const value = withLine("given", hourly);
    const late = move(value, 1, "2026-03-01T21:15:00+00:00");
    expect(lineOf(late, "given").except).toEqual([{ index: 1, status: "late", at: "2026-03-01T21:15:00+00:00" }]);
    const early = move(late, 1, "2026-03-01T19:45:00+00:00");
    expect(lineOf(early, "given").except).toEqual([{ index: 1, status: "moved", at: "2026-03-01T19:45:00+00:00" }]);
    expect(move(early, 1, "2026-03-01T20:00:00+00:00")).toEqual(value);
  });

  it("keeps the other exceptions, in order, and its own amount", () => {
    let value = withLine("given", { ...hourly, except: [{ index: 2, status: "missed" }] });
    value = caseEdit(value, "doseScale", { lane: "given", lineId: "x", index: 0, amount: mg(250) });
    value = move(value, 0, "2026-03-01T08:30:00+00:00");
    expect(lineOf(value, "given").except).toEqual([
      { index: 0, status: "late", at: "2026-03-01T08:30:00+00:00", amount: mg(250) },
      { index: 2, status: "missed" },
    ]);
    expect(lineOf(move(value, 0, "2026-03-01T08:00:00+00:00"), "given").except?.[0]).toEqual({
      index: 0,
      status: "moved",
      at: "2026-03-01T08:00:00+00:00",
      amount: mg(250),
    });
  });

  it("a dose that was missed and is moved was taken then", () => {
    const missed = caseEdit(withLine("given", clock), "doseMark", {
      lane: "given",
      lineId: "x",
      index: 1,
      status: "missed",
    });
    expect(taken(missed, "given")).toHaveLength(3);
    expect(taken(move(missed, 1, "2026-03-01T23:00:00+00:00"), "given")[1]).toBe("2026-03-01T23:00");
  });

  it("settles a clock time that comes twice or not at all", () => {
    // Lisbon: 29 March 2026 skips 01:00 to 02:00, 25 October 2026 shows 01:00 to 02:00 twice.
    const skipped = withLine("given", { start: "2026-03-28T01:30:00+00:00", repeat: { clock: ["01:30"], days: 3 } });
    expect(taken(skipped, "given")).toEqual(["dose-clock-skipped"]);
    for (const at of ["2026-03-29T00:59:00+00:00", "2026-03-29T02:00:00+01:00", "2026-03-29T03:00:00+01:00"]) {
      expect(taken(move(skipped, 1, at), "given")[1]).toBe(at.slice(0, 16));
    }
    const twice = withLine("given", { start: "2026-10-24T01:30:00+01:00", repeat: { clock: ["01:30"], days: 3 } });
    expect(taken(twice, "given")).toEqual(["dose-clock-twice"]);
    for (const at of ["2026-10-25T01:30:00+01:00", "2026-10-25T01:30:00+00:00"]) {
      const settled = move(twice, 1, at);
      expect(lineOf(settled, "given").except?.[0]?.at).toBe(at);
      expect(taken(settled, "given")).toHaveLength(3);
    }
  });
});

describe("doseMove of an option moves its line", () => {
  const move = (value: Case, index: number, at: string) =>
    caseEdit(value, "doseMove", { lane: "A", lineId: "x", index, at });

  it("a single dose", () => {
    const value = withLine("A", { start: "2026-03-05T08:00:00+00:00" });
    expect(taken(move(value, 0, "2026-03-05T09:15:00+00:00"), "A")).toEqual(["2026-03-05T09:15"]);
  });

  it("an hourly repeat, by any of its doses, by the same shift; its exceptions go along", () => {
    const value = withLine("A", { ...hourly, except: [{ index: 3, status: "late", at: "2026-03-02T21:00:00+00:00" }] });
    const moved = move(value, 2, "2026-03-02T06:30:00+00:00");
    expect(taken(moved, "A")).toEqual(["2026-03-01T06:30", "2026-03-01T18:30", "2026-03-02T06:30", "2026-03-02T19:30"]);
    expect(move(moved, 2, "2026-03-02T08:00:00+00:00")).toEqual(value);
  });

  it.each<[string, number, string, string[]]>([
    ["the second time later", 1, "2026-03-01T23:00:00+00:00", ["01T08:00", "01T23:00", "02T08:00", "02T23:00"]],
    [
      "the second time by its later dose",
      3,
      "2026-03-02T20:30:00+00:00",
      ["01T08:00", "01T20:30", "02T08:00", "02T20:30"],
    ],
    ["the first time earlier", 0, "2026-03-01T06:15:00+00:00", ["01T06:15", "01T22:00", "02T06:15", "02T22:00"]],
    ["the first time later", 2, "2026-03-02T10:00:00+00:00", ["01T10:00", "01T22:00", "02T10:00", "02T22:00"]],
    [
      "the first time past the second",
      0,
      "2026-03-01T23:30:00+00:00",
      ["01T22:00", "01T23:30", "02T22:00", "02T23:30"],
    ],
    [
      "the second time before the first",
      1,
      "2026-03-01T07:00:00+00:00",
      ["01T07:00", "01T08:00", "02T07:00", "02T08:00"],
    ],
    // Over midnight the line keeps its days, counted from the day it now starts on.
    ["the second time into the next day", 1, "2026-03-02T01:00:00+00:00", ["01T08:00", "02T01:00", "02T08:00"]],
    ["the first time into the day before", 0, "2026-02-28T23:00:00+00:00", ["28T23:00", "01T22:00", "01T23:00"]],
    ["onto the other time: stays", 0, "2026-03-01T22:00:00+00:00", ["01T08:00", "01T22:00", "02T08:00", "02T22:00"]],
    ["to where it is", 1, "2026-03-01T22:00:00+00:00", ["01T08:00", "01T22:00", "02T08:00", "02T22:00"]],
  ])("clock times: %s", (_, index, at, expected) => {
    expect(taken(move(withLine("A", clock), index, at), "A").map((each) => each.slice(8))).toEqual(expected);
  });

  describe("on weekdays", () => {
    // Monday 2 March 2026.
    const monday = { start: "2026-03-02T08:00:00+00:00", repeat: { clock: ["08:00"], days: 7, weekdays: [1, 3, 7] } };
    const repeatOf = (value: Case) => lineOf(value, "A").repeat;

    it("within its day, the weekdays stay", () => {
      const moved = move(withLine("A", monday), 1, "2026-03-04T21:00:00+00:00");
      expect(repeatOf(moved)).toEqual({ clock: ["21:00"], days: 7, weekdays: [1, 3, 7] });
      expect(taken(moved, "A")).toEqual(["2026-03-02T21:00", "2026-03-04T21:00", "2026-03-08T21:00"]);
    });

    it("over midnight, they move along, and back again", () => {
      const value = withLine("A", { ...monday, except: [{ index: 1, status: "missed" }] });
      const later = move(value, 0, "2026-03-03T01:00:00+00:00");
      expect(repeatOf(later)).toEqual({ clock: ["01:00"], days: 7, weekdays: [1, 2, 4] });
      expect(taken(later, "A")).toEqual(["2026-03-03T01:00", "2026-03-09T01:00"]);
      expect(move(later, 0, "2026-03-02T08:00:00+00:00")).toEqual(value);
      const earlier = move(value, 0, "2026-03-01T23:00:00+00:00");
      expect(repeatOf(earlier)).toEqual({ clock: ["23:00"], days: 7, weekdays: [2, 6, 7] });
      expect(taken(earlier, "A")).toEqual(["2026-03-01T23:00", "2026-03-07T23:00"]);
    });

    it("over midnight with two clock times, which would part them, the line stays", () => {
      const value = withLine("A", { ...monday, repeat: { ...monday.repeat, clock: ["08:00", "22:00"] } });
      expect(move(value, 1, "2026-03-03T01:00:00+00:00")).toEqual(value);
      expect(repeatOf(move(value, 1, "2026-03-02T20:00:00+00:00"))).toEqual({
        clock: ["08:00", "20:00"],
        days: 7,
        weekdays: [1, 3, 7],
      });
    });

    it("stretched, they stay", () => {
      const longer = caseEdit(withLine("A", monday), "lineStretch", { lane: "A", lineId: "x", days: 14 });
      expect(repeatOf(longer)).toEqual({ clock: ["08:00"], days: 14, weekdays: [1, 3, 7] });
      expect(taken(longer, "A")).toHaveLength(6);
    });
  });

  it("a clock line that starts late on its first day keeps its number of doses", () => {
    const value = withLine("A", { start: "2026-03-01T20:00:00+00:00", repeat: { clock: ["08:00", "12:00"], days: 3 } });
    expect(taken(value, "A")).toHaveLength(4);
    expect(taken(move(value, 0, "2026-03-02T09:00:00+00:00"), "A").map((each) => each.slice(8))).toEqual([
      "02T09:00",
      "02T12:00",
      "03T09:00",
      "03T12:00",
    ]);
  });

  it("exceptions of clock doses stay with their doses when the order of the times changes", () => {
    const value = withLine("A", {
      ...clock,
      except: [
        { index: 1, status: "missed" },
        { index: 2, status: "late", at: "2026-03-02T09:00:00+00:00" },
      ],
    });
    expect(taken(value, "A").map((each) => each.slice(8))).toEqual(["01T08:00", "02T09:00", "02T22:00"]);
    const moved = move(value, 0, "2026-03-01T23:30:00+00:00");
    expect(taken(moved, "A").map((each) => each.slice(8))).toEqual(["01T23:30", "02T22:00", "03T00:30"]);
  });

  it("crosses a change of the clocks at the same clock time", () => {
    const value = withLine("A", { start: "2026-03-28T08:00:00+00:00", repeat: { clock: ["08:00"], days: 3 } });
    expect(taken(move(value, 2, "2026-03-30T09:30:00+01:00"), "A")).toEqual([
      "2026-03-28T09:30",
      "2026-03-29T09:30",
      "2026-03-30T09:30",
    ]);
  });

  it("the dose that is dragged lands where it is dropped, and dragging back restores the doses", () => {
    fc.assert(
      fc.property(
        fc.constantFrom("Europe/Lisbon", "America/St_Johns", "Australia/Lord_Howe", "Asia/Kathmandu"),
        fc.uniqueArray(fc.integer({ min: 0, max: 95 }), { minLength: 1, maxLength: 4 }),
        fc.nat({ max: 7 }),
        fc.integer({ min: -30, max: 30 }),
        (zone, quarters, index, shift) => {
          // January: no change of the clocks in any of these zones within the span.
          const times = quarters.map(
            (each) => `${String(Math.floor(each / 4)).padStart(2, "0")}:${String((each % 4) * 15).padStart(2, "0")}`,
          );
          const value = withLine(
            "A",
            { start: instantIso(Date.UTC(2026, 0, 10), zone), repeat: { clock: times.sort() } },
            zone,
          );
          const due = taken(value, "A", "2026-01-20T00:00:00Z");
          const from = due[index]!;
          const toMs = Date.parse(`${from}Z`) + shift * 900_000;
          const wall = new Date(toMs).toISOString().slice(0, 16);
          const at = instantIso(toMs - (Date.parse(`${from}Z`) - Date.parse(instantOf(value, index))), zone);
          const moved = move(value, index, at);
          if (times.includes(wall.slice(11)) && wall.slice(11) !== from.slice(11)) {
            expect(moved).toEqual(value);
            return;
          }
          expect(taken(moved, "A", "2026-01-20T00:00:00Z")).toContain(wall);
          const line = lineOf(moved, "A");
          expect(line.repeat && "clock" in line.repeat && [...line.repeat.clock].sort()).toEqual(
            times.map((each) => (each === from.slice(11) ? wall.slice(11) : each)).sort(),
          );
        },
      ),
      { seed: 5, numRuns: 300 },
    );
  }, 30_000);
});

/** The instant of a dose of the option's line, exceptions aside. */
function instantOf(value: Case, index: number): string {
  const expanded = doseLineExpand(lineOf(value, "A"), { zone: value.timeZone, untilMs: Date.UTC(2026, 1, 1) });
  if (!expanded.ok) throw new Error("expand");
  return new Date(expanded.value[index]!.atMs).toISOString();
}

describe("doseMark", () => {
  const mark = (value: Case, index: number, status: "missed" | "taken") =>
    caseEdit(value, "doseMark", { lane: "given", lineId: "x", index, status });

  it("missed and back", () => {
    const value = withLine("given", hourly);
    const missed = mark(value, 1, "missed");
    expect(lineOf(missed, "given").except).toEqual([{ index: 1, status: "missed" }]);
    expect(mark(missed, 1, "taken")).toEqual(value);
    expect(mark(value, 1, "taken")).toEqual(value);
  });

  it("taken after late: as the line says, with the amount that was noted", () => {
    let value = withLine("given", hourly);
    value = caseEdit(value, "doseScale", { lane: "given", lineId: "x", index: 1, amount: mg(250) });
    value = caseEdit(value, "doseMove", { lane: "given", lineId: "x", index: 1, at: "2026-03-01T21:00:00+00:00" });
    expect(lineOf(mark(value, 1, "taken"), "given").except).toEqual([
      { index: 1, status: "moved", at: "2026-03-01T20:00:00+00:00", amount: mg(250) },
    ]);
  });
});

describe("doseScale", () => {
  it("given: that dose alone; without an index the line", () => {
    const value = withLine("given", hourly);
    const one = caseEdit(value, "doseScale", { lane: "given", lineId: "x", index: 2, amount: mg(250) });
    expect(lineOf(one, "given")).toEqual({
      ...lineOf(value, "given"),
      except: [{ index: 2, status: "moved", at: "2026-03-02T08:00:00+00:00", amount: mg(250) }],
    });
    expect(taken(one, "given")).toEqual(taken(value, "given"));
    expect(
      lineOf(caseEdit(value, "doseScale", { lane: "given", lineId: "x", amount: mg(250) }), "given").amount,
    ).toEqual(mg(250));
  });

  it("option: the line, whichever dose was dragged", () => {
    const value = withLine("A", clock);
    const after = caseEdit(value, "doseScale", { lane: "A", lineId: "x", index: 1, amount: mg(250) });
    expect(lineOf(after, "A")).toEqual({ ...lineOf(value, "A"), amount: mg(250) });
  });
});

describe("lineStretch", () => {
  it("sets doses, days, or no end", () => {
    const value = withLine("given", hourly);
    const longer = caseEdit(value, "lineStretch", { lane: "given", lineId: "x", count: 6 });
    expect(taken(longer, "given")).toHaveLength(6);
    expect(lineOf(caseEdit(value, "lineStretch", { lane: "given", lineId: "x" }), "given").repeat).toEqual({
      every: { value: 12, unit: "h" },
    });
    expect(
      lineOf(caseEdit(withLine("A", clock), "lineStretch", { lane: "A", lineId: "x", days: 9 }), "A").repeat,
    ).toEqual({ clock: ["08:00", "22:00"], days: 9 });
  });

  it("exceptions past the new end go", () => {
    const value = withLine("A", {
      ...clock,
      except: [
        { index: 1, status: "missed" },
        { index: 2, status: "missed" },
      ],
    });
    const shorter = caseEdit(value, "lineStretch", { lane: "A", lineId: "x", days: 1 });
    expect(lineOf(shorter, "A").except).toEqual([{ index: 1, status: "missed" }]);
  });
});
