import { normalQuantile } from "./normalQuantile.ts";

export interface SeededRandom {
  /** A whole number, 0 to 2^32 − 1, each as likely. */
  readonly bits: () => number;
  /** Even over (0, 1): never 0 and never 1. */
  readonly uniform: () => number;
  /** Standard normal. */
  readonly normal: () => number;
}

const SIZE = 624;
const SHIFT = 397;
const HIGH_BIT = 0x80000000;
const LOW_BITS = 0x7fffffff;
const TWIST = 0x9908b0df;

/**
 * A source of numbers that look random and are the same for the same seed, everywhere.
 *
 * Formula: the Mersenne Twister MT19937 of 32 bits; `uniform` is (k + 1/2)/2^53 of a number k of 53 bits made of two of them (the
 * generator's own recipe, moved by half a place off 0; the half is lost to rounding above 1/2), `normal` is normalQuantile of that.
 * @param seed whole number, 0 to 2^32 − 1
 * @returns see SeededRandom; each call moves on
 * Outside: RangeError for another seed.
 * Accuracy: `bits` and `uniform` the same to the bit on every machine; `normal` as far as Math.log is (it is within one engine).
 * Period 2^19937 − 1.
 * Source: Matsumoto & Nishimura, Mersenne Twister: a 623-dimensionally equidistributed uniform pseudo-random number generator, ACM
 * Trans. Model. Comput. Simul. 8 (1998) 3–30, with the seeding of 2002; the C++ standard states its 10,000th number for seed 5489,
 * 4123659995 (both from memory; compared with NumPy in tests/core/numerics/seededRandom.test.ts).
 * @example seededRandom(5489).bits() // 3499211612
 */
export function seededRandom(seed: number): SeededRandom {
  if (!(Number.isInteger(seed) && seed >= 0 && seed < 2 ** 32)) {
    throw new RangeError(`seed: ${seed}; must be a whole number, 0 to 4294967295`);
  }
  const state = new Uint32Array(SIZE);
  state[0] = seed;
  for (let i = 1; i < SIZE; i++) {
    const before = state[i - 1]! ^ (state[i - 1]! >>> 30);
    state[i] = Math.imul(1_812_433_253, before) + i;
  }
  let at = SIZE;

  const bits = () => {
    if (at === SIZE) {
      twist(state);
      at = 0;
    }
    let y = state[at++]!;
    y ^= y >>> 11;
    y ^= (y << 7) & 0x9d2c5680;
    y ^= (y << 15) & 0xefc60000;
    return (y ^ (y >>> 18)) >>> 0;
  };
  const uniform = () => {
    const high = bits() >>> 5;
    const low = bits() >>> 6;
    const k = high * 2 ** 26 + low;
    // At the very top the sum would round to 1.
    return Math.min(k + 0.5, 2 ** 53 - 1) / 2 ** 53;
  };
  return { bits, uniform, normal: () => normalQuantile(uniform()) };
}

function twist(state: Uint32Array): void {
  for (let i = 0; i < SIZE; i++) {
    const y = (state[i]! & HIGH_BIT) | (state[(i + 1) % SIZE]! & LOW_BITS);
    state[i] = state[(i + SHIFT) % SIZE]! ^ (y >>> 1) ^ (y & 1 ? TWIST : 0);
  }
}
