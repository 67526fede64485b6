import type { Case } from "../case/index.ts";
import {
  type KineticsParameter,
  type ModelHistory,
  modelExposure,
  modelHalfLife,
  modelScaled,
  modelSteadyState,
  modelTimeToSteadyState,
} from "../kinetics/index.ts";
import type { DoseLine } from "../regimen/index.ts";
import type { Model } from "./analysisTypes.ts";
import type { IndividualReadings, Spread } from "./fitTypes.ts";
import { finalDisposition, modelInputs } from "./modelInputs.ts";
import { concentrationWindow } from "./optionReadings.ts";
import { regimenPattern } from "./regimenPattern.ts";
import { spreadOfEqual } from "./spreadOf.ts";
import { windowChance } from "./windowChance.ts";
import { windowLimits } from "./windowLimits.ts";

/** Equally weighted draws of what differs from the typical patient. */
export interface DrawnPatients {
  readonly names: readonly KineticsParameter[];
  readonly count: number;
  /** η of the nth draw, in the order of `names`. */
  readonly eta: (nth: number) => readonly number[];
}

const SPAN_NAMES = ["peak", "lowest", "average", "auc", "hoursBelow", "hoursWithin", "hoursAbove"] as const;
const STEADY_NAMES = ["peak", "lowest", "average", "accumulation", "swing", "fluctuation"] as const;

/**
 * The readings of an option for every draw of this patient, as intervals; found as the typical patient's are (optionReadings), draw by draw.
 * Yields after each draw.
 */
export function* individualReadings(
  value: Case,
  lines: readonly DoseLine[],
  history: ModelHistory,
  typical: Model,
  patients: DrawnPatients,
  { fromH, toH }: { readonly fromH: number; readonly toH: number },
): Generator<void, IndividualReadings> {
  const { names, count } = patients;
  const window = concentrationWindow(value) ?? undefined;
  const found = regimenPattern(value, lines);
  const pattern = found.ok ? found.pattern : null;
  const settledHistory: ModelHistory | null = pattern && {
    dispositions: [{ from: Number.NEGATIVE_INFINITY, disposition: finalDisposition(typical) }],
    inputs: modelInputs(typical, pattern.courses),
  };

  const span = columns(SPAN_NAMES, count);
  const steady = columns([...STEADY_NAMES, "timeTo90H"] as const, count);
  const halfLives = new Float64Array(count);
  let hasHalfLife = true;
  let settledCount = 0;
  for (let i = 0; i < count; i++) {
    const eta = patients.eta(i);
    const own = modelScaled(history, names, eta);
    const exposure = modelExposure(own, fromH, toH, window);
    for (const name of SPAN_NAMES) span[name][i] = exposure[name];
    const halfLife = modelHalfLife(own.dispositions.at(-1)!.disposition);
    if (halfLife === null) hasHalfLife = false;
    else halfLives[i] = halfLife;
    if (settledHistory && pattern) {
      const settled = modelScaled(settledHistory, names, eta);
      const { disposition } = settled.dispositions[0]!;
      const state = modelSteadyState(disposition, settled.inputs, pattern.periodH);
      if (state.status === "settled") {
        for (const name of STEADY_NAMES) steady[name][settledCount] = state[name];
        steady.timeTo90H[settledCount] = modelTimeToSteadyState(
          disposition,
          settled.inputs,
          pattern.periodH,
          0.9,
        ).hours;
        settledCount++;
      }
    }
    yield;
  }

  // Chances first: spreadOfEqual puts a column in order.
  const limits = windowLimits(value);
  const chanceOf = (figures: { peak: Float64Array; lowest: Float64Array; average: Float64Array }) =>
    limits && value.window
      ? windowChance(value.window.quantity, limits, { ...figures, auc24: figures.average.map((level) => level * 24) })
      : null;
  const spanChance = chanceOf(span);
  const settled = firstRows(steady, settledCount);
  const steadyChance = settledCount > 0 ? chanceOf(settled) : null;
  const hours = (name: "hoursBelow" | "hoursWithin" | "hoursAbove") => (window ? spreadOfEqual(span[name]) : null);
  return {
    span: {
      fromH,
      toH,
      peak: spreadOfEqual(span.peak),
      lowest: spreadOfEqual(span.lowest),
      auc24: daily(spreadOfEqual(span.average)),
      average: spreadOfEqual(span.average),
      auc: spreadOfEqual(span.auc),
      hoursBelow: hours("hoursBelow"),
      hoursWithin: hours("hoursWithin"),
      hoursAbove: hours("hoursAbove"),
      chance: spanChance,
    },
    steadyState:
      settledCount === 0
        ? null
        : {
            peak: spreadOfEqual(settled.peak),
            lowest: spreadOfEqual(settled.lowest),
            average: spreadOfEqual(settled.average),
            auc24: daily(spreadOfEqual(settled.average)),
            accumulation: spreadOfEqual(settled.accumulation),
            swing: spreadOfEqual(settled.swing),
            fluctuation: spreadOfEqual(settled.fluctuation),
            timeTo90H: spreadOfEqual(settled.timeTo90H),
            chance: steadyChance,
          },
    shareNeverSteady: pattern ? (count - settledCount) / count : 0,
    halfLifeH: hasHalfLife ? spreadOfEqual(halfLives) : null,
  };
}

function columns<N extends string>(names: readonly N[], count: number): Record<N, Float64Array> {
  return Object.fromEntries(names.map((name) => [name, new Float64Array(count)])) as Record<N, Float64Array>;
}

function firstRows<N extends string>(table: Record<N, Float64Array>, count: number): Record<N, Float64Array> {
  const cut = Object.entries<Float64Array>(table).map(([name, column]) => [name, column.subarray(0, count)]);
  return Object.fromEntries(cut) as Record<N, Float64Array>;
}

/** AUC in 24 h of an average. */
function daily({ q05, q25, q50, q75, q95 }: Spread): Spread {
  return { q05: q05 * 24, q25: q25 * 24, q50: q50 * 24, q75: q75 * 24, q95: q95 * 24 };
}
