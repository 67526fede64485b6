import { describe, expect, test } from "vitest";
import {
  type Absorption,
  type KineticsParameter,
  kineticsParametersOf,
  type ModelDisposition,
  type ModelHistory,
  modelLevelsOfDraws,
  modelProfile,
  modelScaled,
  modelSensitivity,
} from "../../../../src/core/kinetics/index.ts";

const ONE = { kind: "one-compartment", clearance: 4.5, volume: 30 } as const;
const TWO = { kind: "two-compartment", clearance: 4.5, volume: 20, exchange: 8, peripheralVolume: 60 } as const;
const SATURABLE = { kind: "saturable", vmax: 40, km: 6, volume: 30 } as const;
const FIRST = { kind: "first-order", ka: 1 } as const;
const ZERO = { kind: "zero-order", duration: 6 } as const;
const LONG = { kind: "zero-order", duration: 15 } as const;
const MIXED_ZERO = { kind: "mixed", fastFraction: 0.4, fastKa: 1.5, slow: ZERO, slowLag: 1 } as const;
const MIXED_FIRST = {
  kind: "mixed",
  fastFraction: 0.3,
  fastKa: 2,
  slow: { kind: "first-order", ka: 0.09 },
  slowLag: 2,
} as const;

const KINDS: Record<string, readonly ModelDisposition[]> = {
  "one compartment": [ONE, { ...ONE, clearance: 2 }, { ...ONE, clearance: 6, volume: 40 }],
  // ka equal to ke, and alpha to ka.
  "one compartment, equal rates": [{ ...ONE, clearance: 30 }],
  "two compartments": [TWO, { ...TWO, clearance: 2 }, { ...TWO, volume: 30 }],
  "two compartments, next to no exchange": [{ ...TWO, exchange: 1e-4 }],
  saturable: [SATURABLE, { ...SATURABLE, vmax: 55 }, { ...SATURABLE, vmax: 70, km: 3 }],
};

const doses = (from: number, amounts: readonly number[]) =>
  amounts.map((amount, i) => ({ time: from + 12 * i, amount }));

function historyOf(dispositions: readonly ModelDisposition[], absorptions: readonly Absorption[]): ModelHistory {
  return {
    dispositions: dispositions.map((disposition, i) => ({
      from: i === 0 ? Number.NEGATIVE_INFINITY : 20 * i + 0.5,
      disposition,
    })),
    inputs: absorptions.map((absorption, i) => ({
      absorption,
      bioavailability: 0.9,
      lag: 0.25 * (i + 1),
      doses: doses(3 * i, [300, 200, 0, 500, 250]),
    })),
  };
}

const ABSORPTIONS: Record<string, readonly Absorption[]> = {
  "first-order": [FIRST],
  "zero-order": [ZERO],
  "zero-order longer than the interval": [LONG],
  "mixed, and another product": [MIXED_ZERO, MIXED_FIRST],
};

const CASES = Object.entries(KINDS).flatMap(([kind, dispositions]) =>
  Object.entries(ABSORPTIONS).map(
    ([name, absorptions]) => [`${kind}, ${name}`, historyOf(dispositions, absorptions)] as const,
  ),
);

/** Some before the first dose, some at an event, close ones after it, and late ones. */
const TIMES = [-1, 0.25, 0.3, 1, 2.5, 6, 6.25, 11, 12.25, 14, 20.5, 23, 30, 36.25, 38, 45, 50, 60, 80, 120];

const largest = (values: ArrayLike<number>) => Math.max(...Array.from(values, Math.abs));
const farthest = (a: ArrayLike<number>, b: ArrayLike<number>) =>
  Math.max(...Array.from(a, (value, i) => Math.abs(value - b[i]!)));

/** Richardson's extrapolation of central differences with steps h, 2h, 4h: error of order h⁶. */
function byDifferences(history: ModelHistory, name: KineticsParameter, times: readonly number[], h: number): number[] {
  const difference = (step: number) => {
    const up = modelProfile(modelScaled(history, [name], [step]), times);
    const down = modelProfile(modelScaled(history, [name], [-step]), times);
    return Array.from(up, (level, i) => (level - down[i]!) / (2 * step));
  };
  const [one, two, four] = [difference(h), difference(2 * h), difference(4 * h)];
  const first = one.map((value, i) => (4 * value - two[i]!) / 3);
  const second = two.map((value, i) => (4 * value - four[i]!) / 3);
  return first.map((value, i) => (16 * value - second[i]!) / 15);
}

describe("levels and their derivatives by every parameter", () => {
  test.each(CASES)("%s: levels are those of modelProfile, to 1e-9 of the largest", (_name, history) => {
    const expected = modelProfile(history, TIMES);
    const { levels } = modelSensitivity(history, TIMES, kineticsParametersOf(history));
    expect(farthest(levels, expected)).toBeLessThanOrEqual(1e-9 * largest(expected));
  });

  test.each(CASES)(
    "%s: derivatives are those of central differences at two steps, to 2e-8 of the largest",
    (_name, history) => {
      const names = kineticsParametersOf(history);
      const scale = largest(modelProfile(history, TIMES));
      // At the very end of a zero-order input the level has a corner in ka: differences straddle it.
      const times = TIMES.filter((time) => time !== 6.25);
      const { derivatives } = modelSensitivity(history, times, names);
      for (const [q, name] of names.entries()) {
        for (const h of [2e-3, 4e-3]) {
          const expected = byDifferences(history, name, times, h);
          expect(farthest(derivatives[q]!, expected), `${name}, step ${h}`).toBeLessThanOrEqual(2e-8 * scale);
        }
      }
    },
  );
});

const isLinear = (history: ModelHistory) => history.dispositions[0]!.disposition.kind !== "saturable";

describe("invariants", () => {
  test.each(CASES.filter(([, history]) => isLinear(history)))(
    "%s: by bioavailability the level itself; all volumes, flows and doses together: nothing, 1e-12",
    (_name, history) => {
      const names = kineticsParametersOf(history);
      const { levels, derivatives } = modelSensitivity(history, TIMES, names);
      const by = (name: KineticsParameter) => derivatives[names.indexOf(name)]!;
      expect(farthest(by("bioavailability"), levels)).toBeLessThanOrEqual(1e-12 * largest(levels));
      // Twice the body and twice the dose leave every level as it is.
      const sum = levels.map((_, i) =>
        names.filter((name) => name !== "ka").reduce((total, name) => total + derivatives[names.indexOf(name)]![i]!, 0),
      );
      expect(largest(sum)).toBeLessThanOrEqual(1e-12 * largest(levels));
    },
  );

  test("saturable: twice Vmax, volume and dose leave every level as it is, 1e-9", () => {
    for (const [, history] of CASES.filter(([, each]) => !isLinear(each))) {
      const { levels, derivatives } = modelSensitivity(history, TIMES, ["vmax", "volume", "bioavailability"]);
      const sum = levels.map((_, i) => derivatives.reduce((total, each) => total + each[i]!, 0));
      expect(largest(sum)).toBeLessThanOrEqual(1e-9 * largest(levels));
    }
  });

  test("names the kind has not, and names twice, are refused", () => {
    const history = historyOf([ONE], [FIRST]);
    expect(() => modelSensitivity(history, [1], ["vmax"])).toThrow(/names\[0\] is vmax/);
    expect(() => modelScaled(history, ["ka", "ka"], [0, 0])).toThrow(/names\[1\]/);
    expect(() => modelScaled(history, ["ka"], [Number.NaN])).toThrow(/eta\[0\]/);
  });
});

describe("levels of many patients", () => {
  const ETA = [
    [0.4, -0.8, 0, 1.1],
    [-0.3, 0.5, 0, 0.9],
    [0.7, -1.2, 0, 0.2],
  ].map((column) => Float64Array.from(column));

  test.each(CASES)(
    "%s: each is modelProfile of the scaled history, linear 1e-9, saturable 1e-6 of its largest",
    (_name, history) => {
      const names = kineticsParametersOf(history).slice(-3);
      const found = modelLevelsOfDraws(history, names, ETA, TIMES);
      for (let draw = 0; draw < 4; draw++) {
        const own = ETA.map((column) => column[draw]!);
        const expected = modelProfile(modelScaled(history, names, own), TIMES);
        const levels = found.map((each) => each[draw]!);
        expect(farthest(levels, expected)).toBeLessThanOrEqual((isLinear(history) ? 1e-9 : 1e-6) * largest(expected));
      }
    },
  );
});
