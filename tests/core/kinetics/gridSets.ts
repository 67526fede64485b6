import { readFileSync } from "node:fs";
import type { OralKinetics } from "../../../src/core/kinetics/index.ts";

/** One parameter set of tests/fixtures/grid_public.json with its references as numbers (see tests/fixtures/README.md). */
export interface GridSet {
  readonly id: string;
  readonly kinetics: OralKinetics;
  /** mg */
  readonly dose: number;
  /** h */
  readonly interval: number;
  /** max(ka, ke), 1/h */
  readonly fast: number;
  readonly timeOfPeak: number;
  readonly peak: number;
  readonly auc: number;
  readonly single: readonly { readonly t: number; readonly level: number; readonly auc: number }[];
  readonly threshold: Threshold;
  readonly steady: {
    readonly points: readonly { readonly s: number; readonly level: number }[];
    readonly timeOfPeak: number;
    readonly peak: number;
    readonly trough: number;
    readonly average: number;
    readonly accumulation: number;
    readonly fluctuation: number;
    readonly swing: number;
    readonly threshold: Threshold | null;
  };
  readonly afterDoses: readonly { readonly n: number; readonly s: number; readonly level: number }[];
}

/** `up` and `down` are null where the level is above the peak. */
interface Threshold {
  readonly level: number;
  readonly up: number | null;
  readonly down: number | null;
  readonly duration: number | null;
}

type Raw = Record<string, string> & { readonly [key: string]: never };
interface RawSet {
  readonly id: string;
  readonly inputs: Raw;
  readonly singleDose: readonly Raw[];
  readonly singleDoseThreshold: Raw;
  readonly steadyState: Raw & { readonly points: readonly Raw[]; readonly steadyStateThreshold: Raw | null };
  readonly steadyStateThreshold: Raw | null;
  readonly afterNDoses: readonly Raw[];
}

/** A missing field must not become NaN or 0 unseen. */
function number(text: string | number | undefined): number {
  const value = Number(text);
  if (text === undefined || text === null || !Number.isFinite(value)) throw new Error(`no number in the grid: ${text}`);
  return value;
}

const orNull = (text: string | null | undefined) => (text === null ? null : number(text));

function thresholdOf(raw: Raw): Threshold {
  return {
    level: number(raw.c),
    up: orNull(raw.tUp_h ?? raw.sUp_h ?? null),
    down: orNull(raw.tDown_h ?? raw.sDown_h ?? null),
    duration: orNull(raw.duration_h ?? null),
  };
}

function setOf(raw: RawSet): GridSet {
  const { inputs, steadyState } = raw;
  const ka = number(inputs.ka_per_h);
  const ke = number(inputs.ke_per_h);
  return {
    id: raw.id,
    kinetics: { ka, ke, volume: number(inputs.V_L), bioavailability: number(inputs.F), lag: 0 },
    dose: number(inputs.dose_mg),
    interval: number(inputs.tau_h),
    fast: Math.max(ka, ke),
    timeOfPeak: number((raw as unknown as Raw).tmax_h),
    peak: number((raw as unknown as Raw).Cmax),
    auc: number((raw as unknown as Raw).AUC_0_inf),
    single: raw.singleDose.map((p) => ({ t: number(p.t_h), level: number(p.C), auc: number(p.AUC_0_t) })),
    threshold: thresholdOf(raw.singleDoseThreshold),
    steady: {
      points: steadyState.points.map((p) => ({ s: number(p.s_h), level: number(p.Css) })),
      timeOfPeak: number(steadyState.tmaxSS_h),
      peak: number(steadyState.CmaxSS),
      trough: number(steadyState.CminSS),
      average: number(steadyState.CavgSS),
      accumulation: number(steadyState.accumulationAUC),
      fluctuation: number(steadyState.fluctuationPercent) / 100,
      swing: number(steadyState.swingPercent) / 100,
      threshold: raw.steadyStateThreshold && thresholdOf(raw.steadyStateThreshold),
    },
    afterDoses: raw.afterNDoses.map((p) => ({ n: number(p.N), s: number(p.s_h), level: number(p.C) })),
  };
}

/** All 200 sets. */
export function gridSets(): GridSet[] {
  const file = new URL("../../fixtures/grid_public.json", import.meta.url);
  return (JSON.parse(readFileSync(file, "utf8")) as { sets: RawSet[] }).sets.map(setOf);
}
