import { describe, expect, it } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import { recordById } from "../../../src/core/medicine/index.ts";
import { readingsGroups } from "../../../src/view/bench/readingsRows.ts";
import { levelLines, levelNear, readoutLines, readoutsAt } from "../../../src/view/bench/readoutLines.ts";
import { bandAt } from "../../../src/view/chart/bandAt.ts";
import { profileParts } from "../../../src/view/chart/profileParts.ts";
import { caseFixture } from "../../core/analysis/caseFixture.ts";
import { fittedAnalysis, spread } from "../../core/analysis/fitFixture.ts";
import { orderedLine } from "../../core/case/orderedLine.ts";

const value = caseFixture({
  levels: [{ id: "l", at: "2026-03-04T07:30:00+00:00", quantity: { value: 5, unit: "mg/L" }, kind: "measured" }],
});
const typical = derive(value);
const fitted = fittedAnalysis(typical);

describe("readings of this patient", () => {
  const row = (analysis: typeof typical, id: string, ofCase = value) =>
    readingsGroups(ofCase, analysis, "mg/L")
      .flatMap((group) => group.rows)
      .find((each) => each.id === id)!;

  it("stand beside the typical ones: the median, and the 90 % interval from 5 to 95 %", () => {
    const own = {
      ...fitted.options[0]!.individual!.steadyState!,
      peak: { q05: 9.364, q25: 10, q50: 11.72, q75: 13, q95: 14.68 },
    };
    const options = [{ ...fitted.options[0]!, individual: { ...fitted.options[0]!.individual!, steadyState: own } }];
    const [cell] = row({ ...fitted, options }, "peak").cells;
    expect(cell!.individual).toEqual({ text: "11.7", sub: "9.36 to 14.7" });
    expect(cell!.typical!.text).not.toContain("mg/L");
  });

  it("say the unit once, in the head; hours in the row's name", () => {
    const [steady] = readingsGroups(value, fitted, "mg/L");
    expect(steady!.head).toContain("mg/L");
    expect(steady!.head).not.toContain("typical");
    expect(row(fitted, "halfLife").name).toBe("Half-life, h");
  });

  it("without a fit there is the typical patient alone, named in the head, units in the cells", () => {
    const [steady] = readingsGroups(value, typical, "mg/L");
    expect(steady!.head).toBe("Readings at steady state, typical patient");
    const [cell] = row(typical, "peak").cells;
    expect(cell!.individual).toBeNull();
    expect(cell!.typical!.text).toMatch(/ mg\/L$/);
  });

  it("have a row for the hour after the dose that the window is about: one figure, or from the lowest to the highest", () => {
    expect(readingsGroups(value, fitted, "mg/L")[0]!.rows.map(({ id }) => id)).not.toContain("timed");
    const timed = { afterDoseH: 12, lowest: 5, highest: 5 };
    const own = { afterDoseH: 12, lowest: spread(6, 1.1), highest: spread(8, 1.1) };
    const [option] = fitted.options;
    const options = [
      {
        ...option!,
        typical: { ...option!.typical!, steadyState: { ...option!.typical!.steadyState!, timed } },
        individual: { ...option!.individual!, steadyState: { ...option!.individual!.steadyState!, timed: own } },
      },
    ];
    const drawn = (hours: number) => ({ value: hours, unit: "h" as const });
    const window = { ...value.window!, quantity: "trough" as const, drawFrom: drawn(11), drawTo: drawn(13) };
    const found = row({ ...fitted, options }, "timed", { ...value, window });
    expect(found.name).toBe("12 h after a dose");
    // 6 / 1.21 and 8 · 1.21.
    expect(found.cells).toEqual([{ typical: { text: "5" }, individual: { text: "6 to 8", sub: "4.96 to 9.68" } }]);
    // Both say so where the next dose always comes sooner (the fixture's own readings have no such level).
    const never = { text: "never", sub: "the next dose comes sooner" };
    expect(row(fitted, "timed", { ...value, window }).cells).toEqual([{ typical: never, individual: never }]);
  });

  it("follow the unit shown", () => {
    const molar = readingsGroups(value, fitted, "umol/L")[0]!.rows.find((each) => each.id === "peak")!;
    const shown = Number(molar.cells[0]!.individual!.text);
    const mgPerL = fitted.options[0]!.individual!.steadyState!.peak.q50;
    // Theophylline, 180.17 g/mol; printed to three digits.
    expect(Math.abs(shown / ((mgPerL * 1000) / 180.17) - 1)).toBeLessThan(5e-3);
  });
});

describe("the dose in 24 h", () => {
  const medicine = recordById("phenytoin")!;
  const [salt, acid] = [true, false].map((isSalt) =>
    medicine.products.find(({ saltFactor }) => (saltFactor !== undefined) === isSalt),
  );
  const cells = (doses: readonly (readonly [product: string, mg: number])[]) => {
    const options = doses.map(([product, mg], i) => ({
      id: "AB"[i]!,
      label: "",
      chosen: false,
      lines: [
        orderedLine({
          id: `l${i}`,
          product,
          amount: { value: mg, unit: "mg" },
          repeat: { every: { value: 24, unit: "h" } },
        }),
      ],
    }));
    const of = caseFixture({ medicine, given: [], levels: [], options });
    const rows = readingsGroups(of, derive(of), "mg/L").flatMap((group) => group.rows);
    return rows.find(({ id }) => id === "dailyDose")!.cells.map(({ typical: cell }) => cell);
  };

  it("of a salt and of the free acid: the active part of both under the labelled amounts", () => {
    const active = 400 * salt!.saltFactor!.value;
    expect(active).toBeCloseTo(368, 0);
    expect(
      cells([
        [salt!.id, 400],
        [acid!.id, 350],
      ]),
    ).toEqual([
      { text: "400 mg", sub: "368 mg of active phenytoin" },
      { text: "350 mg", sub: "350 mg of active phenytoin" },
    ]);
  });

  it("of one salt: the labelled amounts alone", () => {
    expect(
      cells([
        [salt!.id, 400],
        [salt!.id, 300],
      ]),
    ).toEqual([{ text: "400 mg" }, { text: "300 mg" }]);
  });
});

describe("readout", () => {
  it("says the median and its 90 % interval, the typical value after it", () => {
    const hours = typical.clock.nowH + 20;
    const band = bandAt(fitted.options[0]!.band!, hours)!;
    const [line] = readoutLines(value, readoutsAt(fitted, hours), "mg/L");
    expect(line).toMatch(
      /^A {2}[\d.]+ mg\/L, 90 % interval [\d.]+ to [\d.]+; typical [\d.]+, [\d.]+ h after the dose$/,
    );
    const [, median, low, high] = /A {2}([\d.]+).*interval ([\d.]+) to ([\d.]+)/.exec(line!)!.map(Number);
    // Printed to three digits.
    expect(Math.abs(median! / band.q50 - 1)).toBeLessThan(5e-3);
    expect(Math.abs(low! / band.q05 - 1)).toBeLessThan(5e-3);
    expect(Math.abs(high! / band.q95 - 1)).toBeLessThan(5e-3);
  });

  it("at a level adds what was predicted and whether the forecast held", () => {
    const { atH } = fitted.levels[0]!;
    expect(levelNear(fitted, atH + 0.4, 20)?.id).toBe("l");
    expect(levelNear(fitted, atH + 0.6, 20)).toBeNull();
    const missed = {
      ...fitted.levels[0]!,
      fit: { ...fitted.levels[0]!.fit!, forecast: { predictive: spread(9), levelsKnown: 2, held: false } },
    };
    const lines = levelLines(value, missed, "mg/L");
    expect(lines).toHaveLength(2);
    expect(lines[1]).toBe("forecast before it (2 levels known), 90 %: 6.25 to 13: did not hold");
  });

  it("at a level the curve's limits are the level's own, not read off the drawing", () => {
    const { atH, fit } = fitted.levels[0]!;
    const given = { ...fitted, levels: [{ ...fitted.levels[0]!, fit: { ...fit!, predicted: spread(7.77) } }] };
    expect(readoutLines(value, readoutsAt(given, atH), "mg/L")[0]).toMatch(
      /^7\.77 mg\/L, 90 % interval 5\.4 to 11\.2; typical/,
    );
  });

  it("a band is read off between its times, and nowhere else", () => {
    const flat = Float64Array.of(0, 10, 20);
    const band = { timesH: Float64Array.of(0, 10, 20), q05: flat, q25: flat, q50: flat, q75: flat, q95: flat };
    expect(bandAt(band, 5)!.q50).toBe(5);
    expect(bandAt(band, 20)!.q95).toBe(20);
    expect(bandAt(band, 20.01)).toBeNull();
    expect(bandAt(band, -0.01)).toBeNull();
  });
});

describe("curves of the profile", () => {
  it("this patient's median where there is a band, the typical one thin beside it for the option pointed at", () => {
    const { curves, bands } = profileParts(value, fitted, 1, "A");
    expect(curves.map(({ id, isThin = false }) => [id, isThin])).toEqual([
      ["given-typical", true],
      ["given", false],
      ["A-typical", true],
      ["A", false],
    ]);
    expect(bands!.map(({ id, isFilled }) => [id, isFilled])).toEqual([
      ["given", true],
      ["A", true],
    ]);
  });

  it("an option not pointed at is lines only", () => {
    const { curves, bands } = profileParts(value, fitted, 1, null);
    expect(curves.map(({ id }) => id)).toEqual(["given-typical", "given", "A"]);
    expect(bands!.at(-1)).toMatchObject({ id: "A", isFilled: false });
  });

  it("without a fit the typical curves alone", () => {
    const { curves, bands } = profileParts(value, typical, 1, "A");
    expect(curves.map(({ id }) => id)).toEqual(["given", "A"]);
    expect(bands).toEqual([]);
  });
});
