import type { EstimationProblem } from "../../../src/core/estimation/index.ts";
import {
  type KineticsParameter,
  type ModelDisposition,
  modelProfile,
  modelScaled,
} from "../../../src/core/kinetics/index.ts";

export const ONE = { kind: "one-compartment", clearance: 4.5, volume: 30 } as const;
export const TWO = { kind: "two-compartment", clearance: 4.5, volume: 20, exchange: 8, peripheralVolume: 60 } as const;
export const SATURABLE = { kind: "saturable", vmax: 40, km: 6, volume: 30 } as const;

const NAMES: Record<ModelDisposition["kind"], readonly KineticsParameter[]> = {
  "one-compartment": ["clearance", "volume", "ka"],
  "two-compartment": ["clearance", "volume", "exchange", "peripheralVolume", "ka", "bioavailability"],
  saturable: ["vmax", "km", "volume", "ka"],
};

/** Eight doses of 300 mg every 12 h; every parameter of the kind differs between patients. */
export function problemOf(
  disposition: ModelDisposition,
  levels: readonly (readonly [time: number, value: number, kind?: "below-limit"])[],
  change: Partial<EstimationProblem> = {},
): EstimationProblem {
  return {
    history: {
      dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition }],
      inputs: [
        {
          absorption: { kind: "first-order", ka: 1.1 },
          bioavailability: 0.9,
          lag: 0.25,
          doses: Array.from({ length: 8 }, (_, i) => ({ time: 12 * i, amount: 300 })),
        },
      ],
    },
    random: NAMES[disposition.kind].map((name, i) => ({ name, omega: 0.3 + 0.05 * i })),
    residual: { additive: 0.2, proportional: 0.1 },
    levels: levels.map(([time, value, kind]) => ({ time, value, kind: kind ?? "measured" })),
    residualModel: "normal",
    ...change,
  };
}

/** The levels of a patient with these η, exactly. */
export function levelsAt(problem: EstimationProblem, eta: readonly number[], times: readonly number[]): number[] {
  const names = problem.random.map(({ name }) => name);
  return [...modelProfile(modelScaled(problem.history, names, eta), times)];
}
