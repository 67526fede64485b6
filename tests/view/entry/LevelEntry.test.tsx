import { screen, waitFor, within } from "@testing-library/react";
import { describe, expect, test, vi } from "vitest";
import { recordById } from "../../../src/core/medicine/index.ts";
import { askWords, issueMessage, levelWords } from "../../../src/core/messages/index.ts";
import { issue } from "../../../src/core/result/index.ts";
import { LevelEntry } from "../../../src/view/entry/LevelEntry.tsx";
import { caseFixture } from "../../core/analysis/caseFixture.ts";
import { axeFaults } from "../ui/axeFaults.ts";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";

const level = {
  id: "l",
  at: "2026-03-03T14:00:00+00:00",
  quantity: { value: 5.3, unit: "mg/L" },
  kind: "measured",
} as const;
const show = (change: Parameters<typeof caseFixture>[0] = {}) =>
  renderWorkbench(<LevelEntry onDone={vi.fn()} />, { open: caseFixture(change) });
const value = () => screen.getByRole<HTMLInputElement>("textbox", { name: levelWords.value });
const drawn = () => screen.getByRole<HTMLInputElement>("textbox", { name: levelWords.drawnAt });
const addButton = () => screen.getByRole("button", { name: levelWords.add });

describe("LevelEntry", () => {
  test("has no accessibility fault axe can see", async () => {
    const { container } = await show({ levels: [level] });
    expect(await axeFaults(container)).toEqual([]);
  });

  test("is added by keyboard alone, value, unit and clock time", async () => {
    const shown = await show();
    expect(value()).toHaveFocus();
    await shown.user.keyboard("29 micromol/L");
    await shown.user.tab();
    await shown.user.tab();
    expect(drawn()).toHaveFocus();
    expect(drawn()).toHaveValue("");
    await shown.user.keyboard("3 March 14:00{Enter}");
    expect(shown.value().levels).toEqual([
      {
        id: expect.any(String),
        at: "2026-03-03T14:00:00+00:00",
        quantity: { value: 29, unit: "umol/L" },
        kind: "measured",
      },
    ]);
    expect(value()).toHaveValue("");
  });

  test("before the first dose it is refused with a sentence and nothing is lost", async () => {
    const shown = await show();
    await shown.user.type(value(), "5.2");
    await shown.user.type(drawn(), "1 March 07:30{Enter}");
    const sentence = issueMessage(
      issue("level-before-dose", { at: "Sunday 1 March 2026, 07:30", first: "Sunday 1 March 2026, 08:00" }),
    );
    expect(drawn()).toHaveAccessibleDescription(expect.stringContaining(sentence));
    expect(value()).toHaveValue("5.2");
    expect(drawn()).toHaveValue("1 March 07:30");
    expect(shown.value().levels).toEqual([]);
  });

  test("without any dose it says to enter the doses first", async () => {
    const shown = await show({ given: [] });
    await shown.user.type(value(), "5.2");
    await shown.user.type(drawn(), "3 March 07:30{Enter}");
    expect(drawn()).toHaveAccessibleDescription(expect.stringContaining(issueMessage(issue("level-no-dose"))));
    expect(shown.value().levels).toEqual([]);
  });

  test("a missed first dose does not count as a dose", async () => {
    const given = caseFixture().given.map((line) => ({ ...line, except: [{ index: 0, status: "missed" as const }] }));
    const shown = await show({ given });
    await shown.user.type(value(), "5.2");
    await shown.user.type(drawn(), "1 March 12:00{Enter}");
    const data = { at: "Sunday 1 March 2026, 12:00", first: "Sunday 1 March 2026, 20:00" };
    expect(drawn()).toHaveAccessibleDescription(
      expect.stringContaining(issueMessage(issue("level-before-dose", data))),
    );
  });

  test("after the now line it is refused with a sentence and nothing is lost", async () => {
    const shown = await show();
    await shown.user.type(value(), "5.2");
    await shown.user.type(drawn(), "tomorrow 07:30{Enter}");
    const data = { at: "Thursday 5 March 2026, 07:30", now: "Wednesday 4 March 2026, 12:00" };
    expect(drawn()).toHaveAccessibleDescription(expect.stringContaining(issueMessage(issue("level-after-now", data))));
    expect(value()).toHaveValue("5.2");
    expect(shown.value().levels).toEqual([]);
  });

  test.each([
    ["0", issue("level-not-positive", { found: 0, unit: "mg/L" })],
    ["-3", issue("level-not-positive", { found: -3, unit: "mg/L" })],
    ["1,5", issue("number-comma", { text: "1,5", suggestion: "1.5" })],
  ])("%s is refused", async (typed, expected) => {
    const shown = await show();
    await shown.user.type(value(), typed);
    await shown.user.type(drawn(), "3 March 07:30{Enter}");
    expect(value()).toHaveAccessibleDescription(issueMessage(expected));
    expect(value()).toHaveValue(typed);
    expect(shown.value().levels).toEqual([]);
  });

  test("an empty form says what is missing", async () => {
    const shown = await show();
    await shown.user.click(addButton());
    expect(value()).toBeInvalid();
    expect(drawn()).toBeInvalid();
    expect(shown.value().levels).toEqual([]);
  });

  test("a level a thousand times too high is asked about, and the unit it fits is offered", async () => {
    const shown = await show();
    await shown.user.type(value(), "5200");
    await shown.user.type(drawn(), "3 March 14:00{Enter}");
    expect(shown.value().levels).toEqual([]);
    await shown.user.click(screen.getByRole("button", { name: askWords.itIs("5,200\u00a0microgram/L") }));
    expect(shown.value().levels[0]).toMatchObject({ quantity: { value: 5200, unit: "ug/L" } });
    expect(shown.value().levels[0]).not.toHaveProperty("confirmed");
  });

  test("theophylline 55 typed as mg/L, when umol/L was meant, is asked about", async () => {
    const shown = await show();
    await shown.user.type(value(), "55");
    await shown.user.type(drawn(), "3 March 14:00{Enter}");
    expect(shown.value().levels).toEqual([]);
    await shown.user.click(screen.getByRole("button", { name: askWords.itIs("55\u00a0micromol/L") }));
    expect(shown.value().levels[0]).toMatchObject({ quantity: { value: 55, unit: "umol/L" } });
    expect(shown.value().levels[0]).not.toHaveProperty("confirmed");
  });

  test("the answer that it is meant is recorded", async () => {
    const shown = await show();
    await shown.user.type(value(), "55");
    await shown.user.type(drawn(), "3 March 14:00{Enter}");
    await shown.user.click(screen.getByRole("button", { name: askWords.itIs("55\u00a0mg/L") }));
    expect(shown.value().levels[0]).toMatchObject({ quantity: { value: 55, unit: "mg/L" }, confirmed: true });
  });

  test.each([
    ["lithium", ["mmol/L", "mg/L", "ug/mL", "umol/L"], "0.8", { value: 0.8, unit: "mmol/L" }],
    ["digoxin", ["ug/L", "ng/mL", "nmol/L"], "1.1 nmol/L", { value: 1.1, unit: "nmol/L" }],
  ])("%s offers its own unit first and takes it without a word", async (id, units, typed, quantity) => {
    const medicine = recordById(id)!;
    const given = caseFixture().given.map((line) => ({ ...line, product: medicine.products[0]!.id }));
    const shown = await show({ medicine, given, options: [] });
    const unit = screen.getByRole<HTMLSelectElement>("combobox", { name: `${levelWords.value}: unit` });
    expect([...unit.options].map((option) => option.value)).toEqual(units);
    await shown.user.type(value(), typed);
    await shown.user.type(drawn(), "3 March 14:00{Enter}");
    expect(shown.value().levels[0]).toMatchObject({ quantity });
    expect(shown.value().levels[0]).not.toHaveProperty("confirmed");
  });

  test("is changed in a form, its reason for being left out kept", async () => {
    const shown = await show({ levels: [{ ...level, excluded: "line contaminated" }] });
    await shown.user.click(screen.getByRole("button", { name: new RegExp(`^${levelWords.change}`) }));
    const form = within(screen.getByRole("form", { name: levelWords.save }));
    const concentration = form.getByRole("textbox", { name: levelWords.value });
    expect(concentration).toHaveFocus();
    expect(concentration).toHaveValue("5.3");
    await shown.user.clear(concentration);
    await shown.user.type(concentration, "6.3{Enter}");
    expect(shown.value().levels).toEqual([
      { ...level, quantity: { value: 6.3, unit: "mg/L" }, excluded: "line contaminated" },
    ]);
    expect(screen.queryByRole("form", { name: levelWords.save })).toBeNull();
  });

  test("a confirmed odd value is not asked about again when only its time is changed", async () => {
    const odd = { ...level, quantity: { value: 5200, unit: "mg/L" as const }, confirmed: true as const };
    const shown = await show({ levels: [odd] });
    await shown.user.click(screen.getByRole("button", { name: new RegExp(`^${levelWords.change}`) }));
    const time = within(screen.getByRole("form", { name: levelWords.save })).getByRole("textbox", {
      name: levelWords.drawnAt,
    });
    await shown.user.clear(time);
    await shown.user.type(time, "3 March 15:00{Enter}");
    expect(shown.value().levels).toEqual([{ ...odd, at: "2026-03-03T15:00:00+00:00" }]);
  });

  test("is shown with predicted and difference, left out with a reason, taken back, removed", async () => {
    const shown = await show({ levels: [level] });
    const row = () => screen.getAllByRole("row")[1]!;
    await waitFor(() => expect(shown.state().open?.analysis.status).toBe("fresh"));
    const result = shown.state().open!.analysis.result!.levels[0]!;
    expect(within(row()).getByText(`${result.predicted!.toFixed(2)} mg/L`)).toBeVisible();
    expect(within(row()).getByText(`\u2212${(-result.difference!).toFixed(2)} mg/L`)).toBeVisible();

    await shown.user.click(within(row()).getByRole("button", { name: new RegExp(`^${levelWords.leaveOut}`) }));
    await shown.user.keyboard("{Enter}");
    expect(shown.value().levels[0]).not.toHaveProperty("excluded");
    expect(screen.getByRole("textbox", { name: levelWords.reason })).toBeInvalid();
    await shown.user.keyboard("line contaminated{Enter}");
    expect(shown.value().levels[0]?.excluded).toBe("line contaminated");
    expect(within(row()).getByText(levelWords.left("line contaminated"))).toBeVisible();

    await shown.user.click(within(row()).getByRole("button", { name: new RegExp(`^${levelWords.takeBack}`) }));
    expect(shown.value().levels[0]).not.toHaveProperty("excluded");
    await shown.user.click(within(row()).getByRole("button", { name: new RegExp(`^${levelWords.remove}`) }));
    expect(shown.value().levels).toEqual([]);
  });
});
