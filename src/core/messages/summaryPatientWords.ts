/** The words of the printed summary about whose figures it shows: this patient's, with intervals, or the typical one's and why. */
export const summaryPatientWords = {
  pending: "What the levels make of this patient is still being worked out.",
  setAside: (levels: number) =>
    `${levels === 1 ? "1 level adjusts" : `${levels} levels adjust`} this patient's curve, but the case is set to order by the typical patient's figures.`,
  whyTypical: (reason: string) =>
    `For the typical patient: no interval and no chance of staying in the window is given. ${reason}`,
  /** "9.95 mg per L (90 %: 8.1 to 12.3)" */
  spread: (median: string, low: string, high: string) => `${median} (90 %: ${low} to ${high})`,
  /** In a column that says what it is: "9.95 (8.1 to 12.3)" */
  cell: (median: string, low: string, high: string) => `${median} (${low}\u00a0to\u00a0${high})`,
  days: (figure: string) => `${figure} ${figure === "1" ? "day" : "days"}`,
  highest: "Highest",
  lowest: "Lowest",
  steady90After: "90 % of steady state after",
  spreadRemark: "Median (90 % interval).",
  typicalWhen: (highest: string, lowest: string) => `In the typical patient: ${lowered(highest)}; ${lowered(lowest)}.`,
  chanceOf: (what: string) => `Chances: of ${what}.`,
  overSpan: (span: string) => `These days: ${span}${span.endsWith(".") ? "" : "."}`,
  windowChance: (low: string, high: string) => `Window ${low} to ${high}: chance, hours`,
  chanceSteady: "chance when steady",
  chanceSpan: "these days",
  hoursColumn: "hours (90 %)",
  notAdjusted: (figure: string) => `${figure}, not adjusted`,
  levelsUsed: (used: number, out: number) =>
    `${used} used to adjust the prediction${out > 0 ? `, ${out} left out (hollow)` : ""}; residual in standard deviations of the residual error`,
  beforeFirstDose: "not used: drawn before the first counted dose",
  noForecast: "none",
  forecast: (range: string, held: boolean) => `${range}: ${held ? "held" : "did NOT hold"}`,
  parameter: "parameter",
  typical: "typical",
  variation: "ω",
  mostLikely: "most likely",
  median: "median",
  interval50: "50 % interval",
  interval90: "90 % interval",
  taught: "taught",
  taughtCell: (word: string, left: string) => `${word}: ${left} % of the spread left`,
  method: (method: string, steps: string) =>
    `Parameters are log-normal about the typical patient's, ω their standard deviation on the ln scale, √(ln(1 + CV²)) of the record's CV; most likely values found in ${steps} steps; ${method}. Median and intervals are of the draws.`,
  methodSource: "Method, accuracy and where it fails: docs/methods/levels-to-this-patient.md of the program.",
  figuresRemark: "typical patient, before the levels",
} as const;

function lowered(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1);
}
