import { richWords } from "../../core/messages/index.ts";
import type { AfterOneDose, ToInfinity, WithinInterval } from "../../core/noncompartmental/index.ts";
import { numberPrint } from "../../core/units/index.ts";
import type { RichReading } from "./richReading.ts";

/** The unit concentrations are shown in. */
export type RichUnit = "mg/L" | "umol/L";

export interface RichFigure {
  readonly id: string;
  readonly name: string;
  readonly value: string;
}

const three = (value: number) => numberPrint(value, { significant: 3 });
const percent = (share: number) => `${numberPrint(share * 100, { significant: 3 })} %`;

/** Numbers with their units as the panel writes them; `factor` turns mg/L into the unit shown. */
export function richUnits(unit: RichUnit, factor: number) {
  const amount = unit === "mg/L" ? "mg" : "micromol";
  return {
    level: (value: number) => `${three(value * factor)} ${amount}/L`,
    area: (value: number) => `${three(value * factor)} ${amount}·h/L`,
    moment: (value: number) => `${three(value * factor)} ${amount}·h²/L`,
    hours: (value: number) => `${three(value)} h`,
    rate: (value: number) => `${three(value)} per h`,
  };
}

/** The table of results, in the order a reader checks them. */
export function richFigures(reading: RichReading, unit: RichUnit, factor: number): readonly RichFigure[] {
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
    ...figure("halfLife", found.halfLife === null ? null : show.hours(found.halfLife)),
    ...figure("rate", line && show.rate(line.rate)),
    ...figure("fit", line && richWords.fit(line.indices.length, numberPrint(line.adjustedRSquared, { decimals: 4 }))),
    ...(found.kind === "one-dose" ? oneDoseFigures(found) : intervalFigures(found)),
    ...figure("ka", residuals && residuals.ka !== null ? show.rate(residuals.ka) : null),
    ...figure("lag", residuals && residuals.lag !== null ? show.hours(residuals.lag) : null),
  ];

  function oneDoseFigures({ auc, observed, predicted, tlast }: AfterOneDose): RichFigure[] {
    const to = (value: number) => `${show.area(value)} ${richWords.upTo(show.hours(tlast))}`;
    const carried = (pick: (each: ToInfinity) => number, print: (value: number) => string) =>
      richWords.bothLast(print(pick(observed)), print(pick(predicted)));
    return [
      ...figure("aucLinear", to(auc.linear)),
      ...figure("aucLogDown", to(auc["linear-up-log-down"])),
      ...figure(
        "aucInfinity",
        carried((each) => each.auc, show.area),
      ),
      ...figure("carriedOn", percent(observed.extrapolatedShare)),
      ...figure("aumcInfinity", show.moment(observed.aumc)),
      ...figure("mrt", show.hours(observed.mrt)),
      ...figure("clearance", `${three(observed.clearance)} L/h`),
      ...figure("volume", `${three(observed.volume)} L`),
    ];
  }

  function intervalFigures({ interval }: WithinInterval): RichFigure[] {
    return [
      ...figure("aucInterval", `${show.area(interval.auc)} ${richWords.inInterval(show.hours(interval.tau))}`),
      ...figure("carriedOn", percent(interval.extrapolatedShare)),
      ...figure("average", show.level(interval.average)),
      ...figure("clearance", `${three(interval.clearance)} L/h`),
      ...figure("volume", interval.volume === null ? null : `${three(interval.volume)} L`),
    ];
  }
}
