import { describe, expect, it } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";
import { richOccasions } from "../../../src/view/rich/richOccasions.ts";
import { at, levelsOf, ORAL_LEVELS, richCase } from "./richCase.ts";

const found = (value: Case) => richOccasions(value, derive(value));
const codes = (value: Case) => found(value).lacks.map(({ code }) => code);
/** Four levels after the dose `hours` after the first, the last just before the next. */
const fourAfter = (hours: number) =>
  levelsOf([
    [hours + 1, 6],
    [hours + 3, 9],
    [hours + 6, 8],
    [hours + 12, 6],
  ]);

describe("richOccasions", () => {
  it("after the first dose: the levels before the next, and 0 at the dose", () => {
    const { occasions, lacks } = found(richCase(1, ORAL_LEVELS));
    expect(lacks).toEqual([]);
    expect(occasions).toHaveLength(1);
    const [{ kind, tau, doseMg, measured, points }] = occasions as [(typeof occasions)[0]];
    expect([kind, tau, doseMg, measured]).toEqual(["one-dose", null, 200, 10]);
    expect(points.map(({ time }) => time)).toEqual([0, 0.25, 0.5, 1, 2, 3.5, 5, 7, 9, 12, 24]);
    expect(points.map(({ from }) => from).slice(0, 2)).toEqual(["nothing-before", "measured"]);
  });

  it("levels after the second dose do not belong to the first", () => {
    const { occasions } = found(richCase(2, ORAL_LEVELS));
    expect(occasions.map(({ points }) => points.at(-1)!.time)).toEqual([12]);
  });

  it("a missed dose is none", () => {
    const value = richCase(2, ORAL_LEVELS);
    const given = value.given.map((line) => ({ ...line, except: [{ index: 1, status: "missed" as const }] }));
    expect(found({ ...value, given }).occasions[0]!.points.at(-1)!.time).toBe(24);
  });

  it.each([
    ["left out", { excluded: "haemolysed" }],
    ["below the limit", { kind: "below-limit" as const }],
  ])("a level %s does not count", (_, change) => {
    const levels = ORAL_LEVELS.map((level, i) => (i > 2 ? { ...level, ...change } : level));
    const value = richCase(1, levels);
    expect(codes(value)).toEqual(["rich-levels-few"]);
    expect(found(value).lacks[0]!.data).toEqual({ found: 3, needed: 4 });
  });

  it("no dose, no reading", () => {
    expect(codes(richCase(1, [], { given: [] }))).toEqual(["rich-no-dose"]);
    expect(codes(richCase(5, []))).toEqual(["rich-levels-few"]);
  });

  it("at steady state: an interval; the level at the very moment of the next dose ends it", () => {
    const { occasions } = found(richCase(9, fourAfter(84)));
    expect(occasions.map(({ kind, tau, measured }) => [kind, tau, measured])).toEqual([["interval", 12, 4]]);
    expect(occasions[0]!.points.map(({ time }) => time)).toEqual([1, 3, 6, 12]);
  });

  it("a level up to half an hour before the dose stands for the level at it, one before that does not", () => {
    const early = (hours: number) => found(richCase(9, [...levelsOf([[hours, 5]]), ...fourAfter(84)])).occasions[0]!;
    expect(early(83.75).points[0]).toMatchObject({ time: 0, value: 5, from: "just-before" });
    expect(early(84).points[0]).toMatchObject({ time: 0, value: 5, from: "measured" });
    expect(early(83.25).points[0]!.time).toBe(1);
  });

  it("before five half-lives: none, with the hours it lacks", () => {
    const value = richCase(3, fourAfter(24));
    expect(codes(value)).toEqual(["rich-not-steady"]);
    const { run, needed } = found(value).lacks[0]!.data as { run: number; needed: number };
    expect(run).toBe(24);
    expect(needed).toBeGreaterThan(24);
    expect(needed).toBeCloseTo(5 * derive(value).typical!.halfLife!.value, 9);
  });

  it("doses that are unequal or irregular have no steady state to assume", () => {
    const line = richCase(1, []).given[0]!;
    const uneven = [0, 12, 30, 36, 60, 72].map((hours, i) => ({ ...line, id: `u${i}`, start: at(hours) }));
    expect(codes(richCase(6, fourAfter(60), { given: uneven }))).toEqual(["rich-irregular"]);
    const growing = [0, 12, 24, 36, 48, 60].map((hours, i) => ({
      ...line,
      id: `g${i}`,
      amount: { value: 100 * (i + 1), unit: "mg" as const },
      start: at(hours),
    }));
    expect(codes(richCase(6, fourAfter(60), { given: growing }))).toEqual(["rich-irregular"]);
  });

  it("a dose taken an hour late keeps the interval, regular enough", () => {
    const value = richCase(9, fourAfter(84));
    const given = value.given.map((each) => ({ ...each, except: [{ index: 5, status: "late" as const, at: at(61) }] }));
    expect(found({ ...value, given }).occasions).toHaveLength(1);
  });

  it("without a typical patient steady state is not known", () => {
    const value = richCase(9, fourAfter(84));
    const patient = { ...value.patient, observations: [] };
    expect(codes({ ...value, patient })).toEqual(["rich-model-missing"]);
  });

  it("two doses at one moment are one dose of their sum", () => {
    const value = richCase(1, ORAL_LEVELS);
    const twice = [value.given[0]!, { ...value.given[0]!, id: "h", amount: { value: 100, unit: "mg" as const } }];
    expect(found({ ...value, given: twice }).occasions.map(({ doseMg }) => doseMg)).toEqual([300]);
  });

  it("a change of clearance starts the wait anew, and during the levels is pointed out", () => {
    const changedAt = (hours: number) => {
      const value = richCase(9, fourAfter(84));
      const factor = { kind: "smoking" as const, from: at(hours), detail: "stopped", effect: { clearance: 0.6 } };
      return found({ ...value, patient: { ...value.patient, factors: [factor] } });
    };
    expect(changedAt(60).lacks.map(({ code }) => code)).toEqual(["rich-not-steady"]);
    expect(changedAt(60).lacks[0]!.data.run).toBe(24);
    expect(changedAt(90).occasions[0]!.cautions.map(({ code }) => code)).toEqual(["rich-clearance-changed"]);
    expect(changedAt(-24).occasions[0]!.cautions).toEqual([]);
  });

  it("of a medicine whose elimination saturates it says that no half-life holds", () => {
    const medicine = recordById("phenytoin")!;
    const line = { ...richCase(1, []).given[0]!, product: medicine.products[0]!.id };
    const [occasion] = found(richCase(1, ORAL_LEVELS, { medicine, given: [line] })).occasions;
    expect(occasion!.saturates).toBe(true);
    expect(occasion!.cautions.map(({ code }) => code)).toEqual(["rich-saturates"]);
    expect(found(richCase(1, ORAL_LEVELS)).occasions[0]!.saturates).toBe(false);
  });
});
