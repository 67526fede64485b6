import { describe, expect, it } from "vitest";
import { type DoseLine, doseTextRead } from "../../../src/core/regimen/index.ts";
import { doseTextContext } from "./doseTextContext.ts";

const MG = (value: number) => ({ value, unit: "mg" as const });
const EVERY = (hours: number, count?: number) => ({
  every: { value: hours, unit: "h" as const },
  ...(count === undefined ? {} : { count }),
});

/** The one line, without its id, of a text that is read. */
function one(text: string, rest = {}): Omit<DoseLine, "id"> {
  const result = doseTextRead(text, doseTextContext(rest));
  if (!result.ok) throw new Error(`${text}: ${JSON.stringify(result.issues)}`);
  expect(result.value).toHaveLength(1);
  const { id, ...line } = result.value[0]!;
  expect(id).toBe("L1");
  return line;
}

describe("an option, now Wednesday 4 March 2026 09:00", () => {
  it.each<[string, Omit<DoseLine, "id" | "product">]>([
    [
      "300 mg every 12 h from 08:00, 10 doses",
      { amount: MG(300), start: "2026-03-05T08:00:00+00:00", repeat: EVERY(12, 10) },
    ],
    ["300 mg every 12 h from 09:00", { amount: MG(300), start: "2026-03-04T09:00:00+00:00", repeat: EVERY(12) }],
    [
      "300 mg every 12 h from Wed 4 March 20:00",
      { amount: MG(300), start: "2026-03-04T20:00:00+00:00", repeat: EVERY(12) },
    ],
    [
      "300 mg every 12 hours starting tomorrow at 08:00",
      { amount: MG(300), start: "2026-03-05T08:00:00+00:00", repeat: EVERY(12) },
    ],
    [
      "300 mg every 12 h, first dose today 20:00",
      { amount: MG(300), start: "2026-03-04T20:00:00+00:00", repeat: EVERY(12) },
    ],
    [
      "300 mg every 8 hours from 08:00 for 5 days",
      { amount: MG(300), start: "2026-03-05T08:00:00+00:00", repeat: EVERY(8, 15) },
    ],
    ["300 mg 8-hourly from tomorrow 08:00", { amount: MG(300), start: "2026-03-05T08:00:00+00:00", repeat: EVERY(8) }],
    [
      "300 mg 8 hourly from 20:00 for 1 week",
      { amount: MG(300), start: "2026-03-04T20:00:00+00:00", repeat: EVERY(8, 21) },
    ],
    ["300 mg every 48 h from 20:00", { amount: MG(300), start: "2026-03-04T20:00:00+00:00", repeat: EVERY(48) }],
    [
      "300 mg every twelve hours from 20:00, two doses",
      { amount: MG(300), start: "2026-03-04T20:00:00+00:00", repeat: EVERY(12, 2) },
    ],
    [
      "300mg every 12h from 20:00,2 doses.",
      { amount: MG(300), start: "2026-03-04T20:00:00+00:00", repeat: EVERY(12, 2) },
    ],
    [
      "Take 300 mg every 12 h from 2026-03-04 20:00",
      { amount: MG(300), start: "2026-03-04T20:00:00+00:00", repeat: EVERY(12) },
    ],
    ["300 mg every 12 h at 20:00", { amount: MG(300), start: "2026-03-04T20:00:00+00:00", repeat: EVERY(12) }],
    [
      "every 12 h from 20:00 for 10 doses 300 mg",
      { amount: MG(300), start: "2026-03-04T20:00:00+00:00", repeat: EVERY(12, 10) },
    ],
    [
      "10 doses, from 20:00, every 12 h, 300 mg",
      { amount: MG(300), start: "2026-03-04T20:00:00+00:00", repeat: EVERY(12, 10) },
    ],
    ["450 mg once", { amount: MG(450), start: "2026-03-04T09:00:00+00:00" }],
    ["450 mg once at 14:00", { amount: MG(450), start: "2026-03-04T14:00:00+00:00" }],
    ["450 mg once at 08:00", { amount: MG(450), start: "2026-03-05T08:00:00+00:00" }],
    ["450 mg once at 14:00 on Fri 6 March", { amount: MG(450), start: "2026-03-06T14:00:00+00:00" }],
    ["450 mg once on 6 March at 14:00", { amount: MG(450), start: "2026-03-06T14:00:00+00:00" }],
    ["450 mg once tomorrow at 14:00", { amount: MG(450), start: "2026-03-05T14:00:00+00:00" }],
    ["450 mg at 14:00, 1 dose", { amount: MG(450), start: "2026-03-04T14:00:00+00:00" }],
    ["1 g once", { amount: { value: 1, unit: "g" }, start: "2026-03-04T09:00:00+00:00" }],
    ["125 microgram once", { amount: { value: 125, unit: "ug" }, start: "2026-03-04T09:00:00+00:00" }],
    ["125 \u00b5g once", { amount: { value: 125, unit: "ug" }, start: "2026-03-04T09:00:00+00:00" }],
    ["2 tablets of 200 mg once", { amount: MG(400), start: "2026-03-04T09:00:00+00:00" }],
    ["two tablets of 0.2 g once", { amount: MG(400), start: "2026-03-04T09:00:00+00:00" }],
    ["1.5 tablets of 200 mg once", { amount: MG(300), start: "2026-03-04T09:00:00+00:00" }],
    ["half a tablet of 200 mg once", { amount: MG(100), start: "2026-03-04T09:00:00+00:00" }],
    ["300 mg daily at 08:00", { amount: MG(300), start: "2026-03-05T08:00:00+00:00", repeat: { clock: ["08:00"] } }],
    ["300 mg daily from 08:00", { amount: MG(300), start: "2026-03-05T08:00:00+00:00", repeat: { clock: ["08:00"] } }],
    [
      "300 mg once daily at 22:00",
      { amount: MG(300), start: "2026-03-04T22:00:00+00:00", repeat: { clock: ["22:00"] } },
    ],
    [
      "300 mg every day at 22:00 until further notice",
      { amount: MG(300), start: "2026-03-04T22:00:00+00:00", repeat: { clock: ["22:00"] } },
    ],
    [
      "300 mg at 22:00 for 7 days",
      { amount: MG(300), start: "2026-03-04T22:00:00+00:00", repeat: { clock: ["22:00"], days: 7 } },
    ],
    [
      "300 mg twice daily at 08:00 and 20:00",
      { amount: MG(300), start: "2026-03-04T20:00:00+00:00", repeat: { clock: ["08:00", "20:00"] } },
    ],
    [
      "300 mg twice a day at 20:00 and 08:00 from tomorrow 08:00",
      { amount: MG(300), start: "2026-03-05T08:00:00+00:00", repeat: { clock: ["08:00", "20:00"] } },
    ],
    [
      "300 mg 3 times a day at 06:00, 14:00 and 22:00 from tomorrow for 2 days",
      { amount: MG(300), start: "2026-03-05T06:00:00+00:00", repeat: { clock: ["06:00", "14:00", "22:00"], days: 2 } },
    ],
    [
      "300 mg at 08:00 and 20:00 from tomorrow, 10 doses",
      { amount: MG(300), start: "2026-03-05T08:00:00+00:00", repeat: { clock: ["08:00", "20:00"], days: 5 } },
    ],
    [
      "300 mg at 08:00 and 20:00, 9 doses",
      { amount: MG(300), start: "2026-03-04T20:00:00+00:00", repeat: { clock: ["08:00", "20:00"], days: 5 } },
    ],
    // A start after the first clock time of its day: 13 doses in 7 calendar days. The words shown back say so.
    [
      "300 mg at 08:00 and 20:00 for 7 days",
      { amount: MG(300), start: "2026-03-04T20:00:00+00:00", repeat: { clock: ["08:00", "20:00"], days: 7 } },
    ],
  ])("%s", (text, line) => {
    expect(one(text)).toEqual({ product: "mr", ...line });
  });

  it("names another product, anywhere after the amount", () => {
    expect(one("100 mg of tablet once").product).toBe("ir");
    expect(one("100 mg tablet daily at 22:00").product).toBe("ir");
    expect(one("50 mg once, capsule").product).toBe("cap");
    expect(one("2 capsules of capsule once")).toMatchObject({ product: "cap", amount: MG(100) });
    expect(one("200 mg of 12-hour modified-release tablet once", { defaultProduct: "ir" }).product).toBe("mr");
  });

  it("a volume of a liquid", () => {
    expect(one("5 mL of oral solution every 12 h from 20:00, 6 doses")).toMatchObject({
      product: "solution",
      amount: { value: 5, unit: "mL" },
    });
    expect(one("2.5 ml once", { defaultProduct: "solution" }).amount).toEqual({ value: 2.5, unit: "mL" });
  });
});

describe("weekdays, now Wednesday 4 March 2026 09:00", () => {
  it.each<[string, string, { clock: string[]; days?: number; weekdays: number[] }]>([
    ["300 mg at 08:00 on Mon, Wed and Fri", "2026-03-06T08:00:00+00:00", { clock: ["08:00"], weekdays: [1, 3, 5] }],
    ["300 mg on Fri, Wed, and Mon at 08:00", "2026-03-06T08:00:00+00:00", { clock: ["08:00"], weekdays: [1, 3, 5] }],
    ["300 mg at 10:00 on Mon, Wed and Fri", "2026-03-04T10:00:00+00:00", { clock: ["10:00"], weekdays: [1, 3, 5] }],
    ["300 mg on Mon and Thu from 20:00", "2026-03-05T20:00:00+00:00", { clock: ["20:00"], weekdays: [1, 4] }],
    [
      "200 mg at 08:00 on Tuesday and Saturday for 28 days",
      "2026-03-07T08:00:00+00:00",
      { clock: ["08:00"], days: 28, weekdays: [2, 6] },
    ],
    [
      "300 mg at 08:00 and 20:00 on weekdays",
      "2026-03-04T20:00:00+00:00",
      { clock: ["08:00", "20:00"], weekdays: [1, 2, 3, 4, 5] },
    ],
    ["300 mg at 08:00 every weekday", "2026-03-05T08:00:00+00:00", { clock: ["08:00"], weekdays: [1, 2, 3, 4, 5] }],
    ["300 mg at weekends at 08:00", "2026-03-07T08:00:00+00:00", { clock: ["08:00"], weekdays: [6, 7] }],
    ["300 mg at 08:00 every Wednesday", "2026-03-11T08:00:00+00:00", { clock: ["08:00"], weekdays: [3] }],
    ["300 mg on Thurs at 08:00 until further notice", "2026-03-05T08:00:00+00:00", { clock: ["08:00"], weekdays: [4] }],
    ["300 mg at 08:00 on Mondays", "2026-03-09T08:00:00+00:00", { clock: ["08:00"], weekdays: [1] }],
    // The length counts from the day that was said, a Thursday.
    [
      "300 mg at 08:00 on Mon from 5 March for 7 days",
      "2026-03-05T08:00:00+00:00",
      { clock: ["08:00"], days: 7, weekdays: [1] },
    ],
    // Fri, Mon, Wed, Fri.
    [
      "300 mg at 08:00 on Mon, Wed and Fri, 4 doses",
      "2026-03-06T08:00:00+00:00",
      { clock: ["08:00"], days: 8, weekdays: [1, 3, 5] },
    ],
  ])("%s", (text, start, repeat) => {
    expect(one(text)).toEqual({ product: "mr", amount: MG(300 - (text.startsWith("2") ? 100 : 0)), start, repeat });
  });

  it("among doses given, whole weeks and a number of doses end with the latest at or before now", () => {
    expect(one("300 mg at 08:00 on Mon, Wed and Fri for 14 days", { lane: "given" })).toMatchObject({
      start: "2026-02-20T08:00:00+00:00",
      repeat: { days: 14, weekdays: [1, 3, 5] },
    });
    // Sun 22 February and Sun 1 March.
    expect(one("300 mg at 08:00 every Sunday, 2 doses", { lane: "given" })).toMatchObject({
      start: "2026-02-22T08:00:00+00:00",
      repeat: { days: 8, weekdays: [7] },
    });
  });

  it("each of two amounts has its own", () => {
    const result = doseTextRead("200 mg at 08:00 on weekdays and 300 mg at 10:00 at weekends", doseTextContext());
    expect(result.ok && result.value.map(({ repeat }) => repeat)).toEqual([
      { clock: ["08:00"], weekdays: [1, 2, 3, 4, 5] },
      { clock: ["10:00"], weekdays: [6, 7] },
    ]);
  });

  it("late on the evening before a day of 23 hours, that day is the next", () => {
    const evening = { nowIso: "2026-03-28T23:30:00+00:00" };
    expect(one("300 mg at 08:00 every Sunday", evening).start).toBe("2026-03-29T08:00:00+01:00");
    expect(one("300 mg daily at 08:00", evening).start).toBe("2026-03-29T08:00:00+01:00");
  });
});

describe("two amounts make two lines", () => {
  const lines = (text: string, rest = {}) => {
    const result = doseTextRead(text, doseTextContext(rest));
    if (!result.ok) throw new Error(JSON.stringify(result.issues));
    return result.value.map(({ product: _, ...line }) => line);
  };

  it("what is said at the end holds for both", () => {
    expect(lines("200 mg at 08:00 and 300 mg at 22:00 for 7 days")).toEqual([
      { id: "L1", amount: MG(200), start: "2026-03-05T08:00:00+00:00", repeat: { clock: ["08:00"], days: 7 } },
      { id: "L2", amount: MG(300), start: "2026-03-04T22:00:00+00:00", repeat: { clock: ["22:00"], days: 7 } },
    ]);
  });

  it("each day until further notice, when nothing says for how long", () => {
    expect(lines("200 mg at 08:00 and 300 mg at 22:00").map((line) => line.repeat)).toEqual([
      { clock: ["08:00"] },
      { clock: ["22:00"] },
    ]);
  });

  it("a first day holds for both, a comma joins too, and each may have several times", () => {
    expect(lines("200 mg at 08:00 and 14:00, 300 mg at 22:00 from 10 March for 3 days")).toEqual([
      { id: "L1", amount: MG(200), start: "2026-03-10T08:00:00+00:00", repeat: { clock: ["08:00", "14:00"], days: 3 } },
      { id: "L2", amount: MG(300), start: "2026-03-10T22:00:00+00:00", repeat: { clock: ["22:00"], days: 3 } },
    ]);
  });

  it("a single dose first takes nothing from the repeat after it", () => {
    expect(lines("450 mg once, then 300 mg every 12 h from 20:00, 10 doses")).toEqual([
      { id: "L1", amount: MG(450), start: "2026-03-04T09:00:00+00:00" },
      { id: "L2", amount: MG(300), start: "2026-03-04T20:00:00+00:00", repeat: EVERY(12, 10) },
    ]);
  });

  it("each may have its own length", () => {
    expect(lines("200 mg at 08:00 for 3 days and 300 mg at 22:00 for 7 days").map((line) => line.repeat)).toEqual([
      { clock: ["08:00"], days: 3 },
      { clock: ["22:00"], days: 7 },
    ]);
  });
});

describe("doses given, now Wednesday 4 March 2026 09:00: the last is the latest at or before now", () => {
  const given = { lane: "given" };
  it.each<[string, string, DoseLine["repeat"]]>([
    ["300 mg every 12 h from 08:00, 10 doses", "2026-02-27T08:00:00+00:00", EVERY(12, 10)],
    ["300 mg every 12 h from 08:00, 11 doses", "2026-02-27T08:00:00+00:00", EVERY(12, 11)],
    ["300 mg every 24 h from 09:00, 3 doses", "2026-03-02T09:00:00+00:00", EVERY(24, 3)],
    ["300 mg every 8 h from 08:00 for 5 days", "2026-02-27T08:00:00+00:00", EVERY(8, 15)],
    ["300 mg daily at 08:00 for 3 days", "2026-03-02T08:00:00+00:00", { clock: ["08:00"], days: 3 }],
    ["300 mg daily at 09:01 for 3 days", "2026-03-01T09:01:00+00:00", { clock: ["09:01"], days: 3 }],
    // Whole days: the last dose is yesterday's 20:00, not today's 08:00.
    ["300 mg at 08:00 and 20:00 for 7 days", "2026-02-25T08:00:00+00:00", { clock: ["08:00", "20:00"], days: 7 }],
    ["300 mg at 08:00 and 20:00, 9 doses", "2026-02-27T20:00:00+00:00", { clock: ["08:00", "20:00"], days: 5 }],
    ["300 mg every 12 h from 1 March 08:00", "2026-03-01T08:00:00+00:00", EVERY(12)],
    ["300 mg daily at 08:00 from yesterday", "2026-03-03T08:00:00+00:00", { clock: ["08:00"] }],
    ["450 mg once at 14:00", "2026-03-03T14:00:00+00:00", undefined],
    ["450 mg once at 09:00", "2026-03-04T09:00:00+00:00", undefined],
    ["450 mg once yesterday at 14:00", "2026-03-03T14:00:00+00:00", undefined],
  ])("%s", (text, start, repeat) => {
    const line = one(text, given);
    expect([line.start, line.repeat]).toEqual([start, repeat]);
  });

  it("across a change of the clocks, by the wall", () => {
    const now = { lane: "given", nowIso: "2026-03-31T09:00:00+01:00" };
    expect(one("300 mg every 12 h from 08:00, 9 doses", now).start).toBe("2026-03-27T08:00:00+00:00");
    expect(one("300 mg at 08:00 for 5 days", now).start).toBe("2026-03-27T08:00:00+00:00");
  });
});

describe("exceptions", () => {
  const text = "300 mg every 12 h from 08:00, 10 doses";
  it("missed, late (the next such time) and moved (that day), with another amount", () => {
    expect(one(`${text}, dose 3 missed, dose 4 was late at 10:15, dose 5 moved to 06:00 200 mg`).except).toEqual([
      { index: 2, status: "missed" },
      { index: 3, status: "late", at: "2026-03-07T10:15:00+00:00" },
      { index: 4, status: "moved", at: "2026-03-07T06:00:00+00:00", amount: MG(200) },
    ]);
  });

  it("settle a clock time that does not exist or comes twice", () => {
    expect(one("300 mg daily at 01:30 from 28 March for 3 days, dose 2 moved to 02:00").except).toEqual([
      { index: 1, status: "moved", at: "2026-03-29T02:00:00+01:00" },
    ]);
    const october = { nowIso: "2026-10-20T09:00:00+01:00" };
    expect(
      one("300 mg daily at 01:30 from 24 October for 3 days, dose 2 moved to 01:30 second", october).except,
    ).toEqual([{ index: 1, status: "moved", at: "2026-10-25T01:30:00+00:00" }]);
  });
});
