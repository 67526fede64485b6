import { ModelSweep } from "../kinetics/index.ts";
import { estimationCheck } from "./estimationCheck.ts";
import type { EstimationLevel, EstimationProblem } from "./estimationTypes.ts";
import { type Prior, priorOf } from "./prior.ts";
import { type ResidualTerm, residualTerm } from "./residualTerm.ts";

/** Beyond this no η has a patient: e^30 is 1e13. */
const MOST_ETA = 30;

/**
 * The objective of an estimation problem, with its gradient.
 *
 * Formula: O(η) = Σ residualTerm(levelⱼ, f(tⱼ; η)) + ½·ηᵀ·Ω⁻¹·η; ∂O/∂η = Σ termⱼ′·∂fⱼ/∂η + Ω⁻¹·η, the derivatives of the
 * predictions from ModelSweep. The density of η given the levels is in proportion to e^(−O).
 * Outside: a bad problem throws RangeError; O is Infinity, never NaN, where no patient has such figures (|η| above 30, a figure out of
 * the kinetics' range) or a level is impossible.
 * Accuracy: gradient against central differences 1e-6 relative (tests/core/estimation/estimationObjective.test.ts).
 * Source: docs/methods/levels-to-this-patient.md.
 */
export class EstimationObjective {
  readonly problem: EstimationProblem;
  readonly prior: Prior;
  /** In order of time; `order[i]` is the place of the i-th among the problem's levels. */
  readonly order: readonly number[];
  readonly #levels: readonly EstimationLevel[];
  readonly #size: number;
  readonly #gradients: ModelSweep;
  #valuesMade: ModelSweep | undefined;
  readonly #term: ResidualTerm = { value: 0, slope: 0, curvature: 0 };
  /** Of the last point a gradient was made at. */
  readonly #at: Float64Array;
  #isMade = false;
  #value = 0;
  #gradient: readonly number[] = [];
  readonly #curvature: Float64Array;

  constructor(problem: EstimationProblem) {
    estimationCheck(problem);
    this.problem = problem;
    this.prior = priorOf(problem);
    this.#size = problem.random.length;
    this.order = problem.levels.map((_, i) => i).sort((a, b) => problem.levels[a]!.time - problem.levels[b]!.time);
    this.#levels = this.order.map((i) => problem.levels[i]!);
    this.#gradients = this.#sweep(true);
    this.#at = new Float64Array(this.#size);
    this.#curvature = new Float64Array(this.#levels.length);
  }

  #sweep(withDerivatives: boolean): ModelSweep {
    const { history, random } = this.problem;
    const names = random.map(({ name }) => name);
    const times = this.#levels.map(({ time }) => time);
    return new ModelSweep(history, names, times, withDerivatives);
  }

  /** Made when first asked for: the search for the most likely η does without. */
  get #values(): ModelSweep {
    this.#valuesMade ??= this.#sweep(false);
    return this.#valuesMade;
  }

  /** O(η). */
  value(eta: ArrayLike<number>): number {
    const sweep = this.#values;
    if (!this.#run(sweep, eta)) return Number.POSITIVE_INFINITY;
    const { residual, residualModel } = this.problem;
    const { levels } = sweep;
    let sum = this.#priorTerm(eta);
    for (let j = 0; j < levels.length; j++) {
      residualTerm(this.#levels[j]!, levels[j]!, residual, residualModel, this.#term);
      sum += this.#term.value;
    }
    return sum < Infinity ? sum : Number.POSITIVE_INFINITY;
  }

  /** O(η), its gradient kept for the next call at the same point. */
  valueWithGradient(eta: readonly number[]): number {
    this.#evaluate(eta);
    return this.#value;
  }

  /** Not finite where O is not. */
  gradient(eta: readonly number[]): readonly number[] {
    this.#evaluate(eta);
    return this.#gradient;
  }

  /** Second derivatives without those of the predictions, the rest as expected (see residualTerm): positive definite. */
  expectedHessian(eta: readonly number[]): number[][] {
    this.#evaluate(eta);
    const { precision } = this.prior;
    const { derivatives } = this.#gradients;
    const curvature = this.#curvature;
    const size = this.#size;
    const hessian: number[][] = [];
    for (let a = 0; a < size; a++) {
      const row = new Array<number>(size);
      const byA = derivatives[a]!;
      for (let b = 0; b <= a; b++) {
        const byB = derivatives[b]!;
        let sum = precision[a]![b]!;
        for (let j = 0; j < curvature.length; j++) sum += curvature[j]! * byA[j]! * byB[j]!;
        row[b] = sum;
        if (b < a) hessian[b]![a] = sum;
      }
      hessian.push(row);
    }
    return hessian;
  }

  /** mg/L at each level, in the order of the problem. */
  predictions(eta: readonly number[]): number[] {
    const predictions = new Array<number>(this.order.length).fill(0);
    this.#evaluate(eta);
    for (const [j, i] of this.order.entries()) predictions[i] = this.#gradients.levels[j]!;
    return predictions;
  }

  #evaluate(eta: readonly number[]): void {
    const size = this.#size;
    const at = this.#at;
    let isSame = this.#isMade;
    for (let i = 0; i < size; i++) {
      if (at[i] !== eta[i]) isSame = false;
      at[i] = eta[i]!;
    }
    if (isSame) return;
    this.#isMade = true;
    const { precision } = this.prior;
    const { residual, residualModel } = this.problem;
    const { levels, derivatives } = this.#gradients;
    const gradient = new Array<number>(size).fill(0);
    this.#gradient = gradient;
    let sum = Number.POSITIVE_INFINITY;
    if (this.#run(this.#gradients, eta)) {
      sum = this.#priorTerm(eta);
      for (let a = 0; a < size; a++) {
        const row = precision[a]!;
        for (let b = 0; b < size; b++) gradient[a] = gradient[a]! + row[b]! * eta[b]!;
      }
      for (let j = 0; j < levels.length; j++) {
        residualTerm(this.#levels[j]!, levels[j]!, residual, residualModel, this.#term);
        const { value, slope, curvature } = this.#term;
        sum += value;
        this.#curvature[j] = curvature;
        for (let a = 0; a < size; a++) gradient[a] = gradient[a]! + slope * derivatives[a]![j]!;
      }
    } else this.#curvature.fill(0);
    let isNumber = sum < Infinity;
    for (let a = 0; a < size; a++) if (!Number.isFinite(gradient[a]!)) isNumber = false;
    this.#value = isNumber ? sum : Number.POSITIVE_INFINITY;
    if (!isNumber) gradient.fill(Number.POSITIVE_INFINITY);
  }

  /** False where no patient has such figures. */
  #run(sweep: ModelSweep, eta: ArrayLike<number>): boolean {
    for (let i = 0; i < this.#size; i++) if (!(Math.abs(eta[i]!) <= MOST_ETA)) return false;
    try {
      sweep.run(eta);
      return true;
    } catch (fault) {
      // The arguments were checked when the sweep was made: what is left is a figure scaled out of its range.
      if (fault instanceof RangeError) return false;
      throw fault;
    }
  }

  #priorTerm(eta: ArrayLike<number>): number {
    const { precision } = this.prior;
    let sum = 0;
    for (let a = 0; a < precision.length; a++) {
      const row = precision[a]!;
      for (let b = 0; b < row.length; b++) sum += row[b]! * eta[a]! * eta[b]!;
    }
    return sum / 2;
  }
}
