import type { Basis, Figure, MedicineRecord, Product, RecordWindow } from "../../core/medicine/index.ts";
import { medicinesWords, windowQuantityWord } from "../../core/messages/index.ts";
import { numberPrint, quantityPrint, type UnitCode, unitSpoken } from "../../core/units/index.ts";

/** A line of a record's tables: what it is, its value in words, and how it is known. */
export interface RecordRow {
  readonly id: string;
  readonly name: string;
  readonly value: string;
  readonly source: string;
  readonly basis: Basis;
  readonly note: string | undefined;
}

/** Six digits: enough for every published figure; 80 mg in 15 mL does not become sixteen digits. */
const shown = (value: number, unit: UnitCode) => quantityPrint({ value, unit }, { style: "screen", significant: 6 });

function figureRow(id: string, name: string, figure: Figure): RecordRow {
  const { value, unit, source, basis, note } = figure;
  return { id, name, value: shown(value, unit), source, basis, note };
}

interface FormulaLike extends Omit<Figure, "value"> {
  readonly formula: string;
}

const hasSource = (value: unknown): value is { readonly source: string } =>
  typeof value === "object" && value !== null && "source" in value;
const isFigure = (value: unknown): value is Figure => hasSource(value) && "value" in value;
const isFormula = (value: unknown): value is FormulaLike => hasSource(value) && "formula" in value;
const nameOf = (key: string): string => medicinesWords.figures[key] ?? key;

/** Every figure among the fields of a part of the record, in the record's own order: a new kind of model needs no change here. */
function figureRows(part: object): readonly RecordRow[] {
  return Object.entries(part).flatMap(([key, field]) => (isFigure(field) ? [figureRow(key, nameOf(key), field)] : []));
}

export function kineticsRows(record: MedicineRecord): readonly RecordRow[] {
  const formulas = Object.entries(record.kinetics).flatMap(([key, field]): RecordRow[] =>
    isFormula(field)
      ? [
          {
            id: key,
            name: nameOf(key),
            value: `${field.formula} (${unitSpoken(field.unit, "screen")})`,
            source: field.source,
            basis: field.basis,
            note: field.note,
          },
        ]
      : [],
  );
  return [
    ...formulas,
    ...figureRows({ molarMass: record.molarMass, toxicFrom: record.toxicFrom, earliestSample: record.earliestSample }),
  ];
}

export function variabilityRows(record: MedicineRecord): readonly RecordRow[] {
  return figureRows(record.variability);
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
    rows.set(
      key,
      before ? { ...before, value: `${before.value}, ${value}` } : figureRow(key, medicinesWords.strength, strength),
    );
  }
  return [...rows.values()];
}

/** "10 to 20 mg/L, lowest and highest" */
export function windowValue(window: Pick<RecordWindow, "low" | "high" | "quantity">): string {
  return `${numberPrint(window.low.value)} to ${shown(window.high.value, window.high.unit)}, ${windowQuantityWord(window.quantity)}`;
}

export function windowRows(record: MedicineRecord): readonly RecordRow[] {
  return record.windows.map((window) => ({
    id: window.id,
    name: window.label,
    value: windowValue(window),
    source: window.source,
    basis: window.basis,
    note: window.note,
  }));
}

/** Sources in the order they are written in the record, counted from 1: the number is what the tables point to. */
export function sourceNumber(record: MedicineRecord, source: string): number {
  return Object.keys(record.sources).indexOf(source) + 1;
}

/** A title is cut here where it stands for a source in a table; the list below has it whole. */
const SHORT = 48;

/** "Hussein Z, 1997", or the beginning of the title where no author is named. */
export function sourceShort(record: MedicineRecord, id: string): string {
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
