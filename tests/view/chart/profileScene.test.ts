import { describe, expect, it } from "vitest";
import { curvePoints } from "../../../src/view/chart/curvePoints.ts";
import { type ProfileInput, profileScene } from "../../../src/view/chart/profileScene.ts";

const input: ProfileInput = {
  width: 800,
  height: 400,
  margin: { top: 10, right: 80, bottom: 30, left: 0 },
  fromH: 0,
  toH: 48,
  nowH: 24,
  midnightsH: [0, 24, 48],
  scale: "linear",
  factor: 1,
  window: { low: 8, high: 15 },
  curves: [
    { id: "given", name: "", timesH: [0, 12, 24], values: [0, 6, 4] },
    { id: "A", name: "A", timesH: [24, 36, 60], values: [4, 12, 10] },
  ],
  levels: [
    { id: "l1", atH: 23, value: 5, sd: 0.7, excluded: false, belowLimit: false, label: "5" },
    { id: "l2", atH: 90, value: 5, sd: null, excluded: true, belowLimit: false, label: "5" },
  ],
};

describe("profileScene", () => {
  it("puts the window between its edges, lower edge lower on the page", () => {
    const scene = profileScene(input);
    expect(scene.window!.top).toBeLessThan(scene.window!.bottom);
    expect(scene.window!.top).toBeCloseTo(scene.concentration.y(15), 9);
  });

  it("names a curve at its end inside the span and leaves nameless ones alone", () => {
    const scene = profileScene(input);
    expect(scene.curves.map((curve) => curve.name)).toEqual(["", "A"]);
    expect(scene.curves[1]!.endX).toBeCloseTo(720, 9);
    expect(scene.curves[1]!.endY).toBeCloseTo(scene.concentration.y(11), 9);
  });

  it("keeps only what lies in the span", () => {
    expect(profileScene(input).levels.map((level) => level.id)).toEqual(["l1"]);
    expect(profileScene({ ...input, nowH: -5 }).nowX).toBeNull();
  });

  it("multiplies into the unit shown: a molar scale only changes the ticks, not the shape", () => {
    const mass = profileScene(input);
    const molar = profileScene({ ...input, factor: 10 });
    expect(molar.window!.high).toBe(150);
    expect(molar.curves[1]!.path.length).toBeGreaterThan(10);
    expect(molar.concentration.high).toBeGreaterThan(mass.concentration.high * 5);
  });
});

describe("curvePoints", () => {
  it("interpolates on the edges of the span", () => {
    const curve = { timesH: [0, 10, 20], values: [0, 10, 0] };
    expect(curvePoints(curve, 5, 15)).toEqual([
      [5, 5],
      [10, 10],
      [15, 5],
    ]);
  });

  it("is empty outside", () => {
    expect(curvePoints({ timesH: [0, 1], values: [1, 1] }, 5, 6)).toEqual([]);
  });
});

describe("bands", () => {
  const band = {
    id: "A",
    isFilled: true,
    timesH: [24, 36, 60],
    q05: [3, 8, 6],
    q25: [3.5, 10, 8],
    q75: [4.5, 14, 12],
    q95: [5, 18, 14],
  };
  const heights = (path: string) => [...path.matchAll(/,(-?[\d.]+)/g)].map(([, y]) => Number(y));

  it("the 90 % area holds the 50 % one, and its top is the upper limit", () => {
    const scene = profileScene({ ...input, bands: [band] });
    const [drawn] = scene.bands;
    // Paths are rounded to hundredths of a pixel.
    expect(Math.min(...heights(drawn!.wide))).toBeCloseTo(scene.concentration.y(18), 1);
    expect(Math.min(...heights(drawn!.narrow))).toBeCloseTo(scene.concentration.y(14), 1);
    expect(Math.max(...heights(drawn!.narrow))).toBeLessThan(Math.max(...heights(drawn!.wide)));
  });

  it("are cut at the span's end, and the axis makes room for them", () => {
    const scene = profileScene({ ...input, bands: [band] });
    const xs = [...scene.bands[0]!.wide.matchAll(/[ML](-?[\d.]+),/g)].map(([, x]) => Number(x));
    expect(Math.max(...xs)).toBeLessThanOrEqual(scene.plot.right);
    expect(scene.concentration.high).toBeGreaterThanOrEqual(18);
  });

  it("a thin curve takes another's style and no name", () => {
    const curves = [...input.curves, { ...input.curves[1]!, id: "A-typical", of: "A", isThin: true, name: "" }];
    expect(profileScene({ ...input, curves }).curves[2]).toMatchObject({ of: "A", isThin: true, name: "" });
  });

  it("a level carries its forecast and prediction, upper limits higher on the page", () => {
    const level = {
      ...input.levels[0]!,
      predicted: { low: 4, median: 4.5, high: 5 },
      forecast: { low: 2, high: 9, held: true },
    };
    const [drawn] = profileScene({ ...input, levels: [level] }).levels;
    expect(drawn!.forecast!.top).toBeLessThan(drawn!.predicted!.top);
    expect(drawn!.predicted!.top).toBeLessThan(drawn!.predicted!.bottom);
    expect(drawn!.forecast!.bottom).toBeGreaterThan(drawn!.predicted!.bottom);
    expect(profileScene(input).levels[0]).toMatchObject({ forecast: null, predicted: null });
  });
});
