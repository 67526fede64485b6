import { argumentFraction, argumentRefuse } from "../argumentCheck.ts";
import type { Dose } from "../oralKinetics.ts";
import { modelDelay, modelPositive } from "./modelArgument.ts";

/** First-order absorption; ka in 1/h, above 0. */
export interface FirstOrderAbsorption {
  readonly kind: "first-order";
  readonly ka: number;
}

/** Absorption at a constant rate; duration in h, above 0, may be longer than the dosing interval. */
export interface ZeroOrderAbsorption {
  readonly kind: "zero-order";
  readonly duration: number;
}

/** A fast part and a slow part of one product; the slow one begins `slowLag` h after the fast one. */
export interface MixedAbsorption {
  readonly kind: "mixed";
  /** Share of the dose that is absorbed fast, 0–1. */
  readonly fastFraction: number;
  /** 1/h, above 0. */
  readonly fastKa: number;
  readonly slow: FirstOrderAbsorption | ZeroOrderAbsorption;
  /** h, 0 or more. */
  readonly slowLag: number;
}

export type Absorption = FirstOrderAbsorption | ZeroOrderAbsorption | MixedAbsorption;

/** One product: how it is absorbed, and its doses. */
export interface ModelInput {
  readonly absorption: Absorption;
  /** 0–1 */
  readonly bioavailability: number;
  /** h, 0 or more. */
  readonly lag: number;
  /** In ascending order of time; doses at one time add. */
  readonly doses: readonly Dose[];
}

/** A part of a product that is absorbed in one way. */
export interface AbsorptionPart {
  readonly release: FirstOrderAbsorption | ZeroOrderAbsorption;
  /** Of the dose that reaches the circulation, 0–1. */
  readonly share: number;
  /** From administration to the start of absorption, h. */
  readonly lag: number;
}

function releaseCheck(name: string, release: FirstOrderAbsorption | ZeroOrderAbsorption): void {
  if (release.kind === "first-order") modelPositive(`${name}.ka`, release.ka, "/h");
  else if (release.kind === "zero-order") modelPositive(`${name}.duration`, release.duration, "h");
  else argumentRefuse(`${name}.kind`, (release as { kind: unknown }).kind, "", "first-order or zero-order");
}

/** Throws a RangeError for an absorption outside the ranges above. */
export function absorptionCheck(name: string, absorption: Absorption): void {
  if (absorption.kind !== "mixed") {
    releaseCheck(name, absorption);
    return;
  }
  argumentFraction(`${name}.fastFraction`, absorption.fastFraction);
  modelPositive(`${name}.fastKa`, absorption.fastKa, "/h");
  releaseCheck(`${name}.slow`, absorption.slow);
  modelDelay(`${name}.slowLag`, absorption.slowLag);
}

/** A share below this carries nothing that a double could tell from nothing at the end. */
const LEAST_SHARE = 1e-30;

/** The parts that carry anything at all, already checked. */
export function absorptionParts(absorption: Absorption, bioavailability: number, lag: number): AbsorptionPart[] {
  const parts: AbsorptionPart[] = [];
  if (absorption.kind === "mixed") {
    const { fastFraction, fastKa, slow, slowLag } = absorption;
    parts.push({ release: { kind: "first-order", ka: fastKa }, share: bioavailability * fastFraction, lag });
    parts.push({ release: slow, share: bioavailability * (1 - fastFraction), lag: lag + slowLag });
  } else parts.push({ release: absorption, share: bioavailability, lag });
  return parts.filter((part) => part.share >= LEAST_SHARE);
}
