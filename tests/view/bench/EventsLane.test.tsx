import { screen, within } from "@testing-library/react";
import { describe, expect, test, vi } from "vitest";
import { amountsWords, eventWords } from "../../../src/core/messages/index.ts";
import { BenchScreen } from "../../../src/view/bench/BenchScreen.tsx";
import { caseFixture } from "../../core/analysis/caseFixture.ts";
import { axeFaults } from "../ui/axeFaults.ts";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";

const base = caseFixture();
const value = caseFixture({
  patient: {
    ...base.patient,
    factors: [
      {
        kind: "interacting-medicine",
        from: "2026-03-03T08:00:00+00:00",
        detail: "clarithromycin",
        effect: { clearance: 0.6, onset: { value: 2, unit: "d" } },
      },
    ],
  },
});
const show = async (open = value) => {
  const shown = await renderWorkbench(<BenchScreen onPrint={vi.fn()} />, { open });
  await screen.findByRole("region", { name: eventWords.lane });
  return { ...shown, lane: screen.getByRole("region", { name: eventWords.lane }) };
};
const EVENT = "clarithromycin, from Tue 3 March, 08:00; clearance 60 % of usual over 2 days";

describe("events lane on the bench", () => {
  test("has no accessibility fault axe can see", async () => {
    const { lane } = await show();
    expect(await axeFaults(lane)).toEqual([]);
  });

  test("an event opens its form by keyboard; a measured value opens the patient", async () => {
    const { user, lane } = await show();
    within(lane).getByRole("button", { name: EVENT }).focus();
    await user.keyboard("{Enter}");
    const dialog = await screen.findByRole("dialog", { name: eventWords.lane });
    expect(within(dialog).getByRole("textbox", { name: eventWords.name })).toHaveValue("clarithromycin");
    expect(within(dialog).getByRole("textbox", { name: eventWords.clearance })).toHaveValue("60");
    await user.keyboard("{Escape}");
    await user.click(within(lane).getByRole("button", { name: /^creatinine 0\.94\smg\/dL/ }));
    expect(await screen.findByRole("dialog", { name: "Patient" })).toBeVisible();
  });

  test("a line is drawn at each step of the kinetics: two days of onset, two lines", async () => {
    const { lane } = await show();
    expect(lane.querySelectorAll(".event-change")).toHaveLength(2);
    expect(within(lane).getByText(eventWords.changesAt)).toBeVisible();
  });

  test("without events the lane offers to add one", async () => {
    const { user, lane } = await show(base);
    await user.click(within(lane).getByRole("button", { name: eventWords.add }));
    expect(await screen.findByRole("dialog", { name: eventWords.lane })).toBeVisible();
  });

  test("where the dose is can be shown and hidden, and is no part of the case", async () => {
    const { user, value: now } = await show();
    const before = now();
    expect(screen.queryByRole("region", { name: amountsWords.title })).toBeNull();
    await user.click(screen.getByRole("button", { name: amountsWords.show }));
    const row = screen.getByRole("region", { name: amountsWords.title });
    expect(await axeFaults(row)).toEqual([]);
    const image = within(row).getByRole("img");
    expect(image).toHaveAccessibleName(expect.stringContaining(amountsWords.option("A")));
    expect(image.querySelectorAll(".amounts-band")).toHaveLength(3);
    expect(within(row).queryByText(amountsWords.peripheral)).toBeNull();
    await user.click(screen.getByRole("button", { name: amountsWords.hide }));
    expect(screen.queryByRole("region", { name: amountsWords.title })).toBeNull();
    expect(now()).toBe(before);
  });
});
