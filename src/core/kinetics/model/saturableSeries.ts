import { type Inflow, inflowAt } from "./stretch.ts";

/** Terms of the power series. 20 to 26 cost about the same for a stretch; see tests/bench. */
const TERMS = 22;
/** What is cut off a series, as a part of the amount at stake, or of the capacity that is free. */
const CUT_OFF = 1e-17;
/** A depot with less than this part of it is left out: a fast one that is all but empty would else dictate the unit of time. */
const LEFT_OUT_BELOW = 1e-25;

/** Elimination that saturates: rate = vmax·b/(half + b), b mg in the body. */
export interface Saturation {
  /** mg/h */
  readonly vmax: number;
  /** mg in the body at which half of vmax is eliminated: Km × volume. */
  readonly half: number;
}

/**
 * Power series that hold for a short time: the amount in the body b(u) = Σ bₖ·(u/unit)^k, the part of vmax that is free,
 * half/(half + b), and the part that is used, b/(half + b).
 */
export interface SaturableSeries {
  /** h */
  readonly unit: number;
  /** h for which they hold. */
  readonly length: number;
  readonly body: Float64Array;
  readonly free: Float64Array;
  /** −free but for the leading term, which is given for itself because 1 − free would cancel. */
  readonly used: Float64Array;
}

/**
 * The series from a given state.
 *
 * Formula, with x = u/unit: (half + b)·free = half gives freeₖ = −Σ_{j=1..k} bⱼ·free_{k−j}/(half + b₀); usedₖ = −freeₖ for k > 0;
 * b′ = inflow − vmax·used gives bₖ₊₁ = unit·(inflowₖ − vmax·usedₖ)/(k + 1). The length is chosen so that each of the last three terms
 * is below 1e-17 of the amount at stake, and of the free part.
 * @param body mg, 0 or more
 * @param hours how long the inflow lasts at most, 0 or more
 * @returns see SaturableSeries
 * Accuracy: relative 1e-15 of the amount at stake, rounding included.
 * Source: power-series method for differential equations (standard), derived in docs/methods/saturable-elimination.md.
 */
export function saturableSeries(
  { vmax, half }: Saturation,
  body: number,
  inflow: Inflow,
  hours: number,
): SaturableSeries {
  const { rate } = inflow;
  const linearRate = vmax / half;
  // What can be in the body at once: from a slow depot only what comes in about one time constant.
  let atStake = body + rate * Math.min(hours, 1 / linearRate);
  for (const [i, k] of inflow.ka.entries()) atStake += inflow.gut[i]! * Math.min(1, k / linearRate);
  const isIn = (_: unknown, i: number) => inflow.gut[i]! > LEFT_OUT_BELOW * atStake;
  const ka = inflow.ka.filter(isIn);
  const gut = inflow.gut.filter(isIn);
  const total = half + body;
  // About the time in which anything changes: the coefficients then neither over- nor underflow.
  const unit = 1 / Math.max(vmax / total, inflowAt({ ka, gut, rate }, 0) / total, ...ka);
  const b = new Float64Array(TERMS + 1);
  const free = new Float64Array(TERMS + 1);
  const term = ka.map((k, i) => k * gut[i]!);
  b[0] = body;
  free[0] = half / total;
  let used = body / total;
  for (let k = 0; k < TERMS; k++) {
    let input = k === 0 ? rate : 0;
    for (let i = 0; i < ka.length; i++) {
      input += term[i]!;
      term[i] = (term[i]! * -ka[i]! * unit) / (k + 1);
    }
    b[k + 1] = (unit * (input - vmax * used)) / (k + 1);
    let sum = 0;
    for (let j = 1; j <= k + 1; j++) sum += b[j]! * free[k + 1 - j]!;
    used = sum / total;
    free[k + 1] = -used;
  }
  let x = Number.POSITIVE_INFINITY;
  for (let k = TERMS - 2; k <= TERMS; k++) {
    if (b[k] !== 0) x = Math.min(x, ((CUT_OFF * atStake) / Math.abs(b[k]!)) ** (1 / k));
    if (free[k] !== 0) x = Math.min(x, ((CUT_OFF * free[0]!) / Math.abs(free[k]!)) ** (1 / k));
  }
  const usedSeries = free.map((value) => -value);
  usedSeries[0] = body / total;
  return { unit, length: x * unit, body: b, free, used: usedSeries };
}

/** Σ cₖ·x^k. */
export function seriesAt(coefficients: Float64Array, x: number): number {
  let sum = 0;
  for (let k = TERMS; k >= 0; k--) sum = sum * x + coefficients[k]!;
  return sum;
}

/** ∫₀ˣ Σ cₖ·s^k ds. */
export function seriesArea(coefficients: Float64Array, x: number): number {
  let sum = 0;
  for (let k = TERMS; k >= 0; k--) sum = sum * x + coefficients[k]! / (k + 1);
  return sum * x;
}

/** The coefficients of the square of a series. */
export function seriesSquared(coefficients: Float64Array): Float64Array {
  const square = new Float64Array(TERMS + 1);
  for (let k = 0; k <= TERMS; k++) {
    let sum = 0;
    for (let j = 0; j <= k; j++) sum += coefficients[j]! * coefficients[k - j]!;
    square[k] = sum;
  }
  return square;
}
