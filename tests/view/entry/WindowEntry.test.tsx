import { screen } from "@testing-library/react";
import { describe, expect, test, vi } from "vitest";
import { recordById } from "../../../src/core/medicine/index.ts";
import { askWords, issueMessage, windowQuantityWord, windowWords } from "../../../src/core/messages/index.ts";
import { issue } from "../../../src/core/result/index.ts";
import { WindowEntry } from "../../../src/view/entry/WindowEntry.tsx";
import { caseFixture } from "../../core/analysis/caseFixture.ts";
import { MemoryRepository } from "../../shell/store/memoryRepository.ts";
import { axeFaults } from "../ui/axeFaults.ts";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";

const withoutWindow = () => {
  const { window: _, ...rest } = caseFixture();
  return rest;
};
const record = recordById("theophylline")!;

describe("WindowEntry", () => {
  test("preselects none of the record's windows", async () => {
    const { container, value } = await renderWorkbench(<WindowEntry onDone={vi.fn()} />, { open: withoutWindow() });
    expect(record.windows.length).toBeGreaterThan(1);
    for (const radio of screen.getAllByRole("radio")) expect(radio).not.toBeChecked();
    expect(value()).not.toHaveProperty("window");
    expect(await axeFaults(container)).toEqual([]);
  });

  test("a window of the record is taken with its source as basis", async () => {
    const { user, value } = await renderWorkbench(<WindowEntry onDone={vi.fn()} />, { open: withoutWindow() });
    const [first] = record.windows;
    await user.click(screen.getByRole("radio", { name: new RegExp(`^${first!.label}`) }));
    expect(value().window).toMatchObject({ quantity: first!.quantity, low: first!.low, high: first!.high });
    expect(value().window?.basis).toContain(record.sources[first!.source]!.title);
    expect(screen.getByRole("radio", { name: new RegExp(`^${first!.label}`) })).toBeChecked();
  });

  test("one of your own is typed, in a molar unit if need be, and kept in it", async () => {
    const { user, value } = await renderWorkbench(<WindowEntry onDone={vi.fn()} />, { open: withoutWindow() });
    await user.click(screen.getByRole("radio", { name: new RegExp(`^${windowWords.own}`) }));
    await user.click(screen.getByRole("button", { name: windowWords.set }));
    expect(value()).not.toHaveProperty("window");
    expect(screen.getByRole("textbox", { name: windowWords.basis })).toBeInvalid();

    await user.selectOptions(screen.getByRole("combobox", { name: windowWords.about }), windowQuantityWord("trough"));
    await user.selectOptions(screen.getByRole("combobox", { name: windowWords.unit }), "umol/L");
    await user.type(screen.getByRole("textbox", { name: windowWords.low }), "55");
    await user.type(screen.getByRole("textbox", { name: windowWords.high }), "110");
    await user.type(screen.getByRole("textbox", { name: windowWords.basis }), "ward policy (invented){Enter}");
    expect(value().window).toEqual({
      quantity: "trough",
      low: { value: 55, unit: "umol/L" },
      high: { value: 110, unit: "umol/L" },
      basis: "ward policy (invented)",
    });
  });

  const lithium = () => {
    const medicine = recordById("lithium")!;
    return { ...withoutWindow(), medicine, given: [], options: [] };
  };
  const fill = async (user: Awaited<ReturnType<typeof renderWorkbench>>["user"], low: string, high: string) => {
    await user.click(screen.getByRole("radio", { name: new RegExp(`^${windowWords.own}`) }));
    await user.selectOptions(screen.getByRole("combobox", { name: windowWords.about }), windowQuantityWord("trough"));
    await user.type(screen.getByRole("textbox", { name: windowWords.low }), low);
    await user.type(screen.getByRole("textbox", { name: windowWords.high }), high);
    await user.type(screen.getByRole("textbox", { name: windowWords.basis }), "ward policy (invented)");
  };

  test("a trough may be one of so many hours after the dose; both hours are kept, shown, and typed again", async () => {
    const { user, value } = await renderWorkbench(<WindowEntry onDone={vi.fn()} />, { open: lithium() });
    await fill(user, "0.6", "0.9");
    await user.type(screen.getByRole("textbox", { name: windowWords.drawTo }), "12.5");
    await user.click(screen.getByRole("button", { name: windowWords.set }));
    expect(value()).not.toHaveProperty("window");
    expect(screen.getByText(issueMessage(issue("window-draw-from-missing")))).toBeVisible();
    await user.type(screen.getByRole("textbox", { name: windowWords.drawFrom }), "13");
    expect(screen.getByText(issueMessage(issue("window-draw-order", { from: 13, to: 12.5 })))).toBeVisible();
    await user.clear(screen.getByRole("textbox", { name: windowWords.drawFrom }));
    await user.type(screen.getByRole("textbox", { name: windowWords.drawFrom }), "11.5");
    expect(screen.getByText(windowWords.drawReading("12 hours after the dose"))).toBeVisible();
    await user.click(screen.getByRole("button", { name: windowWords.set }));
    expect(value().window).toMatchObject({
      quantity: "trough",
      drawFrom: { value: 11.5, unit: "h" },
      drawTo: { value: 12.5, unit: "h" },
    });
    expect(screen.getByText(/^0\.6 to 0\.9 mmol\/L, 12 hours after the dose/)).toBeVisible();

    await user.selectOptions(screen.getByRole("combobox", { name: windowWords.about }), windowQuantityWord("peak"));
    await user.click(screen.getByRole("button", { name: windowWords.set }));
    expect(value().window).not.toHaveProperty("drawFrom");
  });

  test("lithium is asked for in mmol/L, and 0.6 stays 0.6", async () => {
    const { user, value } = await renderWorkbench(<WindowEntry onDone={vi.fn()} />, { open: lithium() });
    await fill(user, "0.6", "0.9");
    expect(screen.getByRole("combobox", { name: windowWords.unit })).toHaveValue("mmol/L");
    await user.click(screen.getByRole("button", { name: windowWords.set }));
    expect(value().window).toMatchObject({ low: { value: 0.6, unit: "mmol/L" }, high: { value: 0.9, unit: "mmol/L" } });
    expect(value().window).not.toHaveProperty("confirmed");
  });

  test("a window everyday only in another unit is asked about; that unit can be taken", async () => {
    const { user, value } = await renderWorkbench(<WindowEntry onDone={vi.fn()} />, { open: lithium() });
    await fill(user, "0.6", "0.9");
    await user.selectOptions(screen.getByRole("combobox", { name: windowWords.unit }), "mg/L");
    await user.click(screen.getByRole("button", { name: windowWords.set }));
    expect(value()).not.toHaveProperty("window");
    await user.click(screen.getByRole("button", { name: askWords.itIs("0.6 to 0.9\u00a0mmol/L") }));
    expect(value().window).toMatchObject({ low: { value: 0.6, unit: "mmol/L" } });
    expect(value().window).not.toHaveProperty("confirmed");
    expect(screen.getByRole("combobox", { name: windowWords.unit })).toHaveValue("mmol/L");
  });

  test("the answer that it is meant is recorded, and not asked for again when only the basis changes", async () => {
    const { user, value } = await renderWorkbench(<WindowEntry onDone={vi.fn()} />, { open: lithium() });
    await fill(user, "0.6", "0.9");
    await user.selectOptions(screen.getByRole("combobox", { name: windowWords.unit }), "mg/L");
    await user.click(screen.getByRole("button", { name: windowWords.set }));
    await user.click(screen.getByRole("button", { name: askWords.itIs("0.6 to 0.9\u00a0mg/L") }));
    expect(value().window).toMatchObject({ low: { value: 0.6, unit: "mg/L" }, confirmed: true });
    await user.type(screen.getByRole("textbox", { name: windowWords.basis }), ", renewed{Enter}");
    expect(value().window).toMatchObject({ basis: "ward policy (invented), renewed", confirmed: true });
  });

  test("a low end above the high end, and a comma, are refused and stay", async () => {
    const { user, value } = await renderWorkbench(<WindowEntry onDone={vi.fn()} />, { open: caseFixture() });
    const before = value().window;
    const low = screen.getByRole("textbox", { name: windowWords.low });
    const high = screen.getByRole("textbox", { name: windowWords.high });
    await user.clear(low);
    await user.type(low, "20{Enter}");
    expect(high).toHaveAccessibleDescription(
      expect.stringContaining(issueMessage(issue("window-ends", { low: 20, high: 15, unit: "mg/L" }))),
    );
    await user.clear(low);
    await user.type(low, "1,5{Enter}");
    expect(low).toHaveAccessibleDescription(issueMessage(issue("number-comma", { text: "1,5", suggestion: "1.5" })));
    expect(low).toHaveValue("1,5");
    expect(value().window).toEqual(before);
  });

  test("an AUC window takes only the unit of an AUC", async () => {
    const { user } = await renderWorkbench(<WindowEntry onDone={vi.fn()} />, { open: caseFixture() });
    await user.selectOptions(screen.getByRole("combobox", { name: windowWords.about }), windowQuantityWord("auc24"));
    const units = screen.getByRole<HTMLSelectElement>("combobox", { name: windowWords.unit });
    expect([...units.options].map((option) => option.value)).toEqual(["mg.h/L"]);
  });

  test("the ward's own windows are offered, and the window can be taken away", async () => {
    const repository = new MemoryRepository();
    const window = { ...caseFixture().window!, basis: "ward policy (invented)" };
    await repository.saveWindow("theophylline", "w", window);
    const { user, value } = await renderWorkbench(<WindowEntry onDone={vi.fn()} />, {
      repository,
      open: withoutWindow(),
    });
    await user.click(screen.getByRole("radio", { name: /ward policy/ }));
    expect(value().window).toEqual(window);
    await user.click(screen.getByRole("button", { name: windowWords.clear }));
    expect(value()).not.toHaveProperty("window");
  });
});
