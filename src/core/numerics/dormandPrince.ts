/** dy/dt of an autonomous system: writes into `change`. */
export type Derivative = (y: Float64Array, change: Float64Array) => void;

/**
 * One step of a fifth-order Runge–Kutta method with a fourth-order companion that tells its error.
 *
 * Formula: y(t + h) ≈ y + h·Σ bᵢ·kᵢ, kᵢ the derivative at y + h·Σ aᵢⱼ·kⱼ, with the seven stages of Dormand and Prince.
 * Accuracy: local error of order h⁶; the estimate is that of the fourth-order companion and so errs on the large side.
 * Source: Dormand & Prince, A family of embedded Runge–Kutta formulae, J. Comput. Appl. Math. 6 (1980) 19–26 (coefficients from
 * memory; tests/core/numerics/dormandPrince.test.ts checks their order).
 * @example const s = new DormandPrince(1, (y, d) => { d[0] = -y[0]; }); s.step(Float64Array.of(1), 0.1); s.result[0] // 0.904837418…
 */
export class DormandPrince {
  /** The state after the last step. */
  readonly result: Float64Array;
  /** The estimated error of each of its components. */
  readonly error: Float64Array;
  /** dy/dt at the start and at the end of the last step. */
  readonly startChange: Float64Array;
  readonly endChange: Float64Array;
  readonly #derivative: Derivative;
  readonly #stage: readonly Float64Array[];
  readonly #at: Float64Array;

  constructor(size: number, derivative: Derivative) {
    this.#derivative = derivative;
    this.result = new Float64Array(size);
    this.error = new Float64Array(size);
    this.#at = new Float64Array(size);
    this.#stage = WEIGHTS.map(() => new Float64Array(size));
    this.startChange = this.#stage[0]!;
    this.endChange = this.#stage[LAST]!;
  }

  /** From the state y over h; y is left as it is. */
  step(y: Float64Array, h: number): void {
    const { result, error } = this;
    const stage = this.#stage;
    for (let s = 0; s <= LAST; s++) {
      const target = s === LAST ? result : this.#at;
      this.#combine(WEIGHTS[s]!, s, target);
      for (let i = 0; i < y.length; i++) target[i] = y[i]! + h * target[i]!;
      this.#derivative(target, stage[s]!);
    }
    this.#combine(ERROR, LAST + 1, error);
    for (let i = 0; i < y.length; i++) error[i] = h * error[i]!;
  }

  /** Σ weightⱼ·stageⱼ of the first `count` stages. */
  #combine(weights: readonly number[], count: number, target: Float64Array): void {
    target.fill(0);
    for (let j = 0; j < count; j++) {
      const weight = weights[j]!;
      const stage = this.#stage[j]!;
      for (let i = 0; i < target.length; i++) target[i] = target[i]! + weight * stage[i]!;
    }
  }
}

/** Row s leads to stage s; the last row is also the result. */
const WEIGHTS: readonly (readonly number[])[] = [
  [],
  [1 / 5],
  [3 / 40, 9 / 40],
  [44 / 45, -56 / 15, 32 / 9],
  [19372 / 6561, -25360 / 2187, 64448 / 6561, -212 / 729],
  [9017 / 3168, -355 / 33, 46732 / 5247, 49 / 176, -5103 / 18656],
  [35 / 384, 0, 500 / 1113, 125 / 192, -2187 / 6784, 11 / 84],
];
const LAST = WEIGHTS.length - 1;

/** Fifth-order minus fourth-order weights. */
const ERROR: readonly number[] = [71 / 57600, 0, -71 / 16695, 71 / 1920, -17253 / 339200, 22 / 525, -1 / 40];
