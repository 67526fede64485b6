// @vitest-environment node
import { expect, it } from "vitest";
import { windowEdges } from "../../../src/view/chart/windowEdges.ts";

it.each([
  ["far apart: at their lines", { top: 20, bottom: 60 }, [20, 60]],
  ["near: a line apart, evenly to both sides", { top: 40, bottom: 49 }, [37, 52]],
])("the numbers of a window's edges, %s", (_, window, wanted) => {
  expect(windowEdges(window)).toEqual(wanted);
});
