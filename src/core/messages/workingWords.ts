import type { Analysis, Model, OptionResult, Traced } from "../analysis/index.ts";
import type { Case } from "../case/index.ts";
import { concentrationUnit, type DisplayUnit } from "../medicine/index.ts";
import { instantText } from "../time/index.ts";
import { numberPrint, quantityConvert, unitSpoken } from "../units/index.ts";
import { windowPointWords } from "./windowWords.ts";
import { workingUnit } from "./workingUnit.ts";

/** The arithmetic of one figure: formula, numbers put in, result, and where the parts come from. */
export interface WorkingWords {
  readonly title: string;
  readonly steps: readonly string[];
  readonly result: string;
  readonly sources: readonly string[];
}

/** Six digits: enough to check by hand, more than is shown on the bench. */
const six = (value: number): string => numberPrint(value, { significant: 6 });

/** A traced figure as "0.053 * min(weight, idealWeight) with weight = 58 kg …". */
export function tracedWords(figure: Traced): string {
  const unit = figure.unit === "1" ? "" : ` ${unitSpoken(figure.unit, "screen")}`;
  const inputs = figure.inputs.map(
    (input) => `${input.name} = ${six(input.value)}${input.unit === "1" ? "" : ` ${unitSpoken(input.unit, "screen")}`}`,
  );
  const formula =
    figure.formula === "" ? "" : `${figure.formula}${inputs.length > 0 ? `, with ${inputs.join(", ")}` : ""} = `;
  return `${formula}${six(figure.value)}${unit}`;
}

const provenance = (name: string, figure: Traced): string => `${name}: ${figure.source} (${figure.basis})`;

function modelSteps(model: Model): string[] {
  const steps = model.parameters.map(({ symbol, figure }) => `${symbol} = ${tracedWords(figure)}`);
  if (model.kind === "one-compartment" && model.clearance && model.eliminationRate) {
    steps.push(
      `ke = CL / V = ${six(model.clearance.value)} / ${six(model.volume.value)} = ${six(model.eliminationRate.value)} per h`,
    );
  }
  if (model.dispositions.length > 1) {
    steps.push(
      `${model.dispositions.length - 1} changes on the clock (kidney function measured again, events); steady state refers to the final state`,
    );
  }
  return steps;
}

function usedProducts(model: Model, option: OptionResult) {
  const used = new Set(option.doses.map((dose) => dose.product));
  return model.products.filter((product) => used.has(product.product));
}

function modelSources(model: Model, option: OptionResult): string[] {
  return [
    ...model.parameters.map(({ symbol, figure }) => provenance(symbol, figure)),
    ...usedProducts(model, option).flatMap((product) => [
      ...(product.absorptionRate ? [provenance(`ka of ${product.product}`, product.absorptionRate)] : []),
      ...product.inputFigures.map(({ words, figure }) => provenance(`${words}, ${product.product}`, figure)),
      provenance(`F of ${product.product}`, product.bioavailability),
      provenance(`lag of ${product.product}`, product.lag),
    ]),
  ];
}

function absorptionSteps(model: Model, option: OptionResult): string[] {
  return usedProducts(model, option).map((product) =>
    [
      `${product.product}: F = ${six(product.bioavailability.value)}`,
      ...(product.absorptionRate ? [`ka = ${six(product.absorptionRate.value)} per h`] : []),
      ...product.inputFigures.map(({ words, figure }) => `${words.toLowerCase()} ${tracedWords(figure)}`),
      `lag = ${six(product.lag.value)} h`,
    ].join(", "),
  );
}

/** What one dose does, a line a kind of model. */
const CURVES: Readonly<Record<Model["kind"], string>> = {
  "one-compartment":
    "one dose, first-order: C(t) = F·D·ka / (V·(ka − ke)) · (e^(−ke·t) − e^(−ka·t)), t from the end of the lag; other inputs by the same exponentials",
  "two-compartment":
    "one dose: three exponentials, the two of the compartments and that of absorption, t from the end of the lag",
  saturable: "dC/dt = input / V − Vmax · C / (Km + C) / V: no closed form, solved to 1e-9; doses do not add up",
};

/** The working of one reading of one option, concentrations in `unit`; null when there is nothing to show. */
export function readingWorking(
  value: Case,
  analysis: Analysis,
  optionId: string,
  row: string,
  unit: DisplayUnit = concentrationUnit(value.medicine),
): WorkingWords | null {
  const option = analysis.options.find((candidate) => candidate.id === optionId);
  const model = analysis.typical;
  if (!option?.typical || !model) return null;
  const { steadyState, span } = option.typical;
  const timed = steadyState?.timed ?? null;
  const clock = (hours: number) => instantText(analysis.clock.originMs + hours * 3_600_000, value.timeZone, "dayClock");
  const base = { sources: modelSources(model, option) };
  const shown = workingUnit(value, unit);
  const level = (mgPerL: number) => `${six(mgPerL * shown.factor)} ${shown.concentration}`;
  const exposure = (mgHours: number) => `${six(mgHours * shown.factor)} ${shown.exposure}`;
  const make = (title: string, steps: readonly string[], result: string): WorkingWords => ({
    title,
    steps,
    result,
    ...base,
  });
  const settledSteps = (found = "highest and lowest found where its slope is 0, or at a dose") => [
    ...modelSteps(model),
    ...absorptionSteps(model, option),
    CURVES[model.kind],
    `steady state: the same curve summed over all earlier doses of the pattern of ${six(steadyState!.periodH)} h (${six(steadyState!.dosePerPeriodMg)} mg); ${found}`,
  ];
  const inUnit = (steps: readonly string[]) => [...steps, ...shown.steps];
  const spanSteps = () => [
    ...modelSteps(model),
    ...absorptionSteps(model, option),
    CURVES[model.kind],
    `summed over every counted dose of the given lane and of option ${optionId}; found between doses on the curve itself, not on the drawing`,
    `span: ${clock(span.fromH)} to ${clock(span.toH)}, ${six(span.toH - span.fromH)} h`,
  ];
  const exposed = () => {
    const perDose = model.products.filter((product) => option.doses.some((dose) => dose.product === product.product));
    const f = perDose.length === 1 ? six(perDose[0]!.bioavailability.value) : "F of each product";
    return [
      ...modelSteps(model),
      `dose in the pattern of ${six(steadyState!.periodH)} h: ${six(steadyState!.dosePerPeriodMg)} mg, F = ${f}`,
    ];
  };
  switch (row) {
    case "peak":
      return steadyState && make("Highest at steady state", inUnit(settledSteps()), level(steadyState.peak));
    case "peakAfterDose":
      return (
        steadyState && make("Time from the dose to the highest", settledSteps(), `${six(steadyState.peakAfterDoseH)} h`)
      );
    case "lowest":
      return (
        steadyState &&
        make(
          "Lowest at steady state",
          inUnit(settledSteps()),
          `${level(steadyState.lowest)}, ${six(steadyState.lowestAfterDoseH)} h after a dose`,
        )
      );
    case "timed":
      return (
        timed &&
        make(
          timedTitle(timed.afterDoseH),
          inUnit(
            settledSteps(
              `read off it ${six(timed.afterDoseH)} h after each dose that no other follows sooner; where the next comes within the hours the level may be drawn, just before it`,
            ),
          ),
          timed.lowest === timed.highest ? level(timed.lowest) : `${level(timed.lowest)} to ${level(timed.highest)}`,
        )
      );
    case "average":
      return (
        steadyState &&
        make(
          "Average at steady state",
          inUnit([
            ...exposed(),
            model.clearance
              ? `average = F·D / (CL · ${six(steadyState.periodH)} h)`
              : "average = AUC over the period / period, from the balance: the mean of Vmax · C / (Km + C) equals F·D / period",
          ]),
          level(steadyState.average),
        )
      );
    case "auc24":
      return (
        steadyState &&
        make(
          "AUC in 24 hours at steady state",
          inUnit([...exposed(), `AUC = average · 24 h = ${six(steadyState.average)} mg/L · 24 h`]),
          exposure(steadyState.auc24),
        )
      );
    case "halfLife":
      return (
        model.halfLife &&
        make(
          "Half-life of elimination",
          [...modelSteps(model), `t½ = ${tracedWords(model.halfLife)}`],
          `${six(model.halfLife.value)} h`,
        )
      );
    case "accumulation":
      return (
        steadyState &&
        make(
          "Accumulation",
          [
            ...settledSteps(),
            `AUC over one pattern at steady state / AUC over the first pattern, from its first dose on, after starting from nothing`,
          ],
          `${six(steadyState.accumulation)} times`,
        )
      );
    case "timeTo90":
      return (
        steadyState &&
        make(
          "90 % of the way to steady state",
          [
            ...modelSteps(model),
            ...absorptionSteps(model, option),
            model.kind === "saturable"
              ? "Km·V / (Vmax − R)² · (2.303·Vmax − 0.9·R), R the dose rate (Winter, from memory, unverified)"
              : `ln 10 / k, with k the slower rate: here ${steadyState.slower}`,
            "counted from the first dose of the pattern, or from the last dose of a lead-in that goes on beyond it",
          ],
          `${six(steadyState.timeTo90H)} h: from ${clock(steadyState.steady90AtH)}`,
        )
      );
    case "dailyDose":
      return (
        steadyState &&
        make(
          "Dose in 24 hours",
          [`${six(steadyState.dosePerPeriodMg)} mg · 24 / ${six(steadyState.periodH)} h`],
          `${six(option.typical.dailyDoseMg ?? 0)} mg`,
        )
      );
    case "spanPeak":
      return make("Highest over the span", inUnit(spanSteps()), `${level(span.peak)} at ${clock(span.timeOfPeakH)}`);
    case "spanLowest":
      return make("Lowest over the span", inUnit(spanSteps()), `${level(span.lowest)} at ${clock(span.timeOfLowestH)}`);
    case "spanAverage":
      return make(
        "Average over the span",
        inUnit([
          ...spanSteps(),
          `AUC = ${six(span.auc)} mg·h/L by the exact integral between doses`,
          `average = AUC / ${six(span.toH - span.fromH)} h`,
        ]),
        level(span.average),
      );
    case "hoursBelow":
    case "hoursWithin":
    case "hoursAbove":
      return span.hoursWithin === null || !value.window
        ? null
        : make(
            "Hours below, within and above the window",
            [
              ...spanSteps(),
              `window ${windowEnds(value.window, value.medicine.molarMass.value)}; the crossings are solved for on each stretch between doses`,
            ],
            `below ${six(span.hoursBelow ?? 0)} h, within ${six(span.hoursWithin)} h, above ${six(span.hoursAbove ?? 0)} h`,
          );
    default:
      return null;
  }
}

/** In mg/L, as the curve is; a window stated in another unit says so too. */
function windowEnds({ low, high }: NonNullable<Case["window"]>, molarMass: number): string {
  const mgPerL = (end: typeof low) => six(quantityConvert(end, "mg/L", molarMass));
  const stated =
    low.unit === "mg/L" ? "" : ` (${six(low.value)} to ${six(high.value)} ${unitSpoken(low.unit, "screen")})`;
  return `${mgPerL(low)} to ${mgPerL(high)} mg/L${stated}`;
}

/** "Level 12 hours after the dose at steady state" */
export function timedTitle(afterDoseH: number): string {
  return `Level ${windowPointWords("trough", afterDoseH)} at steady state`;
}
