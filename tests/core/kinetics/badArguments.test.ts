import { describe, expect, it } from "vitest";
import * as core from "../../../src/core/kinetics/index.ts";

const good = { ka: 1, ke: 0.2, volume: 30, bioavailability: 0.9, lag: 0.5 };
const dose = [{ time: 0, amount: 100 }];
const body = { ke: 0.2, volume: 30 };
const course = { ka: 1, bioavailability: 0.9, lag: 0.5, doses: dose };

/** A wrong argument throws a RangeError that names the argument, its value, its unit and what is allowed. */
function refused(call: () => unknown, name: string, value: string, unit: string) {
  let caught: unknown;
  try {
    call();
  } catch (error) {
    caught = error;
  }
  expect(caught, `${name} ${value} was let through`).toBeInstanceOf(RangeError);
  const { message } = caught as RangeError;
  expect(message).toContain(name);
  expect(message).toContain(`is ${value}`);
  if (unit !== "") expect(message).toContain(`${value} ${unit};`);
  expect(message).toMatch(/; allowed: .+/);
}

const BAD_KINETICS: [keyof core.OralKinetics, number, string][] = [
  ...[0, -1, Number.NaN, Infinity, -Infinity].flatMap((value): [keyof core.OralKinetics, number, string][] => [
    ["ka", value, "/h"],
    ["ke", value, "/h"],
    ["volume", value, "L"],
  ]),
  ...[-0.1, 1.1, Number.NaN, Infinity].map((value): [keyof core.OralKinetics, number, string] => [
    "bioavailability",
    value,
    "",
  ]),
  ...[-0.1, Number.NaN, Infinity].map((value): [keyof core.OralKinetics, number, string] => ["lag", value, "h"]),
];

/** Every function that takes kinetics. */
const WITH_KINETICS: Record<string, (k: core.OralKinetics) => unknown> = {
  amountsAfterDose: (k) => core.amountsAfterDose(k, 100, 1),
  concentrationAfterDose: (k) => core.concentrationAfterDose(k, 100, 1),
  timeOfPeak: (k) => core.timeOfPeak(k),
  peakAfterDose: (k) => core.peakAfterDose(k, 100),
  aucAfterDose: (k) => core.aucAfterDose(k, 100),
  crossingsAfterDose: (k) => core.crossingsAfterDose(k, 100, 1),
  steadyStateConcentration: (k) => core.steadyStateConcentration(k, 100, 12, 1),
  steadyState: (k) => core.steadyState(k, 100, 12),
  profile: (k) => core.profile(k, dose, [1]),
  exposure: (k) => core.exposure(k, dose, 0, 1),
  bothReadings: (k) => core.bothReadings(k),
  timeToSteadyState: (k) => core.timeToSteadyState(k),
};

describe.each(Object.entries(WITH_KINETICS))("%s", (_, call) => {
  it("takes good kinetics", () => {
    expect(() => call(good)).not.toThrow();
  });

  it.each(BAD_KINETICS)("refuses kinetics.%s %d", (name, value, unit) => {
    refused(() => call({ ...good, [name]: value }), `kinetics.${name}`, String(value), unit);
  });
});

type Case = [name: string, value: string, unit: string, call: () => unknown];
const bad = [Number.NaN, Infinity, -1];

const OTHER_ARGUMENTS: Case[] = [
  ...bad.flatMap((v): Case[] => [
    ["amount", String(v), "mg", () => core.amountsAfterDose(good, v, 1)],
    ["amount", String(v), "mg", () => core.concentrationAfterDose(good, v, 1)],
    ["amount", String(v), "mg", () => core.peakAfterDose(good, v)],
    ["amount", String(v), "mg", () => core.aucAfterDose(good, v)],
    ["amount", String(v), "mg", () => core.crossingsAfterDose(good, v, 1)],
    ["amount", String(v), "mg", () => core.steadyStateConcentration(good, v, 12, 1)],
    ["amount", String(v), "mg", () => core.steadyState(good, v, 12)],
    ["level", String(v), "mg/L", () => core.crossingsAfterDose(good, 100, v)],
    ["doses[0].amount", String(v), "mg", () => core.profile(good, [{ time: 0, amount: v }], [1])],
    ["window.low", String(v), "mg/L", () => core.exposure(good, dose, 0, 1, { low: v, high: 2 })],
    ["window.high", String(v), "mg/L", () => core.exposure(good, dose, 0, 1, { low: 0, high: v })],
  ]),
  ...[Number.NaN, Infinity, -Infinity].flatMap((v): Case[] => [
    ["t", String(v), "h", () => core.amountsAfterDose(good, 1, v)],
    ["t", String(v), "h", () => core.concentrationAfterDose(good, 1, v)],
    ["times[0]", String(v), "h", () => core.profile(good, dose, [v])],
    ["doses[0].time", String(v), "h", () => core.profile(good, [{ time: v, amount: 1 }], [1])],
    ["from", String(v), "h", () => core.exposure(good, dose, v, 1)],
    ["to", String(v), "h", () => core.exposure(good, dose, 0, v)],
  ]),
  ["t", "NaN", "h", () => core.aucAfterDose(good, 1, Number.NaN)],
  ["t", "-Infinity", "h", () => core.aucAfterDose(good, 1, -Infinity)],
  ...[Number.NaN, Infinity, 0, -1].flatMap((v): Case[] => [
    ["interval", String(v), "h", () => core.steadyState(good, 1, v)],
    ["interval", String(v), "h", () => core.steadyStateConcentration(good, 1, v, 0)],
    ["period", String(v), "h", () => core.patternSteadyState(body, [course], v)],
    ["period", String(v), "h", () => core.patternProfile(body, [course], v, [0])],
  ]),
  ...[Number.NaN, -0.1, 12.1].map(
    (v): Case => ["s", String(v), "h", () => core.steadyStateConcentration(good, 1, 12, v)],
  ),
  ...[Number.NaN, 0, 1, -1, 2].map((v): Case => ["fraction", String(v), "", () => core.timeToSteadyState(good, v)]),
  ["times[1]", "0.5", "h", () => core.profile(good, dose, [1, 0.5])],
  ["times[1]", "NaN", "h", () => core.profile(good, dose, [1, Number.NaN])],
  ["times[2]", "Infinity", "h", () => core.profile(good, dose, [1, 2, Infinity])],
  ["doses[1].time", "-1", "h", () => core.profile(good, [...dose, { time: -1, amount: 1 }], [1])],
  ["doses[1].time", "NaN", "h", () => core.profile(good, [...dose, { time: Number.NaN, amount: 1 }], [1])],
  ["to", "1", "h", () => core.exposure(good, dose, 1, 1)],
  ["to", "0", "h", () => core.exposure(good, dose, 1, 0)],
  ["window.low", "3", "mg/L", () => core.exposure(good, dose, 0, 1, { low: 3, high: 2 })],
  ["disposition.ke", "0", "/h", () => core.historyProfile({ ...body, ke: 0 }, [course], [1])],
  ["disposition.volume", "NaN", "L", () => core.historyExposure({ ...body, volume: Number.NaN }, [course], 0, 1)],
  ["courses[1].ka", "-2", "/h", () => core.historyProfile(body, [course, { ...course, ka: -2 }], [1])],
  [
    "courses[1].bioavailability",
    "2",
    "",
    () => core.historyExposure(body, [course, { ...course, bioavailability: 2 }], 0, 1),
  ],
  ["courses[0].lag", "-1", "h", () => core.patternProfile(body, [{ ...course, lag: -1 }], 12, [1])],
  [
    "courses[0].doses[0].time",
    "12",
    "h",
    () => core.patternSteadyState(body, [{ ...course, doses: [{ time: 12, amount: 1 }] }], 12),
  ],
  [
    "courses[0].doses[0].time",
    "-1",
    "h",
    () => core.patternProfile(body, [{ ...course, doses: [{ time: -1, amount: 1 }] }], 12, [0]),
  ],
  ["sum of absorbed doses", "0", "mg", () => core.patternSteadyState(body, [{ ...course, doses: [] }], 12)],
];

it.each(OTHER_ARGUMENTS)("refuses %s %s %s", (name, value, unit, call) => {
  refused(call, name, value, unit);
});

it("takes the edges of what is allowed", () => {
  expect(core.concentrationAfterDose({ ...good, bioavailability: 0 }, 100, 1)).toBe(0);
  expect(core.concentrationAfterDose({ ...good, bioavailability: 1, lag: 0 }, 0, 1)).toBe(0);
  expect(core.concentrationAfterDose(good, 100, -5)).toBe(0);
  expect(core.aucAfterDose(good, 100, 0.5)).toBe(0);
  expect(core.aucAfterDose(good, 100, Infinity)).toBe(core.aucAfterDose(good, 100));
  expect(core.amountsAfterDose(good, 100, 0.25)).toEqual({ gut: 0, body: 0, eliminated: 0 });
  expect(core.amountsAfterDose(good, 100, 0.5)).toEqual({ gut: 90, body: 0, eliminated: 0 });
  expect(core.steadyStateConcentration(good, 100, 12, 12)).toBe(core.steadyStateConcentration(good, 100, 12, 0));
});
