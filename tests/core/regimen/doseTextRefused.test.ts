import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { issueMessage } from "../../../src/core/messages/index.ts";
import { doseTextRead } from "../../../src/core/regimen/index.ts";
import { doseTextContext } from "./doseTextContext.ts";

const refusal = (text: string, rest = {}) => {
  const result = doseTextRead(text, doseTextContext(rest));
  return result.ok ? null : result.issues.map((issue) => [issue.code, issueMessage(issue)]);
};

/** What is typed, the code, and the one sentence that is read. */
const OPTION: readonly (readonly [text: string, code: string, sentence: string])[] = [
  ["", "dose-text-empty", 'Write the doses, such as "300 mg every 12 h from 08:00, 10 doses".'],
  [" , ", "dose-text-needs-amount", 'The amount is missing: begin with one, such as "300 mg".'],
  // The amount.
  ["every 12 h from 08:00", "dose-text-needs-amount", 'The amount is missing: begin with one, such as "300 mg".'],
  ["1,5 g once", "number-comma", '"1,5" has a comma: write 1.5 with a point.'],
  ["1,5g once", "number-comma", '"1,5" has a comma: write 1.5 with a point.'],
  [
    "1,000 mg once",
    "number-thousands",
    'The comma in "1,000" can be read two ways: write 1000 without it, or a point for a decimal.',
  ],
  [".5 g once", "number-leading-point", '".5" has no digit before the point: write 0.5.'],
  ["1e3 mg once", "dose-text-unit", '"e3" after "1" is not a unit of a dose: write mg, g, microgram, mL or tablets.'],
  ["0 mg once", "dose-text-amount-not-positive", '"0 mg" is not a dose: write an amount above 0.'],
  ["-300 mg once", "dose-text-amount-not-positive", '"-300 mg" is not a dose: write an amount above 0.'],
  [
    "\u2212300 mg once",
    "number-minus",
    '"\u2212300" has a dash that is not the minus of the keyboard: write - for minus.',
  ],
  ["٣٠٠ mg once", "number-digits", '"٣٠٠" has digits other than 0 to 9: write it with 0 to 9.'],
  ["300 every 12 h from 08:00", "dose-text-needs-unit", '"300" has no unit: write it like "300 mg".'],
  ["300", "dose-text-needs-unit", '"300" has no unit: write it like "300 mg".'],
  [
    "300 units once",
    "dose-text-unit",
    '"units" after "300" is not a unit of a dose: write mg, g, microgram, mL or tablets.',
  ],
  [
    "5 mg/kg once",
    "dose-text-unit",
    '"mg/kg" after "5" is not a unit of a dose: write mg, g, microgram, mL or tablets.',
  ],
  [
    "5 mL every 12 h from 08:00",
    "dose-unit-mismatch",
    "The 12-hour modified-release tablet is not given in mL: write mg, g or ug.",
  ],
  [
    "2 capsules of 200 mg once",
    "dose-unit-mismatch",
    "The 12-hour modified-release tablet is not given in capsule: write mg, g or ug.",
  ],
  [
    "2 tablets of oral solution once",
    "dose-unit-mismatch",
    "The oral solution is not given in tablet: write mg, g, ug or mL.",
  ],
  [
    "2 tablets once",
    "dose-text-needs-strength",
    '"2 tablets" does not say of which strength: add it, such as "of 200 mg". There are 200 and 300 mg.',
  ],
  [
    "2 tablets of 250 mg once",
    "dose-text-strength",
    '"2 tablets of 250 mg" is a strength that the 12-hour modified-release tablet does not have: it has 200 and 300 mg.',
  ],
  [
    "1/2 tablet of 200 mg once",
    "dose-text-fraction",
    '"1/2 tablet" is easily misread: write "half a tablet" or the amount in mg.',
  ],
  [
    "0.25 tablets of 200 mg once",
    "dose-text-tablet-part",
    '"0.25 tablets" is not a number of whole or half tablets: write the amount in mg.',
  ],
  [
    "300 mg 200 mg once",
    "dose-text-conflict",
    '"200 mg" comes on top of something already said: say it once, or join two amounts with "and", each before its times.',
  ],
  // How often.
  [
    "300 mg",
    "dose-text-needs-repeat",
    '"300 mg" does not say how often: write "once", "daily at 08:00" or "every 12 h from 08:00".',
  ],
  [
    "300 mg at 08:00",
    "dose-text-needs-repeat",
    '"300 mg" does not say how often: write "once", "daily at 08:00" or "every 12 h from 08:00".',
  ],
  [
    "300 mg on Fri 6 March at 08:00 and 20:00",
    "dose-text-needs-repeat",
    '"300 mg" does not say how often: write "once", "daily at 08:00" or "every 12 h from 08:00".',
  ],
  [
    "200 mg tomorrow at 08:00 and 300 mg at 22:00",
    "dose-text-needs-repeat",
    '"200 mg" does not say how often: write "once", "daily at 08:00" or "every 12 h from 08:00".',
  ],
  [
    "300 mg qd",
    "dose-text-abbreviation",
    'The abbreviation "qd" is easily misread: write it in full, such as "daily at 08:00".',
  ],
  [
    "300 mg OD",
    "dose-text-abbreviation",
    'The abbreviation "OD" is easily misread: write it in full, such as "daily at 08:00".',
  ],
  [
    "300 mg b.d.",
    "dose-text-abbreviation",
    'The abbreviation "b.d." is easily misread: write it in full, such as "at 08:00 and 20:00".',
  ],
  [
    "300 mg tds",
    "dose-text-abbreviation",
    'The abbreviation "tds" is easily misread: write it in full, such as "at 08:00, 14:00 and 22:00".',
  ],
  [
    "300 mg q12h from 08:00",
    "dose-text-abbreviation",
    'The abbreviation "q12h" is easily misread: write it in full, such as "every 12 h".',
  ],
  [
    "300 mg q8h",
    "dose-text-abbreviation",
    'The abbreviation "q8h" is easily misread: write it in full, such as "every 8 h".',
  ],
  [
    "300 mg qhs",
    "dose-text-abbreviation",
    'The abbreviation "qhs" is easily misread: write it in full, such as "daily at 22:00".',
  ],
  [
    "300 mg qod",
    "dose-text-abbreviation",
    'The abbreviation "qod" is easily misread: write it in full, such as "every 48 h".',
  ],
  [
    "300 mg prn",
    "dose-text-as-needed",
    'Doses taken only when needed ("prn") have no clock times, so they can\'t be laid out: write the times at which they are taken.',
  ],
  [
    "300 mg every other day at 08:00",
    "dose-text-every-days",
    '"every other day" is not taken in days: write "daily at 08:00" for each day, or "every 48 h".',
  ],
  [
    "300 mg every 3 days at 08:00",
    "dose-text-every-days",
    '"every 3 days" is not taken in days: write "daily at 08:00" for each day, or "every 72 h".',
  ],
  [
    "300 mg every 0 h from 08:00",
    "dose-text-interval",
    '"every 0 h" is no interval: write one above 0, such as "every 12 h".',
  ],
  [
    "300 mg every so often",
    "dose-text-unreadable",
    '"every so" could not be read: write it like "every 12 h" or "daily at 08:00".',
  ],
  [
    "300 mg once every 12 h from 08:00",
    "dose-text-two-repeats",
    '"300 mg" is given two ways to repeat: say once, daily, or every so many hours.',
  ],
  [
    "300 mg daily every 12 h from 08:00",
    "dose-text-two-repeats",
    '"300 mg" is given two ways to repeat: say once, daily, or every so many hours.',
  ],
  [
    "300 mg every 12 h every 8 h from 08:00",
    "dose-text-conflict",
    '"every 8 h" comes on top of something already said: say it once, or join two amounts with "and", each before its times.',
  ],
  [
    "300 mg every 12 h at 08:00 and 20:00",
    "dose-text-every-and-clocks",
    '"300 mg" every 12 h has more than one clock time: write the first, as in "from 08:00", or leave "every 12 h" out.',
  ],
  ["300 mg once at 08:00 and 20:00", "dose-text-once-times", '"300 mg" once has more than one time: leave one.'],
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

const GIVEN: typeof OPTION = [
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
  ["450 mg once", "dose-text-needs-time", '"450 mg" has no clock time: add it, such as "at 08:00".'],
];

describe("in an option, each is refused with one sentence that names the part", () => {
  it.each(OPTION)("%j", (text, code, sentence) => {
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
    ..."300 mg 5 mL every 12 h from at on for and then , 08:00 20:00 01:30 first once twice daily 10 doses days week 2 tablets of 200 tablet tomorrow today Wed 4 March 2026 dose 3 missed late moved to half a until further notice 1,5 0 -1 oral solution".split(
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
