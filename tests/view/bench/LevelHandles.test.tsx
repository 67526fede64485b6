import { act, screen, within } from "@testing-library/react";
import { describe, expect, test, vi } from "vitest";
import { derive } from "../../../src/core/analysis/index.ts";
import { dragWords } from "../../../src/core/messages/index.ts";
import type { AnalysisRunner } from "../../../src/shell/store/ports.ts";
import { BenchScreen } from "../../../src/view/bench/BenchScreen.tsx";
import { caseFixture } from "../../core/analysis/caseFixture.ts";
import { axeFaults } from "../ui/axeFaults.ts";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";

const level = (id: string, at: string, value: number, excluded?: string) => ({
  id,
  at,
  quantity: { value, unit: "mg/L" as const },
  kind: "measured" as const,
  ...(excluded ? { excluded } : {}),
});
const open = caseFixture({
  levels: [
    level("l", "2026-03-03T14:00:00+00:00", 5.3),
    level("m", "2026-03-04T07:30:00+00:00", 5),
    level("n", "2026-03-04T09:00:00+00:00", 6, "clotted"),
  ],
});
/** The clock is all that the handles need of an analysis; their levels are those of the case. */
const analysis = derive(open);
const show = async () => {
  const runner: AnalysisRunner = { where: "page", run: async () => ({ ok: true, analysis }) };
  const shown = await renderWorkbench(<BenchScreen onPrint={vi.fn()} />, { open, runner });
  const levels = await screen.findByRole("group", { name: dragWords.levels });
  const handle = (place: number) => within(levels).getByRole("slider", { name: dragWords.levelName(place) });
  const names = () => shown.state().open!.undo.map(({ name }) => name);
  return { ...shown, levels, handle, names };
};

describe("levels on the profile, by keyboard", () => {
  test("each says when and how much, and how it is moved; no fault axe can see", async () => {
    const { levels, handle } = await show();
    expect(handle(1)).toHaveAttribute("aria-valuetext", expect.stringMatching(/^Tue 3 March, 14:00, 5\.3.mg\/L$/));
    expect(handle(1)).toHaveAccessibleDescription(dragWords.levelHint);
    expect(handle(3)).toHaveAttribute("aria-valuetext", expect.stringMatching(/left out: clotted$/));
    expect(await axeFaults(levels.parentElement!)).toEqual([]);
  });

  test("left and right move the time alone, by quarter hours, with Shift by minutes; presses in a row are one step", async () => {
    const { user, handle, value, names, state } = await show();
    handle(1).focus();
    await user.keyboard("{ArrowRight}{ArrowRight}{Shift>}{ArrowLeft}{/Shift}");
    expect(value().levels[0]).toEqual({ ...open.levels[0], at: "2026-03-03T14:29:00+00:00" });
    expect(names()).toEqual(["levelMove"]);
    state().undo();
    expect(value().levels).toEqual(open.levels);
  });

  test("up and down change the value alone, and with Alt only; by tenths, as the level beside it was typed to tenths", async () => {
    const { user, handle, value, names } = await show();
    handle(2).focus();
    await user.keyboard("{ArrowUp}{ArrowDown}{ArrowUp}");
    expect(names()).toEqual([]);
    await user.keyboard("{Alt>}{ArrowUp}{ArrowUp}{/Alt}");
    expect(value().levels[1]).toEqual({ ...open.levels[1], quantity: { value: 5.2, unit: "mg/L" } });
    expect(names()).toEqual(["levelRevalue"]);
  });

  test("a level goes no earlier than the first dose and no later than the now line", async () => {
    const { user, handle, value, state } = await show();
    const at = () => value().levels.find(({ id }) => id === "l")!.at;
    act(() => state().edit("levelMove", { id: "l", at: "2026-03-04T11:40:00+00:00" }));
    handle(3).focus();
    await user.keyboard("{ArrowRight}{ArrowRight}{ArrowRight}");
    expect(at()).toBe(open.now);
    act(() => state().edit("levelMove", { id: "l", at: "2026-03-01T08:20:00+00:00" }));
    handle(1).focus();
    await user.keyboard("{ArrowLeft}{ArrowLeft}{ArrowLeft}");
    expect(at()).toBe(open.given[0]!.start);
  });

  test("Enter opens its form, Delete asks why it is left out; one left out does not move", async () => {
    const { user, handle, value, names } = await show();
    handle(3).focus();
    await user.keyboard("{ArrowLeft}{Alt>}{ArrowUp}{/Alt}{Delete}");
    expect(names()).toEqual([]);
    handle(1).focus();
    await user.keyboard("{Delete}");
    const panel = await screen.findByRole("dialog", { name: "Measured levels" });
    await user.type(within(panel).getByRole("textbox", { name: "Why is it left out?" }), "haemolysed{Enter}");
    expect(value().levels[0]!.excluded).toBe("haemolysed");
    await user.click(within(panel).getByRole("button", { name: "Close" }));
    handle(2).focus();
    await user.keyboard("{Enter}");
    const form = await screen.findByRole("dialog", { name: "Measured levels" });
    expect(within(form).getByRole("textbox", { name: "Concentration" })).toHaveValue("5");
  });

  test("a value its form would ask about is not set by a key: the form opens", async () => {
    const { user, handle, value, state, names } = await show();
    // Theophylline at 40 mg/L is everyday at the most; above, the same number of micromoles is likelier.
    act(() => state().edit("levelRevalue", { id: "m", number: 40 }));
    const before = names().length;
    handle(2).focus();
    await user.keyboard("{Alt>}{ArrowUp}{/Alt}");
    expect(await screen.findByRole("dialog", { name: "Measured levels" })).toBeVisible();
    expect(value().levels[1]!.quantity.value).toBe(40);
    expect(names()).toHaveLength(before);
  });
});
