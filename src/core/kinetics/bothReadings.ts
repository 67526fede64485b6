import { type OralKinetics, oralKineticsCheck } from "./oralKinetics.ts";

/** One way to read an oral curve: which of its two rates is absorption. */
export interface Reading {
  /** 1/h */
  readonly ka: number;
  /** 1/h */
  readonly ke: number;
  /** L */
  readonly volume: number;
  /** L/h */
  readonly clearance: number;
  /** h */
  readonly eliminationHalfLife: number;
  /** h */
  readonly absorptionHalfLife: number;
  /** Absorption is the slower of the two: the terminal slope is that of absorption. */
  readonly flipFlop: boolean;
}

export interface BothReadings {
  /** The reading the kinetics given state. */
  readonly assumed: Reading;
  /** The same plasma curve with the two rates exchanged. */
  readonly alternative: Reading;
  /** Whether oral levels can tell the two apart. The curves are identical, so they never can. */
  readonly distinguishable: boolean;
  /** One of `FlipFlopReason`. */
  readonly reason: string;
}

export type FlipFlopReason = "levels-alone-cannot-tell" | "rates-within-20-percent";

/** What would tell the two readings apart. */
export const FLIP_FLOP_SETTLED_BY = ["intravenous-reference", "urinary-recovery", "immediate-release-product"] as const;

/** ka this near to ke, as a part of ke: both are then poorly determined by any levels. Common practice. */
const NEAR = 0.2;

function readingOf(ka: number, ke: number, volume: number, clearance: number): Reading {
  return {
    ka,
    ke,
    volume,
    clearance,
    eliminationHalfLife: Math.LN2 / ke,
    absorptionHalfLife: Math.LN2 / ka,
    flipFlop: ka < ke,
  };
}

/**
 * Both readings of an oral curve: as given, and with absorption and elimination exchanged.
 *
 * Formula: (ka, ke, V) and (ke, ka, V·ke/ka) give the same plasma curve, with the same clearance ke·V.
 * @param kinetics see OralKinetics
 * @returns see BothReadings; `reason` is "rates-within-20-percent" when |ka − ke| <= 0.2·ke, else "levels-alone-cannot-tell"
 * Outside: bad arguments throw RangeError.
 * Accuracy: relative 3e-16.
 * Source: standard result, derived in docs/methods/flip-flop.md.
 * @example bothReadings({ ka: 0.125, ke: 0.2, volume: 10, bioavailability: 1, lag: 0 }).alternative.volume // 16
 */
export function bothReadings(kinetics: OralKinetics): BothReadings {
  oralKineticsCheck(kinetics);
  const { ka, ke, volume } = kinetics;
  const clearance = ke * volume;
  const reason: FlipFlopReason =
    Math.abs(ka - ke) <= NEAR * ke ? "rates-within-20-percent" : "levels-alone-cannot-tell";
  return {
    assumed: readingOf(ka, ke, volume, clearance),
    alternative: readingOf(ke, ka, clearance / ka, clearance),
    distinguishable: false,
    reason,
  };
}
