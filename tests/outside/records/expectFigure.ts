import { expect } from "vitest";

type Ends = readonly [low: number, high: number];

export function expectWithin(found: number, wanted: number, relative: number): void {
  expect(Math.abs(found / wanted - 1), `${found} against ${wanted}`).toBeLessThanOrEqual(relative);
}

/** The ends themselves are outside. */
export function expectInside(found: number, low: number, high: number): void {
  expect(found).toBeGreaterThan(low);
  expect(found).toBeLessThan(high);
}

/** A printed figure that was rounded to whole `grain`s: the found one must round to it. */
export function expectRoundsTo(found: number, printed: number, grain: number): void {
  expect(Math.abs(found - printed), `${found} against ${printed} printed`).toBeLessThanOrEqual(grain / 2);
}

export function expectEndsWithin(found: Ends, wanted: Ends, relative: number): void {
  expectWithin(found[0], wanted[0], relative);
  expectWithin(found[1], wanted[1], relative);
}

export function expectEndsRoundTo(found: Ends, printed: Ends, grain: number): void {
  expectRoundsTo(found[0], printed[0], grain);
  expectRoundsTo(found[1], printed[1], grain);
}
