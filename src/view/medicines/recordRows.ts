import type { TargetWindow } from "../../core/case/index.ts";
import {
  type Basis,
  COVARIATES,
  type Figure,
  type Interaction,
  kineticsFormulas,
  type MedicineRecord,
  type PopulationRange,
  type Product,
  type RecordWindow,
} from "../../core/medicine/index.ts";
import { medicinesWords, recordWords, windowAboutWords, windowQuantityWord } from "../../core/messages/index.ts";
import { numberPrint, type Quantity, quantityPrint, type UnitCode, unitSpoken } from "../../core/units/index.ts";
import { windowOtherUnit } from "./windowOtherUnit.ts";

/** A line of a record's tables: what it is, its value in words, and how it is known. */
export interface RecordRow {
  /** The same for the same figure of another record. */
  readonly id: string;
  readonly name: string;
  readonly value: string;
  readonly source: string;
  readonly basis: Basis;
  readonly note: string | undefined;
}

/** Six digits: enough for every published figure; 80 mg in 15 mL does not become sixteen digits. */
const shown = (value: number, unit: UnitCode) => quantityPrint({ value, unit }, { style: "screen", significant: 6 });
const bare = (value: number) => numberPrint(value, { significant: 6 });

export function figureRow(id: string, name: string, figure: Figure): RecordRow {
  const { value, unit, source, basis, note } = figure;
  return { id, name, value: shown(value, unit), source, basis, note };
}

const hasSource = (value: unknown): value is { readonly source: string } =>
  typeof value === "object" && value !== null && "source" in value;
const isFigure = (value: unknown): value is Figure => hasSource(value) && "value" in value;
export const figureName = (key: string): string => recordWords.figures[key] ?? medicinesWords.figures[key] ?? key;

/** Every figure among the fields of a part of the record, in the record's own order. */
export function figureRows(part: object, name: (key: string) => string = figureName): readonly RecordRow[] {
  return Object.entries(part).flatMap(([key, field]) => (isFigure(field) ? [figureRow(key, name(key), field)] : []));
}

export function kineticsRows(record: MedicineRecord): readonly RecordRow[] {
  const formulas = kineticsFormulas(record).map(({ name, words, symbol, formula }) => ({
    id: name,
    name: recordWords.formula(words, symbol),
    value: `${formula.formula} (${unitSpoken(formula.unit, "screen")})`,
    source: formula.source,
    basis: formula.basis,
    note: formula.note,
  }));
  return [...formulas, figureRow("molarMass", figureName("molarMass"), record.molarMass)];
}

export function variabilityRows({ variability }: MedicineRecord): readonly RecordRow[] {
  const { correlations = [], ...figures } = variability;
  const name = (key: string) =>
    key.startsWith("residual") ? figureName(key) : recordWords.variability(figureName(key));
  const correlated = correlations.map(({ between: [a, b], ...figure }) =>
    figureRow(`${a} ${b}`, recordWords.correlation(figureName(a), figureName(b)), figure),
  );
  return [...figureRows(figures, name), ...correlated];
}

export function rangeValue({ low, high, unit }: PopulationRange): string {
  const word = unit === "1" ? "" : ` ${unitSpoken(unit, "screen")}`;
  if (low !== undefined && high !== undefined) return `${recordWords.rangeBoth(bare(low), bare(high))}${word}`;
  if (low !== undefined) return `${recordWords.rangeLow(`${bare(low)}${word}`)}`;
  return recordWords.rangeHigh(`${bare(high ?? 0)}${word}`);
}

export function populationRows({ population }: MedicineRecord): readonly RecordRow[] {
  const ranges = population.ranges.map((range) => ({
    id: range.covariate,
    name: recordWords.covariates[range.covariate] ?? range.covariate,
    value: rangeValue(range),
    source: range.source,
    basis: range.basis,
    note: range.note,
  }));
  return [...(population.number ? [figureRow("number", recordWords.patients, population.number)] : []), ...ranges];
}

export function productRows(product: Product): readonly RecordRow[] {
  const { strengths: _, ...fields } = product;
  const parts = Object.values<unknown>(fields).flatMap((field) =>
    typeof field === "object" && field !== null && !hasSource(field) ? [field] : [],
  );
  return [...strengthRows(product), ...figureRows(fields), ...parts.flatMap((part) => figureRows(part))];
}

/** Strengths known in the same way stand on one line: "100, 200, 300 mg". */
function strengthRows(product: Product): readonly RecordRow[] {
  const rows = new Map<string, RecordRow>();
  for (const strength of product.strengths) {
    const key = JSON.stringify([strength.unit, strength.source, strength.basis, strength.note]);
    const before = rows.get(key);
    const value = shown(strength.value, strength.unit);
    const id = `strengths ${rows.size + 1}`;
    rows.set(
      key,
      before ? { ...before, value: `${before.value}, ${value}` } : figureRow(id, medicinesWords.strength, strength),
    );
  }
  return [...rows.values()];
}

/** "10 to 20 mg/L" */
function ends(low: Quantity, high: Quantity): string {
  return `${bare(low.value)} to ${shown(high.value, high.unit)}`;
}

/** "10 to 20 mg/L, lowest and highest" */
export function windowValue(window: TargetWindow): string {
  return `${ends(window.low, window.high)}, ${windowAboutWords(window)}`;
}

/** By mass and by amount: "10 to 20 mg/L (55.5 to 111 micromol/L), lowest and highest; drawn 6 h or more after the dose" */
export function windowRows(record: MedicineRecord): readonly RecordRow[] {
  return record.windows.map((window) => {
    const other = windowOtherUnit(window, record.molarMass.value);
    const range = other
      ? `${ends(window.low, window.high)} (${ends(other.low, other.high)})`
      : ends(window.low, window.high);
    const drawn = drawnWords(window);
    return {
      id: window.id,
      name: window.label,
      value: `${range}, ${windowQuantityWord(window.quantity)}${drawn ? `; ${drawn}` : ""}. ${recordWords.windowFor(window.use, window.sampling)}`,
      source: window.source,
      basis: window.basis,
      note: window.note,
    };
  });
}

function drawnWords({ drawFrom, drawTo }: RecordWindow): string {
  if (drawFrom && drawTo) return recordWords.drawn(bare(drawFrom.value), shown(drawTo.value, drawTo.unit));
  if (drawFrom) return recordWords.drawnFrom(shown(drawFrom.value, drawFrom.unit));
  return drawTo ? recordWords.drawnTo(shown(drawTo.value, drawTo.unit)) : "";
}

export function interactionRows({ interactions }: MedicineRecord): readonly RecordRow[] {
  return interactions.map((each: Interaction) => ({
    id: each.id,
    name: each.medicine,
    value: `${recordWords.interactionFactor(
      figureName(each.parameter),
      bare(each.factor.value),
      each.onset ? shown(each.onset.value, each.onset.unit) : null,
    )}. ${each.text}`,
    source: each.factor.source,
    basis: each.factor.basis,
    note: each.factor.note,
  }));
}

/** The unit a covariate is counted in. */
export function covariateUnit(name: string): UnitCode {
  return (COVARIATES as Readonly<Record<string, UnitCode>>)[name] ?? "1";
}

/** Sources in the order they are written in the record, counted from 1: the number is what the tables point to. */
export function sourceNumber(record: Pick<MedicineRecord, "sources">, source: string): number {
  return Object.keys(record.sources).indexOf(source) + 1;
}

/** A title is cut here where it stands for a source in a table; the list below has it whole. */
const SHORT = 48;

/** "Hussein Z, 1997", or the beginning of the title where no author is named. */
export function sourceShort(record: Pick<MedicineRecord, "sources">, id: string): string {
  const source = record.sources[id];
  if (!source) return id;
  const who = source.authors?.split(/[,;]| and /)[0]?.trim() ?? beginning(source.title);
  return source.year ? `${who}, ${source.year}` : who;
}

function beginning(title: string): string {
  const first = title.split(/[:(]/)[0]?.trim() ?? title;
  const part = first.length < SHORT / 3 ? title : first;
  if (part.length <= SHORT) return part;
  return `${part.slice(0, part.lastIndexOf(" ", SHORT)).replace(/[,;]$/, "")} …`;
}
