import { BASES, type Basis } from "./figureSchema.ts";
import type { MedicineRecord } from "./medicineRecord.ts";

/** One figure of a record, wherever it stands: what the reader may ask the source of. */
export interface RecordFigure {
  readonly path: readonly (string | number)[];
  readonly basis: Basis;
  readonly source: string;
  readonly note?: string | undefined;
}

/** The parts of a record that hold figures, in the order in which they are read. */
const PARTS = [
  "molarMass",
  "kinetics",
  "variability",
  "population",
  "products",
  "windows",
  "toxicFrom",
  "limits",
  "earliestSample",
  "steadyStateAfter",
  "interactions",
  "autoinduction",
] as const satisfies readonly (keyof MedicineRecord)[];

/**
 * The figures of a record, in reading order: everything with a source but the statements (estimates, population, dose limits, sampling,
 * cautions, autoinduction), whose own figures count. The strengths of a product together are one, known as well as the least known of them.
 */
export function recordFigures(record: MedicineRecord): RecordFigure[] {
  return PARTS.flatMap((part) => figuresIn(record[part], [part]));
}

function figuresIn(value: unknown, path: RecordFigure["path"]): RecordFigure[] {
  if (typeof value !== "object" || value === null) return [];
  if (path.at(-1) === "strengths") return leastKnown(value as RecordFigure[], path);
  const own = isFigure(value) ? [{ path, ...provenance(value) }] : [];
  const parts = Array.isArray(value) ? value.map((each, i) => [i, each] as const) : Object.entries(value);
  return [...own, ...parts.flatMap(([key, each]) => figuresIn(each, [...path, key]))];
}

function leastKnown(strengths: readonly RecordFigure[], path: RecordFigure["path"]): RecordFigure[] {
  const least = [...strengths].sort((a, b) => BASES.indexOf(b.basis) - BASES.indexOf(a.basis))[0];
  return least ? [{ path, ...provenance(least) }] : [];
}

function isFigure(value: object): value is Omit<RecordFigure, "path"> {
  return "basis" in value && "source" in value && !("text" in value);
}

function provenance({ basis, source, note }: Omit<RecordFigure, "path">) {
  return { basis, source, ...(note !== undefined && { note }) };
}

/** How many figures of a record are known in which way: for "2 of 9 figures unverified", and for the share of each. */
export function unverifiedFigures(record: MedicineRecord): {
  readonly seen: number;
  readonly derived: number;
  readonly memory: number;
  readonly commonPractice: number;
  readonly invented: number;
  /** Neither read in a source nor derived from what was. */
  readonly unverified: number;
  readonly total: number;
} {
  const figures = recordFigures(record);
  const count = (basis: Basis) => figures.filter((each) => each.basis === basis).length;
  return {
    seen: count("seen"),
    derived: count("derived"),
    memory: count("memory"),
    commonPractice: count("common practice"),
    invented: count("invented"),
    unverified: figures.filter(({ basis }) => basis !== "seen" && basis !== "derived").length,
    total: figures.length,
  };
}
