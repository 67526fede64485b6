import { modelPositive } from "./modelArgument.ts";

/** A central compartment that exchanges with a peripheral one and eliminates in proportion to its level. */
export interface TwoCompartmentDisposition {
  readonly kind: "two-compartment";
  /** L/h, above 0. */
  readonly clearance: number;
  /** Of the central compartment, L, above 0. */
  readonly volume: number;
  /** Between the compartments, both ways, L/h, above 0. */
  readonly exchange: number;
  /** L, above 0. */
  readonly peripheralVolume: number;
}

export interface TwoCompartmentConstants {
  /** Elimination from, transfer out of and back into the central compartment, 1/h. */
  readonly k10: number;
  readonly k12: number;
  readonly k21: number;
  /** The fast and the slow (terminal) rate, 1/h. */
  readonly alpha: number;
  readonly beta: number;
  /** alpha − beta, 1/h, above 0. */
  readonly gap: number;
  /** alpha − k10 − k12 and alpha − k21, 1/h, above 0. */
  readonly alphaOverOut: number;
  readonly alphaOverBack: number;
  /** Of a dose put straight into the central compartment, the part whose level falls with alpha; the rest falls with beta. */
  readonly alphaShare: number;
  readonly betaShare: number;
  /** h */
  readonly alphaHalfLife: number;
  readonly betaHalfLife: number;
  /** At equilibrium between the compartments, and in the terminal phase (clearance/beta), L. */
  readonly volumeSteady: number;
  readonly volumeTerminal: number;
}

export function twoCompartmentCheck(name: string, disposition: TwoCompartmentDisposition): void {
  const { clearance, volume, exchange, peripheralVolume } = disposition;
  modelPositive(`${name}.clearance`, clearance, "L/h");
  modelPositive(`${name}.volume`, volume, "L");
  modelPositive(`${name}.exchange`, exchange, "L/h");
  modelPositive(`${name}.peripheralVolume`, peripheralVolume, "L");
  modelPositive(`${name}.clearance / volume`, clearance / volume, "/h");
  modelPositive(`${name}.exchange / volume`, exchange / volume, "/h");
  modelPositive(`${name}.exchange / peripheralVolume`, exchange / peripheralVolume, "/h");
}

/**
 * Micro and macro constants of a two-compartment disposition.
 *
 * Formula: k10 = CL/V, k12 = Q/V, k21 = Q/Vp; s = k10 + k12 − k21; gap = √(s² + 4·k12·k21);
 * alpha = (k10 + k12 + k21 + gap)/2; beta = k10·k21/alpha; of (gap ± s)/2 the larger as written, the other as k12·k21/larger.
 * Nothing cancels, so alpha and beta keep their digits however far apart or close they are.
 * @param disposition see TwoCompartmentDisposition
 * @returns see TwoCompartmentConstants
 * Outside: bad arguments throw RangeError.
 * Accuracy: relative 2e-15 (tests/core/kinetics/model/twoCompartment.test.ts).
 * Source: standard result, derived in docs/methods/two-compartment-oral.md.
 * @example twoCompartmentConstants({ kind: "two-compartment", clearance: 2.04, volume: 30.8, exchange: 5.88, peripheralVolume: 20.1 }).beta
 * // 0.0378564899727…
 */
export function twoCompartmentConstants(disposition: TwoCompartmentDisposition): TwoCompartmentConstants {
  twoCompartmentCheck("disposition", disposition);
  const { clearance, volume, exchange, peripheralVolume } = disposition;
  const k10 = clearance / volume;
  const k12 = exchange / volume;
  const k21 = exchange / peripheralVolume;
  const s = k10 + k12 - k21;
  const gap = Math.hypot(s, 2 * Math.sqrt(k12) * Math.sqrt(k21));
  const larger = (gap + Math.abs(s)) / 2;
  const smaller = (k12 / larger) * k21;
  const alphaOverOut = s >= 0 ? smaller : larger;
  const alphaOverBack = s >= 0 ? larger : smaller;
  const alpha = (k10 + k12 + k21 + gap) / 2;
  const beta = k10 * (k21 / alpha);
  return {
    k10,
    k12,
    k21,
    alpha,
    beta,
    gap,
    alphaOverOut,
    alphaOverBack,
    alphaShare: alphaOverBack / gap,
    betaShare: alphaOverOut / gap,
    alphaHalfLife: Math.LN2 / alpha,
    betaHalfLife: Math.LN2 / beta,
    volumeSteady: volume + peripheralVolume,
    volumeTerminal: clearance / beta,
  };
}
