import { describe, expect, it } from "vitest";
import { figureColumns } from "../../../src/core/analysis/drawnCurve.ts";
import { derive } from "../../../src/core/analysis/index.ts";
import { individualReadings } from "../../../src/core/analysis/individualReadings.ts";
import type { Case } from "../../../src/core/case/index.ts";
import type { DoseLine } from "../../../src/core/regimen/index.ts";
import { orderedLine } from "../case/orderedLine.ts";
import { caseFixture } from "./caseFixture.ts";

/** 200 mg at 08:00 and 300 mg at 22:00 from an instant on. */
function morningAndEvening(start: string, order: (lines: DoseLine[]) => DoseLine[] = (lines) => lines): Case {
  const lines = order([
    orderedLine({ id: "m", start, amount: { value: 200, unit: "mg" }, repeat: { clock: ["08:00"] } }),
    orderedLine({ id: "e", start, amount: { value: 300, unit: "mg" }, repeat: { clock: ["22:00"] } }),
  ]);
  return caseFixture({ options: [{ id: "A", label: "", chosen: true, lines }] });
}

const EVENING = "2026-03-04T22:00:00+00:00";
const MORNING = "2026-03-05T08:00:00+00:00";
const evening = derive(morningAndEvening(EVENING));
const morning = derive(morningAndEvening(MORNING));
const steady = ({ options }: typeof evening) => options[0]!.typical!.steadyState!;

/** Share of a dose's whole area that lies in the first `hours`, one compartment with first-order absorption after a lag. */
function areaShare(ka: number, ke: number, lag: number, hours: number): number {
  const open = hours - lag;
  return 1 + (ke * Math.exp(-ka * open) - ka * Math.exp(-ke * open)) / (ka - ke);
}

/** Area of one period at steady state is that of its doses for ever: 500 mg over what each leaves within the first 24 h. */
function accumulationByHand(doses: readonly (readonly [number, number])[]): number {
  const { products, eliminationRate } = evening.typical!;
  const { absorptionRate, lag } = products.find(({ product }) => product === "tablet-12h")!;
  const first = doses.reduce(
    (sum, [at, mg]) => sum + mg * areaShare(absorptionRate!.value, eliminationRate!.value, lag.value, 24 - at),
    0,
  );
  return 500 / first;
}

describe("a pattern is taken in the order in which the option gives it", () => {
  it("accumulation of 300 mg at 22:00 and then 200 mg at 08:00 is not that of 200 mg first", () => {
    const byHand = accumulationByHand([
      [0, 300],
      [10, 200],
    ]);
    const fromMorning = accumulationByHand([
      [0, 200],
      [14, 300],
    ]);
    // More than a sixth apart: what was mistaken for the other would be seen.
    expect(fromMorning / byHand).toBeGreaterThan(1.15);
    expect(Math.abs(steady(evening).accumulation / byHand - 1)).toBeLessThan(1e-12);
    expect(Math.abs(steady(morning).accumulation / fromMorning - 1)).toBeLessThan(1e-12);
    const otherWay = derive(morningAndEvening(EVENING, (lines) => lines.toReversed()));
    expect(steady(otherWay).accumulation).toBe(steady(evening).accumulation);
  });

  it("highest, lowest, average and when they come don't depend on it", () => {
    const [one, other] = [steady(evening), steady(morning)];
    for (const name of ["peak", "lowest", "average", "auc24", "swing", "fluctuation", "timeTo90H"] as const) {
      expect(Math.abs(one[name] / other[name] - 1), name).toBeLessThan(1e-12);
    }
    // Times of an extreme, h: to 1e-9 as elsewhere.
    expect(Math.abs(one.peakAfterDoseH - other.peakAfterDoseH)).toBeLessThan(1e-9);
    expect(Math.abs(one.lowestAfterDoseH - other.lowestAfterDoseH)).toBeLessThan(1e-9);
  });

  it("90 % of steady state counts from the first dose, at 22:00", () => {
    const from = ({ clock }: typeof evening, instant: string) => (Date.parse(instant) - clock.originMs) / 3_600_000;
    expect(steady(evening).steady90AtH - steady(evening).timeTo90H).toBeCloseTo(from(evening, EVENING), 9);
    expect(steady(morning).steady90AtH - steady(morning).timeTo90H).toBeCloseTo(from(morning, MORNING), 9);
  });

  it("the draws take it in the same order", () => {
    const value = morningAndEvening(EVENING);
    // Two draws that differ in nothing from the typical patient.
    const steps = individualReadings(
      value,
      value.options[0]!.lines,
      evening.typical!,
      { names: [], count: 2, eta: [] },
      figureColumns(2),
      { fromH: 0, toH: 24, actsFromH: null },
      null,
    );
    let step = steps.next();
    while (!step.done) step = steps.next();
    expect(Math.abs(step.value.steadyState!.accumulation.q50 / steady(evening).accumulation - 1)).toBeLessThan(1e-12);
  });
});
