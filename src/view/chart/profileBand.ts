import { area, line } from "d3-shape";
import { curvePoints } from "./curvePoints.ts";

/** 50 % and 90 % limits about the curve of the same id, mg/L. */
export interface ProfileBandInput {
  readonly id: string;
  /** Filled, or only its outer edges as lines. */
  readonly isFilled: boolean;
  readonly timesH: ArrayLike<number>;
  readonly q05: ArrayLike<number>;
  readonly q25: ArrayLike<number>;
  readonly q75: ArrayLike<number>;
  readonly q95: ArrayLike<number>;
}

/** 90 % and 50 % as areas, and the outer edges as lines. */
export interface ProfileBand {
  readonly id: string;
  readonly isFilled: boolean;
  readonly wide: string;
  readonly narrow: string;
  readonly edges: string;
}

const rounded = (value: number): number => Math.round(value * 100) / 100;

/** The paths of a band inside a span; `x` takes hours, `y` mg/L. */
export function profileBand(
  band: ProfileBandInput,
  fromH: number,
  toH: number,
  x: (hours: number) => number,
  y: (mgPerL: number) => number,
): ProfileBand {
  const edge = (values: ArrayLike<number>) => curvePoints({ timesH: band.timesH, values }, fromH, toH);
  const stroke = line<[number, number]>()
    .x(([hours]) => rounded(x(hours)))
    .y(([, value]) => rounded(y(value)));
  const between = (low: ArrayLike<number>, high: ArrayLike<number>) => {
    const upper = edge(high);
    const fill = area<[number, number]>()
      .x(([hours]) => rounded(x(hours)))
      .y0(([, value]) => rounded(y(value)))
      .y1((_, i) => rounded(y(upper[i]![1])));
    return fill(edge(low)) ?? "";
  };
  return {
    id: band.id,
    isFilled: band.isFilled,
    wide: between(band.q05, band.q95),
    narrow: between(band.q25, band.q75),
    edges: `${stroke(edge(band.q05)) ?? ""}${stroke(edge(band.q95)) ?? ""}`,
  };
}
