import { quantityConvert, type UnitCode } from "../units/index.ts";
import { COVARIATES } from "./covariates.ts";
import { formulaFaults } from "./formulaRead.ts";
import { kineticsFormulas } from "./kineticsKinds.ts";
import { DISPLAY_UNITS, type MedicineRecord, type PopulationRange } from "./medicineRecord.ts";
import { productChecks } from "./productChecks.ts";
import { type Bounds, boundsFaults, duplicateFaults, type FaultPath, type RecordFault } from "./recordFault.ts";
import { variabilityChecks } from "./variabilityChecks.ts";
import { recordWindowChecks } from "./windowChecks.ts";

/** Everything the shape can't say: sources named, units and ranges, products that make sense, formulas whose units come out right. */
export function recordChecks(record: MedicineRecord): RecordFault[] {
  return [
    ...provenanceFaults(record),
    ...figureFaults(record),
    ...variabilityChecks(record),
    ...record.population.ranges.flatMap((range, i) => rangeFaults(range, ["population", "ranges", i])),
    ...record.products.flatMap((product, i) => productChecks(product, record.kinetics.apparent, ["products", i])),
    ...record.windows.flatMap((window, i) => recordWindowChecks(window, ["windows", i])),
    ...displayFaults(record),
    ...interactionFaults(record),
    ...formulaChecks(record),
    ...duplicateFaults(record.products, ["products"], (each) => each.id),
    ...duplicateFaults(record.windows, ["windows"], (each) => each.id),
    ...duplicateFaults(record.interactions, ["interactions"], (each) => each.id),
    ...duplicateFaults(record.population.ranges, ["population", "ranges"], (each) => each.covariate),
    ...nameFaults(record),
  ];
}

function provenanceFaults(record: MedicineRecord): RecordFault[] {
  const faults: RecordFault[] = [];
  const visit = (value: unknown, path: FaultPath): void => {
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

/** Ours: slower than any known enzyme induction. d */
const LONGEST_ONSET_D = 365;
const POSITIVE_MG: Bounds = { unit: "mg", above: 0 };

function figureFaults(record: MedicineRecord): RecordFault[] {
  const { limits, population, autoinduction } = record;
  const { maximumSingleDose: single, maximumDailyDose: daily } = limits;
  const settled = { unit: "d", above: 0, most: LONGEST_ONSET_D } as const;
  const faults = [
    ...boundsFaults(record.molarMass, { unit: "g/mol", above: 0 }, ["molarMass"]),
    ...boundsFaults(population.number, { unit: "1", least: 1 }, ["population", "number"]),
    ...boundsFaults(record.toxicFrom, { unit: DISPLAY_UNITS, above: 0 }, ["toxicFrom"]),
    ...boundsFaults(single, POSITIVE_MG, ["limits", "maximumSingleDose"]),
    ...boundsFaults(daily, POSITIVE_MG, ["limits", "maximumDailyDose"]),
    ...boundsFaults(record.earliestSample, { unit: "h", above: 0, most: 168 }, ["earliestSample"]),
    ...boundsFaults(record.steadyStateAfter, { unit: ["h", "d"], above: 0 }, ["steadyStateAfter"]),
    ...boundsFaults(autoinduction?.settledAfter, settled, ["autoinduction", "settledAfter"]),
  ];
  if (single && daily && single.unit === daily.unit && single.value > daily.value) {
    faults.push({ code: "record-limits", path: ["limits"], data: { single: single.value, daily: daily.value } });
  }
  return faults;
}

function rangeFaults({ covariate, low, high, unit }: PopulationRange, path: FaultPath): RecordFault[] {
  const allowed: UnitCode = COVARIATES[covariate];
  const faults: RecordFault[] =
    unit === allowed
      ? []
      : [{ code: "record-unit", path: [...path, "unit"], data: { found: unit, allowed: [allowed] } }];
  const isEmpty = low !== undefined && high !== undefined && low > high;
  const isNegative = (low ?? 0) < 0 || (high ?? 0) < 0;
  if (isEmpty || isNegative || (low === undefined && high === undefined)) {
    faults.push({
      code: "record-population-range",
      path,
      data: { covariate, low: low ?? null, high: high ?? null, unit },
    });
  }
  return faults;
}

/** Ours: outside it a concentration is read with so many zeros that they are miscounted. */
const SHOWN_LEAST = 0.01;
const SHOWN_MOST = 100_000;

/** The highest concentration the record speaks of, in the unit it is shown in. */
function displayFaults({ windows, toxicFrom, displayUnit, molarMass }: MedicineRecord): RecordFault[] {
  const concentrations = [...windows.map((each) => each.high), ...(toxicFrom ? [toxicFrom] : [])].filter(
    ({ unit, value }) => unit !== "mg.h/L" && DISPLAY_UNITS.some((each) => each === unit) && Number.isFinite(value),
  );
  if (concentrations.length === 0 || !(molarMass.value > 0)) return [];
  const shown = Math.max(
    ...concentrations.map(({ value, unit }) => quantityConvert({ value, unit }, displayUnit, molarMass.value)),
  );
  if (shown >= SHOWN_LEAST && shown <= SHOWN_MOST) return [];
  return [{ code: "record-display-unit", path: ["displayUnit"], data: { displayUnit, found: shown } }];
}

/** The same limits as for a factor's effect in a case. */
const FACTOR: Readonly<Record<MedicineRecord["interactions"][number]["parameter"], Bounds>> = {
  clearance: { unit: "1", least: 0.05, most: 20 },
  volume: { unit: "1", least: 0.2, most: 5 },
};

function interactionFaults({ interactions }: MedicineRecord): RecordFault[] {
  return interactions.flatMap(({ parameter, factor, onset }, i) => [
    ...boundsFaults(factor, FACTOR[parameter], ["interactions", i, "factor"]),
    ...boundsFaults(onset, { unit: "d", above: 0, most: LONGEST_ONSET_D }, ["interactions", i, "onset"]),
  ]);
}

function formulaChecks(record: MedicineRecord): RecordFault[] {
  return kineticsFormulas(record).flatMap(({ name, unit: allowed, formula }) => {
    const path = ["kinetics", name, "formula"];
    const unitFaults: RecordFault[] =
      formula.unit === allowed
        ? []
        : [
            {
              code: "record-unit",
              path: ["kinetics", name, "unit"],
              data: { found: formula.unit, allowed: [allowed] },
            },
          ];
    const faults = formulaFaults({ formula: formula.formula, unit: allowed });
    return [...unitFaults, ...faults.map(({ code, data }) => ({ code, path, data }))];
  });
}

/** Marks that turn the direction of text could make a printed name read as another. */
const TURNING = /[\u202a-\u202e\u2066-\u2069]/;

function nameFaults(record: MedicineRecord): RecordFault[] {
  const faults: RecordFault[] = [];
  if (record.invented && !record.name.toLowerCase().includes("invented")) {
    faults.push({ code: "record-invented-name", path: ["name"], data: { name: record.name } });
  }
  const names: readonly (readonly [FaultPath, string])[] = [
    [["name"], record.name],
    ...record.products.map((each, i) => [["products", i, "name"], each.name] as const),
    ...record.windows.map((each, i) => [["windows", i, "label"], each.label] as const),
  ];
  for (const [path, text] of names) {
    if (TURNING.test(text)) faults.push({ code: "record-name-turns", path, data: {} });
  }
  return faults;
}
