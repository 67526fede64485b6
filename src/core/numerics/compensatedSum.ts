import { sumError } from "./sumError.ts";

/**
 * A running sum that carries what rounding takes from it.
 *
 * Formula: Σ xᵢ.
 * Terms: any finite numbers, added with `add`; `value` is the sum so far.
 * Outside: Infinity where the plain sum overflows.
 * Accuracy: 1 unit in the last place for terms of one sign, whatever their number (below 2^50).
 * Source: Neumaier's variant of compensated summation (from memory, unverified).
 * @example const s = new CompensatedSum(); for (let i = 0; i < 10; i++) s.add(0.1); s.value // 1
 */
export class CompensatedSum {
  #sum = 0;
  #rest = 0;

  add(term: number): void {
    const sum = this.#sum + term;
    this.#rest += sumError(this.#sum, term, sum);
    this.#sum = sum;
  }

  get value(): number {
    return Number.isFinite(this.#sum) ? this.#sum + this.#rest : this.#sum;
  }
}
