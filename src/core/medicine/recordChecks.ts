import type { UnitCode } from "../units/index.ts";
import type { Figure } from "./figureSchema.ts";
import { formulaFaults } from "./formulaRead.ts";
import { kineticsFormulas } from "./kineticsKinds.ts";
import type { MedicineRecord, Product } from "./medicineRecord.ts";

/** A fault found across fields, where the shape alone is right. */
export interface RecordFault {
  readonly code: string;
  readonly path: readonly (string | number)[];
  readonly data: Readonly<Record<string, unknown>>;
}

type Path = RecordFault["path"];

interface Bounds {
  readonly unit: UnitCode;
  readonly above?: number;
  readonly least?: number;
  readonly most?: number;
}

const POSITIVE_MG: Bounds = { unit: "mg", above: 0 };
const HOURS: Bounds = { unit: "h", above: 0 };
const VARIATION: Bounds = { unit: "%", above: 0, most: 500 };

/** Everything the shape can't say: sources named, units and ranges, products that make sense, formulas that can be read. */
export function recordChecks(record: MedicineRecord): RecordFault[] {
  return [
    ...provenanceFaults(record),
    ...figureFaults(record),
    ...record.products.flatMap((product, i) => productFaults(product, record.kinetics.apparent, ["products", i])),
    ...windowFaults(record),
    ...formulaChecks(record),
    ...duplicateFaults(record),
    ...nameFaults(record),
  ];
}

function provenanceFaults(record: MedicineRecord): RecordFault[] {
  const faults: RecordFault[] = [];
  const visit = (value: unknown, path: Path): void => {
    if (typeof value !== "object" || value === null) return;
    const { source, basis } = value as { source?: unknown; basis?: unknown };
    // An empty one is the schema's to refuse.
    if (typeof source === "string" && source !== "" && !Object.hasOwn(record.sources, source)) {
      faults.push({ code: "record-source-unknown", path: [...path, "source"], data: { source } });
    }
    if (basis === "invented" && !record.invented) {
      faults.push({ code: "record-basis-invented", path: [...path, "basis"], data: {} });
    }
    for (const [key, each] of Object.entries(value)) visit(each, [...path, Array.isArray(value) ? Number(key) : key]);
  };
  const { sources: _, ...rest } = record;
  visit(rest, []);
  return faults;
}

function figureFaults(record: MedicineRecord): RecordFault[] {
  const { variability: v } = record;
  return [
    ...boundsFaults(record.molarMass, { unit: "g/mol", above: 0 }, ["molarMass"]),
    ...boundsFaults(v.clearance, VARIATION, ["variability", "clearance"]),
    ...boundsFaults(v.maximumRate, VARIATION, ["variability", "maximumRate"]),
    ...boundsFaults(v.halfMaximum, VARIATION, ["variability", "halfMaximum"]),
    ...boundsFaults(v.volume, VARIATION, ["variability", "volume"]),
    ...boundsFaults(v.absorptionRate, VARIATION, ["variability", "absorptionRate"]),
    ...boundsFaults(v.residualProportional, VARIATION, ["variability", "residualProportional"]),
    ...boundsFaults(v.residualAdditive, { unit: "mg/L", above: 0 }, ["variability", "residualAdditive"]),
    ...boundsFaults(record.toxicFrom, { unit: "mg/L", above: 0 }, ["toxicFrom"]),
    ...boundsFaults(record.earliestSample, { unit: "h", above: 0, most: 168 }, ["earliestSample"]),
  ];
}

function boundsFaults(figure: Figure | undefined, bounds: Bounds, path: Path): RecordFault[] {
  if (!figure) return [];
  const { value, unit } = figure;
  if (unit !== bounds.unit) {
    return [{ code: "record-unit", path: [...path, "unit"], data: { found: unit, allowed: bounds.unit } }];
  }
  const isAbove = bounds.above === undefined || value > bounds.above;
  const isInside = value >= (bounds.least ?? value) && value <= (bounds.most ?? value);
  if (isAbove && isInside) return [];
  return [{ code: "record-range", path: [...path, "value"], data: { found: value, ...bounds } }];
}

function productFaults(product: Product, isApparent: boolean, path: Path): RecordFault[] {
  const isLiquid = product.form === "liquid";
  const isContentRight = isLiquid
    ? product.strengths.length === 0 && product.concentration !== undefined
    : product.strengths.length > 0 && product.concentration === undefined;
  const faults: RecordFault[] = isContentRight
    ? []
    : [{ code: "record-product-content", path, data: { product: product.name, isLiquid } }];
  const bioavailability: Bounds = isApparent ? { unit: "1", least: 1, most: 1 } : { unit: "1", above: 0, most: 1 };
  return [
    ...faults,
    ...product.strengths.flatMap((each, i) => boundsFaults(each, POSITIVE_MG, [...path, "strengths", i])),
    ...boundsFaults(product.concentration, { unit: "mg/mL", above: 0 }, [...path, "concentration"]),
    ...inputFaults(product, path),
    ...boundsFaults(product.saltFactor, { unit: "1", above: 0, most: 1 }, [...path, "saltFactor"]),
    ...boundsFaults(product.lag, { unit: "h", least: 0 }, [...path, "lag"]),
    ...boundsFaults(product.bioavailability, bioavailability, [...path, "bioavailability"]),
  ];
}

/** An absorption rate where something is absorbed by it and nowhere else; a mixed input's slow part in one way. */
function inputFaults(product: Product, path: Path): RecordFault[] {
  const { absorptionRate, input } = product;
  const isZeroOrder = input?.kind === "zero-order";
  const at = (name: string): Path => [...path, "input", name];
  const faults: RecordFault[] = boundsFaults(absorptionRate, { unit: "/h", above: 0 }, [...path, "absorptionRate"]);
  if ((absorptionRate === undefined) !== isZeroOrder) {
    faults.push({ code: "record-absorption-rate", path, data: { product: product.name, isZeroOrder } });
  }
  if (input?.kind === "zero-order") faults.push(...boundsFaults(input.duration, HOURS, at("duration")));
  if (input?.kind === "mixed") {
    if ((input.slowRate === undefined) === (input.slowDuration === undefined)) {
      const hasBoth = input.slowRate !== undefined;
      faults.push({ code: "record-slow-part", path: [...path, "input"], data: { product: product.name, hasBoth } });
    }
    faults.push(
      ...boundsFaults(input.fastFraction, { unit: "1", least: 0, most: 1 }, at("fastFraction")),
      ...boundsFaults(input.slowRate, { unit: "/h", above: 0 }, at("slowRate")),
      ...boundsFaults(input.slowDuration, HOURS, at("slowDuration")),
      ...boundsFaults(input.slowLag, { unit: "h", least: 0 }, at("slowLag")),
    );
  }
  return faults;
}

function windowFaults(record: MedicineRecord): RecordFault[] {
  return record.windows.flatMap((window, i) => windowChecks(window, ["windows", i]));
}

/** Shared with the target window of a case: one unit that fits what the window is about, and low below high. */
export function windowChecks(
  { quantity, low, high }: Pick<MedicineRecord["windows"][number], "quantity" | "low" | "high">,
  path: Path,
): RecordFault[] {
  const allowed = quantity === "auc24" ? "mg.h/L" : "mg/L";
  const faults: RecordFault[] = [];
  for (const [end, { unit }] of [["low", low] as const, ["high", high] as const]) {
    if (unit !== allowed)
      faults.push({ code: "window-unit", path: [...path, end, "unit"], data: { found: unit, allowed, quantity } });
  }
  if (low.value < 0 || low.value >= high.value) {
    faults.push({ code: "window-order", path, data: { low: low.value, high: high.value, unit: low.unit } });
  }
  return faults;
}

function formulaChecks(record: MedicineRecord): RecordFault[] {
  return kineticsFormulas(record).flatMap(({ name, unit: allowed, formula: { formula, unit } }) => {
    const path = ["kinetics", name, "formula"];
    const unitFaults: RecordFault[] =
      unit === allowed
        ? []
        : [{ code: "record-unit", path: ["kinetics", name, "unit"], data: { found: unit, allowed } }];
    return [...unitFaults, ...formulaFaults(formula).map(({ code, data }) => ({ code, path, data }))];
  });
}

function duplicateFaults(record: MedicineRecord): RecordFault[] {
  const faults = [
    ...duplicates(record.products, ["products"], (each) => each.id),
    ...duplicates(record.windows, ["windows"], (each) => each.id),
  ];
  record.products.forEach((product, i) => {
    faults.push(...duplicates(product.strengths, ["products", i, "strengths"], (each) => String(each.value)));
  });
  return faults;
}

function duplicates<T>(list: readonly T[], path: Path, key: (each: T) => string): RecordFault[] {
  const seen = new Set<string>();
  const faults: RecordFault[] = [];
  list.forEach((each, i) => {
    if (seen.has(key(each))) faults.push({ code: "record-duplicate", path: [...path, i], data: { found: key(each) } });
    seen.add(key(each));
  });
  return faults;
}

/** Marks that turn the direction of text could make a printed name read as another. */
const TURNING = /[\u202a-\u202e\u2066-\u2069]/;

function nameFaults(record: MedicineRecord): RecordFault[] {
  const faults: RecordFault[] = [];
  if (record.invented && !record.name.toLowerCase().includes("invented")) {
    faults.push({ code: "record-invented-name", path: ["name"], data: { name: record.name } });
  }
  const names: readonly (readonly [Path, string])[] = [
    [["name"], record.name],
    ...record.products.map((each, i) => [["products", i, "name"], each.name] as const),
    ...record.windows.map((each, i) => [["windows", i, "label"], each.label] as const),
  ];
  for (const [path, text] of names) {
    if (TURNING.test(text)) faults.push({ code: "record-name-turns", path, data: {} });
  }
  const { ageMin, ageMax } = record.population;
  if (ageMin !== undefined && ageMax !== undefined && ageMin > ageMax) {
    faults.push({ code: "record-ages", path: ["population"], data: { ageMin, ageMax } });
  }
  return faults;
}
