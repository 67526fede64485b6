import { line } from "d3-shape";
import { type ClockScale, type ClockTick, clockScale, hourTicks } from "./clockScale.ts";
import { type ConcentrationScale, concentrationScale } from "./concentrationScale.ts";
import { curvePoints } from "./curvePoints.ts";
import { labelSpread } from "./labelSpread.ts";
import { type ProfileBand, type ProfileBandInput, profileBand } from "./profileBand.ts";

/**
 * The profile as geometry: pure data that the bench and the summary paint each in their own way.
 * Concentrations come in mg/L; `factor` turns them into the unit shown.
 */
export interface ProfileInput {
  readonly width: number;
  readonly height: number;
  readonly margin: { readonly top: number; readonly right: number; readonly bottom: number; readonly left: number };
  readonly fromH: number;
  readonly toH: number;
  readonly nowH: number;
  readonly midnightsH: readonly number[];
  readonly scale: "linear" | "log";
  readonly factor: number;
  /** mg/L; null when the window is not a concentration or there is none. */
  readonly window: { readonly low: number; readonly high: number } | null;
  readonly curves: readonly ProfileCurveInput[];
  readonly bands?: readonly ProfileBandInput[];
  readonly levels: readonly ProfileLevelInput[];
}

export interface ProfileCurveInput {
  readonly id: string;
  /** Whose style it is drawn in, where that is not its own id: the typical patient beside this one. */
  readonly of?: string;
  /** The typical patient's where this patient's is drawn too: thin. */
  readonly isThin?: boolean;
  /** Written at the curve's right end; empty for none. */
  readonly name: string;
  readonly timesH: ArrayLike<number>;
  readonly values: ArrayLike<number>;
}

export interface ProfileLevelInput {
  readonly id: string;
  readonly atH: number;
  readonly value: number;
  readonly sd: number | null;
  readonly excluded: boolean;
  readonly belowLimit: boolean;
  readonly label: string;
  /** This patient's curve there: median and 90 % limits. */
  readonly predicted?: { readonly low: number; readonly median: number; readonly high: number } | null;
  /** 90 % limits said before the level was known. */
  readonly forecast?: { readonly low: number; readonly high: number; readonly held: boolean } | null;
}

export interface ProfileScene {
  readonly width: number;
  readonly height: number;
  readonly plot: { readonly left: number; readonly right: number; readonly top: number; readonly bottom: number };
  readonly clock: ClockScale;
  readonly concentration: ConcentrationScale;
  readonly factor: number;
  readonly nowX: number | null;
  readonly midnights: readonly { readonly hours: number; readonly x: number }[];
  readonly hourTicks: readonly ClockTick[];
  readonly window: {
    readonly top: number;
    readonly bottom: number;
    readonly low: number;
    readonly high: number;
  } | null;
  readonly bands: readonly ProfileBand[];
  readonly curves: readonly {
    readonly id: string;
    readonly of: string;
    readonly isThin: boolean;
    readonly name: string;
    readonly path: string;
    readonly endX: number;
    readonly endY: number;
    readonly labelY: number;
  }[];
  readonly levels: readonly {
    readonly id: string;
    readonly x: number;
    readonly y: number;
    readonly top: number | null;
    readonly bottom: number | null;
    readonly excluded: boolean;
    readonly belowLimit: boolean;
    readonly label: string;
    readonly predicted: { readonly top: number; readonly y: number; readonly bottom: number } | null;
    readonly forecast: { readonly top: number; readonly bottom: number; readonly held: boolean } | null;
  }[];
}

const LABEL_DISTANCE = 17;

function highestShown(input: ProfileInput): number {
  let highest = input.window ? input.window.high : 0;
  const upper = (input.bands ?? []).map((band) => ({ timesH: band.timesH, values: band.q95 }));
  for (const curve of [...input.curves, ...upper]) {
    for (let i = 0; i < curve.timesH.length; i++) {
      if (curve.timesH[i]! >= input.fromH && curve.timesH[i]! <= input.toH)
        highest = Math.max(highest, curve.values[i]!);
    }
  }
  for (const level of input.levels) {
    if (level.atH >= input.fromH && level.atH <= input.toH)
      highest = Math.max(highest, level.value + (level.sd ?? 0), level.forecast?.high ?? 0);
  }
  return highest * input.factor;
}

export function profileScene(input: ProfileInput): ProfileScene {
  const plot = {
    left: input.margin.left,
    right: input.width - input.margin.right,
    top: input.margin.top,
    bottom: input.height - input.margin.bottom,
  };
  const clock = clockScale(input.fromH, input.toH, plot.left, plot.right);
  const concentration = concentrationScale(input.scale, highestShown(input), plot.top, plot.bottom);
  const path = line<[number, number]>()
    .x(([hours]) => Math.round(clock.x(hours) * 100) / 100)
    .y(([, value]) => Math.round(concentration.y(value * input.factor) * 100) / 100);
  const drawn = input.curves.map((curve) => ({ curve, points: curvePoints(curve, input.fromH, input.toH) }));
  const ends = drawn.map(({ points }) => {
    const [hours, value] = points.at(-1) ?? [input.fromH, 0];
    return { x: clock.x(hours), y: concentration.y(value * input.factor) };
  });
  const named = drawn.flatMap(({ curve }, index) => (curve.name === "" ? [] : [index]));
  const spread = labelSpread(
    named.map((index) => ends[index]!.y),
    LABEL_DISTANCE,
    plot.top + 6,
    plot.bottom - 4,
  );
  const labelY = (index: number): number => {
    const rank = named.indexOf(index);
    return rank < 0 ? ends[index]!.y : spread[rank]!;
  };
  return {
    width: input.width,
    height: input.height,
    plot,
    clock,
    concentration,
    factor: input.factor,
    nowX: input.nowH >= input.fromH && input.nowH <= input.toH ? clock.x(input.nowH) : null,
    midnights: input.midnightsH
      .filter((hours) => hours >= input.fromH && hours <= input.toH)
      .map((hours) => ({ hours, x: clock.x(hours) })),
    hourTicks: hourTicks(clock, input.midnightsH),
    window: input.window && {
      low: input.window.low * input.factor,
      high: input.window.high * input.factor,
      top: concentration.y(input.window.high * input.factor),
      bottom: concentration.y(input.window.low * input.factor),
    },
    bands: (input.bands ?? []).map((band) =>
      profileBand(band, input.fromH, input.toH, clock.x, (value) => concentration.y(value * input.factor)),
    ),
    curves: drawn.map(({ curve, points }, index) => ({
      id: curve.id,
      of: curve.of ?? curve.id,
      isThin: curve.isThin ?? false,
      name: curve.name,
      path: path(points) ?? "",
      endX: ends[index]!.x,
      endY: ends[index]!.y,
      labelY: labelY(index),
    })),
    levels: input.levels
      .filter((level) => level.atH >= input.fromH && level.atH <= input.toH)
      .map((level) => ({
        id: level.id,
        x: clock.x(level.atH),
        y: concentration.y(level.value * input.factor),
        top: level.sd === null ? null : concentration.y((level.value + level.sd) * input.factor),
        bottom: level.sd === null ? null : concentration.y(Math.max(0, level.value - level.sd) * input.factor),
        excluded: level.excluded,
        belowLimit: level.belowLimit,
        label: level.label,
        predicted: level.predicted
          ? {
              top: concentration.y(level.predicted.high * input.factor),
              y: concentration.y(level.predicted.median * input.factor),
              bottom: concentration.y(level.predicted.low * input.factor),
            }
          : null,
        forecast: level.forecast
          ? {
              top: concentration.y(level.forecast.high * input.factor),
              bottom: concentration.y(level.forecast.low * input.factor),
              held: level.forecast.held,
            }
          : null,
      })),
  };
}
