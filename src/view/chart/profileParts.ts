import { type Analysis, type Band, concentrationWindow } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { numberPrint } from "../../core/units/index.ts";
import { bandOf } from "./bandAt.ts";
import type { ProfileBandInput } from "./profileBand.ts";
import type { ProfileCurveInput, ProfileInput, ProfileLevelInput } from "./profileScene.ts";

/** The curves, bands and levels of a profile. `lit`: the option whose band is filled; the others are lines. */
export function profileParts(
  value: Case,
  analysis: Analysis,
  factor: number,
  lit: string | null,
): Pick<ProfileInput, "curves" | "bands" | "levels" | "window"> {
  const ways = [
    { id: "given", name: "", curve: analysis.givenCurve, band: bandOf(analysis, null) },
    ...analysis.options.map(({ id, curve, band }) => ({ id, name: id, curve, band })),
  ];
  return {
    window: concentrationWindow(value),
    curves: ways.flatMap(({ id, name, curve, band }) => curvesOf(id, name, curve, band, id === "given" || id === lit)),
    bands: ways.flatMap(({ id, band }) => bandsOf(id, band, id === "given" || id === lit)),
    levels: analysis.levels.map((level): ProfileLevelInput => {
      const { fit } = level;
      return {
        id: level.id,
        atH: level.atH,
        value: level.measured,
        sd: level.assaySd,
        excluded: level.excluded !== null,
        belowLimit: level.belowLimit,
        label: `${level.belowLimit ? "below " : ""}${numberPrint(level.measured * factor, { significant: 3 })}`,
        predicted: fit && { low: fit.predicted.q05, median: fit.predicted.q50, high: fit.predicted.q95 },
        forecast: fit?.forecast
          ? { low: fit.forecast.predictive.q05, high: fit.forecast.predictive.q95, held: fit.forecast.held }
          : null,
      };
    }),
  };
}

/** This patient's median where the levels say one, with the typical patient's thin beside it where the band is filled; else the typical patient's alone. */
function curvesOf(
  id: string,
  name: string,
  typical: Analysis["givenCurve"],
  band: Band | null,
  isLit: boolean,
): ProfileCurveInput[] {
  if (band === null) return typical ? [{ id, name, ...typical }] : [];
  return [
    ...(typical && isLit ? [{ id: `${id}-typical`, of: id, isThin: true, name: "", ...typical }] : []),
    { id, name, timesH: band.timesH, values: band.q50 },
  ];
}

function bandsOf(id: string, band: Band | null, isFilled: boolean): ProfileBandInput[] {
  return band ? [{ id, isFilled, ...band }] : [];
}
