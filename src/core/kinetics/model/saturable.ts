import { rootBracketed } from "../../numerics/index.ts";
import { modelPositive } from "./modelArgument.ts";
import type { ModelKind, PeriodRun } from "./modelKind.ts";
import type { Saturation } from "./saturableSeries.ts";
import { SaturableStretch } from "./saturableStretch.ts";
import { SaturableSweepBody } from "./saturableSweepBody.ts";

/** One compartment whose elimination saturates: rate = vmax·C/(km + C). */
export interface SaturableDisposition {
  readonly kind: "saturable";
  /** The most that can be eliminated, mg/h, above 0. */
  readonly vmax: number;
  /** The level at which half of that is, mg/L, above 0. */
  readonly km: number;
  /** L, above 0. */
  readonly volume: number;
}

const saturationOf = ({ vmax, km, volume }: SaturableDisposition): Saturation => ({ vmax, half: km * volume });

/** How near the amount at the start of a period is found, as a part of the largest amount tried. */
const NEAR = 1e-15;

/**
 * The amount at the start of a period that the period gives back.
 *
 * Formula: f(b) = end − b = 0; f falls and is convex, f′ = e^(−∫vmax·half/(half + body)²) − 1. Where more than half of vmax is in use
 * f is computed as vmax·(∫half/(half + body) − period·(vmax − doseRate)/vmax), the balance of the period, in which nothing cancels
 * however near the dose rate is to vmax. Newton steps inside a bracket.
 */
function steadyBody(disposition: SaturableDisposition, period: number, doseRate: number, run: PeriodRun): Float64Array {
  const { vmax, half } = saturationOf(disposition);
  const spare = (vmax - doseRate) / vmax;
  let at = Number.NaN;
  let change = 0;
  let slope = 0;
  const evaluate = (body: number) => {
    if (body === at) return;
    let free = 0;
    let squared = 0;
    let end = body;
    for (const { stretch, length } of run(Float64Array.of(body))) {
      if (!(stretch instanceof SaturableStretch)) throw new Error("saturable: a stretch of another kind");
      const part = stretch.freeTo(length);
      free += part.free;
      squared += part.squared;
      end = stretch.bodyAt(length)[0]!;
    }
    at = body;
    change = spare < 0.5 ? vmax * (free - period * spare) : end - body;
    slope = Math.expm1(-(vmax / half) * squared);
  };
  const changeAt = (body: number) => {
    evaluate(body);
    return change;
  };
  const slopeAt = (body: number) => {
    evaluate(body);
    return slope;
  };

  const guess = (half * doseRate) / (vmax - doseRate);
  let high = guess + doseRate * period;
  while (changeAt(high) > 0) high *= 2;
  const found = rootBracketed(changeAt, slopeAt, 0, high, Math.min(guess, high), NEAR * high);
  if (!found.converged && changeAt(0) > 0) throw new Error("saturable: the steady state was not found");
  return Float64Array.of(Math.max(0, found.root));
}

export const saturable = {
  kind: "saturable",
  superposes: false,
  compartments: 1,
  figures: ["vmax", "km", "volume"],
  sweepBody: (state) => new SaturableSweepBody(state),
  check: (name, { vmax, km, volume }) => {
    modelPositive(`${name}.vmax`, vmax, "mg/h");
    modelPositive(`${name}.km`, km, "mg/L");
    modelPositive(`${name}.volume`, volume, "L");
    modelPositive(`${name}.vmax / (km × volume)`, vmax / (km * volume), "/h");
  },
  stretch: (disposition, body, inflow, length) =>
    new SaturableStretch(saturationOf(disposition), disposition.volume, body[0]!, inflow, length),
  equations: ({ vmax, km, volume }, input, x, change, at) => {
    const level = x[at]! / volume;
    change[at] = input - (vmax * level) / (km + level);
  },
  capacity: ({ vmax }) => vmax,
  steadyBody,
  hoursToSteady: (disposition, doseRate, fraction) => {
    const { vmax, half } = saturationOf(disposition);
    const spare = vmax - doseRate;
    return (half / spare / spare) * (-Math.log1p(-fraction) * vmax - fraction * doseRate);
  },
  // The higher the level the slower it falls: no half-life describes it, least of all the one at a level near 0.
  halfLife: () => null,
  bothReadings: () => null,
  distributionEnd: () => 0,
} as const satisfies ModelKind<SaturableDisposition>;
