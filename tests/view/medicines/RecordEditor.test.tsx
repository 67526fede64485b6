import { fireEvent, screen, waitFor, within } from "@testing-library/react";
import { describe, expect, test } from "vitest";
import { type MedicineRecord, recordById, recordDraft, recordDraftHistory } from "../../../src/core/medicine/index.ts";
import { recordWords } from "../../../src/core/messages/index.ts";
import { MedicinesScreen } from "../../../src/view/medicines/MedicinesScreen.tsx";
import { MemoryRepository } from "../../shell/store/memoryRepository.ts";
import { renderWorkbench } from "../ui/renderWorkbench.tsx";

// The whole form is large for a simulated browser, so fields are found by label, and axe looks at it in the real one.

const source = recordById("theophylline")!;
const own: MedicineRecord = {
  ...source,
  id: "a-own",
  name: "a theophylline of mine",
  cautions: [],
  doseLimits: [],
  sampling: [],
};
const button = (name: string | RegExp) => screen.getByText(name, { selector: "button, button *" }).closest("button")!;
const field = (name: string | RegExp) => screen.getByLabelText<HTMLInputElement>(name, { selector: "input" });
const type = (element: HTMLElement, value: string) => fireEvent.change(element, { target: { value } });
const clearance = () => field(/\(CL\)$/);
const volume = () => field(/\(V\)$/);
const pathOf = () => document.querySelector("path.profile-curve")?.getAttribute("d");

/** The editor open on a record of the user's own. */
async function openEditor() {
  const repository = new MemoryRepository();
  repository.medicines.set(own.id, own);
  const draft = recordDraftHistory(recordDraft(own)).draft;
  repository.settings.set("record-drafts", { [own.id]: { recordVersion: own.recordVersion, draft } });
  const rendered = await renderWorkbench(<MedicinesScreen />, { repository });
  fireEvent.click(button(own.name));
  fireEvent.click(button(recordWords.editOn));
  await screen.findByText(recordWords.editing(own.name));
  return rendered;
}

describe("the editor", () => {
  test("opens clean, with the curve of what is saved", async () => {
    await openEditor();
    expect(screen.getByText(recordWords.clean)).toBeVisible();
    expect(button(recordWords.save(own.recordVersion + 1))).toBeDisabled();
    expect(pathOf()).toMatch(/^M/);
  });

  test("a formula says its dimension and value, and where its units go wrong; the curve follows what is right", async () => {
    await openEditor();
    const before = pathOf();
    type(clearance(), "0.05 L/h/kg * weight");
    // 0.05 L/h/kg × 70 kg.
    expect(screen.getByText(/^3\.5.L\/h for the reference patient; dimension L\/h$/)).toBeVisible();
    const after = pathOf();
    expect(after).not.toBe(before);

    type(clearance(), "0.05 L/h * weight");
    expect(clearance()).toHaveAttribute("aria-invalid", "true");
    expect(document.querySelector(".draft-place mark")).toHaveTextContent("0.05 L/h * weight");
    expect(screen.getByText(recordWords.curveOld)).toBeVisible();
    expect(pathOf()).toBe(after);
    expect(button(recordWords.save(own.recordVersion + 1))).toBeDisabled();
  });

  test("a changed figure asks for its source, undo and redo go step by step, and saving counts the version up", async () => {
    const { state, repository } = await openEditor();
    const before = volume().value;
    type(volume(), "0.5 L/kg * weight");
    const group = within(volume().closest("fieldset")!);
    expect(group.getByText(recordWords.newSourceAsked)).toBeVisible();
    expect(group.getByText(recordWords.sourceMissing)).toBeVisible();
    expect(group.getByText(recordWords.basisMissing)).toBeVisible();
    expect(button(recordWords.save(own.recordVersion + 1))).toBeDisabled();
    type(group.getByLabelText(recordWords.sourceField), Object.keys(own.sources)[0]!);
    type(group.getByLabelText(recordWords.basisField), "common practice");
    expect(screen.getByText(recordWords.ready)).toBeVisible();

    for (let step = 0; step < 3; step += 1) fireEvent.click(button(recordWords.stepUndo));
    expect(volume()).toHaveValue(before);
    expect(screen.getByText(recordWords.clean)).toBeVisible();
    for (let step = 0; step < 3; step += 1) fireEvent.click(button(recordWords.stepRedo));
    expect(button(recordWords.stepRedo)).toBeDisabled();

    fireEvent.click(button(recordWords.save(own.recordVersion + 1)));
    await screen.findByText(recordWords.saved(own.name, own.recordVersion + 1));
    expect(repository.medicines.get(own.id)).toMatchObject({
      recordVersion: own.recordVersion + 1,
      kinetics: { volume: { formula: "0.5 L/kg * weight", basis: "common practice" } },
    });
    await waitFor(() => expect(state().recordEdits).toEqual({}));
  });

  test("what is wrong is kept when the editor is left, and given up only when asked", async () => {
    const { state } = await openEditor();
    type(field(/^Molar mass/), "180,17");
    fireEvent.click(button(recordWords.leave));
    expect(screen.getByText(new RegExp(recordWords.unsaved))).toBeVisible();
    fireEvent.click(button(recordWords.editOn));
    expect(field(/^Molar mass/)).toHaveValue("180,17");
    fireEvent.click(button(recordWords.giveUp));
    fireEvent.click(button(recordWords.giveUpNow));
    await waitFor(() => expect(state().recordEdits).toEqual({}));
    expect(state().medicines.at(-1)).toEqual(own);
  });

  test("the reference patient is the editor's to choose: what a formula lacks is said, and is no fault", async () => {
    await openEditor();
    type(field(recordWords.weight), "");
    expect(screen.getAllByText(/needs a weight/).length).toBeGreaterThan(0);
    expect(volume()).not.toHaveAttribute("aria-invalid");
    expect(screen.getByText(recordWords.clean)).toBeVisible();
  });
});
