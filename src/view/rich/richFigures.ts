import type { DisplayUnit } from "../../core/medicine/index.ts";
import { richWords } from "../../core/messages/index.ts";
import type { AfterOneDose, WithinInterval } from "../../core/noncompartmental/index.ts";
import { numberPrint, unitSpoken } from "../../core/units/index.ts";
import type { RichReading } from "./richReading.ts";

/** The unit concentrations are shown in. */
export type RichUnit = DisplayUnit;

export interface RichFigure {
  readonly id: string;
  readonly name: string;
  readonly value: string;
}

const three = (value: number) => numberPrint(value, { significant: 3 });
/** Keeps a number on one line with its unit. */
const NBSP = "\u00a0";
const percent = (share: number) => `${three(share * 100)}${NBSP}%`;

/** Numbers with their units as the panel writes them; `factor` turns mg/L into the unit shown. */
export function richUnits(unit: RichUnit, factor: number) {
  const amount = unitSpoken(unit, "screen").replace(/\/L$/, "");
  return {
    level: (value: number) => `${three(value * factor)}${NBSP}${amount}/L`,
    area: (value: number) => `${three(value * factor)}${NBSP}${amount}·h/L`,
    moment: (value: number) => `${three(value * factor)}${NBSP}${amount}·h²/L`,
    hours: (value: number) => `${three(value)}${NBSP}h`,
    rate: (value: number) => `${three(value)}${NBSP}per${NBSP}h`,
    clearance: (value: number) => `${three(value)}${NBSP}L/h`,
    volume: (value: number) => `${three(value)}${NBSP}L`,
  };
}

/** The table of results, in the order a reader checks them; without a half-life where elimination saturates. */
export function richFigures(
  reading: RichReading,
  saturates: boolean,
  unit: RichUnit,
  factor: number,
): readonly RichFigure[] {
  const { result, residuals } = reading;
  if (!result.ok) return [];
  const found = result.value;
  const show = richUnits(unit, factor);
  const { names } = richWords;
  const figure = (id: keyof typeof names, value: string | null): RichFigure[] =>
    value === null ? [] : [{ id, name: names[id], value }];
  const line = found.terminal;
  return [
    ...figure("cmax", show.level(found.cmax)),
    ...figure("tmax", show.hours(found.tmax)),
    ...figure("halfLife", found.halfLife === null || saturates ? null : show.hours(found.halfLife)),
    ...figure("rate", line && show.rate(line.rate)),
    ...figure("fit", line && richWords.fit(line.indices.length, numberPrint(line.adjustedRSquared, { decimals: 4 }))),
    ...(found.kind === "one-dose" ? oneDoseFigures(found) : intervalFigures(found)),
    ...figure("ka", residuals && residuals.ka !== null ? show.rate(residuals.ka) : null),
    ...figure("lag", residuals && residuals.lag !== null ? show.hours(residuals.lag) : null),
  ];

  function oneDoseFigures({ auc, observed, predicted, tlast }: AfterOneDose): RichFigure[] {
    const to = (value: number) => `${show.area(value)} ${richWords.upTo(show.hours(tlast))}`;
    return [
      ...figure("aucLinear", to(auc.linear)),
      ...figure("aucLogDown", to(auc["linear-up-log-down"])),
      ...figure("aucInfinity", show.area(observed.auc)),
      ...figure("aucPredicted", show.area(predicted.auc)),
      ...figure("carriedOn", percent(observed.extrapolatedShare)),
      ...figure("aumcInfinity", show.moment(observed.aumc)),
      ...figure("mrt", show.hours(observed.mrt)),
      ...figure("clearance", show.clearance(observed.clearance)),
      ...figure("volume", show.volume(observed.volume)),
    ];
  }

  function intervalFigures({ interval }: WithinInterval): RichFigure[] {
    return [
      ...figure("aucInterval", `${show.area(interval.auc)} ${richWords.inInterval(show.hours(interval.tau))}`),
      ...figure("carriedOn", percent(interval.extrapolatedShare)),
      ...figure("average", show.level(interval.average)),
      ...figure("clearance", show.clearance(interval.clearance)),
      ...figure("volume", interval.volume === null ? null : show.volume(interval.volume)),
    ];
  }
}
