import type { Absorption, FirstOrderAbsorption, ModelInput, ZeroOrderAbsorption } from "./absorption.ts";
import type { KineticsParameter } from "./kineticsParameter.ts";
import { kineticsEtaCheck, kineticsParametersCheck } from "./kineticsParameterNames.ts";
import type { ModelDisposition, ModelHistory } from "./modelHistory.ts";

function releaseFaster<R extends FirstOrderAbsorption | ZeroOrderAbsorption>(release: R, factor: number): R {
  return release.kind === "first-order"
    ? { ...release, ka: release.ka * factor }
    : { ...release, duration: release.duration / factor };
}

function absorptionFaster(absorption: Absorption, factor: number): Absorption {
  if (absorption.kind !== "mixed") return releaseFaster(absorption, factor);
  const { fastKa, slow } = absorption;
  return { ...absorption, fastKa: fastKa * factor, slow: releaseFaster(slow, factor) };
}

/** A disposition with each figure times the factor named like it. */
function dispositionScaled(disposition: ModelDisposition, factors: ReadonlyMap<string, number>): ModelDisposition {
  const figures = Object.entries(disposition).map(([name, value]) => [
    name,
    typeof value === "number" ? value * (factors.get(name) ?? 1) : value,
  ]);
  return Object.fromEntries(figures) as ModelDisposition;
}

/**
 * The history of an individual: the typical patient's with each named parameter times e^η.
 *
 * Formula: figures of every disposition × e^η; `ka`: every first-order rate × e^η, every zero-order duration ÷ e^η, lags as they are;
 * `bioavailability`: every dose × e^η, so that more than 1 times the typical is possible.
 * @param history see ModelHistory
 * @param names see KineticsParameter; each once
 * @param eta one a name, finite
 * @returns a history of the same kind
 * Outside: a name the kind has not, and bad arguments, throw RangeError; a figure scaled out of range is refused where the history is
 * used.
 * Accuracy: to rounding.
 * Source: defined here, docs/methods/levels-to-this-patient.md.
 * @example modelScaled({ dispositions: [{ from: -Infinity, disposition: { kind: "one-compartment", clearance: 3, volume: 30 } }],
 *   inputs: [] }, ["clearance"], [Math.LN2]).dispositions[0] // { from: -Infinity, disposition: { …, clearance: 6, volume: 30 } }
 */
export function modelScaled(
  history: ModelHistory,
  names: readonly KineticsParameter[],
  eta: ArrayLike<number>,
): ModelHistory {
  kineticsParametersCheck(history, names);
  kineticsEtaCheck(names, eta);
  const factors = new Map<string, number>(names.map((name, i) => [name, Math.exp(eta[i]!)]));
  const faster = factors.get("ka") ?? 1;
  const more = factors.get("bioavailability") ?? 1;
  const inputs = history.inputs.map(
    (input): ModelInput => ({
      ...input,
      absorption: faster === 1 ? input.absorption : absorptionFaster(input.absorption, faster),
      doses: more === 1 ? input.doses : input.doses.map(({ time, amount }) => ({ time, amount: amount * more })),
    }),
  );
  return {
    dispositions: history.dispositions.map(({ from, disposition }) => ({
      from,
      disposition: dispositionScaled(disposition, factors),
    })),
    inputs,
  };
}
