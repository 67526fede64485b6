import { decay, decayIntegral, passedTwoSteps, sumError } from "../numerics/index.ts";

/** Where φ changes form: within ±1 by expm1, beyond as a difference that loses less than a factor 2.2. */
const DIFFERENCE_ABOVE = 1;
/** Below it (1 − e^(−x))/x rounds to 1. */
const NEGLIGIBLE = 2 ** -53;
/** Below it a decay is carried as a small loss (expm1), above it as a factor. */
const CARRY_AS_LOSS_BELOW = 0.5;

/** ka·φ(u): the part of what is now in the gut that will be in the body `u` h on; d = ka − ke, left = e^(−ke·u). */
function absorbedPart(ka: number, d: number, u: number, left: number): number {
  const x = d * u;
  if (x > DIFFERENCE_ABOVE || x < -DIFFERENCE_ABOVE) return (ka / d) * (left - Math.exp(-ka * u));
  if (x > NEGLIGIBLE || x < -NEGLIGIBLE) return (ka / d) * (left * -Math.expm1(-x));
  return left * ka * u;
}

/**
 * The exact state of one body compartment fed by several gut compartments (one a product), and its exact propagator.
 *
 * Formula, over a gap u with no dose: gut_i(u) = G_i·e^(−ka_i·u);
 * body(u) = B·e^(−ke·u) + Σ G_i·ka_i·φ_i(u), φ_i(u) = (e^(−ke·u) − e^(−ka_i·u))/(ka_i − ke).
 * Amounts are carried as unrounded pairs, and a decay over a short gap as a small loss rather than a factor, so that the error
 * does not grow with the number of doses.
 * Units: rates 1/h, times h, amounts mg.
 * Accuracy: 5e-15 of the largest amount after any number of doses (tests/core/kinetics/historyProfile.test.ts).
 * Source: standard result, derived in docs/methods/one-compartment-oral.md.
 */
export class BodyState {
  readonly ke: number;
  readonly ka: Float64Array;
  /** mg open to absorption, by product. */
  readonly gut: Float64Array;
  body = 0;
  readonly #gap: Float64Array;
  readonly #gutRest: Float64Array;
  #bodyRest = 0;
  /** The last step taken, h, and what it does (see #stepSet). */
  #step = Number.NaN;
  #bodyKept = 1;
  #bodyLoss = 0;
  readonly #part: Float64Array;
  readonly #gutKept: Float64Array;
  readonly #gutLoss: Float64Array;

  constructor(ke: number, ka: ArrayLike<number>) {
    this.ke = ke;
    this.ka = Float64Array.from(ka);
    this.gut = new Float64Array(ka.length);
    this.#gutRest = new Float64Array(ka.length);
    this.#gap = this.ka.map((rate) => rate - ke);
    this.#part = new Float64Array(ka.length);
    this.#gutKept = new Float64Array(ka.length);
    this.#gutLoss = new Float64Array(ka.length);
  }

  /** Puts given amounts in place of the present ones. */
  set(body: number, gut: ArrayLike<number>): void {
    this.body = body;
    this.#bodyRest = 0;
    this.gut.set(gut);
    this.#gutRest.fill(0);
  }

  give(product: number, amountMg: number): void {
    this.#gutAdd(product, this.gut[product]!, this.#gutRest[product]!, amountMg);
  }

  /** Goes on by `u` h, 0 or more. */
  advance(u: number): void {
    if (!(u > 0)) return;
    // Regular dosing meets the same gap again and again: its exponentials are evaluated once.
    if (u !== this.#step) this.#stepSet(u);
    let absorbed = 0;
    for (let i = 0; i < this.ka.length; i++) {
      const amount = this.gut[i]!;
      const rest = this.#gutRest[i]!;
      const kept = this.#gutKept[i]!;
      const loss = this.#gutLoss[i]!;
      absorbed += amount * this.#part[i]!;
      this.#gutAdd(i, amount * kept, rest * (kept + loss), amount * loss);
    }
    const kept = this.#bodyKept;
    const loss = this.#bodyLoss;
    this.#bodyAdd(this.body * kept, this.#bodyRest * (kept + loss), this.body * loss + absorbed);
  }

  /** What a step of `u` h does: amount → amount·kept + amount·loss, the first product exact over a short step. */
  #stepSet(u: number): void {
    this.#step = u;
    const left = Math.exp(-this.ke * u);
    const isShort = this.ke * u < CARRY_AS_LOSS_BELOW;
    this.#bodyKept = isShort ? 1 : left;
    this.#bodyLoss = isShort ? Math.expm1(-this.ke * u) : 0;
    for (let i = 0; i < this.ka.length; i++) {
      const x = this.ka[i]! * u;
      this.#part[i] = absorbedPart(this.ka[i]!, this.#gap[i]!, u, left);
      this.#gutKept[i] = x < CARRY_AS_LOSS_BELOW ? 1 : Math.exp(-x);
      this.#gutLoss[i] = x < CARRY_AS_LOSS_BELOW ? Math.expm1(-x) : 0;
    }
  }

  /** mg in the body `u` h on. */
  bodyAt(u: number): number {
    const left = Math.exp(-this.ke * u);
    let body = this.body * left;
    for (let i = 0; i < this.ka.length; i++) body += this.gut[i]! * absorbedPart(this.ka[i]!, this.#gap[i]!, u, left);
    return body;
  }

  /**
   * Writes the levels at those times, from index `from` on, that are not after the instant `until` + `untilRest`.
   * The present state is that at the instant `at` + `atRest`. Gives the index after the last one written.
   */
  levelsInto(
    levels: Float64Array,
    times: Float64Array,
    from: number,
    at: number,
    atRest: number,
    until: number,
    untilRest: number,
    volume: number,
  ): number {
    let end = from;
    while (end < times.length && !(times[end]! - until - untilRest > 0)) end++;
    const done = this.ka.length === 1 ? this.#levelsOfOneProduct(levels, times, from, end, at, atRest, volume) : from;
    for (let i = done; i < end; i++) levels[i] = this.bodyAt(times[i]! - at - atRest) / volume;
    return end;
  }

  /**
   * The usual case apart: coefficients outside the loops and few live values within them make it more than twice as fast.
   * Gives the index after the last level written: `from` when a coefficient overflows.
   */
  #levelsOfOneProduct(
    levels: Float64Array,
    times: Float64Array,
    from: number,
    end: number,
    at: number,
    atRest: number,
    volume: number,
  ): number {
    const ke = this.ke;
    const ka = this.ka[0]!;
    const d = this.#gap[0]!;
    const bodyLevel = this.body / volume;
    const gutLevel = this.gut[0]! / volume;
    // Near: |d|·u <= 1, as in absorbedPart. Times ascend, so all of them come first.
    const near = DIFFERENCE_ABOVE / Math.abs(d);
    const share = d === 0 ? 0 : gutLevel * (ka / d);
    if (!Number.isFinite(gutLevel + Math.abs(share) + bodyLevel)) return from;
    let i = from;
    for (; i < end; i++) {
      const u = times[i]! - at - atRest;
      if (u > near) break;
      const left = Math.exp(-ke * u);
      const x = d * u;
      const absorbed = x > NEGLIGIBLE || x < -NEGLIGIBLE ? share * -Math.expm1(-x) : gutLevel * (ka * u);
      // All gone: 0 also where the amount absorbed would overflow.
      levels[i] = left === 0 ? 0 : left * (bodyLevel + absorbed);
    }
    const slope = -share;
    const level = bodyLevel + share;
    for (; i < end; i++) {
      const u = times[i]! - at - atRest;
      levels[i] = level * Math.exp(-ke * u) + slope * Math.exp(-ka * u);
    }
    return end;
  }

  /** mg/h absorbed, all products together, `u` h on. */
  inputAt(u: number): number {
    let input = 0;
    for (let i = 0; i < this.ka.length; i++) input += this.gut[i]! * (this.ka[i]! * decay(this.ka[i]!, u));
    return input;
  }

  /** How fast that input falls, mg/h², 0 or more. */
  inputFallAt(u: number): number {
    let fall = 0;
    for (let i = 0; i < this.ka.length; i++) {
      const ka = this.ka[i]!;
      fall += this.gut[i]! * (ka * (ka * decay(ka, u)));
    }
    return fall;
  }

  /** mg·h in the body over the next `u` h. */
  areaOver(u: number): number {
    let area = this.body * decayIntegral(this.ke, u);
    for (let i = 0; i < this.ka.length; i++) {
      const amount = this.gut[i]!;
      if (amount > 0) area += (amount * passedTwoSteps(this.ka[i]!, this.ke, u)) / this.ke;
    }
    return area;
  }

  #bodyAdd(amount: number, rest: number, more: number): void {
    const sum = amount + more;
    const carried = rest + sumError(amount, more, sum);
    this.body = sum + carried;
    this.#bodyRest = carried - (this.body - sum);
  }

  #gutAdd(i: number, amount: number, rest: number, more: number): void {
    const sum = amount + more;
    const carried = rest + sumError(amount, more, sum);
    const total = sum + carried;
    this.gut[i] = total;
    this.#gutRest[i] = carried - (total - sum);
  }
}
