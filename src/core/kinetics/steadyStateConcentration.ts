import { decay, decayIntegral } from "../numerics/index.ts";
import { argumentInterval, argumentNotNegative, argumentRefuse } from "./argumentCheck.ts";
import { type OralKinetics, oralKineticsCheck } from "./oralKinetics.ts";

/**
 * The steady-state amount in the body for F·D = 1, u h after absorption of a dose began; `rest` is interval − u, given
 * apart because the caller has it more exactly.
 */
export function steadyStatePart(ka: number, ke: number, interval: number, u: number, rest: number): number {
  const slow = Math.min(ka, ke);
  const fast = Math.max(ka, ke);
  const gap = fast - slow;
  const shape =
    decay(slow, u) * decayIntegral(gap, u) + decay(fast, u) * decay(slow, interval) * decayIntegral(gap, rest);
  return (ka * shape) / -Math.expm1(-fast * interval) / -Math.expm1(-slow * interval);
}

/**
 * The level s hours after a dose when equal doses have been taken for ever.
 *
 * Formula, with u = s − lag (plus whole intervals until it lies in [0, interval]), k = min(ka, ke), K = max(ka, ke),
 * ψ(x) = (1 − e^(−(K−k)·x))/(K − k):
 * Css = F·D·ka/V · [e^(−k·u)·ψ(u) + e^(−K·u − k·τ)·ψ(τ − u)] / [(1 − e^(−K·τ))·(1 − e^(−k·τ))]. Every term is positive.
 * @param kinetics see OralKinetics
 * @param amount mg, 0 or more
 * @param interval τ, h, above 0
 * @param s h since the last administration, 0 to interval
 * @returns mg/L
 * Outside: bad arguments throw RangeError.
 * Accuracy: relative 5e-15 wherever the result is a normal double (tests/core/kinetics/gridSteadyState.test.ts).
 * Source: standard result, derived in docs/methods/one-compartment-oral.md.
 * @example steadyStateConcentration({ ka: 1, ke: Math.LN2 / 6, volume: 30, bioavailability: 1, lag: 0 }, 624, 12, 0)
 * // 7.838776505201096
 */
export function steadyStateConcentration(kinetics: OralKinetics, amount: number, interval: number, s: number): number {
  oralKineticsCheck(kinetics);
  argumentNotNegative("amount", amount, "mg");
  argumentInterval("interval", interval, kinetics.ka);
  argumentInterval("interval", interval, kinetics.ke);
  if (!(s >= 0 && s <= interval)) argumentRefuse("s", s, "h", `0 to the interval, ${interval} h`);
  const { ka, ke, volume, bioavailability, lag } = kinetics;
  const available = bioavailability * amount;
  if (available === 0) return 0;
  // `%` is exact, so only one subtraction is rounded either way.
  const shift = lag % interval;
  const u = s >= shift ? s - shift : interval - (shift - s);
  const rest = s >= shift ? interval - u : shift - s;
  return (available * steadyStatePart(ka, ke, interval, u, rest)) / volume;
}
