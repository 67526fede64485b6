import { screen, within } from "@testing-library/react";
import { describe, expect, test, vi } from "vitest";
import type { Analysis } from "../../../src/core/analysis/index.ts";
import { fitWords, levelWords } from "../../../src/core/messages/index.ts";
import { BenchScreen } from "../../../src/view/bench/BenchScreen.tsx";
import { LearntPanel } from "../../../src/view/bench/LearntPanel.tsx";
import { LevelEntry } from "../../../src/view/entry/LevelEntry.tsx";
import { caseFixture } from "../../core/analysis/caseFixture.ts";
import { fittedAnalysis } from "../../core/analysis/fitFixture.ts";
import { axeFaults } from "../ui/axeFaults.ts";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";
import { fittedRunner } from "./fittedRunner.ts";

const level = (id: string, at: string, excluded?: string) => ({
  id,
  at,
  quantity: { value: 5.3, unit: "mg/L" as const },
  kind: "measured" as const,
  ...(excluded ? { excluded } : {}),
});
const open = caseFixture({
  fit: { use: "individual", residualModel: "normal" },
  levels: [level("l", "2026-03-03T14:00:00+00:00"), level("m", "2026-03-04T07:30:00+00:00", "line contaminated")],
});
const show = async (change: (typical: Analysis) => Analysis = fittedAnalysis) => {
  const shown = await renderWorkbench(<BenchScreen onPrint={vi.fn()} />, { open, runner: fittedRunner(change) });
  await screen.findByRole("complementary");
  return { ...shown, column: screen.getByRole("complementary") };
};

describe("this patient on the bench", () => {
  test("two columns an option, chances in words, bands on the profile; no fault axe can see", async () => {
    const { column, container } = await show();
    expect(within(column).getByText("this patient: 1 level used, 1 left out")).toBeVisible();
    const [steady] = within(column).getAllByRole("table");
    const heads = within(steady!).getAllByRole("columnheader");
    expect(heads.map((head) => head.textContent)).toEqual(
      expect.arrayContaining([fitWords.typical, fitWords.individual]),
    );
    const chances = within(column).getByRole("region", { name: /^Chance of the whole curve/ });
    expect(within(chances).getByText("74 %")).toBeVisible();
    expect(within(chances).getByText("below 16 %, above 10 %")).toBeVisible();
    expect(container.querySelectorAll(".profile-band-wide")).toHaveLength(2);
    expect(container.querySelectorAll(".profile-forecast")).toHaveLength(2);
    expect(container.querySelectorAll(".profile-hollow")).toHaveLength(1);
    expect(await axeFaults(chances)).toEqual([]);
    expect(await axeFaults(steady!)).toEqual([]);
  });

  test("no steady-state figure of this patient: the reason at the table, the share counted beside the chance", async () => {
    const { column } = await show((typical) => {
      const made = fittedAnalysis(typical);
      const options = made.options.map((option) => ({
        ...option,
        individual: {
          ...option.individual!,
          span: { ...option.individual!.span, lowestBeforeOption: 0.98 },
          steadyState: null,
          shareNeverSteady: 0.17,
        },
      }));
      return { ...made, options };
    });
    const cell = column.querySelector("[data-reading=peak]")!;
    expect(cell).toHaveTextContent("not given");
    expect(
      within(column).getByText(/^Option A, this patient: in 17 % of what the levels leave possible/),
    ).toBeVisible();
    const chances = within(column).getByRole("region", { name: /^Chance of the whole curve/ });
    expect(
      within(chances).getByText(/^Option A: with a chance of 17 % a steady state is never reached: counted as above/),
    ).toBeVisible();
    expect(chances).not.toHaveTextContent("left out of");
    // Read out too: not the typical patient's levels in its place.
    expect(document.body.innerHTML).toMatch(/option A never settles in this patient with a chance of 17(&nbsp;|\s)%/);
    expect(document.body.innerHTML).not.toMatch(/option A settles between/);
    expect(within(chances).getByText(/^Option A: in 98 % .* comes before the option's first dose/)).toBeVisible();
  });

  test("a figure of this patient opens its working: levels, draws, seed, method", async () => {
    const { user, column } = await show();
    const cell = column.querySelector<HTMLButtonElement>("[data-reading=peak] .readings-own")!;
    await user.click(cell);
    const dialog = await screen.findByRole("dialog", { name: "Working" });
    expect(
      within(dialog).getByRole("heading", { name: /Highest at steady state, option A, this patient/ }),
    ).toBeVisible();
    expect(within(dialog).getByText(/seed 1/)).toBeVisible();
    expect(within(dialog).getByText(/^median .* mg\/L; 50 % between/)).toBeVisible();
  });

  test("what the levels taught opens from the line on what the figures rest on", async () => {
    const { user, column } = await show();
    await user.click(within(column).getByRole("button", { name: fitWords.openTaught }));
    expect(await screen.findByRole("dialog", { name: fitWords.taughtTitle })).toBeVisible();
  });

  test("L goes from level to level, and the readout says what was predicted there and whether the forecast held", async () => {
    const { user } = await show();
    const slider = screen.getByRole("slider", { name: "Time on the profile" });
    slider.focus();
    await user.keyboard("L");
    expect(slider.getAttribute("aria-valuetext")).toMatch(
      /Tue 3 March, 14:00.*90 % interval.*; level 5\.3 mg\/L; forecast before it.*: held$/,
    );
    await user.keyboard("L");
    expect(slider.getAttribute("aria-valuetext")).toMatch(/Wed 4 March, 07:30.*left out: line contaminated/);
  });

  test.each([
    ["pending", { kind: "pending" }, fitWords.pending],
    ["withheld", { kind: "withheld", reason: "draws-unreliable", data: { paretoK: 0.93 } }, /Pareto k 0\.93/],
    ["none", { kind: "none", reason: "no-variability" }, /does not say how much patients differ/],
  ] as const)("%s: the typical patient stays, and the line says why", async (_, fit, words) => {
    const { column, container } = await show((typical) => ({ ...typical, fit }));
    expect(column.querySelector("[data-fit]")).toHaveTextContent(words);
    expect(container.querySelector(".profile-band")).toBeNull();
    expect(column.querySelector("[data-reading=peak] .readings-cell")).toBeVisible();
    expect(column.querySelector(".readings-own")).toBeNull();
    expect(within(column).queryByText(/^Chance of/)).toBeNull();
  });
});

describe("what the levels taught", () => {
  test("pictures with words, figures, working; the switches are edits that undo", async () => {
    const shown = await renderWorkbench(<LearntPanel />, { open, runner: fittedRunner(fittedAnalysis) });
    const { user, value, state } = shown;
    expect(
      await screen.findByText(
        "The level taught much about clearance, something about volume, little about absorption rate.",
      ),
    ).toBeVisible();
    expect(screen.getAllByRole("img")).toHaveLength(3);
    expect(screen.getByRole("img", { name: /^Clearance: before the levels 90 % between/ })).toBeVisible();
    expect(screen.getByText(/5\.3.mg\/L, Wed 4 March, 07:30 \(left out: line contaminated\)/)).toBeVisible();
    expect(await axeFaults(shown.container)).toEqual([]);
    await user.click(screen.getByRole("radio", { name: /^robust/ }));
    expect(value().fit).toEqual({ use: "individual", residualModel: "robust" });
    await user.click(screen.getByRole("radio", { name: fitWords.uses.typical }));
    expect(value().fit).toEqual({ use: "typical", residualModel: "robust" });
    state().undo();
    expect(value().fit).toEqual({ use: "individual", residualModel: "robust" });
  });
});

describe("levels with a fit", () => {
  test("typical and this patient side by side, and what each level says", async () => {
    await renderWorkbench(<LevelEntry onDone={vi.fn()} />, {
      open,
      runner: fittedRunner(fittedAnalysis),
    });
    const findings = await screen.findByRole("region", { name: fitWords.findingsHead });
    expect(within(findings).getByText("Without it clearance would be 12 % higher.")).toBeVisible();
    expect(within(findings).getByText("With it clearance would be 11 % lower.")).toBeVisible();
    expect(
      within(findings).getByText(/^Forecast before it was known \(no level known\), 90 % interval .*: held\.$/),
    ).toBeVisible();
    expect(screen.getByRole("columnheader", { name: fitWords.individual })).toBeVisible();
    expect(screen.getByText(fitWords.predictedBy)).toBeVisible();
    expect(screen.queryByText(levelWords.predictedBy)).toBeNull();
  });
});
