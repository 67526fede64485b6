/** What is typed, the code, and the one sentence that is read. */
export type RefusedCase = readonly [text: string, code: string, sentence: string];

/** Texts whose amount or repeat is at fault. */
export const REFUSED_AMOUNTS: readonly RefusedCase[] = [
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
    "The 12-hour modified-release tablet is not measured in mL: write mg, g or microgram.",
  ],
  [
    "2 capsules of 200 mg once",
    "dose-unit-mismatch",
    "The 12-hour modified-release tablet is not measured in capsule: write mg, g or microgram.",
  ],
  [
    "2 tablets of oral solution once",
    "dose-unit-mismatch",
    "The oral solution is not measured in tablet: write mg, g, microgram or mL.",
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
];
