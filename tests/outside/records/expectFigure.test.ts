import { expect, it } from "vitest";
import { expectEndsRoundTo, expectEndsWithin, expectInside, expectRoundsTo, expectWithin } from "./expectFigure.ts";

it.each<[string, (found: number) => void, holds: number, fails: readonly number[]]>([
  ["within", (found) => expectWithin(found, 8, 0.25), 10, [5.9, 10.1]],
  ["inside", (found) => expectInside(found, 1, 2), 1.5, [1, 2]],
  ["rounds to", (found) => expectRoundsTo(found, 8, 1), 8.5, [7.4, 8.6]],
  ["lower end within", (found) => expectEndsWithin([found, 16], [8, 16], 0.25), 10, [5.9, 10.1]],
  ["upper end within", (found) => expectEndsWithin([8, found], [8, 16], 0.25), 20, [11.9, 20.1]],
  ["lower end rounds to", (found) => expectEndsRoundTo([found, 16], [8, 16], 1), 8.5, [7.4, 8.6]],
  ["upper end rounds to", (found) => expectEndsRoundTo([8, found], [8, 16], 1), 16.5, [15.4, 16.6]],
])("%s: holds, fails beyond its bound and for what is not a number", (_, check, holds, fails) => {
  check(holds);
  for (const found of [...fails, Number.NaN]) expect(() => check(found)).toThrow();
});
