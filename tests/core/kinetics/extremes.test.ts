import fc from "fast-check";
import { expect, it } from "vitest";
import * as core from "../../../src/core/kinetics/index.ts";

/** Any positive double with a liking for the edges: smallest, smallest normal, largest, and all magnitudes between. */
const positive = fc.oneof(
  fc.constantFrom(Number.MIN_VALUE, 2 ** -1022, 1, Number.MAX_VALUE),
  fc.double({ min: -300, max: 300, noNaN: true }).map((x) => 10 ** x),
  fc.double({ min: -12, max: 12, noNaN: true }).map((x) => 10 ** x),
);
const notNegative = fc.oneof({ weight: 1, arbitrary: fc.constant(0) }, { weight: 9, arbitrary: positive });
const kinetics = fc
  .record({
    ka: positive,
    ke: positive,
    nearness: fc.option(fc.double({ min: -1e-14, max: 1e-14, noNaN: true })),
    volume: positive,
    bioavailability: fc.oneof(fc.constantFrom(0, 1), fc.double({ min: 0, max: 1, noNaN: true })),
    lag: notNegative,
  })
  .map(({ nearness, ...k }) => {
    const near = nearness === null ? k.ke : k.ka * (1 + nearness);
    return { ...k, ke: near > 0 && near < Infinity ? near : k.ka };
  });

/** Every number in a result, however deep. */
function numbersOf(value: unknown): number[] {
  if (typeof value === "number") return [value];
  if (ArrayBuffer.isView(value)) return [...(value as Float64Array)];
  if (typeof value === "object" && value !== null) return Object.values(value).flatMap(numbersOf);
  return [];
}

it("nothing is ever not a number, at any magnitude: a result or a RangeError", { timeout: 60_000 }, () => {
  const answered = new Map<string, number>();
  const args = fc.record({
    k: kinetics,
    other: kinetics,
    mg: notNegative,
    mg2: positive,
    t: positive,
    span: positive,
    level: notNegative,
    part: fc.double({ min: 0, max: 1, noNaN: true }),
  });
  fc.assert(
    fc.property(args, ({ k, other, mg, mg2, t, span, level, part }) => {
      const doses = [
        { time: -t, amount: mg },
        { time: 0, amount: mg2 },
        { time: span, amount: mg },
      ];
      const courses = [
        { ...k, doses },
        { ...other, doses: [{ time: 1, amount: mg2 }] },
      ];
      const pattern = [
        { ...k, doses: [{ time: 0, amount: mg }] },
        { ...other, doses: [{ time: part * span * 0.99, amount: mg2 }] },
      ];
      const window = { low: level / 2, high: level };
      const calls: Record<string, () => unknown> = {
        amountsAfterDose: () => core.amountsAfterDose(k, mg, t),
        concentrationAfterDose: () => core.concentrationAfterDose(k, mg, t),
        timeOfPeak: () => core.timeOfPeak(k),
        peakAfterDose: () => core.peakAfterDose(k, mg),
        aucAfterDose: () => [core.aucAfterDose(k, mg), core.aucAfterDose(k, mg, t)],
        crossingsAfterDose: () => core.crossingsAfterDose(k, mg, level),
        crossingsNearPeak: () => core.crossingsAfterDose(k, mg, part * core.peakAfterDose(k, mg)),
        steadyStateConcentration: () => core.steadyStateConcentration(k, mg, span, part * span),
        steadyState: () => core.steadyState(k, mg, span),
        profile: () => core.profile(k, doses, [-t, 0, t]),
        exposure: () => core.exposure(k, doses, -t, span, window),
        historyProfile: () => core.historyProfile(k, courses, [-t, t, t]),
        historyExposure: () => core.historyExposure(k, courses, -t, span, window),
        patternSteadyState: () => core.patternSteadyState(k, pattern, span),
        patternProfile: () => core.patternProfile(k, pattern, span, [-part * span, 0, part * span, span]),
        bothReadings: () => core.bothReadings(k),
        timeToSteadyState: () => core.timeToSteadyState(k),
      };
      for (const [name, call] of Object.entries(calls)) {
        try {
          const numbers = numbersOf(call());
          answered.set(name, (answered.get(name) ?? 0) + 1);
          expect(numbers.some(Number.isNaN), `${name} gave NaN`).toBe(false);
        } catch (error) {
          if (!(error instanceof RangeError)) throw error;
        }
      }
    }),
    { seed: 1022, numRuns: 600 },
  );
  // The test would pass if everything were refused: most is answered. Steady state needs rate × interval within 1e±150.
  for (const [name, count] of answered) expect(count, name).toBeGreaterThan(150);
  expect(answered.size).toBe(17);
});

it("far out everything is gone: no level, all eliminated, no more area", () => {
  const k = { ka: 1, ke: 0.2, volume: 30, bioavailability: 1, lag: 0 };
  for (const t of [1e5, 1e100, Number.MAX_VALUE]) {
    expect(core.concentrationAfterDose(k, 100, t)).toBe(0);
    expect(core.amountsAfterDose(k, 100, t)).toEqual({ gut: 0, body: 0, eliminated: 100 });
    expect(core.aucAfterDose(k, 100, t)).toBe(core.aucAfterDose(k, 100));
    expect([...core.profile(k, [{ time: 0, amount: 100 }], [t])]).toEqual([0]);
  }
});

it("the smallest steps: a level grows linearly from nothing", () => {
  const k = { ka: 1, ke: 0.2, volume: 1, bioavailability: 1, lag: 0 };
  // C = D·ka·t to the last place, t²/2 for the part eliminated: relative 1e-15.
  for (const t of [1e-20, 1e-100, 1e-150]) {
    expect(Math.abs(core.concentrationAfterDose(k, 1, t) / t - 1)).toBeLessThanOrEqual(1e-15);
    expect(Math.abs(core.aucAfterDose(k, 1, t) / (t * t * 0.5) - 1)).toBeLessThanOrEqual(1e-15);
  }
});

it("rates that differ in the last place only give what equal ones give, to 1e-15", () => {
  const ke = 0.2;
  const ka = ke * (1 + Number.EPSILON);
  expect(ka).not.toBe(ke);
  const near = { ka, ke, volume: 10, bioavailability: 1, lag: 0 };
  const equal = { ...near, ka: ke };
  for (const t of [0.01, 1, 5, 30, 200]) {
    const [a, b] = [core.concentrationAfterDose(near, 100, t), core.concentrationAfterDose(equal, 100, t)];
    expect(Math.abs(a / b - 1)).toBeLessThanOrEqual(1e-14);
  }
  expect(core.timeOfPeak(equal)).toBe(5);
  expect(core.timeOfPeak(near)).toBeCloseTo(5, 14);
});
