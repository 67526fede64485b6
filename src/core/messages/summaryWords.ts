/**
 * The words of the printed summary. Amounts, concentrations and times arrive already printed (units in words, "per", never a slash).
 * No sentence ends with the symbol of a unit: a full stop after it can be read as a digit.
 */
export const SUMMARY_TITLES = {
  heading: "Oral regimen summary",
  expectedSteady: "Expected at steady state",
  expectedSpan: "Expected over the days shown",
  hours: "Hours in the window",
  kinetics: "Kinetic basis",
  levels: "Levels",
  nextLevel: "Next level",
  cautions: "Cautions",
  assumes: "This prediction assumes",
  window: "Target window",
  individual: "This patient, from the levels",
  levelsSay: "What each level says",
  figures: "Figures, with formula and source",
  doses: "Doses counted",
  concerns: "Concerns in full",
  elements: "For the record",
  sources: "Sources",
  notes: "Notes of the case",
} as const;

export const SUMMARY_COLUMNS = {
  drawn: "drawn",
  afterDose: "after dose",
  measured: "measured",
  predicted: "predicted",
  difference: "difference",
  predictedOwn: "predicted (90 %)",
  residual: "residual",
  forecast: "forecast before it (90 %)",
  figure: "figure",
  value: "value",
  formula: "formula, and what went in",
  source: "source and basis",
} as const;

export const SUMMARY_BUTTONS = {
  screen: "Summary, as it will be printed",
  print: "Print",
  refused: "Not printed now",
  back: "Back to the bench",
  working: "The figures are being worked out …",
  noCase: "No case is open.",
} as const;

export const SUMMARY_STATEMENT =
  "Supports, and does not replace, a licensed professional's judgement and local policy. Check against current product information before use.";

export const NOT_RECORDED = "not recorded";
export const WATERMARK = "demo — invented patient";

/** Joins with commas and a last "and": "a, b and c". */
export function listWords(items: readonly string[], last: "and" | "or" = "and"): string {
  if (items.length < 2) return items[0] ?? "";
  return `${items.slice(0, -1).join(", ")} ${last} ${items[items.length - 1]}`;
}

export function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

const plural = (count: number, one: string, many = `${one}s`): string => (count === 1 ? one : many);
const perKgWords = (perKg: string | null): string => (perKg ? `, ${perKg} per kg per day` : "");

export const summaryHeadWords = {
  sex: { female: "woman", male: "man" },
  unlabelled: "case without a label",
  sexUnknown: "sex not recorded",
  ageUnknown: "age not recorded",
  weightUnknown: "weight not recorded",
  heightUnknown: "height not recorded",
  printed: (when: string) => `printed ${when}`,
  saved: (when: string) => `saved ${when}`,
  notSaved: "case not saved as shown",
  readOnly: "read-only copy",
  marks: (titles: readonly string[]) => titles.join(" · "),
  details: (heading: string) => `${heading}: details`,
  preparedBy: "prepared by, date, time",
  checkedBy: "independently checked by, date, time",
  footer: (program: string, record: string, fingerprint: string) => `Ebbline ${program} · ${record} · ${fingerprint}`,
  record: (name: string, version: number) => `record “${name}” version ${version}`,
  fingerprint: (groups: string) => `fingerprint ${groups}`,
  recompute: (command: string) =>
    `Export the case and run ${command} with its file: it prints the figures of this summary and this fingerprint:`,
} as const;

export const summaryChartWords = {
  title: (medicine: string) => `${medicine} concentration over time`,
  between: (low: string, high: string) => `predicted between ${low} and ${high} from the now line on`,
  ownBetween: (low: string, high: string) =>
    `this patient's median lowest ${low} and highest ${high} from the now line on, with 50 and 90 % bands`,
  levels: (count: number) => `${count} ${plural(count, "level")} measured`,
  individual: "Thick: this patient, median; greys: 50 and 90 % intervals; dotted: typical patient.",
  forecast: "Bar left of a level: its 90 % forecast before it was known.",
  missed: "Dashed bar: did not hold.",
  leftOut: "Hollow: left out.",
  unit: "mg per L",
  given: "given",
  proposed: "proposed",
} as const;

/** What is printed across the sheet. */
export const summaryBannerWords = {
  notForUse: (reason: string) => ({ title: "Not for use", text: reason }),
  nothingLeft: (text: string) => ({ title: "A line with no dose to come", text }),
  notMakeable: (text: string) => ({ title: "Cannot be given as written", text }),
  unchecked: {
    title: "Unchecked",
    text: "The medicine record is not independently reviewed. Not an order until checked and signed below.",
  },
  unverified: (count: number, total: number) => `${count} of ${total} figures unverified`,
} as const;

/** The chosen option in plain sentences. */
export const summaryOrderWords = {
  option: (id: string, label: string) =>
    ["", id, `Option ${id}`].includes(label) ? `Option ${id}` : `Option ${id}, ${label}`,
  product: (medicine: string, strength: string, product: string) => `${capitalised(medicine)} ${strength} ${product}`,
  productPlain: (medicine: string, product: string) => `${capitalised(medicine)} ${product}`,
  liquid: (medicine: string, product: string, concentration: string) =>
    `${capitalised(medicine)} ${product}, ${concentration}`,
  /** "2 tablets", "half a tablet", "1 and a half tablets": a half in words, never a fraction that can be misread. */
  pieces: (count: number, form: string) => {
    const whole = Math.floor(count);
    if (count === whole) return `${whole} ${plural(whole, form)}`;
    return whole === 0 ? `half a ${form}` : `${whole} and a half ${form}s`;
  },
  ofStrength: (pieces: string, strength: string) => `${pieces} of ${strength}`,
  together: (parts: readonly string[]) => `${listWords(parts)}, taken together,`,
  byMouth: (take: string, schedule: string) => `${take} by mouth ${schedule}`,
  concentration: (amount: string, volume: string) => `${amount} in ${volume}`,
  liquidTake: (volume: string, amount: string) => `${volume} (${amount})`,
  once: "once",
  every: (hours: string, clock: readonly string[]) =>
    `every ${hours === "1" ? "hour" : `${hours} hours`}${clock.length === 0 ? "" : `, at ${listWords(clock)}`}`,
  everyDay: (clock: readonly string[]) =>
    clock.length === 1 ? `every day at ${clock[0]}` : `at each of ${listWords(clock)}, every day`,
  /** `days`: "Monday, Wednesday and Friday". */
  onWeekdays: (days: string, clock: readonly string[]) =>
    clock.length === 1 ? `on ${days} at ${clock[0]}` : `on ${days}, at each of ${listWords(clock)}`,
  firstDose: (when: string) => `First dose ${when}.`,
  onlyDose: (when: string) => `One dose, ${when}.`,
  lastDose: (count: number, when: string) => `${count} doses, the last ${when}.`,
  untilReview: "No end date: until reviewed.",
  clockChange: (when: string, clock: readonly string[]) =>
    `The clocks change: the interval stays as written in elapsed hours, so from ${when} the dose falls at ${listWords(clock)}.`,
  perDose: (amount: string) => `${amount} per dose.`,
  active: (name: string) => `of active ${name}`,
  total: (perDose: string, perDay: string, perKg: string | null, isAverage: boolean) =>
    `${perDose} per dose, ${isAverage ? "on average " : ""}${perDay} per day${perKgWords(perKg)}.`,
  settlesAt: (perDay: string, perKg: string | null, isAverage: boolean) =>
    `Settles at ${isAverage ? "on average " : ""}${perDay} per day${perKgWords(perKg)}.`,
  together24: (perDay: string, perKg: string | null, isAverage: boolean) =>
    `Together ${isAverage ? "on average " : ""}${perDay} per day${perKgWords(perKg)}.`,
  perKgUnknown: "Dose per kg: weight not recorded.",
  swallowWhole: "Swallow whole.",
  measureLiquid: "Measure with an oral syringe marked in mL only.",
  replaces: (what: string) => `Replaces ${what}.`,
  continues: (what: string) => `Continues ${what}, unchanged.`,
  noneRunning: "No regimen was running at the now line.",
  noneRunningSince: (last: string) => `No regimen was running at the now line; ${last}.`,
  /** `dose`: "450 mg" or "tablet, 450 mg". */
  lastGiven: (dose: string, when: string) => `last dose ${dose}, ${when}`,
  since: (when: string) => ` (last dose ${when})`,
  noneGiven: "No dose is recorded as given before.",
  running: (amount: string, schedule: string) => `${amount} ${schedule}`,
  ofProduct: (product: string, amount: string) => `${product}, ${amount}`,
  missed: (when: string) => `The dose of ${when} is left out.`,
  moved: (when: string, to: string) => `The dose of ${when} is given on ${to} instead.`,
  changed: (when: string, amount: string) => `The dose of ${when} is ${amount} instead.`,
  beforeNow: (count: number) =>
    `${count} ${plural(count, "dose")} before the now line ${plural(count, "is", "are")} not part of this order.`,
  nothingLeft: (amount: string) => `${amount}: every dose of this line lies before the now line or is left out.`,
  notMakeable: (amount: string, strengths: readonly string[], isHalf: boolean, form: string) =>
    strengths.length === 0
      ? `${amount}: the record lists no strength of this ${form}.`
      : `From ${isHalf ? `whole or half ${form}s` : `whole ${form}s`} of ${listWords(strengths, "or")}, ${amount} cannot be made.`,
} as const;

/** Expected readings, hours in the window, kinetic basis. */
export const summaryReadingWords = {
  typical: "typical patient",
  individual: "this patient",
  titled: (title: string, rest: string) => `${title}, ${rest}`,
  span: (from: string, to: string) => `${from} to ${to}`,
  hours: (figure: string) => `${figure} ${figure === "1" ? "hour" : "hours"}`,
  highest: (hours: string) => `Highest, ${hours} after a dose`,
  lowestBefore: "Lowest, just before a dose",
  lowestAfter: (hours: string) => `Lowest, ${hours} after a dose`,
  highestAt: (when: string) => `Highest, ${when}`,
  lowestAt: (when: string) => `Lowest, ${when}`,
  timed: (hours: string) => `${capitalised(hours)} after a dose`,
  timedLowest: (hours: string) => `${capitalised(hours)} after a dose, the lowest`,
  timedNever: "never: the next dose comes sooner",
  timedHighest: (hours: string) => `${capitalised(hours)} after a dose, the highest`,
  average: "Average",
  auc24: "AUC in 24 hours",
  accumulation: "Accumulation",
  times: (figure: string) => `${figure} times`,
  steady90: "90 % of steady state from",
  noRepeat: "The option does not repeat, so it has no steady state.",
  neverSteady: "No steady state: more is taken than can be eliminated, and the level rises without end.",
  noCommonPeriod: "The lines have no common period within two weeks, so no steady state is given.",
  hoursOf: (title: string, low: string, high: string) => `${title} of ${low} to ${high}`,
  below: "below",
  within: "within",
  above: "above",
  clearance: (isApparent: boolean) => (isApparent ? "Clearance, over bioavailability" : "Clearance"),
  volume: (isApparent: boolean) => (isApparent ? "Volume, over bioavailability" : "Volume"),
  halfLife: "Half-life",
  absorption: "Absorption rate",
  lag: "Lag before absorption",
  bioavailability: "Bioavailability",
  noModel: "No prediction: something the model needs is missing. See the concerns.",
  flipFlop: (product: string, elimination: string, absorption: string) =>
    `Half-life taken as ${elimination} for elimination and ${absorption} for absorption from the ${product}; exchanged, they draw the same curve with the same clearance.`,
} as const;

export const summaryLevelWords = {
  none: "No level is recorded.",
  compared: "Compared with the prediction, not used to adjust it.",
  leftOut: (reason: string) => `left out: ${reason}`,
  belowLimit: (limit: string) => `below the limit of ${limit}`,
  asTyped: (typed: string, converted: string) => `${typed} (${converted})`,
  noPrediction: "none",
  noDose: "no dose before",
  more: (figure: string) => `+ ${figure}`,
  less: (figure: string) => `− ${figure}`,
} as const;

export const summaryAssumptionWords = {
  typical: (kind: string) => `${kind}, typical patient: levels are compared and not used to adjust`,
  individual: (kind: string) => `${kind}, this patient: adjusted by the levels`,
  levels: (used: string, leftOut: string) =>
    `levels used: ${used}${leftOut === "" ? "; none left out" : `; left out: ${leftOut}`}`,
  residuals: { normal: "normal residuals", robust: "robust residuals (Student t, 4 degrees of freedom)" },
  methods: { importance: "importance sampling", chain: "Markov chain" },
  method: (found: {
    readonly residuals: string;
    readonly method: string;
    readonly seed: string;
    readonly draws: string;
    readonly effective: string;
    readonly paretoK: string | null;
    readonly rHat: string | null;
  }) =>
    [
      `${found.residuals}; ${found.method}, seed ${found.seed}, ${found.draws} draws, effective size ${found.effective}`,
      ...(found.paretoK === null ? [] : [`Pareto k ${found.paretoK} (trusted to 0.7)`]),
      ...(found.rHat === null ? [] : [`R-hat ${found.rHat}`]),
    ].join(", "),
  estimates: {
    "one-model": "the record's figures were estimated together in one model, where its text does not say otherwise",
    "pieced-together": "the record's figures were pieced together from different studies, never estimated together",
  },
  effect: (detail: string, from: string, clearance: string, volume: string | null, source: string) =>
    `${detail} from ${from}: clearance ${clearance} % of usual${volume === null ? "" : `, volume ${volume} %`} is in the figures (${source})`,
  ownFigure: "the user's own figure",
  kinds: {
    "one-compartment": "one-compartment model",
    "two-compartment": "two-compartment model",
    saturable: "one compartment, saturable elimination (Michaelis–Menten)",
  },
  changes: (count: number, last: string) =>
    `kinetics change ${count === 1 ? "once" : `${count} times`} during the course, last ${last}; steady state refers to the final state`,
  crossCheck: {
    agreed: "cross-check: profile and exposure worked out again by plain numerical integration, and agree",
    differs: "cross-check: does NOT agree with plain numerical integration; do not use",
    none: "cross-check by numerical integration not made",
  },
  record: (name: string, version: number, review: string, unverified: string) =>
    `record “${name}” version ${version}, ${review}; ${unverified}`,
  notReviewed: "not independently reviewed",
  reviewed: (by: string, on: string) => `reviewed by ${by}, ${on}`,
  noDoses: "no dose given before",
  doses: (counted: number, missed: string, late: string) =>
    [`${counted} ${plural(counted, "dose")} taken as listed`, missed, late].filter((part) => part !== "").join("; "),
  missed: (list: string) => `missed: ${list}`,
  late: (when: string, at: string) => `${when} taken ${at}`,
  lateAll: (list: string) => `late or moved: ${list}`,
  many: (list: string, more: number) => `${list}, and ${more} more (see details)`,
  kidney: (value: string) => `kidney function ${value}`,
  kidneyBy: (value: string, formula: string, weight: string) => `${value} (${formula}, ${weight} weight)`,
  now: (when: string, zone: string) =>
    `doses up to the now line (${when}) as given, from it on as proposed; clock times of ${zone}`,
} as const;

export const summaryDetailWords = {
  window: (about: string, low: string, high: string, basis: string) => `${about}, ${low} to ${high}; basis: ${basis}`,
  measuredAt: (value: string, when: string) => `${value}, ${when}`,
  cockcroftGault: "Cockcroft–Gault",
  weight: "Weight",
  creatinine: "Serum creatinine",
  idealWeight: "Ideal weight",
  adjustedWeight: "Adjusted weight",
  creatinineClearance: "Creatinine clearance, Cockcroft–Gault",
  phenytoinForAlbumin: "Phenytoin level corrected for its albumin",
  eliminationRate: "Elimination rate",
  numbered: (number: number) => `(${number})`,
  marked: (text: string) => `${text}\u00a0*`,
  cited: (text: string, number: number) => `${text}\u00a0(${number})`,
  markRemark: "(n) source n in the details; * from memory or common practice, unverified.",
  sourcesRemark: "(n) source n in the details.",
  sourceAndBasis: (source: string, basis: string) => `${source} ${basis}`,
  bases: {
    seen: "read",
    derived: "derived",
    memory: "from memory, unverified",
    "common practice": "common practice",
    invented: "invented",
  },
  input: (name: string, value: string) => `${name} = ${value}`,
  line: (product: string, amount: string, schedule: string, start: string) =>
    `${product}: ${amount} ${schedule}, from ${start}.`,
  dose: (when: string, amount: string, status: string) => `${when}: ${amount}${status}`,
  status: {
    taken: "",
    missed: ", missed",
    late: ", late",
    moved: ", moved",
    "after-now": ", after the now line, not counted",
    "before-now": ", before the now line, not counted",
  },
  earlier: (count: number, first: string) => `and ${count} earlier ${plural(count, "dose")} from ${first} on`,
  noDoses: "No dose is recorded as given.",
} as const;

/** Rows of the details: what a note on a pharmacokinetic question should contain. */
export const summaryElementWords = {
  purpose: "Purpose, requester",
  assay: "Specimen, assay",
  assayUnknown: (matrix: string) => `${matrix}; assay ${NOT_RECORDED}`,
  regimen: "Regimen before",
  noneRunning: (last: string) => `none running; ${last}`,
  duration: "Duration of therapy",
  durationFrom: (when: string) => `listed from ${when}; before ${NOT_RECORDED}`,
  salt: "Salt or base, brand",
  steady: "Steady at the levels",
  kidney: "Kidney function",
  liver: "Liver function",
  albumin: "Albumin",
  haematocrit: "Haematocrit",
  pregnancy: "Pregnancy, genotype",
  smoking: "Smoking",
  interactions: "Other medicines",
  meals: "Food, vomiting, other",
  adherence: "Adherence",
  adherenceMissed: (missed: number, listed: number) => `${missed} of ${listed} doses missed; how known ${NOT_RECORDED}`,
  response: "Response, toxicity",
  target: "Target",
  interpretation: "Interpretation",
  currentExposure: "Exposure before",
  monitoring: "Who acts on the level",
  communication: "Told to, read back",
  patientTold: "Patient told",
  factor: (detail: string, from: string) => `${detail}, from ${from}`,
  factorUntil: (detail: string, from: string, to: string) => `${detail}, ${from} to ${to}`,
} as const;
