import { describe, expect, test } from "vitest";
import type { Factor, Observation } from "../../../src/core/case/index.ts";
import { eventsScene } from "../../../src/view/bench/eventsScene.ts";
import { clockScale } from "../../../src/view/chart/clockScale.ts";

// Hour 0 is Sunday 1 March 2026, midnight; 10 px an hour.
const scale = clockScale(0, 100, 0, 1000);
const originMs = Date.parse("2026-03-01T00:00:00Z");
const iso = (hours: number) => new Date(originMs + hours * 3_600_000).toISOString().replace(".000Z", "+00:00");
const factor = (from: number, to?: number, change: Partial<Factor> = {}): Factor => ({
  kind: "interacting-medicine",
  from: iso(from),
  ...(to === undefined ? {} : { to: iso(to) }),
  detail: "x",
  ...change,
});
const scene = (factors: Factor[], observations: Observation[] = [], changesH: number[] = []) =>
  eventsScene({ factors, observations, changesH, scale, originMs, zone: "UTC" });

/** Numbers are kept on one line with their unit. */
const plain = (text: string) => text.replaceAll("\u00a0", " ");

describe("eventsScene", () => {
  test("a bar lies between its ends; one without an end runs to the end of what is shown", () => {
    const [closed, open] = scene([factor(10, 30), factor(50)]).bars;
    expect([closed!.from, closed!.to, closed!.goesOn]).toEqual([100, 300, false]);
    expect([open!.from, open!.to, open!.goesOn]).toEqual([500, 1000, true]);
    expect(open!.label).toBe("x, from Tue 3 March, 02:00");
  });

  test("overlapping events get rows of their own, later ones take a free row", () => {
    const { bars, height } = scene([factor(0, 40), factor(5, 30), factor(65, 90)]);
    const tops = new Map(bars.map((bar) => [bar.index, bar.top]));
    expect(tops.get(1)).toBeGreaterThan(tops.get(0)!);
    expect(tops.get(2)).toBe(tops.get(0));
    expect(height).toBeGreaterThan(tops.get(1)!);
  });

  test("a label is never laid over another bar or label", () => {
    const { bars } = scene(Array.from({ length: 12 }, (_, i) => factor(i * 8, i * 8 + 4)));
    for (const a of bars) {
      for (const b of bars) {
        if (a.index >= b.index || a.top !== b.top) continue;
        const labelEnd = a.anchor === "start" ? a.labelX + a.label.length * 6 : a.labelX;
        expect(Math.max(a.to, labelEnd)).toBeLessThan(
          Math.min(b.from, b.anchor === "end" ? b.labelX - b.label.length * 6 : b.labelX),
        );
      }
    }
  });

  test("an event that began before what is shown is cut and marked; one outside is left out", () => {
    const { bars } = scene([factor(-20, 10), factor(-20, -10), factor(101)]);
    expect(bars).toHaveLength(1);
    expect([bars[0]!.from, bars[0]!.to, bars[0]!.beginsBefore]).toEqual([0, 100, true]);
  });

  test("an onset is a ramp as long as its days", () => {
    const [bar] = scene([factor(10, undefined, { effect: { clearance: 0.5, onset: { value: 2, unit: "d" } } })]).bars;
    expect(bar!.full).toBe(580);
    expect(scene([factor(10)]).bars[0]!.full).toBe(100);
  });

  test("a meal without an end is a moment", () => {
    const [bar] = scene([factor(10, undefined, { kind: "meal", detail: "breakfast" })]).bars;
    expect([bar!.isMoment, bar!.to - bar!.from]).toEqual([true, 10]);
    expect(bar!.label).toBe("breakfast, Sun 1 March, 10:00");
  });

  test("measured values stand at their time with value and unit, in rows of their own above the bars", () => {
    const observations: Observation[] = [
      { id: "w", at: iso(8), kind: "weight", quantity: { value: 58, unit: "kg" } },
      { id: "c", at: iso(8), kind: "serumCreatinine", quantity: { value: 1.4, unit: "mg/dL" } },
      { id: "out", at: iso(200), kind: "weight", quantity: { value: 58, unit: "kg" } },
    ];
    const { marks, bars } = scene([factor(0)], observations);
    expect(marks.map((mark) => [plain(mark.label), mark.x])).toEqual([
      ["weight 58 kg", 80],
      ["creatinine 1.4 mg/dL", 80],
    ]);
    expect(marks[0]!.top).toBeLessThan(marks[1]!.top);
    expect(marks[1]!.top).toBeLessThan(bars[0]!.top);
  });

  test("many values at once keep three rows; the rest lose their words, not their marks", () => {
    const observations: Observation[] = Array.from({ length: 6 }, (_, i) => ({
      id: `c${i}`,
      at: iso(20 + i / 10),
      kind: "serumCreatinine" as const,
      quantity: { value: 1 + i / 10, unit: "mg/dL" as const },
    }));
    const { marks } = scene([], observations);
    expect(marks.map((mark) => mark.label !== "")).toEqual([true, true, true, false, false, false]);
    expect(new Set(marks.map((mark) => mark.top)).size).toBe(3);
    expect(plain(marks[5]!.words)).toContain("creatinine 1.5 mg/dL");
  });

  test("a change of the kinetics outside what is shown draws no line", () => {
    expect(scene([], [], [-5, 40, 120]).changes).toEqual([400]);
  });
});
