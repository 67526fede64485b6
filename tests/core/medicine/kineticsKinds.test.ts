import { describe, expect, it } from "vitest";
import {
  BUILT_IN_RECORDS,
  covariatesOf,
  formulaEvaluate,
  kineticsFormulas,
  recordById,
} from "../../../src/core/medicine/index.ts";
import { medicinesWords } from "../../../src/core/messages/index.ts";

const of = (id: string) => kineticsFormulas(recordById(id)!).map(({ name, symbol, unit }) => [name, symbol, unit]);

describe("kineticsFormulas", () => {
  it("lists the formulas of each kind in order", () => {
    expect(of("theophylline")).toEqual([
      ["clearance", "CL", "L/h"],
      ["volume", "V", "L"],
    ]);
    expect(of("digoxin")).toEqual([
      ["clearance", "CL", "L/h"],
      ["volume", "V1", "L"],
      ["exchange", "Q", "L/h"],
      ["peripheralVolume", "V2", "L"],
    ]);
    expect(of("phenytoin")).toEqual([
      ["maximumRate", "Vmax", "mg/h"],
      ["halfMaximum", "Km", "mg/L"],
      ["volume", "V", "L"],
    ]);
  });

  it("gives each formula as the record states it, and every name has a word on the record's page", () => {
    for (const record of BUILT_IN_RECORDS) {
      const stated = record.kinetics as unknown as Record<string, unknown>;
      const formulas = kineticsFormulas(record);
      for (const { name, formula, words } of formulas) {
        expect(formula).toBe(stated[name]);
        expect(medicinesWords.figures[name]).toMatch(/^[a-z]/);
        expect(words).toMatch(/^[A-Z]/);
      }
      const fields = Object.keys(stated).filter((key) => key !== "kind" && key !== "apparent");
      expect(formulas.map((each) => each.name as string).sort()).toEqual(fields.sort());
    }
  });
});

describe("covariatesOf", () => {
  it.each([
    ["theophylline", ["weight", "idealWeight"]],
    ["lamotrigine", []],
    ["demoxiline", ["creatinineClearance", "weight"]],
    ["phenytoin", ["weight"]],
    ["digoxin", ["weight", "creatinineClearance"]],
  ])("%s needs %j", (id, names) => {
    expect(covariatesOf(recordById(id)!)).toEqual(names);
  });

  it("names what is asked for when nothing is known, no more and no less", () => {
    for (const record of BUILT_IN_RECORDS) {
      const asked = kineticsFormulas(record).flatMap(({ formula }) => {
        const value = formulaEvaluate(formula, {});
        return value.ok ? [] : value.issues.map((each) => each.data.name);
      });
      expect([...new Set(asked)]).toEqual(covariatesOf(record));
    }
  });
});
