import type { Posterior } from "../estimation/index.ts";
import type { FitProblem } from "./fitProblem.ts";
import type { FlipFlopFinding } from "./fitTypes.ts";
import { spreadOf } from "./spreadOf.ts";

type Drawn = Extract<Posterior, { status: "drawn" }>;

/** A side of which at least this share of the draws lies on is not ruled out. Common practice: one in twenty. */
const NOT_RULED_OUT = 0.05;

/**
 * Whether the levels tell absorption from elimination. Only where one first-order rate meets one compartment do the two readings give the
 * same curve; elsewhere null.
 */
export function flipFlopFinding({ history, parameters }: FitProblem, posterior: Drawn): FlipFlopFinding | null {
  const disposition = history.dispositions.at(-1)!.disposition;
  const [input, ...others] = history.inputs;
  if (disposition.kind !== "one-compartment" || !input || others.length > 0) return null;
  if (input.absorption.kind !== "first-order") return null;
  const typical = { ka: input.absorption.ka, clearance: disposition.clearance, volume: disposition.volume };
  const { weights } = posterior;
  const drawn = (name: keyof typeof typical): Float64Array => {
    const at = parameters.findIndex((parameter) => parameter.name === name);
    const etas = at < 0 ? undefined : posterior.eta[at]!;
    return Float64Array.from(weights, (_, i) => typical[name] * Math.exp(etas?.[i] ?? 0));
  };
  const ka = drawn("ka");
  const volume = drawn("volume");
  const clearance = drawn("clearance");
  const ke = clearance.map((each, i) => each / volume[i]!);
  const isSlow = Array.from(ka, (each, i) => each < ke[i]!);
  let shareSlow = 0;
  for (const [i, slow] of isSlow.entries()) if (slow) shareSlow += weights[i]!;
  const side = (slow: boolean, share: number) => {
    if (share < NOT_RULED_OUT) return null;
    const within = weights.map((weight, i) => (isSlow[i] === slow ? weight / share : 0));
    const middle = (values: Float64Array) => spreadOf(values, within).q50;
    return { ka: middle(ka), ke: middle(ke), volume: middle(volume) };
  };
  return {
    shareSlowAbsorption: shareSlow,
    isAmbiguous: shareSlow >= NOT_RULED_OUT && shareSlow <= 1 - NOT_RULED_OUT,
    fastAbsorption: side(false, 1 - shareSlow),
    slowAbsorption: side(true, shareSlow),
  };
}
