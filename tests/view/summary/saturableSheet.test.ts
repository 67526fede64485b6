import { expect, test } from "vitest";
import { chanceWords } from "../../../src/core/messages/index.ts";
import { steadyWithheldNotes } from "../../../src/view/bench/steadyWithheld.ts";
import { buildSummary } from "../../../src/view/summary/buildSummary.ts";
import { demoCase } from "../../fixtures/demoCase.ts";
import { fittedInputOf } from "./summaryFixture.ts";

/** Option B of the demo: it repeats, the typical patient settles under it, and so many draws never do that no figure is given. */
test("an order under which many draws never settle: the share is the reason, wherever a steady-state figure would stand", () => {
  const demo = demoCase("saturable");
  const input = fittedInputOf({
    ...demo,
    options: demo.options.map((option) => ({ ...option, chosen: option.id === "B" })),
  });
  const { individual, typical } = input.analysis.options.find(({ id }) => id === "B")!;
  expect(typical!.steadyState).not.toBeNull();
  expect(individual!.steadyState).toBeNull();
  const reason = `In ${chanceWords(individual!.shareNeverSteady)} of what the levels leave possible the level never settles under this dose: no steady-state figures are given.`;

  const { expected, hours, nextLevel, details } = buildSummary(input);
  expect(expected!.remark).toContain(reason);
  expect(nextLevel.sentences[0]).toBe(reason);
  expect(JSON.stringify([expected, nextLevel])).not.toContain("does not repeat");
  expect(hours!.span).toContain("counted as above in the chance at steady state");
  expect(hours!.span).toContain("the lowest of these days comes before the option's first dose acts");
  expect(steadyWithheldNotes(input.analysis)[0]).toBe(
    `Option B, this patient: ${reason.charAt(0).toLowerCase()}${reason.slice(1)}`,
  );
  // No concern speaks of the typical patient's levels as if they were this one's.
  const of = details.concerns.filter(({ title }) => title.startsWith("Option B"));
  expect(of.length).toBeGreaterThan(0);
  for (const { title } of of) expect(title).toContain("in this patient");
});
