import { describe, expect, it } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { BUILT_IN_RECORDS, type MedicineRecord, recordById } from "../../../src/core/medicine/index.ts";
import { concernMessage } from "../../../src/core/messages/index.ts";
import { caseFixture } from "./caseFixture.ts";

const fixture = caseFixture();

/** The fixture with a toxic limit between the lowest and the highest level of its option, which it is held against as the record says. */
function derived(toxicAt: MedicineRecord["toxicAt"], from: number, change: Partial<Case> = {}) {
  const { toxicAt: _, ...record } = fixture.medicine;
  const toxicFrom = { value: from, unit: "mg/L", source: Object.keys(record.sources)[0]!, basis: "seen" } as const;
  const medicine = { ...record, toxicFrom, ...(toxicAt && { toxicAt }) };
  return derive(
    { ...fixture, fit: { ...fixture.fit, use: "typical" }, medicine, ...change },
    { isFitted: change.levels !== undefined },
  );
}
const codes = (found: ReturnType<typeof derive>) => found.concerns.map(({ code }) => code);

describe("a toxic limit for the level just before a dose", () => {
  const { lowest, peak } = derived(undefined, 1).options[0]!.typical!.steadyState!;
  const between = (lowest + peak) / 2;

  it("is not compared with the highest level; one for any level is", () => {
    expect(codes(derived("trough", between))).not.toContain("option-toxic");
    expect(codes(derived("any", between))).toContain("option-toxic");
    expect(codes(derived(undefined, between))).toContain("option-toxic");
  });

  it("is reached by the level before a dose, and the sentence says which level", () => {
    const one = derived("trough", lowest * 0.99).concerns.find(({ code }) => code === "option-toxic")!;
    expect(one.gravity).toBe("stop");
    expect(concernMessage(one).text).toMatch(/^Highest predicted just before a dose /);
    expect(codes(derived("trough", lowest * 1.01))).not.toContain("option-toxic");
  });

  it("of unequal doses the highest level before a dose is held against it", () => {
    const [line] = fixture.options[0]!.lines;
    const of = (hour: string, mg: number) => ({
      ...line!,
      id: `at-${hour}`,
      amount: { value: mg, unit: "mg" as const },
      start: `2026-03-05T${hour}:00+00:00`,
      repeat: { clock: [hour] },
    });
    const options = [{ ...fixture.options[0]!, lines: [of("08:00", 400), of("20:00", 100)] }];
    const steady = derived("trough", 1, { options }).options[0]!.typical!.steadyState!;
    // Before the evening dose, twelve hours after the large one.
    expect(steady.highestTrough! / steady.lowest).toBeGreaterThan(1.1);
    expect(codes(derived("trough", (steady.highestTrough! + steady.lowest) / 2, { options }))).toContain(
      "option-toxic",
    );
  });

  it("is held against this patient's levels before a dose where the order rests on them", () => {
    const levels: Case["levels"] = [
      { id: "l", at: "2026-03-04T07:30:00+00:00", quantity: { value: 6, unit: "mg/L" }, kind: "measured" },
    ];
    const change: Partial<Case> = { levels, fit: { ...fixture.fit, use: "individual" } };
    const own = derived("trough", 1, change).options[0]!.individual!.steadyState!;
    // Equal doses: the lowest comes soon after the next dose, once it is absorbed faster than eliminated; relative.
    expect(Math.abs(own.highestTrough!.q50 / own.lowest.q50 - 1)).toBeLessThan(0.02);
    const one = derived("trough", own.highestTrough!.q50 * 0.99, change);
    expect(codes(one)).toContain("option-chance-toxic");
    expect(codes(one)).not.toContain("option-toxic");
    const { text } = concernMessage(one.concerns.find(({ code }) => code === "option-chance-toxic")!);
    expect(text).toContain(
      "the highest just before a dose at steady state reaches the record's toxic limit for that level",
    );
    expect(codes(derived("trough", own.peak.q50, change))).not.toContain("option-chance-toxic");
  });
});

/** Read in the sources the records name; ug/L, for linezolid and voriconazole mg/L. */
it.each([
  ["tacrolimus", 25],
  ["clozapine", 1000],
  ["imatinib", 2000],
  ["linezolid", 10],
  ["voriconazole", 6],
])("the %s record states its toxic limit for the trough: %d", (id, wanted) => {
  const record = recordById(id)!;
  expect([record.toxicFrom?.value, record.toxicFrom?.unit, record.toxicFrom?.basis, record.toxicAt]).toEqual([
    wanted,
    record.displayUnit,
    "seen",
    "trough",
  ]);
});

it("no other record's limit is for the trough alone", () => {
  expect(BUILT_IN_RECORDS.filter(({ toxicAt }) => toxicAt === "trough")).toHaveLength(5);
});
