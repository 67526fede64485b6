import { screen } from "@testing-library/react";
import { beforeEach, describe, expect, test, vi } from "vitest";
import { caseWords } from "../../../src/core/messages/index.ts";
import { instantMs } from "../../../src/core/time/index.ts";
import { CaseEntry } from "../../../src/view/entry/CaseEntry.tsx";
import { caseFixture } from "../../core/analysis/caseFixture.ts";
import { MemoryRepository } from "../../shell/store/memoryRepository.ts";
import { axeFaults } from "../ui/axeFaults.ts";
import { fewTimeZones } from "../ui/fewTimeZones.ts";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";

const show = () => renderWorkbench(<CaseEntry onDone={vi.fn()} />, { open: caseFixture() });

beforeEach(fewTimeZones);

describe("CaseEntry", () => {
  test("label, now line, zone and notes are edits of the case", async () => {
    const { user, value, container } = await show();
    expect(await axeFaults(container)).toEqual([]);
    const label = screen.getByRole("textbox", { name: caseWords.label });
    await user.clear(label);
    await user.type(label, "Harbour ward 5{Enter}");
    expect(value().label).toBe("Harbour ward 5");
    const now = screen.getByRole("textbox", { name: caseWords.now });
    await user.clear(now);
    await user.type(now, "2026-03-05 09:00{Enter}");
    expect(value().now).toBe("2026-03-05T09:00:00+00:00");
    await user.type(screen.getByRole("textbox", { name: caseWords.notes }), "seen today");
    await user.tab();
    expect(value().notes).toBe("seen today");
    await user.selectOptions(screen.getByRole("combobox", { name: caseWords.timeZone }), "Europe/Berlin");
    expect(value().timeZone).toBe("Europe/Berlin");
    expect(screen.getByRole("textbox", { name: caseWords.now })).toHaveValue("Thu 5 March 2026 10:00");
  });

  test("the now line is set to the present minute", async () => {
    const { user, value } = await show();
    const before = Date.now();
    await user.click(screen.getByRole("button", { name: caseWords.nowPresent }));
    const nowMs = instantMs(value().now);
    expect(nowMs % 60_000).toBe(0);
    expect(nowMs).toBeGreaterThan(before - 60_000);
    expect(nowMs).toBeLessThanOrEqual(Date.now());
  });

  test("a reader sees the fields and can't change them", async () => {
    const repository = new MemoryRepository();
    repository.elsewhere.add("fixture");
    const { state } = await renderWorkbench(<CaseEntry onDone={vi.fn()} />, { repository, open: caseFixture() });
    expect(state().open?.role).toBe("reader");
    expect(screen.getByRole("textbox", { name: caseWords.label })).toHaveAttribute("readonly");
    expect(screen.getByRole("button", { name: caseWords.nowPresent })).toBeDisabled();
  });
});
