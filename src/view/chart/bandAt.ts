import type { Band, Spread } from "../../core/analysis/index.ts";

/** Limits at one instant, read off between the band's own times as the drawing does; null outside them. */
export function bandAt(band: Band, hours: number): Spread | null {
  const at = (values: Float64Array) => valueAt(band.timesH, values, hours);
  const [q05, q25, q50, q75, q95] = [at(band.q05), at(band.q25), at(band.q50), at(band.q75), at(band.q95)];
  return q05 === null || q25 === null || q50 === null || q75 === null || q95 === null
    ? null
    : { q05, q25, q50, q75, q95 };
}

/** A drawn curve at one instant, linear between its points; null outside them. */
export function valueAt(timesH: Float64Array, values: Float64Array, hours: number): number | null {
  const last = timesH.length - 1;
  if (last < 0 || hours < timesH[0]! || hours > timesH[last]!) return null;
  let low = 0;
  let high = last;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (timesH[middle]! <= hours) low = middle;
    else high = middle;
  }
  const gap = timesH[high]! - timesH[low]!;
  const share = gap > 0 ? (hours - timesH[low]!) / gap : 0;
  return values[low]! + share * (values[high]! - values[low]!);
}

/** The band of an option, or of the doses given (null). */
export function bandOf(
  analysis: {
    readonly givenBand: Band | null;
    readonly options: readonly { readonly id: string; readonly band: Band | null }[];
  },
  option: string | null,
): Band | null {
  return option === null ? analysis.givenBand : (analysis.options.find(({ id }) => id === option)?.band ?? null);
}
