// @vitest-environment node
import { expect, it } from "vitest";
import { buildSummary } from "../../../src/view/summary/buildSummary.ts";
import { phenytoinCase } from "../../core/analysis/phenytoinCase.ts";
import { summaryInputOf } from "./summaryFixture.ts";

const plain = (text: string) => text.replaceAll("\u00a0", " ");
const NAME = "Phenytoin level corrected for its albumin";

it("a level of phenytoin beside a low albumin is on the sheet corrected, with formula and source, and as a concern", () => {
  const sheet = buildSummary(summaryInputOf(phenytoinCase(8.4, 3.1)));
  const row = sheet.details.figures.find(({ name }) => name === NAME)!;
  // 8.4 / (0.2 · 3.1 + 0.1) = 11.667
  expect(plain(row.value)).toBe("11.667 mg per L");
  expect(row.formula).toBe("corrected = measured ÷ (0.2 × albumin in g per dL + 0.1)");
  expect(plain(row.inputs)).toBe("measured = 8.4 mg per L; albumin = 3.1 g per dL");
  const number = Number(/^\((\d+)\) read$/.exec(row.source)![1]);
  expect(sheet.details.sources[number - 1]).toMatch(/^Sheiner LB, Tozer TN/);
  const titles = sheet.concerns.map(({ title }) => title);
  expect(
    titles.some((title) => /^The level of .* corrected for albumin, is 11\.7\s?mg per L$/.test(plain(title))),
  ).toBe(true);
  expect(titles.some((title) => title.includes("below the target window"))).toBe(false);
});

it("with a normal albumin there is nothing to correct", () => {
  const sheet = buildSummary(summaryInputOf(phenytoinCase(8.4, 4.5)));
  expect(sheet.details.figures.some(({ name }) => name === NAME)).toBe(false);
});
