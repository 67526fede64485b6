import type { MedicineRecord } from "../../core/medicine/index.ts";
import { medicinesWords, recordWords } from "../../core/messages/index.ts";
import {
  figureName,
  figureRow,
  figureRows,
  interactionRows,
  kineticsRows,
  populationRows,
  productRows,
  type RecordRow,
  variabilityRows,
  windowRows,
} from "./recordRows.ts";

export interface RecordSection {
  readonly id: string;
  readonly heading: string;
  readonly rows: readonly RecordRow[];
}

/** The figures of a record, part by part: what the page shows and what two records are compared by. */
export function recordSections(record: MedicineRecord): readonly RecordSection[] {
  return [
    { id: "population", heading: recordWords.ranges, rows: populationRows(record) },
    { id: "windows", heading: medicinesWords.windows, rows: [...windowRows(record), ...toxicRows(record)] },
    { id: "limits", heading: recordWords.limits, rows: figureRows(record.limits) },
    {
      id: "sampling",
      heading: medicinesWords.sampling,
      rows: [...optional(record, "earliestSample"), ...optional(record, "steadyStateAfter")],
    },
    { id: "kinetics", heading: medicinesWords.kinetics, rows: kineticsRows(record) },
    ...record.products.map((product) => ({
      id: `product ${product.id}`,
      heading: product.name,
      rows: productRows(product),
    })),
    { id: "variability", heading: medicinesWords.variability, rows: variabilityRows(record) },
    { id: "interactions", heading: recordWords.interactions, rows: interactionRows(record) },
    {
      id: "autoinduction",
      heading: recordWords.autoinduction,
      rows: record.autoinduction?.settledAfter
        ? [figureRow("settledAfter", recordWords.settledAfter, record.autoinduction.settledAfter)]
        : [],
    },
  ];
}

function toxicRows(record: MedicineRecord): RecordRow[] {
  const isTrough = record.toxicAt === "trough";
  return optional(record, "toxicFrom").map((row) =>
    isTrough ? { ...row, value: recordWords.toxicTrough(row.value) } : row,
  );
}

function optional(record: MedicineRecord, key: "toxicFrom" | "earliestSample" | "steadyStateAfter"): RecordRow[] {
  const figure = record[key];
  return figure ? [figureRow(key, figureName(key), figure)] : [];
}

export interface RecordDifference {
  readonly key: string;
  readonly section: string;
  readonly name: string;
  /** null: not stated there. */
  readonly first: RecordRow | null;
  readonly second: RecordRow | null;
}

/** Figures that two records state differently, their sources included. */
export function recordDifferences(first: MedicineRecord, second: MedicineRecord): readonly RecordDifference[] {
  const rows = new Map<string, { section: string; name: string; first: RecordRow | null; second: RecordRow | null }>();
  for (const [side, record] of [["first", first] as const, ["second", second] as const]) {
    for (const { id, heading, rows: own } of recordSections(record)) {
      for (const row of own) {
        const key = `${id}/${row.id}`;
        const before = rows.get(key) ?? { section: heading, name: row.name, first: null, second: null };
        rows.set(key, { ...before, [side]: row });
      }
    }
  }
  return [...rows].flatMap(([key, row]) =>
    said(row.first, first) === said(row.second, second) ? [] : [{ key, ...row }],
  );
}

function said(row: RecordRow | null, record: MedicineRecord): string {
  return row ? JSON.stringify([row.value, row.basis, record.sources[row.source], row.note]) : "";
}
