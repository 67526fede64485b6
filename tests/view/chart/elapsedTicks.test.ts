import { expect, test } from "vitest";
import { clockScale } from "../../../src/view/chart/clockScale.ts";
import { elapsedTicks } from "../../../src/view/chart/elapsedTicks.ts";

test("elapsed hours stand at the finest step that leaves each 40 px, from 0 on", () => {
  const labels = (toH: number, width: number) => elapsedTicks(clockScale(0, toH, 0, width)).map((tick) => tick.label);
  expect(labels(12, 480)).toEqual(["0", "1", "2", "3", "4", "5", "6", "7", "8", "9", "10", "11", "12"]);
  expect(labels(12, 160)).toEqual(["0", "3", "6", "9", "12"]);
  expect(labels(360, 600)).toEqual([
    "0",
    "24",
    "48",
    "72",
    "96",
    "120",
    "144",
    "168",
    "192",
    "216",
    "240",
    "264",
    "288",
    "312",
    "336",
    "360",
  ]);
  // Two months in a narrow column: weeks.
  expect(labels(1440, 360)).toEqual(["0", "168", "336", "504", "672", "840", "1008", "1176", "1344"]);
});

test("a mark stands where its hour is", () => {
  const scale = clockScale(0, 48, 50, 290);
  for (const tick of elapsedTicks(scale)) expect(tick.x).toBe(scale.x(tick.hours));
});
