type Fields = Readonly<Record<string, unknown>>;

/**
 * A medicine record from version 1 to version 2, alone or inside a case. Frozen: its numbers stay what they were, bit for bit.
 * - Formulas had bare numbers: every covariate is divided by one of its unit, the whole multiplied by one of the result's; `log` is now `ln`.
 * - The lowest and highest age become a range; the unit to show concentrations in follows the rule that version 1 worked by.
 * - What version 1 did not hold is said not to be stated; limits and interactions are left empty.
 * A value of another shape is handed on for the schema to refuse.
 */
export function record0001(record: Fields): Fields {
  const { kinetics, population, products, windows } = record;
  return {
    ...record,
    version: 2,
    displayUnit: displayUnit(record),
    estimates: estimates(record),
    kinetics: isFields(kinetics) ? migratedKinetics(kinetics) : kinetics,
    population: isFields(population) ? migratedPopulation(population) : population,
    products: Array.isArray(products) ? products.map(migratedProduct) : products,
    windows: Array.isArray(windows) ? windows.map(migratedWindow) : windows,
    limits: {},
    interactions: [],
  };
}

const COVARIATE_UNITS: Readonly<Record<string, string>> = {
  weight: "kg",
  idealWeight: "kg",
  adjustedWeight: "kg",
  height: "cm",
  age: "a",
  creatinineClearance: "mL/min",
};

/** Numbers are passed over whole, so that the e of 1e-3 is not taken for a name. */
const NUMBER_OR_NAME = /(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?|[A-Za-z_][A-Za-z0-9_]*/g;

function migratedKinetics(kinetics: Fields): Fields {
  return Object.fromEntries(
    Object.entries(kinetics).map(([name, part]) => {
      if (!isFields(part) || typeof part.formula !== "string") return [name, part];
      return [name, { ...part, formula: withUnits(part.formula, String(part.unit)) }];
    }),
  );
}

function withUnits(formula: string, unit: string): string {
  const named = formula.replace(NUMBER_OR_NAME, (word) => {
    if (word === "log") return "ln";
    return Object.hasOwn(COVARIATE_UNITS, word) ? `(${word} / (1 ${COVARIATE_UNITS[word]}))` : word;
  });
  return `(${named}) * (1 ${unit})`;
}

function migratedPopulation({ ageMin, ageMax, ...rest }: Fields): Fields {
  const range = {
    covariate: "age",
    ...(ageMin !== undefined && { low: ageMin }),
    ...(ageMax !== undefined && { high: ageMax }),
    unit: "a",
    source: rest.source,
    basis: rest.basis,
  };
  return { ...rest, ranges: ageMin === undefined && ageMax === undefined ? [] : [range] };
}

function migratedProduct(product: unknown): unknown {
  return isFields(product) && product.saltFactor !== undefined ? { ...product, salt: "not named" } : product;
}

const SAMPLING: Readonly<Record<string, string>> = {
  trough: "just before a dose",
  peak: "at the highest concentration",
  average: "over a dosing interval",
  auc24: "over 24 hours",
  "lowest-and-highest": "over a dosing interval",
};

function migratedWindow(window: unknown): unknown {
  if (!isFields(window)) return window;
  return { ...window, use: window.label, sampling: SAMPLING[String(window.quantity)] ?? "not stated" };
}

function estimates({ kinetics, invented }: Fields): Fields {
  const formulas = isFields(kinetics) ? Object.values(kinetics).filter(isFields) : [];
  return {
    from: "pieced-together",
    text: "Whether the figures come from one model was not stated when this record was made.",
    source: formulas[0]?.source,
    basis: invented === true ? "invented" : "memory",
  };
}

/** mg/L: windows and a toxic limit wholly below it were shown in micrograms. */
const MICROGRAM_BELOW = 0.1;

function displayUnit({ windows, toxicFrom }: Fields): string {
  const ends: readonly unknown[] = [...(Array.isArray(windows) ? windows.map(fieldOf("high")) : []), toxicFrom];
  const highs = ends.flatMap((end) =>
    isFields(end) && end.unit === "mg/L" && typeof end.value === "number" ? [end.value] : [],
  );
  return highs.length > 0 && Math.max(...highs) < MICROGRAM_BELOW ? "ug/L" : "mg/L";
}

function fieldOf(name: string): (value: unknown) => unknown {
  return (value) => (isFields(value) ? value[name] : undefined);
}

function isFields(value: unknown): value is Fields {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}
