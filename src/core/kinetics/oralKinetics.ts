import { argumentAboveZero, argumentFraction, argumentNotNegative } from "./argumentCheck.ts";

/** One compartment, first-order absorption after a lag, first-order elimination. */
export interface OralKinetics {
  /** Absorption rate constant, 1/h, above 0. */
  ka: number;
  /** Elimination rate constant, 1/h, above 0. */
  ke: number;
  /** Volume of distribution, L, above 0. */
  volume: number;
  /** Share of the dose that reaches the circulation, 0–1. */
  bioavailability: number;
  /** From administration to the start of absorption, h, 0 or more. */
  lag: number;
}

export interface Dose {
  /** h */
  time: number;
  /** mg of the active moiety, 0 or more. */
  amount: number;
}

/** Throws a RangeError for kinetics outside the ranges above. */
export function oralKineticsCheck(kinetics: OralKinetics): void {
  argumentAboveZero("kinetics.ka", kinetics.ka, "/h");
  argumentAboveZero("kinetics.ke", kinetics.ke, "/h");
  argumentAboveZero("kinetics.volume", kinetics.volume, "L");
  argumentFraction("kinetics.bioavailability", kinetics.bioavailability);
  argumentNotNegative("kinetics.lag", kinetics.lag, "h");
}
