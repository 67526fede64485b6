import { describe, expect, it } from "vitest";
import { issueMessage } from "../../../src/core/messages/index.ts";
import { instantRead } from "../../../src/core/time/index.ts";

const NOW = "2026-03-04T09:00:00+00:00";
const read = (text: string, now = NOW, zone = "Europe/London") => instantRead(text, zone, now);

describe("instantRead takes", () => {
  it.each([
    ["2026-03-04 07:30", "2026-03-04T07:30:00+00:00"],
    ["2026-03-04T07:30", "2026-03-04T07:30:00+00:00"],
    ["2026-03-04T07:30:00+00:00", "2026-03-04T07:30:00+00:00"],
    ["2026-07-04T07:30:00Z", "2026-07-04T08:30:00+01:00"],
    ["4 March 2026 07:30", "2026-03-04T07:30:00+00:00"],
    ["4 March 2026, 07:30", "2026-03-04T07:30:00+00:00"],
    ["4 March 2026 at 07:30", "2026-03-04T07:30:00+00:00"],
    ["4th Mar 2026 7:30", "2026-03-04T07:30:00+00:00"],
    ["March 4, 2026 07:30", "2026-03-04T07:30:00+00:00"],
    ["Wed 4 March 07:30", "2026-03-04T07:30:00+00:00"],
    ["wednesday, 4 march 07:30", "2026-03-04T07:30:00+00:00"],
    ["4 March 07:30", "2026-03-04T07:30:00+00:00"],
    ["  07:30  ", "2026-03-04T07:30:00+00:00"],
    ["23:59", "2026-03-04T23:59:00+00:00"],
    ["07:30:15", "2026-03-04T07:30:15+00:00"],
    ["today 07:30", "2026-03-04T07:30:00+00:00"],
    ["yesterday 07:30", "2026-03-03T07:30:00+00:00"],
    ["tomorrow at 07:30", "2026-03-05T07:30:00+00:00"],
    ["4 July 07:30", "2026-07-04T07:30:00+01:00"],
    ["07:30 +00:00", "2026-03-04T07:30:00+00:00"],
    ["25 October 2026 01:30 first", "2026-10-25T01:30:00+01:00"],
    ["25 October 2026 01:30 second", "2026-10-25T01:30:00+00:00"],
    ["25 October 2026 01:30 +01:00", "2026-10-25T01:30:00+01:00"],
    ["25 October 2026 01:30 (UTC+00:00)", "2026-10-25T01:30:00+00:00"],
  ])("%j", (text, iso) => {
    expect(read(text)).toEqual({ ok: true, value: iso });
  });

  it("the year nearest to now, across the turn of the year", () => {
    expect(read("28 December 20:00", "2026-01-03T09:00:00+00:00")).toEqual({
      ok: true,
      value: "2025-12-28T20:00:00+00:00",
    });
    expect(read("3 January 20:00", "2025-12-28T09:00:00+00:00")).toEqual({
      ok: true,
      value: "2026-01-03T20:00:00+00:00",
    });
    expect(read("29 February 20:00", "2027-06-01T09:00:00+00:00")).toEqual({
      ok: true,
      value: "2028-02-29T20:00:00+00:00",
    });
  });

  it("today is that of the case's zone, not of UTC", () => {
    const lateEvening = "2026-03-05T01:00:00+00:00";
    expect(read("07:30", lateEvening, "America/St_Johns")).toEqual({ ok: true, value: "2026-03-04T07:30:00-03:30" });
  });

  it("tomorrow on the eve of the change is the next date, not 24 h on", () => {
    expect(read("tomorrow 23:30", "2026-03-28T23:30:00+00:00")).toEqual({
      ok: true,
      value: "2026-03-29T23:30:00+01:00",
    });
    expect(read("yesterday 00:30", "2026-10-26T00:15:00+00:00")).toEqual({
      ok: true,
      value: "2026-10-25T00:30:00+01:00",
    });
  });
});

describe("instantRead refuses, with one sentence", () => {
  it.each([
    ["", "instant-empty", "Write a day and a time, such as 4 March 07:30."],
    [
      "03/04 07:30",
      "instant-numeric-date",
      '"03/04" can be read as two different days: write the month by name, such as 4 March.',
    ],
    [
      "3/4/2026 07:30",
      "instant-numeric-date",
      '"3/4/2026" can be read as two different days: write the month by name, such as 4 March.',
    ],
    [
      "04.03.2026 07:30",
      "instant-numeric-date",
      '"04.03.2026" can be read as two different days: write the month by name, such as 4 March.',
    ],
    [
      "04-03-2026 07:30",
      "instant-numeric-date",
      '"04-03-2026" can be read as two different days: write the month by name, such as 4 March.',
    ],
    ["7:30 pm", "instant-twelve-hour", '"7:30 pm" is on the 12-hour clock: write 19:30.'],
    ["12:15am", "instant-twelve-hour", '"12:15am" is on the 12-hour clock: write 00:15.'],
    ["12 p.m.", "instant-twelve-hour", '"12 p.m." is on the 12-hour clock: write 12:00.'],
    ["4 March 8pm", "instant-twelve-hour", '"8pm" is on the 12-hour clock: write 20:00.'],
    ["15 pm", "instant-twelve-hour", '"15 pm" is no time of day: write it on the 24-hour clock, such as 19:30.'],
    ["24:00", "instant-no-such-time", '"24:00" is not on the 24-hour clock: write a time from 00:00 to 23:59.'],
    ["4 March 07:65", "instant-no-such-time", '"07:65" is not on the 24-hour clock: write a time from 00:00 to 23:59.'],
    ["31 April 07:30", "instant-no-such-date", "There is no 31 April: check the day and month."],
    ["29 February 2026 07:30", "instant-no-such-date", "There is no 29 February 2026: check the day and month."],
    ["2026-13-04 07:30", "instant-no-such-date", "There is no 4 month 13 2026: check the day and month."],
    [
      "Thu 4 March 07:30",
      "instant-weekday",
      "Wednesday 4 March 2026 is a Wednesday, not a Thursday: check the date, or leave the weekday out.",
    ],
    ["Wed 07:30", "instant-needs-date", '"Wed" alone can mean several days: add the date, such as Wed 4 March.'],
    ["4 March", "instant-needs-time", "Wednesday 4 March 2026 has no time with it: add one, such as 07:30."],
    ["tomorrow", "instant-needs-time", "Thursday 5 March 2026 has no time with it: add one, such as 07:30."],
    [
      "0730",
      "instant-unreadable",
      '"0730" could not be read as a day and a time: write it like 4 March 07:30, 2026-03-04 07:30, or 07:30 for today.',
    ],
    [
      "07.30",
      "instant-unreadable",
      '"07.30" could not be read as a day and a time: write it like 4 March 07:30, 2026-03-04 07:30, or 07:30 for today.',
    ],
    [
      "07:30 sharp",
      "instant-unreadable",
      '"sharp" could not be read as a day and a time: write it like 4 March 07:30, 2026-03-04 07:30, or 07:30 for today.',
    ],
    [
      "07:30 4 March",
      "instant-unreadable",
      '"4 March" could not be read as a day and a time: write it like 4 March 07:30, 2026-03-04 07:30, or 07:30 for today.',
    ],
    ["07:30 first", "instant-once", '07:30 comes only once on Wednesday 4 March 2026: leave "first" out.'],
    [
      "07:30 +01:00",
      "instant-offset",
      "07:30 on Wednesday 4 March 2026 is not at UTC+01:00: write UTC+00:00, or leave it out.",
    ],
    [
      "25 October 2026 01:30 +02:00",
      "instant-offset",
      "01:30 on Sunday 25 October 2026 is not at UTC+02:00: write UTC+01:00 or UTC+00:00, or leave it out.",
    ],
    [
      "29 March 2026 01:30",
      "clock-skipped",
      "01:30 does not exist on Sunday 29 March 2026 in Europe/London: the clocks go forward. Write 00:59 or 02:00.",
    ],
    [
      "29 March 2026 01:30 first",
      "clock-skipped",
      "01:30 does not exist on Sunday 29 March 2026 in Europe/London: the clocks go forward. Write 00:59 or 02:00.",
    ],
    [
      "25 October 2026 01:30",
      "clock-twice",
      '01:30 comes twice on Sunday 25 October 2026 in Europe/London: the clocks go back. Write "01:30 first" (UTC+01:00) or "01:30 second" (UTC+00:00).',
    ],
  ])("%j", (text, code, sentence) => {
    const result = read(text);
    expect(result.ok).toBe(false);
    if (result.ok) return;
    expect(result.issues.map((issue) => [issue.code, issueMessage(issue)])).toEqual([[code, sentence]]);
  });
});
