import { type NumberPrintOptions, numberPrint, type UnitCode, unitSpoken } from "../units/index.ts";
import type { MessageFunction } from "./messageFunction.ts";

const number = (value: unknown, options: NumberPrintOptions = { significant: 3 }): string =>
  typeof value === "number" && Number.isFinite(value) ? numberPrint(value, options) : "no number";
const hours = (value: unknown): string => `${number(value, { significant: 4 })} h`;
/** mg/L, or in the unit that stands beside the issue's data: how many of it make 1 mg/L. */
const level = (value: unknown, shownIn: unknown): string => {
  const { unit, factor } = (shownIn as { unit: UnitCode; factor: number } | undefined) ?? { unit: "mg/L", factor: 1 };
  return `${number(typeof value === "number" ? value * factor : value)} ${unitSpoken(unit, "screen")}`;
};
const percent = (share: unknown): string => (typeof share === "number" ? `${number(share * 100)} %` : "a part");
const levels = (count: unknown): string => (count === 1 ? "1 level" : `${number(count)} levels`);

/** Why levels can't be read without a model, and what to look at when they can. */
export const noncompartmentalMessages: Readonly<Record<string, MessageFunction>> = {
  "nca-points-few": ({ found, needed }) => `There are ${levels(found)}: at least ${number(needed)} are needed.`,
  "nca-time-unusable": ({ position }) => `The time of level ${number(position)} is not a number.`,
  "nca-level-unusable": ({ time }) => `The level at ${hours(time)} is not a number.`,
  "nca-time-negative": ({ time }) => `A level at ${hours(time)} was drawn before the dose.`,
  "nca-level-negative": ({ time, value, shownIn }) =>
    `The level at ${hours(time)} is below 0: ${level(value, shownIn)}.`,
  "nca-times-equal": ({ time }) => `Two levels stand at ${hours(time)}: leave one out.`,
  "nca-times-unsorted": ({ time, before }) =>
    `The levels are not in order of time: ${hours(time)} comes after ${hours(before)}.`,
  "nca-levels-zero": () => "All levels are 0.",
  "nca-levels-equal": ({ value, shownIn }) =>
    `All levels are ${level(value, shownIn)}: nothing falls, so there is no half-life.`,
  "nca-dose-not-positive": ({ dose }) => `The dose is ${number(dose)} mg: it has to be above 0.`,
  "nca-interval-not-positive": ({ tau }) => `The interval is ${number(tau)} h: it has to be above 0.`,
  "nca-interval-empty": ({ tau, first }) =>
    `No level lies within the interval of ${hours(tau)}; the first is at ${hours(first)}.`,
  "nca-peak-beyond-interval": ({ tau, peakTime }) =>
    `The highest level, at ${hours(peakTime)}, lies beyond the interval of ${hours(tau)}.`,
  "nca-figures-infinite": () => "With these levels the figures are too large or too small to be computed.",
  "nca-point-unknown": ({ count }) => `A point was picked that does not exist; there are ${number(count)}.`,
  "nca-level-zero-logged": ({ time }) =>
    `The level at ${hours(time)} is 0, which has no logarithm: leave it out of the terminal line.`,
  "nca-terminal-few": ({ found, needed, picked }) =>
    `A terminal line needs at least ${levels(needed)}; ${picked ? `${number(found)} picked` : `after the highest there ${found === 1 ? "is" : "are"} ${number(found)}`}.`,
  "nca-terminal-before-peak": ({ time, peakTime }) =>
    `The level at ${hours(time)} lies before the highest, at ${hours(peakTime)}: it can't be on the terminal line.`,
  "nca-terminal-rises": ({ count, fromTime, toTime }) =>
    `The ${levels(count)} of the terminal line, ${hours(fromTime)} to ${hours(toTime)}, do not fall: there is no half-life in them.`,
  "nca-extrapolated-much": ({ share, limit }) =>
    `${percent(share)} of the area was not measured but carried on, more than ${percent(limit)}: clearance is uncertain.`,
  "nca-area-begins-late": ({ time }) =>
    `The area begins at the first level, ${hours(time)} after the dose: what lies before is not in it.`,
  "nca-level-at-dose": ({ value, shownIn }) =>
    `The level at the time of the dose is ${level(value, shownIn)}, not 0: something was still there from before, or it entered at once.`,
  "nca-start-from-end": ({ level: value, shownIn }) =>
    `No level was drawn at the start of the interval: ${level(value, shownIn)}, the level at its end, stands there too, as at steady state.`,
  "nca-end-from-start": ({ level: value, shownIn }) =>
    `No level was drawn at the end of the interval: ${level(value, shownIn)}, the level at its start, stands there too, as at steady state.`,
  "nca-end-from-line": ({ level: value, shownIn }) =>
    `No level was drawn at the end of the interval: ${level(value, shownIn)} on the terminal line stands there.`,
  "nca-residuals-few": ({ found, needed }) =>
    `${found === 0 ? "No residual" : `Only ${number(found)} residual`} of the early levels can be used; an absorption rate needs ${number(needed)}.`,
  "nca-residuals-rise": ({ count }) =>
    `The ${number(count)} residuals of the early levels do not fall: no absorption rate comes of them.`,
  "nca-rates-near": ({ ratio, limit }) =>
    `The absorption rate is only ${number(ratio)} times the terminal rate, less than ${number(limit)} times: it is doubtful.`,
  "nca-rates-too-near": ({ ratio, limit }) =>
    `The absorption rate is only ${number(ratio)} times the terminal rate, less than ${number(limit)} times: it is not reliable.`,
  "nca-rate-not-positive": ({ rate }) => `The elimination rate is ${number(rate)} per h: it has to be above 0.`,
  "nca-dose-level-missing": ({ time }) =>
    `The first level is at ${hours(time)}: the fraction absorbed needs the level at the time of the dose.`,
  "nca-absorbed-above-all": ({ fraction, time }) =>
    `At ${hours(time)} the fraction absorbed comes to ${number(fraction)}, above 1: the levels or the elimination rate do not fit together exactly.`,
  "nca-remaining-few": ({ found, needed }) =>
    `${levels(found)} in this stretch: a rate needs at least ${number(needed)}.`,
  "nca-remaining-none": ({ time }) => `At ${hours(time)} nothing remains to be absorbed: end the stretch before.`,
  "nca-remaining-rises": ({ count }) =>
    `What remains to be absorbed does not fall over these ${levels(count)}: no rate comes of it.`,
  "rich-no-dose": () => "The case has no dose given before the now line.",
  "rich-levels-few": ({ found, needed }) =>
    `The most measured levels after one dose and before the next: ${number(found)}; ${number(needed)} are needed.`,
  "rich-irregular": () =>
    "There are levels enough after a dose, but the doses before it are not equal at equal intervals: steady state can't be assumed, and the earlier doses are still in the levels.",
  "rich-model-missing": () =>
    "There are levels enough after a dose, but how long it takes to reach steady state is not known: the typical patient can't be worked out yet.",
  "rich-not-steady": ({ run, needed }) =>
    `There are levels enough after a dose, but regular doses had run for only ${number(run)} h before it; ${needed === null ? "at this dose no steady state is reached" : `steady state, to within 3 %, takes about ${number(needed)} h`}. The earlier doses are still in the levels.`,
  "rich-clearance-changed": () =>
    "Clearance or volume changed while these levels were drawn: they do not belong to one rate.",
  "rich-saturates": () =>
    "Elimination of this medicine saturates: no half-life holds, and clearance, volume and what is carried on hold for these levels only, not for another dose.",
  "rich-reason-missing": () => "Say why other points are taken.",
};
