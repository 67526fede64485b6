import type { Basis, Figure } from "./figureSchema.ts";
import { kineticsFormulas } from "./kineticsKinds.ts";
import type { MedicineRecord } from "./medicineRecord.ts";

/** One figure of a record, wherever it stands: what the reader may ask the source of. */
export interface RecordFigure {
  readonly path: readonly (string | number)[];
  readonly basis: Basis;
  readonly source: string;
  readonly note?: string | undefined;
}

/** From best known to least: of several strengths of a product the least known speaks for all. */
const TRUST: readonly Basis[] = ["seen", "common practice", "memory", "invented"];

/**
 * The figures of a record, in its own order: molar mass, the formulas of its kinetics, variability, each product's content
 * (its strengths together count as one), absorption rate, input, salt factor, lag and bioavailability, windows and the toxic limit.
 * Statements (dose limits, sampling, cautions, population) are not figures.
 */
export function recordFigures(record: MedicineRecord): RecordFigure[] {
  const figures: RecordFigure[] = [{ path: ["molarMass"], ...provenance(record.molarMass) }];
  const add = (path: RecordFigure["path"], figure: Omit<Figure, "value" | "unit"> | undefined): void => {
    if (figure) figures.push({ path, ...provenance(figure) });
  };
  for (const { name, formula } of kineticsFormulas(record)) add(["kinetics", name], formula);
  for (const [name, figure] of Object.entries(record.variability)) add(["variability", name], figure);
  record.products.forEach((product, i) => {
    const at = (...rest: (string | number)[]) => ["products", i, ...rest];
    const leastKnown = [...product.strengths].sort((a, b) => TRUST.indexOf(b.basis) - TRUST.indexOf(a.basis))[0];
    add(at("strengths"), leastKnown);
    add(at("concentration"), product.concentration);
    add(at("absorptionRate"), product.absorptionRate);
    for (const [name, figure] of Object.entries(product.input ?? {})) {
      if (typeof figure === "object") add(at("input", name), figure);
    }
    add(at("saltFactor"), product.saltFactor);
    add(at("lag"), product.lag);
    add(at("bioavailability"), product.bioavailability);
  });
  record.windows.forEach((window, i) => {
    add(["windows", i], window);
  });
  add(["toxicFrom"], record.toxicFrom);
  add(["earliestSample"], record.earliestSample);
  return figures;
}

function provenance({ basis, source, note }: { basis: Basis; source: string; note?: string | undefined }) {
  return { basis, source, ...(note !== undefined && { note }) };
}

/** How many figures of a record nobody has read in their source: for "2 of 9 figures unverified". */
export function unverifiedFigures(record: MedicineRecord): {
  readonly memory: number;
  readonly commonPractice: number;
  readonly invented: number;
  readonly total: number;
} {
  const figures = recordFigures(record);
  const count = (basis: Basis) => figures.filter((each) => each.basis === basis).length;
  return {
    memory: count("memory"),
    commonPractice: count("common practice"),
    invented: count("invented"),
    total: figures.length,
  };
}
