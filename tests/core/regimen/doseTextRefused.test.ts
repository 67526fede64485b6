import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { issueMessage } from "../../../src/core/messages/index.ts";
import { doseTextRead } from "../../../src/core/regimen/index.ts";
import { doseTextContext } from "./doseTextContext.ts";
import { REFUSED_AMOUNTS, type RefusedCase } from "./doseTextRefusedAmount.ts";

const refusal = (text: string, rest = {}) => {
  const result = doseTextRead(text, doseTextContext(rest));
  return result.ok ? null : result.issues.map((issue) => [issue.code, issueMessage(issue)]);
};

/** Texts whose times, length, second amount or exceptions are at fault. */
const REFUSED_TIMES: readonly RefusedCase[] = [
  // When.
  ["300 mg every 12 h", "dose-text-needs-time", '"300 mg" has no clock time: add it, such as "from 08:00".'],
  [
    "300 mg every 12 h from tomorrow",
    "dose-text-needs-time",
    '"300 mg" has no clock time: add it, such as "from 08:00".',
  ],
  ["300 mg once tomorrow", "dose-text-needs-time", '"300 mg" has no clock time: add it, such as "at 08:00".'],
  ["300 mg daily", "dose-text-needs-clock", '"300 mg" daily needs its clock time: write it, such as "at 08:00".'],
  [
    "300 mg twice daily",
    "dose-text-needs-clock",
    '"300 mg" twice a day needs its clock times: write them, such as "at 08:00 and 20:00".',
  ],
  [
    "300 mg twice daily from 08:00",
    "dose-text-needs-clock",
    '"300 mg" twice a day needs its clock times: write them, such as "at 08:00 and 20:00".',
  ],
  [
    "300 mg three times a day at 08:00 and 20:00",
    "dose-text-clock-count",
    "3 times a day does not go with 2 clock times (08:00 and 20:00): make them agree.",
  ],
  [
    "300 mg once daily at 08:00 and 20:00",
    "dose-text-clock-count",
    "Once a day does not go with 2 clock times (08:00 and 20:00): make them agree.",
  ],
  [
    "300 mg daily at 08:00 and 08:00",
    "dose-text-conflict",
    '"08:00 and 08:00" comes on top of something already said: say it once, or join two amounts with "and", each before its times.',
  ],
  ["300 mg daily at 08:00:30", "dose-text-seconds", '"08:00:30" has seconds: write a daily time to the minute.'],
  [
    "300 mg daily at 01:30 first",
    "dose-text-daily-which",
    '"01:30" each day can\'t carry "first", "second" or an offset: write the time alone.',
  ],
  [
    "300 mg daily in the morning",
    "dose-text-vague-time",
    '"in the morning" is no clock time: write one, such as "at 08:00".',
  ],
  ["300 mg at bedtime", "dose-text-vague-time", '"at bedtime" is no clock time: write one, such as "at 08:00".'],
  ["300 mg every night", "dose-text-vague-time", '"every night" is no clock time: write one, such as "at 08:00".'],
  [
    "300 mg daily at 8",
    "dose-text-unreadable",
    '"at 8" could not be read: write it like "at 08:00", "from 08:00" or "from 4 March 08:00".',
  ],
  ["300 mg daily at 8 pm", "instant-twelve-hour", '"8 pm" is on the 12-hour clock: write 20:00.'],
  ["300 mg daily at 8pm", "instant-twelve-hour", '"8pm" is on the 12-hour clock: write 20:00.'],
  [
    "300 mg daily at 25:00",
    "instant-no-such-time",
    '"25:00" is not on the 24-hour clock: write a time from 00:00 to 23:59.',
  ],
  [
    "300 mg every 12 h from 03/04 08:00",
    "instant-numeric-date",
    '"03/04" can be read as two different days: write the month by name, such as 4 March.',
  ],
  [
    "300 mg every 12 h from Thu 4 March 08:00",
    "instant-weekday",
    "Wednesday 4 March 2026 is a Wednesday, not a Thursday: check the date, or leave the weekday out.",
  ],
  [
    "300 mg every 12 h from Wed 08:00",
    "instant-needs-date",
    '"Wed" alone can mean several days: add the date, such as Wed 4 March.',
  ],
  ["300 mg every 12 h from 31 April 08:00", "instant-no-such-date", "There is no 31 April: check the day and month."],
  [
    "300 mg every 12 h from 29 March 2026 01:30",
    "clock-skipped",
    "01:30 does not exist on Sunday 29 March 2026 in Europe/London: the clocks go forward. Write 00:59 or 02:00.",
  ],
  [
    "300 mg every 12 h from 25 October 2026 01:30",
    "clock-twice",
    '01:30 comes twice on Sunday 25 October 2026 in Europe/London: the clocks go back. Write "01:30 first" (UTC+01:00) or "01:30 second" (UTC+00:00).',
  ],
  [
    "300 mg daily at 01:30 from 27 March for 4 days",
    "dose-clock-skipped",
    'Dose 3 falls on 01:30 on Sunday 29 March 2026, which does not exist in Europe/London, as the clocks go forward: add "dose 3 moved to 02:00", or another time.',
  ],
  [
    "300 mg daily at 01:30 from 24 October 2026 for 4 days",
    "dose-clock-twice",
    'Dose 2 falls on 01:30 on Sunday 25 October 2026, which comes twice in Europe/London, as the clocks go back: add "dose 2 moved to 01:30 first", or "second".',
  ],
  // How long.
  [
    "300 mg every 12 h from 08:00, 10 doses for 5 days",
    "dose-text-two-lengths",
    '"300 mg" is given two lengths: say the days or the number of doses.',
  ],
  [
    "300 mg once for 5 days",
    "dose-text-two-lengths",
    '"300 mg" is given two lengths: say the days or the number of doses.',
  ],
  [
    "300 mg every 7 h from 08:00 for 5 days",
    "dose-text-uneven-days",
    "5 days are no whole number of 7-hour intervals: write the number of doses.",
  ],
  [
    "300 mg at 08:00 and 20:00, 10 doses",
    "dose-text-uneven-doses",
    "10 doses at 08:00 and 20:00 would end in the middle of a day: write the days, or start with another of these times.",
  ],
  [
    "300 mg every 12 h from 08:00 for a while",
    "dose-text-unreadable",
    '"for a while" could not be read: write it like "for 7 days" or "10 doses".',
  ],
  [
    "300 mg every 12 h from 08:00 until Friday",
    "dose-text-unreadable",
    '"until" could not be read: write it like "300 mg every 12 h from 08:00, 10 doses", "200 mg at 08:00 and 300 mg at 22:00 for 7 days" or "450 mg once at 14:00".',
  ],
  [
    "300 mg every 12 h from 08:00, 20000 doses",
    "dose-too-many",
    "A line can't have more than 10000 doses: write fewer, or a shorter time.",
  ],
  // Two amounts.
  [
    "200 mg at 08:00 and 300 mg at 22:00, 10 doses",
    "dose-text-ambiguous",
    'It is not clear for how long or how many doses "200 mg" is meant: say it for each amount.',
  ],
  [
    "200 mg at 08:00 for 3 days, 300 mg at 14:00 for 5 days and 100 mg at 22:00",
    "dose-text-ambiguous",
    'It is not clear for how long or how many doses "100 mg" is meant: say it for each amount.',
  ],
  [
    "at 08:00 200 mg and at 22:00 300 mg",
    "dose-text-conflict",
    '"at 22:00" comes on top of something already said: say it once, or join two amounts with "and", each before its times.',
  ],
  // Weekdays.
  [
    "300 mg at 08:00 on Monday",
    "dose-text-one-weekday",
    '"on Monday" may be one Monday or each: write "every Monday", or the date, such as "once on 4 March at 08:00".',
  ],
  [
    "300 mg once on Monday at 08:00",
    "dose-text-weekday-once",
    '"on Monday" for a single dose can mean several days: write the date, such as "once on 4 March at 08:00".',
  ],
  [
    "300 mg daily at 08:00 on Mon",
    "dose-text-weekdays-and",
    '"300 mg" is said to be taken daily and also "on Mon": leave one of them out.',
  ],
  [
    "300 mg every 12 h from 08:00 on Mon, Wed and Fri",
    "dose-text-weekdays-and",
    '"300 mg" is said to be taken every 12 h and also "on Mon, Wed and Fri": leave one of them out.',
  ],
  ["300 mg on Mon and Wed", "dose-text-needs-time", '"on Mon and Wed" has no clock time: add it, such as "at 08:00".'],
  [
    "300 mg at 08:00 on Mon, Wed and Mon",
    "dose-text-weekday-twice",
    '"on Mon, Wed and Mon" names a weekday twice: name it once.',
  ],
  [
    "300 mg at 08:00 on Mondays tomorrow",
    "dose-text-weekdays-day",
    '"on Mondays" stands beside a single day: if that is the first day, write it with "from", as in "from 4 March".',
  ],
  [
    "300 mg at 08:00 on Mon and Wed at 20:00 on Fri",
    "dose-text-conflict",
    '"at 20:00" comes on top of something already said: say it once, or join two amounts with "and", each before its times.',
  ],
  [
    "300 mg at 08:00 and 20:00 on Mon and Wed, 4 doses",
    "dose-text-uneven-doses",
    "4 doses at 08:00 and 20:00 would end in the middle of a day: write the days, or start with another of these times.",
  ],
  [
    "300 mg at 08:00 on Mon and Wed, 20000 doses",
    "dose-too-many",
    "A line can't have more than 10000 doses: write fewer, or a shorter time.",
  ],
  [
    "300 mg at 08:00 every Monday from 4 March for 2 days",
    "dose-none",
    "No dose falls between the start of this line and its last day: check the start, the clock times and the days.",
  ],
  [
    "200 mg at 08:00 and 300 mg at 22:00 on Mon and Thu",
    "dose-text-ambiguous",
    'It is not clear on which weekdays "200 mg" is meant: say it for each amount.',
  ],
  // Exceptions.
  [
    "300 mg every 12 h from 08:00, 10 doses, dose 12 missed",
    "dose-exception-beyond",
    "There is no dose 12: the line has 10 doses.",
  ],
  [
    "300 mg every 12 h from 08:00, 10 doses, dose 2 late",
    "dose-exception-needs-at",
    'Dose 2 is marked late without a time: write when, such as "dose 2 late at 10:15".',
  ],
  [
    "300 mg every 12 h from 08:00, 10 doses, dose 2 doubled",
    "dose-text-unreadable",
    '"dose 2 doubled" could not be read: write it like "dose 3 missed", "dose 3 late at 10:15" or "dose 3 moved to 10:15".',
  ],
  // Anything else.
  [
    "300 mg sometimes",
    "dose-text-unreadable",
    '"sometimes" could not be read: write it like "300 mg every 12 h from 08:00, 10 doses", "200 mg at 08:00 and 300 mg at 22:00 for 7 days" or "450 mg once at 14:00".',
  ],
  [
    "300 mg of phenytoin once",
    "dose-text-unreadable",
    '"phenytoin" could not be read: write it like "300 mg every 12 h from 08:00, 10 doses", "200 mg at 08:00 and 300 mg at 22:00 for 7 days" or "450 mg once at 14:00".',
  ],
];

const GIVEN: readonly RefusedCase[] = [
  [
    "300 mg every 12 h from 08:00",
    "dose-text-needs-day",
    'It is not clear on which day this began: add it, such as "from 4 March 08:00", or the number of doses given.',
  ],
  [
    "200 mg at 08:00 and 300 mg at 22:00",
    "dose-text-needs-day",
    'It is not clear on which day this began: add it, such as "from 4 March 08:00", or the number of doses given.',
  ],
  [
    "300 mg daily at 08:00 until further notice",
    "dose-text-needs-day",
    'It is not clear on which day this began: add it, such as "from 4 March 08:00", or the number of doses given.',
  ],
  [
    "300 mg at 08:00 on Mon, Wed and Fri for 10 days",
    "dose-text-needs-day",
    'It is not clear on which day this began: add it, such as "from 4 March 08:00", or the number of doses given.',
  ],
  [
    "300 mg at 08:00 every Monday",
    "dose-text-needs-day",
    'It is not clear on which day this began: add it, such as "from 4 March 08:00", or the number of doses given.',
  ],
  ["450 mg once", "dose-text-needs-time", '"450 mg" has no clock time: add it, such as "at 08:00".'],
];

describe("in an option, each is refused with one sentence that names the part", () => {
  it.each([...REFUSED_AMOUNTS, ...REFUSED_TIMES])("%j", (text, code, sentence) => {
    expect(refusal(text)).toEqual([[code, sentence]]);
  });
});

describe("among the doses given", () => {
  it.each(GIVEN)("%j", (text, code, sentence) => {
    expect(refusal(text, { lane: "given" })).toEqual([[code, sentence]]);
  });
});

describe("a clock time of today that the clocks skip or show twice", () => {
  it("is not passed over for the next day", () => {
    const spring = { nowIso: "2026-03-29T00:10:00+00:00" };
    expect(refusal("300 mg every 12 h from 01:30", spring)?.[0]?.[0]).toBe("clock-skipped");
    const autumn = { nowIso: "2026-10-25T00:10:00+01:00" };
    expect(refusal("300 mg every 12 h from 01:30", autumn)?.[0]?.[0]).toBe("clock-twice");
    const result = doseTextRead("300 mg every 12 h from 01:30 second", doseTextContext(autumn));
    expect(result.ok && result.value[0]?.start).toBe("2026-10-25T01:30:00+00:00");
  });

  it("is no matter once it has passed", () => {
    const noon = doseTextContext({ nowIso: "2026-10-25T12:00:00+00:00" });
    const result = doseTextRead("300 mg every 12 h from 01:30", noon);
    expect(result.ok && result.value[0]?.start).toBe("2026-10-26T01:30:00+00:00");
  });
});

it("a default product that is not among the products is a programmer's mistake", () => {
  expect(() => doseTextRead("300 mg once", doseTextContext({ defaultProduct: "none" }))).toThrow(RangeError);
});

it("any jumble of the grammar's own words is read or refused with a sentence, never thrown at", () => {
  const word = fc.constantFrom(
    ..."300 mg 5 mL every 12 h from at on for and then , 08:00 20:00 01:30 first once twice daily 10 doses days week 2 tablets of 200 tablet tomorrow today Wed 4 March 2026 dose 3 missed late moved to half a until further notice 1,5 0 -1 oral solution Mon Fridays weekdays weekends each".split(
      " ",
    ),
  );
  fc.assert(
    fc.property(fc.array(word, { maxLength: 12 }), fc.constantFrom("given", "option"), (words, lane) => {
      const result = doseTextRead(words.join(" "), doseTextContext({ lane }));
      if (result.ok) expect(result.value.length).toBeGreaterThan(0);
      else for (const issue of result.issues) expect(issueMessage(issue)).toMatch(/^\S.*[.?]$/);
    }),
    { seed: 20260304, numRuns: 2000 },
  );
}, 60_000);
