import { describe, expect, it } from "vitest";
import type { AnalysisClock } from "../../../src/core/analysis/analysisClock.ts";
import { caseConcerns } from "../../../src/core/analysis/caseConcerns.ts";
import type { ConcernContext } from "../../../src/core/analysis/concernRule.ts";
import { derive } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { concernMessage, FIT_CONCERN_CODES } from "../../../src/core/messages/index.ts";
import { caseFixture } from "./caseFixture.ts";
import { fittedAnalysis, individualFit, levelFit, parameter, spread } from "./fitFixture.ts";

const level = (id: string, at: string, mgPerL: number, change: Partial<Case["levels"][number]> = {}) => ({
  id,
  at,
  quantity: { value: mgPerL, unit: "mg/L" as const },
  kind: "measured" as const,
  ...change,
});
const value = caseFixture({
  fit: { use: "individual", residualModel: "normal" },
  levels: [level("l", "2026-03-03T07:30:00+00:00", 6), level("m", "2026-03-04T07:30:00+00:00", 7)],
});
const analysis = fittedAnalysis(derive(value));
/** A context of a quiet fit: nothing to point out but what every case has. */
const quiet: ConcernContext = {
  case: value,
  clock: analysis.clock as unknown as AnalysisClock,
  patient: analysis.patient,
  model: analysis.typical,
  modelIssues: [],
  given: analysis.given,
  lineIssues: [],
  levels: analysis.levels,
  fit: {
    kind: "fitted",
    fit: individualFit({
      parameters: [parameter({ symbol: "CL", words: "Clearance" }), parameter({ symbol: "V", words: "Volume" })],
      // Short enough that the levels come after steady state.
      halfLife: { typical: 4, posterior: spread(4) },
    }),
  },
  options: analysis.options,
  crossCheck: null,
};
const fitted = quiet.fit as Extract<ConcernContext["fit"], { kind: "fitted" }>;
const withFit = (change: Parameters<typeof individualFit>[0]): ConcernContext => ({
  ...quiet,
  fit: { kind: "fitted", fit: { ...fitted.fit, ...change } },
});
/** Levels by hand, all used. */
const withLevels = (...levels: readonly Partial<ConcernContext["levels"][number]>[]): ConcernContext => {
  const made = levels.map((change, i) => ({
    ...quiet.levels[1]!,
    atH: quiet.levels[1]!.atH - 2 + i / 10,
    ...change,
    id: `x${i}`,
  }));
  return { ...withFit({ levelsUsed: made.map(({ id }) => id) }), levels: made };
};
const off = (standardised: number) => ({ fit: levelFit(6, { standardised }) });
const withOption = (change: (option: NonNullable<ConcernContext["options"][number]["individual"]>) => object) => ({
  ...quiet,
  options: quiet.options.map((option) => ({
    ...option,
    individual: { ...option.individual!, ...change(option.individual!) },
  })),
});
const chance = (above: number, below = 0) =>
  withOption(() => ({ steadyChance: { below, within: 1 - above - below, above } }));
const toxic = (share: number) => withOption(() => ({ toxicChance: share }));
const never = (share: number) =>
  withOption((found) => ({ shareNeverSteady: share, steadyState: share > 0.05 ? null : found.steadyState }));
const ambiguous = (isAmbiguous: boolean) =>
  withFit({
    flipFlop: {
      shareSlowAbsorption: 0.37,
      isAmbiguous,
      fastAbsorption: { ka: 0.6, ke: 0.1, volume: 30 },
      slowAbsorption: { ka: 0.1, ke: 0.6, volume: 5 },
    },
  });
const changed = (from: number): ConcernContext => {
  const model = quiet.model!;
  const last = { ...model.dispositions[0]!, from };
  return { ...quiet, model: { ...model, dispositions: [...model.dispositions, last] } };
};
const lastGiven = quiet.given.filter((mark) => mark.countedMg > 0).at(-1)!;
const early = (afterDoseH: number) => ({ atH: lastGiven.atH + afterDoseH, afterDoseH });

/** For every concern about a fit: a context that raises it, and one as like it as can be that does not. */
const TABLE: readonly (readonly [code: string, raises: ConcernContext, doesNot: ConcernContext])[] = [
  ["levels-not-used", { ...quiet, fit: { kind: "none", reason: "no-variability" } }, quiet],
  [
    "levels-all-left-out",
    { ...quiet, fit: { kind: "none", reason: "all-left-out" } },
    { ...quiet, fit: { kind: "none", reason: "no-residual" } },
  ],
  ["fit-withheld", { ...quiet, fit: { kind: "withheld", reason: "draws-unreliable", data: { paretoK: 0.91 } } }, quiet],
  ["fit-set-aside", { ...quiet, case: { ...value, fit: { ...value.fit, use: "typical" } } }, quiet],
  ["level-out-of-range", withLevels({ measured: 401 }), withLevels({ measured: 399 })],
  ["level-residual", withLevels(off(2.01), off(0)), withLevels(off(1.99), off(0))],
  ["level-outlier", withLevels(off(2.01), off(0), off(-1)), withLevels(off(2.01), off(0))],
  [
    "level-outside-prior",
    withLevels({ fit: levelFit(6, { isOutsidePrior: true }) }),
    withLevels({ fit: levelFit(6, { isOutsidePrior: false }) }),
  ],
  [
    "forecast-missed",
    withLevels({ fit: levelFit(6, { forecast: { predictive: spread(3), levelsKnown: 1, held: false } }) }),
    withLevels({ fit: levelFit(6, { forecast: { predictive: spread(3), levelsKnown: 0, held: false } }) }),
  ],
  [
    "parameter-unusual",
    withFit({ parameters: [parameter({ symbol: "CL", words: "Clearance", omega: 0.3, eta: -0.601 })] }),
    withFit({ parameters: [parameter({ symbol: "CL", words: "Clearance", omega: 0.3, eta: -0.599 })] }),
  ],
  [
    "levels-taught-little",
    withFit({ parameters: [parameter({ symbol: "V", words: "Volume", taught: 0.19 })] }),
    withFit({ parameters: [parameter({ symbol: "V", words: "Volume", taught: 0.21 })] }),
  ],
  [
    "parameters-held",
    withFit({ parameters: [parameter({ symbol: "CL", words: "Clearance" })] }),
    withFit({
      parameters: [
        parameter({ symbol: "CL", words: "Clearance" }),
        parameter({ symbol: "V", words: "Volume" }),
        parameter({ symbol: "ka", words: "Absorption rate" }),
      ],
    }),
  ],
  [
    "one-level",
    withFit({ levelsUsed: ["m"], parameters: [parameter({ symbol: "V", words: "Volume", taught: 0.19 })] }),
    // What a level taught something of does not stay near the record's.
    withFit({ levelsUsed: ["m"], parameters: [parameter({ symbol: "V", words: "Volume", taught: 0.21 })] }),
  ],
  ["levels-absorption-only", withLevels(early(2), early(3)), withLevels(early(2), early(11.9))],
  [
    "levels-before-steady",
    withFit({ halfLife: { typical: 22, posterior: spread(22) } }),
    withFit({ halfLife: { typical: 6, posterior: spread(6) } }),
  ],
  ["flip-flop-ambiguous", ambiguous(true), ambiguous(false)],
  ["levels-below-limit", withLevels({ belowLimit: true }), withLevels({ belowLimit: false })],
  [
    "levels-within-error",
    withLevels({ measured: 6, assaySd: 0.6 }, { measured: 6.8, assaySd: 0.6 }),
    withLevels({ measured: 6, assaySd: 0.6 }, { measured: 6.9, assaySd: 0.6 }),
  ],
  ["levels-same-time", withLevels({ atH: 60 }, { atH: 60 }), withLevels({ atH: 60 }, { atH: 60.1 })],
  ["levels-before-change", changed(quiet.levels[0]!.atH + 1), changed(quiet.levels[0]!.atH)],
  ["option-chance-above", chance(0.25), chance(0.24)],
  ["option-chance-below", chance(0.1, 0.25), chance(0.1, 0.24)],
  ["option-chance-toxic", toxic(0.05), toxic(0.049)],
  ["never-steady-chance", never(0.17), never(0.05)],
];

const found = (context: ConcernContext, code: string) =>
  caseConcerns(context).filter((concern) => concern.code === code);

describe("concerns about the fit", () => {
  it.each(TABLE)("%s is raised where it should be and not where it should not", (code, raises, doesNot) => {
    expect(found(raises, code)).not.toEqual([]);
    expect(found(doesNot, code)).toEqual([]);
  });

  it("the table has every concern about a fit there is a sentence for", () => {
    expect(TABLE.map(([code]) => code).sort()).toEqual([...FIT_CONCERN_CODES].sort());
  });

  it.each(TABLE)("%s reads as whole sentences with nothing left open", (code, raises) => {
    for (const concern of found(raises, code)) {
      const { title, text } = concernMessage(concern);
      expect(`${title} ${text}`).not.toMatch(/undefined|NaN|null|\[object|Infinity/);
      expect(text).toMatch(/[.?]$/);
    }
  });

  it("a residual beyond 3 is grave where the errors are normal, and to be checked where they are robust", () => {
    const gravity = (z: number, residualModel: "normal" | "robust") => {
      const context = withLevels(off(z), off(0));
      const { fit } = context.fit as typeof fitted;
      return found({ ...context, fit: { kind: "fitted", fit: { ...fit, residualModel } } }, "level-residual")[0]!
        .gravity;
    };
    expect(gravity(-3.01, "normal")).toBe("stop");
    expect(gravity(-2.99, "normal")).toBe("check");
    expect(gravity(-3.01, "robust")).toBe("check");
  });

  it("where the order rests on this patient, the typical patient's place in the window is not held against an option", () => {
    const high = { ...quiet.options[0]!.typical!.steadyState!, peak: 40 };
    const options = quiet.options.map((option) => ({
      ...option,
      typical: { ...option.typical!, span: { ...option.typical!.span, peak: 40 }, steadyState: high },
    }));
    const codes = (use: "individual" | "typical", individual: (typeof options)[0]["individual"]) =>
      caseConcerns({
        ...quiet,
        case: { ...value, fit: { ...value.fit, use } },
        options: options.map((option) => ({ ...option, individual })),
      }).map((concern) => concern.code);
    const both = ["option-above-window", "option-toxic"];
    const own = options[0]!.individual;
    expect(codes("individual", own).filter((code) => both.includes(code))).toEqual([]);
    expect(codes("typical", own)).toEqual(expect.arrayContaining(both));
    expect(codes("individual", null)).toEqual(expect.arrayContaining(both));
  });

  it("the typical patient is named where the figure is its own although there is a fit, and only there", () => {
    const steady = { ...quiet.options[0]!.typical!.steadyState!, peak: 40 };
    const options = quiet.options.map((option) => ({
      ...option,
      typical: { ...option.typical!, steadyState: steady },
    }));
    const titles = (fit: ConcernContext["fit"]) => {
      const context = { ...quiet, case: { ...value, fit: { ...value.fit, use: "typical" as const } }, options, fit };
      return ["option-toxic", "option-above-window"].map((code) => {
        const [one] = found(context, code);
        const { title, text } = concernMessage(one!);
        return [title.includes(" in the typical patient"), text.includes(" in the typical patient")];
      });
    };
    expect(titles(quiet.fit)).toEqual([
      [true, true],
      [true, true],
    ]);
    expect(titles({ kind: "none", reason: "no-levels" })).toEqual([
      [false, false],
      [false, false],
    ]);
  });

  it("says how likely the toxic limit is reached: may, is likely to, almost certainly", () => {
    const words = (share: number) => concernMessage(found(toxic(share), "option-chance-toxic")[0]!);
    expect([0.1, 0.49, 0.5, 0.94, 0.95, 1].map((share) => words(share).title)).toEqual([
      "Option A may reach the toxic limit in this patient",
      "Option A may reach the toxic limit in this patient",
      "Option A is likely to reach the toxic limit in this patient",
      "Option A is likely to reach the toxic limit in this patient",
      "Option A almost certainly reaches the toxic limit in this patient",
      "Option A almost certainly reaches the toxic limit in this patient",
    ]);
    expect(words(0.43).text).toMatch(
      /^With a chance of 43\u00a0% the highest, over the span shown or at steady state, reaches the record's toxic limit/,
    );
    const settling = toxic(0.43).options.map((option) => ({
      ...option,
      individual: { ...option.individual!, shareNeverSteady: 0.17, steadyState: null },
    }));
    const { text } = concernMessage(found({ ...quiet, options: settling }, "option-chance-toxic")[0]!);
    expect(text).toMatch(/^With a chance of 43\u00a0%, levels that never settle \(17\u00a0%\) counted in, the highest/);
    expect(text).toContain("; median highest over the span shown ");
    // A full stop after the symbol of a unit is read as a digit: no sentence follows the last figure.
    expect(text).toMatch(/mg per L\.$/);
    expect([0.24, 0.25].map((share) => found(toxic(share), "option-chance-toxic")[0]!.gravity)).toEqual([
      "check",
      "stop",
    ]);
  });

  it("a level that may rise without end is said of this patient with its chance, and not of the typical one as if of this one", () => {
    const options = never(0.17).options.map((option) => ({
      ...option,
      typical: { ...option.typical!, steadyState: null, noSteadyState: "dose-rate-at-or-above-vmax" as const },
    }));
    const context: ConcernContext = { ...quiet, options };
    const own = found(context, "never-steady-chance")[0]!;
    expect(own.gravity).toBe("check");
    expect(concernMessage(own).title).toBe("Option A may never reach a steady state in this patient");
    expect(concernMessage(own).text).toMatch(
      /^With a chance of 17\u00a0% more is taken than this patient can ever eliminate/,
    );
    expect(found(context, "never-steady")).toEqual([]);
    const byTypical: ConcernContext = { ...context, case: { ...value, fit: { ...value.fit, use: "typical" } } };
    expect(concernMessage(found(byTypical, "never-steady")[0]!).title).toBe(
      "Option A never reaches a steady state in the typical patient",
    );
    expect(found(never(0.25), "never-steady-chance")[0]!.gravity).toBe("stop");
  });

  it("the half-lives of a flip-flop are the typical patient's, and said to be", () => {
    const readings = {
      assumed: { flipFlop: false, clearance: 2.92, volume: 31, eliminationHalfLife: 7.35, absorptionHalfLife: 2 },
      alternative: { flipFlop: true, clearance: 2.92, volume: 8, eliminationHalfLife: 2, absorptionHalfLife: 7.35 },
      reason: "rates-within-20-percent",
    };
    const model = {
      ...quiet.model!,
      products: quiet.model!.products.map((product) => ({ ...product, readings })),
    } as unknown as NonNullable<ConcernContext["model"]>;
    const text = (fit: ConcernContext["fit"]) => concernMessage(found({ ...quiet, model, fit }, "flip-flop")[0]!).text;
    expect(text(quiet.fit)).toContain("in the typical patient the model takes half-life 7.35 hours");
    expect(text({ kind: "none", reason: "no-levels" })).not.toContain("typical patient");
  });

  it("another option than the chosen one is pointed out only where it is likelier than not, and never as grave", () => {
    const other = (above: number) => {
      const context = chance(above);
      const options = value.options.map((option) => ({ ...option, chosen: false }));
      const chosen = { ...options[0]!, id: "B", chosen: true };
      return found({ ...context, case: { ...value, options: [...options, chosen] } }, "option-chance-above");
    };
    expect(other(0.49)).toEqual([]);
    expect(other(0.51).map(({ gravity }) => gravity)).toEqual(["check"]);
    expect(found(chance(0.51), "option-chance-above").map(({ gravity }) => gravity)).toEqual(["stop"]);
  });

  it("a lone outlier is said once, not twice", () => {
    const codes = caseConcerns(withLevels(off(4), off(0), off(0.5))).map((concern) => concern.code);
    expect(codes.filter((code) => code === "level-outlier" || code === "level-residual")).toEqual(["level-outlier"]);
  });

  it("nothing about a fit is said while it is being worked out", () => {
    const codes = caseConcerns({
      ...quiet,
      fit: { kind: "pending" },
      options: quiet.options.map((option) => ({ ...option, individual: null, band: null })),
    }).map((concern) => concern.code);
    expect(codes.filter((code) => FIT_CONCERN_CODES.includes(code))).toEqual([]);
  });

  it("with a fit the typical patient's misses are left to the prior predictive check", () => {
    const far = { ...quiet.levels[1]!, measured: 12, predicted: 6 };
    expect(found({ ...quiet, levels: [far] }, "level-far-off")).toEqual([]);
    expect(found({ ...quiet, levels: [{ ...far, fit: null }] }, "level-far-off")).toHaveLength(1);
  });
});
