import { scaleLinear, scaleLog } from "d3-scale";
import { area, line } from "d3-shape";

/** What one parameter was before the levels and is with them, on one axis: pure data for a painter. Values in the parameter's own unit. */
export interface LearntInput {
  readonly width: number;
  readonly height: number;
  readonly margin: { readonly top: number; readonly right: number; readonly bottom: number; readonly left: number };
  /** Densities over a common grid, each with a highest value of 1. */
  readonly values: ArrayLike<number>;
  readonly prior: ArrayLike<number>;
  readonly posterior: ArrayLike<number>;
  readonly typical: number;
  readonly mostLikely: number;
  readonly interval: { readonly low: number; readonly median: number; readonly high: number };
}

export interface LearntScene {
  readonly width: number;
  readonly height: number;
  readonly plot: { readonly left: number; readonly right: number; readonly top: number; readonly bottom: number };
  /** The prior as a line, the posterior as an area and its line. */
  readonly prior: string;
  readonly posterior: string;
  readonly posteriorLine: string;
  readonly typicalX: number;
  readonly mostLikelyX: number;
  /** The 90 % interval under the axis of the densities, and its median. */
  readonly interval: { readonly x1: number; readonly x2: number; readonly median: number; readonly y: number };
  readonly ticks: readonly { readonly value: number; readonly x: number }[];
}

/** A density this low is off the picture: what lies beyond is neither drawn nor given room. */
const SHOWN_FROM = 0.01;
/** Room between the densities and the interval's bar, px. */
const BAR_ROOM = 9;
/** Room a tick's figure needs, px. */
const TICK_ROOM = 34;

const rounded = (value: number): number => Math.round(value * 100) / 100;

/** Log axis: densities that are normal on the ln scale look it. */
export function learntScene(input: LearntInput): LearntScene {
  const { width, height, margin, values } = input;
  const plot = { left: margin.left, right: width - margin.right, top: margin.top, bottom: height - margin.bottom };
  const floor = plot.bottom - 2 * BAR_ROOM;
  const points = Array.from(values, (value, i) => ({
    value,
    prior: input.prior[i]!,
    posterior: input.posterior[i]!,
  })).filter(({ value }) => value > 0);
  const shown = points.filter(({ prior, posterior }) => prior >= SHOWN_FROM || posterior >= SHOWN_FROM);
  const marks = [input.typical, input.mostLikely, input.interval.low, input.interval.high];
  const domain = [...shown.map(({ value }) => value), ...marks].filter((value) => value > 0);
  const low = domain.length > 0 ? Math.min(...domain) : 0.5;
  const high = domain.length > 0 ? Math.max(...domain) : 2;
  const scale = scaleLog(high > low ? [low, high] : [low / 2, low * 2], [plot.left, plot.right]);
  const tall = scaleLinear([0, 1], [floor, plot.top]);
  const x = (value: number) => rounded(scale(value));
  const y = (density: number) => rounded(tall(density));
  const stroke = (of: "prior" | "posterior") =>
    line<(typeof shown)[number]>()
      .x(({ value }) => x(value))
      .y((point) => y(point[of]))(shown) ?? "";
  return {
    width,
    height,
    plot,
    prior: stroke("prior"),
    posteriorLine: stroke("posterior"),
    posterior:
      area<(typeof shown)[number]>()
        .x(({ value }) => x(value))
        .y0(floor)
        .y1(({ posterior }) => y(posterior))(shown) ?? "",
    typicalX: x(input.typical),
    mostLikelyX: x(input.mostLikely),
    interval: {
      x1: x(input.interval.low),
      x2: x(input.interval.high),
      median: x(input.interval.median),
      y: floor + BAR_ROOM,
    },
    ticks: spacedTicks(scale.ticks(8), x),
  };
}

/** Ticks from the left, those that would run into the one before left out; round ones first. */
function spacedTicks(ticks: readonly number[], x: (value: number) => number): { value: number; x: number }[] {
  const isRound = (value: number) => /^[125]e|^[125]$/.test(value.toExponential().replace(/\.0+/, ""));
  const kept: { value: number; x: number }[] = [];
  for (const value of [...ticks.filter(isRound), ...ticks.filter((each) => !isRound(each))]) {
    const at = x(value);
    if (kept.every((tick) => Math.abs(tick.x - at) >= TICK_ROOM)) kept.push({ value, x: at });
  }
  return kept.sort((a, b) => a.value - b.value);
}
