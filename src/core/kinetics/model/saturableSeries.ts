/** Terms of the power series. 20 to 26 cost about the same for a stretch; see tests/bench. */
const TERMS = 22;
/** What is cut off a series, as a part of the amount at stake. */
const CUT_OFF = 1e-17;

/** Elimination that saturates: rate = vmax·b/(half + b), b mg in the body. */
export interface Saturation {
  /** mg/h */
  readonly vmax: number;
  /** mg in the body at which half of vmax is eliminated: Km × volume. */
  readonly half: number;
}

/** mg/h that flow in: Σ ka·gut·e^(−ka·u) + rate. */
export interface SeriesInflow {
  readonly ka: readonly number[];
  readonly gut: readonly number[];
  readonly rate: number;
}

/**
 * A power series for the amount in the body that holds for a short time: b(u) = Σ bₖ·(u/unit)^k, and the same for the saturated part
 * e = b/(half + b) of vmax.
 */
export interface SaturableSeries {
  /** h */
  readonly unit: number;
  /** h for which it holds. */
  readonly length: number;
  readonly body: Float64Array;
  readonly saturated: Float64Array;
  /** half/(half + b) at the start: 1 − saturated[0] without the cancellation. */
  readonly free: number;
}

/**
 * The series from a given state.
 *
 * Formula, with x = u/unit: (half + b)·e = b gives eₖ = (bₖ − Σ_{j=1..k} bⱼ·e_{k−j})/(half + b₀); b′ = inflow − vmax·e gives
 * bₖ₊₁ = unit·(inflowₖ − vmax·eₖ)/(k + 1). The length is chosen so that each of the last three terms is below 1e-17 of the amount
 * at stake.
 * @param body mg, 0 or more
 * @param hours how long the inflow lasts at most, above 0
 * @returns see SaturableSeries
 * Accuracy: relative 1e-15 of the amount at stake, rounding included.
 * Source: power-series method for differential equations (standard), derived in docs/methods/saturable-elimination.md.
 */
export function saturableSeries(
  { vmax, half }: Saturation,
  body: number,
  inflow: SeriesInflow,
  hours: number,
): SaturableSeries {
  const { ka, gut, rate } = inflow;
  const linearRate = vmax / half;
  const unit = 1 / Math.max(linearRate, ...ka);
  const b = new Float64Array(TERMS + 1);
  const e = new Float64Array(TERMS + 1);
  const term = ka.map((k, i) => k * gut[i]!);
  const total = half + body;
  b[0] = body;
  e[0] = body / total;
  for (let k = 0; k < TERMS; k++) {
    let input = k === 0 ? rate : 0;
    for (let i = 0; i < ka.length; i++) {
      input += term[i]!;
      term[i] = (term[i]! * -ka[i]! * unit) / (k + 1);
    }
    b[k + 1] = (unit * (input - vmax * e[k]!)) / (k + 1);
    let sum = b[k + 1]!;
    for (let j = 1; j <= k + 1; j++) sum -= b[j]! * e[k + 1 - j]!;
    e[k + 1] = sum / total;
  }
  // What can be in the body at once: from a slow depot only what comes in about one time constant.
  let atStake = body + rate * Math.min(hours, 1 / linearRate);
  for (let i = 0; i < ka.length; i++) atStake += gut[i]! * Math.min(1, ka[i]! / linearRate);
  let x = Number.POSITIVE_INFINITY;
  for (let k = TERMS - 2; k <= TERMS; k++) {
    if (b[k] !== 0) x = Math.min(x, ((CUT_OFF * atStake) / Math.abs(b[k]!)) ** (1 / k));
  }
  return { unit, length: x * unit, body: b, saturated: e, free: half / total };
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

/** The coefficients of (half/(half + b))². */
export function seriesFreeSquared({ saturated, free }: SaturableSeries): Float64Array {
  const w = saturated.map((value) => -value);
  w[0] = free;
  const square = new Float64Array(TERMS + 1);
  for (let k = 0; k <= TERMS; k++) {
    let sum = 0;
    for (let j = 0; j <= k; j++) sum += w[j]! * w[k - j]!;
    square[k] = sum;
  }
  return square;
}
