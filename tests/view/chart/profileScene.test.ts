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
