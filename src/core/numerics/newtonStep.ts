import type { Matrix } from "./choleskyFactor.ts";

/** A step cut to the radius has its length to this share. */
const NEAR_RADIUS = 0.05;
const MOST_CUTS = 30;

/** A pivot below this share of its diagonal entry has lost too many digits to be divided by. */
const LEAST_PIVOT = 1e-12;

/**
 * Newton's step where the curvature is positive definite, for one number of variables again and again without making anything anew.
 *
 * Formula: with H̃ᵢⱼ = Hᵢⱼ/(unitᵢ·unitⱼ) and g̃ᵢ = gᵢ/unitᵢ: step p = −(H̃ + μ·1)⁻¹·g̃ with μ = 0, which lets the model fall by
 * ½·‖L⁻¹·g̃‖², H̃ = L·Lᵀ; or within a radius with the μ that gives ‖p‖ = radius: Newton's steps on 1/‖p‖ = 1/radius from μ = 0, which
 * never overshoot.
 * Outside: not checked. `factor` says false where H̃ is not positive definite to about 12 digits; `solve` and `cut` are meant after true.
 * Accuracy: that of Cholesky's method: relative 1e-15 × the condition of H̃ (tests/core/numerics/newtonStep.test.ts).
 * Source: standard; within a radius: Moré & Sorensen, Computing a trust region step, SIAM J. Sci. Stat. Comput. 4 (1983) 553–572 (from
 * memory, unverified).
 */
export class NewtonStep {
  /** p, in units of 1/unit. */
  readonly step: Float64Array;
  /** ‖p‖. */
  length = 0;
  /** By how much the model falls. */
  predicted = 0;
  /** Product of the pivots: det H̃. */
  determinant = 0;
  #mu = 0;
  readonly #size: number;
  readonly #lower: Float64Array;
  readonly #room: Float64Array;

  constructor(size: number) {
    this.#size = size;
    this.#room = new Float64Array(size);
    this.step = new Float64Array(size);
    this.#lower = new Float64Array(size * size);
  }

  /** Reads the lower half of H. */
  factor(hessian: Matrix, unit: ArrayLike<number>, mu = 0): boolean {
    const n = this.#size;
    const lower = this.#lower;
    this.#mu = mu;
    let determinant = 1;
    for (let i = 0; i < n; i++) {
      const row = hessian[i]!;
      const own = unit[i]!;
      for (let j = 0; j <= i; j++) {
        const entry = row[j]! / own / unit[j]! + (j === i ? mu : 0);
        let sum = entry;
        for (let k = 0; k < j; k++) sum -= lower[i * n + k]! * lower[j * n + k]!;
        if (j < i) {
          lower[i * n + j] = sum / lower[j * n + j]!;
          continue;
        }
        // Written so that NaN is refused too.
        if (!(sum > LEAST_PIVOT * entry && sum < Infinity)) return false;
        determinant *= sum;
        lower[i * n + i] = Math.sqrt(sum);
      }
    }
    this.determinant = determinant;
    return true;
  }

  solve(gradient: ArrayLike<number>, unit: ArrayLike<number>): void {
    const n = this.#size;
    const lower = this.#lower;
    const { step } = this;
    let squares = 0;
    for (let i = 0; i < n; i++) {
      let sum = -gradient[i]! / unit[i]!;
      for (let k = 0; k < i; k++) sum -= lower[i * n + k]! * step[k]!;
      const part = sum / lower[i * n + i]!;
      step[i] = part;
      squares += part * part;
    }
    this.predicted = squares / 2;
    let long = 0;
    for (let i = n - 1; i >= 0; i--) {
      let sum = step[i]!;
      for (let k = i + 1; k < n; k++) sum -= lower[k * n + i]! * step[k]!;
      const part = sum / lower[i * n + i]!;
      step[i] = part;
      long += part * part;
    }
    this.length = Math.sqrt(long);
  }

  /** After `solve`, where that step is longer than the radius: one at most that long. Again with a smaller radius goes on from there. */
  cut(hessian: Matrix, gradient: ArrayLike<number>, unit: ArrayLike<number>, radius: number): void {
    const n = this.#size;
    const lower = this.#lower;
    const room = this.#room;
    const { step } = this;
    for (let tries = 0; tries < MOST_CUTS && this.length > (1 + NEAR_RADIUS) * radius; tries++) {
      let squares = 0;
      for (let i = 0; i < n; i++) {
        let sum = step[i]!;
        for (let k = 0; k < i; k++) sum -= lower[i * n + k]! * room[k]!;
        room[i] = sum / lower[i * n + i]!;
        squares += room[i]! * room[i]!;
      }
      this.#mu += ((this.length * this.length) / squares) * (this.length / radius - 1);
      this.factor(hessian, unit, this.#mu);
      this.solve(gradient, unit);
    }
    const shrink = this.length > radius ? radius / this.length : 1;
    this.length *= shrink;
    let fall = 0;
    for (let i = 0; i < n; i++) step[i] = step[i]! * shrink;
    for (let i = 0; i < n; i++) {
      const own = unit[i]!;
      let bend = 0;
      for (let j = 0; j < n; j++) bend += (hessian[i]![j]! / own / unit[j]!) * step[j]!;
      fall -= step[i]! * (gradient[i]! / own + bend / 2);
    }
    this.predicted = Math.max(0, fall);
  }
}
