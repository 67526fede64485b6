import { decay, decayIntegral, expm1Excess, passedTwoSteps } from "../numerics/index.ts";
import { argumentInterval, argumentNotNegative } from "./argumentCheck.ts";
import { type OralKinetics, oralKineticsCheck } from "./oralKinetics.ts";
import { steadyStatePart } from "./steadyStateConcentration.ts";

export interface SteadyState {
  /** mg/L */
  peak: number;
  /** h since the administration, in [0, interval). */
  timeOfPeak: number;
  /** The lowest level, mg/L: at the instant absorption of the next dose begins (s = lag). */
  trough: number;
  /** mg/L */
  average: number;
  /** Over one interval, mg·h/L. */
  auc: number;
  /** AUC over one interval at steady state / AUC over the first interval. */
  accumulation: number;
  /** (peak − trough)/trough */
  swing: number;
  /** (peak − trough)/average */
  fluctuation: number;
}

/** Below this slow rate × interval, peak − trough is computed without subtracting them. */
const SLOW_BELOW = 5;

/** 1 − x/(e^x − 1), x >= 0. */
function shortfall(x: number): number {
  const excess = expm1Excess(x);
  return excess === Infinity ? 1 : excess / (1 + excess);
}

/** Time from the start of absorption to the peak, h. */
function steadyPeakTime(slow: number, fast: number, interval: number): number {
  const gap = fast - slow;
  const first = shortfall(slow * interval);
  // ln[K(1 − e^(−kτ)) / (k(1 − e^(−Kτ)))]/Δ with the ratio written as 1/(1 − Δ·z); z sums positive terms.
  const z = (first + (1 - first) * -expm1Excess(-gap * interval)) / fast;
  const y = gap * z;
  if (y < Number.EPSILON / 4) return z;
  if (y < 0.5) return -Math.log1p(-y) / gap;
  return Math.log(decayIntegral(slow, interval) / decayIntegral(fast, interval)) / gap;
}

/** Peak − trough of steadyStatePart, without the factor ka, for a slow decay (slow·interval < 5), as a sum of positive terms. */
function steadyAmplitude(slow: number, fast: number, interval: number, u: number): number {
  const gap = fast - slow;
  const meanToPeak = 1 + expm1Excess(-gap * u);
  const meanToEnd = 1 + expm1Excess(-gap * interval);
  const fall = gap * interval < 1 ? expm1Excess(-gap * u) - expm1Excess(-gap * interval) : meanToPeak - meanToEnd;
  const excess = expm1Excess(slow * interval);
  const bend = (excess - expm1Excess(slow * u)) / (1 + excess);
  return ((decay(slow, u) * u) / -Math.expm1(-fast * interval)) * (fall + meanToEnd * bend);
}

/**
 * The readings of equal doses at equal intervals, taken for ever.
 *
 * Formula: peak = Css at u* = ln[K(1 − e^(−kτ))/(k(1 − e^(−Kτ)))]/(K − k) after absorption begins, k = min(ka, ke),
 * K = max(ka, ke); trough = Css at u = 0; average = F·D/(ke·V·τ); auc = F·D/(ke·V);
 * accumulation = auc/AUC(0→τ) of the first dose; swing and fluctuation as in SteadyState. For k·τ < 5 peak − trough is
 * computed as a sum of positive terms, so that a nearly flat curve keeps its digits.
 * @param kinetics see OralKinetics
 * @param amount mg, 0 or more
 * @param interval τ, h, above 0
 * @returns see SteadyState; the ratios do not depend on the amount and are those of any dose when it is 0
 * Outside: a lag as long as the interval leaves the first interval empty: accumulation is then Infinity. A trough below the
 * smallest double gives a swing of Infinity. Bad arguments throw RangeError.
 * Accuracy: relative 5e-15 (tests/core/kinetics/gridSteadyState.test.ts).
 * Source: standard result, derived in docs/methods/one-compartment-oral.md.
 * @example steadyState({ ka: 1, ke: Math.LN2 / 6, volume: 30, bioavailability: 1, lag: 0 }, 624, 12).peak // 21.7216554708148
 */
export function steadyState(kinetics: OralKinetics, amount: number, interval: number): SteadyState {
  oralKineticsCheck(kinetics);
  argumentNotNegative("amount", amount, "mg");
  argumentInterval("interval", interval, kinetics.ka);
  argumentInterval("interval", interval, kinetics.ke);
  const { ka, ke, volume, bioavailability, lag } = kinetics;
  const slow = Math.min(ka, ke);
  const fast = Math.max(ka, ke);
  const top = steadyPeakTime(slow, fast, interval);
  const peakPart = steadyStatePart(ka, ke, interval, top, interval - top);
  const troughPart = steadyStatePart(ka, ke, interval, 0, interval);
  const isSlow = slow * interval < SLOW_BELOW;
  const amplitude = isSlow ? ka * steadyAmplitude(slow, fast, interval, top) : peakPart - troughPart;
  const dosed = bioavailability * amount;
  const first = interval - lag;
  // From the start of absorption to the next administration; `%` is exact.
  const toNext = interval - (lag % interval);
  return {
    peak: (dosed * peakPart) / volume,
    timeOfPeak: top < toNext ? interval - toNext + top : top - toNext,
    trough: (dosed * troughPart) / volume,
    average: dosed / ke / volume / interval,
    auc: dosed / ke / volume,
    accumulation: first > 0 ? 1 / passedTwoSteps(ka, ke, first) : Infinity,
    swing: amplitude / troughPart,
    fluctuation: amplitude * (ke * interval),
  };
}
