import { scaleLinear, scaleLog } from "d3-scale";

export interface ConcentrationScale {
  readonly kind: "linear" | "log";
  readonly low: number;
  readonly high: number;
  /** Position of a concentration in the shown unit; on a log scale values at or below the floor sit on it. */
  y(value: number): number;
  value(y: number): number;
  readonly ticks: readonly { readonly value: number; readonly y: number }[];
}

/** Decades shown below the highest value on a log scale. */
const LOG_DECADES = 2;

/**
 * Concentration to vertical position. Linear starts at 0; log shows the top two decades.
 * `highest` is the largest value to be shown (shown unit, > 0).
 */
export function concentrationScale(
  kind: "linear" | "log",
  highest: number,
  top: number,
  bottom: number,
  tickCount = 5,
): ConcentrationScale {
  const high = highest > 0 && Number.isFinite(highest) ? highest : 1;
  if (kind === "linear") {
    const scale = scaleLinear([0, high * 1.08], [bottom, top]).nice(tickCount);
    const [low = 0, niceHigh = high] = scale.domain();
    return {
      kind,
      low,
      high: niceHigh,
      y: (value) => scale(value),
      value: (y) => scale.invert(y),
      ticks: scale.ticks(tickCount).map((value) => ({ value, y: scale(value) })),
    };
  }
  const ceiling = high * 1.25;
  const floor = ceiling / 10 ** LOG_DECADES;
  const scale = scaleLog([floor, ceiling], [bottom, top]).clamp(true);
  const ticks = scale.ticks(tickCount).filter((value) => /^[125]/.test(String(value).replace(/^0\.0*/, "")));
  return {
    kind,
    low: floor,
    high: ceiling,
    y: (value) => scale(Math.max(value, floor)),
    value: (y) => scale.invert(y),
    ticks: ticks.map((value) => ({ value, y: scale(value) })),
  };
}
