import { screen } from "@testing-library/react";
import { describe, expect, test, vi } from "vitest";
import { recordById } from "../../../src/core/medicine/index.ts";
import { issueMessage, windowQuantityWord, windowWords } from "../../../src/core/messages/index.ts";
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

  test("one of your own is typed, in a molar unit if need be, and stored in mg/L", async () => {
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
    const { window } = value();
    expect(window).toMatchObject({ quantity: "trough", basis: "ward policy (invented)" });
    // 55 umol/L of 180.17 g/mol is 9.90935 mg/L, 110 twice that: relative error at most 1e-12.
    expect(Math.abs(window!.low.value / 9.90935 - 1)).toBeLessThan(1e-12);
    expect(Math.abs(window!.high.value / 19.8187 - 1)).toBeLessThan(1e-12);
    expect(window!.low.unit).toBe("mg/L");
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
