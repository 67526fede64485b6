import { describe, expect, it } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import type { Case } from "../../../src/core/case/index.ts";
import { modelProfile } from "../../../src/core/kinetics/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";
import { caseFixture } from "./caseFixture.ts";

const base = caseFixture();
type Factor = Case["patient"]["factors"][number];
const withFactors = (...factors: Factor[]): Case => ({ ...base, patient: { ...base.patient, factors } });
const inhibitor = (change: Partial<Factor> = {}): Factor => ({
  kind: "interacting-medicine",
  from: "2026-03-03T08:00:00+00:00",
  detail: "invented inhibitor",
  effect: { clearance: 0.5 },
  ...change,
});
const spans = (value: Case) => derive(value).typical!.dispositions;
const clearances = (value: Case) =>
  spans(value).map(({ from, disposition }) => [from, "clearance" in disposition ? disposition.clearance : 0] as const);

describe("kinetics that change on the clock", () => {
  const usual = derive(base).typical!.clearance!.value;

  it("without events one span holds for ever", () => {
    expect(clearances(base)).toEqual([[Number.NEGATIVE_INFINITY, usual]]);
  });

  it("an event without onset changes clearance at once and for good", () => {
    expect(clearances(withFactors(inhibitor()))).toEqual([
      [Number.NEGATIVE_INFINITY, usual],
      [56, usual * 0.5],
    ]);
  });

  it("an onset is a daily ramp on the log scale that ends at the whole effect", () => {
    const found = clearances(withFactors(inhibitor({ effect: { clearance: 0.25, onset: { value: 2, unit: "d" } } })));
    expect(found.map(([from]) => from)).toEqual([Number.NEGATIVE_INFINITY, 56, 80]);
    expect(Math.abs(found[1]![1] / (usual * 0.5) - 1)).toBeLessThan(1e-15);
    expect(Math.abs(found[2]![1] / (usual * 0.25) - 1)).toBeLessThan(1e-15);
  });

  it("an event that ends gives the kinetics back", () => {
    const found = clearances(withFactors(inhibitor({ to: "2026-03-04T08:00:00+00:00" })));
    expect(found.at(-1)).toEqual([80, usual]);
  });

  it("two events multiply while both last", () => {
    const found = clearances(
      withFactors(inhibitor(), inhibitor({ from: "2026-03-04T08:00:00+00:00", effect: { clearance: 2 } })),
    );
    expect(found.at(-1)![1]).toBe(usual);
  });

  it("an event without an effect changes nothing", () => {
    const { effect: _, ...plain } = inhibitor();
    expect(clearances(withFactors(plain))).toHaveLength(1);
  });

  it("the curve is that of the kinetics core with the same spans, and continuous where clearance changes", () => {
    const analysis = derive(withFactors(inhibitor()));
    const product = analysis.typical!.products.find((each) => each.product === "tablet-12h")!;
    const doses = analysis.given.map((mark) => ({ time: mark.atH, amount: mark.countedMg }));
    const times = [55.9, 56, 56.1, 70];
    const found = modelProfile(
      {
        dispositions: analysis.typical!.dispositions,
        inputs: [{ absorption: product.absorption, bioavailability: 1, lag: 0, doses }],
      },
      times,
    );
    expect(Math.abs(found[1]! - found[0]!)).toBeLessThan(0.1);
    // Slower clearance: higher than without the event.
    const plain = derive(base);
    expect(found[3]!).toBeGreaterThan(
      modelProfile(
        {
          dispositions: plain.typical!.dispositions,
          inputs: [{ absorption: product.absorption, bioavailability: 1, lag: 0, doses }],
        },
        [70],
      )[0]!,
    );
  });

  it("steady state refers to the final state, and says so", () => {
    const changed = derive(withFactors(inhibitor({ from: "2026-03-05T08:00:00+00:00" }))).options[0]!.typical!;
    const plain = derive(base).options[0]!.typical!;
    expect(Math.abs(changed.steadyState!.average / (2 * plain.steadyState!.average) - 1)).toBeLessThan(1e-12);
    expect(changed.refersToFinalState).toBe(true);
    expect(plain.refersToFinalState).toBe(false);
  });

  it("kidney function measured again changes a record that uses it, and no other", () => {
    const creatinine = (id: string, at: string, value: number): Case["patient"]["observations"][number] => ({
      id,
      at,
      kind: "serumCreatinine",
      quantity: { value, unit: "mg/dL" },
    });
    const observations = [
      ...base.patient.observations.filter((each) => each.kind === "weight"),
      creatinine("c1", "2026-03-01T08:00:00+00:00", 1),
      creatinine("c2", "2026-03-03T08:00:00+00:00", 2),
    ];
    const theophylline = { ...base, patient: { ...base.patient, observations } };
    expect(spans(theophylline)).toHaveLength(1);
    const medicine = recordById("digoxin")!;
    const digoxin = { ...theophylline, medicine, given: [], options: [] };
    const found = clearances(digoxin);
    expect(found.map(([from]) => from)).toEqual([Number.NEGATIVE_INFINITY, -16]);
    expect(found[1]![1]).toBeLessThan(found[0]![1]);
    // At the now line the later creatinine holds: the figure shown is the last span's.
    expect(derive(digoxin).typical!.clearance!.value).toBe(found[1]![1]);
  });
});

describe("the cross-check", () => {
  it("is made only when asked for, and agrees", () => {
    expect(derive(base).crossCheck).toBeNull();
    const { crossCheck, concerns } = derive(base, { isCrossChecked: true });
    expect(crossCheck!.isAgreed).toBe(true);
    expect(crossCheck!.worst).toBeLessThan(1e-8);
    expect(concerns.map((concern) => concern.code)).not.toContain("roads-differ");
  });
});
