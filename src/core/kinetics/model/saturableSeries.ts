import type { Inflow } from "./stretch.ts";

/** Terms of the power series: more cost more a piece and need fewer pieces; from 26 on a dosing interval costs about the same. */
const TERMS = 30;
/** What is cut off a series, as a part of the amount at stake, or of the capacity that is free. */
const CUT_OFF = 1e-16;
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
 * Power series that hold for a short time: the amount in the body b(u) = Σ bₖ·(u/unit)^k, and the part of vmax that is free,
 * half/(half + b). The part that is used is 1 − free: −freeₖ but for the leading term.
 */
export interface SaturableSeries {
  /** h */
  readonly unit: number;
  /** h for which they hold. */
  readonly length: number;
  readonly body: Float64Array;
  readonly free: Float64Array;
  /** b/(half + b) at the start; 1 − free would cancel. */
  readonly used: number;
}

/**
 * The series from a given state.
 *
 * Formula, with x = u/unit: (half + b)·free = half gives freeₖ = −Σ_{j=1..k} bⱼ·free_{k−j}/(half + b₀); usedₖ = −freeₖ for k > 0;
 * b′ = inflow − vmax·used gives bₖ₊₁ = unit·(inflowₖ − vmax·usedₖ)/(k + 1). The length is chosen so that each of the last three terms
 * is below 1e-16 of the amount at stake, and of the free part.
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
  for (let i = 0; i < inflow.ka.length; i++) atStake += inflow.gut[i]! * Math.min(1, inflow.ka[i]! / linearRate);
  const total = half + body;
  const ka: number[] = [];
  /** Of each depot, mg/h × unit^k/k!. */
  const term: number[] = [];
  let fastest = (vmax + rate) / total;
  for (let i = 0; i < inflow.ka.length; i++) {
    const amount = inflow.gut[i]!;
    if (!(amount > LEFT_OUT_BELOW * atStake)) continue;
    const k = inflow.ka[i]!;
    ka.push(k);
    term.push(k * amount);
    fastest = Math.max(fastest, k, (k * amount) / total);
  }
  // About the time in which anything changes: the coefficients then neither over- nor underflow.
  const unit = 1 / fastest;
  const b = new Float64Array(TERMS + 1);
  const free = new Float64Array(TERMS + 1);
  b[0] = body;
  free[0] = half / total;
  let used = body / total;
  for (let k = 1; k <= TERMS; k++) {
    let input = k === 1 ? rate : 0;
    for (let i = 0; i < ka.length; i++) {
      input += term[i]!;
      term[i] = (term[i]! * -ka[i]! * unit) / k;
    }
    b[k] = (unit * (input - vmax * used)) / k;
    let sum = 0;
    for (let j = 1; j <= k; j++) sum += b[j]! * free[k - j]!;
    used = sum / total;
    free[k] = -used;
  }
  const x = Math.min(seriesReach(b, CUT_OFF * atStake), seriesReach(free, CUT_OFF * free[0]!));
  return { unit, length: x * unit, body: b, free, used: body / total };
}

/** Up to which x each of the last three terms stays below a bound. */
function seriesReach(coefficients: Float64Array, bound: number): number {
  let x = Number.POSITIVE_INFINITY;
  for (let k = TERMS - 2; k <= TERMS; k++) {
    const size = Math.abs(coefficients[k]!);
    if (size > 0) x = Math.min(x, (bound / size) ** (1 / k));
  }
  return x;
}

/** Σ cₖ·x^k. */
export function seriesAt(coefficients: Float64Array, x: number): number {
  let sum = 0;
  for (let k = TERMS; k >= 0; k--) sum = sum * x + coefficients[k]!;
  return sum;
}

/** ∫₀ˣ Σ cₖ·s^k ds. */
export function seriesArea(coefficients: Float64Array, x: number): number {
  return x * (coefficients[0]! + seriesAreaRest(coefficients, x));
}

/** ∫₀ˣ of the part of vmax in use. */
export function seriesUsedArea({ free, used }: SaturableSeries, x: number): number {
  return x * (used - seriesAreaRest(free, x));
}

/** Σ_{k>0} cₖ·x^k/(k + 1). */
function seriesAreaRest(coefficients: Float64Array, x: number): number {
  let sum = 0;
  for (let k = TERMS; k > 0; k--) sum = (sum + coefficients[k]! / (k + 1)) * x;
  return sum;
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
