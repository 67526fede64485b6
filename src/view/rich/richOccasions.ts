import type { Analysis, DoseMark, LevelResult, Model } from "../../core/analysis/index.ts";
import type { Case } from "../../core/case/index.ts";
import { modelTimeToSteadyState } from "../../core/kinetics/index.ts";
import { type Issue, issue } from "../../core/result/index.ts";

/** Levels asked for before anything is read from them. */
const FEWEST_LEVELS = 4;
/** A level drawn so shortly before a dose stands for the level at the dose. h, common practice */
const JUST_BEFORE_H = 0.5;
/** Intervals that differ by less than this part count as equal. Ours: an hour or so of twelve. */
const SAME_INTERVAL = 0.1;
/** Within 1/32 of steady state, which where there is a half-life takes five. Common practice. */
const SETTLED_FRACTION = 31 / 32;

export interface RichPoint {
  /** h after the dose */
  readonly time: number;
  /** mg/L */
  readonly value: number;
  /** "nothing-before": no dose was given before, so the level at the dose is 0. "just-before": drawn shortly before the dose. */
  readonly from: "measured" | "just-before" | "nothing-before";
  /** When it was drawn, h on the clock of the case. */
  readonly atH: number;
}

/** A dose with enough levels after it, before the next. */
export interface RichOccasion {
  readonly id: string;
  readonly doseAtH: number;
  readonly doseMg: number;
  /** "one-dose": nothing was given before. "interval": regular doses have run long enough. */
  readonly kind: "one-dose" | "interval";
  /** h; null after one dose */
  readonly tau: number | null;
  readonly points: readonly RichPoint[];
  readonly measured: number;
  /** Elimination saturates, so that no half-life holds. */
  readonly saturates: boolean;
  /** What to keep in mind about it. */
  readonly cautions: readonly Issue[];
}

export interface RichOccasions {
  readonly occasions: readonly RichOccasion[];
  /** Why nothing, or a dose with enough levels, can't be read. */
  readonly lacks: readonly Issue[];
}

/** Doses of one moment together. */
interface Administration {
  readonly atH: number;
  readonly mg: number;
  /** Which product with how much: equal for equal doses. */
  readonly what: string;
  readonly parts: readonly { readonly product: string; readonly mg: number }[];
}

/** Which doses of the case have levels enough to be read without a model; most levels first. */
export function richOccasions({ medicine }: Case, analysis: Analysis): RichOccasions {
  const saturates = medicine.kinetics.kind === "saturable-oral";
  const doses = administrations(analysis.given);
  const levels = analysis.levels.filter((level) => !level.belowLimit && level.excluded === null);
  if (doses.length === 0) return { occasions: [], lacks: [issue("rich-no-dose")] };
  const candidates = doses.map((_, index) => ({ index, points: pointsAfter(doses, index, levels) }));
  const most = candidates.reduce((best, each) => (measuredOf(each.points) > measuredOf(best.points) ? each : best));
  const found = measuredOf(most.points);
  if (found < FEWEST_LEVELS) {
    return { occasions: [], lacks: [issue("rich-levels-few", { found, needed: FEWEST_LEVELS })] };
  }
  const occasions: RichOccasion[] = [];
  const lacks: Issue[] = [];
  for (const { index, points } of candidates) {
    const measured = measuredOf(points);
    if (measured < FEWEST_LEVELS) continue;
    const dose = doses[index]!;
    const common = { id: String(dose.atH), doseAtH: dose.atH, doseMg: dose.mg, points, measured, saturates };
    const cautions = cautionsOf(analysis.typical, dose.atH, points.at(-1)!.atH);
    if (saturates) cautions.push(issue("rich-saturates"));
    if (index === 0) {
      occasions.push({ ...common, kind: "one-dose", tau: null, cautions });
      continue;
    }
    const steady = steadyInterval(doses, index, analysis.typical);
    if (typeof steady === "number") occasions.push({ ...common, kind: "interval", tau: steady, cautions });
    else lacks.push(steady);
  }
  occasions.sort((a, b) => b.measured - a.measured || b.doseAtH - a.doseAtH);
  return { occasions, lacks: occasions.length > 0 ? [] : lacks };
}

const measuredOf = (points: readonly RichPoint[]) => points.filter((point) => point.from !== "nothing-before").length;

function administrations(given: readonly DoseMark[]): Administration[] {
  const found: { atH: number; parts: { product: string; mg: number }[] }[] = [];
  for (const { atH, product, countedMg } of given) {
    if (countedMg === 0) continue;
    const last = found.at(-1);
    const part = { product, mg: countedMg };
    if (last && last.atH === atH) last.parts.push(part);
    else found.push({ atH, parts: [part] });
  }
  return found.map(({ atH, parts }) => ({
    atH,
    parts,
    mg: parts.reduce((sum, part) => sum + part.mg, 0),
    what: parts
      .map((part) => `${part.product} ${part.mg}`)
      .sort()
      .join(", "),
  }));
}

/** A level at the very moment of a dose was drawn before it: it ends one interval and begins the next. */
function pointsAfter(doses: readonly Administration[], index: number, levels: readonly LevelResult[]): RichPoint[] {
  const { atH } = doses[index]!;
  const nextH = doses[index + 1]?.atH ?? Number.POSITIVE_INFINITY;
  const previousH = doses[index - 1]?.atH ?? Number.NEGATIVE_INFINITY;
  const after = levels
    .filter((level) => level.atH > atH && level.atH <= nextH)
    .map((level): RichPoint => ({ time: level.atH - atH, value: level.measured, from: "measured", atH: level.atH }));
  const before = levels.findLast(
    (level) => level.atH <= atH && level.atH >= atH - JUST_BEFORE_H && level.atH > previousH,
  );
  if (before) {
    const from = before.atH === atH ? "measured" : "just-before";
    return [{ time: 0, value: before.measured, from, atH: before.atH }, ...after];
  }
  return index === 0 ? [{ time: 0, value: 0, from: "nothing-before", atH }, ...after] : after;
}

/** The interval at steady state, h, or why there is none: equal doses at equal intervals have to run until the typical patient has settled. */
function steadyInterval(doses: readonly Administration[], index: number, model: Model | null): number | Issue {
  const dose = doses[index]!;
  const next = doses[index + 1];
  const tau = next ? next.atH - dose.atH : dose.atH - doses[index - 1]!.atH;
  let first = index;
  while (first > 0 && isSameInterval(doses[first]!.atH - doses[first - 1]!.atH, tau)) {
    if (doses[first - 1]!.what !== dose.what) break;
    first--;
  }
  if (first === index) return issue("rich-irregular");
  if (!model) return issue("rich-model-missing");
  const changed = changesOf(model).findLast((change) => change <= dose.atH) ?? Number.NEGATIVE_INFINITY;
  const run = dose.atH - Math.max(doses[first]!.atH, changed);
  const needed = hoursToSettle(model, dose, tau);
  return run >= needed ? tau : issue("rich-not-steady", { run, needed: Number.isFinite(needed) ? needed : null });
}

function isSameInterval(a: number, b: number): boolean {
  return Math.abs(a - b) <= SAME_INTERVAL * b;
}

function hoursToSettle(model: Model, dose: Administration, tau: number): number {
  const inputs = model.products.flatMap((product) => {
    const amount = dose.parts.reduce((sum, part) => sum + (part.product === product.product ? part.mg : 0), 0);
    if (amount === 0) return [];
    const { absorption, bioavailability, lag } = product;
    return [{ absorption, bioavailability: bioavailability.value, lag: lag.value, doses: [{ time: 0, amount }] }];
  });
  const inForce = model.dispositions.findLast((span) => span.from <= dose.atH) ?? model.dispositions[0]!;
  return modelTimeToSteadyState(inForce.disposition, inputs, tau, SETTLED_FRACTION).hours;
}

const changesOf = (model: Model) => model.dispositions.map((span) => span.from).filter(Number.isFinite);

/** A change of clearance or volume while the levels were drawn makes one rate of several. */
function cautionsOf(model: Model | null, fromH: number, toH: number): Issue[] {
  const isChanged = model !== null && changesOf(model).some((change) => change > fromH && change < toH);
  return isChanged ? [issue("rich-clearance-changed")] : [];
}
