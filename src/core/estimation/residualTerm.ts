import { normalLogCdf, normalLogCdfSlope } from "../numerics/index.ts";
import type { EstimationLevel, Residual, ResidualModel } from "./estimationTypes.ts";

/** Degrees of freedom of the robust residuals. */
export const ROBUST_DEGREES = 4;

/** What one level adds to the objective, and how that answers to the prediction. */
export interface ResidualTerm {
  value: number;
  /** d value/d prediction, L/mg. */
  slope: number;
  /** Expected second derivative, 0 or more, (L/mg)². */
  curvature: number;
}

/** mg/L: s = √(a² + (b·f)²). */
export function residualSd({ additive, proportional }: Residual, prediction: number): number {
  return Math.hypot(additive, proportional * prediction);
}

/**
 * ln of the probability that a Student residual with 4 degrees of freedom is below z, and its derivative by z.
 *
 * Formula: with s = z/√(z² + 4), P = (1 + s)²·(2 − s)/4, and 1 + s = 4/((z² + 4)·(1 − s)) below 0: nothing cancels in the tail.
 * Density: 3/8·(1 + z²/4)^(−5/2).
 */
export function robustLogCdf(z: number): { value: number; slope: number } {
  const size = Math.hypot(z, 2);
  const s = z / size;
  const above = z < 0 ? ((2 / size) * (2 / size)) / (1 - s) : 1 + s;
  const value = 2 * Math.log(above) + Math.log((2 - s) / 4);
  const lnDensity = Math.log(3 / 8) + 5 * Math.log(2 / size);
  return { value, slope: Math.exp(lnDensity - value) };
}

export const robustCdf = (z: number) => Math.exp(robustLogCdf(z).value);
export const robustDensity = (z: number) => (3 / 8) * (1 + (z * z) / 4) ** -2.5;

function normalLog(z: number): { value: number; slope: number } {
  return { value: normalLogCdf(z), slope: normalLogCdfSlope(z) };
}

/**
 * What one level adds to the objective at a prediction f.
 *
 * Formula, s² = a² + (b·f)², r = y − f: normal: r²/(2s²) + ln s. Robust (Student, 4 degrees of freedom, scale s):
 * 5/2·ln(1 + r²/(4s²)) + ln s. Both without the constant that no parameter touches, and ln s where r = 0. Below a limit:
 * −ln P((limit − f)/s), P the probability of the same residuals. The curvature is the expected one (of a level below the limit what is
 * left without the second derivative of (limit − f)/s): never negative.
 * @param level see EstimationLevel
 * @param prediction f, mg/L, 0 or more
 * @returns written into `out`; value Infinity where the level is impossible (no additive error and f = 0)
 * Accuracy: slope against central differences 1e-8 (tests/core/estimation/residualTerm.test.ts).
 * Source: normal and its expected curvature: standard; below the limit: Beal, Ways to fit a PK model with some data below the
 * quantification limit, J Pharmacokinet Pharmacodyn 2001;28:481–504, method M3; robust: Lange, Little & Taylor, Robust statistical
 * modeling using the t distribution, J Am Stat Assoc 1989;84:881–896 (both from memory, unverified).
 */
export function residualTerm(
  level: EstimationLevel,
  prediction: number,
  residual: Residual,
  model: ResidualModel,
  out: ResidualTerm,
): void {
  const { additive, proportional } = residual;
  const variance = additive * additive + proportional * proportional * (prediction * prediction);
  const s = Math.sqrt(variance);
  if (!(variance > 0 && variance < Infinity)) {
    out.value = Number.POSITIVE_INFINITY;
    out.slope = 0;
    out.curvature = 0;
    return;
  }
  /** d ln s/df. */
  const widening = (proportional * (proportional * prediction)) / variance;
  if (level.kind === "below-limit") {
    const z = (level.value - prediction) / s;
    const byPrediction = -1 / s - z * widening;
    const { value, slope } = model === "normal" ? normalLog(z) : robustLogCdf(z);
    out.value = -value;
    out.slope = -slope * byPrediction;
    const bend = model === "normal" ? slope * (z + slope) : slope * ((5 * z) / (4 + z * z) + slope);
    out.curvature = Math.max(0, bend) * byPrediction * byPrediction;
    return;
  }
  const z = (level.value - prediction) / s;
  // d(z²/2)/df = −z/s − z²·widening
  if (model === "normal") {
    out.value = (z * z) / 2 + Math.log(s);
    out.slope = -z / s - z * z * widening + widening;
    out.curvature = 1 / variance + 2 * widening * widening;
    return;
  }
  const share = 5 / (4 + z * z);
  out.value = 2.5 * Math.log1p((z * z) / 4) + Math.log(s);
  out.slope = share * (-z / s - z * z * widening) + widening;
  // Expected curvatures of location and scale of a Student density: (ν + 1)/(ν + 3) and 2ν/(ν + 3).
  out.curvature = 5 / 7 / variance + (8 / 7) * widening * widening;
}
