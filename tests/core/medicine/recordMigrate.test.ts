import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import {
  type Covariates,
  formulaEvaluate,
  kineticsFormulas,
  medicineParse,
  RECORD_MIGRATIONS,
  RECORD_VERSION,
  record0001,
  recordMigrate,
} from "../../../src/core/medicine/index.ts";
import { issueMessage } from "../../../src/core/messages/index.ts";

/** The records that came with the program when the first version was the newest. */
const folder = new URL("../../fixtures/records-version-1/", import.meta.url);
const files = readdirSync(folder).filter((name) => name.endsWith(".json"));
const stored = (name: string): Record<string, unknown> => JSON.parse(readFileSync(new URL(name, folder), "utf8"));

/** The formulas of those files as they were, worked out by hand in the same order of operations. */
const BEFORE: Readonly<Record<string, (c: Required<Record<keyof Covariates, number>>) => number[]>> = {
  "theophylline.json": (c) => [0.053 * Math.min(c.weight, c.idealWeight), 0.484 * c.weight],
  "lamotrigine.json": () => [2.28, 77.4],
  "phenytoin.json": (c) => [(415 / 24) * (c.weight / 70) ** 0.6, 5.7, ((78.6 / 0.859) * c.weight) / 70],
  "digoxin.json": (c) => [
    0.036 * c.weight + 0.112 * c.creatinineClearance,
    1.83 * c.weight,
    0.629 * c.weight,
    22.6 * c.weight,
  ],
  "demoxiline.json": (c) => [0.6 + 0.03 * c.creatinineClearance, 0.7 * c.weight],
};

const covariates = (weight: number): Required<Record<keyof Covariates, number>> => ({
  weight,
  idealWeight: 54.23,
  adjustedWeight: 55.7,
  leanWeight: 41.3,
  height: 162.5,
  age: 64,
  creatinineClearance: 52.31,
  albumin: 36,
  bodySurface: 1.6,
  isFemale: 1,
});

describe("a record of version 1", () => {
  it("has one step for every version but the first", () => {
    expect(RECORD_MIGRATIONS).toHaveLength(RECORD_VERSION - 1);
    expect(Object.keys(BEFORE).sort()).toEqual([...files].sort());
  });

  it.each(files)("%s opens, and its formulas give the same bits", (name) => {
    const parsed = medicineParse(stored(name));
    expect(parsed.ok ? [] : parsed.issues).toEqual([]);
    if (!parsed.ok) return;
    for (const weight of [3.1, 41.7, 58, 70, 123.4]) {
      const values = kineticsFormulas(parsed.value).map(({ formula }) => {
        const found = formulaEvaluate(formula, covariates(weight));
        return found.ok ? found.value.value : found.issues;
      });
      // Tolerance 0.
      expect(values).toEqual(BEFORE[name]!(covariates(weight)));
    }
  });

  it.each(files)("%s: what it held is there still", (name) => {
    const before = stored(name);
    const after = record0001(before) as Record<string, unknown> & { population: Record<string, unknown> };
    const changed = ["version", "kinetics", "population", "products", "windows"];
    for (const [key, value] of Object.entries(before)) if (!changed.includes(key)) expect(after[key]).toEqual(value);
    expect(before).toEqual(stored(name));
    expect(after.population.text).toBe((before.population as { text: string }).text);
  });

  it("before and after, part by part", () => {
    const provenance = { source: "a", basis: "seen" };
    const before = {
      format: "ebbline-medicine",
      version: 1,
      invented: false,
      kinetics: {
        kind: "one-compartment-oral",
        clearance: { formula: "1e-3 * log(age) + weight ^ 0.75 * isFemale", unit: "L/h", ...provenance },
        volume: { formula: "height", unit: "L", ...provenance },
        apparent: true,
      },
      population: { text: "Adults.", ageMin: 18, ageMax: 90, ...provenance },
      products: [{ id: "a", saltFactor: { value: 0.9 } }, { id: "b" }],
      windows: [{ label: "5 to 15", quantity: "trough", high: { value: 0.09, unit: "mg/L" } }],
    };
    expect(record0001(before)).toEqual({
      format: "ebbline-medicine",
      version: 2,
      invented: false,
      displayUnit: "ug/L",
      estimates: {
        from: "pieced-together",
        text: "Whether the figures come from one model was not stated when this record was made.",
        source: "a",
        basis: "memory",
      },
      kinetics: {
        kind: "one-compartment-oral",
        clearance: {
          formula: "(1e-3 * ln((age / (1 a))) + (weight / (1 kg)) ^ 0.75 * isFemale) * (1 L/h)",
          unit: "L/h",
          ...provenance,
        },
        volume: { formula: "((height / (1 cm))) * (1 L)", unit: "L", ...provenance },
        apparent: true,
      },
      population: {
        text: "Adults.",
        ranges: [{ covariate: "age", low: 18, high: 90, unit: "a", ...provenance }],
        ...provenance,
      },
      products: [{ id: "a", saltFactor: { value: 0.9 }, salt: "not named" }, { id: "b" }],
      windows: [
        {
          label: "5 to 15",
          use: "5 to 15",
          sampling: "just before a dose",
          quantity: "trough",
          high: { value: 0.09, unit: "mg/L" },
        },
      ],
      limits: {},
      interactions: [],
    });
  });

  it("the longest formula that version 1 could hold can still be read", () => {
    const record = stored("lamotrigine.json") as { kinetics: { volume: { formula: string } } };
    record.kinetics.volume.formula = `${"age+".repeat(99)}age`;
    const parsed = medicineParse(record);
    expect(parsed.ok ? [] : parsed.issues).toEqual([]);
    record.kinetics.volume.formula = `${"(".repeat(20)}weight${")".repeat(20)}`;
    expect(medicineParse(record).ok).toBe(true);
  });

  it.each([{}, { kinetics: null, population: 1, products: "x", windows: [null, 2] }, { kinetics: { a: 1 } }])(
    "%j is handed on for the schema to refuse",
    (parts) => {
      expect(medicineParse({ format: "ebbline-medicine", version: 1, ...parts }).ok).toBe(false);
    },
  );
});

describe("a record of another version", () => {
  it("a newer one is refused with the reason", () => {
    const newer = recordMigrate({ format: "ebbline-medicine", version: RECORD_VERSION + 1 });
    expect(newer).toMatchObject({ ok: false, issues: [{ code: "record-newer", path: ["version"] }] });
    expect(newer.ok ? "" : issueMessage(newer.issues[0]!)).toContain("newer version of the program");
  });

  it("a file that says it is something else is answered with that alone; a case with where it belongs", () => {
    const found = (format: string) => {
      const read = medicineParse({ format, version: 1 });
      return read.ok ? [] : read.issues.map(issueMessage);
    };
    expect(found("shopping-list")).toEqual([
      'The file is a "shopping-list", not a medicine record ("ebbline-medicine").',
    ]);
    expect(found("ebbline-case")).toEqual([
      'The file is a "ebbline-case", not a medicine record ("ebbline-medicine"). Import it on the screen of cases: its record comes with it.',
    ]);
  });

  it.each([0, -1, 1.5, "1", null])("version %j goes to the schema as it is", (version) => {
    const value = { format: "ebbline-medicine", version };
    expect(recordMigrate(value)).toEqual({ ok: true, value });
  });
});
