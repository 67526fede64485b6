import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { type ModelDisposition, type ModelInput, modelProfile } from "../../src/core/kinetics/index.ts";

/**
 * Reference levels of tests/fixtures/ode_public.json: closed forms and a Taylor integrator in 50-digit arithmetic (mpmath), each
 * checked there against two other integrators. Its `generator` and `formula` say how.
 */
interface Case {
  id: string;
  model: string;
  inputs: Record<string, string> & { doses: { t_h: string; dose_mg: string }[] };
  points: { t_h: string; C: string }[];
}

const { cases } = JSON.parse(readFileSync(new URL("../fixtures/ode_public.json", import.meta.url), "utf8")) as {
  cases: Case[];
};

/**
 * Of the largest level listed. What was asked for is 1e-12 for the linear models and 1e-8 for saturable elimination; reached is
 * 5e-16, and the bar stands close above that.
 */
const BAR = 1e-15;

function modelOf({ model, inputs }: Case): { disposition: ModelDisposition; input: ModelInput } {
  const figure = (name: string) => {
    const text = inputs[name];
    if (text === undefined) throw new Error(`no ${name}`);
    return Number(text);
  };
  const doses = inputs.doses.map(({ t_h, dose_mg }) => ({ time: Number(t_h), amount: Number(dose_mg) }));
  const product = { bioavailability: figure("F"), lag: figure("tlag_h"), doses };
  const firstOrder = () => ({ kind: "first-order", ka: figure("ka_per_h") }) as const;
  switch (model) {
    case "two-compartment oral":
      return {
        disposition: {
          kind: "two-compartment",
          clearance: figure("CL_L_per_h"),
          volume: figure("V1_L"),
          exchange: figure("Q_L_per_h"),
          peripheralVolume: figure("V2_L"),
        },
        input: { absorption: firstOrder(), ...product },
      };
    case "one-compartment, zero-order absorption":
      return {
        disposition: { kind: "one-compartment", clearance: figure("CL_L_per_h"), volume: figure("V_L") },
        input: { absorption: { kind: "zero-order", duration: figure("Tk0_h") }, ...product },
      };
    case "one-compartment, first-order absorption, Michaelis-Menten elimination":
      return {
        disposition: {
          kind: "saturable",
          vmax: figure("Vmax_mg_per_h"),
          km: figure("Km_mg_per_L"),
          volume: figure("V_L"),
        },
        input: { absorption: firstOrder(), ...product },
      };
    default:
      throw new Error(`unknown model ${model}`);
  }
}

/** Largest error of the levels, as a part of the largest level listed. */
function errorOf(one: Case): number {
  const { disposition, input } = modelOf(one);
  const expected = one.points.map(({ C }) => Number(C));
  const levels = modelProfile(
    { dispositions: [{ from: -Infinity, disposition }], inputs: [input] },
    one.points.map(({ t_h }) => Number(t_h)),
  );
  return Math.max(...expected.map((level, i) => Math.abs(levels[i]! - level))) / Math.max(...expected);
}

describe("levels of models beyond first-order, one-compartment: 50-digit references", () => {
  test("15 cases, five of each model", () => {
    expect(cases).toHaveLength(15);
    expect(new Set(cases.map(({ model }) => model)).size).toBe(3);
  });

  test.each(cases.map((one) => [one.id, one] as const))("%s", (_id, one) => {
    expect(errorOf(one)).toBeLessThanOrEqual(BAR);
  });
});
