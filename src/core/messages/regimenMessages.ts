import { WEEKDAYS } from "../time/index.ts";
import type { MessageFunction } from "./messageFunction.ts";
import { dateWords } from "./timeMessages.ts";

type Data = Readonly<Record<string, unknown>>;

const said = (value: unknown): string => `"${String(value)}"`;
const texts = (value: unknown): readonly string[] => (Array.isArray(value) ? value.map(String) : [String(value)]);
const either = (value: unknown, last = "or"): string => {
  const items = texts(value);
  return items.length < 2 ? (items[0] ?? "") : `${items.slice(0, -1).join(", ")} ${last} ${items[items.length - 1]}`;
};
const quoted = (value: unknown): string => either(texts(value).map((text) => `"${text}"`));
const strengthList = (strengths: unknown): string => {
  const list = texts(strengths);
  return list.length === 0 ? "no strength" : `${either(list, "and")} mg`;
};
const times = (count: unknown): string => {
  const words = ["Once", "Twice"];
  return words[Number(count) - 1] ?? `${String(count)} times`;
};
const WAYS: Readonly<Record<string, string>> = {
  once: "how often",
  days: "for how long",
  date: "from which day",
  product: "of which product",
  weekdays: "on which weekdays",
};

export const regimenMessages: Readonly<Record<string, MessageFunction>> = {
  "dose-clock-skipped": ({ dose, date, time, zone, nearest }: Data) =>
    `Dose ${String(dose)} falls on ${String(time)} on ${dateWords(date)}, which does not exist in ${String(zone)}, as the clocks go forward: add "dose ${String(dose)} moved to ${texts(nearest)[1] ?? ""}", or another time.`,
  "dose-clock-twice": ({ dose, date, time, zone }: Data) =>
    `Dose ${String(dose)} falls on ${String(time)} on ${dateWords(date)}, which comes twice in ${String(zone)}, as the clocks go back: add "dose ${String(dose)} moved to ${String(time)} first", or "second".`,
  "dose-exception-twice": ({ dose }: Data) => `Dose ${String(dose)} has two exceptions: leave one.`,
  "dose-exception-needs-at": ({ dose, status }: Data) =>
    `Dose ${String(dose)} is marked ${String(status)} without a time: write when, such as "dose ${String(dose)} ${String(status)} at 10:15".`,
  "dose-exception-beyond": ({ dose, doses }: Data) =>
    `There is no dose ${String(dose)}: the line has ${String(doses)} ${doses === 1 ? "dose" : "doses"}.`,
  "dose-none": () =>
    "No dose falls between the start of this line and its last day: check the start, the clock times and the days.",
  "dose-too-many": ({ most }: Data) =>
    `A line can't have more than ${String(most)} doses: write fewer, or a shorter time.`,

  "dose-text-empty": ({ expected }: Data) => `Write the doses, such as ${said(expected)}.`,
  "dose-text-unreadable": ({ part, expected }: Data) =>
    `${said(part)} could not be read: write it like ${quoted(expected)}.`,
  "dose-text-abbreviation": ({ part, expected }: Data) =>
    `The abbreviation ${said(part)} is easily misread: write it in full, such as ${said(expected)}.`,
  "dose-text-vague-time": ({ part, expected }: Data) =>
    `${said(part)} is no clock time: write one, such as ${said(expected)}.`,
  "dose-text-as-needed": ({ part }: Data) =>
    `Doses taken only when needed (${said(part)}) have no clock times, so they can't be laid out: write the times at which they are taken.`,
  "dose-text-fraction": ({ part }: Data) =>
    `${said(part)} is easily misread: write "half a tablet" or the amount in mg.`,
  "dose-text-tablet-part": ({ part }: Data) =>
    `${said(part)} is not a number of whole or half tablets: write the amount in mg.`,
  "dose-text-amount-not-positive": ({ part }: Data) => `${said(part)} is not a dose: write an amount above 0.`,
  "dose-text-needs-amount": ({ expected }: Data) => `The amount is missing: begin with one, such as ${said(expected)}.`,
  "dose-text-needs-unit": ({ part, expected }: Data) => `${said(part)} has no unit: write it like ${said(expected)}.`,
  "dose-text-unit": ({ part, amount }: Data) =>
    `${said(part)} after ${said(amount)} is not a unit of a dose: write mg, g, microgram, mL or tablets.`,
  "dose-text-needs-strength": ({ part, strengths }: Data) =>
    `${said(part)} does not say of which strength: add it, such as "of ${String(texts(strengths)[0] ?? "200")} mg". There are ${strengthList(strengths)}.`,
  "dose-text-strength": ({ part, product, strengths }: Data) =>
    `${said(part)} is a strength that the ${String(product)} does not have: it has ${strengthList(strengths)}.`,
  "dose-text-conflict": ({ part }: Data) =>
    `${said(part)} comes on top of something already said: say it once, or join two amounts with "and", each before its times.`,
  "dose-text-ambiguous": ({ part, about }: Data) =>
    `It is not clear ${about === "days" ? "for how long or how many doses" : (WAYS[String(about)] ?? "what")} ${said(part)} is meant: say it for each amount.`,
  "dose-text-interval": ({ part }: Data) => `${said(part)} is no interval: write one above 0, such as "every 12 h".`,
  "dose-text-every-days": ({ part, expected }: Data) =>
    `${said(part)} is not taken in days: write "daily at 08:00" for each day, or ${said(expected)}.`,
  "dose-text-two-repeats": ({ part }: Data) =>
    `${said(part)} is given two ways to repeat: say once, daily, or every so many hours.`,
  "dose-text-two-lengths": ({ part }: Data) =>
    `${said(part)} is given two lengths: say the days or the number of doses.`,
  "dose-text-once-times": ({ part }: Data) => `${said(part)} once has more than one time: leave one.`,
  "dose-text-every-and-clocks": ({ part, hours }: Data) =>
    `${said(part)} every ${String(hours)} h has more than one clock time: write the first, as in "from 08:00", or leave "every ${String(hours)} h" out.`,
  "dose-text-uneven-days": ({ days, hours }: Data) =>
    `${String(days)} days are no whole number of ${String(hours)}-hour intervals: write the number of doses.`,
  "dose-text-uneven-doses": ({ doses, clocks }: Data) =>
    `${String(doses)} doses at ${either(clocks, "and")} would end in the middle of a day: write the days, or start with another of these times.`,
  "dose-text-needs-repeat": ({ part, expected }: Data) =>
    `${said(part)} does not say how often: write ${quoted(expected)}.`,
  "dose-text-needs-clock": ({ part, times: count }: Data) =>
    Number(count) > 1
      ? `${said(part)} ${times(count).toLowerCase()} a day needs its clock times: write them, such as "at 08:00 and 20:00".`
      : `${said(part)} daily needs its clock time: write it, such as "at 08:00".`,
  "dose-text-clock-count": ({ times: count, clocks }: Data) =>
    `${times(count)} a day does not go with ${texts(clocks).length === 1 ? "one clock time" : `${texts(clocks).length} clock times`} (${either(clocks, "and")}): make them agree.`,
  "dose-text-daily-which": ({ part }: Data) =>
    `${said(part)} each day can't carry "first", "second" or an offset: write the time alone.`,
  "line-weekdays-order": () =>
    "Weekdays of a dose line are numbers from 1 (Monday) to 7 (Sunday), in ascending order, each once.",
  "dose-text-weekday-twice": ({ part }: Data) => `${said(part)} names a weekday twice: name it once.`,
  "dose-text-weekday-once": ({ part }: Data) =>
    `${said(part)} for a single dose can mean several days: write the date, such as "once on 4 March at 08:00".`,
  "dose-text-weekdays-and": ({ part, weekdays, hours }: Data) =>
    `${said(part)} is said to be taken ${hours === undefined ? "daily" : `every ${String(hours)} h`} and also ${said(weekdays)}: leave one of them out.`,
  "dose-text-weekdays-day": ({ part }: Data) =>
    `${said(part)} stands beside a single day: if that is the first day, write it with "from", as in "from 4 March".`,
  "dose-text-one-weekday": ({ part, weekday }: Data) => {
    const name = WEEKDAYS[Number(weekday) - 1] ?? "";
    return `${said(part)} may be one ${name} or each: write "every ${name}", or the date, such as "once on 4 March at 08:00".`;
  },
  "dose-text-seconds": ({ part }: Data) => `${said(part)} has seconds: write a daily time to the minute.`,
  "dose-text-needs-time": ({ part, expected }: Data) =>
    `${said(part)} has no clock time: add it, such as ${said(expected)}.`,
  "dose-text-needs-day": ({ expected }: Data) =>
    `It is not clear on which day this began: add it, such as ${said(expected)}, or the number of doses given.`,
};
