import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { issueMessage } from "../../../src/core/messages/index.ts";
import {
  type LevelPoint,
  type NoncompartmentalOptions,
  noncompartmental,
  residualsMethod,
  wagnerNelson,
  wagnerNelsonRate,
} from "../../../src/core/noncompartmental/index.ts";
import { issue, type Result } from "../../../src/core/result/index.ts";
import { levelsAt, ORAL } from "./levelSets.ts";

const good: NoncompartmentalOptions = { dose: 100, method: "linear-up-log-down" };
const codes = (result: Result<unknown>) => (result.ok ? [] : result.issues.map(({ code }) => code));
const replaced = (index: number, change: Partial<LevelPoint>) =>
  ORAL.map((point, i) => (i === index ? { ...point, ...change } : point));

describe("what can't be read has its reason", () => {
  it.each<[string, readonly LevelPoint[], Partial<NoncompartmentalOptions>, string, string]>([
    ["no points", [], {}, "nca-points-few", "There are 0 levels: at least 3 are needed."],
    ["two points", levelsAt([4, 2]), {}, "nca-points-few", "There are 2 levels: at least 3 are needed."],
    ["all levels 0", levelsAt([0, 0, 0, 0]), {}, "nca-levels-zero", "All levels are 0."],
    [
      "all levels equal",
      levelsAt([0.1, 0.1, 0.1, 0.1]),
      {},
      "nca-levels-equal",
      "All levels are 0.1 mg/L: nothing falls, so there is no half-life.",
    ],
    [
      "a terminal slope that rises",
      levelsAt([0, 9, 1, 2, 4, 8]),
      {},
      "nca-terminal-rises",
      "The 4 levels of the terminal line, 2 h to 5 h, do not fall: there is no half-life in them.",
    ],
    [
      "a terminal slope that is level",
      levelsAt([0, 9, 2, 2, 2]),
      {},
      "nca-terminal-rises",
      "The 3 levels of the terminal line, 2 h to 4 h, do not fall: there is no half-life in them.",
    ],
    [
      "levels up and down about a level line",
      levelsAt([0, 9, 2, 3, 2], [0, 1.1, 2.3, 4.7, 7.1]),
      {},
      "nca-terminal-rises",
      "The 3 levels of the terminal line, 2.3 h to 7.1 h, do not fall: there is no half-life in them.",
    ],
    [
      "only rising levels",
      levelsAt([0, 1, 2, 3]),
      {},
      "nca-terminal-few",
      "A terminal line needs at least 3 levels; after the highest there are 0.",
    ],
    [
      "two levels after the highest",
      levelsAt([0, 4, 3, 2]),
      {},
      "nca-terminal-few",
      "A terminal line needs at least 3 levels; after the highest there are 2.",
    ],
    [
      "a level of 0 after the highest",
      levelsAt([0, 8, 4, 2, 0]),
      {},
      "nca-level-zero-logged",
      "The level at 4 h is 0, which has no logarithm: leave it out of the terminal line.",
    ],
    [
      "a level below 0",
      replaced(9, { value: -0.1 }),
      {},
      "nca-level-negative",
      "The level at 12 h is below 0: \u22120.1 mg/L.",
    ],
    [
      "a level that is no number",
      replaced(9, { value: Number.NaN }),
      {},
      "nca-level-unusable",
      "The level at 12 h is not a number.",
    ],
    [
      "a time that is no number",
      replaced(2, { time: Number.NaN }),
      {},
      "nca-time-unusable",
      "The time of level 3 is not a number.",
    ],
    [
      "a time before the dose",
      replaced(0, { time: -0.5 }),
      {},
      "nca-time-negative",
      "A level at \u22120.5 h was drawn before the dose.",
    ],
    [
      "times out of order",
      replaced(3, { time: 0.4 }),
      {},
      "nca-times-unsorted",
      "The levels are not in order of time: 0.4 h comes after 0.52 h.",
    ],
    ["equal times", replaced(3, { time: 0.52 }), {}, "nca-times-equal", "Two levels stand at 0.52 h: leave one out."],
    ["a dose of 0", ORAL, { dose: 0 }, "nca-dose-not-positive", "The dose is 0 mg: it has to be above 0."],
    ["a dose below 0", ORAL, { dose: -5 }, "nca-dose-not-positive", "The dose is \u22125 mg: it has to be above 0."],
    [
      "a dose that is no number",
      ORAL,
      { dose: Number.NaN },
      "nca-dose-not-positive",
      "The dose is no number mg: it has to be above 0.",
    ],
    ["an interval of 0", ORAL, { tau: 0 }, "nca-interval-not-positive", "The interval is 0 h: it has to be above 0."],
    [
      "an interval before the first level",
      ORAL.slice(1),
      { tau: 0.1 },
      "nca-interval-empty",
      "No level lies within the interval of 0.1 h; the first is at 0.27 h.",
    ],
    [
      "a highest level beyond the interval",
      ORAL,
      { tau: 1.5 },
      "nca-peak-beyond-interval",
      "The highest level, at 1.92 h, lies beyond the interval of 1.5 h.",
    ],
    [
      "picked points: two",
      ORAL,
      { terminal: [9, 10] },
      "nca-terminal-few",
      "A terminal line needs at least 3 levels; 2 picked.",
    ],
    [
      "picked points: none in these hours",
      ORAL,
      { terminal: { from: 30, to: 40 } },
      "nca-terminal-few",
      "A terminal line needs at least 3 levels; 0 picked.",
    ],
    [
      "picked points: one before the highest",
      ORAL,
      { terminal: [2, 8, 9, 10] },
      "nca-terminal-before-peak",
      "The level at 0.52 h lies before the highest, at 1.92 h: it can't be on the terminal line.",
    ],
    [
      "picked points: one that is not there",
      ORAL,
      { terminal: [8, 9, 11] },
      "nca-point-unknown",
      "A point was picked that does not exist; there are 11.",
    ],
    [
      "picked points: half a place",
      ORAL,
      { terminal: [8, 9.5, 10] },
      "nca-point-unknown",
      "A point was picked that does not exist; there are 11.",
    ],
    [
      "picked points: a level of 0",
      levelsAt([0, 8, 4, 2, 0]),
      { terminal: [2, 3, 4] },
      "nca-level-zero-logged",
      "The level at 4 h is 0, which has no logarithm: leave it out of the terminal line.",
    ],
    [
      "figures beyond double precision",
      levelsAt([1e308, 1e307, 1e306, 1e305], [0, 1e3, 2e3, 3e3]),
      {},
      "nca-figures-infinite",
      "With these levels the figures are too large or too small to be computed.",
    ],
  ])("%s", (_, points, change, code, sentence) => {
    const found = noncompartmental(points, { ...good, ...change });
    expect(codes(found)).toEqual([code]);
    expect(found.ok ? "" : issueMessage(found.issues[0]!)).toBe(sentence);
  });

  it("several faults are told together", () => {
    const points = [
      { time: 3, value: -1 },
      { time: 2, value: 1 },
      { time: 2, value: 1 },
    ];
    expect(codes(noncompartmental(points, { ...good, dose: 0, tau: -1 }))).toEqual([
      "nca-level-negative",
      "nca-times-unsorted",
      "nca-times-equal",
      "nca-dose-not-positive",
      "nca-interval-not-positive",
    ]);
  });

  it("an unknown method is a programmer's mistake", () => {
    const method = "cubic" as "linear";
    expect(() => noncompartmental(ORAL, { dose: 1, method })).toThrow("method is cubic");
    expect(() => wagnerNelson(ORAL, 0.1, method)).toThrow("method is cubic");
  });

  it("residuals and Wagner–Nelson refuse the same points", () => {
    expect(codes(residualsMethod(levelsAt([4, 2])))).toEqual(["nca-points-few"]);
    expect(codes(residualsMethod(levelsAt([2, 2, 2])))).toEqual(["nca-levels-equal"]);
    expect(codes(residualsMethod(ORAL, { residual: [99] }))).toEqual(["nca-point-unknown"]);
    expect(codes(wagnerNelson(levelsAt([4, 2]), 0.1, "linear"))).toEqual(["nca-points-few"]);
    expect(codes(wagnerNelson(ORAL, 0, "linear"))).toEqual(["nca-rate-not-positive"]);
    expect(codes(wagnerNelson(ORAL, Number.NaN, "linear"))).toEqual(["nca-rate-not-positive"]);
    expect(codes(wagnerNelson(ORAL.slice(1), 0.1, "linear"))).toEqual(["nca-dose-level-missing"]);
  });

  it("a rate of what remains wants points with something remaining that falls", () => {
    const absorbed = wagnerNelson(ORAL, 0.1, "linear");
    if (!absorbed.ok) throw new Error("no fractions");
    expect(codes(wagnerNelsonRate(absorbed.value, 0.3, 0.6))).toEqual(["nca-remaining-few"]);
    expect(codes(wagnerNelsonRate(absorbed.value, 9, 24.3))).toEqual(["nca-remaining-none"]);
  });
});

it("whatever comes in: a reason with its sentence, or finite figures; never NaN, never a throw", () => {
  const wild = fc.oneof(
    fc.double(),
    fc.constantFrom(0, -0, 1, 1, 2, 3, 5e-324, 1e308, -1, Number.NaN, Infinity),
    fc.double({ min: 0, max: 50, noNaN: true }),
  );
  const calm = fc.double({ min: 0, max: 50, noNaN: true });
  const some = fc.oneof(
    fc.array(fc.record({ time: wild, value: wild }), { maxLength: 12 }),
    fc
      .array(fc.record({ time: calm, value: fc.oneof(calm, fc.constantFrom(0, 1, 5e-324, 1e300)) }), { maxLength: 12 })
      .map((points) => points.sort((a, b) => a.time - b.time)),
    fc
      .array(
        fc.record({
          step: fc.double({ min: 0.01, max: 9, noNaN: true }),
          fall: fc.double({ min: 0.3, max: 1.02, noNaN: true }),
        }),
        {
          minLength: 3,
          maxLength: 12,
        },
      )
      .map((steps) => {
        let [time, value] = [-steps[0]!.step, 20];
        return steps.map(({ step, fall }, i) => {
          time += step;
          value *= fall;
          return { time, value: i === 0 ? 0 : value };
        });
      }),
  );
  const choice = fc.oneof(fc.record({ from: wild, to: wild }), fc.array(fc.oneof(fc.nat(12), wild)));
  let read = 0;
  fc.assert(
    fc.property(
      some,
      fc.oneof(fc.constant(100), wild),
      fc.constantFrom("linear" as const, "linear-up-log-down" as const),
      fc.option(fc.oneof(calm, wild), { nil: undefined }),
      fc.option(choice, { nil: undefined }),
      wild,
      (points, dose, method, tau, terminal, ke) => {
        const picked = terminal === undefined ? {} : { terminal };
        const results: Result<object>[] = [
          noncompartmental(points, { dose, method, ...(tau === undefined ? {} : { tau }), ...picked }),
          residualsMethod(points, picked),
          wagnerNelson(points, ke, method),
        ];
        for (const result of results) {
          if (result.ok) read++;
          const issues = result.ok ? (result.value as { flags: readonly never[] }).flags : result.issues;
          for (const each of issues) expect(issueMessage(each)).toMatch(/^[A-Z0-9].*\.$/);
          if (result.ok) expect(JSON.stringify(result.value, numbersNamed)).not.toContain("BAD");
        }
      },
    ),
    { seed: 20263, numRuns: 3000 },
  );
  expect(read).toBeGreaterThan(500);
});

const numbersNamed = (_: string, value: unknown) =>
  typeof value === "number" && !Number.isFinite(value) ? "BAD" : value;

it("a sentence names a level in the unit shown, where one is", () => {
  const data = { value: 4.164, shownIn: { unit: "mmol/L", factor: 1 / 6.94 } };
  expect(issueMessage(issue("nca-levels-equal", data))).toBe(
    "All levels are 0.6 mmol/L: nothing falls, so there is no half-life.",
  );
});
