import type { Basis, MedicineRecord } from "./medicineRecord.ts";

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
 * The figures of a record, in its own order: molar mass, clearance, volume, variability, each product's content
 * (its strengths together count as one), absorption rate, lag and bioavailability, windows and the toxic limit.
 * Statements (dose limits, sampling, cautions, population) are not figures.
 */
export function recordFigures(record: MedicineRecord): RecordFigure[] {
  const { kinetics, variability } = record;
  const figures: RecordFigure[] = [
    { path: ["molarMass"], ...provenance(record.molarMass) },
    { path: ["kinetics", "clearance"], ...provenance(kinetics.clearance) },
    { path: ["kinetics", "volume"], ...provenance(kinetics.volume) },
  ];
  for (const [name, figure] of Object.entries(variability)) {
    if (figure) figures.push({ path: ["variability", name], ...provenance(figure) });
  }
  record.products.forEach((product, i) => {
    const at = (...rest: (string | number)[]) => ["products", i, ...rest];
    const leastKnown = [...product.strengths].sort((a, b) => TRUST.indexOf(b.basis) - TRUST.indexOf(a.basis))[0];
    if (leastKnown) figures.push({ path: at("strengths"), ...provenance(leastKnown) });
    if (product.concentration) figures.push({ path: at("concentration"), ...provenance(product.concentration) });
    figures.push({ path: at("absorptionRate"), ...provenance(product.absorptionRate) });
    figures.push({ path: at("lag"), ...provenance(product.lag) });
    figures.push({ path: at("bioavailability"), ...provenance(product.bioavailability) });
  });
  record.windows.forEach((window, i) => {
    figures.push({ path: ["windows", i], ...provenance(window) });
  });
  if (record.toxicFrom) figures.push({ path: ["toxicFrom"], ...provenance(record.toxicFrom) });
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
