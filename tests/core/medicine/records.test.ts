import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { BUILT_IN_RECORDS, medicineParse, recordById, recordFigures } from "../../../src/core/medicine/index.ts";
import { forbiddenForms } from "../../../src/core/units/index.ts";

const folder = new URL("../../../src/core/medicine/records/", import.meta.url);
const files = readdirSync(folder).filter((name) => name.endsWith(".json"));

describe("built-in records", () => {
  it.each(files)("%s parses, unchanged, and stands in the index under its own name", (name) => {
    const json: unknown = JSON.parse(readFileSync(new URL(name, folder), "utf8"));
    const parsed = medicineParse(json);
    expect(parsed.ok ? [] : parsed.issues).toEqual([]);
    if (!parsed.ok) return;
    expect(parsed.value).toEqual(json);
    expect(`${parsed.value.id}.json`).toBe(name);
    expect(recordById(parsed.value.id)).toEqual(parsed.value);
  });

  it("has no record without a file", () => {
    expect(BUILT_IN_RECORDS.map((each) => `${each.id}.json`).sort()).toEqual([...files].sort());
  });

  it("has no error-prone form in the texts that are printed", () => {
    const texts = BUILT_IN_RECORDS.flatMap((record) => [
      record.name,
      record.population.text,
      ...[...record.doseLimits, ...record.sampling, ...record.cautions].map((each) => each.text),
      ...record.products.map((each) => each.name),
      ...record.windows.map((each) => each.label),
      ...recordFigures(record).map((each) => each.note ?? ""),
    ]);
    expect(texts.length).toBeGreaterThan(80);
    expect(texts.flatMap((text) => forbiddenForms(text).map(({ found }) => `${found}: ${text}`))).toEqual([]);
  });
});
