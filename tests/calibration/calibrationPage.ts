import { markdownTable, markdownText } from "../../.ci/markdown.ts";
import { numberPrint } from "../../src/core/units/index.ts";
import type { CalibrationResults, ForecastRow, MeanWithError, ModelCalibration } from "./calibrationResults.ts";
import { shareRange } from "./rankUniformity.ts";

const BEGIN = "<!-- made by npm run calibrate: from here -->";
const END = "<!-- made by npm run calibrate: to here -->";
/** Below it ranks are called uneven. */
export const LEAST_P = 0.01;

/** The page with its part about the calibration made again from the results; a page without the two marks throws a RangeError. */
export function calibrationInto(page: string, results: CalibrationResults): string {
  const begin = page.indexOf(BEGIN);
  const end = page.indexOf(END);
  if (begin < 0 || end < begin) throw new RangeError(`page: must hold "${BEGIN}" and after it "${END}"`);
  return `${page.slice(0, begin)}${BEGIN}\n\n${calibrationSection(results)}\n\n${page.slice(end)}`;
}

/** What stands between the marks: tables in Markdown. */
export function calibrationSection(results: CalibrationResults): string {
  const { models } = results;
  const rows = (cells: (model: ModelCalibration) => readonly string[][]) =>
    models.flatMap((model) => cells(model).map((row, i) => [i === 0 ? markdownText(model.id) : "", ...row]));
  return [
    `Run of ${results.date}, engine ${results.engine}, ${results.machine}, ${results.seconds} s of processor time. Patient n of a model has the seed first + n, for the patient and for the draws. Full figures: tests/calibration/results.json.`,
    markdownTable(
      ["model", "what", "record", "typical", "ω", "residual", "patients", "first seed"],
      models.map((model) => [
        model.id,
        markdownText(model.name),
        `${model.record}, version ${model.recordVersion}`,
        Object.entries(model.typical)
          .map(([name, value]) => `${name} ${figure(value)}`)
          .join(", "),
        model.random.map(({ symbol, omega }) => `${symbol} ${figure(omega)}`).join(", "),
        residualText(model),
        String(model.patients),
        String(model.firstSeed),
      ]),
    ),
    "How often the engine had no answer, or another road was taken:",
    markdownTable(
      ["model", "patients", "not converged", "withheld", "by the chain", "levels below the limit"],
      models.map(({ id, fits, patients }) => [
        id,
        String(patients),
        share(fits.notConverged, patients),
        share(fits.withheld, patients),
        share(fits.chain, patients),
        share(fits.belowLimit, fits.levels),
      ]),
    ),
    `Ranks of the truth among ${results.rankDraws} draws, 1 to 4 levels a patient, chi-square over 21 bins:`,
    markdownTable(
      ["model", "quantity", "χ² (20 degrees)", "p"],
      rows(({ ranks }) => ranks.map(({ quantity, chiSquare, p }) => [quantity, fixed(chiSquare, 1), chance(p)])),
    ),
    verdict(results),
    "![Rank histograms with the range expected of even ranks, and coverage of central intervals](pictures/calibration.svg)",
    "Coverage, %: the next trough, and the share of the times of the next interval at which the true curve lies inside the band. In brackets how far chance alone takes it (trough: 95 % range of a share; band: 1.96 standard errors):",
    markdownTable(
      ["model", "patients", "trough, 50 %", "trough, 90 %", "band, 50 %", "band, 90 %"],
      models.map(({ id, coverage }) => [
        id,
        String(coverage.patients),
        `${percent(coverage.trough50)} (± ${percent(shareRange(0.5, coverage.patients))})`,
        `${percent(coverage.trough90)} (± ${percent(shareRange(0.9, coverage.patients))})`,
        bandText(coverage.band50),
        bandText(coverage.band90),
      ]),
    ),
    "The next trough forecast, error in % of the true trough; the forecast is the median of the draws, that of the typical patient the record's own curve with the interval of the prior:",
    markdownTable(
      [
        "model",
        "levels",
        "patients",
        "mean error (± 1.96 standard errors)",
        "root mean squared error",
        "median size of error",
        "inside the 90 % interval",
      ],
      rows(({ forecasts }) => forecasts.map(forecastCells)),
    ),
  ].join("\n\n");
}

function verdict({ models, planted }: CalibrationResults): string {
  const all = models.flatMap(({ id, ranks }) => ranks.map((rank) => ({ ...rank, id })));
  const uneven = all.filter(({ p }) => p <= LEAST_P);
  const least = all.reduce((a, b) => (b.p < a.p ? b : a));
  const found =
    uneven.length === 0
      ? `No p at or below ${LEAST_P}; the smallest of ${all.length} is ${chance(least.p)} (${least.id}, ${least.quantity}).`
      : `**Uneven (p at or below ${LEAST_P}): ${uneven.map(({ id, quantity, p }) => `${id}, ${quantity} (${chance(p)})`).join("; ")}.** Of ${all.length} even ones, one falls that low in ${percent(1 - (1 - LEAST_P) ** all.length)} of 100 runs.`;
  return `${found} A fault put in on purpose shows: where ${planted.fault}, ${planted.patients} patients (${planted.model}) give χ² ${fixed(planted.chiSquare, 1)} for the ${planted.quantity}, p ${chance(planted.p)}.`;
}

function forecastCells(row: ForecastRow): string[] {
  const { mean, standardError } = row.meanError;
  return [
    row.levels === 0 ? "none: typical patient" : String(row.levels),
    String(row.patients),
    `${signed(mean)} (± ${fixed(1.96 * standardError, 1)})`,
    fixed(row.rootMeanSquare, 1),
    fixed(row.medianAbsolute, 1),
    `${percent(row.cover90)} (± ${percent(shareRange(0.9, row.patients))})`,
  ];
}

function residualText({ residual: { additive, proportional }, limit }: ModelCalibration): string {
  const parts = [
    ...(additive > 0 ? [`${figure(additive)} mg/L`] : []),
    ...(proportional > 0 ? [`${figure(100 * proportional)} %`] : []),
  ];
  return `${parts.join(" and ")}; limit ${figure(limit)} mg/L`;
}

function bandText({ mean, standardError }: MeanWithError): string {
  return `${percent(mean)} (± ${percent(1.96 * standardError)})`;
}

const figure = (value: number) => numberPrint(value, { significant: 3 });
const fixed = (value: number, places: number) => value.toFixed(places).replace("-", "−");
const signed = (value: number) => `${value > 0 ? "+" : ""}${fixed(value, 1)}`;
const percent = (value: number) => fixed(100 * value, 1);
const chance = (p: number) => (p < 0.001 ? p.toExponential(0).replace("-", "−") : p.toFixed(3));
const share = (part: number, whole: number) => (part === 0 ? "0" : `${part} (${percent(part / whole)} %)`);
