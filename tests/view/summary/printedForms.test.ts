// @vitest-environment node
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { BUILT_IN_RECORDS } from "../../../src/core/medicine/index.ts";
import type { DoseLine } from "../../../src/core/regimen/index.ts";
import { forbiddenForms } from "../../../src/core/units/index.ts";
import { buildSummary, fingerprintGroups } from "../../../src/view/summary/buildSummary.ts";
import type { SummaryInput } from "../../../src/view/summary/summaryInput.ts";
import { orderedLine } from "../../core/case/orderedLine.ts";
import { demoCase } from "../../fixtures/demoCase.ts";
import { caseOrdering, summaryCase, summaryInputOf } from "./summaryFixture.ts";

/** Every string of a value, with its path. */
function strings(value: unknown, path = "model"): readonly (readonly [path: string, text: string])[] {
  if (typeof value === "string") return [[path, value]];
  if (Array.isArray(value)) return value.flatMap((each, index) => strings(each, `${path}[${index}]`));
  if (value !== null && typeof value === "object") {
    return Object.entries(value).flatMap(([key, each]) => strings(each, `${path}.${key}`));
  }
  return [];
}

/**
 * What is printed as it stands elsewhere: published titles, which a concern may quote too, and the fingerprint,
 * a name whose hexadecimal digits may spell anything.
 */
function quoted({ case: { medicine }, analysis }: SummaryInput): readonly string[] {
  const titles = Object.values(medicine.sources).map(({ authors, title, year, place }) =>
    [authors, title, year, place].filter((part) => part !== undefined).join(", "),
  );
  return [...titles, fingerprintGroups(analysis.fingerprint), fingerprintGroups(analysis.fingerprint.slice(0, 12))];
}

function found(input: SummaryInput): readonly string[] {
  const quotes = quoted(input);
  return strings(buildSummary(input))
    .map(([path, text]) => [path, quotes.reduce((rest, quote) => rest.replaceAll(quote, ""), text)] as const)
    .flatMap(([path, text]) =>
      forbiddenForms(text).map((form) => `${path}: rule ${form.rule} "${form.found}" in "${text}"`),
    );
}

describe("nothing printed has an error-prone form", () => {
  it("finds one that was put in, wherever it stands", () => {
    expect(found(summaryInputOf(summaryCase({ label: "theophylline 10.0 mg QD" }))).length).toBeGreaterThan(0);
    expect(found(summaryInputOf(summaryCase({ notes: "5 mg/L" }))).length).toBeGreaterThan(0);
  });

  it.each(["adjustment", "start"])("in the %s demo", (name) => {
    expect(found(summaryInputOf(demoCase(name)))).toEqual([]);
  });

  it.each(BUILT_IN_RECORDS.map((record) => [record.id, record.products[0]!.id] as const))(
    "in a case of %s",
    (medicine, product) => {
      const line = orderedLine({ product, amount: { value: 50, unit: "mg" } });
      expect(
        found(
          summaryInputOf(
            caseOrdering([line], { given: [{ ...line, start: "2026-03-01T08:00:00+00:00" }], notes: "" }, medicine),
          ),
        ),
      ).toEqual([]);
    },
  );

  it("in cases with nothing recorded, stale, unsaved, without an option", () => {
    const bare = { patient: { observations: [], factors: [] }, levels: [], given: [], options: [] };
    for (const value of [summaryCase(bare), summaryCase(), summaryCase({ options: [] })]) {
      for (const change of [
        {},
        { revision: 15 },
        { saving: { status: "unsaved" as const, savedAt: null, detail: "" } },
      ]) {
        expect(found(summaryInputOf(value, change))).toEqual([]);
      }
    }
  });

  it("in any amount, interval, clock time, level and microgram word", () => {
    fc.assert(
      fc.property(lines(anyAmount), anyLevel, anyMicrogram, (ordered, level, microgram) => {
        const input = inputOf(ordered, level, microgram);
        // The sentences of the concerns have the next test to themselves.
        expect(found({ ...input, analysis: { ...input.analysis, concerns: [] } })).toEqual([]);
      }),
      { seed: 20260304, numRuns: 50 },
    );
  }, 120_000);

  it("in the concerns of any amount from 1 mg on", () => {
    fc.assert(
      fc.property(lines(anyMilligram), anyLevel, (ordered, level) => {
        expect(found(inputOf(ordered, level, "microgram"))).toEqual([]);
      }),
      { seed: 20260305, numRuns: 40 },
    );
  }, 120_000);
});

type Ordered = readonly Pick<DoseLine, "product" | "amount" | "repeat">[];

function inputOf(ordered: Ordered, level: number, microgram: "microgram" | "mcg"): SummaryInput {
  const measured = {
    id: "l",
    at: "2026-03-02T19:30:00+00:00",
    quantity: { value: level, unit: "mg/L" as const },
    kind: "measured" as const,
  };
  const value = caseOrdering(
    ordered.map((line, index) => orderedLine({ ...line, id: `line-${index}` })),
    { levels: [measured] },
  );
  return summaryInputOf(value, { settings: { pageSize: "A4", microgram, preparedBy: "" } });
}

const anyMilligram = fc
  .integer({ min: 100, max: 400_000 })
  .map((value) => ({ value: value / 100, unit: "mg" as const }));
const anyAmount = fc.oneof(
  fc.integer({ min: 1, max: 400_000 }).map((value) => ({ value: value / 100, unit: "mg" as const })),
  fc.integer({ min: 1, max: 9_999 }).map((value) => ({ value, unit: "ug" as const })),
  fc.integer({ min: 1, max: 4_000 }).map((value) => ({ value: value / 1_000, unit: "g" as const })),
);
const anyLevel = fc.integer({ min: 1, max: 1_000_000 }).map((value) => value / 1_000);
const anyMicrogram = fc.constantFrom("microgram" as const, "mcg" as const);
const anyClock = fc
  .tuple(fc.integer({ min: 0, max: 23 }), fc.integer({ min: 0, max: 59 }))
  .map(([hour, minute]) => `${String(hour).padStart(2, "0")}:${String(minute).padStart(2, "0")}`);
const anyRepeat = fc.oneof(
  fc.integer({ min: 1, max: 200 }).map((value) => ({ every: { value: value / 2, unit: "h" as const } })),
  fc
    .tuple(fc.integer({ min: 1, max: 48 }), fc.integer({ min: 1, max: 40 }))
    .map(([value, count]) => ({ every: { value, unit: "h" as const }, count })),
  fc.uniqueArray(anyClock, { minLength: 1, maxLength: 4 }).map((clock) => ({ clock, days: 5 })),
);

function lines(amount: fc.Arbitrary<DoseLine["amount"]>): fc.Arbitrary<Ordered> {
  const product = fc.constantFrom("tablet-12h", "tablet", "solution");
  return fc.array(fc.record({ product, amount, repeat: anyRepeat }), { minLength: 1, maxLength: 3 });
}
